package tables

import (
	"fmt"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// AmbientFactor returns the factor by which an ampacity of the given conductor
// temperature is corrected for ambient air, from the edition's table for a base
// of 30 °C. Between rows the hotter row holds. Under the CEC an ambient of 30 °C
// or less takes 1.00: there is no credit for cold. An ambient that the table
// does not allow for that conductor is a [*NotTabulatedError].
func (e Edition) AmbientFactor(celsius int, ambient Temperature) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	t := e.book().ambient()
	if ambient.IsZero() {
		return Figure{}, &InputError{Field: "wiring.ambient", Want: "the temperature of the air around the conductors", Cite: t.rule.In(e)}
	}
	col := -1
	for i, c := range t.columns {
		if c <= celsius {
			col = i
		}
	}
	if col < 0 {
		return Figure{}, &NotTabulatedError{Field: "wiring.insulation", Table: t.rule.In(e), Row: strconv.Itoa(celsius) + " °C conductor", Covers: "60 °C conductors and hotter"}
	}
	if t.noCredit && ambient.n.Cmp(exact.Int(30)) <= 0 {
		f := newFigure("ambient factor", Tabulated, e, t.rule, exact.Int(1), Plain)
		return f.WithNote("no credit at or below 30 °C"), nil
	}
	for i, top := range t.tops {
		if ambient.n.Cmp(exact.Int(top)) > 0 {
			continue
		}
		if t.cells[i][col] < 0 {
			break
		}
		return newFigure("ambient factor", Tabulated, e, t.rule, exact.New(t.cells[i][col], 2), Plain).WithNote(t.notes[i][col]), nil
	}
	last := int64(0)
	for i, top := range t.tops {
		if t.cells[i][col] >= 0 {
			last = top
		}
	}
	return Figure{}, &NotTabulatedError{Field: "wiring.ambient", Table: t.rule.In(e), Row: "factor for a " + strconv.Itoa(t.columns[col]) + " °C conductor", Col: ambient.String(), Covers: fmt.Sprintf("ambients up to %d °C for it", last)}
}

type ambientTable struct {
	rule     *Rule
	noCredit bool
	columns  []int   // conductor temperature, °C
	tops     []int64 // hottest ambient of each row, °C
	cells    [][]int64
	notes    [][]string
}

func loadAmbient(path, topColumn string, noCredit bool, rule *Rule) func() *ambientTable {
	return loaded(func() (*ambientTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		top, err := g.Col(topColumn)
		if err != nil {
			return nil, err
		}
		t := &ambientTable{rule: rule, noCredit: noCredit}
		var cols []int
		for i, name := range g.Header {
			if c, ok := strings.CutPrefix(name, "factor_"); ok {
				celsius, err := strconv.Atoi(strings.TrimSuffix(c, "c"))
				if err != nil {
					return nil, fmt.Errorf("%s: column %q", path, name)
				}
				t.columns, cols = append(t.columns, celsius), append(cols, i)
			}
		}
		for row := range g.Rows {
			hottest, err := g.Int(row, top, 0)
			if err != nil {
				return nil, err
			}
			cells, notes := make([]int64, len(cols)), make([]string, len(cols))
			for i, col := range cols {
				if cells[i], err = g.Hundredths(row, col); err != nil {
					return nil, err
				}
				if row > 0 && cells[i] > t.cells[row-1][i] {
					return nil, fmt.Errorf("%s: factor rises with ambient at %d °C", path, hottest)
				}
				notes[i] = fmt.Sprintf("ambient up to %d °C, %d °C conductor", hottest, t.columns[i])
			}
			t.tops, t.cells, t.notes = append(t.tops, int64(hottest)), append(t.cells, cells), append(t.notes, notes)
		}
		return t, rising(path, t.tops)
	})
}

// CountFactor returns the factor for n current-carrying conductors in one
// raceway or cable, or bundled: NEC 310.15(C)(1), CEC Table 5C. An n below 1 is
// an [*InputError].
func (e Edition) CountFactor(n int) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	return e.book().count().factor("factor for conductors together", e, n)
}

// SpacingFactor returns the factor of CEC Table 5B for 2 to 4 single conductors
// in free air, closer than a quarter of the largest diameter. The NEC has no
// such table: its factor for bundled conductors is [Edition.CountFactor].
func (e Edition) SpacingFactor(n int) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	if e.book().spacing == nil {
		return Figure{}, &NotTabulatedError{Field: "wiring.run", Table: Citation{Edition: e, Ref: "Article 310"}, Row: "factor by spacing in free air", Covers: "conductors bundled or spaced"}
	}
	return e.book().spacing().factor("factor for single conductors close together", e, n)
}

type countTable struct {
	rule  *Rule
	bands []countBand
}

type countBand struct {
	from, to int // to 0 is no end
	factor   exact.Num
	unit     Unit
	note     string
}

func (t *countTable) factor(name string, e Edition, n int) (Figure, error) {
	for _, b := range t.bands {
		if b.from <= n && (n <= b.to || b.to == 0) {
			return newFigure(name, Tabulated, e, t.rule, b.factor, b.unit).WithNote(b.note), nil
		}
	}
	want := fmt.Sprintf("a count from %d conductors", t.bands[0].from)
	if last := t.bands[len(t.bands)-1].to; last > 0 {
		want = fmt.Sprintf("%d to %d conductors", t.bands[0].from, last)
	}
	return Figure{}, &InputError{"wiring.conductors", strconv.Itoa(n), want, t.rule.In(e)}
}

// loadCounts reads bands of from, to and factor; or points of count and factor.
func loadCounts(path string, rule *Rule, unit Unit) func() *countTable {
	return loaded(func() (*countTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &countTable{rule: rule}
		for row, cells := range g.Rows {
			var b countBand
			if b.from, err = g.Int(row, 0, 0); err != nil {
				return nil, err
			}
			b.to = b.from
			b.note = cells[0] + " conductors"
			if len(cells) == 3 {
				if b.to, err = g.Int(row, 1, 0); err != nil {
					return nil, err
				}
				if b.note = cells[0] + " to " + cells[1] + " conductors"; b.to == 0 {
					b.note = cells[0] + " conductors and more"
				}
			}
			h, err := g.Hundredths(row, len(cells)-1)
			if err != nil {
				return nil, err
			}
			b.factor, b.unit = exact.New(h, 2), unit
			if row > 0 && (b.from != t.bands[row-1].to+1 || b.factor.Cmp(t.bands[row-1].factor) >= 0) {
				return nil, fmt.Errorf("%s: row %q is out of order", path, cells[0])
			}
			t.bands = append(t.bands, b)
		}
		return t, nil
	})
}
