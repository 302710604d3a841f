package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// An Impedance is the ac resistance and reactance to neutral of a conductor in a
// three-conductor circuit at 75 °C and 60 Hz, in ohms per 1000 ft. StandIn is
// the size whose entry is taken where the table has none; zero if it has.
type Impedance struct {
	Resistance, Reactance Figure
	StandIn               Size
}

// Impedance returns the entry of NFPA 70 Chapter 9 Table 9 for a size; the CEC
// prints no such table, and its circuits take the same physics. A size that the
// table lacks takes the entry of the next smaller one, which has more.
func (e Edition) Impedance(m Material, s Size, raceway Raceway) (Impedance, error) {
	if err := e.Check(); err != nil {
		return Impedance{}, err
	}
	cells := impedances()
	for at := s; at.IsValid() && !at.IsMetric(); at = at.Smaller() {
		c, ok := cells[at]
		if !ok || m >= materialCount {
			continue
		}
		r, x := c.resistance[m][0], c.reactance[0]
		where := "in PVC"
		if raceway == 0 || raceway.IsMetal() {
			r, x, where = c.resistance[m][1], c.reactance[1], "in steel"
		}
		if r.IsZero() {
			continue
		}
		z := Impedance{
			Resistance: newFigure("ac resistance", Tabulated, e, &table9, r, OhmPerKft).WithNote(at.String() + " " + m.String() + " " + where),
			Reactance:  newFigure("reactance", Tabulated, e, &table9, x, OhmPerKft).WithNote(at.String() + " " + where),
		}
		if at != s {
			z.StandIn = at
		}
		return z, nil
	}
	return Impedance{}, &NotTabulatedError{Field: "wiring.material", Table: table9.In(e), Row: "impedance of " + s.String() + " " + m.String(), Covers: "14 AWG to 1000 kcmil copper, 12 AWG to 1000 kcmil aluminum"}
}

// DCResistance returns the direct-current resistance of a stranded conductor at
// 75 °C in ohms per 1000 ft: NFPA 70 Chapter 9 Table 8, uncoated copper or
// aluminum.
func (e Edition) DCResistance(m Material, s Size) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	var r exact.Num
	if m < materialCount {
		r = dcResistances()[m][s]
	}
	if r.IsZero() {
		return Figure{}, &NotTabulatedError{Field: "wiring.material", Table: necTable8.In(e), Row: "resistance of " + s.String() + " " + m.String(), Covers: "18 AWG to 2000 kcmil"}
	}
	return newFigure("dc resistance", Tabulated, e, &necTable8, r, OhmPerKft).WithNote(s.String() + " " + m.String()), nil
}

var (
	table9    = Rule{Outside: true, Ref: "NFPA 70 Chapter 9 Table 9", Mark: MarkB}
	necTable8 = Rule{Outside: true, Ref: "NFPA 70 Chapter 9 Table 8", Mark: MarkB}
)

type impedanceCell struct {
	reactance  [2]exact.Num                // PVC, steel
	resistance [materialCount][2]exact.Num // PVC, steel
}

var impedances = loaded(func() (map[Size]impedanceCell, error) {
	const path = "nec/conductor_impedance.csv"
	g, err := open(path)
	if err != nil {
		return nil, err
	}
	columns := [...]string{"x_pvc_al_ohm_per_kft", "x_steel_ohm_per_kft", "r_cu_pvc_ohm_per_kft", "r_cu_steel_ohm_per_kft", "r_al_pvc_ohm_per_kft", "r_al_steel_ohm_per_kft"}
	cells := make(map[Size]impedanceCell)
	for _, row := range g.Rows {
		s, err := ParseSize(row[0])
		if err != nil {
			return nil, err
		}
		var n [len(columns)]exact.Num
		for i, name := range columns {
			col, err := g.Col(name)
			if err != nil {
				return nil, err
			}
			if row[col] == "" {
				continue
			}
			if n[i], err = exact.Parse(row[col]); err != nil {
				return nil, fmt.Errorf("%s: %v %s: %w", path, s, name, err)
			}
		}
		cells[s] = impedanceCell{[2]exact.Num{n[0], n[1]}, [materialCount][2]exact.Num{{n[2], n[3]}, {n[4], n[5]}}}
	}
	return cells, nil
})

var dcResistances = loaded(func() (cells [materialCount]map[Size]exact.Num, err error) {
	for m, column := range []string{"dc_cu_uncoated_ohm_per_kft", "dc_al_ohm_per_kft"} {
		if cells[m], err = bySize("nec/conductor_properties.csv", column, stranded); err != nil {
			return cells, err
		}
	}
	return cells, nil
})
