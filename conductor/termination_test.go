package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// Which column the terminals allow: NEC 110.14(C)(1), CEC 4-006. Copper in
// raceway at 30 °C; Table 310.16 and Table 2 print the same: 1 AWG 110/130/145,
// 2 AWG 95/115/130, 3 AWG 85/100/115, 4 AWG 70/85/95, 6 AWG 55/65/75 A.
func TestTerminationTemperature(t *testing.T) {
	for _, tt := range []struct {
		name           string
		editions       []tables.Edition
		insulation     string
		marked         int
		motor          bool // ends at a motor of Design B, C or D
		amps           string
		celsius        string
		ref            string
		size, ampacity string
		why            string
	}{
		{"not marked, 100 A", necEditions, "THHN", 0, false, "100", "60 °C", "110.14(C)(1)(a)", "1 AWG", "110 A", "2 AWG has 95 A at 60 °C"},
		{"not marked, 100.01 A", necEditions, "THHN", 0, false, "100.01", "75 °C", "110.14(C)(1)(b)", "2 AWG", "115 A", "3 AWG has 100 A at 75 °C"},
		{"not marked, 60 °C wire above 100 A", necEditions, "TW", 0, false, "100.01", "75 °C", "110.14(C)(1)(b)", "1 AWG", "110 A", "the insulation is the weaker"},
		{"marked 60", necEditions, "THHN", 60, false, "100", "60 °C", "110.14(C)(1)", "1 AWG", "110 A", ""},
		{"marked 60, above 100 A", necEditions, "THHN", 60, false, "110", "60 °C", "110.14(C)(1)", "1 AWG", "110 A", "a marking holds at any rating"},
		{"marked 75", necEditions, "THHN", 75, false, "100", "75 °C", "110.14(C)(1)", "3 AWG", "100 A", ""},
		{"marked 75, 60 °C wire", necEditions, "TW", 75, false, "100", "75 °C", "110.14(C)(1)", "1 AWG", "110 A", ""},
		{"marked 90", necEditions, "THHN", 90, false, "95", "90 °C", "110.14(C)(1)", "4 AWG", "95 A", ""},
		{"marked 90, 75 °C wire", necEditions, "THWN", 90, false, "95", "90 °C", "110.14(C)(1)", "3 AWG", "100 A", ""},
		{"Design B to D, 100 A", necEditions, "THHN", 0, true, "100", "75 °C", "110.14(C)(1)(a)(4)", "3 AWG", "100 A", ""},
		{"Design B to D, 75 °C wire", necEditions, "THWN", 0, true, "85", "75 °C", "110.14(C)(1)(a)(4)", "4 AWG", "85 A", ""},
		{"Design B to D, 60 °C wire", necEditions, "TW", 0, true, "85", "60 °C", "110.14(C)(1)(a)", "3 AWG", "85 A", "(4) asks for 75 °C conductors"},
		{"Design B to D, above 100 A", necEditions, "THHN", 0, true, "100.01", "75 °C", "110.14(C)(1)(b)", "2 AWG", "115 A", "(4) is for 100 A and less"},
		{"Design B to D, marked 60", necEditions, "THHN", 60, true, "85", "60 °C", "110.14(C)(1)", "3 AWG", "85 A", "the terminals' marking wins"},
		{"not marked, 100 A", cecEditions, "RW90", 0, false, "100", "60 °C", "Rule 4-006(2)", "1 AWG", "110 A", "exam guide: 30 hp, 240 V, branch conductor"},
		{"not marked, 100.01 A", cecEditions, "RW90", 0, false, "100.01", "75 °C", "Rule 4-006(2)", "2 AWG", "115 A", ""},
		{"marked 60", cecEditions, "RW90", 60, false, "100", "60 °C", "Rule 4-006(1)", "1 AWG", "110 A", ""},
		{"marked 75", cecEditions, "RW90", 75, false, "100", "75 °C", "Rule 4-006(1)", "3 AWG", "100 A", ""},
		{"marked 90", cecEditions, "RW90", 90, false, "95", "90 °C", "Rule 4-006(1)", "4 AWG", "95 A", ""},
		{"marked 90, 75 °C wire", cecEditions, "RW75", 90, false, "95", "90 °C", "Rule 4-006(1)", "3 AWG", "100 A", "the lower of insulation and termination"},
		{"no design letters in the CEC", cecEditions, "RW90", 0, true, "100", "60 °C", "Rule 4-006(2)", "1 AWG", "110 A", ""},
		{"25 A on 75 °C terminals", cecEditions, "RW90", 75, false, "25", "75 °C", "Rule 4-006(1)", "12 AWG", "25 A", "published: 12 AWG, not 14"},
		{"three 500 kcmil on a 75 °C breaker", cecEditions, "RW90", 75, false, "380", "75 °C", "Rule 4-006(1)", "500 kcmil", "380 A", "published: 380 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				l := load(tt.amps)
				l.Motor75 = tt.motor
				s := chosen(t, conductor.Wiring{Insulation: tt.insulation, Termination: tt.marked}, e, l)
				assert.Equal(t, tt.celsius, s.Termination.String())
				assert.Equal(t, tt.ref, s.Termination.Citation().Ref)
				assert.Equal(t, e, s.Termination.Citation().Edition)
				assert.Equal(t, tt.size, s.Size.String(), tt.why)
				assert.Equal(t, tt.ampacity, s.Ampacity.String(), tt.why)
				assert.Equal(t, 1, s.Sets)
			})
		}
	}
}

// Terminals of 90 °C are rare below 1000 V: told under the NEC.
func TestTerminals90Told(t *testing.T) {
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(chosen(t, conductor.Wiring{Insulation: "THHN", Termination: 90}, e, load("95")).Cautions, "110.14(C)(1)", "90 °C"))
		assert.False(t, testkit.Cautioned(chosen(t, conductor.Wiring{Insulation: "THHN", Termination: 75}, e, load("95")).Cautions, "110.14(C)(1)", "90 °C"))
	}
}

// Without an insulation the edition's 75 °C wet and dry type is taken and told.
func TestDefaultInsulation(t *testing.T) {
	for _, e := range tables.Editions() {
		want := "THWN"
		if e.Code() == tables.CEC {
			want = "RW75"
		}
		s := chosen(t, conductor.Wiring{Termination: 75}, e, load("100"))
		assert.Equal(t, want, s.Insulation)
		assert.Equal(t, "3 AWG", s.Size.String())
		assert.Contains(t, s.Cautions[0].Text, "no insulation is given")
	}
}
