package schedule

import (
	"fmt"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// Feeders files that end the program before any row.
func TestBadFeedersFile(t *testing.T) {
	for _, tt := range []struct{ name, feeders, says string }{
		{"empty file", "", "the feeders file is empty"},
		{"a missing column", "tag,device\n", "the header has no column code"},
		{"no header", "F-1,NEC-2023\n", "the header has no column tag, code"},
		{"a column twice", "tag,code,Device,device\n", "the header names column device twice"},
		{"a broken quote in the header", "tag,\"code\n", "line 1, column 11: extraneous or missing"},
		{"a broken quote below", feederHeader + feeder1 + "F\"2,NEC-2023,\n", "line 3, column 2: bare"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			for _, format := range formatNames(formats) {
				status, out, complaint := ranFeeders(t, pumpHeader+pump1, tt.feeders, "-format", format)
				assert.Equal(t, 2, status)
				assert.Empty(t, out)
				assert.Contains(t, complaint, "feeders.csv: "+tt.says)
			}
		})
	}
}

// feederWith is a feeders file of one good row but for the given cells.
func feederWith(cells map[string]string) string {
	row := map[string]string{"tag": "F-1", "code": "NEC-2023"}
	for name, cell := range cells {
		row[name] = cell
	}
	var names, values []string
	for _, c := range feederColumns.columns {
		if c.must || row[c.name] != "" {
			names = append(names, c.name)
			values = append(values, `"`+row[c.name]+`"`)
		}
	}
	return strings.Join(names, ",") + "\n" + strings.Join(values, ",") + "\n"
}

// Cells of a feeder that cannot stand, told in the words of the columns.
func TestBadFeederCells(t *testing.T) {
	for _, tt := range []struct {
		cells map[string]string
		want  []string // what stands in the error, in this order and the first at its start
	}{
		{map[string]string{"tag": " "}, []string{`tag is not given: want a name for the feeder`}},
		{map[string]string{"code": "NEC-2026"}, []string{`code "NEC-2026": want one of NEC-2017`}},
		{map[string]string{"code": ""}, []string{`code is not given: want one of NEC-2017`}},
		{map[string]string{"device": "wire"}, []string{`device "wire": want one of non_time_delay_fuse`}},
		{map[string]string{"device": "instantaneous_breaker"}, []string{`device "`, `want a fuse or an inverse-time breaker`}},
		{map[string]string{"conductor": "silver"}, []string{`conductor "silver": want one of copper, aluminum`}},
		{map[string]string{"insulation": "RW90"}, []string{`insulation "RW90": want one of TW, THW`}},
		{map[string]string{"termination_c": "70"}, []string{`termination_c "70": want 60, 75 or 90 °C`}},
		{map[string]string{"ambient_c": "300"}, []string{`ambient_c "300 °C": want -60 to 150 °C`}},
		{map[string]string{"ambient_c": "90"}, []string{`ambient_c: NFPA 70-2023 Table 310.15(B)(1)(1) has no`}},
		{map[string]string{"conductors_in_raceway": "2"}, []string{`conductors_in_raceway "2": want at least the circuit's own 3`}},
		{map[string]string{"continuous_load_amps": "-1"}, []string{`continuous_load_amps "-1": want a plain decimal in amperes`}},
		{map[string]string{"other_load_amps": "100001"}, []string{`other_load_amps "100001 A": want at most 100000 A`}},
		{map[string]string{"other_load_amps": "100000"}, []string{`conductor: `}},
		{map[string]string{"device": "w", "conductor": "x", "termination_c": "70", "ambient_c": "y", "continuous_load_amps": "٥", "other_load_amps": "200000"},
			[]string{`device "w"`, `conductor "x"`, `termination_c "70"`, `ambient_c "y"`, `continuous_load_amps "٥"`, `other_load_amps "200000 A"`}},
	} {
		t.Run(fmt.Sprint(tt.cells), func(t *testing.T) {
			schedule := pumpHeader + pump1 + pump2
			if tt.cells["tag"] != "" {
				schedule = pumpHeader
			}
			status, _, rows := feederRecords(t, schedule, feederWith(tt.cells))
			assert.Equal(t, 1, status)
			require.Len(t, rows, 1)
			rest := rows[0]["error"]
			for _, want := range tt.want {
				at := strings.Index(rest, want)
				require.GreaterOrEqual(t, at, 0, "%s, want %s", rest, want)
				rest = rest[at+len(want):]
			}
			assert.True(t, strings.HasPrefix(rows[0]["error"], tt.want[0]), rows[0]["error"])
			assert.NotRegexp(t, `motor\.|wiring\.|circuits`, rows[0]["error"])
			for name, cell := range rows[0] {
				if name != "tag" && name != "code" && name != "error" {
					assert.Empty(t, cell, name)
				}
			}
		})
	}
}

// Feeders and motors that do not go together: what is told of each feeder.
func TestBadFeeders(t *testing.T) {
	const bad3 = "P-3,NEC-2023,squirrel_cage,51 hp,460,,F-1\n"
	many := strings.Builder{}
	for i := range 12 {
		fmt.Fprintf(&many, "Q-%02d,NEC-2023,squirrel_cage,5 hp,460,,F-8\n", i)
	}
	for _, tt := range []struct {
		name, schedule, feeders string
		want                    []string // "tag: error" of each feeder row, or its tag alone for a good one
	}{
		{"a feeder that the file lacks", pump1 + pump3, feeder1, []string{"F-1", "F-2: no feeder of this tag is in the feeders file; named by P-3"}},
		{"many motors name it", many.String(), "", []string{"F-8: no feeder of this tag is in the feeders file; named by Q-00, Q-01, Q-02, Q-03, Q-04, Q-05, Q-06, Q-07, Q-08, Q-09 and 2 more"}},
		{"a feeder that no motor names", pump1, feeder1 + feeder2, []string{"F-1", "F-2: no motor of the schedule names this feeder"}},
		{"a motor that failed", pump1 + pump3 + bad3, feeder1 + feeder2,
			[]string{"F-1: not sized without all its motors; these were not: P-3", "F-2"}},
		{"all motors failed", bad3, feeder1, []string{"F-1: not sized without all its motors; these were not: P-3"}},
		{"a failed motor names what the file lacks", strings.ReplaceAll(bad3, "F-1", "F-9"), "", []string{"F-9: no feeder of this tag is in the feeders file; named by P-3"}},
		{"a tag twice", pump1 + pump3, feeder1 + feeder2 + feeder1,
			[]string{`F-1: tag "F-1": want a tag of its own; it stands on lines 2, 4`, "F-2", `F-1: tag "F-1": want a tag of its own; it stands on lines 2, 4`}},
		{"mixed editions", pump1 + strings.ReplaceAll(pump2, "NEC-2023", "NEC-2020") + pump3, feeder1 + feeder2,
			[]string{`F-1: motor P-2: code "NEC-2020": want NEC-2023, as the feeder`, "F-2"}},
		{"mixed voltages", pump1 + strings.ReplaceAll(pump2, "460", "230") + pump3, feeder1 + feeder2,
			[]string{`F-1: motor P-2: volts "230": want the system of the feeder, which P-1 has at 460 V`, "F-2"}},
		{"a bad cell and a motor that failed", pump1 + bad3, "F-1,NEC-2023,wire\n",
			[]string{`F-1: not sized without all its motors; these were not: P-3; device "wire": want one of non_time_delay_fuse, time_delay_fuse, inverse_time_breaker, instantaneous_breaker`}},
		{"a short feeder row", pump1 + pump3, "F-1,NEC-2023\n" + feeder2, []string{"F-1: row: 2 cells where the header names 3 columns", "F-2"}},
		{"a motor row too long that names its feeder", pump1 + strings.TrimSpace(pump2) + ",\n" + pump3, feeder1 + feeder2,
			[]string{"F-1: not sized without all its motors; these were not: P-2", "F-2"}},
		{"a motor row too short to name one", pump1 + "P-2,NEC-2023\n" + pump3, feeder1 + feeder2,
			[]string{"F-1: its motors are not all known: line 3 of the schedule is not shaped as its header, so its feeder is not known",
				"F-2: its motors are not all known: line 3 of the schedule is not shaped as its header, so its feeder is not known"}},
	} {
		t.Run(tt.name, func(t *testing.T) {
			status, circuits, rows := feederRecords(t, pumpHeader+tt.schedule, feederHeader+tt.feeders)
			assert.Equal(t, 1, status)
			require.Len(t, circuits, strings.Count(tt.schedule, "\n"))
			if strings.HasPrefix(tt.schedule, pump1) {
				assert.Empty(t, circuits[0]["error"], "a motor is sized whatever its feeder")
			}
			var got []string
			for _, row := range rows {
				told := row["tag"]
				if row["error"] != "" {
					told += ": " + row["error"]
				}
				got = append(got, told)
				assert.Equal(t, row["error"] == "", row["feeder_conductor"] != "", "either an error or an answer")
			}
			assert.Equal(t, tt.want, got)
		})
	}
}

// A schedule that breaks off leaves every feeder without an answer.
func TestFeedersOfBrokenSchedule(t *testing.T) {
	for _, format := range formatNames(formats) {
		status, out, complaint := ranFeeders(t, pumpHeader+pump1+"P\"2,NEC-2023\n"+pump3, feederHeader+feeder1, "-format", format)
		assert.Equal(t, 2, status)
		assert.Contains(t, complaint, "line 3, column 2: bare")
		assert.Contains(t, out, "its motors are not all known: the schedule could not be read to its end: line 3, column 2: bare")
	}
}

// Without a column feeder no motor names any.
func TestNoFeederColumn(t *testing.T) {
	status, _, rows := feederRecords(t, "tag,code,kind,power,volts\nP-1,NEC-2023,squirrel_cage,5 hp,460\n", feederHeader+feeder1)
	assert.Equal(t, 1, status)
	require.Len(t, rows, 1)
	assert.Equal(t, "no motor of the schedule names this feeder", rows[0]["error"])
}
