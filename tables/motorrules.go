package tables

import (
	"fmt"
	"strconv"

	"example.org/motorcircuit/internal/exact"
)

// OverloadUnits returns how many overload units other than fuses a motor needs
// and in which conductors: NEC Table 430.37, CEC Table 25. Phases is 0 for
// direct current, else 1, 2 or 3; the supply is taken as one with a grounded
// conductor, whose answer holds for the others too.
func (e Edition) OverloadUnits(phases int) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	t := e.book().overloadUnits()
	u, ok := t.byPhases[phases]
	if !ok {
		return Figure{}, &NotTabulatedError{Field: "motor.phases", Table: t.rule(3).In(e), Row: strconv.Itoa(phases) + "-phase motor", Covers: "dc, one-, two- and three-phase motors"}
	}
	return newFigure("number of overload units", Tabulated, e, t.rule(phases), exact.Int(u.count), Plain).WithNote(u.location), nil
}

type unitsTable struct {
	rule     func(phases int) *Rule
	byPhases map[int]struct {
		count    int64
		location string
	}
}

// loadUnits reads the rows of the given supply systems, by phases.
func loadUnits(path string, rule func(phases int) *Rule, supplies map[int]string) func() *unitsTable {
	return loaded(func() (*unitsTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		n := len(g.Header)
		t := &unitsTable{rule: rule, byPhases: make(map[int]struct {
			count    int64
			location string
		})}
		for phases, supply := range supplies {
			for row, cells := range g.Rows {
				if cells[n-3] != supply {
					continue
				}
				count, err := g.Int(row, n-2, 0)
				if err != nil {
					return nil, err
				}
				t.byPhases[phases] = struct {
					count    int64
					location string
				}{int64(count), cells[n-1]}
			}
			if _, ok := t.byPhases[phases]; !ok {
				return nil, fmt.Errorf("%s: no row %q", path, supply)
			}
		}
		return t, nil
	})
}

// SupplyInsulation returns the least insulation temperature of the conductors
// that enter a motor's terminal box, at an ambient of 30 °C: CEC Table 37, by
// the motor's insulation class (A, B, F or H) and whether it is totally enclosed
// and non-ventilated. The NEC has no such table: a [*NotTabulatedError].
func (e Edition) SupplyInsulation(class string, nonVentilated bool) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	if e.book().supplyInsulation == nil {
		return Figure{}, &NotTabulatedError{Field: "motor.nameplate.insulation_class", Table: Citation{Edition: e, Ref: "Article 430"}, Row: "table of supply conductor insulation", Covers: "no such case"}
	}
	t := e.book().supplyInsulation()
	row, note := t.ventilated, "class "+class+" motor, other than totally enclosed non-ventilated"
	if nonVentilated {
		row, note = t.nonVentilated, "class "+class+" motor, totally enclosed non-ventilated"
	}
	celsius, ok := row[class]
	if !ok {
		return Figure{}, &InputError{"motor.nameplate.insulation_class", clip(class), "A, B, F or H", t.rule.In(e)}
	}
	return newFigure("motor supply conductor insulation", Tabulated, e, t.rule, exact.Int(celsius), Celsius).WithNote(note), nil
}

type supplyInsulationTable struct {
	rule                      *Rule
	ventilated, nonVentilated map[string]int64
}

func loadSupplyInsulation(path string, rule *Rule) func() *supplyInsulationTable {
	return loaded(func() (*supplyInsulationTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &supplyInsulationTable{rule, make(map[string]int64), make(map[string]int64)}
		for row, cells := range g.Rows {
			into := t.ventilated
			if cells[0] == "totally_enclosed_non_ventilated" {
				into = t.nonVentilated
			}
			for i, class := range []string{"A", "B", "F", "H"} {
				celsius, err := g.Int(row, i+1, 0)
				if err != nil {
					return nil, err
				}
				into[class] = int64(celsius)
			}
		}
		return t, nil
	})
}
