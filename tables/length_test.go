package tables_test

import (
	"encoding/json"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func length(s string) tables.Length { return tables.Must(tables.ParseLength(s)) }

// A foot is 0.3048 m exactly (international foot).
func TestParseLength(t *testing.T) {
	for in, want := range map[string]struct{ text, metres string }{
		"42.7 m": {"42.7 m", "42.7"}, "42.7m": {"42.7 m", "42.7"}, " 140 ft ": {"140 ft", "42.672"}, "140ft": {"140 ft", "42.672"},
		"0 m": {"0 m", "0"}, "0.001 ft": {"0.001 ft", "0.0003048"}, "25 ft": {"25 ft", "7.62"}, "10 ft": {"10 ft", "3.048"}, "7.50 m": {"7.5 m", "7.5"},
	} {
		l, err := tables.ParseLength(in)
		require.NoError(t, err, in)
		assert.Equal(t, want.text, l.String(), in)
		assert.Equal(t, want.metres, l.Metres().String(), in)
		assert.False(t, l.IsZero(), in)
	}
	for _, bad := range []string{"", " ", "m", "ft", "10", "10 in", "10 mm", "10 km", "-1 m", "1e3 m", "1,5 m", "ten ft", "10 m ft", "10 ft m", "٥ m", "65. m", "10 M",
		"10 '", strings.Repeat("9", 100) + " m"} {
		l, err := tables.ParseLength(bad)
		var input *tables.InputError
		if assert.ErrorAs(t, err, &input, bad) {
			assert.Equal(t, "length", input.Field)
			assert.Less(t, len(input.Error()), 200)
		}
		assert.Equal(t, tables.Length{}, l, bad)
	}
}

func TestLengthCompares(t *testing.T) {
	assert.Equal(t, 0, length("10 ft").Cmp(length("3.048 m")))
	assert.True(t, length("10 ft").Equal(length("3.048 m")))
	assert.Equal(t, 1, length("10 ft").Cmp(length("3 m")))
	assert.Equal(t, -1, length("24.6 ft").Cmp(length("7.5 m")))
	assert.True(t, tables.Length{}.IsZero())
	assert.False(t, tables.Length{}.Equal(length("0 m")), "not given is not nothing")
	assert.Empty(t, tables.Length{}.String())
}

// Within holds each unit to the figure that the code prints for it: 10 ft (3.0 m),
// 25 ft (7.5 m), 100 ft (30 m).
func TestLengthWithin(t *testing.T) {
	for _, tt := range []struct {
		feet, tenths int64
		in, out      []string
	}{
		{10, 30, []string{"0 m", "3 m", "3.0 m", "9.99 ft", "10 ft"}, []string{"3.01 m", "3.048 m", "10.01 ft"}},
		{25, 75, []string{"7.5 m", "25 ft"}, []string{"7.501 m", "7.62 m", "25.001 ft"}},
		{100, 300, []string{"30 m", "100 ft"}, []string{"30.001 m", "100.1 ft"}},
	} {
		for _, l := range tt.in {
			assert.True(t, length(l).Within(tt.feet, tt.tenths), "%s within %d ft", l, tt.feet)
		}
		for _, l := range tt.out {
			assert.False(t, length(l).Within(tt.feet, tt.tenths), "%s within %d ft", l, tt.feet)
		}
	}
	assert.False(t, tables.Length{}.Within(10, 30), "one that is not given is within nothing")
}

func TestLengthText(t *testing.T) {
	type run struct {
		Length tables.Length `json:"length,omitzero"`
	}
	b, err := json.Marshal(run{length("140 ft")})
	require.NoError(t, err)
	assert.JSONEq(t, `{"length":"140 ft"}`, string(b))
	b, err = json.Marshal(run{})
	require.NoError(t, err)
	assert.JSONEq(t, `{}`, string(b))
	var back run
	require.NoError(t, json.Unmarshal([]byte(`{"length":"7.5 m"}`), &back))
	assert.Equal(t, "7.5 m", back.Length.String())
	require.NoError(t, back.Length.UnmarshalText(nil))
	assert.True(t, back.Length.IsZero())
	back.Length = length("1 m")
	require.Error(t, back.Length.UnmarshalText([]byte("far")))
	assert.True(t, back.Length.IsZero(), "an error resets the value")
}
