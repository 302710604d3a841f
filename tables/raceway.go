package tables

import (
	"fmt"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// A Raceway is a type of raceway. The zero Raceway is "not given".
type Raceway uint8

// The types of raceway. Not every code has every type.
const (
	EMT   Raceway = iota + 1 // electrical metallic tubing
	ENT                      // electrical nonmetallic tubing
	FMC                      // flexible metal conduit
	IMC                      // intermediate metal conduit (NEC)
	LFMC                     // liquidtight flexible metal conduit
	LFNCA                    // liquidtight flexible nonmetallic conduit, type A (NEC)
	LFNCB                    // liquidtight flexible nonmetallic conduit, type B; under the CEC its one type
	PVC40                    // rigid PVC conduit, schedule 40; under the CEC rigid PVC conduit
	PVC80                    // rigid PVC conduit, schedule 80 (NEC)
	PVCA                     // rigid PVC conduit, type A (NEC)
	PVCEB                    // rigid PVC conduit, type EB; under the CEC types EB1 and DB2/ES2
	RMC                      // rigid metal conduit
	racewayCount
)

var racewayTexts = [...]string{"", "emt", "ent", "fmc", "imc", "lfmc", "lfnc_a", "lfnc_b", "pvc_40", "pvc_80", "pvc_a", "pvc_eb", "rmc"}

var racewayCEC = map[string]Raceway{
	"electrical_metallic_tubing": EMT, "electrical_nonmetallic_tubing": ENT, "flexible_metal_conduit": FMC,
	"liquid_tight_flexible_metal_conduit": LFMC, "liquid_tight_flexible_nonmetallic_conduit": LFNCB,
	"rigid_metal_conduit": RMC, "rigid_pvc_conduit": PVC40, "rigid_pvc_eb1_db2_es2": PVCEB,
}

// String returns the stable text form, "" for the zero Raceway.
func (r Raceway) String() string { return TextOf(r, racewayTexts[:]) }

// Name returns the type as the trade writes it, such as "EMT" or "PVC-40".
func (r Raceway) Name() string { return strings.ToUpper(strings.ReplaceAll(r.String(), "_", "-")) }

// MarshalText is [Raceway.String].
func (r Raceway) MarshalText() ([]byte, error) { return []byte(r.String()), nil }

// UnmarshalText reads the text form or the trade's; no text is "not given".
func (r *Raceway) UnmarshalText(text []byte) error {
	return ReadText(r, "wiring.raceway", text, racewayTexts[:])
}

// IsValid reports whether r is a type of raceway.
func (r Raceway) IsValid() bool { return r > 0 && r < racewayCount }

// IsMetal reports a raceway of metal, which for impedance counts as steel.
func (r Raceway) IsMetal() bool {
	switch r {
	case EMT, FMC, IMC, LFMC, RMC:
		return true
	}
	return false
}

// IsFlexible reports a flexible raceway, which as such does not bond.
func (r Raceway) IsFlexible() bool {
	switch r {
	case FMC, LFMC, LFNCA, LFNCB:
		return true
	}
	return false
}

// A RacewaySize is one trade size of a type of raceway.
type RacewaySize struct {
	Raceway  Raceway
	Trade    string // trade size in inches as the trade writes it: "3/4", "1-1/4"
	Metric   int    // metric designator
	Diameter Figure // inside diameter: inches (NEC) or millimetres (CEC)
	Area     Figure // inside area: square inches (NEC) or square millimetres (CEC)
	limits   [4]exact.Num
	rule     *Rule
	edition  Edition
}

// The fills that the tables print an area for: by number of conductors, and of
// a nipple.
const (
	fillOne = iota
	fillTwo
	fillMore
	fillNipple
)

// Limit returns the greatest area that so many conductors may take up: 53
// percent for one, 31 for two, 40 for more; 60 in a nipple of 600 mm (24 in) at
// the most (NEC). It is absent where the code has no such limit.
func (s RacewaySize) Limit(conductors int, nipple bool) Figure {
	at, note := fillMore, "three conductors and more, 40 %"
	switch {
	case nipple:
		at, note = fillNipple, "nipple, 60 %"
	case conductors == 1:
		at, note = fillOne, "one conductor, 53 %"
	case conductors == 2:
		at, note = fillTwo, "two conductors, 31 %"
	}
	if s.limits[at].IsZero() {
		return Figure{}
	}
	return newFigure("area that may be filled", Tabulated, s.edition, s.rule, s.limits[at], s.Area.unit).WithNote(note)
}

// RacewaySizes returns the trade sizes of a type of raceway, smallest first:
// NEC Chapter 9 Table 4, CEC Tables 9A to 9H. A type that the edition's tables
// lack is a [*NotTabulatedError].
func (e Edition) RacewaySizes(r Raceway) ([]RacewaySize, error) {
	if err := e.Check(); err != nil {
		return nil, err
	}
	t := e.book().raceways()
	var sizes []RacewaySize
	if r.IsValid() {
		sizes = t.sizes[r]
	}
	if len(sizes) == 0 {
		return nil, &NotTabulatedError{Field: "wiring.raceway", Table: t.rule[0].In(e), Row: "raceway " + strconv.Quote(r.Name()), Covers: strings.Join(t.names, ", ")}
	}
	all := make([]RacewaySize, len(sizes))
	for i, s := range sizes {
		s.edition, s.Diameter.edition, s.Area.edition = e, e, e
		all[i] = s
	}
	return all, nil
}

type racewayTable struct {
	rule  []*Rule
	names []string
	sizes [racewayCount][]RacewaySize
}

// A racewayShape tells how a code's file is laid out.
type racewayShape struct {
	trade, metric, diameter, area string // columns
	limits                        [4]string
	unit                          Unit
	length                        Unit
	kind                          func(string) (Raceway, bool)
	rule                          func(Raceway) *Rule
}

func loadRaceways(path string, shape racewayShape) func() *racewayTable {
	return loaded(func() (*racewayTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &racewayTable{rule: []*Rule{shape.rule(EMT)}}
		number := func(row int, column string) (exact.Num, error) {
			if column == "" {
				return exact.Num{}, nil
			}
			col, err := g.Col(column)
			if err != nil {
				return exact.Num{}, err
			}
			n, err := exact.Parse(g.Rows[row][col])
			if err != nil {
				return n, fmt.Errorf("%s: row %d, %s: %w", path, row+2, column, err)
			}
			return n, nil
		}
		for row, cells := range g.Rows {
			kind, ok := shape.kind(cells[0])
			if !ok {
				return nil, fmt.Errorf("%s: unknown raceway %q", path, cells[0])
			}
			s := RacewaySize{Raceway: kind, rule: shape.rule(kind)}
			var diameter, area, metric, trade exact.Num
			for _, c := range []struct {
				column string
				into   *exact.Num
			}{{shape.diameter, &diameter}, {shape.area, &area}, {shape.metric, &metric}, {shape.trade, &trade},
				{shape.limits[0], &s.limits[0]}, {shape.limits[1], &s.limits[1]}, {shape.limits[2], &s.limits[2]}, {shape.limits[3], &s.limits[3]}} {
				if *c.into, err = number(row, c.column); err != nil {
					return nil, err
				}
			}
			s.Metric = int(metric.Decimal().IntPart())
			s.Trade = tradeSize(trade)
			s.Diameter = newFigure("inside diameter", Tabulated, 0, s.rule, diameter, shape.length).WithNote(kind.Name() + " " + s.Trade)
			s.Area = newFigure("inside area", Tabulated, 0, s.rule, area, shape.unit).WithNote(kind.Name() + " " + s.Trade)
			before := t.sizes[kind]
			if len(before) == 0 {
				t.names = append(t.names, kind.Name())
			} else if s.Area.Cmp(before[len(before)-1].Area) <= 0 {
				return nil, fmt.Errorf("%s: %s is not above the size before it", path, s.Area.note)
			}
			t.sizes[kind] = append(before, s)
		}
		return t, nil
	})
}

// tradeSize writes inches as the trade does: 1.25 is 1-1/4.
func tradeSize(inches exact.Num) string {
	p, err := ParseHP(inches.String())
	if err != nil {
		return inches.String()
	}
	return p.Text()
}
