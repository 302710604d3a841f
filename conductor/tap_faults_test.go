package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// CSA C22.1 Rules 28-106(3) and 28-110(2) print metres alone: 10 ft is more than
// 3 m and 25 ft more than 7.5 m.
func TestTapInFeetUnderTheCEC(t *testing.T) {
	for _, e := range cecEditions {
		f, err := tap("10 ft", true).Ampacity(e)
		require.NoError(t, err)
		assert.Equal(t, "Rule 28-110(2)(b)", f.Citation().Ref)
		f, err = tap("25 ft", true).Ampacity(e)
		require.NoError(t, err)
		assert.Equal(t, "Rule 28-110(2)", f.Citation().Ref)
	}
}

// NFPA 70 430.28: a tap of 10 ft may take the one-third of 25 ft if that is less.
func TestShortTapTakesTheLesserShare(t *testing.T) {
	for _, e := range tables.Editions() {
		if e.Code() != tables.NEC {
			continue
		}
		x := conductor.Tap{Load: amps("20"), Source: amps("100"), Device: amps("400"), Length: length("10 ft"), Protected: true}
		f, err := x.Ampacity(e)
		require.NoError(t, err)
		assert.Equal(t, "430.28(2)", f.Citation().Ref)
	}
}

// NFPA 70 250.122(F), 2017 to 2023: in parallel every raceway has a bonding
// conductor of the table's full size.
func TestBondingInParallelIsNotCapped(t *testing.T) {
	for _, e := range tables.Editions() {
		if e.Code() != tables.NEC {
			continue
		}
		b, err := conductor.SelectBonding(e, tables.Copper, amps("1200"), conductor.Selection{Size: tables.Must(tables.ParseSize("1/0")), Sets: 8}, 0)
		require.NoError(t, err)
		assert.Equal(t, "3/0", b.Size.Name())
	}
}
