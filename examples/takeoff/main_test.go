package main

import (
	"bytes"
	"flag"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/examples/internal/schedule"
)

var update = flag.Bool("update", false, "rewrite golden files, then read the diff")

// TestGolden freezes the bill of the sample, as text and as CSV.
func TestGolden(t *testing.T) {
	for name, args := range map[string][]string{"takeoff.text": nil, "takeoff.csv": {"-format", "csv"}} {
		var stdout, stderr bytes.Buffer
		status := schedule.RunTakeoff(prices, args, strings.NewReader(""), &stdout, &stderr)
		assert.Equal(t, 1, status, "the sample has one bad motor and one bad feeder")
		assert.Equal(t, 2, strings.Count(stderr.String(), "is left out"), stderr.String())
		path := filepath.Join("testdata", "golden", name)
		if *update {
			require.NoError(t, os.MkdirAll(filepath.Dir(path), 0o755))
			require.NoError(t, os.WriteFile(path, stdout.Bytes(), 0o600))
		}
		want, err := os.ReadFile(path)
		require.NoError(t, err)
		assert.Equal(t, string(want), stdout.String())
	}
}
