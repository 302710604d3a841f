package tables

import (
	"fmt"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/csvgrid"
	"example.org/motorcircuit/internal/exact"
)

// A Material is a conductor's metal. The zero Material is copper.
type Material uint8

// The materials.
const (
	Copper Material = iota
	Aluminum
	materialCount
)

var materialTexts = [...]string{"copper", "aluminum"}

// String returns the stable text form.
func (m Material) String() string { return TextOf(m, materialTexts[:]) }

// MarshalText is [Material.String].
func (m Material) MarshalText() ([]byte, error) { return []byte(m.String()), nil }

// UnmarshalText reads the text form, or "cu", "al" or "aluminium"; no text is copper.
func (m *Material) UnmarshalText(text []byte) error {
	switch strings.ToLower(string(text)) {
	case "cu":
		text = []byte("copper")
	case "al", "aluminium":
		text = []byte("aluminum")
	}
	return ReadText(m, "wiring.material", text, materialTexts[:])
}

// A Run is the way in which conductors are run, which picks the ampacity table.
// The zero Run is in raceway.
type Run uint8

// The ways to run conductors.
const (
	InRaceway Run = iota
	InCable       // multiconductor cable; the ampacity table of raceways
	InFreeAir     // single conductors in free air
	runCount
)

var runTexts = [...]string{"raceway", "cable", "free_air"}

// String returns the stable text form.
func (r Run) String() string { return TextOf(r, runTexts[:]) }

// MarshalText is [Run.String].
func (r Run) MarshalText() ([]byte, error) { return []byte(r.String()), nil }

// UnmarshalText reads the text form; no text is InRaceway.
func (r *Run) UnmarshalText(text []byte) error {
	return ReadText(r, "wiring.run", text, runTexts[:])
}

// An AmpacityTable is one printed table of ampacity, of one material: amperes
// by size and by column of conductor temperature, at an ambient of 30 °C. The
// zero table is empty.
type AmpacityTable struct {
	edition Edition
	*ampacityData
}

type ampacityData struct {
	rule    func(Size, int) *Rule      // by size and column: the marks of cells differ
	columns []int                      // °C, rising
	names   []string                   // of a figure, by column
	cells   [len(awgNames) + 1][]int64 // by Size, then column; nil is no row
	notes   [len(awgNames) + 1][]string
}

// Ampacities returns the table for a way of running conductors and a material.
func (e Edition) Ampacities(run Run, m Material) (AmpacityTable, error) {
	if err := e.Check(); err != nil {
		return AmpacityTable{}, err
	}
	if run >= runCount {
		return AmpacityTable{}, &InputError{Field: "wiring.run", Value: strconv.Itoa(int(run)), Want: "raceway, cable or free_air"}
	}
	if m >= materialCount {
		return AmpacityTable{}, &InputError{Field: "wiring.material", Value: strconv.Itoa(int(m)), Want: "copper or aluminum"}
	}
	b := e.book()
	load := b.raceway[m]
	if run == InFreeAir {
		load = b.freeAir[m]
	}
	return AmpacityTable{e, load()}, nil
}

// Column returns the table's highest column that is not above the temperature,
// in °C; 0 if there is none.
func (t AmpacityTable) Column(celsius int) int {
	best := 0
	if t.ampacityData == nil {
		return best
	}
	for _, c := range t.columns {
		if c <= celsius {
			best = c
		}
	}
	return best
}

// Ampacity returns the printed ampacity of a size in the column of that
// temperature. The figure is absent where the table has no entry.
func (t AmpacityTable) Ampacity(s Size, column int) Figure {
	if t.ampacityData == nil || int(s) >= len(t.cells) || t.cells[s] == nil {
		return Figure{}
	}
	for i, c := range t.columns {
		if c == column && t.cells[s][i] >= 0 {
			f := newFigure(t.names[i], Tabulated, t.edition, t.rule(s, column), exact.New(t.cells[s][i], 2), Ampere)
			f.note = t.notes[s][i]
			return f
		}
	}
	return Figure{}
}

// AtLeast returns the smallest size, of those from least to most, whose ampacity
// in that column is at or above need; 0 if there is none.
func (t AmpacityTable) AtLeast(need Figure, column int, least, most Size) Size {
	if t.ampacityData == nil {
		return 0
	}
	want, col := need.value.HundredthsUp(), -1
	for i, c := range t.columns {
		if c == column {
			col = i
		}
	}
	if col < 0 {
		return 0
	}
	for s := least; s <= most && int(s) < len(t.cells); s++ {
		if cells := t.cells[s]; cells != nil && cells[col] >= want {
			return s
		}
	}
	return 0
}

// Citation returns the table's citation.
func (t AmpacityTable) Citation() Citation {
	if t.ampacityData == nil {
		return Citation{}
	}
	return t.rule(0, 0).In(t.edition)
}

// always is the rule of a table whose cells are all equally sure.
func always(rule *Rule) func(Size, int) *Rule { return func(Size, int) *Rule { return rule } }

func loadAmpacity(path string, m Material, rule func(Size, int) *Rule) func() *ampacityData {
	return loaded(func() (*ampacityData, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		return newAmpacity(g, m, rule)
	})
}

func newAmpacity(g *csvgrid.Grid, m Material, rule func(Size, int) *Rule) (*ampacityData, error) {
	t := &ampacityData{rule: rule}
	prefix := [...]string{"cu_", "al_"}[m]
	var cols []int
	for i, name := range g.Header {
		if c, ok := strings.CutPrefix(name, prefix); ok {
			celsius, err := strconv.Atoi(strings.TrimSuffix(c, "c_a"))
			if err != nil {
				return nil, fmt.Errorf("%s: column %q", g.Path, name)
			}
			t.columns, cols = append(t.columns, celsius), append(cols, i)
			t.names = append(t.names, "ampacity in the "+strconv.Itoa(celsius)+" °C column")
		}
	}
	if len(cols) == 0 {
		return nil, fmt.Errorf("%s: no columns of %v", g.Path, m)
	}
	var above []int64
	for row := range g.Rows {
		size, err := ParseSize(g.Rows[row][0])
		if err != nil {
			return nil, fmt.Errorf("%s: %w", g.Path, err)
		}
		cells, notes := make([]int64, len(cols)), make([]string, len(cols))
		for i, col := range cols {
			if cells[i], err = g.Hundredths(row, col); err != nil {
				return nil, err
			}
			notes[i] = size.String() + " " + m.String()
			if i > 0 && cells[i] >= 0 && cells[i] < cells[i-1] {
				return nil, fmt.Errorf("%s: %v falls with temperature", g.Path, size)
			}
			if above != nil && cells[i] >= 0 && cells[i] <= above[i] {
				return nil, fmt.Errorf("%s: %v is not above the size before it", g.Path, size)
			}
		}
		above = cells
		t.cells[size], t.notes[size] = cells, notes
	}
	return t, nil
}
