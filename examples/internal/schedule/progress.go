package schedule

import (
	"fmt"
	"io"
	"os"
)

// progressEvery is how many rows go by between two reports.
const progressEvery = 10_000

// A progress reports how far a long schedule has come. The zero progress is silent.
type progress struct{ w io.Writer }

// newProgress reports to w if that is a terminal.
func newProgress(w io.Writer) progress {
	if f, ok := w.(*os.File); ok {
		if info, err := f.Stat(); err == nil && info.Mode()&os.ModeCharDevice != 0 {
			return progress{w}
		}
	}
	return progress{}
}

func (p progress) report(rows int) {
	if p.w != nil && rows%progressEvery == 0 {
		fmt.Fprintf(p.w, "schedule: %d rows\n", rows)
	}
}
