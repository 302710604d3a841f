package conductor_test

import (
	"math"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

func plain(s string) tables.Figure { return tables.Must(tables.ParseRatio(s)).Figure("ratio") }

// line is a running three-phase load at 480 V.
func line(current, pf string) conductor.LineLoad {
	return conductor.LineLoad{Volts: 480, Phases: 3, Current: amps(current), PowerFactor: plain(pf)}
}

// run is a selection of one size on 75 °C terminals, and its wiring.
func run(t *testing.T, e tables.Edition, m tables.Material, awg, length string, r tables.Raceway) (conductor.Wiring, conductor.Selection) {
	t.Helper()
	w := conductor.Wiring{Material: m, Termination: 75, Raceway: r, Least: size(awg), Sets: 1, Length: tables.Must(tables.ParseLength(length))}
	if e.Code() == tables.NEC && size(awg).Cmp(size("1000")) > 0 {
		w.Insulation = "XHHW-2"
	}
	s := chosen(t, w, e, load("1"))
	require.Equal(t, size(awg), s.Size)
	return w, s
}

func running(t *testing.T, e tables.Edition, m tables.Material, awg, length string, r tables.Raceway, l conductor.LineLoad) tables.Figure {
	t.Helper()
	w, s := run(t, e, m, awg, length, r)
	f, err := w.RunningDrop(e, s, l)
	require.NoError(t, err)
	return f
}

// 480 V, 4 AWG in steel, 200 ft: 1.386 percent at 65 A and 0.85 (IEEE 141-1993
// 3.11 with NFPA 70 Chapter 9 Table 9), rounded up to 1.39. A locked rotor of
// 363 A at 0.36 loses less than the 4.64 percent of a constant current.
func TestDropFigures(t *testing.T) {
	for _, e := range tables.Editions() {
		f := running(t, e, conductor.Copper, "4", "200 ft", conductor.RMC, line("65", "0.85"))
		assert.Equal(t, "1.39 %", f.String())
		assert.Equal(t, "IEEE 141-1993 3.11", f.Citation().Ref)
		assert.True(t, testkit.Rests(f, "NFPA 70 Chapter 9 Table 9"))
		w, s := run(t, e, conductor.Copper, "4", "200 ft", conductor.RMC)
		f, err := w.StartingDrop(e, s, line("363", "0.36"))
		require.NoError(t, err)
		// Z = 480/√3/363 = 0.76344: 0.27484 + j0.71226, and the run 0.062 + j0.012.
		want := 100 * (1 - 0.76344/math.Hypot(0.27484+0.062, 0.71226+0.012))
		assert.InDelta(t, want, f.Float(), 0.01)
		assert.Less(t, f.Float(), 4.64)
		assert.Equal(t, "IEEE 399-1997 chapter 9", f.Citation().Ref)
	}
}

// Twice the length is twice the drop within 2 percent of it below 5 percent
// (and the rounding up of two figures), and a larger conductor never drops more.
func TestDropProperties(t *testing.T) {
	for _, m := range []tables.Material{conductor.Copper, conductor.Aluminum} {
		before := math.Inf(1)
		for _, awg := range []string{"12", "10", "8", "6", "4", "3", "2", "1", "1/0", "2/0", "3/0", "4/0", "250", "300", "350", "400", "500", "600", "700", "750", "800", "900", "1000"} {
			for _, r := range []tables.Raceway{0, conductor.EMT, conductor.PVC40} {
				one := running(t, tables.NEC2023, m, awg, "30 m", r, line("40", "0.85")).Float()
				two := running(t, tables.NEC2023, m, awg, "60 m", r, line("40", "0.85")).Float()
				assert.InDelta(t, 2*one, two, 0.02+0.02*one, "%s %v", awg, m)
			}
			far := running(t, tables.NEC2023, m, awg, "100 m", conductor.EMT, line("40", "0.85")).Float()
			assert.LessOrEqual(t, far, before, "%s %v", awg, m)
			before = far
			if m == conductor.Aluminum {
				assert.Greater(t, far, running(t, tables.NEC2023, conductor.Copper, awg, "100 m", conductor.EMT, line("40", "0.85")).Float())
			}
		}
	}
}

// Feet and metres are one length, and all sets share the current.
func TestDropUnitsAndSets(t *testing.T) {
	feet := running(t, tables.NEC2023, conductor.Copper, "4", "250 ft", conductor.EMT, line("65", "0.85"))
	metres := running(t, tables.NEC2023, conductor.Copper, "4", "76.2 m", conductor.EMT, line("65", "0.85"))
	assert.Equal(t, feet.String(), metres.String())
	w, s := run(t, tables.NEC2023, conductor.Copper, "1/0", "400 ft", conductor.EMT)
	single, err := w.RunningDrop(tables.NEC2023, s, line("100", "0.85"))
	require.NoError(t, err)
	s.Sets = 2
	double, err := w.RunningDrop(tables.NEC2023, s, line("200", "0.85"))
	require.NoError(t, err)
	assert.Equal(t, single.String(), double.String(), "twice the current in two sets")
}

// Direct current: 2 I R L / V with R of Table 8. 40 A at 240 V over 200 ft of 8
// AWG: 2 × 40 × 0.778 × 0.2 / 240 = 5.1867 percent.
func TestDropDirectCurrent(t *testing.T) {
	l := conductor.LineLoad{Volts: 240, Current: amps("40")}
	f := running(t, tables.NEC2023, conductor.Copper, "8", "200 ft", conductor.EMT, l)
	assert.Equal(t, "5.19 %", f.String())
	assert.True(t, testkit.Rests(f, "NFPA 70 Chapter 9 Table 8"))
	assert.False(t, testkit.Rests(f, "NFPA 70 Chapter 9 Table 9"))
}

// The run is as warm as its terminals: Table 8 note 2, 0.00323 per °C for copper
// and 0.00330 for aluminum.
func TestDropTemperature(t *testing.T) {
	l := conductor.LineLoad{Volts: 240, Current: amps("40")}
	for m, alpha := range map[tables.Material]float64{conductor.Copper: 0.00323, conductor.Aluminum: 0.00330} {
		w, s := run(t, tables.CEC2024, m, "8", "1000 ft", 0)
		warm, err := w.RunningDrop(tables.CEC2024, s, l)
		require.NoError(t, err)
		w.Termination = 60
		s = chosen(t, w, tables.CEC2024, load("1"))
		cool, err := w.RunningDrop(tables.CEC2024, s, l)
		require.NoError(t, err)
		assert.InEpsilon(t, 1-15*alpha, cool.Float()/warm.Float(), 0.001)
	}
}

// Sizes that Table 9 does not print take the entry of the next smaller and say so.
func TestDropStandIn(t *testing.T) {
	for awg, entry := range map[string]string{"700": "600", "800": "750", "900": "750", "1250": "1000", "2000": "1000"} {
		f := running(t, tables.NEC2023, conductor.Copper, awg, "500 ft", conductor.EMT, line("300", "0.85"))
		assert.Contains(t, f.How(), "the next smaller one", awg)
		assert.Equal(t, running(t, tables.NEC2023, conductor.Copper, entry, "500 ft", conductor.EMT, line("300", "0.85")).String(), f.String())
		assert.NotContains(t, running(t, tables.NEC2023, conductor.Copper, entry, "500 ft", conductor.EMT, line("300", "0.85")).How(), "next smaller")
	}
}

// The longest run stands on the edge: it passes, and 0.2 m more fails.
func TestLongestRun(t *testing.T) {
	limit := tables.StatedFigure("limit", tables.NEC2023, &tables.Rule{Ref: "a rule"}, tables.Percent, 3, 0)
	for _, tt := range []struct {
		awg string
		l   conductor.LineLoad
	}{
		{"4", line("65", "0.85")}, {"14", line("11", "0.6")}, {"500", line("350", "0.9")},
		{"8", conductor.LineLoad{Volts: 240, Current: amps("38")}}, {"10", conductor.LineLoad{Volts: 230, Phases: 1, Current: amps("17"), PowerFactor: plain("0.8")}},
	} {
		w, s := run(t, tables.NEC2023, conductor.Copper, tt.awg, "1 m", conductor.PVC40)
		far, err := w.LongestRun(tables.NEC2023, s, tt.l, limit)
		require.NoError(t, err)
		assert.Equal(t, tables.Metre, far.Unit())
		drop := func(more string) tables.Figure {
			w.Length = tables.Must(tables.ParseLength(far.Value().Add(decimal.RequireFromString(more)).String() + " m"))
			f, err := w.RunningDrop(tables.NEC2023, s, tt.l)
			require.NoError(t, err)
			return f
		}
		assert.LessOrEqual(t, drop("0").Cmp(limit), 0, "%s at %v", tt.awg, far)
		assert.Positive(t, drop("0.2").Cmp(limit), "%s at %v", tt.awg, far)
	}
}

// Without a length, a current or volts there is nothing to tell.
func TestDropAbsent(t *testing.T) {
	w, s := run(t, tables.NEC2023, conductor.Copper, "4", "50 m", 0)
	for _, l := range []conductor.LineLoad{{Volts: 480, Phases: 3}, {Phases: 3, Current: amps("5")}} {
		f, err := w.RunningDrop(tables.NEC2023, s, l)
		require.NoError(t, err)
		assert.True(t, f.IsZero())
		f, err = w.LongestRun(tables.NEC2023, s, l, amps("3"))
		require.NoError(t, err)
		assert.True(t, f.IsZero())
	}
	f, err := w.FaultAtEnd(tables.NEC2023, s, 0, 3, amps("20000"), tables.Figure{})
	require.NoError(t, err)
	assert.True(t, f.IsZero())
	w.Length = tables.Length{}
	f, err = w.RunningDrop(tables.NEC2023, s, line("65", "0.85"))
	require.NoError(t, err)
	assert.True(t, f.IsZero())
	f, err = w.FaultAtEnd(tables.NEC2023, s, 480, 3, amps("20000"), tables.Figure{})
	require.NoError(t, err)
	assert.True(t, f.IsZero())
	w.Length = conductor.Metres("50")
	s.Size = size("18")
	_, err = w.RunningDrop(tables.NEC2023, s, line("65", "0.85"))
	assert.Error(t, err)
	_, err = w.LongestRun(tables.NEC2023, s, line("65", "0.85"), amps("3"))
	assert.Error(t, err)
	_, err = w.FaultAtEnd(tables.NEC2023, s, 480, 3, amps("20000"), tables.Figure{})
	assert.Error(t, err)
}
