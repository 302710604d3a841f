package main

import (
	"encoding/csv"
	"encoding/json"
	"io"
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
	for _, c := range columns {
		if c.set != nil {
			names = append(names, c.name)
		}
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
		status := run([]string{"-format", "csv", "-"}, strings.NewReader(header+line), &b, &complaint)
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
		assert.Equal(t, status, run([]string{"-format", "json", "-"}, strings.NewReader(header+line), &b, &complaint))
		var elements []any
		require.NoError(t, json.Unmarshal([]byte(b.String()), &elements))
		require.Len(t, elements, rows)
	})
}
