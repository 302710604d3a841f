package motorcircuit

import (
	"errors"
	"strconv"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A Circuit is the branch circuit of one motor, as a designer knows it. Edition
// and the motor's kind, power and voltage are required; every other field has a
// default that its comment names and the result tells of.
type Circuit struct {
	Tag     string           `json:"tag,omitzero"`              // the caller's name for the circuit, carried through
	Edition tables.Edition   `json:"edition"`                   // the code in force
	Motor   motor.Motor      `json:"motor"`                     // the motor and its nameplate
	Device  tables.Device    `json:"device,omitzero"`           // short-circuit device; zero takes a time-delay fuse, which has the lowest ceilings
	Wiring  conductor.Wiring `json:"wiring,omitzero"`           // how the circuit is run
	MaxDrop tables.Ratio     `json:"max_drop_percent,omitzero"` // greatest voltage drop running, in percent: larger conductors are taken to keep it; zero asks for none
	Fault   tables.Current   `json:"fault_amperes,omitzero"`    // fault current available at the beginning of the run; zero leaves fault duty out
	FaultXR tables.Ratio     `json:"fault_xr,omitzero"`         // its ratio of reactance to resistance; zero takes reactance alone, which gives the most
}

// MaxVolts is the highest motor voltage that [Size] takes, in volts: above it
// other parts of the codes hold.
const MaxVolts = 1000

// Validate reports every field that cannot stand, joined: each error is a
// [*tables.InputError], or a [*tables.NotTabulatedError] for an ambient that the
// insulation does not allow.
func (c Circuit) Validate() error {
	if err := c.Edition.Check(); err != nil {
		return errors.Join(err, c.Motor.Validate())
	}
	return errors.Join(c.Motor.Validate(), c.validateRest())
}

// validateRest reports the faults that are not the motor's own.
func (c Circuit) validateRest() error {
	faults := []error{c.Wiring.Validate(c.Edition)}
	if c.Motor.Voltage > MaxVolts {
		faults = append(faults, &tables.InputError{Field: "motor.voltage", Value: strconv.Itoa(c.Motor.Voltage), Want: "1000 V or less: motors of higher voltage fall under other parts of the code"})
	}
	if c.Wiring.Conductors > 0 && c.Motor.Kind != 0 {
		_, err := c.Wiring.Together(c.Motor.LineConductors())
		faults = append(faults, err)
	}
	faults = append(faults, checkPhysical(c.Wiring, c.MaxDrop, c.Fault, c.FaultXR))
	faults = append(faults, protection.ValidateDevice(c.Edition, c.device(), c.Motor.Kind))
	return errors.Join(faults...)
}

// device returns the kind of short-circuit device, the default if none is given.
func (c Circuit) device() tables.Device {
	if c.Device == 0 {
		return protection.TimeDelayFuse
	}
	return c.Device
}

// Size works out the branch circuit of one motor. All faults of the input come
// back together, joined; [errors.As] finds each: [*tables.InputError] for a
// field that cannot stand, [*tables.NotTabulatedError] for what the code does
// not print, [*tables.NoSizeError] for a requirement that no size meets. With an
// error comes the zero Result.
func Size(c Circuit) (Result, error) {
	e, m := c.Edition, c.Motor
	if err := e.Check(); err != nil {
		return Result{}, errors.Join(err, m.Validate())
	}
	if m.Voltage > MaxVolts {
		return Result{}, c.Validate()
	}
	d, err := m.Demand(e)
	if err := errors.Join(err, c.validateRest()); err != nil {
		return Result{}, err
	}
	r := Result{Circuit: c, Demand: d}
	var faults []error
	note := func(err error) {
		if err != nil {
			faults = append(faults, err)
		}
	}
	note(r.conductors(e, c, d))
	r.Overload, err = protection.SizeOverload(e, m, d)
	note(err)
	r.ShortCircuit, err = protection.SizeShortCircuit(e, c.device(), m, d)
	note(err)
	if len(faults) > 0 {
		return Result{}, errors.Join(faults...)
	}
	if err := r.upsize(c); err != nil {
		return Result{}, err
	}
	if err := r.physical(c); err != nil {
		return Result{}, err
	}
	r.Disconnect = protection.SizeDisconnect(e, m, d)
	r.Controller = protection.SizeController(e, m, d)
	r.Cautions = r.cautions()
	return r, nil
}

// conductors selects the branch-circuit, motor-supply and secondary conductors.
func (r *Result) conductors(e tables.Edition, c Circuit, d motor.Demand) error {
	load := c.branchLoad(d.Branch)
	var faults [5]error
	r.Branch, faults[0] = c.Wiring.Select(e, load)
	if !d.Supply.IsZero() {
		load.Ampacity, load.Count = d.Supply, c.Motor.SupplyConductors()
		c.Wiring.Conductors = atLeastOwn(c.Wiring.Conductors, load.Count)
		if e.Code() == tables.CEC {
			r.MotorSupply, faults[1] = c.Wiring.SelectMotorSupply(e, load, c.motorEnd(&d))
		} else {
			r.MotorSupply, faults[1] = c.Wiring.Select(e, load)
		}
	}
	if !d.Secondary.IsZero() {
		c.Wiring.Conductors = atLeastOwn(c.Wiring.Conductors, 3)
		r.Secondary, faults[2] = c.Wiring.Select(e, conductor.Load{Ampacity: d.Secondary, Count: 3})
	}
	if !d.Resistor.IsZero() {
		c.Wiring.Conductors = atLeastOwn(c.Wiring.Conductors, 3)
		r.Resistor, faults[3] = c.Wiring.Select(e, conductor.Load{Ampacity: d.Resistor, Count: 3})
	}
	for _, w := range d.Windings {
		s, err := c.Wiring.Select(e, conductor.Load{Ampacity: w.Ampacity, Count: c.Motor.LineConductors(), Motor75: c.Motor.IsDesignBCD()})
		r.Windings, faults[4] = append(r.Windings, s), errors.Join(faults[4], err)
	}
	return errors.Join(faults[:]...)
}

// motorEnd describes the terminal box of the motor.
func (c *Circuit) motorEnd(d *motor.Demand) conductor.MotorEnd {
	n := &c.Motor.Nameplate
	return conductor.MotorEnd{InsulationClass: n.InsulationClass, NonVentilated: n.NonVentilated, Power: d.Horsepower}
}

// atLeastOwn carries a count given for the branch circuit over to another run,
// which holds its own conductors at least.
func atLeastOwn(given, own int) int {
	if given == 0 {
		return 0
	}
	return max(given, own)
}
