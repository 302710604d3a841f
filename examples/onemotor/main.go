// Onemotor sizes the branch circuit of one motor, a 15 hp conveyor at 460 V
// under NEC-2023, and prints the derivation and a few of its figures:
//
//	go run ./examples/onemotor
//
// Cautions: the figures are for design by or under a licensed person: the
// printed code in force, local amendments, equipment markings and the authority
// having jurisdiction decide.
package main

import (
	"fmt"
	"log"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

func main() {
	res, err := motorcircuit.Size(motorcircuit.Circuit{
		Tag:     "CV-204",
		Edition: tables.NEC2023,
		Motor: motor.Motor{
			Kind: motor.SquirrelCage, Power: motor.HP("15"), Voltage: 460,
			Nameplate: motor.Nameplate{Amperes: motor.Amps("19.5"), ServiceFactor: motor.Factor("1.15"), CodeLetter: "G", DesignLetter: "B"},
		},
		Device: protection.InverseTimeBreaker,
		Wiring: conductor.Wiring{Insulation: "THWN-2", Ambient: motor.Celsius("35"), Termination: 75},
	})
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println(res)
	fmt.Println("conductor:", res.Branch.Size, "for", res.Branch.Required, "by", res.Branch.Required.Citation())
	fmt.Println("breaker:", res.ShortCircuit.Rating, "under a limit of", res.ShortCircuit.Limit)
	fmt.Println("overload:", res.Overload.Limit, "=", res.Overload.Limit.How())
}
