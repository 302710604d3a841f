package schedule

import (
	"bytes"
	"fmt"
	"io"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"
)

// A farm gives rows one by one and takes answers, and notes how far the
// answers lag behind.
type farm struct {
	row                       string // with verbs for a number and a power
	rows, given, answers, lag int
	rest                      []byte
}

func (f *farm) Read(p []byte) (int, error) {
	if len(f.rest) == 0 {
		if f.given == f.rows {
			return 0, io.EOF
		}
		f.given++
		f.lag = max(f.lag, f.given-f.answers)
		f.rest = fmt.Appendf(nil, f.row, f.given, 5*(1+f.given%4))
	}
	n := copy(p, f.rest)
	f.rest = f.rest[n:]
	return n, nil
}

func (f *farm) Write(p []byte) (int, error) {
	f.answers += bytes.Count(p, []byte("\n"))
	return len(p), nil
}

// Rows are answered as they come: what is held at once is bounded by the
// buffers, whatever the number of rows.
func TestStreaming(t *testing.T) {
	for _, tt := range []struct {
		name        string
		run         func([]string, io.Reader, io.Writer, io.Writer) int
		header, row string
	}{
		{"schedule", Run, "tag,code,kind,power,volts\n", "P-%d,NEC-2023,squirrel_cage,%d hp,460\n"},
		{"check", RunCheck, "tag,code,kind,power,volts,branch_size,disconnect_power\n", "P-%d,NEC-2023,squirrel_cage,%d hp,460,14,1 hp\n"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			const rows = 20_000
			f := &farm{row: tt.row, rows: rows}
			var stderr bytes.Buffer
			status := tt.run([]string{"-format", "csv", "-"}, io.MultiReader(strings.NewReader(tt.header), f), f, &stderr)
			require.Less(t, status, 2)
			assert.GreaterOrEqual(t, f.answers, rows+1, "every row and the header")
			assert.Less(t, f.lag, 4_000)
			assert.Empty(t, stderr.String(), "no progress where standard error is no terminal")
		})
	}
}

func TestProgress(t *testing.T) {
	var b bytes.Buffer
	for rows := range 30_001 {
		progress{"schedule", &b}.report(rows + 1)
	}
	assert.Equal(t, "schedule: 10000 rows\nschedule: 20000 rows\nschedule: 30000 rows\n", b.String())
	assert.Nil(t, newProgress("schedule", &b).w)
	file, err := os.Create(filepath.Join(t.TempDir(), "log"))
	require.NoError(t, err)
	defer file.Close()
	assert.Nil(t, newProgress("schedule", file).w, "a file is no terminal")
}
