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
		f.rest = fmt.Appendf(nil, "P-%d,NEC-2023,squirrel_cage,%d hp,460\n", f.given, 5*(1+f.given%4))
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
	const rows = 20_000
	f := &farm{rows: rows}
	var stderr bytes.Buffer
	in := io.MultiReader(strings.NewReader("tag,code,kind,power,volts\n"), f)
	require.Equal(t, 0, Run([]string{"-format", "csv", "-"}, in, f, &stderr))
	assert.Equal(t, rows+1, f.answers, "every row and the header")
	assert.Less(t, f.lag, 4_000)
	assert.Empty(t, stderr.String(), "no progress where standard error is no terminal")
}

func TestProgress(t *testing.T) {
	var b bytes.Buffer
	for rows := range 30_001 {
		progress{&b}.report(rows + 1)
	}
	assert.Equal(t, "schedule: 10000 rows\nschedule: 20000 rows\nschedule: 30000 rows\n", b.String())
	assert.Nil(t, newProgress(&b).w)
	file, err := os.Create(filepath.Join(t.TempDir(), "log"))
	require.NoError(t, err)
	defer file.Close()
	assert.Nil(t, newProgress(file).w, "a file is no terminal")
}
