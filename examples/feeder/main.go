// Feeder sizes a feeder of four motors at 575 V under CEC-2024 and prints the
// derivation: a pump with a standby that never runs beside it, a hoist of
// intermittent duty, a fan, and heaters that run on.
//
//	go run ./examples/feeder
//
// Cautions: the figures are for design by or under a licensed person: the
// printed code in force, local amendments, equipment markings and the authority
// having jurisdiction decide.
package main

import (
	"fmt"
	"io"
	"log"
	"os"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

func main() {
	if err := run(os.Stdout); err != nil {
		log.Fatal(err)
	}
}

// run sizes the feeder and prints it to w.
func run(w io.Writer) error {
	wiring := conductor.Wiring{Insulation: "RW90", Termination: 75, Ambient: motor.Celsius("30")}
	circuit := func(tag, hp, amps string, duty motor.Duty) motorcircuit.Circuit {
		return motorcircuit.Circuit{Tag: tag, Edition: tables.CEC2024, Device: protection.InverseTimeBreaker, Wiring: wiring,
			Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(hp), Voltage: 575, Duty: duty,
				Nameplate: motor.Nameplate{Amperes: motor.Amps(amps), ServiceFactor: motor.Factor("1.15")}}}
	}
	res, err := motorcircuit.SizeFeeder(motorcircuit.Feeder{
		Tag: "F-12", Edition: tables.CEC2024, Device: protection.InverseTimeBreaker, Wiring: wiring,
		Circuits: []motorcircuit.FeederCircuit{
			{Circuit: circuit("P-1 brine pump", "40", "39", motor.Duty{}), Interlock: "brine pumps"},
			{Circuit: circuit("P-2 standby pump", "40", "39", motor.Duty{}), Interlock: "brine pumps"},
			{Circuit: circuit("H-1 bale hoist", "30", "31", motor.Duty{Kind: motor.Intermittent, Minutes: 30})},
			{Circuit: circuit("V-1 dryer fan", "15", "16", motor.Duty{})},
		},
		Continuous: motor.Amps("24"),
	})
	if err != nil {
		return err
	}
	fmt.Fprintln(w, res)
	fmt.Fprintln(w, "conductors:", res.Conductors.Size, "for", res.Ampacity, "by", res.Ampacity.Citation())
	fmt.Fprintln(w, "breaker:", res.Rating, "under a limit of", res.Limit)
	_, err = fmt.Fprintln(w, "bonding:", res.Bonding.Size)
	return err
}
