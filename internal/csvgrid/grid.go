// Package csvgrid reads the published tables: CSV files with a header row,
// checked as they are read.
package csvgrid

import (
	"encoding/csv"
	"fmt"
	"io/fs"
	"slices"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// A Grid is one table file: a header and rows as long as it.
type Grid struct {
	Path   string
	Header []string
	Rows   [][]string
}

// Read reads a table and checks that it has rows, that every row is as long as
// the header, and that no cell has stray space.
func Read(fsys fs.FS, path string) (*Grid, error) {
	f, err := fsys.Open(path)
	if err != nil {
		return nil, err
	}
	defer f.Close()
	rows, err := csv.NewReader(f).ReadAll()
	if err != nil {
		return nil, fmt.Errorf("%s: %w", path, err)
	}
	if len(rows) < 2 {
		return nil, fmt.Errorf("%s: no rows", path)
	}
	for i, row := range rows {
		for _, cell := range row {
			if cell != strings.TrimSpace(cell) {
				return nil, fmt.Errorf("%s: row %d: stray space in %q", path, i+1, cell)
			}
		}
	}
	return &Grid{path, rows[0], rows[1:]}, nil
}

// Col returns the index of a column.
func (g *Grid) Col(name string) (int, error) {
	if i := slices.Index(g.Header, name); i >= 0 {
		return i, nil
	}
	return 0, fmt.Errorf("%s: no column %q", g.Path, name)
}

// Hundredths returns a cell as integer hundredths, -1 for a blank cell ("not
// tabulated", never zero).
func (g *Grid) Hundredths(row, col int) (int64, error) {
	cell := g.Rows[row][col]
	if cell == "" {
		return -1, nil
	}
	n, err := exact.Parse(cell)
	if err != nil {
		return 0, fmt.Errorf("%s: row %d, %s: %q: %w", g.Path, row+2, g.Header[col], cell, err)
	}
	h := n.HundredthsUp()
	if exact.New(h, 2).Cmp(n) != 0 {
		return 0, fmt.Errorf("%s: row %d, %s: %q has more than two places", g.Path, row+2, g.Header[col], cell)
	}
	return h, nil
}

// Int returns a cell as an integer, the given value for a blank cell.
func (g *Grid) Int(row, col, blank int) (int, error) {
	cell := g.Rows[row][col]
	if cell == "" {
		return blank, nil
	}
	i, err := strconv.Atoi(cell)
	if err != nil {
		return 0, fmt.Errorf("%s: row %d, %s: %w", g.Path, row+2, g.Header[col], err)
	}
	return i, nil
}
