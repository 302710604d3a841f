// Check judges installed motor circuits: one CSV row in, the findings on it out.
// Run it on its own sample, or on a file ("-" is standard input):
//
//	go run ./examples/check
//	go run ./examples/check -format csv installed.csv > findings.csv
//	go run ./examples/check -only violation installed.csv
//
// The columns are those of a motor schedule (examples/schedule), which describe the
// motor and how its circuit is run, and those of what is installed, listed in
// columns_installed.go of examples/internal/schedule. Only tag, code, kind, power
// and volts must be there: what is not given is not judged. Columns it does not know
// are passed through, and so is the column feeder. A row that cannot be judged tells
// all its faults in the words of the columns, and the other rows go on.
//
// The flag -only gives the least severity of the findings shown: violation, caution,
// which is taken if it is not given, or note, which shows the requirements that are
// met too. In text the first line of a report counts all findings. As CSV there is
// one line for each finding that is shown; what was not judged, and what a judgement
// rests on, is told as text and as JSON only.
//
// The exit status is 0 if no circuit has a violation, 1 if any has one or could not
// be judged, and 2 if the command line or the header cannot stand, or reading or
// writing broke off. The flag -only does not change it.
//
// Cautions: every report carries its own. The findings are an aid to inspection by
// or under a licensed person: the printed code in force, local amendments, equipment
// markings and the authority having jurisdiction decide.
package main

import (
	"os"

	"example.org/motorcircuit/examples/internal/schedule"
)

func main() { os.Exit(schedule.RunCheck(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) }
