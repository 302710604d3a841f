package protection_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

const (
	nonTime   = protection.NonTimeDelayFuse
	timeDelay = protection.TimeDelayFuse
	breaker   = protection.InverseTimeBreaker
	magnetic  = protection.InstantaneousBreaker
)

var (
	necEditions = []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023}
	cecEditions = []tables.Edition{tables.CEC2021, tables.CEC2024}
	to2020      = []tables.Edition{tables.NEC2017, tables.NEC2020}
	from2023    = []tables.Edition{tables.NEC2023}
)

// cage50 is a 50 hp, 460 V squirrel cage motor: 65 A by either code's table.
func cage50() motor.Motor {
	return motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460}
}

// drawing is a 460 V motor whose nameplate current serves for every purpose under
// both codes: built for high torque, NEC 430.6(A)(1); by its rating, CEC.
func drawing(amps string) motor.Motor {
	m := cage50()
	m.Nameplate.Amperes, m.Nameplate.HighTorque = motor.Amps(amps), true
	return m
}

// compressor is a 230 V three-phase hermetic motor-compressor; "" is not marked.
func compressor(rated, selection, lockedRotor string) motor.Motor {
	m := motor.Motor{Kind: motor.Hermetic, Voltage: 230}
	m.Nameplate.Amperes = motor.Amps(rated)
	if selection != "" {
		m.Nameplate.BranchSelection = motor.Amps(selection)
	}
	if lockedRotor != "" {
		m.Nameplate.LockedRotor = motor.Amps(lockedRotor)
	}
	return m
}

// torque is a torque motor of the given locked-rotor current.
func torque(amps string) motor.Motor {
	return motor.Motor{Kind: motor.Torque, Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps(amps)}}
}

// as returns a motor of another kind.
func as(k motor.Kind, m motor.Motor) motor.Motor { m.Kind = k; return m }

// started returns a motor started another way.
func started(s motor.Starting, m motor.Motor) motor.Motor { m.Starting = s; return m }

func demand(t *testing.T, m motor.Motor, e tables.Edition) motor.Demand {
	t.Helper()
	d, err := m.Demand(e)
	require.NoError(t, err)
	return d
}

func overload(t *testing.T, e tables.Edition, m motor.Motor) protection.Overload {
	t.Helper()
	o, err := protection.SizeOverload(e, m, demand(t, m, e))
	require.NoError(t, err)
	return o
}

func device(t *testing.T, e tables.Edition, d tables.Device, m motor.Motor) protection.ShortCircuit {
	t.Helper()
	s, err := protection.SizeShortCircuit(e, d, m, demand(t, m, e))
	require.NoError(t, err)
	return s
}

func disconnect(t *testing.T, e tables.Edition, m motor.Motor) protection.Disconnect {
	t.Helper()
	return protection.SizeDisconnect(e, m, demand(t, m, e))
}

func controller(t *testing.T, e tables.Edition, m motor.Motor) protection.Controller {
	t.Helper()
	return protection.SizeController(e, m, demand(t, m, e))
}

// ref returns the rule or table that decided a figure, without its note.
func ref(f tables.Figure) string { return f.Citation().Ref }
