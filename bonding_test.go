package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// NEC 250.122(D)(2): an instantaneous trip has no rating; the bonding conductor
// goes by the time-delay fuse that would be allowed. 50 hp at 460 V: 65 A × 175 %
// = 113.75 A, 125 A by the exception, 6 AWG; as a 70 A setting would give 8 AWG.
func TestBondingBehindInstantaneousTrip(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "5")
		c.Motor.Power, c.Device = motor.HP("50"), protection.InstantaneousBreaker
		r := circuitOf(t, c)
		c.Device = protection.TimeDelayFuse
		fuse := circuitOf(t, c)
		assert.Equal(t, fuse.Bonding.Size, r.Bonding.Size)
		if e.Code() == tables.NEC {
			assert.Equal(t, "125 A", fuse.ShortCircuit.Rating.String())
			assert.Equal(t, "6 AWG", r.Bonding.Size.String())
			assert.Equal(t, "200 A", r.Bonding.Row.String())
		}
	}
}

// NEC 250.122(B): to 2017 an increase counts from the size before correction, so
// that derating enlarges the bonding conductor too; from 2020 it does not. 50 hp
// behind a breaker of 175 A: 6 AWG by the table. Twelve conductors together and
// 81.25 A: 162.5 A from the 75 °C column, 2/0 AWG in place of 4 AWG; 6 AWG grows
// by 133 100 / 41 740 to 83 680 cmil, 1 AWG.
func TestBondingByEdition(t *testing.T) {
	for _, e := range []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023} {
		c := longRun(e, "5")
		c.Motor.Power, c.Wiring.Conductors = motor.HP("50"), 12
		r := circuitOf(t, c)
		assert.Equal(t, "2/0 AWG", r.Branch.Size.String())
		want := "6 AWG"
		if e == tables.NEC2017 {
			want = "1 AWG"
		}
		assert.Equal(t, want, r.Bonding.Size.String(), e.String())
		assert.Equal(t, "2/0 AWG", r.BySize.String())
	}
}

// Enlarged for voltage drop: NEC in proportion, never below the table's size.
func TestBondingOfEnlargedConductors(t *testing.T) {
	for _, e := range tables.Editions() {
		c := longRun(e, "300")
		before := circuitOf(t, c)
		c.MaxDrop = motor.Factor("2")
		after := circuitOf(t, c)
		assert.LessOrEqual(t, after.Bonding.Size.Cmp(after.Branch.Size), 0)
		if e.Code() == tables.NEC {
			assert.Positive(t, after.Bonding.Size.Cmp(before.Bonding.Size))
			assert.Contains(t, after.Bonding.Why, "in proportion")
			// The ratio of areas holds to the size that is just large enough.
			need := before.Bonding.Size.Area().Mul(after.Branch.Size.Area()).Div(before.Branch.Size.Area())
			assert.True(t, after.Bonding.Size.Area().GreaterThanOrEqual(need))
			assert.True(t, after.Bonding.Size.Smaller().Area().LessThan(need))
		} else {
			assert.Contains(t, after.Bonding.Why, "ampacity")
		}
	}
}

// The worked example N073 again, by hand: 2 hp, 208 V single-phase, 25 A fuse,
// 14 AWG: the row of 30 A asks for 10 AWG, but no more than the circuit's own.
func TestBondingNotAboveTheCircuit(t *testing.T) {
	c := longRun(tables.NEC2023, "5")
	c.Motor = motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("2"), Voltage: 208}
	c.Device, c.Wiring = protection.TimeDelayFuse, conductor.Wiring{Termination: 75}
	r := circuitOf(t, c)
	assert.Equal(t, "25 A", r.ShortCircuit.Rating.String())
	assert.Equal(t, "14 AWG", r.Bonding.Size.String())
	assert.Contains(t, r.Bonding.Why, "need not exceed")
}
