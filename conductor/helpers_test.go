package conductor_test

import (
	"errors"
	"strings"
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

// cautioned reports a caution that cites the rule and speaks of the subject.
func cautioned(list []tables.Caution, ref, subject string) bool {
	for _, c := range list {
		if c.Cite.Ref == ref && strings.Contains(c.Text, subject) {
			return true
		}
	}
	return false
}

// rests reports whether a figure rests on a rule or table.
func rests(f tables.Figure, ref string) bool {
	for _, c := range f.Citations() {
		if c.Ref == ref {
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
	var none *tables.NoSizeError
	switch {
	case errors.As(err, &input):
		return input.Field
	case errors.As(err, &table):
		return table.Field
	case errors.As(err, &none):
		return none.Field
	}
	return ""
}
