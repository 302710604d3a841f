package main

import (
	"io"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
)

// printed runs the program and returns what it prints.
func printed(t *testing.T) string {
	t.Helper()
	r, w, err := os.Pipe()
	require.NoError(t, err)
	stdout := os.Stdout
	os.Stdout = w
	defer func() { os.Stdout = stdout }()
	text := make(chan string)
	go func() {
		all, _ := io.ReadAll(r)
		text <- string(all)
	}()
	main()
	require.NoError(t, w.Close())
	return <-text
}

func TestGolden(t *testing.T) {
	got := printed(t)
	testkit.Golden(t, "testdata/golden/onemotor.txt", got)
	// NFPA 70-2023: Table 430.250, 430.22, 430.52, 430.32, by hand.
	for _, line := range []string{
		"conductor: 10 AWG for 26.25 A by NFPA 70-2023 430.22\n",
		"breaker: 60 A under a limit of 52.5 A\n",
		"overload: 24.375 A = overload current 19.5 A × 125 %",
	} {
		assert.Contains(t, got, line)
	}
}

// The README shows this program word for word.
func TestInReadme(t *testing.T) {
	program, err := os.ReadFile("main.go")
	require.NoError(t, err)
	readme, err := os.ReadFile(filepath.Join("..", "..", "README.md"))
	require.NoError(t, err)
	assert.True(t, strings.Contains(string(readme), "```go\n"+string(program)+"```\n"), "README.md does not show main.go as it stands")
}
