package motorcircuit_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

func sizedOne(t *testing.T, e tables.Edition, fc motorcircuit.FeederCircuit) motorcircuit.Result {
	t.Helper()
	fc.Circuit.Edition, fc.Circuit.Wiring.Termination = e, 75
	r, err := motorcircuit.Size(fc.Circuit)
	require.NoError(t, err)
	for section, f := range r.Figures() {
		requireCited(t, e, section, f)
	}
	return r
}

// A multispeed motor has conductors to each winding: 35 and 15 A at 75 °C.
func TestSizeWindings(t *testing.T) {
	for _, e := range everyone {
		r := sizedOne(t, e, with(cage("fan", "20", 460), func(fc *motorcircuit.FeederCircuit) {
			fc.Circuit.Motor.Nameplate.Windings = []motor.Winding{{Amperes: motor.Amps("28")}, {Amperes: motor.Amps("12")}}
		}))
		require.Len(t, r.Windings, 2)
		assert.Equal(t, "10", r.Windings[0].Size.Name())
		assert.Equal(t, "14", r.Windings[1].Size.Name())
		assert.Equal(t, "15 A", r.Windings[1].Required.String())
		text := r.String()
		assert.Contains(t, text, "2 speeds")
		assert.Contains(t, text, "Conductors to each winding: 10 AWG copper")
		assert.Contains(t, text, "; 14 AWG copper")
		assert.Contains(t, text, "smallest winding")
	}
}

// A wound rotor with resistors apart: 65 A × 55 % = 35.75 A, 8 AWG.
func TestSizeResistors(t *testing.T) {
	for _, e := range everyone {
		r := sizedOne(t, e, with(cage("crane", "30", 460), func(fc *motorcircuit.FeederCircuit) {
			m := &fc.Circuit.Motor
			m.Kind, m.Nameplate.Secondary, m.Resistor = motor.WoundRotor, motor.Amps("65"), tables.ExtraHeavyStarting
			fc.Circuit.Wiring.Conductors = 3
		}))
		assert.Equal(t, "8", r.Resistor.Size.Name())
		assert.Equal(t, "4", r.Secondary.Size.Name(), "81.25 A")
		assert.Contains(t, r.String(), "Conductors to the resistors: 8 AWG copper")
		assert.Equal(t, e.Code() == tables.CEC, len(r.Resistor.Required.FromMemory()) > 0)
	}
}

// Single-phase rectifiers: the run to the motor is larger than the supply's.
func TestSizeRectifier(t *testing.T) {
	for _, e := range necEditions {
		r := sizedOne(t, e, with(cage("hoist", "10", 240), func(fc *motorcircuit.FeederCircuit) {
			m := &fc.Circuit.Motor
			m.Kind, m.Rectifier, m.Nameplate.RectifierInput = motor.DirectCurrent, motor.HalfWave, motor.Amps("44")
		}))
		assert.Equal(t, "6", r.Branch.Size.Name(), "55 A")
		assert.Equal(t, "4", r.MotorSupply.Size.Name(), "38 × 190 % = 72.2 A")
	}
}

// A fire pump has no overload protection, and its text says so.
func TestSizeFirePump(t *testing.T) {
	for _, e := range necEditions {
		r := sizedOne(t, e, with(cage("FP-1", "50", 460), func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Use = motor.FirePump }))
		text := r.String()
		assert.Contains(t, text, "fire pump")
		assert.Contains(t, text, "Overload protection: none")
		assert.Contains(t, text, "FIRE PUMP")
		assert.Contains(t, text, "400 A time-delay fuse")
	}
}

// The text of a drive with a bypass says so, and is what WriteTo writes.
func TestSizeBypassText(t *testing.T) {
	r := sizedOne(t, tables.NEC2023, cage("VFD", "30", 460, onDrive("36", ""), bypassed))
	var b strings.Builder
	n, err := r.WriteTo(&b)
	require.NoError(t, err)
	assert.Equal(t, r.String(), b.String())
	assert.Equal(t, int64(b.Len()), n)
	assert.Contains(t, b.String(), "with bypass")
}

// Feeders of one system that is not three-phase. NEC Tables 430.247 to 430.251;
// direct current has no locked-rotor table.
func TestFeederOtherSystems(t *testing.T) {
	for _, e := range necEditions {
		dc := func(tag, hp string) motorcircuit.FeederCircuit {
			return with(cage(tag, hp, 240), func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Kind = motor.DirectCurrent })
		}
		// 38 + 20 = 58 A: 20 hp (72 A), since 15 hp has 55.
		r := sized(t, feeder(e, dc("a", "10"), dc("b", "5")))
		assert.Equal(t, "67.5 A", r.Ampacity.String(), "47.5 + 20")
		assert.Equal(t, "20 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "66.7 A", r.Disconnect.Amperes.String(), "58 × 1.15")

		// 230 V: 17 + 12 = 29 A, 7-1/2 hp (40); locked rotor 102 + 72 = 174: 7-1/2 hp (240).
		r = sized(t, feeder(e, single("a", "3", 230, ""), single("b", "2", 230, "")))
		assert.Equal(t, "33.25 A", r.Ampacity.String(), "21.25 + 12")
		assert.Equal(t, "7-1/2 hp", r.Disconnect.Horsepower.String())

		// Two-phase, 230 V: 10 hp 24 A and 5 hp 13.2 A: 37.2 A, 20 hp (47), since 15 hp
		// has 36; locked rotor 162 + 92 = 254: 20 hp (290).
		two := func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Phases = 2 }
		r = sized(t, feeder(e, cage("a", "10", 230, two), cage("b", "5", 230, two)))
		assert.Equal(t, "43.2 A", r.Ampacity.String(), "30 + 13.2")
		assert.Equal(t, "20 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "80 %", r.Conductors.Together.String(), "four conductors in the raceway")
	}
}

// Feeders that no size or rating meets are refused with the limit.
func TestFeederNoSize(t *testing.T) {
	f := feeder(tables.NEC2023, drawing("a", "40"))
	f.Other = motor.Amps("99999")
	got, _ := refused(t, f)
	assert.Equal(t, map[int][]string{-1: {"wiring"}}, got)

	// A 3 A fuse ahead of 1.1 A; no breaker is that small, and none may be larger.
	f = feeder(tables.NEC2017, cage("a", "1/2", 460))
	f.Device = protection.InverseTimeBreaker
	got, err := refused(t, f)
	assert.Equal(t, map[int][]string{-1: {"device"}}, got)
	assert.Contains(t, err.Error(), "430.62(A)")
}
