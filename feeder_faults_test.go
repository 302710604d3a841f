package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// This file holds what once went wrong in the sums of a feeder.

// NFPA 70 430.24 Exception No. 3 and 430.122(D), CSA C22.1 Rule 28-108(2): a drive
// counts once in each set that can run together, and not once in all.
func TestFeederDriveAcrossInterlocks(t *testing.T) {
	v1 := drawing("v1", "40", onDrive("36", "D"), locked("x", "1"))
	c := drawing("c", "14", locked("x", "2"))
	holdSums(t, []sumCase{
		{"interlocked", everyone, list{v1, drawing("v2", "20", onDrive("36", "D"), locked("x", "2")), c}, "59 A", "v2", "", "", ""},
		{"one free", everyone, list{v1, drawing("v2", "20", onDrive("36", "D")), c}, "59 A", "v2", "", "", ""},
	})
}

// A part of the sum is never below what the circuit's own conductors need: a
// drive whatever its motor's duty (430.122(A)), equipment by its marking (440.35)
// and a rectifier by its input (430.22(A)).
func TestFeederIsNotBelowItsCircuit(t *testing.T) {
	for _, e := range everyone {
		assert.Equal(t, "45 A", sized(t, feeder(e, drawing("v", "40", onDrive("36", ""), duty(motor.Intermittent, 15)))).Ampacity.String())
		ac := compressor("ac", "38", "")
		ac.Circuit.Motor.Nameplate.MinimumAmpacity = motor.Amps("60")
		r := sized(t, feeder(e, ac))
		assert.GreaterOrEqual(t, r.Ampacity.Cmp(r.Circuits[0].Branch.Required), 0)
	}
	for _, e := range necEditions {
		fc := motorcircuit.FeederCircuit{Circuit: motorcircuit.Circuit{Motor: motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240,
			Rectifier: motor.HalfWave, Nameplate: motor.Nameplate{RectifierInput: motor.Amps("60")}}}}
		assert.Equal(t, "75 A", sized(t, feeder(e, fc)).Ampacity.String())
	}
}

// NFPA 70 430.62(A) Exception No. 1: an instantaneous-trip breaker counts the
// table's percent of the feeder device's kind, 2.5 × 65 + 40.
func TestFeederCountsInstantaneousByPercent(t *testing.T) {
	for _, e := range necEditions {
		f := feeder(e, drawing("mcp", "65", behind(protection.InstantaneousBreaker)), drawing("b", "40"))
		f.Device = protection.InverseTimeBreaker
		assert.Equal(t, "202.5 A", sized(t, f).Limit.String())
	}
}

// NFPA 70 430.110(C)(1): the greatest horsepower and locked-rotor current of all
// sets, by the feeder's own system; Table 430.250 and 430.251(B).
func TestGroupDisconnectOverAllSets(t *testing.T) {
	for _, e := range necEditions {
		ac := compressor("ac", "60", "")
		ac.Circuit.Motor.Nameplate.LockedRotor = motor.Amps("600")
		ac.Interlock = "x"
		r := sized(t, feeder(e, cage("a", "50", 460, locked("x", "")), ac))
		assert.Equal(t, "100 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "600 A", r.Disconnect.LockedRotor.String())
		r = sized(t, feeder(e, cage("pump", "10", 208), single("a", "5", 115, "A")))
		assert.Equal(t, "40 hp", r.Disconnect.Horsepower.String())
	}
	for _, e := range cecEditions { // Rule 28-714: 6 × 38 + 20
		assert.Equal(t, "248 A", sized(t, feeder(e, compressor("ac", "38", ""), drawing("b", "20"))).Disconnect.LockedRotor.String())
	}
}

// NFPA 70 430.110(A) beside 430.128: with a bypass the line may feed the motor.
func TestDisconnectOfDriveWithBypass(t *testing.T) {
	for _, e := range necEditions {
		fc := cage("v", "30", 460, onDrive("36", ""), bypassed)
		fc.Circuit.Edition = e
		r, err := motorcircuit.Size(fc.Circuit)
		require.NoError(t, err)
		assert.Equal(t, "46 A", r.Disconnect.Amperes.String())
		assert.Equal(t, "30 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "218 A", sized(t, feeder(e, fc)).Disconnect.LockedRotor.String())
	}
}

// CSA C22.1 Rule 28-204(2) with Table 29: wound rotors that start together count
// 150 percent of their sum, 1.5 × 80 + 20.
func TestStartTogetherByKind(t *testing.T) {
	wound := func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Kind = motor.WoundRotor }
	for _, e := range cecEditions {
		r := sized(t, feeder(e, drawing("a", "40", wound, startsWith("s")), drawing("b", "40", wound, startsWith("s")), drawing("c", "20")))
		assert.Equal(t, "140 A", r.StartLimit.String())
	}
}

// CSA C22.1 Rule 28-204(4): a demand factor never raises the device, neither
// above Rule 28-204(1) nor for motors that start together.
func TestDemandNeverRaisesTheDevice(t *testing.T) {
	var many []motorcircuit.FeederCircuit
	for range 13 {
		many = append(many, drawing("m", "10"))
	}
	for _, e := range cecEditions {
		f := feeder(e, many...)
		f.Demand = motor.Factor("0.98")
		assert.LessOrEqual(t, sized(t, f).Limit.Cmp(motor.Amps("137.5").Figure("28-204(1)")), 0)
		f = feeder(e, drawing("a", "40", startsWith("s")), drawing("b", "40", startsWith("s")))
		f.Demand = motor.Factor("0.7")
		assert.True(t, sized(t, f).StartLimit.IsZero())
	}
}

// NFPA 70 695.4 and 695.6 hold for the supply of a fire pump, which no feeder of
// other motors is sized for here; its device must carry locked rotor.
func TestFirePumpAlone(t *testing.T) {
	for _, e := range necEditions {
		fc := cage("fp", "50", 460)
		fc.Circuit.Motor.Use, fc.Circuit.Motor.Nameplate.LockedRotor = motor.FirePump, motor.Amps("400")
		_, err := motorcircuit.SizeFeeder(feeder(e, fc, cage("j", "20", 460)))
		assert.ErrorContains(t, err, "motor.use")
		_, err = motorcircuit.SizeGroup(oneCircuit(e, fc, cage("j", "20", 460)))
		assert.ErrorContains(t, err, "motor.use")

		c := fc.Circuit
		c.Edition, c.Device = e, protection.InstantaneousBreaker
		_, err = motorcircuit.Size(c)
		assert.ErrorContains(t, err, "device")
		c.Device, c.Motor.Nameplate.MaximumDevice = 0, motor.Amps("150")
		_, err = motorcircuit.Size(c)
		assert.ErrorContains(t, err, "motor.nameplate.maximum_device_rating")
	}
}

// CSA C22.1 Rule 28-206 and NFPA 70 430.53(A): other load counts, every motor is
// at 120 V, and a way without a rating is none.
func TestGroupWaysAtTheirEdges(t *testing.T) {
	for _, e := range cecEditions {
		g := oneCircuit(e, drawing("a", "5"), drawing("b", "4"))
		assert.True(t, way(t, sizedGroup(t, g), "Rule 28-206(a)").Allowed)
		g.Other = motor.Amps("10")
		assert.False(t, way(t, sizedGroup(t, g), "Rule 28-206(a)").Allowed)
		r, err := motorcircuit.SizeGroup(oneCircuit(e, drawing("a", "5"), drawing("b", "2")))
		require.NoError(t, err)
		w := way(t, r, "Rule 28-206(b)")
		assert.False(t, w.Allowed && w.Rating.IsZero())
	}
	for _, e := range necEditions {
		r := sizedGroup(t, oneCircuit(e, single("a", "1/4", 115, ""), single("b", "1/6", 208, "")))
		assert.Equal(t, "15 A", way(t, r, "430.53(A)").Limit.String())
	}
}

// The maximum marked on the equipment holds every limit (430.52(C)(2), Rule
// 28-202), and half of a part winding counts half of the table's percent (Rule
// 28-806): 65 ÷ 2 × 1.75.
func TestHalvesOfAPartWinding(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Starting: motor.PartWinding}
	for _, e := range everyone {
		d, err := m.Demand(e)
		require.NoError(t, err)
		x, err := protection.SizeShortCircuit(e, protection.TimeDelayFuse, m, d)
		require.NoError(t, err)
		assert.Equal(t, "56.875 A", x.Half.String())
		marked := m
		marked.Nameplate.MaximumDevice = motor.Amps("40")
		x, err = protection.SizeShortCircuit(e, protection.TimeDelayFuse, marked, d)
		require.NoError(t, err)
		assert.LessOrEqual(t, x.Half.Cmp(tables.Whole("marked", tables.Ampere, 40)), 0)
	}
}
