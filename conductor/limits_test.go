package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// Smallest size: 14 AWG copper, 12 AWG aluminum. NEC 310.106(A) to 2017, 310.3(A)
// after; CEC 4-002.
func TestSmallestSize(t *testing.T) {
	for _, e := range tables.Editions() {
		ref := map[tables.Edition]string{tables.NEC2017: "310.106(A)", tables.NEC2020: "310.3(A)", tables.NEC2023: "310.3(A)"}[e]
		if e.Code() == tables.CEC {
			ref = "Rule 4-002"
		}
		for material, want := range map[tables.Material][2]string{conductor.Copper: {"14 AWG", "16 AWG"}, conductor.Aluminum: {"12 AWG", "14 AWG"}} {
			s := chosen(t, conductor.Wiring{Material: material, Termination: 75}, e, load("1"))
			assert.Equal(t, want[0], s.Size.String())
			assert.Equal(t, "20 A", s.Ampacity.String(), "both carry 20 A at 75 °C")
			assert.Equal(t, want[1], s.Smaller.Size.String())
			assert.Contains(t, s.Smaller.Why, "smallest size")
			assert.True(t, s.Smaller.Ampacity.IsZero())
			assert.Equal(t, tables.Citation{Edition: e, Ref: ref}, s.Smaller.Cite)
		}
	}
}

// Every selection says why the next smaller size fails.
func TestNextSmaller(t *testing.T) {
	for _, e := range tables.Editions() {
		s := chosen(t, conductor.Wiring{Termination: 75}, e, load("81.25"))
		assert.Equal(t, "4 AWG", s.Size.String())
		assert.Equal(t, "85 A", s.Ampacity.String())
		assert.Equal(t, "6 AWG", s.Smaller.Size.String())
		assert.Equal(t, "65 A", s.Smaller.Ampacity.String())
		assert.Contains(t, s.Smaller.Why, "less than is asked for")
		assert.Equal(t, "81.25 A", s.Required.String())
		assert.Equal(t, "81.25 A", s.Need.String(), "nothing to correct")
		s = chosen(t, conductor.Wiring{Termination: 75}, e, load("22"))
		assert.Equal(t, "12 AWG 14 AWG 20 A", s.Size.String()+" "+s.Smaller.Size.String()+" "+s.Smaller.Ampacity.String(), "the smallest of all fails by its ampacity")
		_, err := conductor.Wiring{}.Select(e, load("0"))
		assert.Equal(t, "load.ampacity", tables.FieldOf(err))
	}
}

// The small-conductor limit is told with its rule of the edition and not applied:
// the wire carries its own 75 °C ampacity. NEC 240.4(D), (G); CEC 14-104.
func TestSmallConductorsTold(t *testing.T) {
	for _, tt := range []struct {
		material            tables.Material
		amps, size          string
		limit               string
		ref17, ref20, ref23 string
		cec                 bool
	}{
		{conductor.Copper, "20", "14 AWG", "15 A", "240.4(D)(3)", "240.4(D)(3)", "240.4(D)(4)", true},
		{conductor.Copper, "25", "12 AWG", "20 A", "240.4(D)(5)", "240.4(D)(5)", "240.4(D)(6)", true},
		{conductor.Copper, "35", "10 AWG", "30 A", "240.4(D)(7)", "240.4(D)(7)", "240.4(D)(8)", true},
		{conductor.Copper, "50", "8 AWG", "", "", "", "", false},
		{conductor.Aluminum, "20", "12 AWG", "15 A", "240.4(D)(4)", "240.4(D)(4)", "240.4(D)(5)", true},
		{conductor.Aluminum, "30", "10 AWG", "25 A", "240.4(D)(6)", "240.4(D)(6)", "240.4(D)(7)", true},
		{conductor.Aluminum, "40", "8 AWG", "", "", "", "", false},
	} {
		for _, e := range tables.Editions() {
			ref, told := map[tables.Edition]string{tables.NEC2017: tt.ref17, tables.NEC2020: tt.ref20, tables.NEC2023: tt.ref23}[e], "240.4(G)"
			if told = "240.4(G)"; e.Code() == tables.CEC {
				told = "Rule 14-104(1)"
				if tt.cec {
					ref = "Rule 14-104(2)"
				}
			}
			s := chosen(t, conductor.Wiring{Material: tt.material, Termination: 75}, e, load(tt.amps))
			assert.Equal(t, tt.size, s.Size.String())
			assert.Equal(t, tt.amps+" A", s.Ampacity.String())
			assert.Equal(t, tt.limit, s.SmallLimit.String())
			assert.Equal(t, ref, s.SmallLimit.Citation().Ref)
			assert.Equal(t, tt.limit != "", testkit.Cautioned(s.Cautions, told, "small-conductor"), "%v %v", tt.size, e)
		}
	}
}

// The largest size that an insulation is made in, then conductors in parallel;
// Tables 310.4 and 310.16, 310.10(G).
func TestLargestSizeNEC(t *testing.T) {
	for _, tt := range []struct {
		insulation, amps string
		sets             int
		size, ampacity   string
		work             string
	}{
		{"UF", "195", 1, "4/0 AWG", "195 A", "made to 4/0; 60 °C column"},
		{"UF", "195.01", 2, "1/0 AWG", "250 A", "two of 125 A"},
		{"THWN", "545", 1, "1000 kcmil", "545 A", "made to 1000 kcmil; 75 °C column"},
		{"THWN", "545.01", 2, "300 kcmil", "570 A", "two of 285 A"},
		{"RHW", "665", 1, "2000 kcmil", "665 A", "made to 2000 kcmil"},
		{"RHW", "665.01", 2, "400 kcmil", "670 A", "two of 335 A"},
		{"THWN", "1090", 2, "1000 kcmil", "1090 A", "two of 545 A"},
		{"THWN", "1090.01", 3, "500 kcmil", "1140 A", "three of 380 A"},
		{"THWN", "6540", 12, "1000 kcmil", "6540 A", "twelve of 545 A"},
	} {
		for _, e := range necEditions {
			s := chosen(t, conductor.Wiring{Insulation: tt.insulation}, e, load(tt.amps))
			assert.Equal(t, tt.sets, s.Sets, "%s %s A", tt.insulation, tt.amps)
			assert.Equal(t, tt.size, s.Size.String(), tt.work)
			assert.Equal(t, tt.ampacity, s.Ampacity.String(), tt.work)
			if tt.sets > 1 {
				ref := "310.10(G)"
				if e == tables.NEC2017 {
					ref = "310.10(H)"
				}
				assert.True(t, testkit.Cautioned(s.Cautions, ref, "parallel"))
			}
		}
	}
}

// Parallel sets: 1/0 AWG and larger only, each set with its own factor for the
// conductors in its raceway. NEC 310.10(H)/(G), CEC 12-108.
func TestParallelSets(t *testing.T) {
	for _, tt := range []struct {
		name           string
		w              conductor.Wiring
		amps           string
		size, ampacity string
		smaller, why   string
	}{
		{"not below 1/0", conductor.Wiring{Sets: 2, Termination: 75}, "100", "1/0 AWG", "300 A", "1 AWG", "too small to be run in parallel"},
		{"three sets", conductor.Wiring{Sets: 3, Termination: 75}, "1000", "400 kcmil", "1005 A", "350 kcmil", "carries less"},
		{"two sets at 40 °C, six in each raceway", conductor.Wiring{Sets: 2, Termination: 75, Ambient: celsius("40"), Conductors: 6}, "211.2", "1/0 AWG", "211.2 A", "1 AWG", "too small"}, // 2 × 150 × 0.88 × 0.80
		{"one set as asked", conductor.Wiring{Sets: 1, Termination: 75}, "380", "500 kcmil", "380 A", "400 kcmil", "carries less"},
	} {
		for _, e := range tables.Editions() {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := chosen(t, tt.w, e, load(tt.amps))
				assert.Equal(t, tt.w.Sets, s.Sets)
				assert.Equal(t, tt.size, s.Size.String())
				assert.Equal(t, tt.ampacity, s.Ampacity.String())
				assert.Equal(t, tt.smaller, s.Smaller.Size.String())
				assert.Contains(t, s.Smaller.Why, tt.why)
			})
		}
	}
}

// A load that no size carries is refused.
func TestNoSize(t *testing.T) {
	for _, tt := range []struct {
		name     string
		editions []tables.Edition
		w        conductor.Wiring
		amps     string
		text     string
	}{
		{"twelve sets", necEditions, conductor.Wiring{Insulation: "THWN"}, "6540.01", "THWN copper conductor up to 1000 kcmil"}, // 12 × 545
		{"one set", necEditions, conductor.Wiring{Insulation: "THWN", Sets: 1}, "545.01", "1 set"},
		{"two sets", necEditions, conductor.Wiring{Insulation: "UF", Sets: 2, Termination: 60}, "390.01", "up to 4/0 AWG"},
		{"a small type in parallel", necEditions, conductor.Wiring{Insulation: "FEP", Sets: 2}, "10", "up to 2 AWG"}, // made to 2 AWG, parallel from 1/0
		{"one set", cecEditions, conductor.Wiring{Insulation: "RW90", Termination: 75, Sets: 1}, "665.01", "up to 2000 kcmil"},
		{"twelve sets of aluminum", cecEditions, conductor.Wiring{Material: conductor.Aluminum, Insulation: "RW75"}, "6720.01", "aluminum"}, // 12 × 560
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s, err := tt.w.Select(e, load(tt.amps))
				var none *tables.NoSizeError
				require.ErrorAs(t, err, &none)
				assert.Equal(t, "wiring", none.Field)
				assert.Equal(t, tt.amps+" A", none.Need.String())
				assert.Contains(t, none.Constraint, tt.text)
				assert.Equal(t, conductor.Selection{}, s)
			})
		}
	}
}
