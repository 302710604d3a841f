// Takeoff sizes a motor schedule, and the feeders that its motors name, and sums
// what they take into a bill of quantities: conductors, bonding conductors,
// raceway, devices, overload protection, disconnecting means and controllers.
//
//	go run ./examples/takeoff
//	go run ./examples/takeoff -format csv -feeders feeders.csv schedule.csv
//	go run ./examples/takeoff -prices prices.csv schedule.csv
//
// The inputs are those of examples/schedule. A prices file has the columns kind,
// item and unit_price, in the words of the bill. Without arguments the program
// runs on the sample schedule, with prices that are invented. A row that cannot
// be sized is told on standard error and left out. The exit status is 0 if every
// row is in the bill, 1 if any is not, and 2 if the command line, a header or a
// price cannot stand.
//
// Cautions: the figures are for design by or under a licensed person: the
// printed code in force, local amendments, equipment markings and the authority
// having jurisdiction decide. A bill is no better than the lengths it is given.
package main

import (
	_ "embed"
	"os"

	"example.org/motorcircuit/examples/internal/schedule"
)

//go:embed sample_prices.csv
var prices string // invented

func main() {
	os.Exit(schedule.RunTakeoff(prices, os.Args[1:], os.Stdin, os.Stdout, os.Stderr))
}
