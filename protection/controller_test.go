package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// NEC 430.83(C): to 2 hp and 300 V a general-use switch of twice the full-load
// current or an ac snap switch loaded to 80 percent may serve. An appliance goes by
// its nameplate, which shows the edges.
func TestSmallSwitchesNEC(t *testing.T) {
	appliance := func(hp string, volts int) motor.Motor {
		m := motor.Motor{Kind: motor.SinglePhase, Power: motor.HP(hp), Voltage: volts}
		m.Nameplate.Amperes, m.Nameplate.Appliance = motor.Amps("5"), true
		return m
	}
	for _, tt := range []struct {
		name          string
		m             motor.Motor
		general, snap string
	}{
		{"2 hp, 230 V", motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("2"), Voltage: 230}, "13.6 A", "8.5 A"}, // 6.8 A
		{"3 hp, 230 V", motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("3"), Voltage: 230}, "", ""},
		{"1/2 hp, 460 V", motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("1/2"), Voltage: 460}, "", ""},
		{"2 hp, 300 V", appliance("2", 300), "10 A", "6.25 A"},
		{"2 hp, 301 V", appliance("2", 301), "", ""},
		{"2.01 hp, 300 V", appliance("2.01", 300), "", ""},
		{"dc, 2 hp, 240 V", motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("2"), Voltage: 240}, "17 A", ""}, // snap switches are ac only
	} {
		for _, e := range necEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				x := controller(t, e, tt.m)
				assert.Equal(t, tt.m.Power, x.Horsepower)
				assert.Equal(t, tt.general, x.GeneralUse.String())
				assert.Equal(t, tt.snap, x.SnapSwitch.String())
				if tt.general != "" {
					assert.Equal(t, "430.83(C)", ref(x.GeneralUse))
				}
				assert.True(t, x.Amperes.IsZero())
				assert.True(t, x.LockedRotor.IsZero())
				assert.True(t, testkit.Cautioned(x.Cautions, "430.83", "inverse-time breaker"))
			})
		}
	}
}

// CEC 28-500: a single-phase motor on a general-use switch of 125 percent.
func TestGeneralUseSwitchCEC(t *testing.T) {
	for _, e := range cecEditions {
		x := controller(t, e, as(motor.SinglePhase, drawing("16")))
		assert.Equal(t, "20 A", x.GeneralUse.String())
		assert.Equal(t, "Rule 28-500", ref(x.GeneralUse))
		assert.Equal(t, "50 hp", x.Horsepower.String())
		assert.True(t, x.SnapSwitch.IsZero())
		x = controller(t, e, drawing("16"))
		assert.True(t, x.GeneralUse.IsZero(), "three-phase")
	}
}

// Torque and hermetic motors are not rated in horsepower: 430.83(D), 440.41; CEC
// 28-500, 28-712.
func TestControllerByAmperes(t *testing.T) {
	for _, tt := range []struct {
		name     string
		editions []tables.Edition
		m        motor.Motor
		amperes  string
		ref      string
		rotor    string
	}{
		{"torque", necEditions, torque("12"), "12 A", "430.83(D)", ""},
		{"hermetic, marked", necEditions, compressor("38", "40", "200"), "40 A", "440.41", "200 A"},
		{"hermetic, not marked", necEditions, compressor("38", "", ""), "38 A", "440.41", "228 A"},
		{"torque", cecEditions, torque("12"), "12 A", "Rule 28-500", ""},
		{"hermetic, marked", cecEditions, compressor("38", "", "200"), "38 A", "Rule 28-712", "200 A"},
		{"hermetic, not marked", cecEditions, compressor("38", "", ""), "38 A", "Rule 28-712", "228 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				x := controller(t, e, tt.m)
				assert.Equal(t, tt.amperes, x.Amperes.String())
				assert.Equal(t, tt.ref, ref(x.Amperes))
				assert.Equal(t, tt.rotor, x.LockedRotor.String())
				assert.True(t, x.GeneralUse.IsZero())
			})
		}
	}
}
