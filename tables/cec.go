package tables

// The CEC's system voltages for a column of rated motor volts: notes of Tables
// 44 and 45.
var cecVolts = []voltRange{{115, 115, 120}, {230, 230, 240}, {460, 460, 480}, {575, 575, 600}}

// Under the note of Table 45 the 200 V and 208 V currents are the 230 V ones
// plus 15 and 10 percent.
var cecSinglePhaseNote = []derivedColumn{{200, 230, 115, &cecTable45}, {208, 230, 110, &cecTable45}}

var (
	cecTable44      = Rule{Ref: "Table 44", Mark: MarkB}
	cecTable45      = Rule{Ref: "Table 45"}
	cecTableD2      = Rule{Ref: "Table D2", Mark: MarkC}
	cecTable27      = Rule{Ref: "Table 27"}
	cecTable29      = Rule{Ref: "Table 29"}
	cecTable25      = Rule{Ref: "Table 25", Mark: MarkB}
	cecTable25Other = Rule{Ref: "Table 25", Mark: MarkC} // other than three-phase
	cecTable16      = Rule{Ref: "Table 16", Mark: MarkB}
	cecTable28      = Rule{Ref: "Table 28", Mark: MarkC}
	cecTable9       = Rule{Ref: "Tables 9A to 9H", Mark: MarkB}
	cecTable6       = Rule{Ref: "Tables 6A to 6K", Mark: MarkB}
	cecTable37      = Rule{Ref: "Table 37", Mark: MarkC}
	cecTable13      = Rule{Ref: "Table 13", Mark: MarkB}

	cecTable2    = Rule{Ref: "Table 2"}
	cecTable4    = Rule{Ref: "Table 4"}
	cecTable2Hot = Rule{Ref: "Table 2", Mark: MarkB} // columns above 90 °C
	cecTable4Hot = Rule{Ref: "Table 4", Mark: MarkB}
	cecTable1    = Rule{Ref: "Table 1", Mark: MarkC}
	cecTable3    = Rule{Ref: "Table 3", Mark: MarkC}
	cecTable5A   = Rule{Ref: "Table 5A", Mark: MarkB}
	cecTable5B   = Rule{Ref: "Table 5B"}
	cecTable5C   = Rule{Ref: "Table 5C"}
	cecTable19   = Rule{Ref: "Table 19", Mark: MarkB}
	cecRaise     = Rule{Ref: "Rule 28-200(4)"}
	cecInstant   = Rule{Ref: "Rule 28-210"}
	cecSmall     = Rule{Ref: "Rule 14-104(2)"}
	cecBigTrade  = Rule{Ref: "Table 13", Note: "ratings above 800 A: common practice, no source", Mark: MarkC}
)

var cecBook = book{
	motors: "Section 28",
	fullLoad: [motorTableCount]func() *motorTable{
		DirectCurrentTable: loadMotorTable("cec/motor_flc_dc.csv", &cecTableD2, nil, nil, nil),
		SinglePhaseTable:   loadMotorTable("cec/motor_flc_1ph.csv", &cecTable45, cecVolts, cecSinglePhaseNote, nil),
		InductionTable:     loadMotorTable("cec/motor_flc_3ph_induction.csv", &cecTable44, cecVolts, nil, nil),
		SynchronousTable:   loadMotorTable("cec/motor_flc_3ph_synchronous.csv", &cecTable44, cecVolts, nil, nil),
	},
	duty:             loadDuty("cec/motor_service_duty_percent.csv", &cecTable27),
	devices:          loadDevices("cec/motor_ocpd_max_percent.csv", &cecTable29),
	ceilings:         loadCeilings("cec/motor_ocpd_increase_caps.csv", &cecRaise),
	instantaneous:    loadInstantaneous("cec/motor_instantaneous_trip_caps.csv", &cecInstant),
	ratings:          func(Edition, Device) *ratingTable { return cecRatings() },
	overloadUnits:    loadUnits("cec/motor_table25_overload_count.csv", table25Rule, map[int]string{0: "one_phase_ac_or_dc_2_wire_one_conductor_grounded", 1: "one_phase_ac_or_dc_2_wire_one_conductor_grounded", 2: "two_phase_4_wire_ac", 3: "three_phase_ac_any"}),
	supplyInsulation: loadSupplyInsulation("cec/motor_insulation_temperature.csv", &cecTable37),
	raceway: [materialCount]func() *ampacityData{
		Copper:   loadAmpacity("cec/conductor_ampacity_copper_raceway.csv", Copper, hotColumns(&cecTable2, &cecTable2Hot)),
		Aluminum: loadAmpacity("cec/conductor_ampacity_aluminum_raceway.csv", Aluminum, hotColumns(&cecTable4, &cecTable4Hot)),
	},
	freeAir: [materialCount]func() *ampacityData{
		Copper:   loadAmpacity("cec/conductor_ampacity_copper_free_air.csv", Copper, always(&cecTable1)),
		Aluminum: loadAmpacity("cec/conductor_ampacity_aluminum_free_air.csv", Aluminum, always(&cecTable3)),
	},
	ambient:           loadAmbient("cec/conductor_ambient.csv", "ambient_c", true, &cecTable5A),
	count:             loadCounts("cec/conductor_count_5c.csv", &cecTable5C, Plain),
	spacing:           loadCounts("cec/conductor_spacing_5b.csv", &cecTable5B, Plain),
	insulations:       loadInsulationsCEC("cec/conductor_insulations.csv", &cecTable19),
	bonding:           func(Edition) *bondingTable { return cecBonding() },
	secondaryResistor: loadResistors("cec/motor_controller_secondary.csv", &cecTable28),
	raceways: loadRaceways("cec/raceway_dimensions.csv", racewayShape{
		trade: "trade_size_in", metric: "metric_designator", diameter: "internal_diameter_mm", area: "area_100pct_mm2",
		limits: [4]string{"area_53pct_mm2", "area_31pct_mm2", "area_40pct_mm2", ""}, unit: SquareMillimetre, length: Millimetre,
		kind: func(name string) (Raceway, bool) { r, ok := racewayCEC[name]; return r, ok },
		rule: func(Raceway) *Rule { return &cecTable9 },
	}),
	dimensions: loadDimensions("cec/conductor_dimensions.csv", &cecTable6, "size", "diameter_mm", "area_mm2", Millimetre, SquareMillimetre,
		"R90, RW75 and RW90 (unjacketed, 600 V), TW, TW75, TWN75 and T90 Nylon", func(row []string) []string {
			if row[1] != "stranded" {
				return nil
			}
			return cecDimensionTypes[row[0]]
		}),
	smallConductors: loadSmallConductors("cec/conductor_small_14_104.csv", func([]string) *Rule { return &cecSmall }),
}

// cecDimensionTypes are the types that a group of rows of Tables 6 is for.
var cecDimensionTypes = map[string][]string{
	"R90XLPE_RW75XLPE_RW90XLPE_UNJACKETED_600V": {"R90", "RW75", "RW90"},
	"TWN75_T90_NYLON": {"TWN75", "T90_NYLON"},
	"TW_TW75":         {"TW", "TW75"},
}

var cecBonding = loadBonding("cec/conductor_bonding.csv", func(Material, int64) *Rule { return &cecTable16 })

// table25Rule marks the row for three phases, which Rule 28-304(2) confirms, as
// surer than the others.
func table25Rule(phases int) *Rule {
	if phases == 3 {
		return &cecTable25
	}
	return &cecTable25Other
}

// hotColumns gives the columns above 90 °C a mark of their own.
func hotColumns(rule, hot *Rule) func(Size, int) *Rule {
	return func(_ Size, column int) *Rule {
		if column > 90 {
			return hot
		}
		return rule
	}
}

// Ratings to 800 A are those of Table 13; above, those that the trade makes.
var cecRatings = loadTable13("cec/conductor_ocpd_table13.csv", &cecTable13, &cecBigTrade, 1000, 1200, 1600, 2000, 2500, 3000, 4000, 5000, 6000)
