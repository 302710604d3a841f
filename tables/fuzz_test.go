package tables_test

import (
	"encoding"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// The fuzz targets hold one promise: an error is an *InputError and comes with
// the zero value; an accepted value formats to text that reads back as itself.

var oddities = []string{
	"", " ", "0", "-1", "+1", "1e9999", "٥", "65.", ".5", "65", "7.6 A", "7-1/2 hp", "7 1/2 HP", "1/3 hp", "0 hp", "7-3/2 hp", "30 kw",
	"999999999.999999", "0.0000001", "4/0", "0000", "#14", "No. 12", "250 MCM", "250 AWG", "4 kcmil", "16 mm2", "17", "-5 °C", "-0",
	"NEC-2023", "cec-2021", "NEC-2026", "\x00", "\xff hp", "250 \u212acmil",
	"42.7 m", "140ft", "25 ft m", "0 m", "1e3 m", "9 М",
}

func fuzzParse[T interface {
	encoding.TextMarshaler
	IsZero() bool
}](f *testing.F, parse func(string) (T, error)) {
	for _, s := range oddities {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, s string) {
		v, err := parse(s)
		if err != nil {
			var zero T
			var input *tables.InputError
			require.ErrorAs(t, err, &input)
			require.Equal(t, zero, v)
			require.LessOrEqual(t, len(input.Value), 43)
			return
		}
		require.False(t, v.IsZero(), "%q", s)
		text, err := v.MarshalText()
		require.NoError(t, err)
		again, err := parse(string(text))
		require.NoError(t, err, "%q", text)
		require.Equal(t, v, again)
		twice, err := again.MarshalText()
		require.NoError(t, err)
		require.Equal(t, string(text), string(twice))
	})
}

func FuzzParsePower(f *testing.F)       { fuzzParse(f, tables.ParsePower) }
func FuzzParseCurrent(f *testing.F)     { fuzzParse(f, tables.ParseCurrent) }
func FuzzParseTemperature(f *testing.F) { fuzzParse(f, tables.ParseTemperature) }
func FuzzParseLength(f *testing.F)      { fuzzParse(f, tables.ParseLength) }

// A sized is a Size that tells whether it is given, as the others do.
type sized struct{ tables.Size }

func (s sized) IsZero() bool { return s.Size == 0 }

func FuzzParseSize(f *testing.F) {
	fuzzParse(f, func(s string) (sized, error) {
		size, err := tables.ParseSize(s)
		return sized{size}, err
	})
}

// An issue is an Edition that tells whether it is given.
type issue struct{ tables.Edition }

func (i issue) IsZero() bool { return i.Edition == 0 }

func FuzzParseEdition(f *testing.F) {
	fuzzParse(f, func(s string) (issue, error) {
		e, err := tables.ParseEdition(s)
		return issue{e}, err
	})
}
