package main

import (
	"bytes"
	"flag"
	"os"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/examples/internal/schedule"
)

// The golden file is that of examples/internal/schedule, which rewrites it.
var _ = flag.Bool("update", false, "does nothing here")

// The program answers the sample as its golden file has it.
func TestSample(t *testing.T) {
	var stdout, stderr bytes.Buffer
	assert.Equal(t, 1, schedule.Run(nil, strings.NewReader(""), &stdout, &stderr), "the sample has one bad motor and one bad feeder")
	want, err := os.ReadFile("../internal/schedule/testdata/golden/sample.text")
	require.NoError(t, err)
	assert.Equal(t, string(want), stdout.String())
	assert.Empty(t, stderr.String())
}
