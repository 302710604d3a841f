package schedule

import (
	"encoding/csv"
	"encoding/json"
	"io"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// namesOf returns the names of the columns of a layout.
func namesOf[T any](of *layout[T]) (names []string) {
	for _, c := range of.columns {
		names = append(names, c.name)
	}
	return names
}

// addRows adds the rows of a sample, one by one, below a header of the given names
// and a note.
func addRows(f *testing.F, sample string, names []string) {
	for _, row := range byName(f, sample) {
		var b strings.Builder
		w := csv.NewWriter(&b)
		var cells []string
		for _, name := range names {
			cells = append(cells, row[name])
		}
		w.Write(append(cells, "as found"))
		w.Flush()
		f.Add(b.String())
	}
}

// faultOf matches a fault that is told of a column, of the row or of a place in the
// file.
func faultOf(names []string) *regexp.Regexp {
	return regexp.MustCompile(`^(row: |line [0-9]+, column [0-9]+|(` + strings.Join(names, "|") + `)( is not given)?( "|:))`)
}

// rowsOf counts the rows of a file; one that breaks the reading off is the last.
func rowsOf(text string) (rows int, broken bool) {
	r := csv.NewReader(strings.NewReader(text))
	r.FieldsPerRecord = -1
	for rows = -1; ; rows++ {
		if _, err := r.Read(); err == io.EOF {
			return rows, false
		} else if err != nil {
			return rows + 1, true
		}
	}
}

// FuzzRow reads whatever stands below a header that names every column: each
// row of the input has a row of the output, and an error names its column.
func FuzzRow(f *testing.F) {
	names := namesOf(motors)
	header := strings.Join(names, ",") + ",note\n"
	blank := strings.Repeat(",", len(names)-4)
	begin := faultOf(names)
	addRows(f, sample, names)
	for _, line := range []string{
		"", "\n", ",", blank, "P,NEC-2023,dc,1/3 hp,120" + blank[1:], "P,NEC-2023,squirrel_cage,1e9 hp,٥" + blank[1:],
		"\"P\n1\",NEC-2023,torque,,460,,65." + blank[3:], "P,\"NEC", "a\"b", "\uFEFF", "\x00,\xff", "P,CEC-2024,hermetic,,575,,-1,NaN,+Inf" + blank[5:],
		"P,NEC-2023,dc,1 hp,120\nQ,NEC-2023,dc,2 hp,120\r\n\"\r\"",
	} {
		f.Add(line)
	}
	f.Fuzz(func(t *testing.T, line string) {
		rows, broken := rowsOf(header + line)
		var b, complaint strings.Builder
		status := Run([]string{"-format", "csv", "-"}, strings.NewReader(header+line), &b, &complaint)
		answers, err := csv.NewReader(strings.NewReader(b.String())).ReadAll()
		require.NoError(t, err)
		require.Len(t, answers, rows+1)
		failed := 0
		for _, answer := range answers[1:] {
			told := answer[2]
			computed := strings.Join(answer[3:len(answer)-1], "")
			require.Equal(t, told == "", computed != "", "either an error or an answer")
			if told == "" {
				continue
			}
			failed++
			require.Regexp(t, begin, told)
			require.NotContains(t, told, "\n")
		}
		switch {
		case broken:
			require.Equal(t, cannotRun, status)
			require.NotEmpty(t, complaint.String())
		case failed > 0:
			require.Equal(t, someBad, status)
		default:
			require.Equal(t, allGood, status)
		}
		b.Reset()
		assert.Equal(t, status, Run([]string{"-format", "json", "-"}, strings.NewReader(header+line), &b, &complaint))
		var elements []any
		require.NoError(t, json.Unmarshal([]byte(b.String()), &elements))
		require.Len(t, elements, rows)
	})
}

// FuzzFeederRow reads whatever stands below a header of a feeders file: each row
// has a row of the output, and an error names its column or its motors.
func FuzzFeederRow(f *testing.F) {
	schedule := filepath.Join(f.TempDir(), "schedule.csv")
	require.NoError(f, os.WriteFile(schedule, []byte(pumpHeader+pump1+pump2+pump3), 0o644))
	names := namesOf(feederColumns)
	header := strings.Join(names, ",") + ",note\n"
	blank := strings.Repeat(",", len(names)-3)
	begin := regexp.MustCompile(`^(row: |no motor |no feeder |motor P-[0-9]: |(` + strings.Join(names, "|") + `)( is not given)?( "|:))`)
	_, body, _ := strings.Cut(sampleFeeders, "\n")
	for line := range strings.Lines(strings.ReplaceAll(body, "F-2 drying hall", "F-1")) {
		f.Add(line)
	}
	for _, line := range []string{
		"", "\n", ",", blank, "F-1,NEC-2023,time_delay_fuse" + blank, "F-1,NEC-2023," + blank + "\nF-1,NEC-2023," + blank, "F-1,CEC-2024,wire" + blank,
		"F-2,NEC-2023,inverse_time_breaker,aluminum,XHHW-2,75,40,6,1e9,٥,", "\"F\n1\",NEC-2023,,,,65.,-1,,NaN,+Inf,", "F-1,\"NEC", "a\"b", "\x00,\xff",
	} {
		f.Add(line)
	}
	f.Fuzz(func(t *testing.T, line string) {
		r := csv.NewReader(strings.NewReader(header + line))
		r.FieldsPerRecord = -1
		file, readError := r.ReadAll()
		var b, complaint strings.Builder
		status := Run([]string{"-format", "csv", "-feeders", "-", schedule}, strings.NewReader(header+line), &b, &complaint)
		if readError != nil {
			require.Equal(t, cannotRun, status)
			require.Empty(t, b.String())
			require.NotEmpty(t, complaint.String())
			return
		}
		tags := map[string]bool{}
		for _, record := range file[1:] {
			tags[strings.TrimSpace(record[0])] = true
		}
		rows := len(file) - 1
		for _, tag := range []string{"F-1", "F-2"} { // those that the motors name
			if !tags[tag] {
				rows++
			}
		}
		_, block, _ := strings.Cut(b.String(), "\n\n")
		answers, err := csv.NewReader(strings.NewReader(block)).ReadAll()
		require.NoError(t, err)
		require.Len(t, answers, rows+1)
		want := allGood
		for _, answer := range answers[1:] {
			told := answer[2]
			require.Equal(t, told == "", strings.Join(answer[3:len(answer)-1], "") != "", "either an error or an answer")
			if told != "" {
				want = someBad
				require.Regexp(t, begin, told)
				require.NotContains(t, told, "\n")
			}
		}
		require.Equal(t, want, status)
		b.Reset()
		assert.Equal(t, status, Run([]string{"-format", "json", "-feeders", "-", schedule}, strings.NewReader(header+line), &b, &complaint))
		var document struct{ Circuits, Feeders []any }
		require.NoError(t, json.Unmarshal([]byte(b.String()), &document))
		require.Len(t, document.Feeders, rows)
	})
}

// FuzzInstalledRow reads whatever stands below a header that names every column of
// the installed circuits: an error names its column, a violation or an error is
// told by the exit status, and every row has an element in JSON.
func FuzzInstalledRow(f *testing.F) {
	names := namesOf(installed)
	header := strings.Join(names, ",") + ",note\n"
	begin := faultOf(names)
	addRows(f, sampleInstalled, names)
	blank := strings.Repeat(",", len(names)-4)
	for _, line := range []string{
		"", "\n", "P,NEC-2023,dc,1/3 hp,120" + blank[1:], "P,\"NEC", "a\"b", "\x00,\xff",
		"P,CEC-2024,squirrel_cage,5 hp,575" + strings.Repeat(",", 33) + "emt,14,99,14,0,61,,,1,1,9,no,yes,1000000,1,0.001,1,1 kW,1,no,1,1 hp,1,2000,aluminum,16,12,",
	} {
		f.Add(line)
	}
	f.Fuzz(func(t *testing.T, line string) {
		rows, broken := rowsOf(header + line)
		var b, complaint strings.Builder
		status := RunCheck([]string{"-format", "csv", "-only", "note", "-"}, strings.NewReader(header+line), &b, &complaint)
		answers, err := csv.NewReader(strings.NewReader(b.String())).ReadAll()
		require.NoError(t, err)
		want := allGood
		for _, answer := range answers[1:] {
			severity, told := answer[4], answer[11]
			require.Equal(t, told == "", severity != "", "either an error or a finding")
			if told != "" {
				require.Regexp(t, begin, told)
				require.NotContains(t, told, "\n")
				require.NotContains(t, told, "installed.")
			}
			if told != "" || severity == "violation" {
				want = someBad
			}
		}
		if broken {
			want = cannotRun
		}
		require.Equal(t, want, status, complaint.String())
		for _, format := range []string{"json", "text"} {
			b.Reset()
			require.Equal(t, status, RunCheck([]string{"-format", format, "-"}, strings.NewReader(header+line), &b, &complaint))
			if format == "json" {
				var elements []any
				require.NoError(t, json.Unmarshal([]byte(b.String()), &elements))
				require.Len(t, elements, rows)
			}
		}
	})
}
