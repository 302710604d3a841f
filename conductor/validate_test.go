package conductor_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// Each bad value of each field, alone: one *tables.InputError that names it.
func TestValidateFields(t *testing.T) {
	for _, tt := range []struct {
		field, name string
		set         func(*conductor.Wiring)
	}{
		{"wiring.material", "unknown", func(w *conductor.Wiring) { w.Material = 9 }},
		{"wiring.insulation", "unknown", func(w *conductor.Wiring) { w.Insulation = "PVC" }},
		{"wiring.insulation", "long text", func(w *conductor.Wiring) { w.Insulation = strings.Repeat("é", 5000) }},
		{"wiring.location", "unknown", func(w *conductor.Wiring) { w.Location = 3 }},
		{"wiring.run", "unknown", func(w *conductor.Wiring) { w.Run = 3 }},
		{"wiring.ambient", "below -60", func(w *conductor.Wiring) { w.Ambient = celsius("-60.01") }},
		{"wiring.ambient", "above 150", func(w *conductor.Wiring) { w.Ambient = celsius("150.01") }},
		{"wiring.ambient", "absurd", func(w *conductor.Wiring) { w.Ambient = celsius("999999999") }},
		{"wiring.conductors", "negative", func(w *conductor.Wiring) { w.Conductors = -1 }},
		{"wiring.conductors", "above 1000", func(w *conductor.Wiring) { w.Conductors = 1001 }},
		{"wiring.termination", "negative", func(w *conductor.Wiring) { w.Termination = -75 }},
		{"wiring.termination", "70", func(w *conductor.Wiring) { w.Termination = 70 }},
		{"wiring.termination", "105", func(w *conductor.Wiring) { w.Termination = 105 }},
		{"wiring.sets", "negative", func(w *conductor.Wiring) { w.Sets = -1 }},
		{"wiring.sets", "13", func(w *conductor.Wiring) { w.Sets = 13 }},
		{"wiring.reading", "unknown", func(w *conductor.Wiring) { w.Reading = 2 }},
	} {
		for _, e := range tables.Editions() {
			t.Run(tt.field+" "+tt.name+" "+e.String(), func(t *testing.T) {
				var w conductor.Wiring
				require.NoError(t, w.Validate(e))
				tt.set(&w)
				list := tables.Faults(w.Validate(e))
				require.Len(t, list, 1, "%v", w.Validate(e))
				var input *tables.InputError
				require.ErrorAs(t, list[0], &input)
				assert.Equal(t, tt.field, input.Field)
				assert.NotEmpty(t, input.Want)
				assert.Less(t, len(input.Value), 60)
				s, err := w.Select(e, load("10"))
				assert.Error(t, err)
				assert.Equal(t, conductor.Selection{}, s)
			})
		}
	}
}

// The ends of each range are allowed, as far as the tables go.
func TestValidateEdges(t *testing.T) {
	for name, w := range map[string]conductor.Wiring{
		"-60 °C":          {Ambient: celsius("-60")},
		"1000 conductors": {Conductors: 1000}, "twelve sets": {Sets: conductor.MaxSets}, "0 °C": {Ambient: celsius("0")},
		"60 °C": {Termination: 60}, "90 °C": {Termination: 90}, "wet aluminum cable": {Material: conductor.Aluminum, Location: tables.Wet, Run: tables.InCable},
	} {
		for _, e := range tables.Editions() {
			assert.NoError(t, w.Validate(e), name)
		}
	}
}

// An ambient within the range that the insulation does not allow is told apart.
func TestValidateAmbient(t *testing.T) {
	for _, e := range tables.Editions() {
		var table *tables.NotTabulatedError
		require.ErrorAs(t, conductor.Wiring{Ambient: celsius("150")}.Validate(e), &table)
		assert.Equal(t, "wiring.ambient", table.Field)
		assert.NoError(t, conductor.Wiring{Ambient: celsius("70")}.Validate(e), "the last row for 75 °C wire")
	}
}

// The rooftop adder is the NEC's alone.
func TestRooftopCEC(t *testing.T) {
	w := conductor.Wiring{Rooftop: true}
	for _, e := range cecEditions {
		assert.Equal(t, "wiring.rooftop", tables.FieldOf(w.Validate(e)))
	}
	for _, e := range necEditions {
		assert.NoError(t, w.Validate(e))
	}
}

// Everything that is wrong with one wiring comes back together.
func TestValidateJoins(t *testing.T) {
	w := conductor.Wiring{Material: 9, Insulation: "PVC", Ambient: celsius("151"), Rooftop: true, Conductors: -3, Termination: 77, Sets: 99, Reading: 7}
	want := []string{"wiring.material", "wiring.insulation", "wiring.ambient", "wiring.conductors", "wiring.termination", "wiring.sets", "wiring.reading"}
	for _, e := range tables.Editions() {
		expect := want
		if e.Code() == tables.CEC {
			expect = append([]string{"wiring.rooftop"}, want...)
		}
		_, err := w.Select(e, load("10"))
		var got []string
		for _, one := range tables.Faults(err) {
			var input *tables.InputError
			require.ErrorAs(t, one, &input)
			got = append(got, input.Field)
		}
		assert.ElementsMatch(t, expect, got)
	}
}

func TestSelectNeedsAnEdition(t *testing.T) {
	for _, e := range []tables.Edition{0, 99} {
		_, err := conductor.Wiring{}.Select(e, load("10"))
		assert.Equal(t, "edition", tables.FieldOf(err))
	}
}

func TestReadingText(t *testing.T) {
	for text, want := range map[string]conductor.Reading{
		"": conductor.CorrectTermination, "correct_termination": conductor.CorrectTermination,
		"correct_insulation": conductor.CorrectInsulation, "Correct Insulation": conductor.CorrectInsulation, "correct-insulation": conductor.CorrectInsulation,
	} {
		got := conductor.CorrectInsulation
		require.NoError(t, got.UnmarshalText([]byte(text)), text)
		assert.Equal(t, want, got)
	}
	got := conductor.CorrectInsulation
	assert.Equal(t, "wiring.reading", tables.FieldOf(got.UnmarshalText([]byte("both"))))
	assert.Zero(t, got, "an error resets the value")
	printed, err := conductor.CorrectInsulation.MarshalText()
	require.NoError(t, err)
	assert.Equal(t, "correct_insulation", string(printed))
	assert.Empty(t, conductor.Reading(9).String())
}
