package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// Check holds an installed circuit against the rules that [Size] designs by. The
// circuit tells the motor, the code in force and how the circuit is run; where what
// is installed has a kind of device, a type of raceway or a length of its own, that
// holds. Least and Sets of its wiring are not used. Parts that are not given are
// listed as not judged; where another part depends on one, as a bonding conductor
// on the conductors, what Size would choose stands in.
//
// Errors are as of [Size], and [*tables.InputError] for what is installed, with the
// path in [Installed] after "installed.". With an error comes the zero Report.
func Check(c Circuit, in Installed) (Report, error) {
	if err := c.Edition.Check(); err != nil {
		return Report{}, errors.Join(err, c.Motor.Validate())
	}
	k := checker{judge: newJudge(c.Tag, c.Edition), in: in}
	c = in.stands(c)
	faults := in.validate(c)
	if c.Motor.Voltage > MaxVolts {
		return Report{}, errors.Join(c.Validate(), faults)
	}
	d, err := c.Motor.Demand(c.Edition)
	k.admit(&c)
	if err := errors.Join(err, c.validateRest(), faults); err != nil {
		return Report{}, err
	}
	k.r = Result{Circuit: c, Demand: d}
	for _, part := range []func() error{k.conductors, k.overload, k.device, k.switches, k.bonding, k.raceways, k.drop} {
		if err := part(); err != nil {
			return Report{}, err
		}
	}
	return k.finish(k.r.cautions()), nil
}

// A checker is a check under way. Its result is the circuit as it stands.
type checker struct {
	judge
	in Installed
	r  Result

	misplaced bool // the kind of device may not protect the motor
}

// stands returns the circuit as it stands, as far as it is described by one.
func (in *Installed) stands(c Circuit) Circuit {
	if in.Device.Kind.IsValid() {
		c.Device = in.Device.Kind
	}
	if in.Flexible.Type != 0 {
		c.Wiring.Flexible = in.Flexible.Type
	}
	c.Wiring = in.Raceway.stands(c.Wiring, in.Length)
	return c
}

// stands returns the wiring of a run as it stands, without what says how to choose.
func (in *InstalledRaceway) stands(w conductor.Wiring, length tables.Length) conductor.Wiring {
	w.Least, w.Sets = 0, 0
	if in.Type != 0 {
		w.Raceway = in.Type
	}
	if !length.IsZero() {
		w.Length = length
	}
	return w
}

// admit finds a kind of device that may not protect the motor, and an insulation
// that may not be used where it is. The circuit goes on without them.
func (k *checker) admit(c *Circuit) {
	k.unsuited(c, protection.ValidateDevice(c.Edition, c.device(), c.Motor.Kind))
	k.strip("branch", k.in.Branch, &c.Wiring)
}

// unsuited reports an error that is of the kind of device, and takes the kind away.
func (k *checker) unsuited(c *Circuit, err error) bool {
	var input *tables.InputError
	if !errors.As(err, &input) || input.Field != "device" || input.Cite.IsZero() {
		return false
	}
	k.say(DeviceKind, "device.kind", Violation, "the device is an "+c.device().Name()+", and the code asks for "+input.Want, input.Cite)
	k.misplaced, c.Device = true, protection.TimeDelayFuse
	return true
}

// overload judges the overload protection of the motor and of its windings.
func (k *checker) overload() (err error) {
	o := &k.r.Overload
	if *o, err = protection.SizeOverload(k.edition, k.r.Circuit.Motor, k.r.Demand); err != nil {
		return err
	}
	in := k.in.Overload
	given := !in.Setting.IsZero() || !in.Heater.IsZero() || in.Units > 0
	if o.Limit.IsZero() { // 695.6: none may be
		if given {
			k.say(OverloadAbsent, "overload", Violation, "there is overload protection, and the motor must have none", o.Cautions[0].Cite)
		}
		return nil
	}
	if in.Units > 0 {
		k.atLeast(claim{code: OverloadUnits, part: "overload.units", found: tables.Whole("number of overload units", tables.Plain, in.Units)}, o.Units, Violation)
	} else {
		k.skip("overload.units", "not given")
	}
	most := ceiling{limit: o.Limit, start: o.StartLimit, confirmed: k.in.HardStart, over: Violation}
	if in.Share {
		most.limit, most.start = o.Share, k.shareOf(o)
	}
	k.settings("overload", in, most)
	for i, w := range o.Windings {
		if i < len(k.in.Windings) {
			k.settings(windingPart(i)+".overload", k.in.Windings[i].Overload, ceiling{limit: w.Limit, start: w.StartLimit, confirmed: k.in.HardStart, over: Violation})
		} else {
			k.skip(windingPart(i)+".overload", "not given")
		}
	}
	return nil
}

// shareOf returns the share of the second step, absent where there is none.
func (k *checker) shareOf(o *protection.Overload) tables.Figure {
	if o.Share.IsZero() || o.StartLimit.IsZero() {
		return tables.Figure{}
	}
	return tables.ProductOf(o.Share.Name()+" if the motor will not start", k.edition, &necShareStart, o.StartLimit, o.Share.Operands()[1])
}

var necShareStart = tables.Rule{Ref: "430.32(C)", Note: "device that does not carry the whole motor current"}

// settings judges the setting and the heater of overload protection, of which one
// is enough.
func (k *checker) settings(part string, in InstalledOverload, most ceiling) {
	if in.Setting.IsZero() && in.Heater.IsZero() {
		k.skip(part+".setting_amperes", "not given")
		return
	}
	if !in.Setting.IsZero() {
		k.atMost(claim{code: OverloadSetting, part: part + ".setting_amperes", found: in.Setting.Figure("overload setting")}, most)
	}
	if !in.Heater.IsZero() {
		k.atMost(claim{code: OverloadSetting, part: part + ".heater_amperes", found: in.Heater.Figure("rated trip current of the heater")}, most)
	}
}
