package tables

import (
	"embed"
	"fmt"
	"sync"

	"example.org/motorcircuit/internal/csvgrid"
	"example.org/motorcircuit/internal/exact"
)

//go:embed data/*/*.csv
var files embed.FS

func open(path string) (*csvgrid.Grid, error) { return csvgrid.Read(files, "data/"+path) }

// loaded makes a table that is read and checked on first use and never
// modified after. It panics if the embedded file is broken, which no input can
// bring about.
func loaded[T any](load func() (T, error)) func() T {
	return sync.OnceValue(func() T {
		t, err := load()
		if err != nil {
			panic(fmt.Sprintf("motorcircuit: broken embedded table: %v", err))
		}
		return t
	})
}

// bySize reads a column of a file whose first column is the conductor size, of
// the rows to keep.
func bySize(path, column string, keep func(row []string) bool) (map[Size]exact.Num, error) {
	g, err := open(path)
	if err != nil {
		return nil, err
	}
	col, err := g.Col(column)
	if err != nil {
		return nil, err
	}
	cells := make(map[Size]exact.Num, len(g.Rows))
	for _, row := range g.Rows {
		if !keep(row) {
			continue
		}
		s, err := ParseSize(row[0])
		if err != nil {
			return nil, fmt.Errorf("%s: %w", path, err)
		}
		if cells[s], err = exact.Parse(row[col]); err != nil {
			return nil, fmt.Errorf("%s: %v, %s: %w", path, s, column, err)
		}
	}
	return cells, nil
}

// Rows of a file of conductors: all of it, or those of stranded conductors.
func every([]string) bool        { return true }
func stranded(row []string) bool { return row[1] == "stranded" }

// rising reports a list that does not strictly rise.
func rising(path string, list []int64) error {
	for i := 1; i < len(list); i++ {
		if list[i] <= list[i-1] {
			return fmt.Errorf("%s: %d after %d hundredths", path, list[i], list[i-1])
		}
	}
	return nil
}
