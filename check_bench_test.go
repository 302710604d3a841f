package motorcircuit_test

import (
	"encoding/json"
	"testing"

	"example.org/motorcircuit"
)

// BenchmarkCheck judges a whole circuit, beside the plain baseline of sizing it, and
// finds its edges, which asks Check some sixty times.
func BenchmarkCheck(b *testing.B) {
	c := whole()
	r, err := motorcircuit.Size(c)
	if err != nil {
		b.Fatal(err)
	}
	in := r.AsInstalled()
	for _, bb := range []struct {
		name string
		run  func() error
	}{
		{"size, the baseline", func() error { _, err := motorcircuit.Size(c); return err }},
		{"check", func() error { _, err := motorcircuit.Check(c, in); return err }},
		{"reverse", func() error { _, err := motorcircuit.Reverse(c, in); return err }},
	} {
		b.Run(bb.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if err := bb.run(); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

// BenchmarkDecode reads a circuit from JSON, beside encoding/json into a map.
func BenchmarkDecode(b *testing.B) {
	text := []byte(circuitJSON)
	b.Run("into a map, the baseline", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			var m map[string]any
			if err := json.Unmarshal(text, &m); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("into a circuit", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			var c motorcircuit.Circuit
			if err := json.Unmarshal(text, &c); err != nil {
				b.Fatal(err)
			}
		}
	})
}
