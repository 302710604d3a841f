package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

var (
	necEditions = []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023}
	cecEditions = []tables.Edition{tables.CEC2021, tables.CEC2024}
)

// load asks for amperes in a circuit of three conductors.
func load(amps string) conductor.Load {
	return conductor.Load{Ampacity: tables.Must(tables.ParseCurrent(amps)).Figure("least ampacity"), Count: 3}
}

// celsius reads a temperature; "" is not given.
func celsius(s string) tables.Temperature {
	if s == "" {
		return tables.Temperature{}
	}
	return tables.Must(tables.ParseTemperature(s))
}

func size(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }

// chosen selects conductors, which must not fail.
func chosen(t *testing.T, w conductor.Wiring, e tables.Edition, l conductor.Load) conductor.Selection {
	t.Helper()
	s, err := w.Select(e, l)
	require.NoError(t, err)
	return s
}
