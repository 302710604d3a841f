package conductor_test

import (
	"fmt"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// The conductors of a 50 hp, 460 V motor, 125 % of 65 A, through a hot place: the
// factor acts on the 90 °C column, the terminals hold the 75 °C one.
func ExampleWiring_Select() {
	w := conductor.Wiring{
		Insulation:  "THWN-2",
		Ambient:     tables.Must(tables.ParseTemperature("40")),
		Termination: 75,
	}
	s, err := w.Select(tables.NEC2023, conductor.Load{
		Ampacity: tables.Must(tables.ParseCurrent("81.25")).Figure("least ampacity"),
		Count:    3,
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(s.Size, s.Material)
	fmt.Println("factor:", s.Ambient, "by", s.Ambient.Citation())
	fmt.Println("usable:", s.Ampacity)
	fmt.Printf("%v has %v and %s\n", s.Smaller.Size, s.Smaller.Ampacity, s.Smaller.Why)
	// Output:
	// 4 AWG copper
	// factor: 0.91 by NFPA 70-2023 Table 310.15(B)(1)(1)
	// usable: 85 A
	// 6 AWG has 65 A and carries less than is asked for
}
