package motorcircuit_test

import (
	"math/rand/v2"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// ofPart returns the findings of a part and of what is in it.
func ofPart(r motorcircuit.Report, part string) (list []motorcircuit.Finding) {
	for _, f := range r.Findings {
		if f.Part == part || strings.HasPrefix(f.Part, part+".") || strings.HasPrefix(f.Part, part+"[") {
			list = append(list, f)
		}
	}
	return list
}

// alone are the parts that are judged by themselves: what else is given of the
// installation makes no difference to them.
var alone = map[string]func(all motorcircuit.Installed) motorcircuit.Installed{
	"branch": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Branch: all.Branch}
	},
	"motor_supply": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{MotorSupply: all.MotorSupply}
	},
	"secondary": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Secondary: all.Secondary}
	},
	"resistor": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Resistor: all.Resistor}
	},
	"windings": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Windings: all.Windings, HardStart: all.HardStart}
	},
	"overload": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Overload: all.Overload, HardStart: all.HardStart}
	},
	"device": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Device: all.Device, HardStart: all.HardStart}
	},
	"disconnecting_means": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Disconnect: all.Disconnect}
	},
	"controller": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Controller: all.Controller}
	},
	"length": func(all motorcircuit.Installed) motorcircuit.Installed {
		return motorcircuit.Installed{Branch: all.Branch, Length: all.Length, Raceway: motorcircuit.InstalledRaceway{Type: all.Raceway.Type}} // whose metal has a part in the reactance
	},
}

// A part is judged alike alone and with all others.
func TestCheckJudgesPartsApart(t *testing.T) {
	count := 8_000
	if testing.Short() {
		count = 500
	}
	rnd := rand.New(rand.NewPCG(71, 72))
	compared := map[string]int{}
	for range count {
		c := anyCircuit(rnd)
		in := anyInstalled(rnd, c)
		all, err := motorcircuit.Check(c, in)
		if err != nil {
			continue
		}
		for part, only := range alone {
			want := ofPart(all, part)
			if len(want) == 0 {
				continue
			}
			compared[part]++
			require.Equal(t, want, ofPart(checked(t, c, only(in)), part), "%s of %+v %+v", part, c, in)
		}
	}
	for part := range alone {
		assert.Positive(t, compared[part], part)
	}
}

// marginOf returns the margin of one finding, and whether it was made.
func marginOf(r motorcircuit.Report, code motorcircuit.FindingCode, part string) (tables.Figure, bool) {
	for _, f := range r.Findings {
		if f.Code == code && f.Part == part {
			return f.Margin, true
		}
	}
	return tables.Figure{}, false
}

// grown returns the next larger size that every insulation is made in.
func grown(size tables.Size) tables.Size {
	if size.Cmp(sizeOf("1000")) < 0 {
		return size.Larger()
	}
	return size
}

// More of what is asked for at the least never makes a margin smaller, and more of
// what is held to a ceiling never makes one larger.
func TestCheckMarginsMoveOneWay(t *testing.T) {
	count := 1_500
	if testing.Short() {
		count = 150
	}
	compared := map[motorcircuit.FindingCode]int{}
	randomDesigns(t, 73, count, func(rnd *rand.Rand, r motorcircuit.Result) {
		c, in := r.Circuit, r.AsInstalled()
		before := checked(t, c, in)
		for _, x := range []struct {
			code  motorcircuit.FindingCode
			part  string
			grows bool
			take  func(*motorcircuit.Installed)
		}{
			{motorcircuit.ConductorAmpacity, "branch", true, func(in *motorcircuit.Installed) { in.Branch.Size = grown(in.Branch.Size) }},
			{motorcircuit.ConductorAmpacity, "branch", true, func(in *motorcircuit.Installed) { in.Branch.Sets = min(in.Branch.Sets+1, conductor.MaxSets) }},
			{motorcircuit.DropRunning, "length", true, func(in *motorcircuit.Installed) { in.Branch.Sets = min(in.Branch.Sets+1, conductor.MaxSets) }},
			{motorcircuit.DropRunning, "length", false, func(in *motorcircuit.Installed) { in.Length = conductor.Metres("250") }},
			{motorcircuit.DeviceRating, "device.rating_amperes", false, func(in *motorcircuit.Installed) { in.Device.Rating = motor.Amps("9000") }},
			{motorcircuit.DeviceCarries, "device.rating_amperes", true, func(in *motorcircuit.Installed) { in.Device.Rating = motor.Amps("9000") }},
			{motorcircuit.OverloadSetting, "overload.setting_amperes", false, func(in *motorcircuit.Installed) { in.Overload.Setting = motor.Amps("9000") }},
			{motorcircuit.SwitchAmperes, "disconnecting_means.amperes", true, func(in *motorcircuit.Installed) { in.Disconnect.Amperes = motor.Amps("9000") }},
			{motorcircuit.BondingSize, "bonding", true, func(in *motorcircuit.Installed) { in.Bonding.Size = grown(in.Bonding.Size) }},
			{motorcircuit.BondingSize, "bonding", false, func(in *motorcircuit.Installed) {
				in.Device.Rating = tables.CurrentAtMost(last(r.ShortCircuit.Rating, r.ShortCircuit.StartRating))
			}},
			{motorcircuit.RacewayFilled, "raceway", false, func(in *motorcircuit.Installed) {
				in.Raceway.Others = []conductor.Pull{{Size: in.Branch.Size, Count: 3}}
			}},
		} {
			changed := in
			x.take(&changed)
			was, had := marginOf(before, x.code, x.part)
			is, has := marginOf(checked(t, c, changed), x.code, x.part)
			if !had || !has {
				continue
			}
			compared[x.code]++
			if x.grows {
				require.GreaterOrEqual(t, is.Cmp(was), 0, "%v %s: %+v", x.code, x.part, c)
			} else {
				require.LessOrEqual(t, is.Cmp(was), 0, "%v %s: %+v", x.code, x.part, c)
			}
		}
	})
	assert.Len(t, compared, 8)
}
