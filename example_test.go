package motorcircuit_test

import (
	"encoding/json"
	"fmt"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// screen is an intake screen of a waterworks, invented.
var screen = motorcircuit.Circuit{
	Tag: "IS-7", Edition: tables.NEC2023, Device: protection.InverseTimeBreaker,
	Motor:  motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("25"), Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("32"), ServiceFactor: motor.Factor("1.15")}},
	Wiring: conductor.Wiring{Insulation: "THWN-2", Termination: 75},
}

func ExampleSize() {
	r, err := motorcircuit.Size(screen)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(r.Branch.Size, "for", r.Branch.Required, "=", r.Branch.Required.How())
	fmt.Println(r.ShortCircuit.Rating, "by", r.ShortCircuit.Rating.Citation())
	// Output:
	// 8 AWG for 42.5 A = design current 34 A × 125 %
	// 90 A by NFPA 70-2023 430.52(C)(1)(a)
}

func ExampleCheck() {
	report, err := motorcircuit.Check(screen, motorcircuit.Installed{
		Branch:   motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("10"))},
		Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("40")},
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, f := range report.Findings {
		if f.Severity != motorcircuit.Note {
			fmt.Println(f.Severity, f.Code, f.Part, f.Margin)
		}
	}
	// Output:
	// violation conductor_ampacity branch -7.5 A
}

func ExampleReverse() {
	h, err := motorcircuit.Reverse(screen, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("6"))}})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(h.Power, "is the largest motor; the next asks for", h.Motor.Binds.Required)
	fmt.Println(h.Ambient.Value, "is the highest ambient")
	// Output:
	// 40 hp is the largest motor; the next asks for 81.25 A
	// 70 °C is the highest ambient
}

func ExampleCompare() {
	x, err := motorcircuit.Compare(motorcircuit.Circuit{Device: protection.InverseTimeBreaker, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("2"), Voltage: 460}}, tables.NEC2020, tables.NEC2023)
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, d := range x.Differences {
		if d.What == "standard rating" {
			fmt.Println(d.Values, d.Cites[1])
		}
	}
	// Output:
	// [15 A 10 A] NFPA 70-2023 430.52(C)(1)(a)
}

func ExampleCircuit_UnmarshalJSON() {
	var c motorcircuit.Circuit
	err := json.Unmarshal([]byte(`{"edition": "NEC-2023", "motor": {"kind": "squirrel_cage", "power": "25 hp", "voltage": 460}, "wiring": {"length": "60 m", "colour": "red", "termination": "75"}}`), &c)
	for _, fault := range tables.Faults(err) {
		fmt.Println(tables.FieldOf(fault))
	}
	// Output:
	// wiring.colour
	// wiring.termination
}
