package tables_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func TestParsePower(t *testing.T) {
	for in, want := range map[string]string{ // "" for an error
		"40 hp":            "40 hp",
		"40hp":             "40 hp",
		"40 HP":            "40 hp",
		" 40  Hp ":         "40 hp",
		"7-1/2 hp":         "7-1/2 hp",
		"7 1/2 HP":         "7-1/2 hp",
		"7- 1/2 hp":        "7-1/2 hp",
		"7.5 hp":           "7-1/2 hp",
		"7.50 hp":          "7-1/2 hp",
		"7-2/4 hp":         "7-1/2 hp",
		"1/3 hp":           "1/3 hp",
		"2/6 hp":           "1/3 hp",
		"0-1/2 hp":         "1/2 hp",
		"0.5 hp":           "1/2 hp",
		".5 hp":            "1/2 hp",
		"0.25 hp":          "1/4 hp",
		"0.333333 hp":      "0.333333 hp",
		"1/128 hp":         "1/128 hp",
		"1-1/64 hp":        "1.015625 hp",
		"30 kW":            "30 kW",
		"30 kw":            "30 kW",
		"0.37 kW":          "0.37 kW",
		"7.5kW":            "7.5 kW",
		"1/3 kW":           "1/3 kW",
		"0.125 kW":         "0.125 kW",
		"999999999 hp":     "999999999 hp",
		"":                 "",
		"hp":               "",
		" hp":              "",
		"kW":               "",
		"40":               "",
		"40 W":             "",
		"40 hp hp":         "",
		"0 hp":             "",
		"0/2 hp":           "",
		"0-0/2 hp":         "",
		"-1 hp":            "",
		"-1/2 hp":          "",
		"7--1/2 hp":        "",
		"7-3/2 hp":         "",
		"3/2 hp":           "",
		"2/2 hp":           "",
		"1/0 hp":           "",
		"7-1/ hp":          "",
		"7-/2 hp":          "",
		"1/2/3 hp":         "",
		"7.5-1/2 hp":       "",
		"7-1.5/2 hp":       "",
		"1/256 hp":         "",
		"+1 hp":            "",
		"1e9999 hp":        "",
		"٥ hp":             "",
		"65. hp":           "",
		"1000000000 hp":    "",
		"0.0000001 hp":     "",
		"seven hp":         "",
		"7\u00bd hp":       "", // the single character ½
		"40 horsepower":    "",
		"40 hp at 1800":    "",
		"40\u00a0hp\u00a0": "40 hp", // no-break spaces
	} {
		t.Run(in, func(t *testing.T) {
			p, err := tables.ParsePower(in)
			assert.Equal(t, want, p.String())
			if want != "" {
				require.NoError(t, err)
				assert.False(t, p.IsZero())
				again, err := tables.ParsePower(p.String())
				require.NoError(t, err)
				assert.Equal(t, p, again)
				return
			}
			var input *tables.InputError
			require.ErrorAs(t, err, &input)
			assert.Equal(t, tables.Power{}, p)
			assert.Equal(t, "power", input.Field)
		})
	}
}

func TestParseHPAndKW(t *testing.T) {
	p, err := tables.ParseHP("7-1/2")
	require.NoError(t, err)
	assert.True(t, p.IsHP())
	assert.Equal(t, "7-1/2", p.Text())
	assert.Equal(t, tables.Horsepower, p.Unit())
	q, err := tables.ParseKW("7.5")
	require.NoError(t, err)
	assert.False(t, q.IsHP())
	assert.Equal(t, "7.5", q.Text())
	assert.Equal(t, tables.Kilowatt, q.Unit())
	assert.NotEqual(t, p, q, "kept in its own unit")
	for _, s := range []string{"", "7-1/2 hp", "x"} {
		_, err = tables.ParseHP(s)
		assert.ErrorAs(t, err, new(*tables.InputError), s)
		_, err = tables.ParseKW(s)
		assert.ErrorAs(t, err, new(*tables.InputError), s)
	}
}

func TestPowerZero(t *testing.T) {
	var p tables.Power
	assert.True(t, p.IsZero())
	assert.False(t, p.IsHP())
	assert.Empty(t, p.Text())
	assert.Empty(t, p.String())
	assert.Equal(t, -1, p.Cmp(tables.Must(tables.ParseHP("1/255"))))
	assert.Zero(t, p.Cmp(tables.Power{}))
}

func TestPowerCmp(t *testing.T) {
	rising := []string{"0.000001", "1/6", "1/4", "0.333333", "1/3", "1/2", "1", "7-1/2", "7.500001", "7.6", "500", "999999999"}
	for i, a := range rising {
		for j, b := range rising {
			want := 0
			if i < j {
				want = -1
			} else if i > j {
				want = 1
			}
			assert.Equal(t, want, hp(a).Cmp(hp(b)), "%s ? %s", a, b)
		}
	}
	assert.True(t, hp("100").AtMost(100))
	assert.True(t, hp("1/3").AtMost(1))
	assert.False(t, hp("100.000001").AtMost(100))
	assert.True(t, hp("7.5") == hp("7-1/2"), "powers of one number are ==")
}
