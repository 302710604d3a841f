package tables_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// TestLookupsOutsideOfTheirRange holds that what no table covers is an error or
// absent, never a panic and never a neighbour's value.
func TestLookupsOutsideOfTheirRange(t *testing.T) {
	e := tables.NEC2023
	_, err := e.DevicePercent(tables.DeviceQuery{Device: 9})
	assert.ErrorContains(t, err, "device")

	low, _, err := e.LockedRotorKVA("H")
	require.NoError(t, err)
	for _, p := range []tables.Power{{}, tables.Must(tables.ParseKW("30"))} {
		assert.True(t, e.LockedRotorOf(low, p, 460, 3, true).IsZero(), "%v", p)
	}
	assert.True(t, e.LockedRotorOf(low, tables.Must(tables.ParseHP("30")), 0, 3, true).IsZero())

	var none *tables.NotTabulatedError
	_, _, err = tables.CEC2024.LockedRotorKVA("H")
	assert.ErrorAs(t, err, &none, "the CEC has no table of code letters")

	_, err = e.AmbientFactor(75, tables.Temperature{})
	assert.ErrorContains(t, err, "wiring.ambient is not given")

	// NFPA 70 Table 310.4: THHW, 75 °C wet; damp is not printed apart.
	ins, err := e.Insulation("THHW")
	require.NoError(t, err)
	assert.Equal(t, [3]int{90, 75, 75}, ins.Celsius)

	// CSA C22.1 Rule 28-210: 200 percent over 50 hp, and where no horsepower is known.
	for power, want := range map[string]string{"50 hp": "250 %", "51 hp": "200 %", "30 kW": "200 %"} {
		percent, _, _ := tables.CEC2024.InstantaneousCaps(true, tables.Must(tables.ParsePower(power)))
		assert.Equal(t, want, percent.String(), power)
	}

	var empty tables.AmpacityTable
	assert.Zero(t, empty.Column(75))
	assert.True(t, empty.Ampacity(3, 75).IsZero())
	assert.Zero(t, empty.AtLeast(hundredAmps(), 75, 1, 30))
	assert.True(t, empty.Citation().IsZero())
}

func hundredAmps() tables.Figure { return tables.Whole("load", tables.Ampere, 100) }

// TestMarks holds the confidence of cells whose table is not equally sure
// throughout: the reference's notes on each table.
func TestMarksOfCells(t *testing.T) {
	size := func(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }
	nec := tables.Must(tables.NEC2023.Ampacities(tables.InRaceway, tables.Copper))
	cec := tables.Must(tables.CEC2024.Ampacities(tables.InRaceway, tables.Copper))
	free := tables.Must(tables.CEC2024.Ampacities(tables.InFreeAir, tables.Copper))
	assert.Equal(t, tables.MarkA, nec.Ampacity(size("600"), 75).Mark())
	assert.Equal(t, tables.MarkB, nec.Ampacity(size("700"), 75).Mark())
	assert.Equal(t, tables.MarkA, cec.Ampacity(size("4"), 90).Mark())
	assert.Equal(t, tables.MarkB, cec.Ampacity(size("4"), 110).Mark())
	assert.Equal(t, tables.MarkC, free.Ampacity(size("4"), 90).Mark())
	assert.Equal(t, tables.MarkB, tables.Must(tables.CEC2024.OverloadUnits(3)).Mark())
	assert.Equal(t, tables.MarkC, tables.Must(tables.CEC2024.OverloadUnits(1)).Mark())
	assert.Equal(t, tables.MarkC, tables.Must(tables.NEC2023.Insulation("SIS")).Mark)
}
