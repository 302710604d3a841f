// Schedule sizes the branch circuits of a motor schedule, and the feeders that
// its motors name: one CSV row in, one answer out. Run it on its own sample, or
// on files ("-" is standard input):
//
//	go run ./examples/schedule
//	go run ./examples/schedule -format csv schedule.csv > sized.csv
//	go run ./examples/schedule -feeders feeders.csv schedule.csv
//
// The header names the columns, in any order; the columns_*.go files list those
// it knows. Of a schedule only tag, code, kind, power and volts must be there, of
// a feeders file only tag and code. Columns it does not know are passed through.
// A row that cannot be sized tells all its faults in the words of the columns,
// and the other rows go on.
//
// Feeders are answered with -feeders: each motor names the tag of its feeder in
// the column feeder, and the feeder carries all motors that name it. A feeder is
// not sized unless all its motors are, and a tag that the feeders file lacks is
// answered as a feeder that failed. The feeders come after the motors: as text
// under a heading, as CSV after a blank line with a header of their own, as JSON
// in an object {"circuits":[...],"feeders":[...]}. Without -feeders the column
// feeder is not used, CSV is one block and JSON one array; only the sample as
// text shows the sample's feeders unasked.
//
// The exit status is 0 if every row was sized, 1 if any motor or feeder was not,
// and 2 if the command line or a header cannot stand, or reading or writing broke
// off.
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

	mc "example.org/motorcircuit"
)

// The sample: an invented yard that dries seaweed.
var (
	//go:embed sample.csv
	sample string
	//go:embed sample_feeders.csv
	sampleFeeders string
)

// The exit statuses.
const (
	allSized  = 0
	someBad   = 1
	cannotRun = 2
)

// An output writes answers in one format, a row at a time: the motors, then the
// feeders if there are any to answer.
type output interface {
	begin(passed []string) error // names of the passed-through columns
	row(a *answer[mc.Result]) error
	end(sized, failed int) error // after the last row

	beginFeeders(passed []string) error
	feeder(a *answer[mc.FeederResult]) error
	endFeeders(sized, failed int) error
}

// formats are the formats of -format.
var formats = []struct {
	name string
	make func(w io.Writer, feeders bool) output
}{
	{"text", func(w io.Writer, _ bool) output { return &textOutput{w: w} }},
	{"csv", func(w io.Writer, _ bool) output { return newCSVOutput(w) }},
	{"json", func(w io.Writer, feeders bool) output { return &jsonOutput{w: w, feeders: feeders} }},
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
		fmt.Fprintf(stderr, "usage: schedule [-format %s] [-feeders feeders.csv] [schedule.csv]\n", strings.Join(formatNames(), "|"))
		flags.PrintDefaults()
	}
	format := flags.String("format", "text", "`format` of the answers: "+strings.Join(formatNames(), ", "))
	feedersName := ""
	flags.Func("feeders", "`file` of the feeders that the motors name", func(name string) error {
		if feedersName = name; name == "" {
			return errors.New("want a file name")
		}
		return nil
	})
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
	if feedersName == "-" && flags.Arg(0) == "-" {
		return complain(errors.New("standard input cannot be both the schedule and the feeders file"))
	}
	var feeders *feederList
	if feedersName != "" {
		feeders, err = openFeeders(feedersName, stdin)
	} else if flags.NArg() == 0 && *format == "text" {
		feeders, err = readFeeders(strings.NewReader(sampleFeeders))
	}
	if err != nil {
		return complain(err)
	}
	s, err := openSheet(motors, in)
	if err != nil {
		return complain(err)
	}
	buffered := bufio.NewWriterSize(stdout, 64<<10)
	failed, err := answerAll(s, feeders, newOutput(buffered, feeders != nil), newProgress(stderr))
	if err := errors.Join(err, buffered.Flush()); err != nil {
		return complain(err)
	}
	if failed > 0 {
		return someBad
	}
	return allSized
}

func formatNames() []string {
	names := make([]string, len(formats))
	for i, f := range formats {
		names[i] = f.name
	}
	return names
}

func pick(name string) (func(io.Writer, bool) output, error) {
	for _, f := range formats {
		if f.name == name {
			return f.make, nil
		}
	}
	return nil, fmt.Errorf("unknown -format %q: want one of %s", clip(name), strings.Join(formatNames(), ", "))
}

// open opens the schedule that the arguments name, or the sample.
func open(args []string, stdin io.Reader) (r io.Reader, closeInput func(), err error) {
	switch len(args) {
	case 0:
		return strings.NewReader(sample), func() {}, nil
	case 1:
		return openFile(args[0], stdin)
	}
	return nil, nil, fmt.Errorf("want one file name, after the flags; got %d arguments", len(args))
}

// openFeeders reads the feeders file of a name.
func openFeeders(name string, stdin io.Reader) (*feederList, error) {
	r, closeInput, err := openFile(name, stdin)
	if err != nil {
		return nil, err
	}
	defer closeInput()
	feeders, err := readFeeders(r)
	if err != nil {
		return nil, fmt.Errorf("feeders file %s: %w", name, err)
	}
	return feeders, nil
}

func openFile(name string, stdin io.Reader) (r io.Reader, closeInput func(), err error) {
	if name == "-" {
		return stdin, func() {}, nil
	}
	f, err := os.Open(name)
	if err != nil {
		return nil, nil, err
	}
	return f, func() { f.Close() }, nil
}
