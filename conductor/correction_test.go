package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// Ambient bands by conductor temperature: at the top of a band and just above.
// The NEC gives credit below 26 °C, the CEC none; "" is an ambient that the
// insulation does not allow.
func TestAmbientBands(t *testing.T) {
	nec := map[int]string{60: "TW", 75: "THWN", 90: "THWN-2"}
	cec := map[int]string{60: "TW", 75: "RW75", 90: "RW90"}
	for _, tt := range []struct {
		ambient   string
		insulated int
		nec, cec  string
	}{
		{"-60", 75, "1.2", "1"},
		{"0", 60, "1.29", "1"},
		{"10", 60, "1.29", "1"},
		{"10", 75, "1.2", "1"},
		{"10", 90, "1.15", "1"},
		{"10.01", 75, "1.15", "1"},
		{"15", 75, "1.15", "1"},
		{"15.01", 75, "1.11", "1"},
		{"20.01", 75, "1.05", "1"},
		{"25", 75, "1.05", "1"},
		{"25.01", 75, "1", "1"},
		{"", 75, "1", "1"},
		{"30", 75, "1", "1"},
		{"30.000001", 75, "0.94", "0.94"},
		{"35", 60, "0.91", "0.91"},
		{"35", 75, "0.94", "0.94"},
		{"35", 90, "0.96", "0.96"},
		{"35.01", 75, "0.88", "0.88"},
		{"40", 75, "0.88", "0.88"},
		{"40", 90, "0.91", "0.91"},
		{"40.1", 90, "0.87", "0.87"},
		{"45.1", 75, "0.75", "0.75"},
		{"50.5", 60, "0.41", "0.41"},
		{"55", 60, "0.41", "0.41"},
		{"55.01", 60, "", ""},
		{"55.01", 75, "0.58", "0.58"},
		{"65", 75, "0.47", "0.47"},
		{"70", 75, "0.33", "0.33"},
		{"70.01", 75, "", ""},
		{"75", 90, "0.5", "0.5"},
		{"80", 90, "0.41", "0.41"},
		{"80.01", 90, "0.29", ""}, // the CEC prints no row between 80 and 90 °C
		{"85", 90, "0.29", ""},
		{"85.01", 90, "", ""},
		{"150", 90, "", ""},
	} {
		for _, e := range tables.Editions() {
			want, insulation := tt.nec, nec[tt.insulated]
			if e.Code() == tables.CEC {
				want, insulation = tt.cec, cec[tt.insulated]
			}
			s, err := conductor.Wiring{Insulation: insulation, Ambient: celsius(tt.ambient)}.Select(e, load("10"))
			if want == "" {
				var table *tables.NotTabulatedError
				require.ErrorAs(t, err, &table, "%s °C, %s, %v", tt.ambient, insulation, e)
				assert.Equal(t, "wiring.ambient", table.Field)
				assert.True(t, s.IsZero())
				continue
			}
			require.NoError(t, err)
			assert.Equal(t, want, s.Ambient.Text(), "%s °C, %s, %v", tt.ambient, insulation, e)
		}
	}
}

// Conductors together, at each edge of a band: NEC 310.15(C)(1) in percent, CEC
// Table 5C as a factor. The two have different bands.
func TestCountBands(t *testing.T) {
	for _, tt := range []struct {
		n        int
		nec, cec string
	}{
		{0, "100 %", "1"}, // the circuit's own three
		{3, "100 %", "1"},
		{4, "80 %", "0.8"},
		{6, "80 %", "0.8"},
		{7, "70 %", "0.7"},
		{9, "70 %", "0.7"},
		{10, "50 %", "0.7"},
		{20, "50 %", "0.7"},
		{21, "45 %", "0.7"},
		{24, "45 %", "0.7"},
		{25, "45 %", "0.6"},
		{30, "45 %", "0.6"},
		{31, "40 %", "0.6"},
		{40, "40 %", "0.6"},
		{41, "35 %", "0.6"},
		{42, "35 %", "0.6"},
		{43, "35 %", "0.5"},
		{1000, "35 %", "0.5"},
	} {
		for _, e := range tables.Editions() {
			want := tt.nec
			if e.Code() == tables.CEC {
				want = tt.cec
			}
			for _, run := range []tables.Run{tables.InRaceway, tables.InCable} {
				s := chosen(t, conductor.Wiring{Run: run, Conductors: tt.n}, e, load("10"))
				assert.Equal(t, want, s.Together.String(), "%d conductors, %v", tt.n, e)
			}
		}
	}
}

// Without a count of its own the wiring takes the circuit's, six for the leads of
// a wye-delta start; a count below the circuit's own cannot be.
func TestOwnConductors(t *testing.T) {
	for _, e := range tables.Editions() {
		want := "80 %"
		if e.Code() == tables.CEC {
			want = "0.8"
		}
		l := load("10")
		l.Count = 6
		assert.Equal(t, want, chosen(t, conductor.Wiring{}, e, l).Together.String())
		l.Count = 0
		assert.True(t, chosen(t, conductor.Wiring{}, e, l).Together.IsOne())
		l.Count = 6
		for _, run := range []tables.Run{tables.InRaceway, tables.InCable, tables.InFreeAir} {
			_, err := conductor.Wiring{Conductors: 5, Run: run}.Select(e, l)
			assert.Equal(t, "wiring.conductors", tables.FieldOf(err))
		}
		_, err := conductor.Wiring{Conductors: 6}.Select(e, l)
		assert.NoError(t, err)
	}
}
