package motorcircuit_test

import (
	"encoding/json"
	"flag"
	"os"
	"path/filepath"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

var update = flag.Bool("update", false, "rewrite golden files, then read the diff")

func checkGolden(t *testing.T, name, got string) {
	t.Helper()
	path := filepath.Join("internal", "testdata", filepath.FromSlash(name))
	if *update {
		require.NoError(t, os.MkdirAll(filepath.Dir(path), 0o755))
		require.NoError(t, os.WriteFile(path, []byte(got), 0o644))
	}
	want, err := os.ReadFile(path)
	require.NoError(t, err)
	assert.Equal(t, string(want), got)
}

// TestGolden freezes the whole derivation, as text and as JSON, of each
// published single-motor example under the newest edition of its code.
func TestGolden(t *testing.T) {
	newest := map[string]tables.Edition{"NEC": tables.NEC2023, "CEC": tables.CEC2024}
	for _, x := range readExamples(t) {
		if x.in.isFeeder() {
			continue
		}
		t.Run(x.id, func(t *testing.T) {
			c := x.in.circuit(t, newest[x.code])
			c.Tag = x.id
			r, err := motorcircuit.Size(c)
			require.NoError(t, err)
			checkGolden(t, "golden/"+x.id+".txt", r.String())
			b, err := json.MarshalIndent(r, "", "  ")
			require.NoError(t, err)
			checkGolden(t, "golden/"+x.id+".json", string(b)+"\n")
		})
	}
}
