package conductor_test

import (
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// 20 918 A at X/R 5.79, 300 ft of 500 kcmil in steel: 9375 A with the conductors
// at 75 °C; they are taken cold, at 25 °C (R less by 50 × 0.00323), which gives more.
func TestFaultAtEnd(t *testing.T) {
	w, s := run(t, tables.NEC2023, conductor.Copper, "500", "300 ft", conductor.RMC)
	f, err := w.FaultAtEnd(tables.NEC2023, s, 480, 3, amps("20918"), plain("5.79"))
	require.NoError(t, err)
	z := 480 / math.Sqrt(3) / 20918
	r := z / math.Hypot(1, 5.79)
	want := 480 / math.Sqrt(3) / math.Hypot(r+0.0087*(1-50*0.00323), 5.79*r+0.0144) / 1000
	assert.InDelta(t, want, f.Float(), 0.011)
	assert.Greater(t, f.Float(), 9.375)
	assert.Less(t, f.Float(), 10.352, "the point-to-point sum of magnitudes at 25 °C with a table of its own")
	assert.Equal(t, tables.Kiloampere, f.Unit())
	assert.Contains(t, f.How(), "25 °C")
}

// The fault falls along the path and with smaller conductors, never above the
// source; an X/R that is not given takes reactance alone, which gives more.
func TestFaultFalls(t *testing.T) {
	for _, phases := range []int{1, 3} {
		for _, awg := range []string{"12", "4", "4/0"} {
			before := 20.0
			for _, length := range []string{"1 m", "5 m", "20 m", "60 m", "200 m", "1000 m", "10000 m"} {
				w, s := run(t, tables.CEC2024, conductor.Copper, awg, length, 0)
				f, err := w.FaultAtEnd(tables.CEC2024, s, 600, phases, amps("20000"), plain("4"))
				require.NoError(t, err)
				assert.LessOrEqual(t, f.Float(), before, "%s, %s", awg, length)
				before = f.Float()
				if awg == "12" {
					most, err := w.FaultAtEnd(tables.CEC2024, s, 600, phases, amps("20000"), tables.Figure{})
					require.NoError(t, err)
					assert.GreaterOrEqual(t, most.Float(), f.Float())
					assert.Contains(t, most.How(), "reactance alone")
				}
			}
			assert.Less(t, before, 1.0, "10 km leave little")
		}
	}
}

// ICEA P-32-382: 0.0719 A of 1 cmil for 1 s from 90 to 250 °C copper, 0.0470
// aluminum (short forms as printed); 1 A for each 42.25 cmil for 5 s from 75 to 150
// °C copper; 250 kcmil from 75 to 150 °C 41 850 A for 0.1 s.
func TestWithstand(t *testing.T) {
	for _, tt := range []struct {
		name       string
		m          tables.Material
		insulation string
		awg        string
		kiloamps   float64
		seconds    float64
		near       float64 // of the printed constant, squared
	}{
		{"copper from 90 to 250 °C, 1 s", conductor.Copper, "XHHW-2", "250", 0.07195 * 250, 1, 0.001},
		{"copper from 90 to 250 °C, 4 s", conductor.Copper, "XHHW-2", "250", 0.07195 * 125, 4, 0.001},
		{"aluminum from 90 to 250 °C", conductor.Aluminum, "XHHW-2", "500", 0.0470 * 500, 1, 0.003},
		{"copper from 75 to 150 °C", conductor.Copper, "THWN", "250", 41.85, 0.1, 0.015},
		{"one ampere for 42.25 cmil", conductor.Copper, "THWN", "500", 500 / 42.25, 5, 0.001},
	} {
		t.Run(tt.name, func(t *testing.T) {
			s := chosen(t, conductor.Wiring{Material: tt.m, Insulation: tt.insulation, Termination: 75, Least: size(tt.awg)}, tables.NEC2023, load("1"))
			fault := tables.ComputedFigure("fault", tables.NEC2023, &tables.Rule{Ref: "a rule"}, tables.Kiloampere, tt.kiloamps, 6, true, "")
			f := conductor.Withstand(tables.NEC2023, s, fault)
			assert.InEpsilon(t, tt.seconds, f.Float(), tt.near+0.001/tt.seconds+0.006, "mm² of Table 8 round to 0.25 percent of cmil")
			assert.Equal(t, tables.Second, f.Unit())
			assert.Equal(t, "ICEA P-32-382", f.Citation().Ref)
		})
	}
}

// Half the current is stood four times as long; two sets share it; without a
// fault or an insulation there is nothing to tell.
func TestWithstandScales(t *testing.T) {
	s := chosen(t, conductor.Wiring{Termination: 75, Least: size("1/0")}, tables.NEC2023, load("1"))
	kiloamps := func(v float64) tables.Figure {
		return tables.ComputedFigure("fault", tables.NEC2023, &tables.Rule{Ref: "a rule"}, tables.Kiloampere, v, 6, true, "")
	}
	full := conductor.Withstand(tables.NEC2023, s, kiloamps(4)).Float()
	assert.InEpsilon(t, 4*full, conductor.Withstand(tables.NEC2023, s, kiloamps(2)).Float(), 0.001)
	s.Sets = 2
	assert.InEpsilon(t, 4*full, conductor.Withstand(tables.NEC2023, s, kiloamps(4)).Float(), 0.001)
	assert.True(t, conductor.Withstand(tables.NEC2023, s, tables.Figure{}).IsZero())
	s.Insulation = "none"
	assert.True(t, conductor.Withstand(tables.NEC2023, s, kiloamps(4)).IsZero())
}

// The method is meant for 0.1 to 5 s: beyond that the figure says so. 4 AWG of 41740
// circular mils stands 1 kA for more, and 42 kA for less.
func TestWithstandOutsideOfItsRange(t *testing.T) {
	s := chosen(t, conductor.Wiring{Termination: 75, Least: size("4")}, tables.NEC2023, load("1"))
	for kiloamps, outside := range map[float64]bool{0.5: true, 2: false, 42: true} {
		fault := tables.ComputedFigure("fault", tables.NEC2023, &tables.Rule{Ref: "a rule"}, tables.Kiloampere, kiloamps, 6, true, "")
		assert.Equal(t, outside, strings.Contains(conductor.Withstand(tables.NEC2023, s, fault).Note(), "outside"), kiloamps)
	}
}
