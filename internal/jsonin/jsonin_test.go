package jsonin_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/jsonin"
	"example.org/motorcircuit/tables"
)

type inner struct {
	Amps tables.Current `json:"amps,omitzero"`
	Size tables.Size    `json:"size,omitzero"`
	Deep []int          `json:"deep,omitempty"`
}

type outer struct {
	Name     string       `json:"name"`
	On       bool         `json:"on"`
	Count    int          `json:"count"`
	Power    tables.Power `json:"power"`
	In       inner        `json:"in"`
	List     []inner      `json:"list"`
	Hidden   string       `json:"-"`
	Untagged string
}

func TestDecode(t *testing.T) {
	var got outer
	require.NoError(t, jsonin.Decode([]byte(`{"name":"a","on":true,"count":-3,"power":"7-1/2 hp","in":{"amps":10.40,"size":4,"deep":[1,2]},"list":[{"amps":"5 A"},null,{}]}`), &got))
	want := outer{Name: "a", On: true, Count: -3, Power: tables.Must(tables.ParsePower("7-1/2 hp")),
		In:   inner{tables.Must(tables.ParseCurrent("10.4")), tables.Must(tables.ParseSize("4")), []int{1, 2}},
		List: []inner{{Amps: tables.Must(tables.ParseCurrent("5"))}, {}, {}}}
	assert.Equal(t, want, got)
	require.NoError(t, jsonin.Decode([]byte(` {"name":null,"in":null,"list":null,"power":null} `), &outer{}))
	assert.Equal(t, outer{}, func() (x outer) { require.NoError(t, jsonin.Decode([]byte("null"), &x)); return x }())
}

func TestDecodeFaults(t *testing.T) {
	for in, want := range map[string]string{
		`{"nam":1}`:                      `nam "nam": want one of name, on, count, power, in, list`,
		`{"Name":"a"}`:                   `Name "Name": want one of name, on, count, power, in, list`,
		`{"Hidden":"a"}`:                 `Hidden "Hidden": want one of name, on, count, power, in, list`,
		`{"in":{"x":{"y":[1,{}]}}}`:      `in.x "x": want one of amps, size, deep`,
		`{"name":"a","name":"b"}`:        `name "name": want each key once`,
		`{"name":5}`:                     `name "5": want text`,
		`{"name":["a",{"b":[]}]}`:        `name "a list": want text`,
		`{"on":"true"}`:                  `on "true": want true or false`,
		`{"count":1.5}`:                  `count "1.5": want a whole number`,
		`{"count":1e2}`:                  `count "1e2": want a whole number`,
		`{"count":99999999999}`:          `count "99999999999": want a whole number`,
		`{"count":{}}`:                   `count "an object": want a whole number`,
		`{"power":40}`:                   `power "40": want horsepower or kilowatts above 0, such as "40 hp", "7-1/2 hp" or "30 kW"`,
		`{"power":true}`:                 `power "true": want text`,
		`{"in":[]}`:                      `in "a list": want an object`,
		`{"in":{"amps":-1}}`:             `in.amps "-1": want a plain decimal in amperes`,
		`{"in":{"amps":1e2}}`:            `in.amps "1e2": want a plain decimal in amperes`,
		`{"in":{"deep":[1,"2",3]}}`:      `in.deep[1] "2": want a whole number`,
		`{"list":{}}`:                    `list "an object": want a list`,
		`{"list":[{},{"size":"5 AWG"}]}`: `list[1].size "5 AWG": want a size from 18 AWG`,
		`[]`:                             `document "a list": want an object`,
		`7`:                              `document "7": want an object`,
		`{"` + strings.Repeat("k", 5000) + `":1}`: `kkk...`,
	} {
		err := jsonin.Decode([]byte(in), &outer{})
		require.Len(t, tables.Faults(err), 1, in)
		var input *tables.InputError
		require.ErrorAs(t, err, &input, in)
		assert.Contains(t, err.Error(), want, in)
		assert.Less(t, len(err.Error()), 300)
	}
}

// All faults are told, in the order of the document.
func TestDecodeTellsAllFaults(t *testing.T) {
	err := jsonin.Decode([]byte(`{"x":[[[1]]],"name":1,"list":[{"amps":"a"},{"y":null,"size":"z"}],"on":2}`), &outer{})
	var fields []string
	for _, fault := range tables.Faults(err) {
		fields = append(fields, tables.FieldOf(fault))
	}
	assert.Equal(t, []string{"x", "name", "list[0].amps", "list[1].y", "list[1].size", "on"}, fields)
}

func TestDecodeSyntax(t *testing.T) {
	for in, want := range map[string]string{
		``: "unexpected EOF", `{`: "unexpected EOF", `{"name":`: "unexpected EOF", `{"x":[`: "unexpected EOF", `{"name" 1}`: "byte 8", `{"list":[1 2]}`: "near byte",
		`{} {}`: "more follows", `{}]`: "near byte 2", `nul`: "near byte", `{"in":{"a":1`: "unexpected EOF",
	} {
		err := jsonin.Decode([]byte(in), &outer{})
		require.ErrorContains(t, err, "JSON, near byte", in)
		assert.ErrorContains(t, err, want, in)
	}
	assert.ErrorContains(t, jsonin.Decode([]byte(`{"f":1}`), &struct {
		F float64 `json:"f"`
	}{}), "cannot be decoded")
}

// Deep nesting in what is skipped does not nest in the decoder.
func TestDecodeDeep(t *testing.T) {
	deep := `{"x":` + strings.Repeat("[", 5000) + strings.Repeat("]", 5000) + `}`
	assert.Len(t, tables.Faults(jsonin.Decode([]byte(deep), &outer{})), 1)
}

// Of a document of something else the first hundred faults are told.
func TestDecodeTellsSoManyFaults(t *testing.T) {
	err := jsonin.Decode([]byte(`{`+strings.Repeat(`"x":1,`, 5000)+`"y":2}`), &outer{})
	faults := tables.Faults(err)
	require.Len(t, faults, 101)
	assert.ErrorContains(t, faults[100], "document is not given: want fewer faults")
}
