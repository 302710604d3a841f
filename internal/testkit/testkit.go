// Package testkit holds what the tests of several packages ask of a result, and
// their golden files.
package testkit

import (
	"flag"
	"os"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

var update = flag.Bool("update", false, "rewrite golden files, then read the diff")

// Golden holds text against a file below testdata, or rewrites the file with
// the flag -update.
func Golden(t *testing.T, path, got string) {
	t.Helper()
	path = filepath.FromSlash(path)
	if *update {
		require.NoError(t, os.MkdirAll(filepath.Dir(path), 0o755))
		require.NoError(t, os.WriteFile(path, []byte(got), 0o644))
	}
	want, err := os.ReadFile(path)
	require.NoError(t, err)
	assert.Equal(t, string(want), got)
}

// Rests reports whether a figure rests on a rule or table.
func Rests(f tables.Figure, ref string) bool {
	return slices.ContainsFunc(f.Citations(), func(c tables.Citation) bool { return c.Ref == ref })
}

// Cautioned reports a caution that cites the rule and speaks of the subject.
func Cautioned(list []tables.Caution, ref, subject string) bool {
	return slices.ContainsFunc(list, func(c tables.Caution) bool {
		return c.Cite.Ref == ref && strings.Contains(c.Text, subject)
	})
}
