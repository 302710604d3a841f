package motor_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

var (
	necEditions = []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023}
	cecEditions = []tables.Edition{tables.CEC2021, tables.CEC2024}
	old         = []tables.Edition{tables.NEC2017, tables.NEC2020} // NEC before the 2023 rewording
	new2023     = []tables.Edition{tables.NEC2023}
)

// cage50 is a 50 hp, 460 V squirrel cage motor: 65 A by either code's table.
func cage50() motor.Motor {
	return motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460}
}

// marked returns cage50 with a nameplate of 61 A.
func marked50() motor.Motor {
	m := cage50()
	m.Nameplate.Amperes = motor.Amps("61")
	return m
}

// compressor is a 230 V three-phase hermetic motor-compressor.
func compressor(rated, selection, lockedRotor string) motor.Motor {
	m := motor.Motor{Kind: motor.Hermetic, Voltage: 230}
	m.Nameplate.Amperes = amps(rated)
	m.Nameplate.BranchSelection = amps(selection)
	m.Nameplate.LockedRotor = amps(lockedRotor)
	return m
}

// amps reads a current; "" is not given.
func amps(s string) tables.Current {
	if s == "" {
		return tables.Current{}
	}
	return motor.Amps(s)
}

// demand works out a demand that must not fail.
func demand(t *testing.T, m motor.Motor, e tables.Edition) motor.Demand {
	t.Helper()
	d, err := m.Demand(e)
	require.NoError(t, err)
	return d
}

// ref returns the rule or table that decided a figure, without its note.
func ref(f tables.Figure) string { return f.Citation().Ref }
