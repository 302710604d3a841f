package tables_test

import (
	"strconv"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// TestPublishedLists holds rules and lists whose answer is several words.
// Sources stand at the head of lists.csv.
func TestPublishedLists(t *testing.T) {
	cites := readCitations(t)
	lines := 0
	for _, l := range readPublished(t, "lists.csv") {
		lines++
		for _, e := range l.editions {
			where := strings.Join([]string{e.String(), l.table, l.row}, ", ")
			words, figures := listWords(t, e, l)
			assert.Equal(t, l.text, words, where)
			for key, list := range figures {
				for _, f := range list {
					assert.Equal(t, cites[key][e], f.Citation().String(), where)
				}
			}
		}
	}
	assert.Equal(t, 43, lines, "lines held")
}

// listWords asks the table that the line is of, and returns its answer in the
// words of the file with the figures that it rests on, by citation key.
func listWords(t *testing.T, e tables.Edition, l line) (string, map[string][]tables.Figure) {
	t.Helper()
	var words []string
	var figures []tables.Figure
	add := func(before string, f tables.Figure, after string) {
		if !f.IsZero() {
			words = append(words, before+f.Text()+after)
			figures = append(figures, f)
		}
	}
	switch l.table {
	case "ceilings", "28-200(4)":
		name, at, _ := strings.Cut(l.row, " at ")
		for _, c := range e.StartCeilings(device(t, name), amps(strings.TrimSuffix(at, " A"))) {
			s := c.Percent.Text()
			if figures = append(figures, c.Percent); !c.Over.IsZero() {
				s, figures = s+" over "+c.Over.Text(), append(figures, c.Over)
			}
			if !c.UpTo.IsZero() {
				s, figures = s+" to "+c.UpTo.Text(), append(figures, c.UpTo)
			}
			words = append(words, s)
		}
	case "28-210":
		kind, power, _ := strings.Cut(l.row, " ")
		full, rotor, floor := e.InstantaneousCaps(kind == "dc", tables.Must(tables.ParsePower(power)))
		add("", full, " of full load")
		add("", rotor, " of locked rotor")
		add("not below ", floor, " A")
	case "ratings", "13":
		byKey := make(map[string][]tables.Figure)
		for _, f := range e.StandardRatings(device(t, l.row)) {
			key := l.table
			if l.table == "13" && f.Value().GreaterThan(decimal.New(800, 0)) {
				key = "trade"
			}
			words, byKey[key] = append(words, f.Text()), append(byKey[key], f)
		}
		return strings.Join(words, " "), byKey
	case "overload units", "25":
		f, err := e.OverloadUnits(volts(l.row))
		require.NoError(t, err)
		add("", f, " "+f.Note())
	case "small", "14-104(2)":
		byKey := make(map[string][]tables.Figure)
		for _, m := range []tables.Material{tables.Copper, tables.Aluminum} {
			f := e.SmallConductorLimit(m, tables.Must(tables.ParseSize(l.row)))
			if f.IsZero() {
				words = append(words, "-")
				continue
			}
			key := l.table
			if e.Code() == tables.NEC {
				key += " " + l.row + " " + m.String()
			}
			words, byKey[key] = append(words, f.Text()), append(byKey[key], f)
		}
		return strings.Join(words, " "), byKey
	}
	if len(words) == 0 {
		return "none", nil
	}
	return strings.Join(words, " | "), map[string][]tables.Figure{l.table: figures}
}

func device(t *testing.T, name string) (d tables.Device) {
	t.Helper()
	require.NoError(t, d.UnmarshalText([]byte(name)))
	return d
}

// TestPublishedCounts holds the factors for conductors together at both ends
// of each band.
func TestPublishedCounts(t *testing.T) {
	cites := readCitations(t)
	lines := 0
	for _, l := range readPublished(t, "counts.csv") {
		lines++
		from, to, ok := strings.Cut(l.row, "-")
		if !ok {
			from, to = strings.TrimSuffix(l.row, " and more"), "500"
		}
		for _, e := range l.editions {
			for _, n := range []int{volts(from), volts(to)} {
				f, err := e.CountFactor(n)
				if l.table == "5B" {
					f, err = e.SpacingFactor(n)
				}
				require.NoError(t, err)
				assert.True(t, decimal.RequireFromString(l.text).Equal(f.Value()), "%v %s: %d conductors, %v", e, l.table, n, f)
				assert.Equal(t, cites[l.table][e], f.Citation().String())
			}
		}
	}
	assert.Equal(t, 15, lines, "lines held")
}

// TestPublishedInsulations holds every type that a table lists, and that the
// library lists no other.
func TestPublishedInsulations(t *testing.T) {
	cites := readCitations(t)
	listed := make(map[tables.Edition]int)
	for _, l := range readPublished(t, "insulations.csv") {
		for _, e := range l.editions {
			listed[e]++
			ins, err := e.Insulation(l.row)
			require.NoError(t, err)
			assert.Equal(t, cites[l.table][e], ins.Citation.String(), l.row)
			var words []string
			for _, celsius := range ins.Celsius {
				word := "-"
				if celsius != 0 {
					word = strconv.Itoa(celsius)
				}
				words = append(words, word)
			}
			if l.groups[0][1] == "*" { // not stated for damp: no more than where wet
				assert.LessOrEqual(t, ins.Celsius[tables.Damp], ins.Celsius[tables.Wet], l.row)
				words[1] = "*"
			}
			if e.Code() == tables.NEC {
				words = append(words, ins.Least.Name()+"-"+ins.Most.Name())
			} else {
				if strings.Contains(ins.Note, "conditions apply") {
					words = append(words, "if")
				}
				if ins.NoRaceway {
					words = append(words, "no")
				}
				words = append(words, "raceway")
			}
			assert.Equal(t, l.text, strings.Join(words, " "), "%v %s", e, l.row)
		}
	}
	for _, e := range tables.Editions() {
		assert.Len(t, e.Insulations(), map[tables.Code]int{tables.NEC: 28, tables.CEC: 33}[e.Code()], e.String())
		assert.Len(t, e.Insulations(), listed[e], e.String())
	}
}

// TestPublishedSizes holds the cross-sections, NFPA 70 Chapter 9 Table 8, and
// that the library has no other size of the series.
func TestPublishedSizes(t *testing.T) {
	records := readRecords(t, "sizes.csv")
	require.Len(t, tables.Sizes(), len(records))
	for i, rec := range records {
		size, err := tables.ParseSize(rec[0])
		require.NoError(t, err)
		assert.Equal(t, tables.Sizes()[i], size)
		assert.True(t, decimal.RequireFromString(rec[2]).Equal(size.Area()), "%v: %v", size, size.Area())
		// 1 cmil is 0.0005067075 mm2; the page has three or four figures.
		cmil := decimal.RequireFromString(rec[1])
		want, _ := cmil.Mul(decimal.RequireFromString("0.0005067075")).Float64()
		got, _ := size.Area().Float64()
		assert.InEpsilon(t, want, got, 0.003, "%v", size)
	}
}

// TestPublishedRows holds that the library prints no row or column beyond the
// published ones: the message for a power that no table has lists every row.
func TestPublishedRows(t *testing.T) {
	asked := 0
	for _, file := range []string{"full_load.csv", "locked_rotor.csv"} {
		heads, rows := make(map[string]line), make(map[tables.Edition]map[string][]string)
		for _, e := range tables.Editions() {
			rows[e] = make(map[string][]string)
		}
		for _, l := range readPublished(t, file) {
			if _, ok := heads[l.table]; !ok {
				heads[l.table] = l
				continue
			}
			for g, group := range l.groups {
				for i, cell := range group {
					key := strings.Join([]string{l.table, strconv.Itoa(g), heads[l.table].groups[g][i]}, ",")
					for _, e := range l.editions {
						if cell != "-" {
							rows[e][key] = append(rows[e][key], l.row)
						}
					}
				}
			}
		}
		for e, columns := range rows {
			for key, want := range columns {
				asked++
				part := strings.Split(key, ",")
				l := heads[part[0]]
				l.row = "9999"
				look := fullLoad
				if file == "locked_rotor.csv" {
					look = lockedRotor
				}
				for _, got := range look(e, l, volts(part[1]), part[2]) {
					var missing *tables.NotTabulatedError
					require.ErrorAs(t, got.err, &missing)
					assert.Equal(t, strings.Join(want, ", ")+" hp", missing.Covers, "%v %s", e, key)
				}
			}
		}
	}
	// Per edition: NFPA 70 26 columns of full load and 9 of locked rotor, CSA C22.1 18.
	assert.Equal(t, 3*(26+9)+2*18, asked)
}

// TestPublishedSizesOfTables holds that no ampacity table has a row or column
// beyond the published ones.
func TestPublishedSizesOfTables(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, run := range []tables.Run{tables.InRaceway, tables.InFreeAir} {
			for _, m := range []tables.Material{tables.Copper, tables.Aluminum} {
				table, err := e.Ampacities(run, m)
				require.NoError(t, err)
				want := 30 // from 18 AWG
				if e.Code() == tables.CEC {
					want = 28 // from 14 AWG
				}
				if m == tables.Aluminum {
					want = 27 // from 12 AWG
				}
				rows := 0
				for _, s := range tables.Sizes() {
					if !table.Ampacity(s, 90).IsZero() {
						rows++
					}
				}
				assert.Equal(t, want, rows, "%v %v %v", e, run, m)
				hottest := 90
				if e.Code() == tables.CEC && run == tables.InRaceway {
					hottest = 200
				}
				assert.Equal(t, hottest, table.Column(1000), "%v %v %v", e, run, m)
				assert.Equal(t, 60, table.Column(74))
				assert.Zero(t, table.Column(59))
			}
		}
	}
}
