package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// ConductorDimensions returns the overall diameter and area of an insulated
// conductor: NEC Chapter 9 Table 5 (inches; RHH, RHW and RHW-2 with their outer
// covering), CEC Tables 6A, 6J and 6K (millimetres, stranded). What the tables
// lack is a [*NotTabulatedError].
func (e Edition) ConductorDimensions(designation string, s Size) (diameter, area Figure, err error) {
	ins, err := e.Insulation(designation)
	if err != nil {
		return Figure{}, Figure{}, err
	}
	t := e.book().dimensions()
	d, ok := t.cells[dimensionKey{ins.Type, s}]
	if !ok {
		return Figure{}, Figure{}, &NotTabulatedError{Field: "wiring.insulation", Table: t.rule.In(e), Row: "dimensions of " + s.String() + " " + ins.Type, Covers: t.covers}
	}
	note := s.String() + " " + ins.Type
	diameter = newFigure("conductor diameter", Tabulated, e, t.rule, d.diameter, t.length).WithNote(note)
	area = newFigure("conductor area", Tabulated, e, t.rule, d.area, t.unit).WithNote(note)
	return diameter, area, nil
}

// BareArea returns the area of a bare stranded conductor by its circumscribed
// circle, in square inches: NEC Chapter 9 Table 8. Under the CEC the figure is
// absent: take the insulated one.
func (e Edition) BareArea(s Size) Figure {
	if !e.IsValid() || e.book().bareAreas == nil {
		return Figure{}
	}
	area, ok := e.book().bareAreas()[s]
	if !ok {
		return Figure{}
	}
	return newFigure("bare conductor area", Tabulated, e, &necTable8, area, SquareInch).WithNote(s.String())
}

type dimensionKey struct {
	insulation string
	size       Size
}

type dimensionTable struct {
	rule         *Rule
	covers       string
	length, unit Unit
	cells        map[dimensionKey]dimensionCell
}

type dimensionCell struct{ diameter, area exact.Num }

// loadDimensions reads rows of insulation, size, diameter and area; keep tells
// which types of the code a row is for.
func loadDimensions(path string, rule *Rule, size, diameter, area string, length, unit Unit, covers string, keep func(row []string) []string) func() *dimensionTable {
	return loaded(func() (*dimensionTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &dimensionTable{rule: rule, covers: covers, length: length, unit: unit, cells: make(map[dimensionKey]dimensionCell)}
		sizeCol, err1 := g.Col(size)
		diameterCol, err2 := g.Col(diameter)
		areaCol, err3 := g.Col(area)
		if err1 != nil || err2 != nil || err3 != nil {
			return nil, fmt.Errorf("%s: a column is missing", path)
		}
		for _, row := range g.Rows {
			types := keep(row)
			if len(types) == 0 || row[sizeCol] == "450" { // a size that the ampacity tables do not have
				continue
			}
			s, err := ParseSize(row[sizeCol])
			if err != nil {
				return nil, fmt.Errorf("%s: %w", path, err)
			}
			var d dimensionCell
			if d.diameter, err = exact.Parse(row[diameterCol]); err != nil {
				return nil, fmt.Errorf("%s: %q: %w", path, row[diameterCol], err)
			}
			if d.area, err = exact.Parse(row[areaCol]); err != nil {
				return nil, fmt.Errorf("%s: %q: %w", path, row[areaCol], err)
			}
			for _, name := range types {
				t.cells[dimensionKey{name, s}] = d
			}
		}
		return t, nil
	})
}

// loadBareAreas reads the overall areas of stranded conductors.
func loadBareAreas(path string) func() map[Size]exact.Num {
	return loaded(func() (map[Size]exact.Num, error) { return bySize(path, "overall_area_in2", stranded) })
}
