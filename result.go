package motorcircuit

import (
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
	Drop         VoltageDrop             `json:"voltage_drop,omitzero"`     // along the run
	FaultDuty    FaultDuty               `json:"fault_duty,omitzero"`       // of a bolted fault
	Cautions     []tables.Caution        `json:"cautions"`                  // assumptions, readings, limits; never empty
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
	var buffer [16]*tables.Figure
	for s := range sectionCount {
		for _, f := range r.section(buffer[:0], s) {
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
