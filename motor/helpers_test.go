package motor_test

import (
	"errors"
	"strings"
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

// rests reports whether a figure rests on a rule or table.
func rests(f tables.Figure, ref string) bool {
	for _, c := range f.Citations() {
		if c.Ref == ref {
			return true
		}
	}
	return false
}

// cautioned reports a caution that cites the rule and speaks of the subject.
func cautioned(list []tables.Caution, ref, subject string) bool {
	for _, c := range list {
		if c.Cite.Ref == ref && strings.Contains(c.Text, subject) {
			return true
		}
	}
	return false
}

// leaves takes joined errors apart.
func leaves(err error) []error {
	if joined, ok := err.(interface{ Unwrap() []error }); ok {
		var all []error
		for _, e := range joined.Unwrap() {
			all = append(all, leaves(e)...)
		}
		return all
	}
	if err == nil {
		return nil
	}
	return []error{err}
}

// field returns the field path that a typed error names, "" for another error.
func field(err error) string {
	var input *tables.InputError
	var table *tables.NotTabulatedError
	var size *tables.NoSizeError
	switch {
	case errors.As(err, &input):
		return input.Field
	case errors.As(err, &table):
		return table.Field
	case errors.As(err, &size):
		return size.Field
	}
	return ""
}
