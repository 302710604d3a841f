package protection_test

import (
	"fmt"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A breaker for 65 A: the NEC takes 250 % to the next size up, the CEC to the size
// below.
func ExampleSizeShortCircuit() {
	m := motor.Motor{
		Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460,
		Nameplate: motor.Nameplate{Amperes: motor.Amps("65")},
	}
	for _, e := range []tables.Edition{tables.NEC2023, tables.CEC2024} {
		d, err := m.Demand(e)
		if err != nil {
			fmt.Println(err)
			return
		}
		s, err := protection.SizeShortCircuit(e, protection.InverseTimeBreaker, m, d)
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Println(e, "limit", s.Limit, "rating", s.Rating, "to start", s.StartRating)
	}
	// Output:
	// NEC-2023 limit 162.5 A rating 175 A to start 250 A
	// CEC-2024 limit 162.5 A rating 150 A to start 175 A
}

// Overload protection goes by the nameplate, and by its service factor.
func ExampleSizeOverload() {
	m := motor.Motor{
		Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460,
		Nameplate: motor.Nameplate{Amperes: motor.Amps("61"), ServiceFactor: motor.Factor("1.15")},
	}
	d, err := m.Demand(tables.NEC2023)
	if err != nil {
		fmt.Println(err)
		return
	}
	o, err := protection.SizeOverload(tables.NEC2023, m, d)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(o.Limit, "by", o.Limit.Citation())
	fmt.Println(o.StartLimit, "by", o.StartLimit.Citation())
	fmt.Println(o.Units, "units,", o.Units.Note())
	// Output:
	// 76.25 A by NFPA 70-2023 430.32(A)(1)
	// 85.4 A by NFPA 70-2023 430.32(C)
	// 3 units, one in each phase
}
