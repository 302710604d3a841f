package motorcircuit

import (
	"errors"
	"fmt"
	"strconv"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A Feeder supplies the branch circuits of several motors, and other loads.
// Edition and at least one circuit are required.
type Feeder struct {
	Tag        string           `json:"tag,omitzero"`                     // the caller's name for the feeder, carried through
	Edition    tables.Edition   `json:"edition"`                          // the code in force; every circuit is under it
	Circuits   []FeederCircuit  `json:"circuits"`                         // the motors, in any order
	Continuous tables.Current   `json:"continuous_load_amperes,omitzero"` // other load that is continuous
	Other      tables.Current   `json:"other_load_amperes,omitzero"`      // other load that is not continuous
	Demand     tables.Ratio     `json:"demand_factor,omitzero"`           // share of the motor load that the loading justifies, with the authority's leave; zero is 1
	Device     tables.Device    `json:"device,omitzero"`                  // short-circuit device of the feeder; zero takes a time-delay fuse
	Fault      tables.Current   `json:"fault_amperes,omitzero"`           // fault current available at the beginning of the feeder; zero leaves fault duty out
	FaultXR    tables.Ratio     `json:"fault_xr,omitzero"`                // its ratio of reactance to resistance; zero takes reactance alone
	MaxDrop    tables.Ratio     `json:"max_drop_percent,omitzero"`        // greatest voltage drop running, in percent: larger conductors are taken to keep it; zero asks for none
	Wiring     conductor.Wiring `json:"wiring,omitzero"`                  // how the feeder is run
}

// A FeederCircuit is a branch circuit as the feeder sees it.
type FeederCircuit struct {
	Circuit Circuit `json:"circuit"` // the motor and its branch circuit

	// Interlock names a group of which only one alternative runs at a time.
	Interlock string `json:"interlock,omitzero"`

	// Alternative names the motor's alternative of the interlock; "" is one of its own.
	Alternative string `json:"alternative,omitzero"`

	// StartsWith names a set of motors that must start together (CEC Rule 28-204(2)).
	StartsWith string `json:"starts_with,omitzero"`

	// DriveGroup names a drive that feeds several motors: its input current counts once.
	DriveGroup string `json:"drive_group,omitzero"`

	// Lines names the conductors of a three-phase feeder that a single-phase motor
	// is connected to, such as "AB" or "C"; "" counts it on every line.
	Lines string `json:"lines,omitzero"`

	// HardStart takes the device of this motor at the higher ceiling, since the
	// motor will not start under the ordinary one.
	HardStart bool `json:"hard_start,omitzero"`
}

// A CircuitError is what is wrong with one circuit of a feeder.
type CircuitError struct {
	Index int    // in [Feeder.Circuits]
	Tag   string // of the circuit
	Err   error
}

func (e *CircuitError) Error() string {
	return fmt.Sprintf("circuits[%d] %.40q: %v", e.Index, e.Tag, e.Err)
}

// Unwrap returns the error of the circuit.
func (e *CircuitError) Unwrap() error { return e.Err }

// A FeederResult is a feeder sized by [SizeFeeder].
type FeederResult struct {
	Feeder      Feeder                `json:"feeder"`                // the input
	Circuits    []Result              `json:"circuits"`              // the branch circuits, in the order given
	Terms       []Term                `json:"terms"`                 // the parts of the least ampacity, in order of current
	Governs     string                `json:"governs"`               // tag of the motor that the 125 percent goes to; "" if it goes to none
	NotCounted  []string              `json:"not_counted,omitempty"` // tags of the motors without a part in the sum: of an interlock, a line or a drive that others stand for
	Ampacity    tables.Figure         `json:"ampacity"`              // least ampacity of the feeder
	Conductors  conductor.Selection   `json:"conductors"`            // feeder conductors
	Count       int                   `json:"conductors_in_set"`     // conductors of each set, a neutral with them
	Largest     string                `json:"largest_device"`        // tag of the motor whose device governs the feeder's
	Device      tables.Device         `json:"device"`                // kind of the feeder's device
	Limit       tables.Figure         `json:"limit"`                 // greatest feeder device
	Rating      tables.Figure         `json:"rating"`                // standard rating at or below the limit
	StartLimit  tables.Figure         `json:"start_limit,omitzero"`  // the same, for motors that must start together (CEC)
	StartRating tables.Figure         `json:"start_rating,omitzero"` // standard rating at or below that
	Disconnect  protection.Disconnect `json:"disconnecting_means"`   // one disconnecting means for the whole group
	Bonding     conductor.Bonding     `json:"bonding"`               // bonding conductor of the feeder
	Raceway     conductor.Filled      `json:"raceway,omitzero"`      // raceway of each set of conductors
	Drop        VoltageDrop           `json:"voltage_drop,omitzero"` // along the feeder
	TotalDrop   []tables.Figure       `json:"total_drop,omitempty"`  // running, of feeder and branch circuit together, in the order given; absent without lengths
	FaultDuty   FaultDuty             `json:"fault_duty,omitzero"`   // at the end of the feeder; its circuits, where they give no fault current, begin with that
	Cautions    []tables.Caution      `json:"cautions"`              // assumptions, readings, limits; never empty
}

// A Term is one part of a sum: a motor or another load.
type Term struct {
	Tag    string        `json:"tag"`    // of the motor; "" for another load
	Figure tables.Figure `json:"figure"` // its part
}

// SizeFeeder works out a feeder: its branch circuits, conductors, short-circuit
// device, the disconnecting means of the group and the bonding conductor. The
// answer does not depend on the order of the circuits. All faults come back
// joined; those of a circuit are in a [*CircuitError].
func SizeFeeder(f Feeder) (FeederResult, error) {
	r, members, err := f.begin()
	if err != nil {
		return FeederResult{}, err
	}
	g := f.group(members)
	if err := g.plan(); err != nil {
		return FeederResult{}, err
	}
	r.ampacity(&g)
	var carrying int
	r.Count, carrying = g.conductors()
	if r.Conductors, err = f.Wiring.Select(f.Edition, conductor.Load{Ampacity: r.Ampacity, Count: carrying}); err != nil {
		return FeederResult{}, err
	}
	if err := r.device(&g); err != nil {
		return FeederResult{}, err
	}
	r.Disconnect = g.disconnect()
	if err := r.physical(&g); err != nil {
		return FeederResult{}, err
	}
	r.Cautions = r.cautions(&g)
	return r, nil
}

// group is the motors and other loads of the feeder.
func (f Feeder) group(members []member) group {
	return group{edition: f.Edition, members: members, continuous: f.Continuous.Figure("continuous other load"), other: f.Other.Figure("other load")}
}

// begin validates a feeder and sizes its branch circuits.
func (f Feeder) begin() (FeederResult, []member, error) {
	r := FeederResult{Feeder: f, Device: f.Device}
	if r.Device == 0 {
		r.Device = protection.TimeDelayFuse
	}
	if err := f.validate(); err != nil {
		return FeederResult{}, nil, err
	}
	members, err := r.sizeCircuits()
	return r, members, err
}

// validate reports the faults of the feeder itself.
func (f Feeder) validate() error {
	if err := f.Edition.Check(); err != nil {
		return err
	}
	faults := []error{f.Wiring.Validate(f.Edition), checkPhysical(f.Wiring, f.MaxDrop, f.Fault, f.FaultXR)}
	add := func(field, value, want string) {
		faults = append(faults, &tables.InputError{Field: field, Value: value, Want: want})
	}
	if len(f.Circuits) == 0 {
		add("circuits", "", "at least one motor circuit")
	}
	if f.Device != 0 && (!f.Device.IsValid() || f.Device == protection.InstantaneousBreaker) {
		value := f.Device.String()
		if value == "" {
			value = strconv.Itoa(int(f.Device))
		}
		add("device", value, "a fuse or an inverse-time breaker for a feeder")
	}
	if d := f.Demand; !d.IsZero() && (d.Decimal().Sign() <= 0 || d.Cmp(wholeDemand) > 0) {
		add("demand_factor", d.String(), "above 0, at most 1")
	}
	for _, load := range []struct {
		field string
		amps  tables.Current
	}{{"continuous_load_amperes", f.Continuous}, {"other_load_amperes", f.Other}} {
		if load.amps.Cmp(mostLoad) > 0 {
			add(load.field, load.amps.String(), "at most 100000 A")
		}
	}
	return errors.Join(faults...)
}

var (
	wholeDemand = motor.Factor("1")
	mostLoad    = motor.Amps("100000")
)

// sizeCircuits sizes every branch circuit and gathers the faults of all.
func (r *FeederResult) sizeCircuits() ([]member, error) {
	var faults []error
	members := make([]member, 0, len(r.Feeder.Circuits))
	for i, fc := range r.Feeder.Circuits {
		fail := func(err error) { faults = append(faults, &CircuitError{i, fc.Circuit.Tag, err}) }
		c := fc.Circuit
		if c.Edition != r.Feeder.Edition {
			fail(&tables.InputError{Field: "edition", Value: c.Edition.String(), Want: r.Feeder.Edition.String() + ", as the feeder"})
			continue
		}
		if c.Motor.Use == motor.FirePump {
			fail(&tables.InputError{Field: "motor.use", Value: c.Motor.Use.String(), Want: "ordinary or valve_actuator on a feeder or in a group: the supply of a fire pump follows rules of its own, size its circuit alone"})
			continue
		}
		if err := checkLines(fc, c.Motor.PhaseCount()); err != nil {
			fail(err)
		}
		one, err := Size(c)
		if err != nil {
			fail(err)
			continue
		}
		r.Circuits = append(r.Circuits, one)
		m, err := r.member(i, fc, one)
		if err != nil {
			fail(err)
			continue
		}
		members = append(members, m)
	}
	faults = append(faults, checkVoltages(members)...)
	return members, errors.Join(faults...)
}

// checkLines checks the lines that a single-phase motor names.
func checkLines(fc FeederCircuit, phases int) error {
	if fc.Lines == "" {
		return nil
	}
	switch fc.Lines {
	case "A", "B", "C", "AB", "BC", "CA":
		if phases == 1 {
			return nil
		}
		return &tables.InputError{Field: "lines", Value: fc.Lines, Want: "none for a motor that is not single-phase"}
	}
	return &tables.InputError{Field: "lines", Value: fc.Lines[:min(len(fc.Lines), 20)], Want: "A, B, C, AB, BC or CA"}
}
