package tables

import (
	"fmt"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// DropFactor returns the K of CEC Table D3 (2024) in ohms per circuit kilometre
// at 75 °C, by material, size, power factor (absent for direct current) and
// whether the conductors are pulled into raceway or are a cable. Between the
// printed power factors the larger of the two neighbours is taken, and for a
// size that is not printed the next smaller one, whose K is larger. Other
// editions are a [*NotTabulatedError].
func (e Edition) DropFactor(m Material, s Size, cable bool, pf Figure) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	if e != CEC2024 {
		return Figure{}, &NotTabulatedError{Field: "wiring.drop_method", Table: Citation{Edition: e, Ref: "Table D3"}, Row: "factor K", Covers: "CEC-2024, which is the first to print it in this form"}
	}
	t := dropFactors()
	columns := dropColumns(cable, pf)
	if columns == nil {
		return Figure{}, &NotTabulatedError{Field: "motor.nameplate.power_factor", Table: cecTableD3.In(e), Row: "factor K", Col: "power factor " + pf.String(), Covers: "power factors from 0.80 to 1"}
	}
	for at := s; at.IsValid() && !at.IsMetric(); at = at.Smaller() {
		var k exact.Num
		for _, c := range columns {
			if cell := t[dropKey{m, at, c}]; cell.Cmp(k) > 0 {
				k = cell
			}
		}
		if k.IsZero() {
			continue
		}
		return newFigure("factor K", Tabulated, e, &cecTableD3, k, OhmPerKm).WithNote(at.String() + " " + m.String() + ", " + strings.ReplaceAll(strings.Join(columns, " or "), "_", " ")), nil
	}
	return Figure{}, &NotTabulatedError{Field: "wiring.drop_method", Table: cecTableD3.In(e), Row: "factor K of " + s.String() + " " + m.String(), Covers: "14 AWG to 1000 kcmil copper, 12 AWG to 1000 kcmil aluminum"}
}

var cecTableD3 = Rule{Ref: "Table D3", Mark: MarkB}

// dropColumns names the columns that a power factor stands in or between.
func dropColumns(cable bool, pf Figure) []string {
	in := "raceway"
	if cable {
		in = "cable"
	}
	at := func(hundredths int64) int { return pf.value.Cmp(exact.New(hundredths, 2)) }
	switch {
	case pf.IsZero():
		return []string{"dc"}
	case at(100) >= 0:
		return []string{"pf100"}
	case at(90) > 0:
		return []string{"pf100", in + "_pf90"}
	case at(90) == 0:
		return []string{in + "_pf90"}
	case at(80) > 0:
		return []string{in + "_pf90", in + "_pf80"}
	case at(80) == 0:
		return []string{in + "_pf80"}
	}
	return nil
}

type dropKey struct {
	material Material
	size     Size
	column   string
}

var dropFactors = loaded(func() (map[dropKey]exact.Num, error) {
	const path = "cec/conductor_voltage_drop_d3.csv"
	g, err := open(path)
	if err != nil {
		return nil, err
	}
	t := make(map[dropKey]exact.Num)
	for _, row := range g.Rows {
		s, err := ParseSize(row[0])
		if err != nil {
			return nil, err
		}
		for col, head := range g.Header[1:] {
			name, ok := strings.CutSuffix(head, "_ohm_per_km")
			if row[col+1] == "" {
				continue
			}
			m := Copper
			column, cu := strings.CutPrefix(name, "k_cu_")
			if !cu {
				m = Aluminum
				column = strings.TrimPrefix(name, "k_al_")
			}
			n, err := exact.Parse(row[col+1])
			if err != nil || !ok {
				return nil, fmt.Errorf("%s: %v %s: %q", path, s, head, row[col+1])
			}
			t[dropKey{m, s, column}] = n
		}
	}
	return t, nil
})
