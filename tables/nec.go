package tables

// The NEC's system voltages for a column of rated motor volts: notes of Tables
// 430.248 to 430.250. The 200 V and 208 V columns stand for themselves.
var necVolts = []voltRange{{115, 110, 120}, {230, 220, 240}, {460, 440, 480}, {575, 550, 600}}

var (
	necDC           = Rule{Ref: "Table 430.247"}
	nec1Ph          = Rule{Ref: "Table 430.248"}
	nec2Ph          = Rule{Ref: "Table 430.249"}
	nec3Ph          = Rule{Ref: "Table 430.250"}
	necRotor1       = Rule{Ref: "Table 430.251(A)"}
	necRotor3       = Rule{Ref: "Table 430.251(B)"}
	necDuty         = Rule{Ref: "Table 430.22(E)"}
	necDevice       = Rule{Ref: "Table 430.52", Moved: []Move{{NEC2023, "Table 430.52(C)(1)"}}}
	necCeiling      = Rule{Ref: "430.52(C)(1) Exception No. 2", Moved: []Move{{NEC2023, "430.52(C)(1)(b)"}}}
	necStandard     = Rule{Ref: "240.6(A)"}
	necResistor     = Rule{Ref: "Table 430.23(C)"}
	necDCResistor   = Rule{Ref: "Table 430.29"}
	necBonding      = Rule{Ref: "Table 250.122"}
	necBondingBig   = Rule{Ref: "Table 250.122", Mark: MarkB}
	necTable4       = Rule{Ref: "Chapter 9 Table 4", Mark: MarkB}
	necTable4Memory = Rule{Ref: "Chapter 9 Table 4", Mark: MarkC}
	necTable5       = Rule{Ref: "Chapter 9 Table 5", Mark: MarkB}
	necUnits        = Rule{Ref: "Table 430.37", Mark: MarkB}

	necRaceway     = Rule{Ref: "Table 310.15(B)(16)", Moved: []Move{{NEC2020, "Table 310.16"}}}
	necFreeAir     = Rule{Ref: "Table 310.15(B)(17)", Moved: []Move{{NEC2020, "Table 310.17"}}, Mark: MarkB}
	necAmbient     = Rule{Ref: "Table 310.15(B)(2)(a)", Moved: []Move{{NEC2020, "Table 310.15(B)(1)"}, {NEC2023, "Table 310.15(B)(1)(1)"}}, Mark: MarkB}
	necCount       = Rule{Ref: "Table 310.15(B)(3)(a)", Moved: []Move{{NEC2020, "Table 310.15(C)(1)"}}}
	necRacewayBig  = Rule{Ref: necRaceway.Ref, Moved: necRaceway.Moved, Mark: MarkB} // above 600 kcmil
	necInsulations = Rule{Ref: "Table 310.104(A)", Moved: []Move{{NEC2020, "Table 310.4(A)"}, {NEC2023, "Table 310.4(1)"}}, Mark: MarkB}
)

var necBook = book{
	motors: "Article 430",
	fullLoad: [motorTableCount]func() *motorTable{
		DirectCurrentTable: loadMotorTable("nec/motor_flc_dc.csv", &necDC, nil, nil, nil),
		SinglePhaseTable:   loadMotorTable("nec/motor_flc_1ph.csv", &nec1Ph, necVolts, nil, nil),
		TwoPhaseTable:      loadMotorTable("nec/motor_flc_2ph.csv", &nec2Ph, necVolts, nil, nil),
		InductionTable:     loadMotorTable("nec/motor_flc_3ph_induction.csv", &nec3Ph, necVolts, nil, nil),
		SynchronousTable:   loadMotorTable("nec/motor_flc_3ph_synchronous.csv", &nec3Ph, necVolts, nil, nil),
	},
	lockedRotor1: func(e Edition) *motorTable {
		if e >= NEC2023 {
			return necRotor1As2023()
		}
		return necRotor1To2020()
	},
	lockedRotor3:  loadMotorTable("nec/motor_locked_rotor_3ph.csv", &necRotor3, necVolts, nil, nil),
	duty:          loadDuty("nec/motor_duty_cycle_percent.csv", &necDuty),
	devices:       loadDevices("nec/motor_ocpd_max_percent.csv", &necDevice),
	ceilings:      loadCeilings("nec/motor_ocpd_increase_caps.csv", &necCeiling),
	ratings:       necRatings,
	overloadUnits: loadUnits("nec/motor_overload_units.csv", func(int) *Rule { return &necUnits }, map[int]string{0: "2-wire 1-phase ac or dc one conductor grounded", 1: "2-wire 1-phase ac or dc one conductor grounded", 2: "4-wire 2-phase grounded or ungrounded", 3: "any 3-phase"}),
	raceway: [materialCount]func() *ampacityData{
		Copper:   loadAmpacity("nec/conductor_ampacity.csv", Copper, necRacewayRule),
		Aluminum: loadAmpacity("nec/conductor_ampacity.csv", Aluminum, necRacewayRule),
	},
	freeAir: [materialCount]func() *ampacityData{
		Copper:   loadAmpacity("nec/conductor_ampacity_free_air.csv", Copper, always(&necFreeAir)),
		Aluminum: loadAmpacity("nec/conductor_ampacity_free_air.csv", Aluminum, always(&necFreeAir)),
	},
	ambient:     loadAmbient("nec/conductor_ambient_30c.csv", "ambient_max_c", false, &necAmbient),
	count:       loadCounts("nec/conductor_adjustment.csv", &necCount, Percent),
	insulations: loadInsulationsNEC("nec/conductor_insulations.csv", &necInsulations, "FEP", "MI", "SA", "SIS", "TBS", "Z", "ZW", "ZW-2"),
	bonding: func(e Edition) *bondingTable {
		if e >= NEC2020 {
			return necBonding2020()
		}
		return necBonding2017()
	},
	secondaryResistor: loadResistors("nec/motor_secondary_resistor_percent.csv", &necResistor),
	dcResistor:        loadResistors("nec/motor_dc_resistor_percent.csv", &necDCResistor),
	raceways:          loadRaceways("nec/raceway_dimensions.csv", necRaceways),
	dimensions: loadDimensions("nec/conductor_dimensions.csv", &necTable5, "size_awg_kcmil", "diameter_in", "area_in2", Inch, SquareInch,
		"TW, THW, THHW, THHN, THWN, XHH, XHHW, RHH, RHW and their -2 types", func(row []string) []string {
			if row[1] == "no" { // with the outer covering, the larger
				return nil
			}
			return row[:1]
		}),
	bareAreas: loadBareAreas("nec/conductor_properties.csv"),
	smallConductors: loadSmallConductors("nec/motor_small_conductors.csv", func(row []string) *Rule {
		return &Rule{Ref: row[4], Moved: []Move{{NEC2023, row[5]}}, Mark: MarkB}
	}),
}

// The 10 hp, 115 V cell of Table 430.251(A) is printed 1000 A in 2023, against
// 600 A (six times full load, as in every other row) before.
var (
	necRotor1To2020 = loadMotorTable("nec/motor_locked_rotor_1ph.csv", &necRotor1, necVolts, nil, map[string]string{"v115_as_printed_2023": ""})
	necRotor1As2023 = loadMotorTable("nec/motor_locked_rotor_1ph.csv", &necRotor1, necVolts, nil, map[string]string{"v115": "", "v115_as_printed_2023": "v115"})
)

var necRaceways = racewayShape{
	trade: "trade_size", metric: "metric_designator", diameter: "internal_diameter_in", area: "area_100_in2",
	limits: [4]string{"area_1wire_53_in2", "area_2wires_31_in2", "area_over2_40_in2", "area_60_in2"}, unit: SquareInch, length: Inch,
	kind: func(name string) (Raceway, bool) {
		var r Raceway
		err := r.UnmarshalText([]byte(name))
		return r, err == nil
	},
	rule: func(r Raceway) *Rule {
		switch r { // from memory, two spot values confirmed
		case LFMC, RMC, PVC40, PVC80, PVCA, PVCEB:
			return &necTable4Memory
		}
		return &necTable4
	},
}

// The largest aluminum sizes of Table 250.122 changed in 2020.
var (
	necBonding2017 = loadBonding("nec/conductor_grounding_2017.csv", necBondingRule)
	necBonding2020 = loadBonding("nec/conductor_grounding.csv", necBondingRule)
)

// necBondingRule marks aluminum above 3000 A as read in one copy.
func necBondingRule(m Material, rating int64) *Rule {
	if m == Aluminum && rating > 3000_00 {
		return &necBondingBig
	}
	return &necBonding
}

// necRacewayRule marks the cells above 600 kcmil, some of which 2011 changed, as
// read in one copy.
func necRacewayRule(s Size, _ int) *Rule {
	if s > size600 {
		return &necRacewayBig
	}
	return &necRaceway
}

var size600 = Must(ParseSize("600"))

// necRatings picks the list of standard ratings: 10 A came to breakers in 2023.
func necRatings(e Edition, d Device) *ratingTable {
	switch {
	case d.IsFuse() && e >= NEC2023:
		return necFuse2023()
	case d.IsFuse():
		return necFuse2017()
	case e >= NEC2023:
		return necBreaker2023()
	}
	return necBreaker2017()
}

var (
	necFuse2017    = loadRatings("nec/motor_standard_ocpd.csv", "fuse_2017", &necStandard)
	necFuse2023    = loadRatings("nec/motor_standard_ocpd.csv", "fuse_2023", &necStandard)
	necBreaker2017 = loadRatings("nec/motor_standard_ocpd.csv", "inverse_time_breaker_2017", &necStandard)
	necBreaker2023 = loadRatings("nec/motor_standard_ocpd.csv", "inverse_time_breaker_2023", &necStandard)
)
