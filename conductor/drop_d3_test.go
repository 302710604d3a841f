package conductor_test

import (
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// Classroom notes on CSA C22.1:24: 30 A, 60 m, 240 V single-phase, 2 percent: K at
// most 1.333, 4 AWG. 1.01 × 2 × 30 × 60 / 1000 = 3.636 V, 1.515 percent; 6 AWG
// loses 2.385.
func TestDropByTableD3(t *testing.T) {
	l := conductor.LineLoad{Volts: 240, Phases: 1, Current: amps("30"), PowerFactor: plain("1")}
	for awg, want := range map[string]string{"4": "1.52 %", "6": "2.39 %"} {
		w, s := run(t, tables.CEC2024, conductor.Copper, awg, "60 m", 0)
		w.DropMethod = conductor.ByTableD3
		f, err := w.RunningDrop(tables.CEC2024, s, l)
		require.NoError(t, err)
		assert.Equal(t, want, f.String(), awg)
		assert.True(t, testkit.Rests(f, "Table D3"))
		// Operation at 90 °C 5 percent more, at 60 °C 5 percent less.
		for _, x := range []struct {
			celsius int
			times   float64
		}{{60, 0.95}, {90, 1.05}} {
			w.Termination, w.Insulation = x.celsius, "RW90"
			other, err := w.RunningDrop(tables.CEC2024, chosen(t, w, tables.CEC2024, load("1")), l)
			require.NoError(t, err)
			assert.InDelta(t, f.Float()*x.times, other.Float(), 0.011)
		}
	}
}

// Three-phase with f = 1.73 stands within a fifth of the exact form at 0.85 with the
// impedance in PVC: the two tables rest on other spacings and temperatures.
func TestTableD3AgainstImpedance(t *testing.T) {
	for awg, length := range map[string]string{"12": "40 m", "8": "60 m", "4": "100 m", "1": "300 m", "2/0": "300 m", "250": "400 m", "500": "400 m"} {
		w, s := run(t, tables.CEC2024, conductor.Copper, awg, length, tables.PVC40)
		exact, err := w.RunningDrop(tables.CEC2024, s, line("40", "0.85"))
		require.NoError(t, err)
		w.DropMethod = conductor.ByTableD3
		table, err := w.RunningDrop(tables.CEC2024, s, line("40", "0.85"))
		require.NoError(t, err)
		assert.InEpsilon(t, exact.Float(), table.Float(), 0.20, awg)
	}
}

// The longest run by the table stands on the edge too.
func TestLongestRunByTableD3(t *testing.T) {
	limit := tables.StatedFigure("limit", tables.CEC2024, &tables.Rule{Ref: "a rule"}, tables.Percent, 3, 0)
	w, s := run(t, tables.CEC2024, conductor.Copper, "8", "1 m", 0)
	w.DropMethod = conductor.ByTableD3
	far, err := w.LongestRun(tables.CEC2024, s, line("40", "0.85"), limit)
	require.NoError(t, err)
	for more, passes := range map[string]bool{"0": true, "0.2": false} {
		w.Length = tables.Must(tables.ParseLength(far.Value().Add(decimal.RequireFromString(more)).String() + " m"))
		f, err := w.RunningDrop(tables.CEC2024, s, line("40", "0.85"))
		require.NoError(t, err)
		assert.Equal(t, passes, f.Cmp(limit) <= 0, "%v", f)
	}
}

// The method is that of the 2024 edition alone.
func TestDropMethodText(t *testing.T) {
	for text, m := range map[string]conductor.DropMethod{"impedance": conductor.ByImpedance, "table_d3": conductor.ByTableD3} {
		var back conductor.DropMethod
		require.NoError(t, back.UnmarshalText([]byte(text)))
		assert.Equal(t, m, back)
		b, err := m.MarshalText()
		require.NoError(t, err)
		assert.Equal(t, text, string(b))
		assert.Equal(t, text, m.String())
	}
	assert.Error(t, new(conductor.DropMethod).UnmarshalText([]byte("by hand")))
	for _, e := range tables.Editions() {
		err := conductor.Wiring{DropMethod: conductor.ByTableD3}.Validate(e)
		if e == tables.CEC2024 {
			assert.NoError(t, err)
		} else {
			assert.Equal(t, "wiring.drop_method", tables.FieldOf(err), e.String())
		}
		assert.Equal(t, "wiring.drop_method", tables.FieldOf(conductor.Wiring{DropMethod: 9}.Validate(e)))
		assert.Equal(t, "wiring.flexible", tables.FieldOf(conductor.Wiring{Flexible: conductor.EMT}.Validate(e)))
		assert.NoError(t, conductor.Wiring{Flexible: conductor.LFMC}.Validate(e))
	}
}

// 1000 kVA, 480 V, 5.75 percent: 1203 A and 20 918 A (full-load current times 100
// over the impedance); a line-to-line fault is √3/2 of it.
func TestTransformerFault(t *testing.T) {
	x := conductor.Transformer{KVA: tables.Must(tables.ParseRatio("1000")), Percent: tables.Must(tables.ParseRatio("5.75"))}
	f, err := x.Fault(tables.NEC2023, 480, 3)
	require.NoError(t, err)
	assert.InDelta(t, 20918, f.Float(), 1)
	assert.InDelta(t, 20918*0.8660254, conductor.LineToLine(tables.NEC2023, f).Float(), 1)
	assert.True(t, conductor.LineToLine(tables.NEC2023, tables.Figure{}).IsZero())
	single, err := conductor.Transformer{KVA: tables.Must(tables.ParseRatio("25")), Percent: tables.Must(tables.ParseRatio("2"))}.Fault(tables.NEC2023, 240, 1)
	require.NoError(t, err)
	assert.Equal(t, "5209 A", single.String()) // 104.17 A × 50, rounded up
	for _, bad := range []conductor.Transformer{{}, {KVA: x.KVA}, {Percent: x.Percent}, {KVA: tables.Must(tables.ParseRatio("0")), Percent: x.Percent}} {
		_, err := bad.Fault(tables.NEC2023, 480, 3)
		assert.Contains(t, tables.FieldOf(err), "transformer.")
	}
	_, err = x.Fault(tables.NEC2023, 0, 3)
	assert.Equal(t, "transformer.volts", tables.FieldOf(err))
	_, err = x.Fault(0, 480, 3)
	assert.Error(t, err)
}

// Each set in parallel carries its share, so that two lose half of what one does.
func TestTableD3InParallel(t *testing.T) {
	w := conductor.Wiring{Insulation: "RW90", Termination: 75, Length: conductor.Metres("60"), DropMethod: conductor.ByTableD3}
	l := conductor.LineLoad{Volts: 240, Phases: 1, Current: amps("30"), PowerFactor: plain("1")}
	s := conductor.Selection{Size: tables.Must(tables.ParseSize("4")), Sets: 1, Termination: tables.StatedFigure("termination", tables.CEC2024, nil, tables.Celsius, 75, 0)}
	one, err := w.RunningDrop(tables.CEC2024, s, l)
	require.NoError(t, err)
	s.Sets = 2
	half, err := w.RunningDrop(tables.CEC2024, s, l)
	require.NoError(t, err)
	assert.Equal(t, "1.52 %", one.String())
	assert.Equal(t, "0.76 %", half.String()) // 1.515 ÷ 2
}

// Two sets carry half each, so that the run is twice as long and the drop half; a
// cable has a factor of its own (CSA C22.1:24 Table D3); nothing without volts.
func TestTableD3SetsAndCable(t *testing.T) {
	limit := tables.StatedFigure("limit", tables.CEC2024, &tables.Rule{Ref: "a rule"}, tables.Percent, 3, 0)
	w, s := run(t, tables.CEC2024, conductor.Copper, "1/0", "100 m", 0)
	w.DropMethod = conductor.ByTableD3
	figures := func(s conductor.Selection) (drop, far float64) {
		f, err := w.RunningDrop(tables.CEC2024, s, line("120", "0.85"))
		require.NoError(t, err)
		g, err := w.LongestRun(tables.CEC2024, s, line("120", "0.85"), limit)
		require.NoError(t, err)
		return f.Float(), g.Float()
	}
	drop, far := figures(s)
	two := s
	two.Sets = 2
	half, twice := figures(two)
	assert.InDelta(t, drop/2, half, 0.011)
	assert.InDelta(t, far*2, twice, 0.21)
	cable := s
	cable.Run = tables.InCable
	other, _ := figures(cable)
	raceway, err := tables.CEC2024.DropFactor(conductor.Copper, s.Size, false, plain("0.85"))
	require.NoError(t, err)
	inCable, err := tables.CEC2024.DropFactor(conductor.Copper, s.Size, true, plain("0.85"))
	require.NoError(t, err)
	assert.NotZero(t, raceway.Cmp(inCable))
	assert.InEpsilon(t, drop*inCable.Float()/raceway.Float(), other, 0.01)
	f, err := w.RunningDrop(tables.CEC2024, s, conductor.LineLoad{Phases: 3, Current: amps("5"), PowerFactor: plain("0.85")})
	require.NoError(t, err)
	assert.True(t, f.IsZero())
}
