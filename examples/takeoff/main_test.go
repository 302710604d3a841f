package main

import (
	"bytes"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/examples/internal/schedule"
	"example.org/motorcircuit/internal/testkit"
)

// TestGolden freezes the bill of the sample, as text and as CSV.
func TestGolden(t *testing.T) {
	for name, args := range map[string][]string{"takeoff.text": nil, "takeoff.csv": {"-format", "csv"}} {
		var stdout, stderr bytes.Buffer
		status := schedule.RunTakeoff(prices, args, strings.NewReader(""), &stdout, &stderr)
		assert.Equal(t, 1, status, "the sample has one bad motor and one bad feeder")
		assert.Equal(t, 2, strings.Count(stderr.String(), "is left out"), stderr.String())
		testkit.Golden(t, "testdata/golden/"+name, stdout.String())
	}
}
