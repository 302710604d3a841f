// Schedule sizes the branch circuits of a motor schedule, and the feeders that
// its motors name: one CSV row in, one answer out. Run it on its own sample, or
// on files ("-" is standard input):
//
//	go run ./examples/schedule
//	go run ./examples/schedule -format csv schedule.csv > sized.csv
//	go run ./examples/schedule -feeders feeders.csv schedule.csv
//
// The header names the columns, in any order; the columns_*.go files of
// examples/internal/schedule list those it knows. Of a schedule only tag, code, kind, power and volts must be there, of
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
	"os"

	"example.org/motorcircuit/examples/internal/schedule"
)

func main() { os.Exit(schedule.Run(os.Args[1:], os.Stdin, os.Stdout, os.Stderr)) }
