package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// difference returns the values that a comparison has for a figure.
func difference(t *testing.T, x motorcircuit.Comparison, what string) motorcircuit.Difference {
	t.Helper()
	for _, d := range x.Differences {
		if d.What == what {
			return d
		}
	}
	t.Fatalf("no difference in %s: %v", what, x)
	return motorcircuit.Difference{}
}

// NFPA 70-2023 240.6(A) has a 10 A breaker, which 2020 has not; the rule for the
// next size up moved from Exception No. 1 to 430.52(C)(1)(a).
func TestCompareEditions(t *testing.T) {
	c := motorcircuit.Circuit{Tag: "F-12", Device: protection.InverseTimeBreaker, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("2"), Voltage: 460}}
	x, err := motorcircuit.Compare(c, tables.NEC2020, tables.NEC2023)
	require.NoError(t, err)
	d := difference(t, x, "standard rating")
	assert.Equal(t, []string{"15 A", "10 A"}, d.Values)
	assert.Equal(t, "NFPA 70-2020 430.52(C)(1) Exception No. 1", d.Cites[0].String())
	assert.Equal(t, "NFPA 70-2023 430.52(C)(1)(a)", d.Cites[1].String())
	assert.Contains(t, x.String(), "\n    NEC-2020  15 A [430.52(C)(1) Exception No. 1]\n    NEC-2023  10 A [430.52(C)(1)(a)]\n")
}

// NEC 430.32(C) has a second step for overload, the CEC none; the CEC does not
// round a device up: Rule 28-200(3).
func TestCompareCodes(t *testing.T) {
	c := motorcircuit.Circuit{Device: protection.InverseTimeBreaker, Wiring: conductor.Wiring{Termination: 75},
		Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("7-1/2"), Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("11")}}}
	x, err := motorcircuit.Compare(c, tables.NEC2023, tables.CEC2024)
	require.NoError(t, err)
	assert.Equal(t, []string{"14.3 A", ""}, difference(t, x, "greatest overload setting if the motor will not start").Values)
	assert.Equal(t, []string{"30 A", "25 A"}, difference(t, x, "standard rating").Values)
	require.Len(t, x.Results, 2)
}

// An edition differs from itself in nothing, and the values stand in the order of
// the editions.
func TestCompareWithItself(t *testing.T) {
	for _, e := range tables.Editions() {
		c := pumpRun(e)
		x, err := motorcircuit.Compare(c, e, e, e)
		require.NoError(t, err)
		assert.Empty(t, x.Differences)
		assert.Contains(t, x.String(), "No figure differs")
	}
	c := pumpRun(0)
	forth, err := motorcircuit.Compare(c, tables.NEC2017, tables.CEC2021)
	require.NoError(t, err)
	back, err := motorcircuit.Compare(c, tables.CEC2021, tables.NEC2017)
	require.NoError(t, err)
	assert.Len(t, back.Differences, len(forth.Differences))
	for _, d := range forth.Differences {
		values := make([]string, 2)
		for _, other := range back.Differences {
			if other.Section == d.Section && other.What == d.What {
				values = other.Values
			}
		}
		assert.Equal(t, d.Values, []string{values[1], values[0]}, d.What)
	}
}

// The windings of a multispeed motor do not hide one another: NEC 430.22(B) and
// CEC Rule 28-808 make a run to each, of 28 A and 12 A × 125 percent.
func TestCompareWindings(t *testing.T) {
	c := motorcircuit.Circuit{Wiring: conductor.Wiring{Termination: 75}, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("20"), Voltage: 460,
		Nameplate: motor.Nameplate{Windings: []motor.Winding{{Amperes: motor.Amps("28")}, {Amperes: motor.Amps("12")}}}}}
	x, err := motorcircuit.Compare(c, tables.NEC2023, tables.CEC2024)
	require.NoError(t, err)
	var got []string
	for _, d := range x.Differences {
		if d.Section == motorcircuit.WindingConductors.String() && d.What == "conductors" {
			got = append(got, d.Values...)
		}
	}
	assert.Equal(t, []string{"10 AWG copper THWN, raceway, dry", "10 AWG copper RW75, raceway, dry", "14 AWG copper THWN, raceway, dry", "14 AWG copper RW75, raceway, dry"}, got)
}

func TestCompareErrors(t *testing.T) {
	c := pumpRun(0)
	_, err := motorcircuit.Compare(c, tables.NEC2023)
	assert.ErrorContains(t, err, "editions")
	c.Wiring.Insulation = "RW90"
	_, err = motorcircuit.Compare(c, tables.NEC2020, tables.CEC2024, 9)
	var under *motorcircuit.EditionError
	require.ErrorAs(t, err, &under)
	assert.Equal(t, tables.NEC2020, under.Edition)
	assert.ErrorContains(t, err, "wiring.insulation")
	assert.ErrorContains(t, err, "edition is not given")
}
