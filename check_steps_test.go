package motorcircuit_test

import (
	"github.com/shopspring/decimal"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A step takes one part of an installation a step over the line. It reports whether
// the design has such a part.
type step struct {
	code motorcircuit.FindingCode
	part string
	take func(r *motorcircuit.Result, in *motorcircuit.Installed) bool
}

// more and less are a current a hundredth of an ampere off.
func more(f tables.Figure) tables.Current {
	return motor.Amps(f.Value().Add(decimal.New(1, -2)).String())
}

func less(f tables.Figure) tables.Current {
	d := f.Value().Sub(decimal.New(1, -2))
	if f.IsZero() || d.Sign() <= 0 {
		return tables.Current{}
	}
	return motor.Amps(d.Truncate(6).String())
}

// lower returns the power of the ladder next below.
func lower(p tables.Power) (q tables.Power) {
	for _, hp := range ladder {
		if x := motor.HP(hp); p.IsHP() && x.Cmp(p) < 0 {
			q = x
		}
	}
	return q
}

// last returns the higher of two figures, of which the second may be absent.
func last(limit, start tables.Figure) tables.Figure {
	if start.Cmp(limit) > 0 {
		return start
	}
	return limit
}

// nextRating returns the standard rating next above what the code lets stand.
func nextRating(r *motorcircuit.Result) tables.Current {
	x := &r.ShortCircuit
	most := last(last(x.Limit, x.Rating), last(x.StartLimit, x.StartRating))
	if r.Circuit.Motor.Use == motor.FirePump {
		most = x.Rating
	}
	for _, rating := range r.Circuit.Edition.StandardRatings(x.Device) {
		if rating.Cmp(most) > 0 {
			return tables.CurrentAtMost(rating)
		}
	}
	return tables.Current{}
}

// smallerTrade returns the trade size next below.
func smallerTrade(e tables.Edition, f conductor.Filled) string {
	sizes, _ := e.RacewaySizes(f.Raceway)
	for i, s := range sizes {
		if s.Trade == f.Trade && i > 0 && sizes[i-1].Metric >= 16 {
			return sizes[i-1].Trade
		}
	}
	return ""
}

var steps = []step{
	{motorcircuit.OverloadSetting, "overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Setting = more(last(r.Overload.Limit, r.Overload.StartLimit))
		return !r.Overload.Limit.IsZero()
	}},
	{motorcircuit.OverloadSetting, "overload.heater_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Heater = more(last(r.Overload.Limit, r.Overload.StartLimit))
		return !r.Overload.Limit.IsZero()
	}},
	{motorcircuit.OverloadSetting, "overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		o := &r.Overload
		if o.Share.IsZero() {
			return false
		}
		percent := o.Share.Operands()[1].Value()
		most := last(o.Limit, o.StartLimit).Value().Mul(percent).Div(decimal.New(100, 0))
		in.Overload.Setting, in.Overload.Share = motor.Amps(most.Add(decimal.New(1, -2)).String()), true
		return true
	}},
	{motorcircuit.OverloadSetting, "windings[1].overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		if len(in.Windings) < 2 {
			return false
		}
		w := r.Overload.Windings[1]
		in.Windings[1].Overload.Setting = more(last(w.Limit, w.StartLimit))
		return true
	}},
	{motorcircuit.OverloadUnits, "overload.units", func(_ *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Units--
		return in.Overload.Units > 0
	}},
	{motorcircuit.OverloadAbsent, "overload", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Units = 3
		return r.Overload.Limit.IsZero()
	}},
	{motorcircuit.DeviceRating, "device.rating_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Rating = nextRating(r)
		return !r.ShortCircuit.Rating.IsZero() && !in.Device.Rating.IsZero()
	}},
	{motorcircuit.DeviceCarries, "device.rating_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Rating = less(r.ShortCircuit.Limit)
		return r.Circuit.Motor.Use == motor.FirePump
	}},
	{motorcircuit.InstantaneousSetting, "device.instantaneous_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		x := &r.ShortCircuit
		most := x.Instantaneous
		if x.Device == protection.InstantaneousBreaker {
			most = last(x.Limit, x.StartLimit)
		}
		in.Device.Instantaneous = more(most)
		return !most.IsZero()
	}},
	{motorcircuit.InterruptingRating, "device.interrupting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Interrupting = less(r.FaultDuty.Source)
		return !r.FaultDuty.Source.IsZero()
	}},
	{motorcircuit.SwitchAmperes, "disconnecting_means.amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.Amperes = less(r.Disconnect.Amperes)
		if r.Circuit.Edition.Code() == tables.CEC { // where the power alone would do
			in.Disconnect.Horsepower = tables.Power{}
		}
		return !in.Disconnect.Amperes.IsZero()
	}},
	{motorcircuit.SwitchHorsepower, "disconnecting_means.horsepower", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.Horsepower = lower(r.Disconnect.Horsepower)
		return !in.Disconnect.Horsepower.IsZero()
	}},
	{motorcircuit.SwitchLockedRotor, "disconnecting_means.locked_rotor_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.LockedRotor = less(r.Disconnect.LockedRotor)
		return !in.Disconnect.LockedRotor.IsZero()
	}},
	{motorcircuit.SwitchAmperes, "controller.amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.Amperes = less(r.Controller.Amperes)
		return !in.Controller.Amperes.IsZero()
	}},
	{motorcircuit.SwitchHorsepower, "controller.horsepower", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.Horsepower = lower(r.Controller.Horsepower)
		return !in.Controller.Horsepower.IsZero()
	}},
	{motorcircuit.SwitchLockedRotor, "controller.locked_rotor_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.LockedRotor = less(r.Controller.LockedRotor)
		return !in.Controller.LockedRotor.IsZero()
	}},
	{motorcircuit.BondingSize, "bonding", func(_ *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Bonding.Size = in.Bonding.Size.Smaller()
		return in.Bonding.Size != 0
	}},
	{motorcircuit.RacewayFilled, "raceway", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Raceway.Trade = smallerTrade(r.Circuit.Edition, r.Raceway)
		return in.Raceway.Trade != ""
	}},
	{motorcircuit.RacewayFilled, "flexible", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Flexible.Trade = smallerTrade(r.Circuit.Edition, r.Flexible)
		return in.Flexible.Trade != ""
	}},
	{motorcircuit.DropRunning, "length", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Length = conductor.Metres("10000")
		return !r.Circuit.MaxDrop.IsZero() && !r.Drop.Running.IsZero() && r.Circuit.Wiring.Least == 0 && r.Branch.Sets == 1
	}},
	{motorcircuit.ConductorInsulation, "motor_supply.insulation", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		least := r.MotorSupply.LeastRating
		in.MotorSupply.Insulated = motor.Celsius("60")
		return !least.IsZero() && least.Value().IntPart() > 60 && r.Circuit.Wiring.Ambient.Cmp(motor.Celsius("45")) < 0
	}},
}
