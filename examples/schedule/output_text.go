package main

import (
	"fmt"
	"io"
	"strings"
)

// rule parts the rows of the text output.
var rule = "\n" + strings.Repeat("-", 72) + "\n\n"

// A textOutput writes the derivation of each row and a summary.
type textOutput struct{ w io.Writer }

func (o *textOutput) begin([]string) error { return nil }

func (o *textOutput) row(a *answer) error {
	text := a.result.String()
	if len(a.faults) > 0 {
		text = fmt.Sprintf("%s: not sized, line %d\n  - %s\n", nameOf(a), a.line, strings.Join(a.faults, "\n  - "))
	}
	_, err := io.WriteString(o.w, text+rule)
	return err
}

func (o *textOutput) end(sized, failed int) error {
	_, err := fmt.Fprintf(o.w, "%d rows sized, %d failed\n", sized, failed)
	return err
}

// nameOf returns the tag on one line, "-" if the row has none.
func nameOf(a *answer) string {
	if name := strings.Join(strings.Fields(a.tag), " "); name != "" {
		return name
	}
	return "-"
}
