package motor_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Which current the NEC takes: 430.6 and 440.6. The table for conductors,
// switches and short-circuit devices, the nameplate for overload, and the
// cases in which the nameplate serves for everything.
func TestCurrentsNEC(t *testing.T) {
	plate := func(amps string) motor.Nameplate { return motor.Nameplate{Amperes: motor.Amps(amps)} }
	with := func(amps string, set func(*motor.Nameplate)) motor.Nameplate {
		n := plate(amps)
		set(&n)
		return n
	}
	rpm := func(r int) func(*motor.Nameplate) { return func(n *motor.Nameplate) { n.SpeedRPM = r } }
	for _, tt := range []struct {
		name                        string
		editions                    []tables.Edition
		m                           motor.Motor
		table, design, overload     string // table "" where the nameplate takes its place
		tableRef, designRef, ovlRef string
		source                      string
	}{
		{"three-phase", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: plate("61")},
			"65 A", "65 A", "61 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "430.6(A)(1), (2); Table 430.250"},
		{"three-phase by system volts", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 480, Nameplate: plate("61")},
			"65 A", "65 A", "61 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "Table 430.250 note on system voltages 440 to 480 V"},
		{"single-phase", necEditions, motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 230, Nameplate: plate("15.8")},
			"17 A", "17 A", "15.8 A", "Table 430.248", "430.6(A)(1)", "430.6(A)(2)", "Table 430.248"},
		{"single-phase 200 V", necEditions, motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 200, Nameplate: plate("18")},
			"19.6 A", "19.6 A", "18 A", "Table 430.248", "430.6(A)(1)", "430.6(A)(2)", "Table 430.248"},
		{"two-phase", necEditions, motor.Motor{Kind: motor.SquirrelCage, Phases: 2, Power: motor.HP("7-1/2"), Voltage: 460, Nameplate: plate("8.8")},
			"9 A", "9 A", "8.8 A", "Table 430.249", "430.6(A)(1)", "430.6(A)(2)", "Table 430.249, printed 9.0"},
		{"direct current", necEditions, motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240, Nameplate: plate("37")},
			"38 A", "38 A", "37 A", "Table 430.247", "430.6(A)(1)", "430.6(A)(2)", "Table 430.247"},
		{"direct current, slow", necEditions, motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240, Nameplate: with("37", rpm(850))},
			"38 A", "38 A", "37 A", "Table 430.247", "430.6(A)(1)", "430.6(A)(2)", "Table 430.247 is for base speed, whatever it is"},
		{"wound rotor", necEditions, motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 460, Nameplate: plate("50")},
			"52 A", "52 A", "50 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "Table 430.250"},
		{"1200 r/min", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("70", rpm(1200))},
			"65 A", "65 A", "70 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "430.6(A)(1): low speed is below 1200 r/min"},
		{"1199 r/min, more on the nameplate", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("70", rpm(1199))},
			"65 A", "70 A", "70 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "six poles with slip: the larger, a reading of 430.6(A)(1)"},
		{"901 r/min, less on the nameplate", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("61", rpm(901))},
			"65 A", "65 A", "61 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "six poles with slip: the larger, a reading of 430.6(A)(1)"},
		{"900 r/min", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("61", rpm(900))},
			"", "61 A", "61 A", "", "430.6(A)(1)", "430.6(A)(2)", "430.6(A)(1): built for less than 1200 r/min"},
		{"high torque", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("72", func(n *motor.Nameplate) { n.HighTorque = true })},
			"", "72 A", "72 A", "", "430.6(A)(1)", "430.6(A)(2)", "430.6(A)(1)"},
		{"multispeed", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Nameplate: with("68", func(n *motor.Nameplate) { n.Multispeed = true })},
			"", "68 A", "68 A", "", "430.6(A)(1)", "430.6(A)(2)", "430.6(A)(1), 430.22(B)"},
		{"fan motor", necEditions, motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("1/6"), Voltage: 115, Nameplate: with("3.2", func(n *motor.Nameplate) { n.FanMotor = true })},
			"", "3.2 A", "3.2 A", "", "430.6(A) Exception No. 2", "430.6(A)(2)", "430.6(A) Exception 2"},
		{"appliance", necEditions, motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("1"), Voltage: 115, Nameplate: with("12.5", func(n *motor.Nameplate) { n.Appliance = true })},
			"", "12.5 A", "12.5 A", "", "430.6(A) Exception No. 3", "430.6(A)(2)", "430.6(A) Exception 3"},
		{"torque", necEditions, motor.Motor{Kind: motor.Torque, Voltage: 230, Nameplate: plate("12")},
			"", "12 A", "12 A", "", "430.6(B)", "430.6(B)", "430.6(B)"},
		{"hermetic", necEditions, compressor("38", "", ""),
			"", "38 A", "38 A", "", "440.6(A)", "440.52(A)", "440.6(A), 440.52(A)"},
		{"hermetic with branch selection", necEditions, compressor("38", "40", ""),
			"", "40 A", "38 A", "", "440.6(A)", "440.52(A)", "440.6(A): not for overload"},
		{"hermetic with a lower branch selection", necEditions, compressor("40", "38", ""),
			"", "40 A", "40 A", "", "440.6(A)", "440.52(A)", "440.22(A), 440.32: the larger of both"},
		{"largest row", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("500"), Voltage: 460, Nameplate: plate("560")},
			"590 A", "590 A", "560 A", "Table 430.250", "430.6(A)(1)", "430.6(A)(2)", "Table 430.250, last row"},
		{"beyond the tables", old, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("600"), Voltage: 460, Nameplate: plate("680")},
			"", "680 A", "680 A", "", "430.6(A)(1)", "430.6(A)(2)", "as NEC-2023 says it"},
		{"beyond the tables", new2023, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("600"), Voltage: 460, Nameplate: plate("680")},
			"", "680 A", "680 A", "", "430.6(A)(2)", "430.6(A)(2)", "NFPA 70-2023 430.6(A)(2)"},
		{"beyond a column", new2023, motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("3"), Voltage: 115, Nameplate: plate("19")},
			"", "19 A", "19 A", "", "430.6(A)(2)", "430.6(A)(2)", "Table 430.250 prints 115 V to 2 hp"},
		{"kilowatts", necEditions, motor.Motor{Kind: motor.SquirrelCage, Power: motor.KW("30"), Voltage: 460, Nameplate: plate("48.5")},
			"", "48.5 A", "48.5 A", "", "430.6(A)(1)", "430.6(A)(2)", "430.6(A): marked in amperes, not in horsepower"},
		{"amperes only", necEditions, motor.Motor{Kind: motor.SquirrelCage, Voltage: 460, Nameplate: plate("48")},
			"", "48 A", "48 A", "", "430.6(A)(1)", "430.6(A)(2)", "430.6(A): marked in amperes, not in horsepower"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				d := demand(t, tt.m, e)
				assert.Equal(t, tt.table, d.Table.String(), tt.source)
				assert.Equal(t, tt.tableRef, ref(d.Table))
				assert.Equal(t, tt.design, d.Design.String(), tt.source)
				assert.Equal(t, tt.designRef, ref(d.Design))
				assert.Equal(t, tt.overload, d.Overload.String(), tt.source)
				assert.Equal(t, tt.ovlRef, ref(d.Overload))
				assert.Equal(t, e, d.Design.Citation().Edition)
			})
		}
	}
}

// A speed between 900 and 1200 r/min is that of six poles with slip, and told.
func TestSixPoles(t *testing.T) {
	for rpm, want := range map[int]bool{900: false, 901: true, 1199: true, 1200: false} {
		m := marked50()
		m.Nameplate.SpeedRPM = rpm
		for _, e := range necEditions {
			assert.Equal(t, want, testkit.Cautioned(demand(t, m, e).Cautions, "430.6(A)(1)", "1200"), "%d r/min %v", rpm, e)
		}
	}
}

// Without a nameplate the overload figures stand in for pricing only.
func TestOverloadWithoutNameplateNEC(t *testing.T) {
	for _, e := range necEditions {
		d := demand(t, cage50(), e)
		assert.Equal(t, "65 A", d.Overload.String(), "430.6(A)(2) asks for the nameplate")
		assert.Equal(t, tables.Assumed, d.Overload.Op())
		assert.True(t, testkit.Cautioned(d.Cautions, "430.6(A)(2)", "no nameplate current"), e)
		assert.False(t, testkit.Cautioned(demand(t, marked50(), e).Cautions, "430.6(A)(2)", "no nameplate current"), e)
	}
}

// NEC-2023 names motors larger than the tables; before, that is a reading.
func TestBeyondTheTablesCaution(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("600"), Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("680")}}
	for _, e := range necEditions {
		told := false
		for _, c := range demand(t, m, e).Cautions {
			told = told || strings.Contains(c.Text, "larger than its tables")
		}
		assert.Equal(t, e != tables.NEC2023, told, e)
	}
}

// The NEC's tables have no kilowatt rows and say nothing of horsepower between
// or beyond rows; a motor that goes by its nameplate must have one.
func TestCurrentsRefusedNEC(t *testing.T) {
	cage := func(set func(*motor.Motor)) motor.Motor { m := cage50(); set(&m); return m }
	for _, tt := range []struct {
		name  string
		m     motor.Motor
		field string
		table string // of a NotTabulatedError, else the rule of an InputError
	}{
		{"600 hp unmarked", cage(func(m *motor.Motor) { m.Power = motor.HP("600") }), "motor.power", "Table 430.250"},
		{"51 hp between rows", cage(func(m *motor.Motor) { m.Power = motor.HP("51") }), "motor.power", "Table 430.250"},
		{"51 hp between rows, marked", cage(func(m *motor.Motor) { m.Power, m.Nameplate.Amperes = motor.HP("51"), motor.Amps("62") }), "motor.power", "Table 430.250"},
		{"30 kW unmarked", cage(func(m *motor.Motor) { m.Power = motor.KW("30") }), "motor.power", "Table 430.250"},
		{"481 V", cage(func(m *motor.Motor) { m.Voltage = 481 }), "motor.voltage", "Table 430.250"},
		{"439 V", cage(func(m *motor.Motor) { m.Voltage = 439 }), "motor.voltage", "Table 430.250"},
		{"600 hp at 347 V, marked", cage(func(m *motor.Motor) {
			m.Power, m.Voltage, m.Nameplate.Amperes = motor.HP("600"), 347, motor.Amps("900")
		}), "motor.voltage", "Table 430.250"},
		{"dc 230 V", motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 230}, "motor.voltage", "Table 430.247"},
		{"20 hp synchronous", motor.Motor{Kind: motor.Synchronous, Power: motor.HP("20"), Voltage: 460}, "motor.power", "Table 430.250"},
		{"900 r/min unmarked", cage(func(m *motor.Motor) { m.Nameplate.SpeedRPM = 900 }), "motor.nameplate.amperes", "430.6(A)(1)"},
		{"high torque unmarked", cage(func(m *motor.Motor) { m.Nameplate.HighTorque = true }), "motor.nameplate.amperes", "430.6(A)(1)"},
		{"multispeed unmarked", cage(func(m *motor.Motor) { m.Nameplate.Multispeed = true }), "motor.nameplate.amperes", "430.6(A)(1)"},
		{"fan motor unmarked", cage(func(m *motor.Motor) { m.Nameplate.FanMotor = true }), "motor.nameplate.amperes", "430.6(A) Exception No. 2"},
		{"appliance unmarked", cage(func(m *motor.Motor) { m.Nameplate.Appliance = true }), "motor.nameplate.amperes", "430.6(A) Exception No. 3"},
		{"torque unmarked", motor.Motor{Kind: motor.Torque, Power: motor.HP("1"), Voltage: 230}, "motor.nameplate.amperes", "430.6(B)"},
		{"hermetic unmarked", motor.Motor{Kind: motor.Hermetic, Power: motor.HP("10"), Voltage: 230}, "motor.nameplate.amperes", "440.6(A)"},
	} {
		for _, e := range necEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				d, err := tt.m.Demand(e)
				require.Error(t, err)
				assert.Equal(t, motor.Demand{}, d)
				assert.Equal(t, tt.field, tables.FieldOf(err))
				cite := tables.Citation{}
				switch x := err.(type) {
				case *tables.NotTabulatedError:
					cite = x.Table
				case *tables.InputError:
					cite = x.Cite
				}
				assert.Equal(t, tt.table, cite.Ref)
				assert.Equal(t, e, cite.Edition)
			})
		}
	}
}
