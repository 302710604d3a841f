package csvgrid_test

import (
	"testing"
	"testing/fstest"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/csvgrid"
	"example.org/motorcircuit/internal/exact"
)

func read(text string) (*csvgrid.Grid, error) {
	return csvgrid.Read(fstest.MapFS{"data/t.csv": {Data: []byte(text)}}, "data/t.csv")
}

func TestRead(t *testing.T) {
	g, err := read("power,v230,note\n1/2,2.2,\"small, but usual\"\n50,,\n")
	require.NoError(t, err)
	assert.Equal(t, "data/t.csv", g.Path)
	assert.Equal(t, []string{"power", "v230", "note"}, g.Header)
	assert.Equal(t, [][]string{{"1/2", "2.2", "small, but usual"}, {"50", "", ""}}, g.Rows)
	col, err := g.Col("note")
	require.NoError(t, err)
	assert.Equal(t, 2, col)
	_, err = g.Col("v460")
	assert.EqualError(t, err, `data/t.csv: no column "v460"`)
}

func TestReadRefuses(t *testing.T) {
	for _, tt := range []struct{ name, text, want string }{
		{"empty", "", "data/t.csv: no rows"},
		{"header only", "a,b\n", "data/t.csv: no rows"},
		{"short row", "a,b\n1,2\n3\n", "data/t.csv: record on line 3: wrong number of fields"},
		{"long row", "a,b\n1,2,3\n", "data/t.csv: record on line 2: wrong number of fields"},
		{"space before", "a,b\n1, 2\n", `data/t.csv: row 2: stray space in " 2"`},
		{"space after", "a,b \n1,2\n", `data/t.csv: row 1: stray space in "b "`},
		{"no-break space", "a,b\n1,2\u00a0\n", "data/t.csv: row 2: stray space"},
		{"open quote", "a,b\n\"1,2\n", "data/t.csv: parse error on line 2"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			g, err := read(tt.text)
			assert.Nil(t, g)
			assert.ErrorContains(t, err, tt.want)
		})
	}
	_, err := csvgrid.Read(fstest.MapFS{}, "none.csv")
	assert.ErrorContains(t, err, "none.csv")
}

func TestHundredths(t *testing.T) {
	g, err := read("a\n65\n7.6\n81.25\n0\n12.50\n81.250\n0.005\nx\n-1\n1e3\n1234567890\n\"\"\n")
	require.NoError(t, err)
	for row, want := range []int64{6500, 760, 8125, 0, 1250, 8125} {
		got, err := g.Hundredths(row, 0)
		require.NoError(t, err)
		assert.Equal(t, want, got)
	}
	_, err = g.Hundredths(6, 0)
	assert.EqualError(t, err, `data/t.csv: row 8, a: "0.005" has more than two places`)
	for _, row := range []int{7, 8, 9} {
		_, err = g.Hundredths(row, 0)
		assert.ErrorIs(t, err, exact.ErrSyntax)
	}
	_, err = g.Hundredths(10, 0)
	assert.ErrorIs(t, err, exact.ErrLarge)
	blank, err := g.Hundredths(11, 0)
	require.NoError(t, err)
	assert.Equal(t, int64(-1), blank, "a blank cell is not tabulated, never zero")
}

func TestInt(t *testing.T) {
	g, err := read("a,b\n41,\n-5,4.5\n")
	require.NoError(t, err)
	for _, tt := range []struct{ row, col, want int }{{0, 0, 41}, {0, 1, 7}, {1, 0, -5}} {
		got, err := g.Int(tt.row, tt.col, 7)
		require.NoError(t, err)
		assert.Equal(t, tt.want, got)
	}
	_, err = g.Int(1, 1, 7)
	assert.ErrorContains(t, err, "data/t.csv: row 3, b:")
}
