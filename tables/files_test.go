package tables

import (
	"errors"
	"io/fs"
	"os"
	"regexp"
	"slices"
	"strings"
	"testing"
	"testing/fstest"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/csvgrid"
)

// dataFiles returns the paths of the embedded tables, such as "nec/motor_flc_dc.csv".
func dataFiles(t testing.TB) []string {
	t.Helper()
	var paths []string
	require.NoError(t, fs.WalkDir(files, "data", func(path string, d fs.DirEntry, err error) error {
		if strings.HasSuffix(path, ".csv") {
			paths = append(paths, strings.TrimPrefix(path, "data/"))
		}
		return err
	}))
	return paths
}

// TestDataListed: every file is listed in data/README.md, every listed file
// exists, and each line of the list says all that it should.
func TestDataListed(t *testing.T) {
	readme, err := os.ReadFile("data/README.md")
	require.NoError(t, err)
	var listed []string
	for line := range strings.Lines(string(readme)) {
		m := regexp.MustCompile("^\\| `([a-z0-9_/]+\\.csv)` \\|(.*)\\|$").FindStringSubmatch(strings.TrimSpace(line))
		if m == nil {
			assert.NotContains(t, strings.SplitN(line+"||", "|", 3)[1], ".csv", "a line that lists a file in another form")
			continue
		}
		listed = append(listed, m[1])
		cells := strings.Split(m[2], "|")
		require.Len(t, cells, 4, m[1])
		assert.NotEmpty(t, strings.TrimSpace(cells[0]), "%s: published table", m[1])
		assert.Regexp(t, "20(17|20|21)", cells[1], "%s: editions", m[1])
		assert.Regexp(t, "^ [ABC]", cells[2], "%s: mark", m[1])
	}
	assert.ElementsMatch(t, dataFiles(t), listed)
	assert.True(t, slices.IsSorted(listed), "the list is in order")
}

// TestDataReadable: every file has rows as long as its header, no stray space
// and no name or row twice.
func TestDataReadable(t *testing.T) {
	paths := dataFiles(t)
	require.NotEmpty(t, paths)
	for _, path := range paths {
		g, err := open(path)
		require.NoError(t, err)
		assert.GreaterOrEqual(t, len(g.Rows), 2, path)
		heads := make(map[string]bool)
		for _, head := range g.Header {
			assert.Regexp(t, "^[a-z0-9_]+$", head, path)
			assert.False(t, heads[head], "%s: column %s twice", path, head)
			heads[head] = true
		}
		rows := make(map[string]bool)
		for _, row := range g.Rows {
			assert.Len(t, row, len(g.Header), path)
			key := strings.Join(row, ",")
			assert.False(t, rows[key], "%s: row %s twice", path, key)
			rows[key] = true
		}
	}
}

// TestOverloadUnitRows: a supply of other grounding needs as many units as the
// row that the lookup reads (NFPA 70 Table 430.37, CSA C22.1 Table 25).
func TestOverloadUnitRows(t *testing.T) {
	for path, want := range map[string]string{
		"nec/motor_overload_units.csv":         "1 1 1 1 2 2 2 2 3",
		"cec/motor_table25_overload_count.csv": "1 1 1 2 2 2 2 3",
	} {
		g, err := open(path)
		require.NoError(t, err)
		var counts []string
		for _, row := range g.Rows {
			counts = append(counts, row[len(row)-2])
		}
		assert.Equal(t, want, strings.Join(counts, " "), path)
	}
}

// TestRowsWithoutLookup holds what the files print beside what the lookups read.
func TestRowsWithoutLookup(t *testing.T) {
	// CSA C22.1 Table 13: each range begins after the one above and ends at its rating.
	g, err := open("cec/conductor_ocpd_table13.csv")
	require.NoError(t, err)
	end := -1
	for row := range g.Rows {
		from, errFrom := g.Int(row, 0, -1)
		to, errTo := g.Int(row, 1, -1)
		rating, errRating := g.Int(row, 2, -1)
		require.NoError(t, errors.Join(errFrom, errTo, errRating))
		assert.Equal(t, end+1, from)
		assert.Equal(t, rating, to)
		end = to
	}

	// NFPA 70 Table 430.52: the line of polyphase motors, which the lines below it part.
	g, err = open("nec/motor_ocpd_max_percent.csv")
	require.NoError(t, err)
	assert.Equal(t, []string{"ac_polyphase_other_than_wound_rotor", "300", "175", "800", "250"}, g.Rows[1])
}

// grid reads a made-up table.
func grid(t testing.TB, text string) *csvgrid.Grid {
	t.Helper()
	g, err := csvgrid.Read(fstest.MapFS{"t.csv": {Data: []byte(text)}}, "t.csv")
	require.NoError(t, err)
	return g
}

func TestMotorTableRefuses(t *testing.T) {
	for _, tt := range []struct{ name, text, want string }{
		{"sound", "power_hp,v230,note\n1,4.2,\n7.5,22,\n1000,,\n", ""},
		{"blank below", "power_hp,v230\n1,\n2,6.8\n3,9.6\n", ""},
		{"out of order", "power_hp,v230\n2,4.2\n1,6.8\n", "t.csv: 1 hp is out of order"},
		{"row twice", "power_hp,v230\n1/2,4.2\n0.5,6.8\n", "t.csv: 1/2 hp is out of order"},
		{"falling current", "power_hp,v230,v460\n1,4.2,2.1\n2,6.8,1.9\n", "t.csv: 2 hp at 460 V is below the row above"},
		{"bad cell", "power_hp,v230\n1,4.2\n2,6.8A\n", `t.csv: row 3, v230: "6.8A": not a plain decimal`},
		{"negative cell", "power_hp,v230\n1,-4.2\n", `t.csv: row 2, v230: "-4.2": not a plain decimal`},
		{"three decimals", "power_hp,v230\n1,4.205\n", `t.csv: row 2, v230: "4.205" has more than two places`},
		{"bad power", "power_hp,v230\none,4.2\n", `t.csv: power "one"`},
		{"no power", "power_hp,v230\n,4.2\n", "t.csv: power is not given"},
		{"kilowatts", "power_hp,v230\n30 kW,4.2\n", `t.csv: power "30 kW"`},
	} {
		t.Run(tt.name, func(t *testing.T) {
			m, err := newMotorTable(grid(t, tt.text), &nec3Ph, necVolts, nil, nil)
			if tt.want == "" {
				require.NoError(t, err)
				assert.Len(t, m.cols, 1)
				return
			}
			assert.Nil(t, m)
			assert.ErrorContains(t, err, tt.want)
		})
	}
}

func TestMotorTableColumns(t *testing.T) {
	g := grid(t, "power_hp,v115,v230,v230_other\n1,8.4,4.2,5\n")
	m, err := newMotorTable(g, &nec1Ph, necVolts, []derivedColumn{{208, 230, 110, &cecTable45}, {999, 460, 110, &cecTable45}}, map[string]string{"v230": "", "v230_other": "v230"})
	require.NoError(t, err)
	var labels []string
	for _, c := range m.cols {
		labels = append(labels, c.label)
	}
	assert.Equal(t, []string{"115 V", "230 V", "208 V"}, labels, "one column renamed, one derived, none from a column that is not there")
	assert.Equal(t, "5.5", m.value(0, 2).String())
}

func TestAmpacityRefuses(t *testing.T) {
	for _, tt := range []struct{ name, text, want string }{
		{"sound", "size,cu_60c_a,cu_75c_a\n18,,14\n14,15,20\n12,20,25\n", ""},
		{"out of order", "size,cu_60c_a,cu_75c_a\n12,20,25\n14,15,20\n", "t.csv: 14 AWG is not above the size before it"},
		{"same ampacity", "size,cu_75c_a\n14,20\n12,20\n", "t.csv: 12 AWG is not above the size before it"},
		{"falls with temperature", "size,cu_60c_a,cu_75c_a\n14,20,15\n", "t.csv: 14 AWG falls with temperature"},
		{"bad size", "size,cu_75c_a\n17,20\n", `t.csv: size "17"`},
		{"bad cell", "size,cu_75c_a\n14,twenty\n", `t.csv: row 2, cu_75c_a: "twenty": not a plain decimal`},
		{"three decimals", "size,cu_75c_a\n14,20.001\n", "has more than two places"},
		{"no column of the metal", "size,al_75c_a\n14,20\n", "t.csv: no columns of copper"},
		{"bad column", "size,cu_warm\n14,20\n", `t.csv: column "cu_warm"`},
	} {
		t.Run(tt.name, func(t *testing.T) {
			table, err := newAmpacity(grid(t, tt.text), Copper, necRacewayRule)
			if tt.want == "" {
				require.NoError(t, err)
				assert.Equal(t, []int{60, 75}, table.columns)
				assert.Nil(t, table.cells[1+slices.Index(awgNames[:], "16")], "a row that is not there")
				return
			}
			assert.Nil(t, table)
			assert.ErrorContains(t, err, tt.want)
		})
	}
}

func TestLoadedPanics(t *testing.T) {
	assert.PanicsWithValue(t, "motorcircuit: broken embedded table: open data/nec/none.csv: file does not exist", func() {
		loadMotorTable("nec/none.csv", &nec3Ph, nil, nil, nil)()
	})
	assert.Panics(t, func() { loadRatings("nec/motor_standard_ocpd.csv", "no_such_column", &necStandard)() })
	assert.Panics(t, func() { loadAmbient("nec/conductor_ambient_30c.csv", "no_such_column", false, &necAmbient)() })
	assert.Panics(t, func() { loadUnits("nec/motor_overload_units.csv", table25Rule, map[int]string{3: "no such supply"})() })
	assert.Panics(t, func() { loadTable13("nec/motor_standard_ocpd.csv", &cecTable13, &cecBigTrade)() })
	assert.Panics(t, func() { loadTable13("cec/conductor_ocpd_table13.csv", &cecTable13, &cecBigTrade, 700)() }, "a rating out of order")
	// Files of another table: rows or columns that the loader does not know.
	other := "nec/motor_flc_dc.csv"
	assert.Panics(t, func() { loadDuty(other, &necDuty)() })
	assert.Panics(t, func() { loadDevices(other, &necDevice)() })
	assert.Panics(t, func() { loadCeilings(other, &necCeiling)() })
	assert.Panics(t, func() { loadInstantaneous(other, &cecInstant)() })
	assert.Panics(t, func() { loadSupplyInsulation(other, &cecTable37)() })
	assert.Panics(t, func() { loadCounts(other, &necCount, Percent)() })
	assert.Panics(t, func() { loadInsulationsCEC(other, &cecTable19)() })
	assert.Panics(t, func() { loadInsulationsNEC("cec/conductor_insulations.csv", &necInsulations)() })
	assert.Panics(t, func() { loadAmpacity(other, Copper, necRacewayRule)() })
	assert.ErrorContains(t, rising("t.csv", []int64{100, 300, 300}), "t.csv: 300 after 300 hundredths")
	assert.NoError(t, rising("t.csv", nil))
}
