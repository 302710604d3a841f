package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

var allEditions = tables.Editions()

// wound is a 30 hp, 460 V wound-rotor motor (40 A) with 65 A in its secondary.
func wound() motor.Motor {
	return motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("30"), Voltage: 460, Nameplate: motor.Nameplate{Secondary: motor.Amps("65")}}
}

// dc is a 10 hp, 240 V direct-current motor: 38 A (NEC Table 430.247, CEC Table D2).
func dc() motor.Motor {
	return motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}
}

// Conductors to resistors apart from the controller: NEC 430.23(C) with Table
// 430.23(C), CEC Rule 28-112 with Table 28, of secondary current; NEC 430.29 of
// the full-load current of a direct-current motor.
func TestResistorConductors(t *testing.T) {
	for _, tt := range []struct {
		duty          tables.ResistorDuty
		secondary, dc string // percent × 65 A and × 38 A
	}{
		{tables.LightStarting, "22.75 A", "13.3 A"},      // 35
		{tables.HeavyStarting, "29.25 A", "17.1 A"},      // 45
		{tables.ExtraHeavyStarting, "35.75 A", "20.9 A"}, // 55
		{tables.LightIntermittent, "42.25 A", "24.7 A"},  // 65
		{tables.MediumIntermittent, "48.75 A", "28.5 A"}, // 75
		{tables.HeavyIntermittent, "55.25 A", "32.3 A"},  // 85
		{tables.ContinuousResistor, "71.5 A", "41.8 A"},  // 110
	} {
		w, d := wound(), dc()
		w.Resistor, d.Resistor = tt.duty, tt.duty
		for _, e := range necEditions {
			got := demand(t, w, e)
			assert.Equal(t, tt.secondary, got.Resistor.String(), tt.duty)
			assert.Equal(t, "430.23(C)", ref(got.Resistor))
			assert.True(t, testkit.Rests(got.Resistor, "Table 430.23(C)"))
			assert.Equal(t, "81.25 A", got.Secondary.String(), "slip rings to controller, as without resistors")
			got = demand(t, d, e)
			assert.Equal(t, tt.dc, got.Resistor.String(), tt.duty)
			assert.Equal(t, "430.29", ref(got.Resistor))
			assert.True(t, testkit.Rests(got.Resistor, "Table 430.29"))
		}
		for _, e := range cecEditions {
			got := demand(t, w, e)
			assert.Equal(t, tt.secondary, got.Resistor.String(), tt.duty)
			assert.Equal(t, "Rule 28-112", ref(got.Resistor))
			assert.True(t, testkit.Rests(got.Resistor, "Table 28"))
			assert.NotEmpty(t, got.Resistor.FromMemory(), "Table 28 is from memory")
			_, err := d.Demand(e)
			assert.Equal(t, "motor.resistor", tables.FieldOf(err), "the CEC has no table for direct current")
		}
	}
	for _, e := range allEditions {
		assert.True(t, demand(t, wound(), e).Resistor.IsZero(), "without resistors")
	}
}

// NEC 430.22(A): 125 percent of the rectifier's input; from its output 190 percent
// of full-load current half-wave, 150 percent full-wave. The CEC is refused.
func TestRectifier(t *testing.T) {
	for r, want := range map[motor.Rectifier]string{motor.HalfWave: "72.2 A", motor.FullWave: "57 A"} {
		m := dc()
		m.Rectifier, m.Nameplate.RectifierInput = r, motor.Amps("44")
		for _, e := range necEditions {
			d := demand(t, m, e)
			assert.Equal(t, "55 A", d.Branch.String(), "44 × 125 %")
			assert.Equal(t, want, d.Supply.String())
			assert.Equal(t, "430.22(A)", ref(d.Branch))
			assert.Equal(t, "430.22(A)", ref(d.Supply))
			assert.Equal(t, "38 A", d.Design.String())
		}
		for _, e := range cecEditions {
			_, err := m.Demand(e)
			assert.Equal(t, "motor.rectifier", tables.FieldOf(err))
		}
	}
}

// twoSpeed has windings of 28 and 12 A.
func twoSpeed() motor.Motor {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("20"), Voltage: 460}
	m.Nameplate.Windings = []motor.Winding{{Power: motor.HP("5"), Amperes: motor.Amps("12")}, {Power: motor.HP("20"), Amperes: motor.Amps("28")}}
	return m
}

// Multispeed motors: line side by the highest nameplate current, each run by its
// own winding's. NEC 430.22(B), 430.6(A)(1); CEC Rule 28-804.
func TestWindings(t *testing.T) {
	for _, e := range allEditions {
		rule, dutyRule := "430.22(B)", "430.22(E)"
		if e.Code() == tables.CEC {
			rule, dutyRule = "Rule 28-804", "Rule 28-106(2)"
		}
		d := demand(t, twoSpeed(), e)
		assert.Equal(t, "28 A", d.Design.String(), "nameplate, not the table's 27 A")
		assert.Equal(t, "28 A", d.Overload.String())
		assert.Equal(t, "35 A", d.Branch.String())
		if assert.Len(t, d.Windings, 2, "in the order given") {
			assert.Equal(t, "12 A", d.Windings[0].Current.String())
			assert.Equal(t, "15 A", d.Windings[0].Ampacity.String())
			assert.Equal(t, "35 A", d.Windings[1].Ampacity.String())
			assert.Equal(t, rule, ref(d.Windings[0].Ampacity))
		}
		m := twoSpeed()
		m.Duty = motor.Duty{Kind: motor.Intermittent, Minutes: 15}
		d = demand(t, m, e)
		assert.Equal(t, "23.8 A", d.Branch.String(), "28 × 85 %")
		assert.Equal(t, "10.2 A", d.Windings[0].Ampacity.String(), "12 × 85 %")
		assert.Equal(t, dutyRule, ref(d.Windings[0].Ampacity))
	}
}

// A drive with a bypass: the larger of 125 percent of its input and of the motor's
// current. NEC 430.122(B) to 2017, (C) from 2020.
func TestBypass(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("30"), Voltage: 460, Starting: motor.Drive, Bypass: true}
	for _, tt := range []struct{ input, want string }{{"36", "50 A"}, {"40", "50 A"}, {"44", "55 A"}} {
		m.Nameplate.DriveInput = motor.Amps(tt.input)
		for e, rule := range map[tables.Edition]string{tables.NEC2017: "430.122(B)", tables.NEC2020: "430.122(C)", tables.NEC2023: "430.122(C)",
			tables.CEC2021: "Rule 28-106", tables.CEC2024: "Rule 28-106"} {
			d := demand(t, m, e)
			assert.Equal(t, tt.want, d.Branch.String(), "%v %s A", e, tt.input)
			assert.Equal(t, rule, ref(d.Branch))
			assert.Equal(t, "50 A", d.Supply.String(), "to the motor")
		}
	}
	m.Bypass, m.Nameplate.DriveInput = false, motor.Amps("36")
	for _, e := range allEditions {
		assert.Equal(t, "45 A", demand(t, m, e).Branch.String(), "without the bypass")
	}
	// Of intermittent duty, on the line: NEC 430.122 speaks of 125 percent of
	// full-load current; the CEC's rule is that of the motor's duty, 40 × 85 %.
	m.Bypass, m.Duty = true, motor.Duty{Kind: motor.Intermittent, Minutes: 15}
	m.Nameplate.DriveInput = motor.Amps("20")
	for _, e := range necEditions {
		assert.Equal(t, "50 A", demand(t, m, e).Branch.String())
	}
	for _, e := range cecEditions {
		assert.Equal(t, "34 A", demand(t, m, e).Branch.String())
	}
}

// Refrigeration equipment marked with its least circuit ampacity: NEC 440.35 takes
// the marking; under the CEC it is taken where it is the larger.
func TestMarkedMinimumAmpacity(t *testing.T) {
	for _, tt := range []struct{ marked, nec, cec string }{{"60", "60 A", "60 A"}, {"47.5", "47.5 A", "47.5 A"}, {"45", "45 A", "47.5 A"}} {
		m := compressor("38", "", "")
		m.Nameplate.MinimumAmpacity = motor.Amps(tt.marked)
		for _, e := range necEditions {
			d := demand(t, m, e)
			assert.Equal(t, tt.nec, d.Branch.String())
			assert.Equal(t, "440.35", ref(d.Branch))
		}
		for _, e := range cecEditions {
			assert.Equal(t, tt.cec, demand(t, m, e).Branch.String())
		}
	}
}

// A valve actuator goes by its nameplate for every purpose, NEC 430.6(D); it must
// be given, CEC too.
func TestValveActuator(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("5"), Voltage: 460, Use: motor.ValveActuator}
	for _, e := range allEditions {
		_, err := m.Demand(e)
		assert.Equal(t, "motor.nameplate.amperes", tables.FieldOf(err))
		marked := m
		marked.Nameplate.Amperes = motor.Amps("9.2")
		d := demand(t, marked, e)
		assert.Equal(t, "9.2 A", d.Design.String(), "not the table's 7.6 A")
		assert.Equal(t, "9.2 A", d.Overload.String())
		assert.Equal(t, "11.5 A", d.Branch.String())
		if e.Code() == tables.NEC {
			assert.Equal(t, "430.6(D)", ref(d.Design))
		}
	}
}

// Fire pumps fall under NEC Article 695; the CEC's rules are not carried.
func TestFirePumpDemand(t *testing.T) {
	m := cage50()
	m.Use = motor.FirePump
	for _, e := range necEditions {
		d := demand(t, m, e)
		assert.Equal(t, "81.25 A", d.Branch.String(), "65 × 125 %, 695.6(B)(2)")
		assert.Equal(t, "363 A", d.LockedRotor.High.String())
	}
	for _, e := range cecEditions {
		_, err := m.Demand(e)
		assert.Equal(t, "motor.use", tables.FieldOf(err))
	}
}

// The largest winding stands for the motor wherever it is in the order: 28 A; of two
// that are alike either does.
func TestLargestWindingStands(t *testing.T) {
	for _, amps := range [][]string{{"28", "12", "20"}, {"12", "28", "20"}, {"12", "20", "28"}, {"28", "28", "12"}} {
		m := motor.Motor{Kind: motor.SquirrelCage, Voltage: 460}
		for _, a := range amps {
			m.Nameplate.Windings = append(m.Nameplate.Windings, motor.Winding{Amperes: motor.Amps(a)})
		}
		for _, e := range allEditions {
			d := demand(t, m, e)
			assert.Equal(t, "28 A", d.Design.String(), amps)
			assert.Equal(t, "28 A", d.Overload.String(), amps)
			assert.Len(t, d.Windings, 3)
		}
	}
}

// What is special of a motor adds up: resistors beside several speeds, and beside
// intermittent duty, NEC 430.29, 430.22(B) and 430.23.
func TestSpecialsTogether(t *testing.T) {
	d := dc()
	d.Resistor = tables.LightStarting
	d.Nameplate.Windings = []motor.Winding{{Amperes: motor.Amps("38")}, {Amperes: motor.Amps("20")}}
	w := wound()
	w.Resistor, w.Duty = tables.LightStarting, motor.Duty{Kind: motor.Intermittent, Minutes: 15}
	for _, e := range necEditions {
		got := demand(t, d, e)
		assert.Equal(t, "13.3 A", got.Resistor.String())
		assert.Len(t, got.Windings, 2)
		got = demand(t, w, e)
		assert.Equal(t, "55.25 A", got.Secondary.String(), "65 × 85 %, Table 430.22(E)")
		assert.Equal(t, "22.75 A", got.Resistor.String())
	}
}

// A compressor that is marked with a power too goes by its amperes: 30 A at 230 V is
// 15 hp by Table 430.250, and 5 hp draws 15.2 A (NEC 440.12(A)).
func TestCompressorPowerIsNotItsRating(t *testing.T) {
	m := motor.Motor{Kind: motor.Hermetic, Power: motor.HP("5"), Phases: 3, Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps("30"), LockedRotor: motor.Amps("100")}}
	for _, e := range necEditions {
		assert.Equal(t, "15 hp", demand(t, m, e).Horsepower.String(), "10 hp draws 28 A, 15 hp 42 A")
	}
}
