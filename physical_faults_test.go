package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// This file holds what once went wrong in the physical circuit.

// pumpRun is a 40 hp pump at the end of a long run.
func pumpRun(e tables.Edition) motorcircuit.Circuit {
	c := motorcircuit.Circuit{Tag: "P-9", Edition: e, Device: protection.InverseTimeBreaker, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("40"), Voltage: 460}}
	c.Wiring.Termination, c.Wiring.Length = 75, conductor.Metres("120")
	return c
}

// CSA C22.1 Rule 10-616(3)(b) and NFPA 70 250.122(B): enlarging the circuit never
// shrinks its bonding conductor.
func TestBondingNeverShrinks(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, drop := range []string{"5", "3", "2", "1", "0.5"} {
			before, err := motorcircuit.Size(pumpRun(e))
			require.NoError(t, err)
			c := pumpRun(e)
			c.MaxDrop = motor.Factor(drop)
			after, err := motorcircuit.Size(c)
			require.NoError(t, err)
			assert.GreaterOrEqual(t, after.Bonding.Size.Cmp(before.Bonding.Size), 0, "%v %s", e, drop)
		}
	}
}

// NFPA 70 250.122(B) holds for feeders too, from the size that ampacity asks for.
func TestFeederBondingGrowsWithALeastSize(t *testing.T) {
	for _, e := range necEditions {
		f := motorcircuit.Feeder{Edition: e, Circuits: []motorcircuit.FeederCircuit{{Circuit: pumpRun(e)}}}
		f.Wiring.Termination, f.Wiring.Least = 75, tables.Must(tables.ParseSize("1/0"))
		r, err := motorcircuit.SizeFeeder(f)
		require.NoError(t, err)
		assert.Contains(t, r.Bonding.Why, "in proportion")
	}
}

// NFPA 70 250.122(D)(2): the time-delay fuse stands for the instantaneous trip,
// and the result says so.
func TestBondingOfInstantaneousTripIsTold(t *testing.T) {
	for _, e := range necEditions {
		c := pumpRun(e)
		c.Device = protection.InstantaneousBreaker
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		assert.Contains(t, r.Bonding.Why, "250.122(D)(2)")
		assert.Contains(t, r.Bonding.Why, "100 A") // 175 percent of 52 A is 91 A
	}
}

// Physics is cited as itself, and is no surer or less sure for a conversion.
func TestPhysicsIsCitedAsItself(t *testing.T) {
	c := pumpRun(tables.CEC2024)
	c.Fault = motor.Amps("20000")
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	assert.Equal(t, "IEEE 141-1993 3.11 (exact form, lagging load)", r.Drop.Running.Citation().String())
	assert.Empty(t, r.FaultDuty.Withstand.FromMemory())
	c.Motor.Starting = motor.WyeDelta
	r, err = motorcircuit.Size(c)
	require.NoError(t, err)
	for _, cite := range r.Drop.Starting.FromMemory() {
		assert.NotContains(t, cite.Ref, "wye start")
	}
}

// What would be passed over in silence is refused or told.
func TestNothingPhysicalIsIgnored(t *testing.T) {
	for field, change := range map[string]func(*motorcircuit.Circuit){
		"max_drop_percent": func(c *motorcircuit.Circuit) {
			c.MaxDrop, c.Wiring.Length = motor.Factor("3"), tables.Length{}
		},
		"fault_xr":      func(c *motorcircuit.Circuit) { c.FaultXR = motor.Factor("5") },
		"fault_amperes": func(c *motorcircuit.Circuit) { c.Fault = motor.Amps("0.5") },
	} {
		c := pumpRun(tables.NEC2023)
		change(&c)
		_, err := motorcircuit.Size(c)
		assert.ErrorContains(t, err, field)
	}
	f := motorcircuit.Feeder{Edition: tables.NEC2023, Circuits: []motorcircuit.FeederCircuit{{Circuit: pumpRun(tables.NEC2023)}}}
	f.Fault = motor.Amps("22000")
	r, err := motorcircuit.SizeFeeder(f)
	require.NoError(t, err)
	assert.Equal(t, "22000 A", r.FaultDuty.Source.String())
	f.MaxDrop = motor.Factor("60")
	_, err = motorcircuit.SizeFeeder(f)
	assert.ErrorContains(t, err, "max_drop_percent")
}

// A drop that no size keeps is told as such, also where the insulation's sizes
// end first.
func TestMaxDropBeyondTheInsulation(t *testing.T) {
	c := pumpRun(tables.NEC2023)
	c.Wiring.Insulation, c.Wiring.Length, c.MaxDrop = "THWN", conductor.Metres("5000"), motor.Factor("1")
	_, err := motorcircuit.Size(c)
	var none *tables.NoSizeError
	require.ErrorAs(t, err, &none)
	assert.Equal(t, "max_drop_percent", none.Field)
}

// NFPA 70 695.7: a fire pump's running drop is taken at 115 percent of its
// full-load current, and its starting drop is held against 15 percent.
func TestFirePumpDrop(t *testing.T) {
	for _, e := range necEditions {
		plain, err := motorcircuit.Size(pumpRun(e))
		require.NoError(t, err)
		c := pumpRun(e)
		c.Motor.Use = motor.FirePump
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		assert.Equal(t, "59.8 A", r.Drop.Running.Operands()[0].String()) // 1.15 × 52
		assert.InDelta(t, plain.Drop.Running.Float()*1.15, r.Drop.Running.Float(), 0.02)
		short := r.String()
		assert.NotContains(t, short, "above the 15 %")
		c.Wiring.Length = conductor.Metres("400")
		r, err = motorcircuit.Size(c)
		require.NoError(t, err)
		assert.Contains(t, r.String(), "above the 15 % that a fire pump's controller may lose [695.7]")
		assert.Contains(t, r.String(), "is above 5 % for one circuit [695.7]")
	}
}
