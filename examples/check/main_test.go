package main

import (
	"bytes"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/examples/internal/schedule"
	"example.org/motorcircuit/internal/testkit"
)

// The program answers the sample as its golden file has it.
func TestSample(t *testing.T) {
	var stdout, stderr bytes.Buffer
	assert.Equal(t, 1, schedule.RunCheck(nil, strings.NewReader(""), &stdout, &stderr), "the sample has violations and one bad row")
	testkit.Golden(t, "../internal/schedule/testdata/golden/check.text", stdout.String())
	assert.Empty(t, stderr.String())
}
