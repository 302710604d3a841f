package motorcircuit

import (
	"iter"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

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
	"Design currents", "Branch-circuit conductors", "Motor supply conductors", "Secondary conductors", "Conductors to the resistors",
	"Conductors to each winding", "Overload protection", "Short-circuit and ground-fault device", "Disconnecting means", "Controller",
	"Bonding conductor", "Raceway", "Voltage drop", "Fault duty",
}

// String returns the section's heading.
func (s Section) String() string { return tables.TextOf(s, sectionNames[:]) }

// Figures yields every figure of the result that is present, in the order of
// the derivation, each with its section.
func (r Result) Figures() iter.Seq2[Section, tables.Figure] {
	return func(yield func(Section, tables.Figure) bool) {
		for s := range sectionCount {
			for _, f := range r.section(nil, s) {
				if !f.IsZero() && !yield(s, *f) {
					return
				}
			}
		}
	}
}

// section appends the figures of a section, absent ones too, to a list.
func (r *Result) section(list []*tables.Figure, s Section) []*tables.Figure {
	for _, x := range r.selections(s) {
		list = selectionFigures(list, x)
	}
	d := &r.Demand
	switch s {
	case BranchConductors, MotorSupplyConductors, SecondaryConductors, ResistorConductors, WindingConductors:
		return list
	case Currents:
		list = append(list, &d.Table, &d.Design, &d.Overload, &d.Input)
		if d.LockedRotor.Source == motor.FromCodeLetter { // the ends of a range
			list = append(list, &d.LockedRotor.Low)
		}
		return append(list, &d.LockedRotor.High)
	case OverloadProtection:
		o := &r.Overload
		list = append(list, &o.Limit, &o.StartLimit, &o.Share, &o.Protector, &o.Units)
		for i := range o.Windings {
			list = append(list, &o.Windings[i].Limit, &o.Windings[i].StartLimit)
		}
		return list
	case ShortCircuitDevice:
		x := &r.ShortCircuit
		list = append(list, &x.Limit, &x.Rating, &x.StartLimit, &x.StartRating)
		if x.Device != protection.InstantaneousBreaker { // whose limit it is already
			list = append(list, &x.Instantaneous)
		}
		return append(list, &x.Half, &x.Smallest)
	case DisconnectingMeans:
		x := &r.Disconnect
		return append(list, &x.Amperes, &x.LockedRotor, &x.Sight)
	case ControllerRating:
		x := &r.Controller
		return append(list, &x.Amperes, &x.LockedRotor, &x.GeneralUse, &x.SnapSwitch)
	case BondingConductor:
		return append(list, &r.Bonding.Row)
	case RacewayFill:
		return racewayFigures(racewayFigures(list, &r.Raceway), &r.Flexible)
	case DropSection:
		return dropFigures(list, &r.Drop)
	}
	x := &r.FaultDuty
	return append(list, &x.Source, &x.Contribution, &x.AtMotor, &x.LineToLine, &x.Withstand)
}

// selections returns the conductors of a section: none for a section of other
// things, one for each winding of a multispeed motor.
func (r *Result) selections(s Section) []*conductor.Selection {
	var x *conductor.Selection
	switch s {
	case BranchConductors:
		x = &r.Branch
	case MotorSupplyConductors:
		x = &r.MotorSupply
	case SecondaryConductors:
		x = &r.Secondary
	case ResistorConductors:
		x = &r.Resistor
	case WindingConductors:
		all := make([]*conductor.Selection, len(r.Windings))
		for i := range all {
			all[i] = &r.Windings[i]
		}
		return all
	}
	if x == nil || x.IsZero() {
		return nil
	}
	return []*conductor.Selection{x}
}

func racewayFigures(list []*tables.Figure, x *conductor.Filled) []*tables.Figure {
	return append(list, &x.Area, &x.Limit, &x.Percent)
}

func dropFigures(list []*tables.Figure, x *VoltageDrop) []*tables.Figure {
	return append(list, &x.Limit, &x.Running, &x.Starting, &x.LongestRun)
}

func selectionFigures(list []*tables.Figure, s *conductor.Selection) []*tables.Figure {
	if s.IsZero() {
		return list
	}
	list = append(list, &s.Required, &s.LeastRating, &s.Termination, &s.Ambient, &s.Together)
	if s.Need.Cmp(s.Required) != 0 { // there is something to correct
		list = append(list, &s.Need)
	}
	return append(list, &s.Ampacity, &s.SmallLimit)
}
