package tables_test

import (
	"encoding/csv"
	"os"
	"path/filepath"
	"slices"
	"strconv"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// The files of testdata/published are a second copy of the published
// tables, typed line by line in the shape of the printed page and not made from
// tables/data. It rests on the same copies, so it finds slips of copying and of
// code, not misprints of a copy. Every cell goes through the public lookup under
// every edition that it holds for. Sources stand at the head of each file.

// A line is one printed line of a published table.
type line struct {
	editions []tables.Edition
	table    string     // key of citations.csv
	row      string     // "7-1/2", "1/0"
	text     string     // the cells as typed
	groups   [][]string // the cells between bars
}

func readRecords(t *testing.T, name string) [][]string {
	t.Helper()
	f, err := os.Open(filepath.Join("testdata", "published", name))
	require.NoError(t, err)
	defer f.Close()
	r := csv.NewReader(f)
	r.Comment = '#'
	records, err := r.ReadAll()
	require.NoError(t, err)
	return records[1:]
}

func readPublished(t *testing.T, name string) []line {
	t.Helper()
	var lines []line
	for _, rec := range readRecords(t, name) {
		l := line{table: rec[1], row: rec[2], text: rec[3]}
		for word := range strings.FieldsSeq(rec[0]) {
			n := len(l.editions)
			for _, e := range tables.Editions() {
				if e.String() == word || e.Code().String() == word {
					l.editions = append(l.editions, e)
				}
			}
			require.Greater(t, len(l.editions), n, "%s: edition %q", name, word)
		}
		for group := range strings.SplitSeq(rec[3], "|") {
			l.groups = append(l.groups, strings.Fields(group))
		}
		lines = append(lines, l)
	}
	return lines
}

// readCitations returns the printed citation by table key and edition.
func readCitations(t *testing.T) map[string]map[tables.Edition]string {
	t.Helper()
	all := make(map[string]map[tables.Edition]string)
	for _, rec := range readRecords(t, "citations.csv") {
		all[rec[0]] = make(map[tables.Edition]string)
		for i, e := range tables.Editions() {
			if rec[i+1] != "" {
				all[rec[0]][e] = e.Standard() + " " + rec[i+1]
			}
		}
	}
	return all
}

// An answer is what a lookup gave for a cell.
type answer struct {
	fig tables.Figure
	err error
}

func one(f tables.Figure, err error) []answer { return []answer{{f, err}} }

// A lookup asks the library for the cell under a head, in every way that the
// printed cell answers for.
type lookup func(e tables.Edition, l line, group int, head string) []answer

func TestPublishedCells(t *testing.T) {
	cites := readCitations(t)
	total, asked := 0, 0
	for _, f := range []struct {
		file    string
		unit    tables.Unit
		blank   string // what a blank cell gives: "error" or "absent"
		cells   int    // printed cells, blank ones too
		lookups int    // cells by editions by ways to ask
		look    lookup
	}{
		{"full_load.csv", tables.Ampere, "error", 1028, 2644, fullLoad},
		{"locked_rotor.csv", tables.Ampere, "error", 192, 1053, lockedRotor},
		{"motor_rules.csv", tables.Plain, "error", 130, 490, motorRule},
		{"ambient.csv", tables.Plain, "error", 192, 864, ambientFactor},
		{"ampacity.csv", tables.Ampere, "absent", 855, 3270, ampacity},
	} {
		t.Run(f.file, func(t *testing.T) {
			heads := make(map[string][][]string)
			cells, lookups := 0, 0
			for _, l := range readPublished(t, f.file) {
				if heads[l.table] == nil {
					heads[l.table] = l.groups
					continue
				}
				require.Len(t, l.groups, len(heads[l.table]), "%s %s", l.table, l.row)
				for g, group := range l.groups {
					require.Len(t, group, len(heads[l.table][g]), "%s %s", l.table, l.row)
					for i, want := range group {
						cells++
						for _, e := range l.editions {
							for _, got := range f.look(e, l, g, heads[l.table][g][i]) {
								lookups++
								where := strings.Join([]string{e.String(), l.table, l.row, heads[l.table][g][i]}, ", ")
								checkCell(t, where, want, cites[l.table][e], f.blank, got)
								if want != "-" && f.unit != tables.Plain {
									assert.Equal(t, f.unit, got.fig.Unit(), where)
								}
							}
						}
					}
				}
			}
			assert.Equal(t, f.cells, cells, "cells held")
			assert.Equal(t, f.lookups, lookups, "lookups made")
			total += cells
			asked += lookups
		})
	}
	assert.Equal(t, 2397, total, "cells held in all files")
	assert.Equal(t, 8321, asked, "lookups made in all files")
}

func checkCell(t *testing.T, where, want, cite, blank string, got answer) {
	t.Helper()
	require.NotEmpty(t, cite, where)
	if want == "-" {
		assert.True(t, got.fig.IsZero(), where)
		var missing *tables.NotTabulatedError
		switch {
		case blank == "absent" || strings.Contains(where, "code letters"):
			assert.NoError(t, got.err, where)
		case assert.ErrorAs(t, got.err, &missing, where):
			assert.Equal(t, cite, missing.Table.String(), where)
		}
		return
	}
	if !assert.NoError(t, got.err, where) {
		return
	}
	assert.True(t, decimal.RequireFromString(want).Equal(got.fig.Value()), "%s: printed %s, looked up %v", where, want, got.fig)
	assert.Equal(t, cite, got.fig.Citation().String(), where)
	assert.False(t, got.fig.IsZero(), where)
}

var motorTables = map[string][]tables.MotorTable{
	"three-phase motors": {tables.InductionTable, tables.SynchronousTable}, "44": {tables.InductionTable, tables.SynchronousTable},
	"single-phase motors": {tables.SinglePhaseTable}, "45": {tables.SinglePhaseTable},
	"two-phase motors": {tables.TwoPhaseTable},
	"dc motors":        {tables.DirectCurrentTable}, "D2": {tables.DirectCurrentTable},
}

func fullLoad(e tables.Edition, l line, group int, head string) []answer {
	return one(e.FullLoadCurrent(motorTables[l.table][group], tables.Must(tables.ParseHP(l.row)), volts(head)))
}

func lockedRotor(e tables.Edition, l line, _ int, head string) (all []answer) {
	phases := []int{2, 3}
	if l.table == "locked rotor 1 phase" {
		phases = []int{1}
	}
	for _, n := range phases {
		all = append(all, one(e.LockedRotorCurrent(n, tables.Must(tables.ParseHP(l.row)), volts(head)))...)
	}
	return all
}

func volts(head string) int { return tables.Must(strconv.Atoi(head)) }

// motorRule asks the table that the line is of.
func motorRule(e tables.Edition, l line, _ int, head string) (all []answer) {
	switch l.table {
	case "code letters":
		low, high, err := e.LockedRotorKVA(l.row)
		if head == "high" {
			low = high
		}
		return one(low, err)
	case "duty", "27":
		var d tables.Duty
		if err := d.UnmarshalText([]byte(l.row)); err != nil {
			return one(tables.Figure{}, err)
		}
		for _, minutes := range map[string][]int{"5": {5}, "15": {15}, "30&60": {30, 60}, "continuous": {0}}[head] {
			all = append(all, one(e.DutyPercent(d, minutes))...)
		}
	case "device percent", "29":
		for _, q := range deviceQueries[l.row] {
			if err := q.Device.UnmarshalText([]byte(head)); err != nil {
				return one(tables.Figure{}, err)
			}
			all = append(all, one(e.DevicePercent(q))...)
		}
	case "37":
		return one(e.SupplyInsulation(head, !strings.HasPrefix(l.row, "other")))
	}
	return all
}

// deviceQueries are the motors that a printed line answers for.
var deviceQueries = map[string][]tables.DeviceQuery{
	"single-phase":                         {{Motor: tables.SinglePhaseType}, {Motor: tables.SinglePhaseType, ReducedVoltage: true}},
	"ac polyphase other than wound rotor":  {{Motor: tables.CageType}, {Motor: tables.SynchronousType}},
	"squirrel cage":                        {{Motor: tables.CageType}, {Motor: tables.CageType, ReducedVoltage: true}},
	"Design B energy efficient":            {{Motor: tables.EfficientCageType}, {Motor: tables.EfficientCageType, ReducedVoltage: true}},
	"synchronous":                          {{Motor: tables.SynchronousType}},
	"wound rotor":                          {{Motor: tables.WoundRotorType}, {Motor: tables.WoundRotorType, ReducedVoltage: true}},
	"dc":                                   {{Motor: tables.DirectCurrentType}, {Motor: tables.DirectCurrentType, ReducedVoltage: true}},
	"cage and synchronous at full voltage": {{Motor: tables.CageType}, {Motor: tables.EfficientCageType}, {Motor: tables.SynchronousType}},
	"cage and synchronous at reduced voltage to 30 A": {
		{Motor: tables.CageType, ReducedVoltage: true, Current: amps("30")}, {Motor: tables.SynchronousType, ReducedVoltage: true, Current: amps("0.5")}},
	"cage and synchronous at reduced voltage over 30 A": {
		{Motor: tables.CageType, ReducedVoltage: true, Current: amps("30.01")}, {Motor: tables.EfficientCageType, ReducedVoltage: true, Current: amps("400")}},
}

func amps(s string) tables.Figure { return tables.Must(tables.ParseCurrent(s)).Figure("current") }

// ambientFactor asks at the hot end of the band, and just above its cold end.
func ambientFactor(e tables.Edition, l line, _ int, head string) (all []answer) {
	celsius := volts(head)
	cold, hot, band := strings.Cut(l.row, "-")
	switch {
	case strings.HasSuffix(l.row, " or less"):
		cold, hot = "-40", strings.TrimSuffix(l.row, " or less")
	case !band: // a point of CEC Table 5A answers back to the point before it
		step := 5
		if volts(l.row) > 80 {
			step = 10
		}
		cold, hot = strconv.Itoa(volts(l.row)-step)+".000001", l.row
	}
	for _, ambient := range []string{cold, hot} {
		all = append(all, one(e.AmbientFactor(celsius, tables.Must(tables.ParseTemperature(ambient))))...)
	}
	return all
}

// ampacity asks for a size; a table of raceways answers for cables too.
func ampacity(e tables.Edition, l line, group int, head string) (all []answer) {
	material := tables.Material(group)
	if l.table == "3" || l.table == "4" {
		material = tables.Aluminum
	}
	runs := []tables.Run{tables.InRaceway, tables.InCable}
	if slices.Contains([]string{"free air", "1", "3"}, l.table) {
		runs = []tables.Run{tables.InFreeAir}
	}
	for _, run := range runs {
		table, err := e.Ampacities(run, material)
		if err != nil {
			return one(tables.Figure{}, err)
		}
		all = append(all, one(table.Ampacity(tables.Must(tables.ParseSize(l.row)), volts(head)), nil)...)
	}
	return all
}
