package motorcircuit_test

import (
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A drop of the feeder above the code's figure is told, and one within is not: NEC
// 215.2 informational note, CEC Rule 8-102.
func TestFeederDropIsTold(t *testing.T) {
	for _, e := range everyone {
		for length, told := range map[string]bool{"400": true, "5": false} {
			f := feeder(e, cage("a", "30", 460))
			f.Wiring.Length = conductor.Metres(length)
			got := slices.ContainsFunc(sized(t, f).Cautions, func(c tables.Caution) bool { return strings.Contains(c.Text, "the voltage drop of the feeder of") })
			assert.Equal(t, told, got, "%v %s m", e, length)
		}
	}
}

// The feeder drops for the greatest set that runs together, and as of the system of
// most phases, whichever motor is the largest.
func TestFeederDropsForItsSystem(t *testing.T) {
	lock := func(fc *motorcircuit.FeederCircuit) { fc.Interlock = "x" }
	for _, e := range everyone {
		alone := feeder(e, cage("a", "30", 460))
		locked := feeder(e, cage("b", "10", 460, lock), cage("a", "30", 460, lock))
		alone.Wiring.Length, locked.Wiring.Length = conductor.Metres("80"), conductor.Metres("80")
		assert.Equal(t, sized(t, alone).Drop.Running.String(), sized(t, locked).Drop.Running.String())

		mixed := feeder(e, single("a", "5", 208, "AB"), cage("b", "1", 208))
		mixed.Wiring.Length = conductor.Metres("40")
		r := sized(t, mixed)
		line := conductor.LineLoad{Volts: 208, Phases: 3, Current: r.Drop.Running.Operands()[0], PowerFactor: tables.Must(tables.ParseRatio("0.85")).Figure("power factor")}
		want, err := mixed.Wiring.RunningDrop(e, r.Conductors, line)
		require.NoError(t, err)
		assert.Equal(t, want.String(), r.Drop.Running.String())
	}
}

// CEC Rule 28-204(2), breakers of 250 percent: of 2 × 14 A and 2 × 40 A that start
// together the latter ask for more, 80 × 250 % + 28 = 228 A. A wound rotor of 150
// percent among them holds the set to that: 80 × 150 % is below the ordinary limit.
func TestFeederSetsThatStartTogether(t *testing.T) {
	set := func(name string) change {
		return func(fc *motorcircuit.FeederCircuit) { fc.StartsWith = name }
	}
	breaker := func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Device = protection.InverseTimeBreaker }
	wound := func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Kind = motor.WoundRotor }
	for _, e := range cecEditions {
		circuits := []motorcircuit.FeederCircuit{cage("a", "10", 460, set("s"), breaker), cage("b", "10", 460, set("s"), breaker), cage("c", "30", 460, set("t"), breaker), cage("d", "30", 460, set("t"), breaker)}
		for range 2 {
			f := feeder(e, circuits...)
			f.Device, f.Wiring.Termination = protection.InverseTimeBreaker, 75
			assert.Equal(t, "228 A", sized(t, f).StartLimit.String())
			slices.Reverse(circuits)
		}
		for _, pair := range [][]motorcircuit.FeederCircuit{{cage("a", "30", 460, set("s"), breaker), cage("b", "30", 460, set("s"), breaker, wound)}, {cage("a", "30", 460, set("s"), breaker, wound), cage("b", "30", 460, set("s"), breaker)}} {
			f := feeder(e, pair...)
			f.Device, f.Wiring.Termination = protection.InverseTimeBreaker, 75
			assert.True(t, sized(t, f).StartLimit.IsZero())
		}
	}
}
