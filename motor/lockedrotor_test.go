package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Where the locked-rotor current comes from, in order: marked amperes, code
// letter, table, six times full load. 430.7(B), 430.110(C), 440.12; CEC 28-010,
// 28-704.
func TestLockedRotor(t *testing.T) {
	cage := func(set func(*motor.Motor)) motor.Motor { m := cage50(); set(&m); return m }
	single := func(hp string, volts int, letter string) motor.Motor {
		return motor.Motor{Kind: motor.SinglePhase, Power: motor.HP(hp), Voltage: volts, Nameplate: motor.Nameplate{CodeLetter: letter}}
	}
	both := func(m *motor.Motor) { m.Nameplate.LockedRotor, m.Nameplate.CodeLetter = motor.Amps("350"), "H" }
	torque := motor.Motor{Kind: motor.Torque, Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps("12"), CodeLetter: "G"}}
	dc := motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}
	for _, tt := range []struct {
		name      string
		editions  []tables.Edition
		m         motor.Motor
		source    motor.Source
		low, high string
		ref       string // of the low end, * for one that no rule settles
	}{
		{"marked before letter", necEditions, cage(both), motor.FromNameplate, "350 A", "350 A", ""},
		{"marked before letter", cecEditions, cage(both), motor.FromNameplate, "350 A", "350 A", ""},
		// 50 hp × 1000 ÷ (460 V × 1.732) = 62.757…
		{"letter G", necEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter = "G" }), motor.FromCodeLetter, "351.44 A", "394.75 A", "Table 430.7(B)"}, // × 5.60 down, × 6.29 up
		{"letter g", necEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter = "g" }), motor.FromCodeLetter, "351.44 A", "394.75 A", "Table 430.7(B)"},
		{"letter A", necEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter = "A" }), motor.FromCodeLetter, "0 A", "197.06 A", "Table 430.7(B)"}, // × 3.14 up
		{"letter V", necEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter = "V" }), motor.FromCodeLetter, "1405.76 A", "", "Table 430.7(B)"},   // × 22.4, no upper end
		{"single-phase H", necEditions, single("3", 230, "H"), motor.FromCodeLetter, "82.17 A", "92.48 A", "Table 430.7(B)"},                              // 3000 ÷ 230 × 6.30, 7.09
		{"a third of a horsepower", necEditions, single("1/3", 115, "L"), motor.FromCodeLetter, "26.08 A", "28.96 A", "Table 430.7(B)"},                   // 3000 ÷ 115, 3330 ÷ 115
		{"two-phase G", necEditions, motor.Motor{Kind: motor.SquirrelCage, Phases: 2, Power: motor.HP("10"), Voltage: 230, Nameplate: motor.Nameplate{CodeLetter: "G"}}, // 10000 ÷ 460; no formula printed for two phases
			motor.FromCodeLetter, "121.73 A", "136.74 A", "Table 430.7(B)"},
		{"letter before table, Design A", necEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter, m.Nameplate.DesignLetter = "G", "A" }), motor.FromCodeLetter, "351.44 A", "394.75 A", "Table 430.7(B)"},
		{"marked, Design A", necEditions, cage(func(m *motor.Motor) { m.Nameplate.LockedRotor, m.Nameplate.DesignLetter = motor.Amps("500"), "A" }), motor.FromNameplate, "500 A", "500 A", ""},
		{"Design A, nothing known", necEditions, cage(func(m *motor.Motor) { m.Nameplate.DesignLetter = "a" }), motor.NoSource, "", "", ""},
		{"Design B", necEditions, cage(func(m *motor.Motor) { m.Nameplate.DesignLetter = "B" }), motor.FromTable, "363 A", "363 A", "Table 430.251(B)"},
		{"table, two-phase", necEditions, cage(func(m *motor.Motor) { m.Phases = 2 }), motor.FromTable, "363 A", "363 A", "Table 430.251(B)"},
		{"table, single-phase", necEditions, single("3", 230, ""), motor.FromTable, "102 A", "102 A", "Table 430.251(A)"},
		{"10 hp at 115 V", old, single("10", 115, ""), motor.FromTable, "600 A", "600 A", "Table 430.251(A)"},
		{"10 hp at 115 V", new2023, single("10", 115, ""), motor.FromTable, "1000 A", "1000 A", "Table 430.251(A)"}, // printed so in 2023
		{"below the table", necEditions, single("1/6", 115, ""), motor.FromSixTimesFLC, "26.4 A", "26.4 A", "430.110(C)(3)"},
		{"2300 V", necEditions, cage(func(m *motor.Motor) { m.Power, m.Voltage = motor.HP("60"), 2300 }), motor.FromSixTimesFLC, "96 A", "96 A", "430.110(C)(3)"},
		{"wound rotor", necEditions, motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 460}, motor.FromSixTimesFLC, "312 A", "312 A", "430.110(C)(3)"},
		{"synchronous", necEditions, motor.Motor{Kind: motor.Synchronous, Power: motor.HP("100"), Voltage: 460, Nameplate: motor.Nameplate{PowerFactor: motor.Factor("1")}}, motor.FromSixTimesFLC, "606 A", "606 A", "430.110(C)(3)"},
		{"torque", necEditions, torque, motor.FromNameplate, "12 A", "12 A", "430.6(B)"},
		{"torque", cecEditions, torque, motor.FromNameplate, "12 A", "12 A", "*"},
		{"direct current", necEditions, dc, motor.NoSource, "", "", ""},
		{"direct current", cecEditions, dc, motor.NoSource, "", "", ""},
		{"hermetic, marked", necEditions, compressor("38", "", "200"), motor.FromNameplate, "200 A", "200 A", ""},
		{"hermetic, not marked", necEditions, compressor("38", "", ""), motor.FromSixTimesFLC, "228 A", "228 A", "440.12(C)"},
		{"hermetic, marked", cecEditions, compressor("38", "", "200"), motor.FromNameplate, "200 A", "200 A", ""},
		{"hermetic, not marked", cecEditions, compressor("38", "", ""), motor.FromSixTimesFLC, "228 A", "228 A", "Rule 28-704"},
		{"no table in the CEC", cecEditions, marked50(), motor.FromSixTimesFLC, "366 A", "366 A", "Rule 28-010"},
		{"no code letters in the CEC", cecEditions, cage(func(m *motor.Motor) { m.Nameplate.CodeLetter = "G" }), motor.FromSixTimesFLC, "390 A", "390 A", "Rule 28-010"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				lr := demand(t, tt.m, e).LockedRotor
				assert.Equal(t, tt.source, lr.Source)
				assert.Equal(t, tt.low, lr.Low.String())
				assert.Equal(t, tt.high, lr.High.String())
				if tt.ref != "*" {
					assert.Equal(t, tt.ref, ref(lr.Low))
				}
			})
		}
	}
}

// The locked-rotor tables do not hold for Design A: nothing is guessed, and the
// missing marking is asked for.
func TestDesignACaution(t *testing.T) {
	m := cage50()
	m.Nameplate.DesignLetter = "A"
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "430.110(C)(3)", "Design A"), e)
	}
	m.Nameplate.CodeLetter = "G"
	for _, e := range necEditions {
		assert.False(t, testkit.Cautioned(demand(t, m, e).Cautions, "430.110(C)(3)", "Design A"), e)
	}
}

// Letter V has no upper end, and that is told.
func TestLetterVCaution(t *testing.T) {
	m := cage50()
	m.Nameplate.CodeLetter = "V"
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "Table 430.7(B)", "no upper end"), e)
	}
}

func TestSourceText(t *testing.T) {
	for source, want := range map[motor.Source]string{
		motor.NoSource: "", motor.FromNameplate: "nameplate", motor.FromCodeLetter: "code_letter",
		motor.FromTable: "table", motor.FromSixTimesFLC: "six_times_full_load", motor.Source(99): "",
	} {
		text, err := source.MarshalText()
		require.NoError(t, err)
		assert.Equal(t, want, string(text))
		assert.Equal(t, want, source.String())
	}
}
