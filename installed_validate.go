package motorcircuit

import (
	"cmp"
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

var (
	mostRating = motor.Amps("1000000")
	leastGrade = motor.Celsius("60")
	mostGrade  = motor.Celsius("250")
)

// An inspection collects what of an installation cannot stand as input.
type inspection struct {
	edition tables.Edition
	faults  []error
}

func (x *inspection) add(field, value, want string) {
	x.faults = append(x.faults, &tables.InputError{Field: "installed." + field, Value: value, Want: want})
}

// validate reports what cannot stand for a circuit under a valid edition.
func (in *Installed) validate(c Circuit) error {
	x := &inspection{edition: c.Edition}
	x.conductors("branch", in.Branch, false)
	x.conductors("motor_supply", in.MotorSupply, c.Edition.Code() == tables.CEC)
	x.conductors("secondary", in.Secondary, false)
	x.conductors("resistor", in.Resistor, false)
	if n := len(c.Motor.Nameplate.Windings); len(in.Windings) > n {
		x.add("windings", itoa(len(in.Windings)), "at most as many as the nameplate has, "+itoa(n))
	}
	shares := c.Motor.Starting == motor.WyeDelta || c.Motor.Starting == motor.PartWinding
	x.overload("overload", in.Overload, shares)
	for i, w := range in.Windings {
		x.conductors(windingPart(i)+".conductors", w.Conductors, false)
		x.overload(windingPart(i)+".overload", w.Overload, false)
	}
	x.device(in.Device)
	x.rated("disconnecting_means", in.Disconnect)
	x.rated("controller", in.Controller)
	x.bonding(in.Bonding)
	x.raceway("raceway", in.Raceway, c.Wiring.Raceway)
	x.raceway("flexible", in.Flexible, c.Wiring.Flexible)
	return errors.Join(x.faults...)
}

// validate reports what cannot stand for a feeder under a valid edition.
func (in *InstalledFeeder) validate(f Feeder) error {
	x := &inspection{edition: f.Edition}
	x.conductors("conductors", in.Conductors, false)
	x.device(in.Device)
	x.rated("disconnecting_means", in.Disconnect)
	x.bonding(in.Bonding)
	x.raceway("raceway", in.Raceway, f.Wiring.Raceway)
	return errors.Join(x.faults...)
}

func (x *inspection) conductors(part string, in Conductors, rated bool) {
	x.size(part, in.Size)
	if in.Sets < 0 || in.Sets > conductor.MaxSets {
		x.add(part+".sets", itoa(in.Sets), "1 to "+itoa(conductor.MaxSets)+", or 0 for 1")
	}
	x.insulation(part, in.Insulation)
	switch grade := in.Insulated; {
	case grade.IsZero():
	case !rated:
		x.add(part+".insulation_rating", grade.String(), "none but for motor supply conductors under the CEC")
	case grade.Cmp(leastGrade) < 0 || grade.Cmp(mostGrade) > 0:
		x.add(part+".insulation_rating", grade.String(), "60 to 250 °C")
	}
}

func (x *inspection) size(part string, size tables.Size) {
	if size != 0 && (!size.IsValid() || size.IsMetric()) {
		x.add(part+".size", cmp.Or(size.String(), itoa(int(size))), "an AWG or kcmil size")
	}
}

// insulation looks a designation up; "" is not given.
func (x *inspection) insulation(part, designation string) {
	if designation == "" {
		return
	}
	_, err := x.edition.Insulation(designation)
	var input *tables.InputError
	if errors.As(err, &input) {
		x.add(part+".insulation", input.Value, input.Want)
	}
}

func (x *inspection) overload(part string, in InstalledOverload, shares bool) {
	x.current(part+".setting_amperes", in.Setting)
	x.current(part+".heater_amperes", in.Heater)
	if in.Units < 0 || in.Units > 9 {
		x.add(part+".units", itoa(in.Units), "1 to 9, or 0 for not given")
	}
	if in.Share && !shares {
		x.add(part+".share", "true", "false but with a wye-delta or part-winding start")
	}
}

func (x *inspection) device(in InstalledDevice) {
	if in.Kind != 0 && !in.Kind.IsValid() {
		x.add("device.kind", itoa(int(in.Kind)), "a kind of fuse or breaker")
	}
	x.current("device.rating_amperes", in.Rating)
	x.current("device.instantaneous_amperes", in.Instantaneous)
	x.current("device.interrupting_amperes", in.Interrupting)
}

func (x *inspection) rated(part string, in Switch) {
	x.current(part+".amperes", in.Amperes)
	x.current(part+".locked_rotor_amperes", in.LockedRotor)
	if !in.Horsepower.IsZero() && !in.Horsepower.AtMost(100_000) {
		x.add(part+".horsepower", in.Horsepower.String(), "at most 100000")
	}
}

func (x *inspection) current(field string, c tables.Current) {
	if !c.IsZero() && (c.Decimal().Sign() <= 0 || c.Cmp(mostRating) > 0) {
		x.add(field, c.String(), "above 0 A, at most 1000000 A")
	}
}

func (x *inspection) bonding(in BondingConductors) {
	x.size("bonding", in.Size)
	if in.Material.String() == "" {
		x.add("bonding.material", itoa(int(in.Material)), "copper or aluminum")
	}
}

func (x *inspection) raceway(part string, in InstalledRaceway, kind tables.Raceway) {
	if in.Trade != "" && kind == 0 {
		x.add(part+".type", "", "the type of the raceway whose trade size is given")
	}
	if most := 20; len(in.Trade) > most {
		x.add(part+".trade_size", in.Trade[:most]+"...", "a trade size in inches or by metric designator")
	}
	for i, p := range in.Others {
		at := part + ".others[" + itoa(i) + "]"
		if p.Size == 0 {
			x.add(at+".size", "", "an AWG or kcmil size")
		}
		x.size(at, p.Size)
		if p.Count < 1 || p.Count > 1000 {
			x.add(at+".count", itoa(p.Count), "1 to 1000 conductors")
		}
		x.insulation(at, p.Insulation)
	}
}
