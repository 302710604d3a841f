package tables_test

import (
	"fmt"

	"example.org/motorcircuit/tables"
)

// A 50 hp motor at 460 V, by the table of each edition.
func ExampleEdition_FullLoadCurrent() {
	for _, e := range []tables.Edition{tables.NEC2023, tables.CEC2024} {
		amperes, err := e.FullLoadCurrent(tables.InductionTable, tables.Must(tables.ParseHP("50")), 460)
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Println(amperes, "by", amperes.Citation())
	}
	_, err := tables.NEC2023.FullLoadCurrent(tables.SinglePhaseTable, tables.Must(tables.ParseHP("15")), 230)
	fmt.Println(err)
	// Output:
	// 65 A by NFPA 70-2023 Table 430.250
	// 65 A by CSA C22.1:24 Table 44
	// motor.power: NFPA 70-2023 Table 430.248 has no 15 hp at 230 V; it covers 1/6, 1/4, 1/3, 1/2, 3/4, 1, 1-1/2, 2, 3, 5, 7-1/2, 10 hp
}

// A power keeps the unit that it is given in.
func ExampleParsePower() {
	for _, s := range []string{"7.5 hp", "7 1/2 HP", "30 kW", "0 hp"} {
		p, err := tables.ParsePower(s)
		if err != nil {
			fmt.Println(err)
			continue
		}
		fmt.Println(p)
	}
	// Output:
	// 7-1/2 hp
	// 7-1/2 hp
	// 30 kW
	// power "0 hp": want horsepower or kilowatts above 0, such as "40 hp", "7-1/2 hp" or "30 kW"
}

// A bare number is a size of the AWG and kcmil series.
func ExampleParseSize() {
	for _, s := range []string{"#4", "0000", "250 MCM", "16 mm2"} {
		size, err := tables.ParseSize(s)
		if err != nil {
			fmt.Println(err)
			continue
		}
		fmt.Println(size)
	}
	// Output:
	// 4 AWG
	// 4/0 AWG
	// 250 kcmil
	// 16 mm²
}

// A figure tells how it came about, line by line.
func ExampleFigure_How() {
	e := tables.NEC2023
	rule := tables.Rule{Ref: "430.22"}
	amperes, err := e.FullLoadCurrent(tables.InductionTable, tables.Must(tables.ParseHP("50")), 460)
	if err != nil {
		fmt.Println(err)
		return
	}
	percent := tables.StatedFigure("continuous duty", e, &rule, tables.Percent, 125, 0)
	least := tables.ProductOf("least ampacity", e, &rule, amperes, percent)
	for _, f := range append(least.Operands(), least) {
		fmt.Printf("%s = %v: %s [%v]\n", f.Name(), f, f.How(), f.Citation())
	}
	// Output:
	// table current = 65 A: from the table, 50 hp, 460 V [NFPA 70-2023 Table 430.250]
	// continuous duty = 125 %: as the rule says [NFPA 70-2023 430.22]
	// least ampacity = 81.25 A: table current 65 A × 125 % [NFPA 70-2023 430.22]
}
