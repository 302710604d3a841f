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

// FuzzRow reads whatever stands below a header that names every column: each
// row of the input has a row of the output, and an error names its column.
func FuzzRow(f *testing.F) {
	var names []string
	for _, c := range motors.columns {
		names = append(names, c.name)
	}
	header := strings.Join(names, ",") + ",note\n"
	blank := strings.Repeat(",", len(names)-4)
	begin := regexp.MustCompile(`^(row: |line [0-9]+, column [0-9]+|(` + strings.Join(names, "|") + `)( is not given)?( "|:))`)
	all, err := csv.NewReader(strings.NewReader(sample)).ReadAll()
	require.NoError(f, err)
	for _, record := range all[1:] {
		var b strings.Builder
		w := csv.NewWriter(&b)
		w.Write(append(append([]string{record[0]}, record[2:]...), record[1]))
		w.Flush()
		f.Add(b.String())
	}
	for _, line := range []string{
		"", "\n", ",", blank, "P,NEC-2023,dc,1/3 hp,120" + blank[1:], "P,NEC-2023,squirrel_cage,1e9 hp,٥" + blank[1:],
		"\"P\n1\",NEC-2023,torque,,460,,65." + blank[3:], "P,\"NEC", "a\"b", "\uFEFF", "\x00,\xff", "P,CEC-2024,hermetic,,575,,-1,NaN,+Inf" + blank[5:],
		"P,NEC-2023,dc,1 hp,120\nQ,NEC-2023,dc,2 hp,120\r\n\"\r\"",
	} {
		f.Add(line)
	}
	f.Fuzz(func(t *testing.T, line string) {
		r := csv.NewReader(strings.NewReader(header + line))
		r.FieldsPerRecord = -1
		rows, broken := -1, false
		for ; ; rows++ {
			if _, err := r.Read(); err == io.EOF {
				break
			} else if err != nil {
				rows, broken = rows+1, true
				break
			}
		}
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
			require.Equal(t, allSized, status)
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
	var names []string
	for _, c := range feederColumns.columns {
		names = append(names, c.name)
	}
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
		want := allSized
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
