// Schedule sizes the branch circuits of a motor schedule: one CSV row in, one
// answer out. Run it on its own sample, or on a file ("-" is standard input):
//
//	go run ./examples/schedule
//	go run ./examples/schedule -format csv schedule.csv > sized.csv
//
// The header names the columns, in any order; see columns.go for those it knows.
// Only tag, code, kind, power and volts must be there. Columns it does not know
// are passed through. A row that cannot be sized tells all its faults in the
// words of the columns, and the other rows go on.
//
// The exit status is 0 if every row was sized, 1 if any was not, and 2 if the
// command line or the header cannot stand, or reading or writing broke off.
//
// Cautions: every answer carries its own. The figures are for design by or under
// a licensed person: the printed code in force, local amendments, equipment
// markings and the authority having jurisdiction decide.
package main

import (
	"bufio"
	_ "embed"
	"errors"
	"flag"
	"fmt"
	"io"
	"os"
	"strings"
)

//go:embed sample.csv
var sample string

// The exit statuses.
const (
	allSized  = 0
	someBad   = 1
	cannotRun = 2
)

// An output writes answers in one format, a row at a time.
type output interface {
	begin(passed []string) error // names of the passed-through columns
	row(a *answer) error         // the answer to one row
	end(sized, failed int) error // after the last row
}

// formats are the formats of -format.
var formats = []struct {
	name string
	make func(io.Writer) output
}{
	{"text", func(w io.Writer) output { return &textOutput{w: w} }},
	{"csv", func(w io.Writer) output { return newCSVOutput(w) }},
	{"json", func(w io.Writer) output { return &jsonOutput{w: w} }},
}

func main() { os.Exit(run(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) }

// run is the whole program; it returns the exit status.
func run(args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	complain := func(err error) int {
		fmt.Fprintf(stderr, "schedule: %v\n", err)
		return cannotRun
	}
	flags := flag.NewFlagSet("schedule", flag.ContinueOnError)
	flags.SetOutput(stderr)
	flags.Usage = func() {
		fmt.Fprintf(stderr, "usage: schedule [-format %s] [schedule.csv]\n", strings.Join(formatNames(), "|"))
		flags.PrintDefaults()
	}
	format := flags.String("format", "text", "`format` of the answers: "+strings.Join(formatNames(), ", "))
	if err := flags.Parse(args); errors.Is(err, flag.ErrHelp) {
		return allSized
	} else if err != nil {
		return cannotRun // flags has said why
	}
	newOutput, err := pick(*format)
	if err != nil {
		return complain(err)
	}
	in, closeInput, err := open(flags.Args(), stdin)
	if err != nil {
		return complain(err)
	}
	defer closeInput()
	s, err := newSchedule(in)
	if err != nil {
		return complain(err)
	}
	if unused := s.unused(); len(unused) > 0 {
		fmt.Fprintf(stderr, "schedule: columns that this release does not use: %s\n", strings.Join(unused, ", "))
	}
	buffered := bufio.NewWriterSize(stdout, 64<<10)
	failed, err := answerAll(s, newOutput(buffered), newProgress(stderr))
	if err := errors.Join(err, buffered.Flush()); err != nil {
		return complain(err)
	}
	if failed > 0 {
		return someBad
	}
	return allSized
}

// answerAll answers row by row and keeps none. It returns how many failed.
func answerAll(s *schedule, out output, p progress) (failed int, err error) {
	if err := out.begin(s.passedNames()); err != nil {
		return 0, err
	}
	sized := 0
	var broken error
	for broken == nil {
		var a *answer
		if a, broken = s.next(); a == nil {
			break
		}
		if len(a.faults) > 0 {
			failed++
		} else {
			sized++
		}
		if err := out.row(a); err != nil {
			return failed, err
		}
		p.report(sized + failed)
	}
	if broken == io.EOF {
		broken = nil
	}
	return failed, errors.Join(broken, out.end(sized, failed))
}

func formatNames() []string {
	names := make([]string, len(formats))
	for i, f := range formats {
		names[i] = f.name
	}
	return names
}

func pick(name string) (func(io.Writer) output, error) {
	for _, f := range formats {
		if f.name == name {
			return f.make, nil
		}
	}
	return nil, fmt.Errorf("unknown -format %q: want one of %s", clip(name), strings.Join(formatNames(), ", "))
}

// open opens the file that the arguments name, or the sample.
func open(args []string, stdin io.Reader) (r io.Reader, closeInput func(), err error) {
	none := func() {}
	switch {
	case len(args) == 0:
		return strings.NewReader(sample), none, nil
	case len(args) > 1:
		return nil, none, fmt.Errorf("want one file name, after the flags; got %d arguments", len(args))
	case args[0] == "-":
		return stdin, none, nil
	}
	f, err := os.Open(args[0])
	if err != nil {
		return nil, none, err
	}
	return f, func() { f.Close() }, nil
}
