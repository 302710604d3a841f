package motorcircuit_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A line-to-line fault is √3/2 of that of all phases, and is told of three-phase
// motors only (IEEE 141-1993 chapter 4).
func TestLineToLineFault(t *testing.T) {
	c := longRun(tables.NEC2023, "60")
	c.Fault = motor.Amps("10000")
	d := circuitOf(t, c).FaultDuty
	assert.InDelta(t, math.Sqrt(3)/2*d.AtMotor.Float(), d.LineToLine.Float(), 0.011)
	c.Motor = motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("5"), Voltage: 230}
	d = circuitOf(t, c).FaultDuty
	assert.False(t, d.AtMotor.IsZero())
	assert.True(t, d.LineToLine.IsZero())
}

// The fault at the end of the feeder is where its circuits begin, unless they
// give a fault current of their own.
func TestFeederFault(t *testing.T) {
	for _, e := range tables.Editions() {
		f := longFeeder(e, "50", "20")
		f.Fault = motor.Amps("20000")
		own := motor.Amps("5000")
		f.Circuits[1].Circuit.Fault = own
		r := fed(t, f)
		want, err := f.Wiring.FaultAtEnd(e, r.Conductors, 460, 3, f.Fault.Figure("source"), tables.Figure{})
		require.NoError(t, err)
		assert.Equal(t, want.String(), r.FaultDuty.AtMotor.String())
		assert.Less(t, r.FaultDuty.AtMotor.Float(), 20.0)
		assert.False(t, r.FaultDuty.Withstand.IsZero())
		for i := range r.Circuits {
			source := r.Circuits[i].FaultDuty.Source.Float()
			if i == 1 {
				assert.InDelta(t, 5000, source, 1e-6)
				continue
			}
			assert.InDelta(t, 1000*r.FaultDuty.AtMotor.Float(), source, 1e-6)
			assert.Less(t, r.Circuits[i].FaultDuty.AtMotor.Float(), r.FaultDuty.AtMotor.Float())
		}
	}
}

// The flexible connection at the motor holds the same conductors.
func TestFlexibleConnection(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "60")
		c.Wiring.Flexible = tables.LFMC
		r := circuitOf(t, c)
		assert.Equal(t, tables.LFMC, r.Flexible.Raceway)
		assert.Equal(t, r.Raceway.Area.String(), r.Flexible.Area.String())
		assert.LessOrEqual(t, r.Flexible.Area.Cmp(r.Flexible.Limit), 0)
		assert.True(t, told(r.Cautions, "flexible raceway does not bond"))
		c.Wiring.Flexible = 0
		assert.True(t, circuitOf(t, c).Flexible.IsZero())
	}
}

// MaxDrop holds by CEC Table D3 as it does by impedance.
func TestMaxDropByTableD3(t *testing.T) {
	c := longRun(tables.CEC2024, "150")
	c.Wiring.DropMethod, c.MaxDrop = conductor.ByTableD3, motor.Factor("2")
	r := circuitOf(t, c)
	assert.Equal(t, "Table D3", r.Drop.Running.Citation().Ref)
	assert.LessOrEqual(t, r.Drop.Running.Float(), 2.0)
	c.MaxDrop, c.Wiring.Least = tables.Ratio{}, r.Branch.Size.Smaller()
	assert.Greater(t, circuitOf(t, c).Drop.Running.Float(), 2.0)
}
