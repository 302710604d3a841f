package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The CEC takes the motor's own rating for every purpose; Tables 44, 45 and D2
// are guides where it is not given.
func TestCurrentsCEC(t *testing.T) {
	single := func(hp string, volts int) motor.Motor {
		return motor.Motor{Kind: motor.SinglePhase, Power: motor.HP(hp), Voltage: volts}
	}
	cage := func(hp string, volts int) motor.Motor {
		return motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(hp), Voltage: volts}
	}
	with := func(m motor.Motor, amps string) motor.Motor { m.Nameplate.Amperes = motor.Amps(amps); return m }
	low := func(m motor.Motor, rpm int) motor.Motor { m.Nameplate.SpeedRPM = rpm; return m }
	for _, tt := range []struct {
		name                string
		m                   motor.Motor
		table, design       string
		tableRef, designRef string
		source              string
	}{
		{"nameplate first", with(cage("50", 460), "61"), "", "61 A", "", "Rule 28-106(1)", "28-106, 28-200, 28-306"},
		{"Table 44", cage("50", 460), "65 A", "65 A", "Table 44", "Rule 28-106(1)", "Table 44"},
		{"Table 44, 1 hp at 460 V", cage("1", 460), "1.8 A", "1.8 A", "Table 44", "Rule 28-106(1)", "Table 44 as printed, not half of 230 V"},
		{"Table 44, 250 hp at 230 V", cage("250", 230), "604 A", "604 A", "Table 44", "Rule 28-106(1)", "Table 44; the NEC prints none"},
		{"Table 44, 30 hp at 240 V", cage("30", 240), "80 A", "80 A", "Table 44", "Rule 28-106(1)", "exam guide, CEC-2024"},
		{"Table 44, 600 V system", cage("60", 600), "62 A", "62 A", "Table 44", "Rule 28-106(1)", "Table 44 note on system voltages"},
		{"Table 45", single("3", 230), "17 A", "17 A", "Table 45", "Rule 28-106(1)", "Table 45"},
		{"Table 45, 208 V", single("3", 208), "18.7 A", "18.7 A", "Table 45", "Rule 28-106(1)", "Table 45 note: 17 A + 10 %"},
		{"Table 45, 200 V", single("3", 200), "19.55 A", "19.55 A", "Table 45", "Rule 28-106(1)", "Table 45 note: 17 A + 15 %"},
		{"Table 45, 7-1/2 hp at 208 V", single("7-1/2", 208), "44 A", "44 A", "Table 45", "Rule 28-106(1)", "Table 45 note: 40 A + 10 %"},
		{"Table D2", motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}, "38 A", "38 A", "Table D2", "Rule 28-106(1)", "from memory"},
		{"wound rotor", motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 575}, "41 A", "41 A", "Table 44", "Rule 28-106(1)", "Table 44"},
		{"low speed, nameplate", low(with(cage("50", 460), "70"), 900), "", "70 A", "", "Rule 28-106(1)", "28-106(1)"},
		{"901 r/min, table", low(cage("50", 460), 901), "65 A", "65 A", "Table 44", "Rule 28-106(1)", "six poles with slip: as under the NEC, no source"},
		{"larger than the table", with(cage("600", 460), "680"), "", "680 A", "", "Rule 28-106(1)", "28-106(1)"},
		{"two-phase, nameplate", motor.Motor{Kind: motor.SquirrelCage, Phases: 2, Power: motor.HP("10"), Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps("23")}},
			"", "23 A", "", "Rule 28-106(1)", "28-106(1)"},
		{"kilowatts, nameplate", motor.Motor{Kind: motor.SquirrelCage, Power: motor.KW("30"), Voltage: 575, Nameplate: motor.Nameplate{Amperes: motor.Amps("39")}},
			"", "39 A", "", "Rule 28-106(1)", "28-106(1)"},
		{"torque", with(motor.Motor{Kind: motor.Torque, Voltage: 230}, "12"), "", "12 A", "", "Rule 28-106(1)", "28-106(1)"},
		{"hermetic", compressor("38", "", ""), "", "38 A", "", "Rule 28-706", "28-706"},
		{"hermetic by horsepower", motor.Motor{Kind: motor.Hermetic, Power: motor.HP("10"), Voltage: 230}, "28 A", "28 A", "Table 44", "Rule 28-704", "28-704: full-load current by the table if not marked"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				d := demand(t, tt.m, e)
				assert.Equal(t, tt.table, d.Table.String(), tt.source)
				assert.Equal(t, tt.tableRef, ref(d.Table))
				assert.Equal(t, tt.design, d.Design.String(), tt.source)
				assert.Equal(t, tt.designRef, ref(d.Design))
				assert.Equal(t, tt.design, d.Overload.String(), "one current for every purpose")
				guide := false
				for _, c := range d.Cautions {
					guide = guide || c.Cite.Ref == tt.tableRef && tt.tableRef != ""
				}
				assert.Equal(t, tt.table != "", guide, "a table value is cautioned as a guide")
			})
		}
	}
}

func TestOverloadRuleCEC(t *testing.T) {
	for _, e := range cecEditions {
		assert.Equal(t, "Rule 28-306(1)", ref(demand(t, marked50(), e).Overload), e)
	}
}

// Table D2 is carried from memory, and a figure built on it says so.
func TestMemoryMarkCEC(t *testing.T) {
	for _, e := range cecEditions {
		d := demand(t, motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}, e)
		assert.Equal(t, tables.MarkC, d.Branch.Mark())
		assert.Equal(t, []tables.Citation{{Edition: e, Ref: "Table D2"}}, d.Design.FromMemory())
	}
}

// Section 28 does not speak of a branch-circuit selection current: the larger
// is taken for conductors and the reading is told. From practice, no source.
func TestBranchSelectionCEC(t *testing.T) {
	for _, e := range cecEditions {
		d := demand(t, compressor("38", "40", ""), e)
		assert.Equal(t, "40 A", d.Design.String())
		assert.Equal(t, "38 A", d.Overload.String(), "28-710: of rated-load current")
		assert.Equal(t, "Rule 28-710", ref(d.Overload))
		assert.True(t, testkit.Cautioned(d.Cautions, "Rule 28-706", "branch-circuit selection"))
		assert.Equal(t, "42 A", demand(t, compressor("42", "40", ""), e).Design.String())
	}
}

func TestCurrentsRefusedCEC(t *testing.T) {
	cage := func(set func(*motor.Motor)) motor.Motor { m := cage50(); set(&m); return m }
	for _, tt := range []struct {
		name, field, ref string
		m                motor.Motor
	}{
		{"600 hp unmarked", "motor.power", "Table 44", cage(func(m *motor.Motor) { m.Power = motor.HP("600") })},
		{"37 kW unmarked", "motor.power", "Table 44", cage(func(m *motor.Motor) { m.Power = motor.KW("37") })},
		{"347 V", "motor.voltage", "Table 44", cage(func(m *motor.Motor) { m.Voltage = 347 })},
		{"440 V", "motor.voltage", "Table 44", cage(func(m *motor.Motor) { m.Voltage = 440 })},
		{"two-phase unmarked", "motor.kind", "Section 28", cage(func(m *motor.Motor) { m.Phases = 2 })},
		{"150 hp synchronous at 230 V", "motor.power", "Table 44", motor.Motor{Kind: motor.Synchronous, Power: motor.HP("150"), Voltage: 230}},
		{"dc 90 V", "motor.voltage", "Table D2", motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("1"), Voltage: 90}},
		{"900 r/min unmarked", "motor.nameplate.amperes", "Table 44", cage(func(m *motor.Motor) { m.Nameplate.SpeedRPM = 900 })},
		{"high torque unmarked", "motor.nameplate.amperes", "Table 44", cage(func(m *motor.Motor) { m.Nameplate.HighTorque = true })},
		{"multispeed unmarked", "motor.nameplate.amperes", "Table 44", cage(func(m *motor.Motor) { m.Nameplate.Multispeed = true })},
		{"torque unmarked", "motor.nameplate.amperes", "Table 44", motor.Motor{Kind: motor.Torque, Power: motor.HP("1"), Voltage: 230}},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				d, err := tt.m.Demand(e)
				require.Error(t, err)
				assert.Equal(t, motor.Demand{}, d)
				assert.Equal(t, tt.field, tables.FieldOf(err))
				assert.Contains(t, err.Error(), e.Standard()+" "+tt.ref)
			})
		}
	}
}
