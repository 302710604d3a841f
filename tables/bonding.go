package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// BondingSize returns the least size of a wire-type bonding (equipment
// grounding) conductor for a device rating: NEC Table 250.122, CEC Table 16. A
// rating between rows takes the row above. The figure is the row's rating. A
// rating above the last row is a [*NotTabulatedError].
func (e Edition) BondingSize(m Material, rating Figure) (Size, Figure, error) {
	if err := e.Check(); err != nil {
		return 0, Figure{}, err
	}
	if m >= materialCount {
		return 0, Figure{}, &InputError{Field: "wiring.material", Value: fmt.Sprint(uint8(m)), Want: "copper or aluminum"}
	}
	t := e.book().bonding(e)
	for _, r := range t.rows {
		if exact.New(r.rating, 2).Cmp(rating.value) >= 0 {
			f := newFigure("device rating of the table row", Tabulated, e, t.rule(m, r.rating), exact.New(r.rating, 2), Ampere)
			return r.sizes[m], f.WithNote(r.notes[m]), nil
		}
	}
	return 0, Figure{}, &NotTabulatedError{Field: "device", Table: t.rule(m, 0).In(e), Row: "row for " + rating.String(), Covers: "ratings to " + exact.New(t.rows[len(t.rows)-1].rating, 2).String() + " A"}
}

type bondingTable struct {
	rule func(m Material, rating int64) *Rule
	rows []bondingRow
}

type bondingRow struct {
	rating int64 // hundredths of an ampere
	sizes  [materialCount]Size
	notes  [materialCount]string
}

func loadBonding(path string, rule func(Material, int64) *Rule) func() *bondingTable {
	return loaded(func() (*bondingTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &bondingTable{rule: rule}
		var ratings []int64
		for row, cells := range g.Rows {
			h, err := g.Hundredths(row, 0)
			if err != nil {
				return nil, err
			}
			r := bondingRow{rating: h}
			for m := range materialCount {
				cell, outside := cells[1+int(m)], ""
				if cell == "1200" { // printed to 2017, but not a size of the ampacity tables
					cell, outside = "1250", ", the table's 1200 kcmil not being one of the series"
				}
				if r.sizes[m], err = ParseSize(cell); err != nil {
					return nil, fmt.Errorf("%s: %w", path, err)
				}
				r.notes[m] = r.sizes[m].String() + " " + m.String() + outside
				if row > 0 && r.sizes[m] < t.rows[row-1].sizes[m] {
					return nil, fmt.Errorf("%s: size falls at %s A", path, cells[0])
				}
			}
			t.rows, ratings = append(t.rows, r), append(ratings, h)
		}
		return t, rising(path, ratings)
	})
}
