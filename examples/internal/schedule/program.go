// Package schedule is what the example programs schedule, takeoff and check share:
// it reads motor schedules, feeders files and installed circuits, sizes or judges
// their rows one by one, and writes the answers or a bill of quantities.
package schedule

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
	allGood   = 0
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

// A format is a format of -format, which a function of type M makes an output of.
type format[M any] struct {
	name string
	make M
}

type newOutput = func(w io.Writer, s settings) output

// settings are what an output may want to know.
type settings struct {
	feeders bool      // whether feeders are answered
	prices  priceList // nil for none
	sample  bool      // the prices are those of the sample
	stderr  io.Writer
}

// formats are the formats of the program schedule.
var formats = []format[newOutput]{
	{"text", func(w io.Writer, _ settings) output { return &textOutput{w, "not sized"} }},
	{"csv", func(w io.Writer, _ settings) output { return newCSVOutput(w) }},
	{"json", func(w io.Writer, s settings) output {
		return &jsonOutput{jsonArray: jsonArray{w: w}, feeders: s.feeders}
	}},
}

// A program is one of the programs that read a schedule.
type program struct {
	name    string
	formats []format[newOutput]
	prices  string // sample of unit prices; "" for a program without prices
}

// Run is the program schedule; it returns the exit status.
func Run(args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	return program{name: "schedule", formats: formats}.run(args, stdin, stdout, stderr)
}

// run is the whole program; it returns the exit status.
func (p program) run(args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	complain := complaints(p.name, stderr)
	usage := "[-feeders feeders.csv] [schedule.csv]"
	if p.prices != "" {
		usage = "[-feeders feeders.csv] [-prices prices.csv] [schedule.csv]"
	}
	flags, format := flagsOf(p.name, usage, p.formats, stderr)
	pricesName := ""
	if p.prices != "" {
		flags.StringVar(&pricesName, "prices", "", "`file` of unit prices")
	}
	feedersName := ""
	flags.Func("feeders", "`file` of the feeders that the motors name", func(name string) error {
		if feedersName = name; name == "" {
			return errors.New("want a file name")
		}
		return nil
	})
	if err := flags.Parse(args); errors.Is(err, flag.ErrHelp) {
		return allGood
	} else if err != nil {
		return cannotRun // flags has said why
	}
	makeOutput, err := pick(p.formats, *format)
	if err != nil {
		return complain(err)
	}
	in, closeInput, err := open(flags.Args(), sample, stdin)
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
	} else if flags.NArg() == 0 && (*format == "text" || p.prices != "") {
		feeders, err = readFeeders(strings.NewReader(sampleFeeders))
	}
	if err != nil {
		return complain(err)
	}
	if pricesName == "-" && (feedersName == "-" || flags.Arg(0) == "-") {
		return complain(errors.New("standard input cannot be the prices file and another input too"))
	}
	prices, err := p.openPrices(pricesName, flags.NArg() == 0, stdin)
	if err != nil {
		return complain(err)
	}
	s, err := openSheet(motors, in)
	if err != nil {
		return complain(err)
	}
	buffered := bufio.NewWriterSize(stdout, 64<<10)
	out := makeOutput(buffered, settings{feeders: feeders != nil, prices: prices, sample: pricesName == "", stderr: stderr})
	failed, err := answerAll(s, feeders, out, newProgress(p.name, stderr))
	if err := errors.Join(err, buffered.Flush()); err != nil {
		return complain(err)
	}
	return statusOf(failed)
}

// complaints returns what tells that the program cannot run.
func complaints(name string, stderr io.Writer) func(error) int {
	return func(err error) int {
		fmt.Fprintf(stderr, "%s: %v\n", name, err)
		return cannotRun
	}
}

// flagsOf returns the flags of a program, of which -format is the first.
func flagsOf[M any](name, usage string, formats []format[M], stderr io.Writer) (flags *flag.FlagSet, format *string) {
	names := formatNames(formats)
	flags = flag.NewFlagSet(name, flag.ContinueOnError)
	flags.SetOutput(stderr)
	flags.Usage = func() {
		fmt.Fprintf(stderr, "usage: %s [-format %s] %s\n", name, strings.Join(names, "|"), usage)
		flags.PrintDefaults()
	}
	return flags, flags.String("format", "text", "`format` of the answers: "+strings.Join(names, ", "))
}

func statusOf(bad int) int {
	if bad > 0 {
		return someBad
	}
	return allGood
}

func formatNames[M any](formats []format[M]) []string {
	names := make([]string, len(formats))
	for i, f := range formats {
		names[i] = f.name
	}
	return names
}

func pick[M any](formats []format[M], name string) (makeOutput M, err error) {
	for _, f := range formats {
		if f.name == name {
			return f.make, nil
		}
	}
	return makeOutput, fmt.Errorf("unknown -format %q: want one of %s", clip(name), strings.Join(formatNames(formats), ", "))
}

// open opens the file that the arguments name, or the sample.
func open(args []string, sample string, stdin io.Reader) (r io.Reader, closeInput func(), err error) {
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
