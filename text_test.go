package motorcircuit_test

import (
	"strings"
	"testing"
	"unicode/utf8"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A document is what prints itself.
type document interface {
	String() string
	Text(width int) string
	Markdown() string
}

// documents are one of each kind, with a tag that says nothing to Markdown.
func documents(t *testing.T) map[string]document {
	t.Helper()
	c, in := installedRun()
	c.Tag = "SP-3 a|b *c*\n# d"
	c.Wiring.Length, c.Fault = tables.Must(tables.ParseLength("60 m")), motor.Amps("14000")
	in.Device.Interrupting = motor.Amps("10000")
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	f := feeder(tables.NEC2023, cage(c.Tag, "15", 460), cage("b", "10", 460))
	f.Tag, f.Wiring.Termination = "F|1", 75
	fr := sized(t, f)
	x, err := motorcircuit.Compare(c, tables.NEC2017, tables.NEC2023)
	require.NoError(t, err)
	report := checked(t, c, in)
	in.Device.Interrupting = c.Fault
	h, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	fh, err := motorcircuit.ReverseFeeder(f, motorcircuit.InstalledFeeder{Conductors: motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("6"))}})
	require.NoError(t, err)
	small := func(tag, hp string) motorcircuit.Circuit {
		c := cage(tag, hp, 460).Circuit
		c.Edition, c.Wiring.Termination = tables.NEC2023, 75
		return c
	}
	group, err := motorcircuit.SizeGroup(motorcircuit.Group{Tag: c.Tag, Edition: tables.NEC2023, Circuits: []motorcircuit.Circuit{small(c.Tag, "1/2"), small("b", "5")}, Listed: true})
	require.NoError(t, err)
	shared, err := motorcircuit.SizeShared(conductor.EMT, []motorcircuit.Circuit{small(c.Tag, "15"), small("b", "10")})
	require.NoError(t, err)
	return map[string]document{"group": group, "shared": shared, "result": r, "feeder": fr, "comparison": x, "report": report, "headroom": h, "feeder_headroom": fh}
}

// Every document wraps to a width without losing a word, is the same each time, and
// a tag breaks nothing of its Markdown.
func TestDocuments(t *testing.T) {
	again := documents(t)
	for name, d := range documents(t) {
		t.Run(name, func(t *testing.T) {
			assert.Equal(t, d.String(), d.Text(0))
			assert.Equal(t, d.Markdown(), again[name].Markdown())
			for _, width := range []int{40, 60, 80, 132} {
				text := d.Text(width)
				assert.Equal(t, strings.Fields(d.String()), strings.Fields(text))
				for line := range strings.SplitSeq(text, "\n") {
					alone := len(strings.Fields(strings.TrimPrefix(line, "  - "))) == 1 // a word that is longer than the line
					assert.True(t, alone || utf8.RuneCountInString(line) <= width, "%q", line)
				}
			}
			testkit.Golden(t, "internal/testdata/golden/"+name+".md", d.Markdown())
			testkit.Golden(t, "internal/testdata/golden/"+name+".80.txt", d.Text(80))
			assert.NotContains(t, d.Markdown(), "\n# d")
			assert.NotContains(t, d.Markdown(), " a|b ")
		})
	}
}

// Nothing has been worked out: there is little to tell, and nothing fails.
func TestEmptyDocuments(t *testing.T) {
	for _, d := range []document{motorcircuit.Result{}, motorcircuit.FeederResult{}, motorcircuit.GroupResult{}, motorcircuit.SharedResult{},
		motorcircuit.Comparison{}, motorcircuit.Report{}, motorcircuit.Headroom{}, motorcircuit.FeederHeadroom{}} {
		assert.NotEmpty(t, d.Text(60), "%T", d)
		assert.NotEmpty(t, d.Markdown(), "%T", d)
	}
	assert.Empty(t, motorcircuit.SharedResult{}.Quantities())
	assert.Empty(t, motorcircuit.Report{}.Violations())
	assert.Equal(t, motorcircuit.Installed{}, motorcircuit.Result{}.AsInstalled())
	assert.Equal(t, motorcircuit.InstalledFeeder{}, motorcircuit.FeederResult{}.AsInstalled())
}
