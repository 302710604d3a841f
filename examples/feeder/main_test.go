package main

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
)

func TestGolden(t *testing.T) {
	var b strings.Builder
	require.NoError(t, run(&b))
	got := b.String()
	testkit.Golden(t, "testdata/golden/feeder.txt", got)
	// CSA C22.1:24, by hand. One pump counts: 39 A × 125 % + 31 A × 90 % + 16 A
	// + 24 A ÷ 80 % by Rules 28-108 and 28-110; 39 A × 250 % + 31 A + 16 A + 30 A
	// by Rule 28-204.
	for _, line := range []string{
		"conductors: 1 AWG for 122.65 A by CSA C22.1:24 Rule 28-110(1)\n",
		"breaker: 150 A under a limit of 174.5 A\n",
		"bonding: 6 AWG\n",
	} {
		assert.Contains(t, got, line)
	}
}
