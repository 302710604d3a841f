package motor

import (
	"errors"

	"example.org/motorcircuit/tables"
)

// A Demand is what a motor asks of its circuit under one edition: the currents
// that the code says to use and the least ampacities that follow from them. A
// figure is absent where it does not apply.
type Demand struct {
	Table       tables.Figure `json:"table_current,omitzero"`    // full-load current of the code's table, where it is used
	Design      tables.Figure `json:"design_current,omitzero"`   // current for conductors, switches and short-circuit devices
	Overload    tables.Figure `json:"overload_current,omitzero"` // current that overload protection is set by
	LockedRotor LockedRotor   `json:"locked_rotor,omitzero"`     // and where it comes from

	Branch    tables.Figure `json:"branch_ampacity,omitzero"`       // least ampacity of the branch-circuit conductors
	Supply    tables.Figure `json:"motor_supply_ampacity,omitzero"` // least ampacity of the run to the motor, where the code treats it apart
	Secondary tables.Figure `json:"secondary_ampacity,omitzero"`    // least ampacity of wound-rotor secondary conductors, slip rings to controller

	Resistor tables.Figure   `json:"resistor_ampacity,omitzero"` // least ampacity of the conductors to resistors apart from the controller
	Windings []WindingDemand `json:"windings,omitempty"`         // of a multispeed motor, in the order given

	Input      tables.Figure `json:"drive_input_current,omitzero"` // rated input current of the drive that feeds the motor
	Horsepower tables.Power  `json:"horsepower,omitzero"`          // rating by which switches and controllers are chosen; of a motor marked in amperes, the least table row that carries them

	Cautions []tables.Caution `json:"-"`
}

// A LockedRotor is a motor's locked-rotor current and where it comes from. Low
// and High are the ends of a code letter's range; otherwise they are equal.
type LockedRotor struct {
	Source Source        `json:"source,omitzero"` // where it comes from
	Low    tables.Figure `json:"low,omitzero"`    // the lower end
	High   tables.Figure `json:"high,omitzero"`   // absent for code letter V, which has no upper end
}

// A Source tells where a locked-rotor current comes from.
type Source uint8

// The sources of a locked-rotor current.
const (
	NoSource        Source = iota // not known and not needed
	FromNameplate                 // marked in amperes
	FromCodeLetter                // the range of a marked code letter
	FromTable                     // the NEC's tables for choosing switches
	FromSixTimesFLC               // six times full-load current, where nothing else is known
)

var sourceTexts = [...]string{"", "nameplate", "code_letter", "table", "six_times_full_load"}

// String returns the stable text form, "" for NoSource.
func (s Source) String() string { return tables.TextOf(s, sourceTexts[:]) }

// MarshalText is [Source.String].
func (s Source) MarshalText() ([]byte, error) { return []byte(s.String()), nil }

// Demand works out the currents and least ampacities of a motor under an
// edition. Errors are [*tables.InputError] (all faults of the motor joined) and
// [*tables.NotTabulatedError].
func (m Motor) Demand(e tables.Edition) (Demand, error) {
	if err := e.Check(); err != nil {
		return Demand{}, err
	}
	if err := m.Validate(); err != nil {
		return Demand{}, errors.Join(err, m.essentials().untabulated(e))
	}
	if err := m.checkEdition(e); err != nil {
		return Demand{}, err
	}
	d := Demand{Input: m.Nameplate.DriveInput.Figure("rated input current of the drive")}
	var err error
	if e.Code() == tables.CEC {
		err = d.cec(m, e)
	} else {
		err = d.nec(m, e)
	}
	if err != nil {
		return Demand{}, err
	}
	return d, nil
}

// essentials returns the motor without what does not choose its table entry.
func (m Motor) essentials() Motor {
	return Motor{Kind: m.Kind, Phases: m.Phases, Power: m.Power, Voltage: m.Voltage, Nameplate: Nameplate{Amperes: m.Nameplate.Amperes}}
}

// untabulated returns the error of a motor that the edition's tables do not
// cover, so that it is told together with the other faults of an input.
func (m Motor) untabulated(e tables.Edition) error {
	if m.Validate() != nil {
		return nil
	}
	_, err := m.Demand(e)
	var none *tables.NotTabulatedError
	if errors.As(err, &none) {
		return none
	}
	return nil
}

// checkEdition reports what an edition has no rules for that are carried here.
func (m Motor) checkEdition(e tables.Edition) error {
	f := &faults{}
	if e.Code() == tables.CEC && m.Use == FirePump {
		f.add("motor.use", m.Use.String(), "ordinary or valve_actuator: the CEC's rules for fire pumps are not carried here")
	}
	if e.Code() == tables.CEC && m.Rectifier != NoRectifier {
		f.add("motor.rectifier", m.Rectifier.String(), "none: the CEC has no rule for motors on rectifiers that is carried here")
	}
	return f.err()
}

// instead adds to a table's refusal what would size the motor.
func instead(err error, what string) error {
	var none *tables.NotTabulatedError
	if errors.As(err, &none) {
		none.Instead = what
	}
	return err
}

// sixTimes is the locked-rotor current of a motor of which nothing else is known
// than its full-load or rated-load current.
func sixTimes(e tables.Edition, rule *tables.Rule, current tables.Figure) LockedRotor {
	six := tables.StatedFigure("times full-load current", e, rule, tables.Plain, 6, 0)
	f := tables.ProductOf("locked-rotor current", e, rule, current, six)
	return LockedRotor{FromSixTimesFLC, f, f}
}

// marked is the locked-rotor current in amperes that the nameplate bears.
func (n Nameplate) marked() LockedRotor {
	f := n.LockedRotor.Figure("marked locked-rotor current")
	return LockedRotor{FromNameplate, f, f}
}

func (d *Demand) caution(e tables.Edition, rule *tables.Rule, text string) {
	d.Cautions = append(d.Cautions, tables.Caution{Text: text, Cite: rule.In(e)})
}

// percentOf returns percent × current.
func percentOf(name string, e tables.Edition, rule *tables.Rule, current tables.Figure, percent, places int) tables.Figure {
	return tables.ProductOf(name, e, rule, current, tables.StatedFigure("of the current", e, rule, tables.Percent, int64(percent), places))
}

// dutyAmpacity returns duty percent × current.
func (m Motor) dutyAmpacity(name string, e tables.Edition, rule *tables.Rule, current tables.Figure) (tables.Figure, error) {
	percent, err := e.DutyPercent(m.Duty.Kind, m.Duty.Minutes)
	if err != nil {
		return tables.Figure{}, err
	}
	return tables.ProductOf(name, e, rule, current, percent), nil
}

// The names of the least ampacities.
const (
	branchName    = "least ampacity of the branch-circuit conductors"
	supplyName    = "least ampacity of the conductors to the motor"
	secondaryName = "least ampacity of the secondary conductors"
)
