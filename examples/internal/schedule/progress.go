package schedule

import (
	"fmt"
	"io"
	"os"
)

// progressEvery is how many rows go by between two reports.
const progressEvery = 10_000

// A progress reports how far a program has come with a long file. The zero progress
// is silent.
type progress struct {
	name string
	w    io.Writer
}

// newProgress reports to w if that is a terminal.
func newProgress(name string, w io.Writer) progress {
	if f, ok := w.(*os.File); ok {
		if info, err := f.Stat(); err == nil && info.Mode()&os.ModeCharDevice != 0 {
			return progress{name, w}
		}
	}
	return progress{}
}

func (p progress) report(rows int) {
	if p.w != nil && rows%progressEvery == 0 {
		fmt.Fprintf(p.w, "%s: %d rows\n", p.name, rows)
	}
}
