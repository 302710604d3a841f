package motorcircuit

import (
	"iter"
	"slices"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A Result is the branch circuit that [Size] works out. Every number in it is a
// [tables.Figure], which tells how it came about; an absent figure or selection
// does not apply to the circuit. Read in order, the figures are a derivation
// that can be redone on paper.
type Result struct {
	Circuit      Circuit                 `json:"circuit"`                   // the input
	Demand       motor.Demand            `json:"demand"`                    // currents and least ampacities
	Branch       conductor.Selection     `json:"branch"`                    // branch-circuit conductors
	MotorSupply  conductor.Selection     `json:"motor_supply,omitzero"`     // run to the motor, where the code treats it apart
	Secondary    conductor.Selection     `json:"secondary,omitzero"`        // wound-rotor secondary conductors
	Resistor     conductor.Selection     `json:"resistor,omitzero"`         // conductors to resistors apart from the controller
	Windings     []conductor.Selection   `json:"windings,omitempty"`        // runs to the windings of a multispeed motor, in the order given
	BySize       tables.Size             `json:"size_by_ampacity,omitzero"` // of the branch circuit, before voltage drop
	Overload     protection.Overload     `json:"overload"`                  // overload protection
	ShortCircuit protection.ShortCircuit `json:"short_circuit_device"`      // short-circuit and ground-fault device
	Disconnect   protection.Disconnect   `json:"disconnecting_means"`       // disconnecting means
	Controller   protection.Controller   `json:"controller"`                // controller
	Bonding      conductor.Bonding       `json:"bonding"`                   // bonding conductor
	Raceway      conductor.Filled        `json:"raceway,omitzero"`          // raceway of each set of conductors
	Flexible     conductor.Filled        `json:"flexible,omitzero"`         // flexible connection at the motor
	Drop         VoltageDrop             `json:"voltage_drop,omitzero"`
	FaultDuty    FaultDuty               `json:"fault_duty,omitzero"`
	Cautions     []tables.Caution        `json:"cautions"` // assumptions, readings, limits; never empty
}

// A Section is a part of a derivation.
type Section uint8

// The sections of a derivation, in order.
const (
	Currents Section = iota
	BranchConductors
	MotorSupplyConductors
	SecondaryConductors
	ResistorConductors
	WindingConductors
	OverloadProtection
	ShortCircuitDevice
	DisconnectingMeans
	ControllerRating
	BondingConductor
	RacewayFill
	DropSection
	FaultSection
	sectionCount
)

var sectionNames = [...]string{
	"Design currents", "Branch-circuit conductors", "Motor supply conductors", "Secondary conductors", "Conductors to the resistors", "Conductors to each winding", "Overload protection",
	"Short-circuit and ground-fault device", "Disconnecting means", "Controller", "Bonding conductor", "Raceway", "Voltage drop", "Fault duty",
}

// String returns the section's heading.
func (s Section) String() string { return tables.TextOf(s, sectionNames[:]) }

// Figures yields every figure of the result that is present, in the order of
// the derivation, each with its section.
func (r Result) Figures() iter.Seq2[Section, tables.Figure] {
	return func(yield func(Section, tables.Figure) bool) {
		for s := range sectionCount {
			for _, f := range r.section(s) {
				if !f.IsZero() && !yield(s, f) {
					return
				}
			}
		}
	}
}

func (r *Result) section(s Section) []tables.Figure {
	d := &r.Demand
	switch s {
	case Currents:
		figures := []tables.Figure{d.Table, d.Design, d.Overload, d.Input, d.LockedRotor.Low, d.LockedRotor.High}
		if d.LockedRotor.Source != motor.FromCodeLetter {
			figures[4] = tables.Figure{} // one figure, not the ends of a range
		}
		return figures
	case BranchConductors:
		return selectionFigures(&r.Branch)
	case MotorSupplyConductors:
		return selectionFigures(&r.MotorSupply)
	case SecondaryConductors:
		return selectionFigures(&r.Secondary)
	case ResistorConductors:
		return selectionFigures(&r.Resistor)
	case WindingConductors:
		var figures []tables.Figure
		for i := range r.Windings {
			figures = append(figures, selectionFigures(&r.Windings[i])...)
		}
		return figures
	case OverloadProtection:
		o := &r.Overload
		figures := []tables.Figure{o.Limit, o.StartLimit, o.Share, o.Protector, o.Units}
		for _, w := range o.Windings {
			figures = append(figures, w.Limit, w.StartLimit)
		}
		return figures
	case ShortCircuitDevice:
		x := &r.ShortCircuit
		figures := []tables.Figure{x.Limit, x.Rating, x.StartLimit, x.StartRating, x.Instantaneous, x.Half, x.Smallest}
		if x.Device == protection.InstantaneousBreaker {
			figures[4] = tables.Figure{} // the same as the limit
		}
		return figures
	case DisconnectingMeans:
		x := &r.Disconnect
		return []tables.Figure{x.Amperes, x.LockedRotor, x.Sight}
	case ControllerRating:
		x := &r.Controller
		return []tables.Figure{x.Amperes, x.LockedRotor, x.GeneralUse, x.SnapSwitch}
	case BondingConductor:
		return []tables.Figure{r.Bonding.Row}
	case RacewayFill:
		return append(racewayFigures(&r.Raceway), racewayFigures(&r.Flexible)...)
	case DropSection:
		return dropFigures(&r.Drop)
	}
	x := &r.FaultDuty
	return []tables.Figure{x.Source, x.Contribution, x.AtMotor, x.LineToLine, x.Withstand}
}

func racewayFigures(x *conductor.Filled) []tables.Figure {
	return []tables.Figure{x.Area, x.Limit, x.Percent}
}

func dropFigures(x *VoltageDrop) []tables.Figure {
	return []tables.Figure{x.Limit, x.Running, x.Starting, x.LongestRun}
}

func selectionFigures(s *conductor.Selection) []tables.Figure {
	if s.IsZero() {
		return nil
	}
	figures := []tables.Figure{s.Required, s.LeastRating, s.Termination, s.Ambient, s.Together, s.Need, s.Ampacity, s.SmallLimit}
	if s.Need.Cmp(s.Required) == 0 {
		figures[5] = tables.Figure{} // nothing to correct
	}
	return figures
}

// supplyEnd is the rule of the other end of motor supply conductors.
var supplyEnd = tables.Rule{Ref: "Rule 4-006", Mark: tables.MarkB}

// The cautions that a circuit as such gives rise to.
var (
	standing      = tables.Caution{Text: "for design by or under a licensed person: the printed code in force, local amendments, equipment markings and the authority having jurisdiction decide"}
	noDevice      = tables.Caution{Text: "no kind of short-circuit device is given: a time-delay fuse is taken, which has the lowest ceilings"}
	noAmbient     = tables.Caution{Text: "no ambient is given: 30 °C is taken, the base of the ampacity tables"}
	noTermination = tables.Caution{Text: "the terminals are not marked: 60 °C is taken for circuits of 100 A or less and 75 °C above"}
	motorMarked   = tables.Caution{Text: "the terminals are not marked: 75 °C is taken for a motor marked Design B, C or D, for which its other end must be suited too"}
)

// cautions gathers what each step had to say, then what the whole rests on;
// each once, the standing caution last.
func (r *Result) cautions() []tables.Caution {
	list := make(cautionList, 0, 16)
	add := list.add
	c := &r.Circuit
	if c.Device == 0 {
		add(noDevice)
	}
	if c.Wiring.Ambient.IsZero() {
		add(noAmbient)
	}
	if c.Wiring.Termination == 0 {
		if c.Edition.Code() == tables.NEC && c.Motor.IsDesignBCD() {
			add(motorMarked)
		} else {
			add(noTermination)
		}
	}
	add(r.Demand.Cautions...)
	add(r.Branch.Cautions...)
	add(r.MotorSupply.Cautions...)
	if c.Edition.Code() == tables.CEC && !r.MotorSupply.IsZero() && r.MotorSupply.Size.Cmp(r.Branch.Size) < 0 {
		add(tables.Caution{Text: "the motor supply conductors hold for the motor's end only: where they begin at terminals, those ask for the size of the branch-circuit conductors", Cite: supplyEnd.In(c.Edition)})
	}
	add(r.Secondary.Cautions...)
	add(r.Resistor.Cautions...)
	for _, w := range r.Windings {
		add(w.Cautions...)
	}
	add(r.Overload.Cautions...)
	add(r.ShortCircuit.Cautions...)
	add(r.Disconnect.Cautions...)
	add(r.Controller.Cautions...)
	add(r.Bonding.Cautions...)
	add(r.Raceway.Cautions...)
	add(r.Flexible.Cautions...)
	add(r.dropCautions()...)
	for s := range sectionCount {
		for _, f := range r.section(s) {
			for _, cite := range f.FromMemory() {
				add(tables.FromMemory(cite))
			}
		}
	}
	list.finish(c.Edition)
	return list
}

// A cautionList holds each caution once.
type cautionList []tables.Caution

func (l *cautionList) add(cautions ...tables.Caution) {
	for _, c := range cautions {
		if !slices.Contains(*l, c) {
			*l = append(*l, c)
		}
	}
}

// finish adds what of the edition was not read, and the standing caution.
func (l *cautionList) finish(e tables.Edition) {
	if gap := e.Gap(); gap != "" {
		l.add(tables.Caution{Text: gap, Cite: tables.Citation{Edition: e, Ref: "edition"}})
	}
	l.add(standing)
}
