package tables_test

import (
	"encoding/json"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func TestParseQuantities(t *testing.T) {
	current := func(s string) (string, bool, error) {
		q, err := tables.ParseCurrent(s)
		return q.String(), q.IsZero(), err
	}
	temperature := func(s string) (string, bool, error) {
		q, err := tables.ParseTemperature(s)
		return q.String(), q.IsZero(), err
	}
	ratio := func(s string) (string, bool, error) {
		q, err := tables.ParseRatio(s)
		return q.String(), q.IsZero(), err
	}
	for _, tt := range []struct {
		name  string
		parse func(string) (string, bool, error)
		in    string
		want  string // "" for an error
	}{
		{"current", current, "65", "65 A"},
		{"current", current, "7.60 A", "7.6 A"},
		{"current", current, "7.6A", "7.6 A"},
		{"current", current, " 7.6 ", "7.6 A"},
		{"current", current, ".5", "0.5 A"},
		{"current", current, "0", "0 A"},
		{"current", current, "007", "7 A"},
		{"current", current, "999999999.999999", "999999999.999999 A"},
		{"current", current, "", ""},
		{"current", current, "A", ""},
		{"current", current, "-1", ""},
		{"current", current, "+1", ""},
		{"current", current, "1e9999", ""},
		{"current", current, "٥", ""},
		{"current", current, "65.", ""},
		{"current", current, "1,5", ""},
		{"current", current, "65 V", ""},
		{"current", current, "65 A A", ""},
		{"current", current, "NaN", ""},
		{"current", current, "1000000000", ""},
		{"current", current, "0.0000001", ""},
		{"temperature", temperature, "40", "40 °C"},
		{"temperature", temperature, "-5 °C", "-5 °C"},
		{"temperature", temperature, "-0", "0 °C"},
		{"temperature", temperature, "--5", ""},
		{"temperature", temperature, "- 5", ""},
		{"temperature", temperature, "−5", ""},
		{"temperature", temperature, "104 °F", ""},
		{"temperature", temperature, "", ""},
		{"ratio", ratio, "1.150", "1.15"},
		{"ratio", ratio, "0.9", "0.9"},
		{"ratio", ratio, "-0.9", ""},
		{"ratio", ratio, "1.15 A", ""},
		{"ratio", ratio, "", ""},
	} {
		t.Run(tt.name+" "+tt.in, func(t *testing.T) {
			got, absent, err := tt.parse(tt.in)
			assert.Equal(t, tt.want, got)
			assert.Equal(t, tt.want == "", absent)
			if tt.want != "" {
				assert.NoError(t, err)
				return
			}
			var input *tables.InputError
			require.ErrorAs(t, err, &input)
			assert.Equal(t, tt.in, input.Value)
			assert.Contains(t, input.Want, "a plain decimal")
		})
	}
}

func TestQuantityErrorText(t *testing.T) {
	_, err := tables.ParseCurrent("1e5")
	assert.EqualError(t, err, `amperes "1e5": want a plain decimal in amperes`)
	_, err = tables.ParseTemperature("hot")
	assert.EqualError(t, err, `degrees Celsius "hot": want a plain decimal in degrees Celsius`)
	_, err = tables.ParseRatio("1.15151515")
	assert.EqualError(t, err, `ratio "1.15151515": want a plain decimal such as 0.93, with at most nine digits before the point and six after`)
	_, err = tables.ParseCurrent(strings.Repeat("9", 1000))
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
	assert.Equal(t, strings.Repeat("9", 40)+"...", input.Value, "a long input is shortened")
	_, err = tables.ParseCurrent(strings.Repeat("é", 30))
	assert.ErrorContains(t, err, strings.Repeat("é", 20)+"...", "cut between characters")
	_, err = tables.ParseCurrent("x" + strings.Repeat("é", 30))
	assert.ErrorContains(t, err, "x"+strings.Repeat("é", 19)+"...", "a split character is dropped")
}

// TestQuantityNotGiven: an ambient that is not given is not 0 °C.
func TestQuantityNotGiven(t *testing.T) {
	var none tables.Temperature
	zero := tables.Must(tables.ParseTemperature("0"))
	assert.True(t, none.IsZero())
	assert.False(t, zero.IsZero())
	assert.False(t, none.Equal(zero))
	assert.False(t, zero.Equal(none))
	assert.True(t, none.Equal(tables.Temperature{}))
	assert.Zero(t, none.Cmp(zero), "Cmp compares the numbers alone")
	assert.True(t, none.Decimal().Equal(zero.Decimal()))
	assert.Empty(t, none.String())
	assert.Equal(t, "0 °C", zero.String())
	assert.True(t, none.Figure("ambient").IsZero())
	assert.Equal(t, "0 °C", zero.Figure("ambient").String())
}

func TestQuantityCompare(t *testing.T) {
	a, b := tables.Must(tables.ParseCurrent("65")), tables.Must(tables.ParseCurrent("65.00"))
	assert.True(t, a.Equal(b))
	assert.Zero(t, a.Cmp(b))
	c := tables.Must(tables.ParseCurrent("65.000001"))
	assert.Equal(t, -1, a.Cmp(c))
	assert.Equal(t, 1, c.Cmp(a))
	assert.False(t, a.Equal(c))
	cold := tables.Must(tables.ParseTemperature("-5"))
	assert.Equal(t, -1, cold.Cmp(tables.Must(tables.ParseTemperature("-4.5"))))
	assert.Equal(t, "-5", cold.Decimal().String())
}

func TestQuantityFigure(t *testing.T) {
	f := tables.Must(tables.ParseCurrent("10.4")).Figure("nameplate current")
	assert.Equal(t, "nameplate current", f.Name())
	assert.Equal(t, "10.4 A", f.String())
	assert.Equal(t, tables.Ampere, f.Unit())
	assert.Equal(t, tables.Given, f.Op())
	assert.Equal(t, "as given", f.How())
	assert.True(t, f.Citation().IsZero())
	assert.Empty(t, f.Citations())
}

func TestMust(t *testing.T) {
	assert.Equal(t, "10.4 A", tables.Must(tables.ParseCurrent("10.4")).String())
	assert.Panics(t, func() { tables.Must(tables.ParseCurrent("1O.4")) })
}

type jsonValues struct {
	Amperes tables.Current     `json:"amperes,omitzero"`
	Ambient tables.Temperature `json:"ambient,omitzero"`
	Factor  tables.Ratio       `json:"factor,omitzero"`
	Power   tables.Power       `json:"power,omitzero"`
	Size    tables.Size        `json:"size,omitzero"`
	Edition tables.Edition     `json:"edition,omitzero"`
	Device  tables.Device      `json:"device,omitzero"`
	Duty    tables.Duty        `json:"duty,omitzero"`
}

// TestJSONRoundTrip: what is written is read back, and "not given" is left out.
func TestJSONRoundTrip(t *testing.T) {
	for _, text := range []string{
		`{}`,
		`{"amperes":"10.4 A","ambient":"-5 °C","factor":"1.15","power":"7-1/2 hp","size":"1/0 AWG","edition":"NEC-2023","device":"time_delay_fuse","duty":"short_time"}`,
		`{"amperes":"0 A","ambient":"0 °C","factor":"0","power":"0.37 kW","size":"2.5 mm²","edition":"CEC-2021"}`,
	} {
		var v jsonValues
		require.NoError(t, json.Unmarshal([]byte(text), &v))
		again, err := json.Marshal(v)
		require.NoError(t, err)
		assert.Equal(t, text, string(again))
	}
	full := jsonValues{Amperes: tables.Must(tables.ParseCurrent("1")), Ambient: tables.Must(tables.ParseTemperature("1")),
		Factor: tables.Must(tables.ParseRatio("1")), Power: tables.Must(tables.ParseHP("1")), Size: tables.Sizes()[0]}
	require.NoError(t, json.Unmarshal([]byte(`{"amperes":"","ambient":"","factor":"","power":"","size":"","edition":""}`), &full))
	assert.Equal(t, jsonValues{}, full, "no text is not given")
	for field, bad := range map[string]string{"amperes": "x", "ambient": "x", "factor": "x", "power": "7", "size": "17", "edition": "NEC-1999", "device": "relay", "duty": "always"} {
		v := jsonValues{Power: tables.Must(tables.ParseHP("1")), Edition: tables.NEC2017}
		err := json.Unmarshal([]byte(`{"`+field+`":"`+bad+`"}`), &v)
		assert.ErrorAs(t, err, new(*tables.InputError), field)
	}
}
