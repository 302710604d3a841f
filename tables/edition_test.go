package tables_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func TestEditions(t *testing.T) {
	want := []struct {
		e              tables.Edition
		text, standard string
		code           tables.Code
		family         string
		gap            bool
	}{
		{tables.NEC2017, "NEC-2017", "NFPA 70-2017", tables.NEC, "NEC", true},
		{tables.NEC2020, "NEC-2020", "NFPA 70-2020", tables.NEC, "NEC", true},
		{tables.NEC2023, "NEC-2023", "NFPA 70-2023", tables.NEC, "NEC", false},
		{tables.CEC2021, "CEC-2021", "CSA C22.1:21", tables.CEC, "CEC", true},
		{tables.CEC2024, "CEC-2024", "CSA C22.1:24", tables.CEC, "CEC", true},
	}
	require.Len(t, tables.Editions(), len(want))
	for i, w := range want {
		assert.Equal(t, w.e, tables.Editions()[i])
		assert.Equal(t, w.text, w.e.String())
		assert.Equal(t, w.standard, w.e.Standard())
		assert.Equal(t, w.code, w.e.Code())
		assert.Equal(t, w.family, w.e.Code().String())
		assert.Equal(t, w.gap, w.e.Gap() != "")
		assert.True(t, w.e.IsValid())
		assert.NoError(t, w.e.Check())
		got, err := tables.ParseEdition(w.text)
		require.NoError(t, err)
		assert.Equal(t, w.e, got)
		text, err := w.e.MarshalText()
		require.NoError(t, err)
		assert.Equal(t, w.text, string(text))
	}
	assert.Empty(t, tables.Code(0).String())
}

func TestParseEditionRefuses(t *testing.T) {
	for _, s := range []string{"nec-2023", "Nec-2023", "NEC-2023"} {
		e, err := tables.ParseEdition(s)
		require.NoError(t, err)
		assert.Equal(t, tables.NEC2023, e)
	}
	for _, s := range []string{"", " ", "NEC", "2023", "NEC 2023", "NEC-2023 ", "NEC-2026", "NEC-2014", "CEC-2018", "IEC-60364", "NFPA 70-2023", "1e9999", "٥"} {
		e, err := tables.ParseEdition(s)
		var input *tables.InputError
		require.ErrorAs(t, err, &input, s)
		assert.Zero(t, e)
		assert.Equal(t, "edition", input.Field)
		assert.Equal(t, "one of NEC-2017, NEC-2020, NEC-2023, CEC-2021, CEC-2024", input.Want)
	}
	e := tables.NEC2023
	assert.Error(t, e.UnmarshalText([]byte("NEC-1900")))
	assert.Zero(t, e, "an error comes with the zero value")
}

// TestNoEdition: without an edition no lookup answers.
func TestNoEdition(t *testing.T) {
	for _, e := range []tables.Edition{0, 6, 255} {
		assert.False(t, e.IsValid())
		assert.Empty(t, e.String())
		assert.Empty(t, e.Standard())
		assert.Empty(t, e.Gap())
		assert.Zero(t, e.Code())
		check := func(f tables.Figure, err error) {
			t.Helper()
			assert.True(t, f.IsZero())
			assert.EqualError(t, err, "edition is not given: want one of NEC-2017, NEC-2020, NEC-2023, CEC-2021, CEC-2024")
		}
		check(tables.Figure{}, e.Check())
		check(e.FullLoadCurrent(tables.InductionTable, hp("50"), 460))
		check(e.LockedRotorCurrent(3, hp("50"), 460))
		check(e.DutyPercent(tables.ShortTime, 5))
		check(e.DevicePercent(tables.DeviceQuery{Device: tables.TimeDelayFuse}))
		check(e.OverloadUnits(3))
		check(e.SupplyInsulation("B", false))
		check(e.AmbientFactor(90, tables.Must(tables.ParseTemperature("40"))))
		check(e.CountFactor(3))
		check(e.SpacingFactor(3))
		_, err := e.Ampacities(tables.InRaceway, tables.Copper)
		assert.ErrorAs(t, err, new(*tables.InputError))
		_, err = e.Insulation("THHN")
		assert.ErrorAs(t, err, new(*tables.InputError))
		_, err = e.PowerAtOrAbove(tables.InductionTable, 460, amps("65"))
		assert.ErrorAs(t, err, new(*tables.InputError))
		_, err = e.PowerAtOrAboveLockedRotor(3, 460, amps("65"))
		assert.ErrorAs(t, err, new(*tables.InputError))
		_, err = e.MotorPowers(tables.InductionTable, 460)
		assert.ErrorAs(t, err, new(*tables.InputError))
		assert.Empty(t, e.Insulations())
		assert.Empty(t, e.StartCeilings(tables.TimeDelayFuse, amps("65")))
		assert.Empty(t, e.StandardRatings(tables.TimeDelayFuse))
		assert.True(t, e.SmallConductorLimit(tables.Copper, tables.Sizes()[2]).IsZero())
		full, rotor, floor := e.InstantaneousCaps(false, hp("50"))
		assert.True(t, full.IsZero() && rotor.IsZero() && floor.IsZero())
	}
}

func TestCitation(t *testing.T) {
	assert.Equal(t, "NFPA 70-2023 430.22", tables.Citation{Edition: tables.NEC2023, Ref: "430.22"}.String())
	assert.Equal(t, "CSA C22.1:21 Rule 28-106(1) (as read)", tables.Citation{Edition: tables.CEC2021, Ref: "Rule 28-106(1)", Note: "as read"}.String())
	assert.Equal(t, "physics", tables.Citation{Ref: "physics"}.String())
	assert.True(t, tables.Citation{}.IsZero())
	text, err := tables.Citation{Edition: tables.NEC2020, Ref: "240.6(A)"}.MarshalText()
	require.NoError(t, err)
	assert.Equal(t, "NFPA 70-2020 240.6(A)", string(text))
	rule := tables.Rule{Ref: "a", Moved: []tables.Move{{From: tables.NEC2020, Ref: "b"}, {From: tables.NEC2023, Ref: "c"}}}
	for e, want := range map[tables.Edition]string{tables.NEC2017: "a", tables.NEC2020: "b", tables.NEC2023: "c"} {
		assert.Equal(t, want, rule.In(e).Ref)
	}
	assert.True(t, (*tables.Rule)(nil).In(tables.NEC2023).IsZero())
	assert.Equal(t, "A", tables.MarkA.String())
	assert.Equal(t, "C", tables.MarkC.String())
}
