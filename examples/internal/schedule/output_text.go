package schedule

import (
	"fmt"
	"io"
	"strings"

	mc "example.org/motorcircuit"
)

// rule parts the rows of the text output.
var rule = "\n" + strings.Repeat("-", 72) + "\n\n"

// A textOutput writes the derivation of each row and a summary, then the same
// of the feeders under a heading.
type textOutput struct {
	w   io.Writer
	bad string // what a row with faults is called
}

func (o *textOutput) begin([]string) error { return nil }

func (o *textOutput) row(a *answer[mc.Result]) error { return writeText(o, a) }

func (o *textOutput) end(sized, failed int) error {
	return o.write(fmt.Sprintf("%d rows sized, %d failed\n", sized, failed))
}

func (o *textOutput) beginFeeders([]string) error { return o.write(rule + "Feeders\n\n") }

func (o *textOutput) feeder(a *answer[mc.FeederResult]) error { return writeText(o, a) }

func (o *textOutput) endFeeders(sized, failed int) error {
	return o.write(fmt.Sprintf("%d feeders sized, %d failed\n", sized, failed))
}

func writeText[R fmt.Stringer](o *textOutput, a *answer[R]) error {
	if len(a.faults) == 0 {
		return o.write(a.result.String() + rule)
	}
	line := ""
	if a.line > 0 {
		line = fmt.Sprintf(", line %d", a.line)
	}
	return o.write(fmt.Sprintf("%s: %s%s\n  - %s\n", nameOf(a.tag), o.bad, line, strings.Join(a.faults, "\n  - ")) + rule)
}

func (o *textOutput) write(text string) error {
	_, err := io.WriteString(o.w, text)
	return err
}

// nameOf returns a tag on one line, "-" for none.
func nameOf(tag string) string {
	if name := oneLine(tag); name != "" {
		return name
	}
	return "-"
}
