package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/motor"
)

func TestPhasesAndConductors(t *testing.T) {
	for _, tt := range []struct {
		kind                 motor.Kind
		phases               int
		start                motor.Starting
		count, line, toMotor int
	}{
		{motor.SquirrelCage, 0, motor.AcrossTheLine, 3, 3, 3},
		{motor.SquirrelCage, 2, motor.AcrossTheLine, 2, 4, 4},
		{motor.SinglePhase, 0, motor.AcrossTheLine, 1, 2, 2},
		{motor.WoundRotor, 0, motor.Resistor, 3, 3, 3},
		{motor.Synchronous, 0, motor.Autotransformer, 3, 3, 3},
		{motor.DirectCurrent, 0, motor.Resistor, 0, 2, 2},
		{motor.Torque, 1, motor.AcrossTheLine, 1, 2, 2},
		{motor.Hermetic, 0, motor.WyeDelta, 3, 3, 6}, // six leads of a wye-delta start
		{motor.SquirrelCage, 3, motor.PartWinding, 3, 3, 6},
		{motor.SquirrelCage, 3, motor.Drive, 3, 3, 3},
	} {
		m := motor.Motor{Kind: tt.kind, Phases: tt.phases, Starting: tt.start}
		assert.Equal(t, tt.count, m.PhaseCount(), "%+v", tt)
		assert.Equal(t, tt.line, m.LineConductors(), "%+v", tt)
		assert.Equal(t, tt.toMotor, m.SupplyConductors(), "%+v", tt)
	}
}

// NEC 110.14(C)(1)(a)(4) names Designs B, C and D; A is not named.
func TestDesignBCD(t *testing.T) {
	for letter, want := range map[string]bool{"": false, "A": false, "B": true, "C": true, "D": true, "b": true, "c": true, "d": true, "E": false, "BC": false} {
		m := cage50()
		m.Nameplate.DesignLetter = letter
		assert.Equal(t, want, m.IsDesignBCD(), letter)
	}
}

// CEC Table 29 tells autotransformer and star-delta starting apart.
func TestReducedVoltage(t *testing.T) {
	for s, want := range map[motor.Starting]bool{
		motor.AcrossTheLine: false, motor.WyeDelta: true, motor.PartWinding: false, motor.Autotransformer: true,
		motor.Resistor: false, motor.SoftStarter: false, motor.Drive: false,
	} {
		assert.Equal(t, want, s.ReducedVoltage(), s)
	}
}

func TestConstructorsPanicOnSlips(t *testing.T) {
	for _, slip := range []func(){
		func() { motor.HP("7-3/2") }, func() { motor.KW("-1") }, func() { motor.Amps("10,4") },
		func() { motor.Factor("1.15x") }, func() { motor.Celsius("warm") },
	} {
		assert.Panics(t, slip)
	}
	assert.Equal(t, "7-1/2 hp", motor.HP("7-1/2").String())
	assert.Equal(t, "30 kW", motor.KW("30").String())
	assert.Equal(t, "10.4 A", motor.Amps("10.4").String())
	assert.Equal(t, "1.15", motor.Factor("1.15").String())
	assert.Equal(t, "40 °C", motor.Celsius("40").String())
}
