package motor_test

import (
	"fmt"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The NEC takes its table for conductors and the nameplate for overload; the
// CEC takes the nameplate for both.
func ExampleMotor_Demand() {
	m := motor.Motor{
		Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460,
		Nameplate: motor.Nameplate{Amperes: motor.Amps("61")},
	}
	for _, e := range []tables.Edition{tables.NEC2023, tables.CEC2024} {
		d, err := m.Demand(e)
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Println(e.Standard())
		for _, f := range []tables.Figure{d.Design, d.Overload, d.Branch} {
			fmt.Printf("  %s: %v [%s]\n", f.Name(), f, f.Citation().Ref)
		}
	}
	// Output:
	// NFPA 70-2023
	//   design current: 65 A [430.6(A)(1)]
	//   overload current: 61 A [430.6(A)(2)]
	//   least ampacity of the branch-circuit conductors: 81.25 A [430.22]
	// CSA C22.1:24
	//   design current: 61 A [Rule 28-106(1)]
	//   overload current: 61 A [Rule 28-306(1)]
	//   least ampacity of the branch-circuit conductors: 76.25 A [Rule 28-106(1)]
}
