package motorcircuit_test

import (
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// amounts sums quantities by kind.
func amounts(list []motorcircuit.Quantity) map[string]string {
	sums := make(map[string]decimal.Decimal)
	for _, q := range list {
		sums[q.Kind] = sums[q.Kind].Add(q.Amount)
	}
	texts := make(map[string]string)
	for kind, sum := range sums {
		texts[kind] = sum.String()
	}
	return texts
}

// Length and 1.5 m of ends, times conductors, times sets; raceway by length; one
// of each device.
func TestQuantities(t *testing.T) {
	for _, e := range tables.Editions() {
		r := circuitOf(t, longRun(e, "30"))
		assert.Equal(t, map[string]string{"conductor": "94.5", "bonding_conductor": "31.5", "raceway": "30", "device": "1", "overload": "1", "disconnect": "1", "controller": "1"}, amounts(r.Quantities()))
		for _, q := range r.Quantities() {
			switch q.Kind {
			case "conductor":
				assert.Equal(t, r.Branch.Size.String()+" copper "+r.Branch.Insulation, q.Item)
				assert.Equal(t, "m", q.Unit)
			case "bonding_conductor":
				assert.Equal(t, r.Bonding.Size.String()+" copper", q.Item)
			case "raceway":
				assert.Equal(t, r.Raceway.Name(e), q.Item)
			case "device":
				assert.Equal(t, r.ShortCircuit.Rating.String()+" "+r.ShortCircuit.Device.Name(), q.Item)
				assert.Equal(t, "each", q.Unit)
			}
		}

		c := longRun(e, "30") // two sets of three, each with its own raceway
		c.Motor.Power, c.Wiring.Sets, c.Wiring.Material = motor.HP("200"), 2, conductor.Aluminum
		sum := amounts(circuitOf(t, c).Quantities())
		assert.Equal(t, []string{"189", "63", "60"}, []string{sum["conductor"], sum["bonding_conductor"], sum["raceway"]})

		c = longRun(e, "30") // two lines, no raceway given
		c.Motor, c.Wiring.Raceway = motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("5"), Voltage: 230}, 0
		sum = amounts(circuitOf(t, c).Quantities())
		assert.Equal(t, []string{"63", "31.5", ""}, []string{sum["conductor"], sum["bonding_conductor"], sum["raceway"]})

		c.Wiring.Length = tables.Length{}
		sum = amounts(circuitOf(t, c).Quantities())
		assert.Equal(t, []string{"", "", "1"}, []string{sum["conductor"], sum["raceway"], sum["device"]}, "no lines by length without one")
	}
	// Feet are turned into metres exactly: (100 × 0.3048 + 1.5) × 3.
	c := longRun(tables.NEC2023, "30")
	c.Wiring.Length = conductor.Feet("100")
	assert.Equal(t, "95.94", amounts(circuitOf(t, c).Quantities())["conductor"])
}

// An instantaneous trip has a setting in place of a rating.
func TestQuantitiesOfASetting(t *testing.T) {
	c := longRun(tables.NEC2023, "30")
	c.Device = tables.InstantaneousBreaker
	for _, q := range circuitOf(t, c).Quantities() {
		if q.Kind == "device" {
			assert.Contains(t, q.Item, "set to 272 A") // 800 % of 34 A
		}
	}
}

// One raceway is as long as the longest run in it, in whatever order; an overload
// relay of one unit is told so (NEC Table 430.37).
func TestQuantitiesOfLongestRun(t *testing.T) {
	run := func(tag, length string) motorcircuit.Circuit {
		c := single(tag, "1", 115, "").Circuit
		c.Edition, c.Wiring.Termination, c.Wiring.Length = tables.NEC2023, 75, conductor.Metres(length)
		c.Motor.Nameplate.Amperes = motor.Amps("15")
		return c
	}
	for _, order := range [][2]string{{"20", "35"}, {"35", "20"}} {
		s, err := motorcircuit.SizeShared(conductor.EMT, []motorcircuit.Circuit{run("a", order[0]), run("b", order[1])})
		require.NoError(t, err)
		units := 0
		for _, q := range s.Quantities() {
			switch q.Kind {
			case "raceway":
				assert.Equal(t, "35", q.Amount.String())
			case "overload":
				units++
				assert.Equal(t, "overload relay of 1 unit", q.Item)
			}
		}
		assert.Equal(t, 2, units)
	}
}
