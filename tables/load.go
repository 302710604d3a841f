package tables

import (
	"embed"
	"fmt"
	"sync"

	"example.org/motorcircuit/internal/csvgrid"
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

// rising reports a list that does not strictly rise.
func rising(path string, list []int64) error {
	for i := 1; i < len(list); i++ {
		if list[i] <= list[i-1] {
			return fmt.Errorf("%s: %d after %d hundredths", path, list[i], list[i-1])
		}
	}
	return nil
}
