package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A SharedResult is several branch circuits in one raceway.
type SharedResult struct {
	Circuits []Result          `json:"circuits"` // each sized for the conductors of all, in the order given
	Count    int               `json:"count"`    // current-carrying conductors in the raceway
	Bonding  conductor.Bonding `json:"bonding"`  // one bonding conductor for all, by the largest device
	Raceway  conductor.Filled  `json:"raceway"`  // the raceway of all
	Cautions []tables.Caution  `json:"cautions"` // assumptions, readings, limits; never empty
}

var (
	necShared = tables.Rule{Ref: "250.122(C)", Mark: tables.MarkB}
	cecShared = tables.Rule{Ref: "Rule 10-616", Mark: tables.MarkB, Note: "by the largest device"}
)

// SizeShared sizes several branch circuits that are pulled into one raceway of a
// type: every circuit is corrected for the current-carrying conductors of all,
// one set of conductors each, and one bonding conductor serves them by the
// largest device. The count does not depend on the sizes, so that the first
// round is the fixed point. Faults of the circuits are in a [*CircuitError] each.
func SizeShared(raceway tables.Raceway, circuits []Circuit) (SharedResult, error) {
	var faults []error
	if len(circuits) < 2 {
		return SharedResult{}, &tables.InputError{Field: "circuits", Value: itoa(len(circuits)), Want: "two circuits at the least"}
	}
	e := circuits[0].Edition
	var s SharedResult
	for _, c := range circuits {
		s.Count += c.Motor.LineConductors()
	}
	var pulls []conductor.Pull
	var largest *Result
	for i, c := range circuits {
		if c.Edition != e {
			faults = append(faults, &CircuitError{i, c.Tag, &tables.InputError{Field: "edition", Value: c.Edition.String(), Want: e.String() + ", as the first circuit"}})
			continue
		}
		c.Wiring.Raceway, c.Wiring.Sets = raceway, 1
		c.Wiring.Conductors = max(c.Wiring.Conductors, s.Count)
		r, err := Size(c)
		if err != nil {
			faults = append(faults, &CircuitError{i, c.Tag, err})
			continue
		}
		s.Circuits = append(s.Circuits, r)
		pulls = append(pulls, conductor.Pull{Insulation: r.Branch.Insulation, Size: r.Branch.Size, Count: c.Motor.LineConductors()})
	}
	if err := errors.Join(faults...); err != nil {
		return SharedResult{}, err
	}
	for i := range s.Circuits {
		if r := &s.Circuits[i]; largest == nil || r.Bonding.Size.Cmp(largest.Bonding.Size) > 0 {
			largest = r
		}
	}
	s.Bonding = largest.Bonding
	pulls = append(pulls, conductor.Pull{Insulation: largest.Branch.Insulation, Size: s.Bonding.Size, Count: 1})
	var err error
	if s.Raceway, err = conductor.SelectRaceway(e, raceway, false, pulls...); err != nil {
		return SharedResult{}, err
	}
	rule := &necShared
	if e.Code() == tables.CEC {
		rule = &cecShared
	}
	var list cautionList
	list.add(tables.Caution{Text: "one bonding conductor serves all circuits of the raceway, sized by the largest device", Cite: rule.In(e)})
	list.add(s.Raceway.Cautions...)
	list.finish(e)
	s.Cautions = list
	return s, nil
}
