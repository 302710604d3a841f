package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// The factors act on the column of the insulation; the column of the
// termination in Table 310.16 holds uncorrected; the smaller of both is usable.
// 310.14(A), 310.15, 110.14(C).
func TestColumnsNEC(t *testing.T) {
	for _, tt := range []struct {
		name           string
		w              conductor.Wiring
		amps           string
		size, ampacity string
		smaller        string // usable ampacity of the next smaller size
		work           string
	}{
		{"hot, 90 °C wire", conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("40")}, "81.25",
			"4 AWG", "85 A", "65 A", "4 AWG: 95 × 0.91 = 86.45, 75 °C column 85; 6 AWG: 75 × 0.91 = 68.25, 65"},
		{"hot, 75 °C wire", conductor.Wiring{Insulation: "THWN", Termination: 75, Ambient: celsius("40")}, "81.25",
			"3 AWG", "88 A", "74.8 A", "3 AWG: 100 × 0.88; 4 AWG: 85 × 0.88"},
		{"hot and full", conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("40"), Conductors: 6}, "81.25",
			"3 AWG", "83.72 A", "69.16 A", "3 AWG: 115 × 0.91 × 0.80; 4 AWG: 95 × 0.91 × 0.80"},
		{"cold gives no more than the terminals", conductor.Wiring{Insulation: "THWN", Termination: 75, Ambient: celsius("10")}, "100",
			"3 AWG", "100 A", "85 A", "3 AWG: 100 × 1.20 = 120, terminals 100; 4 AWG: 85 × 1.20 = 102, terminals 85"},
		{"cold offsets a full raceway", conductor.Wiring{Insulation: "THWN", Termination: 75, Ambient: celsius("10"), Conductors: 4}, "81.6",
			"4 AWG", "81.6 A", "62.4 A", "4 AWG: 85 × 1.20 × 0.80; 6 AWG: 65 × 1.20 × 0.80"},
		{"exactly enough", conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("40")}, "85",
			"4 AWG", "85 A", "65 A", ""},
		{"a hundredth more", conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("40")}, "85.01",
			"3 AWG", "100 A", "85 A", "3 AWG: 115 × 0.91 = 104.65, terminals 100"},
		{"aluminum", conductor.Wiring{Material: conductor.Aluminum, Insulation: "XHHW-2", Termination: 75, Ambient: celsius("40")}, "81.25",
			"2 AWG", "90 A", "75 A", "2 AWG: 100 × 0.91 = 91, terminals 90; 3 AWG: 85 × 0.91 = 77.35, terminals 75"},
		{"free air, kept apart", conductor.Wiring{Insulation: "THHN", Termination: 75, Run: tables.InFreeAir}, "200",
			"3/0 AWG", "200 A", "175 A", "Table 310.17: 350; terminals by Table 310.16: 200; 2/0: 300, 175"},
		{"free air, bundled by ten at 50 °C", conductor.Wiring{Insulation: "THHN", Termination: 75, Run: tables.InFreeAir, Ambient: celsius("50"), Conductors: 10}, "100",
			"1/0 AWG", "106.6 A", "90.2 A", "1/0: 260 × 0.82 × 0.50; 1 AWG: 220 × 0.82 × 0.50"},
		{"free air, three bundled", conductor.Wiring{Insulation: "TW", Termination: 60, Run: tables.InFreeAir, Conductors: 3}, "55",
			"6 AWG", "55 A", "40 A", "Table 310.17: 80, 100 percent; terminals 55; 8 AWG: 60, 40"},
	} {
		for _, e := range necEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := chosen(t, tt.w, e, load(tt.amps))
				assert.Equal(t, tt.size, s.Size.String(), tt.work)
				assert.Equal(t, tt.ampacity, s.Ampacity.String(), tt.work)
				assert.Equal(t, tt.smaller, s.Smaller.Ampacity.String(), tt.work)
				assert.Equal(t, s.Size.Smaller(), s.Smaller.Size)
			})
		}
	}
}

// The ampacity of one conductor that the corrections ask the table for.
func TestNeedNEC(t *testing.T) {
	w := conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("40"), Conductors: 6}
	s := chosen(t, w, tables.NEC2023, load("81.25"))
	assert.Equal(t, "111.61 A", s.Need.String(), "81.25 ÷ 0.91 ÷ 0.80, rounded up")
	w.Sets = 2
	s = chosen(t, w, tables.NEC2023, load("300"))
	assert.Equal(t, "206.05 A", s.Need.String(), "300 ÷ 0.91 ÷ 0.80 ÷ 2 = 206.04…")
	assert.Equal(t, "3/0 AWG", s.Size.String(), "225 A at 90 °C; 2/0 has 195 A")
	assert.Equal(t, "327.6 A", s.Ampacity.String(), "225 × 0.91 × 0.80 × 2, terminals 400")
}

// Rooftop: 33 °C added to the ambient; XHHW-2 is exempt.
func TestRooftopNEC(t *testing.T) {
	for _, tt := range []struct {
		insulation, ambient string
		factor              string
		amps, size          string
		why                 string
	}{
		{"THWN-2", "38", "0.5", "50", "3 AWG", "71 °C; 115 × 0.50 = 57.5, 4 AWG 47.5"},
		{"XHHW-2", "38", "0.91", "50", "8 AWG", "55 × 0.91 = 50.05, terminals 50"},
		{"xhhw-2", "38", "0.91", "50", "8 AWG", "spelling does not matter"},
		{"THWN-2", "", "0.65", "50", "4 AWG", "30 + 33 = 63 °C; 95 × 0.65 = 61.75, 6 AWG 48.75"},
		{"THWN-2", "-5.5", "1", "50", "8 AWG", "27.5 °C, row 26 to 30; 55, terminals 50"},
		{"THWN", "37", "0.33", "33", "3 AWG", "70 °C, last row of 75 °C wire; 100 × 0.33, 4 AWG 28.05"},
	} {
		for _, e := range necEditions {
			t.Run(tt.insulation+" "+tt.ambient+" "+e.String(), func(t *testing.T) {
				s := chosen(t, conductor.Wiring{Insulation: tt.insulation, Termination: 75, Ambient: celsius(tt.ambient), Rooftop: true}, e, load(tt.amps))
				assert.Equal(t, tt.factor, s.Ambient.Text(), tt.why)
				assert.Equal(t, tt.size, s.Size.String(), tt.why)
				ref := "310.15(B)(2)"
				if e == tables.NEC2017 {
					ref = "310.15(B)(3)(c)"
				}
				assert.Equal(t, tt.factor != "0.91", testkit.Cautioned(s.Cautions, ref, "33 °C added"))
			})
		}
	}
	_, err := conductor.Wiring{Insulation: "THWN", Ambient: celsius("37.01"), Rooftop: true}.Select(tables.NEC2023, load("10"))
	var table *tables.NotTabulatedError
	require.ErrorAs(t, err, &table, "70.01 °C: blank for 75 °C wire")
	assert.Equal(t, "wiring.ambient", table.Field)
}

// Each figure cites the number that its edition gives the table.
func TestCitationsNEC(t *testing.T) {
	for _, tt := range []struct {
		e                                                              tables.Edition
		ampacity, freeAir, ambient, together, correct, least, parallel string
	}{
		{tables.NEC2017, "Table 310.15(B)(16)", "Table 310.15(B)(17)", "Table 310.15(B)(2)(a)", "Table 310.15(B)(3)(a)", "310.15(B)", "310.106(A)", "310.10(H)"},
		{tables.NEC2020, "Table 310.16", "Table 310.17", "Table 310.15(B)(1)", "Table 310.15(C)(1)", "310.15", "310.3(A)", "310.10(G)"},
		{tables.NEC2023, "Table 310.16", "Table 310.17", "Table 310.15(B)(1)(1)", "Table 310.15(C)(1)", "310.15", "310.3(A)", "310.10(G)"},
	} {
		t.Run(tt.e.String(), func(t *testing.T) {
			w := conductor.Wiring{Insulation: "THHN", Termination: 75, Ambient: celsius("45"), Conductors: 9}
			s := chosen(t, w, tt.e, load("60"))
			assert.Equal(t, tt.ambient, s.Ambient.Citation().Ref)
			assert.Equal(t, tt.together, s.Together.Citation().Ref)
			assert.Equal(t, tt.correct, s.Need.Citation().Ref)
			assert.True(t, testkit.Rests(s.Ampacity, tt.ampacity))
			assert.True(t, testkit.Rests(s.Ampacity, "110.14(C)"))
			w.Run, w.Conductors = tables.InFreeAir, 0
			assert.True(t, testkit.Rests(chosen(t, w, tt.e, load("60")).Ampacity, tt.freeAir))
			assert.Equal(t, tt.least, chosen(t, conductor.Wiring{}, tt.e, load("1")).Smaller.Cite.Ref)
			assert.Equal(t, tt.parallel, chosen(t, conductor.Wiring{Sets: 2}, tt.e, load("1")).Smaller.Cite.Ref)
		})
	}
}
