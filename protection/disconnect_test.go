package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// NEC: 115 percent, 430.110(A), (B), 440.12(A); horsepower; the locked-rotor
// current of Table 430.251 or, for Design A and motors outside of it, the
// motor's own.
func TestDisconnectNEC(t *testing.T) {
	of := func(set func(*motor.Nameplate)) motor.Motor { m := cage50(); set(&m.Nameplate); return m }
	for _, tt := range []struct {
		name         string
		m            motor.Motor
		amperes, ref string
		hp, rotor    string
	}{
		{"50 hp", cage50(), "74.75 A", "430.110(A)", "50 hp", "363 A"},
		{"the table's, though marked", of(func(n *motor.Nameplate) { n.LockedRotor = motor.Amps("400") }), "74.75 A", "430.110(A)", "50 hp", "363 A"},
		{"Design A, marked", of(func(n *motor.Nameplate) { n.DesignLetter, n.LockedRotor = "A", motor.Amps("500") }), "74.75 A", "430.110(A)", "50 hp", "500 A"},
		{"Design A, code letter", of(func(n *motor.Nameplate) { n.DesignLetter, n.CodeLetter = "A", "G" }), "74.75 A", "430.110(A)", "50 hp", "394.75 A"}, // top of the range
		{"Design A, nothing known", of(func(n *motor.Nameplate) { n.DesignLetter = "A" }), "74.75 A", "430.110(A)", "50 hp", ""},
		{"wound rotor", motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 460}, "59.8 A", "430.110(A)", "40 hp", "312 A"}, // 6 × 52
		{"single-phase", motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 230}, "19.55 A", "430.110(A)", "3 hp", "102 A"},
		{"amperes only", motor.Motor{Kind: motor.SquirrelCage, Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("48")}}, "55.2 A", "430.110(A)", "40 hp", "290 A"},
		{"direct current", motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}, "43.7 A", "430.110(A)", "10 hp", ""},
		{"torque", torque("12"), "13.8 A", "430.110(B)", "", "12 A"},
		{"hermetic", compressor("38", "40", "250"), "46 A", "440.12(A)", "20 hp", "250 A"},
	} {
		for _, e := range necEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				x := disconnect(t, e, tt.m)
				assert.Equal(t, tt.amperes, x.Amperes.String())
				assert.Equal(t, tt.ref, ref(x.Amperes))
				assert.Equal(t, tt.hp, x.Horsepower.String())
				assert.Equal(t, tt.hp != "", !x.Cite.IsZero())
				assert.Equal(t, tt.rotor, x.LockedRotor.String())
				assert.Equal(t, "15 m", x.Sight.String())
				assert.Equal(t, "430.102", ref(x.Sight))
				assert.Equal(t, tt.ref == "430.110(A)", testkit.Cautioned(x.Cautions, "430.110(A) Exception", "unfused"))
				assert.Equal(t, tt.m.Kind == motor.Torque, testkit.Cautioned(x.Cautions, "430.109", "torque"))
			})
		}
	}
}

// Single-phase, 10 hp at 115 V: Table 430.251(A) printed 600 A to 2020, 1000 A in 2023.
func TestDisconnectPrinted2023(t *testing.T) {
	m := motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("10"), Voltage: 115}
	for e, want := range map[tables.Edition]string{tables.NEC2017: "600 A", tables.NEC2020: "600 A", tables.NEC2023: "1000 A"} {
		assert.Equal(t, want, disconnect(t, e, m).LockedRotor.String())
	}
}

// Drives: the NEC goes by the drive's input, 430.128; the CEC has no rule of its
// own and takes the larger current (common practice, no source).
func TestDisconnectDrive(t *testing.T) {
	drive := func(input string) motor.Motor {
		m := started(motor.Drive, cage50()) // 65 A
		m.Nameplate.DriveInput = motor.Amps(input)
		return m
	}
	for _, e := range necEditions {
		x := disconnect(t, e, drive("36"))
		assert.Equal(t, "41.4 A", x.Amperes.String(), "36 × 115 %")
		assert.Equal(t, "430.128", ref(x.Amperes))
		assert.True(t, x.LockedRotor.IsZero(), "the drive stands between")
	}
	for _, e := range cecEditions {
		assert.Equal(t, "74.75 A", disconnect(t, e, drive("36")).Amperes.String(), "65 × 115 %")
		assert.Equal(t, "80.5 A", disconnect(t, e, drive("70")).Amperes.String(), "70 × 115 %")
	}
}

// NEC 430.109(E): a general-use or isolating switch above 100 hp, dc above 40 hp.
// CEC 28-602(3): above 100 hp three-phase, above 50 hp otherwise.
func TestIsolatingSwitch(t *testing.T) {
	for _, tt := range []struct {
		kind     motor.Kind
		hp       string
		nec, cec bool
	}{
		{motor.SquirrelCage, "100", false, false},
		{motor.SquirrelCage, "101", true, true},
		{motor.SinglePhase, "51", false, true},
		{motor.SinglePhase, "101", true, true},
		{motor.DirectCurrent, "40", false, false},
		{motor.DirectCurrent, "41", true, false},
		{motor.DirectCurrent, "50", true, false},
		{motor.DirectCurrent, "51", true, true},
	} {
		m := as(tt.kind, drawing("150"))
		m.Power = motor.HP(tt.hp)
		for _, e := range tables.Editions() {
			want, rule := tt.nec, "430.109(E)"
			if e.Code() == tables.CEC {
				want, rule = tt.cec, "Rule 28-602(3)"
			}
			assert.Equal(t, want, testkit.Cautioned(disconnect(t, e, m).Cautions, rule, "isolating"), "%+v %v", tt, e)
		}
	}
}

// CEC: 115 percent of full-load current and within sight and 9 m, 28-602, 28-604;
// refrigeration and air-conditioning 28-714 and 3 m.
func TestDisconnectCEC(t *testing.T) {
	for _, tt := range []struct {
		name         string
		m            motor.Motor
		amperes, ref string
		hp, rotor    string
		sight        string
	}{
		{"nameplate", drawing("61"), "70.15 A", "Rule 28-602(1)", "50 hp", "", "9 m"},
		{"hermetic, marked", compressor("38", "", "200"), "43.7 A", "Rule 28-714", "15 hp", "200 A", "3 m"},
		{"hermetic, not marked", compressor("38", "", ""), "43.7 A", "Rule 28-714", "15 hp", "228 A", "3 m"},
		{"torque", torque("12"), "13.8 A", "Rule 28-602(1)", "", "", "9 m"},
		{"direct current", as(motor.DirectCurrent, drawing("61")), "70.15 A", "Rule 28-602(1)", "50 hp", "", "9 m"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				x := disconnect(t, e, tt.m)
				assert.Equal(t, tt.amperes, x.Amperes.String())
				assert.Equal(t, tt.ref, ref(x.Amperes))
				assert.Equal(t, tt.hp, x.Horsepower.String())
				assert.Equal(t, tt.rotor, x.LockedRotor.String())
				assert.Equal(t, tt.sight, x.Sight.String())
				assert.Equal(t, "Rule 28-604", ref(x.Sight))
			})
		}
	}
}
