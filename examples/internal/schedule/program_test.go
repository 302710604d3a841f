package schedule

import (
	"bytes"
	"encoding/csv"
	"encoding/json"
	"errors"
	"math/rand/v2"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// ran runs the program on the text of a schedule.
func ran(t *testing.T, schedule string, flags ...string) (status int, out, complaint string) {
	t.Helper()
	var stdout, stderr bytes.Buffer
	status = Run(append(flags, "-"), strings.NewReader(schedule), &stdout, &stderr)
	return status, stdout.String(), stderr.String()
}

// records runs the program for CSV and returns its rows by column name.
func records(t *testing.T, schedule string) (status int, rows []map[string]string) {
	t.Helper()
	status, out, complaint := ran(t, schedule, "-format", "csv")
	require.Empty(t, complaint)
	return status, byName(t, out)
}

func byName(t testing.TB, text string) []map[string]string {
	t.Helper()
	all, err := csv.NewReader(strings.NewReader(text)).ReadAll()
	require.NoError(t, err)
	var rows []map[string]string
	for _, record := range all[1:] {
		row := map[string]string{}
		for i, name := range all[0] {
			row[name] = record[i]
		}
		rows = append(rows, row)
	}
	return rows
}

func TestSample(t *testing.T) {
	for _, tt := range []struct {
		golden string
		args   []string
	}{
		{"sample.text", nil},
		{"sample.text", []string{"-format", "text"}},
		{"sample.text", []string{"-feeders", "sample_feeders.csv"}},
		{"sample.csv", []string{"-format", "csv"}},
		{"sample.json", []string{"-format", "json"}},
		{"feeders.csv", []string{"-format", "csv", "-feeders", "sample_feeders.csv"}},
		{"feeders.json", []string{"-format", "json", "-feeders", "sample_feeders.csv"}},
	} {
		t.Run(strings.Join(tt.args, " "), func(t *testing.T) {
			var stdout, stderr bytes.Buffer
			assert.Equal(t, 1, Run(tt.args, strings.NewReader(""), &stdout, &stderr), "the sample has one bad motor and one bad feeder")
			assert.Empty(t, stderr.String())
			testkit.Golden(t, "testdata/golden/"+tt.golden, stdout.String())
		})
	}
}

// The sample shows every word that a schedule may use.
func TestSampleMeetsEverything(t *testing.T) {
	seen := map[string]map[string]bool{}
	rows := byName(t, sample)
	for _, row := range rows {
		for name, cell := range row {
			if seen[name] == nil {
				seen[name] = map[string]bool{}
			}
			seen[name][cell] = true
		}
	}
	assert.GreaterOrEqual(t, len(rows), 26)
	for _, e := range tables.Editions() {
		assert.Contains(t, seen["code"], e.String())
	}
	for k := motor.SquirrelCage; k <= motor.Hermetic; k++ {
		assert.Contains(t, seen["kind"], k.String())
	}
	for d := motor.Continuous; d <= motor.Varying; d++ {
		assert.Contains(t, seen["duty"], d.String())
	}
	for s := motor.AcrossTheLine; s <= motor.Drive; s++ {
		assert.Contains(t, seen["starting"], s.String())
	}
	for _, d := range []tables.Device{protection.NonTimeDelayFuse, protection.TimeDelayFuse, protection.InverseTimeBreaker, protection.InstantaneousBreaker} {
		assert.Contains(t, seen["device"], d.String())
	}
	for name, cells := range map[string][]string{
		"conductor": {"copper", "aluminum"}, "phases": {"1", "2", "3"}, "ambient_c": {"30", "45", "50"},
		"conductors_in_raceway": {"6", "9"}, "power": {"45 kW", "600 hp", "7-1/2 hp"}, "service_factor": {"3"}, "room": {"Cold store"},
	} {
		for _, cell := range cells {
			assert.Contains(t, seen[name], cell, name)
		}
	}
	factors := map[string]bool{}
	for _, row := range rows {
		if row["kind"] == "synchronous" {
			factors[row["power_factor"]] = true
		}
	}
	assert.Equal(t, map[string]bool{"1": true, "0.9": true, "0.8": true}, factors)
	_, answers := records(t, sample)
	assert.True(t, slices.ContainsFunc(answers, func(a map[string]string) bool { return a["branch_sets"] == "2" }), "parallel sets")
}

// The order of the columns is a promise.
func TestColumns(t *testing.T) {
	const promised = "tag,code,error,table_current_a,design_current_a,overload_current_a,locked_rotor_a,branch_min_ampacity_a," +
		"branch_conductor,branch_sets,branch_ampacity_a,motor_supply_min_ampacity_a,motor_supply_conductor,secondary_min_ampacity_a," +
		"secondary_conductor,overload_max_a,overload_start_max_a,device,device_limit_a,device_rating_a,device_start_limit_a," +
		"device_start_rating_a,instantaneous_max_a,disconnect_min_a,disconnect_min_hp,bonding_conductor,raceway,raceway_fill_percent," +
		"drop_running_percent,drop_starting_percent,fault_at_motor_ka,cautions"
	const known = "tag,code,kind,power,volts,phases,nameplate_amps,service_factor,temperature_rise_c,power_factor,efficiency,speed_rpm," +
		"code_letter,design_letter,locked_rotor_amps,secondary_amps,branch_selection_amps,duty,duty_minutes,starting,drive_input_amps,resistor_duty,use," +
		"device,conductor,insulation,termination_c,ambient_c,conductors_in_raceway,raceway,length_m,length_ft,max_drop_percent,fault_ka,feeder"
	status, out, complaint := ran(t, "zone,"+known+",Note\n", "-format", "csv")
	assert.Equal(t, 0, status)
	assert.Equal(t, promised+",zone,Note\n", out)
	assert.Empty(t, complaint)
	for _, c := range motors.columns {
		for _, need := range strings.Fields(c.needs) {
			assert.GreaterOrEqual(t, motors.named(need), 0, c.name)
		}
	}
}

// By hand from NFPA 70-2023: Table 430.250 (21 A), 430.22 (125 %), Table 310.16,
// 430.32, 430.52, 430.110.
func TestOneRow(t *testing.T) {
	status, rows := records(t, "code,tag,volts,power,kind,nameplate_amps,service_factor,device,insulation,termination_c,ambient_c\n"+
		"nec-2023, CV-1 ,460,15 hp,squirrel_cage,19.5,1.15,inverse_time_breaker,THWN-2,75,30\n")
	require.Equal(t, 0, status)
	require.Len(t, rows, 1)
	for name, want := range map[string]string{
		"tag": "CV-1", "code": "NEC-2023", "error": "", "table_current_a": "21", "design_current_a": "21", "overload_current_a": "19.5",
		"locked_rotor_a": "116", "branch_min_ampacity_a": "26.25", "branch_conductor": "10", "branch_sets": "1", "branch_ampacity_a": "35",
		"motor_supply_conductor": "", "secondary_conductor": "", "overload_max_a": "24.375", "overload_start_max_a": "27.3",
		"device": "inverse_time_breaker", "device_limit_a": "52.5", "device_rating_a": "60", "device_start_limit_a": "84",
		"device_start_rating_a": "80", "instantaneous_max_a": "", "disconnect_min_a": "24.15", "disconnect_min_hp": "15", "raceway": "",
	} {
		assert.Equal(t, want, rows[0][name], name)
	}
	assert.Contains(t, rows[0]["cautions"], " | ")
}

// The answer to a motor does not hang on where its row or its columns stand.
func TestOrderDoesNotMatter(t *testing.T) {
	_, plain := records(t, sample)
	all, err := csv.NewReader(strings.NewReader(sample)).ReadAll()
	require.NoError(t, err)
	random := rand.New(rand.NewPCG(430, 28))
	header, motors := all[0], all[1:]
	order := random.Perm(len(header))
	var b strings.Builder
	w := csv.NewWriter(&b)
	reorder := func(record []string) []string {
		cells := make([]string, len(record))
		for to, from := range order {
			cells[to] = record[from]
		}
		return cells
	}
	require.NoError(t, w.Write(reorder(header)))
	for _, i := range random.Perm(len(motors)) {
		require.NoError(t, w.Write(reorder(motors[i])))
	}
	w.Flush()
	_, shuffled := records(t, b.String())
	assert.NotEqual(t, plain, shuffled)
	assert.ElementsMatch(t, plain, shuffled)
}

func TestJSON(t *testing.T) {
	_, out, _ := ran(t, sample, "-format", "json")
	var elements []struct {
		Circuit struct{ Tag, Edition string }
		Branch  struct{ Size string }
		Error   string
	}
	require.NoError(t, json.Unmarshal([]byte(out), &elements))
	rows := byName(t, sample)
	require.Len(t, elements, len(rows))
	for i, row := range rows {
		assert.Equal(t, row["tag"], elements[i].Circuit.Tag)
		assert.Equal(t, elements[i].Error == "", elements[i].Branch.Size != "", row["tag"])
	}
	status, out, _ := ran(t, "tag,code,kind,power,volts\n", "-format", "json")
	assert.Equal(t, 0, status)
	assert.JSONEq(t, "[]", out)
	_, out, _ = ran(t, "tag,code,kind,power,volts\nP <1>,,dc,1 hp,120\n", "-format", "json")
	assert.JSONEq(t, `[{"circuit":{"tag":"P <1>"},"error":"code is not given: want one of NEC-2017, NEC-2020, NEC-2023, CEC-2021, CEC-2024"}]`, out)
}

func TestExitStatus(t *testing.T) {
	good := filepath.Join(t.TempDir(), "good.csv")
	require.NoError(t, os.WriteFile(good, []byte("tag,code,kind,power,volts\nP-1,NEC-2023,squirrel_cage,5 hp,460\n"), 0o644))
	for _, tt := range []struct {
		name   string
		args   []string
		status int
		says   string
	}{
		{"a good file", []string{"-format", "csv", good}, 0, ""},
		{"flag with =", []string{"-format=json", good}, 0, ""},
		{"the sample", nil, 1, ""},
		{"help", []string{"-h"}, 0, "usage: schedule [-format text|csv|json] [-feeders feeders.csv] [schedule.csv]"},
		{"a format of later", []string{"-format", "html", good}, 2, `unknown -format "html": want one of text, csv, json`},
		{"no format", []string{"-format", "", good}, 2, "want one of text, csv, json"},
		{"a flag of later", []string{"-check", good}, 2, "flag provided but not defined: -check"},
		{"two files", []string{good, good}, 2, "want one file name, after the flags; got 2 arguments"},
		{"flag after the file", []string{good, "-format", "csv"}, 2, "after the flags"},
		{"no such file", []string{filepath.Join(t.TempDir(), "none.csv")}, 2, "none.csv"},
		{"a folder", []string{t.TempDir()}, 2, "reading the schedule"},
		{"no feeders file", []string{"-feeders", filepath.Join(t.TempDir(), "none.csv"), good}, 2, "none.csv"},
		{"a folder of feeders", []string{"-feeders", t.TempDir(), good}, 2, "reading the feeders file"},
		{"no name of a feeders file", []string{"-feeders", "", good}, 2, "want a file name"},
		{"standard input twice", []string{"-feeders", "-", "-"}, 2, "standard input cannot be both"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			var stdout, stderr bytes.Buffer
			assert.Equal(t, tt.status, Run(tt.args, strings.NewReader(""), &stdout, &stderr))
			if tt.says == "" {
				assert.Empty(t, stderr.String())
				return
			}
			assert.Contains(t, stderr.String(), tt.says)
			assert.Empty(t, stdout.String())
		})
	}
}

type brokenWriter struct{}

func (brokenWriter) Write([]byte) (int, error) { return 0, errors.New("disk full") }

func TestBrokenOutput(t *testing.T) {
	for _, format := range formatNames(formats) {
		var stderr bytes.Buffer
		assert.Equal(t, 2, Run([]string{"-format", format, "-feeders", "sample_feeders.csv"}, strings.NewReader(""), brokenWriter{}, &stderr))
		assert.Contains(t, stderr.String(), "disk full")
	}
}
