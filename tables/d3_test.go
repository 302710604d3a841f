package tables_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func powerFactor(s string) tables.Figure {
	if s == "" {
		return tables.Figure{}
	}
	return tables.Must(tables.ParseRatio(s)).Figure("power factor")
}

// Cells of CSA C22.1:24 Table D3, in ohms by circuit kilometre at 75 °C. Between
// the printed power factors the larger neighbour is taken.
func TestDropFactorCells(t *testing.T) {
	for _, tt := range []struct {
		material tables.Material
		size     string
		cable    bool
		pf, want string
	}{
		{tables.Copper, "8", false, "", "2.54 Ω/km"}, {tables.Copper, "8", false, "1", "2.54 Ω/km"}, {tables.Copper, "8", false, "0.9", "2.51 Ω/km"},
		{tables.Copper, "8", true, "0.9", "2.5 Ω/km"}, {tables.Copper, "6", false, "0.8", "1.55 Ω/km"}, {tables.Copper, "3", true, "0.8", "0.787 Ω/km"},
		{tables.Copper, "3", false, "0.85", "0.801 Ω/km"}, {tables.Copper, "500", false, "0.85", "0.121 Ω/km"}, {tables.Copper, "8", false, "0.95", "2.54 Ω/km"},
		{tables.Aluminum, "12", false, "0.8", "9.99 Ω/km"}, {tables.Aluminum, "1000", true, "", "0.0686 Ω/km"},
		{tables.Copper, "700", false, "0.9", "0.101 Ω/km"}, {tables.Copper, "2000", false, "0.9", "0.0778 Ω/km"}, // sizes that are not printed
	} {
		k, err := tables.CEC2024.DropFactor(tt.material, awg(tt.size), tt.cable, powerFactor(tt.pf))
		require.NoError(t, err)
		assert.Equal(t, tt.want, k.String(), "%s %v at %q", tt.size, tt.material, tt.pf)
		assert.Equal(t, tables.Citation{Edition: tables.CEC2024, Ref: "Table D3"}, k.Citation())
	}
}

// K of direct current times kcmil is 41.8 for copper and 68.7 for aluminum, within
// 1.2 percent, and K falls as the size rises in every column.
func TestDropFactorIdentities(t *testing.T) {
	held := 0
	for m, want := range map[tables.Material]float64{tables.Copper: 41.8, tables.Aluminum: 68.7} {
		for _, pf := range []string{"", "1", "0.9", "0.8"} {
			for _, cable := range []bool{true, false} {
				before := 1e9
				for _, s := range tables.Sizes() {
					k, err := tables.CEC2024.DropFactor(m, s, cable, powerFactor(pf))
					if err != nil {
						continue
					}
					assert.LessOrEqual(t, k.Float(), before, "%v %v", s, m)
					before = k.Float()
					if printed, _ := tables.CEC2024.Impedance(m, s, 0); pf == "" && printed.StandIn == 0 {
						mm, _ := s.Area().Float64()
						assert.InEpsilon(t, want, k.Float()*mm*1.973525, 0.014, "%v %v", s, m)
						held++
					}
				}
			}
		}
	}
	assert.Equal(t, 2*(21+20), held)
}

func TestDropFactorRefused(t *testing.T) {
	var missing *tables.NotTabulatedError
	for _, e := range tables.Editions() {
		if e != tables.CEC2024 { // the first with the table in this form
			_, err := e.DropFactor(tables.Copper, awg("8"), false, powerFactor("0.9"))
			require.ErrorAs(t, err, &missing)
			assert.Equal(t, "wiring.drop_method", missing.Field)
		}
	}
	_, err := tables.CEC2024.DropFactor(tables.Copper, awg("8"), false, powerFactor("0.79"))
	require.ErrorAs(t, err, &missing, "below the lowest power factor that is printed")
	assert.Equal(t, "motor.nameplate.power_factor", missing.Field)
	for _, s := range []tables.Size{0, awg("16"), awg("16 mm²")} {
		_, err := tables.CEC2024.DropFactor(tables.Copper, s, false, tables.Figure{})
		assert.ErrorAs(t, err, &missing)
	}
	_, err = tables.CEC2024.DropFactor(tables.Aluminum, awg("14"), false, tables.Figure{})
	assert.ErrorAs(t, err, &missing)
	_, err = tables.Edition(0).DropFactor(tables.Copper, awg("8"), false, tables.Figure{})
	assert.Error(t, err)
}

// A length becomes a figure in metres.
func TestLengthFigure(t *testing.T) {
	f := tables.Must(tables.ParseLength("100 ft")).Figure("length")
	assert.Equal(t, "30.48 m", f.String())
	assert.Equal(t, tables.Given, f.Op())
	assert.True(t, tables.Length{}.Figure("length").IsZero())
}
