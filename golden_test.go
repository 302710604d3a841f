package motorcircuit_test

import (
	"encoding/json"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

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
			testkit.Golden(t, "internal/testdata/golden/"+x.id+".txt", r.String())
			b, err := json.MarshalIndent(r, "", "  ")
			require.NoError(t, err)
			testkit.Golden(t, "internal/testdata/golden/"+x.id+".json", string(b)+"\n")
		})
	}
}
