package tables_test

import (
	"errors"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// TestPublishedBonding holds every cell of the bonding tables at the rating of its
// row, and that the least above it takes the row below. Sources stand at the head
// of bonding.csv.
func TestPublishedBonding(t *testing.T) {
	cites := readCitations(t)
	cells := 0
	before := make(map[tables.Edition]string) // rating of the row above
	for _, l := range readPublished(t, "bonding.csv") {
		if l.row == "device" {
			continue
		}
		for _, e := range l.editions {
			for i, m := range []tables.Material{tables.Copper, tables.Aluminum} {
				want := l.groups[0][i]
				ratings := []string{l.row}
				if before[e] != "" {
					ratings = append(ratings, before[e]+".01") // just over the row above
				} else {
					ratings = append(ratings, "0.01")
				}
				for _, rating := range ratings {
					cells++
					size, row, err := e.BondingSize(m, amps(rating))
					require.NoError(t, err)
					where := strings.Join([]string{e.String(), rating, m.String()}, ", ")
					if want == "1200" { // not a size of the ampacity tables: the next one, and said
						assert.Contains(t, row.Note(), "1200 kcmil", where)
						want = "1250"
					}
					assert.Equal(t, want, size.Name(), where)
					assert.Equal(t, l.row+" A", row.String(), where)
					assert.Equal(t, cites[l.table][e], row.Citation().String(), where)
					assert.Contains(t, row.Note(), size.String()+" "+m.String(), where)
				}
			}
		}
		for _, e := range l.editions {
			before[e] = l.row
		}
	}
	assert.Equal(t, (3*19+2*19)*2*2, cells, "cells held, at both ends of each row")
	for e, last := range before {
		assert.Equal(t, "6000", last)
		size, row, err := e.BondingSize(tables.Copper, amps("6000.01"))
		var none *tables.NotTabulatedError
		require.True(t, errors.As(err, &none), "%v: %v", e, err)
		assert.Zero(t, size)
		assert.True(t, row.IsZero())
		assert.Equal(t, "device", none.Field)
		assert.Equal(t, "ratings to 6000 A", none.Covers)
	}
}

// The edges at which the two codes part: 14 AWG to 15 A under the NEC, to 20 A
// under the CEC; 12 AWG to 20 and to 30 A.
func TestBondingEdges(t *testing.T) {
	for _, e := range tables.Editions() {
		want := map[string]string{"10": "14", "15": "14", "16": "12", "20": "12", "21": "10", "30": "10", "31": "10", "60": "10", "61": "8"}
		if e.Code() == tables.CEC {
			want = map[string]string{"10": "14", "15": "14", "16": "14", "20": "14", "21": "12", "30": "12", "31": "10", "60": "10", "61": "8"}
		}
		for rating, name := range want {
			size, _, err := e.BondingSize(tables.Copper, amps(rating))
			require.NoError(t, err)
			assert.Equal(t, name, size.Name(), "%v %s A", e, rating)
		}
	}
	_, _, err := tables.NEC2023.BondingSize(7, amps("20"))
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
	assert.Equal(t, "wiring.material", input.Field)
	_, _, err = tables.Edition(0).BondingSize(tables.Copper, amps("20"))
	require.ErrorAs(t, err, &input)
	assert.Equal(t, "edition", input.Field)
}

// How sure the new tables are: marks as tables/data/README.md says.
func TestFeederTableMarks(t *testing.T) {
	for _, tt := range []struct {
		e      tables.Edition
		m      tables.Material
		rating string
		want   tables.Mark
	}{
		{tables.NEC2023, tables.Copper, "6000", tables.MarkA}, {tables.NEC2023, tables.Aluminum, "3000", tables.MarkA},
		{tables.NEC2023, tables.Aluminum, "4000", tables.MarkB}, {tables.NEC2017, tables.Aluminum, "5000", tables.MarkB},
		{tables.CEC2021, tables.Copper, "60", tables.MarkB}, {tables.CEC2024, tables.Aluminum, "6000", tables.MarkB},
	} {
		_, row, err := tt.e.BondingSize(tt.m, amps(tt.rating))
		require.NoError(t, err)
		assert.Equal(t, tt.want, row.Mark(), "%v %v %s A", tt.e, tt.m, tt.rating)
	}
	for _, e := range tables.Editions() {
		f, err := e.ResistorPercent(false, tables.HeavyStarting)
		require.NoError(t, err)
		want := tables.MarkA
		if e.Code() == tables.CEC {
			want = tables.MarkC
		}
		assert.Equal(t, want, f.Mark(), e)
	}
}

// resistorDuties are the text forms by the seconds that the tables print.
var resistorDuties = map[string]string{
	"5 s on 75 s off": "light_starting", "10 s on 70 s off": "heavy_starting", "15 s on 75 s off": "extra_heavy_starting", "15 s on 45 s off": "light_intermittent",
	"15 s on 30 s off": "medium_intermittent", "15 s on 15 s off": "heavy_intermittent", "continuous": "continuous",
}

func TestPublishedResistors(t *testing.T) {
	cites := readCitations(t)
	cells := 0
	for _, l := range readPublished(t, "resistors.csv") {
		var d tables.ResistorDuty
		require.NoError(t, d.UnmarshalText([]byte(resistorDuties[l.row])))
		require.True(t, d.IsValid())
		for _, e := range l.editions {
			cells++
			f, err := e.ResistorPercent(l.table == "dc resistors", d)
			require.NoError(t, err)
			assert.True(t, decimal.RequireFromString(l.text).Equal(f.Value()), "%v %s %s: %v", e, l.table, l.row, f)
			assert.Equal(t, tables.Percent, f.Unit())
			assert.Equal(t, cites[l.table][e], f.Citation().String())
			assert.Contains(t, f.Note(), "duty")
		}
	}
	assert.Equal(t, 3*14+2*7, cells)
	for _, e := range tables.Editions() {
		for _, bad := range []tables.ResistorDuty{0, 8, 99} {
			_, err := e.ResistorPercent(false, bad)
			var input *tables.InputError
			require.ErrorAs(t, err, &input)
			assert.Equal(t, "motor.resistor", input.Field)
			assert.False(t, bad.IsValid())
		}
		_, err := e.ResistorPercent(true, tables.LightStarting)
		if e.Code() == tables.CEC {
			var none *tables.NotTabulatedError
			require.ErrorAs(t, err, &none)
			assert.Equal(t, "motor.resistor", none.Field)
		} else {
			assert.NoError(t, err)
		}
	}
	_, err := tables.Edition(99).ResistorPercent(false, tables.LightStarting)
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
	assert.Equal(t, "edition", input.Field)
}

func TestResistorDutyTexts(t *testing.T) {
	for _, text := range resistorDuties {
		for _, in := range []string{text, strings.ToUpper(text), strings.ReplaceAll(text, "_", " "), strings.ReplaceAll(text, "_", "-")} {
			var d tables.ResistorDuty
			require.NoError(t, d.UnmarshalText([]byte(in)), in)
			b, err := d.MarshalText()
			require.NoError(t, err)
			assert.Equal(t, text, string(b))
		}
	}
	d := tables.HeavyStarting
	require.NoError(t, d.UnmarshalText(nil))
	assert.Zero(t, d, "no text is no resistor")
	d = tables.HeavyStarting
	var input *tables.InputError
	require.ErrorAs(t, d.UnmarshalText([]byte("starting")), &input)
	assert.Equal(t, "motor.resistor", input.Field)
	assert.Zero(t, d, "an error resets the value")
	assert.Empty(t, tables.ResistorDuty(99).String())
}
