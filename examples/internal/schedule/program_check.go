package schedule

import (
	"bufio"
	_ "embed"
	"errors"
	"flag"
	"io"
	"slices"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// What a round of inspection found in the yard of the sample: invented.
//
//go:embed sample_installed.csv
var sampleInstalled string

// RunCheck is the program check: it judges installed circuits. It returns the exit
// status.
func RunCheck(args []string, stdin io.Reader, stdout, stderr io.Writer) int {
	const name = "check"
	complain := complaints(name, stderr)
	flags, format := flagsOf(name, "[-only violation|caution|note] [installed.csv]", reportFormats, stderr)
	only := mc.Caution
	flags.Func("only", "least `severity` of the findings shown: violation, caution (if not given) or note", func(text string) error {
		for only = range mc.Violation + 1 {
			if only.String() == text {
				return nil
			}
		}
		return errors.New("want violation, caution or note")
	})
	if err := flags.Parse(args); errors.Is(err, flag.ErrHelp) {
		return allGood
	} else if err != nil {
		return cannotRun // flags has said why
	}
	makeOutput, err := pick(reportFormats, *format)
	if err != nil {
		return complain(err)
	}
	in, closeInput, err := open(flags.Args(), sampleInstalled, stdin)
	if err != nil {
		return complain(err)
	}
	defer closeInput()
	s, err := openSheet(installed, in)
	if err != nil {
		return complain(err)
	}
	buffered := bufio.NewWriterSize(stdout, 64<<10)
	bad, err := checkAll(s, only, makeOutput(buffered), newProgress(name, stderr))
	if err := errors.Join(err, buffered.Flush()); err != nil {
		return complain(err)
	}
	return statusOf(bad)
}

// A judged is the report on an installed circuit, whole and with the findings that
// are shown.
type judged struct{ whole, shown mc.Report }

// A verdict counts circuits.
type verdict struct{ judged, violating, failed int }

func (n *verdict) count(a *answer[judged]) {
	switch {
	case len(a.faults) > 0:
		n.failed++
		return
	case len(a.result.whole.Violations()) > 0:
		n.violating++
	}
	n.judged++
}

// checkAll judges row by row and keeps no report. It returns how many circuits have
// a violation or were not judged.
func checkAll(s *sheet[installedRow], only mc.Severity, out reportOutput, p progress) (bad int, err error) {
	if err := out.begin(s.passedNames()); err != nil {
		return 0, err
	}
	var n verdict
	broken, err := s.each(p, func(r *row[installedRow], _ bool) error {
		a := checkRow(r, only)
		n.count(a)
		return out.row(a)
	})
	if err == nil {
		err = out.end(n)
	}
	return n.violating + n.failed, errors.Join(broken, err)
}

// checkRow answers a row of the installed circuits.
func checkRow(r *row[installedRow], only mc.Severity) *answer[judged] {
	return answerTo(r, func(x *installedRow) (judged, tables.Edition, error) {
		report, err := mc.Check(x.circuit, x.stands)
		j := judged{whole: report, shown: report}
		j.shown.Findings = slices.DeleteFunc(append([]mc.Finding{}, report.Findings...), func(f mc.Finding) bool { return f.Severity < only })
		return j, x.circuit.Edition, err
	})
}
