package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// longFeeder feeds three motors of 25, 10 and 5 hp: 34, 14 and 7.6 A, which run
// together at 55.6 A.
func longFeeder(e tables.Edition, feeder, branch string) motorcircuit.Feeder {
	f := motorcircuit.Feeder{Edition: e, Wiring: conductor.Wiring{Termination: 75, Length: conductor.Metres(feeder), Raceway: tables.RMC}}
	for _, hp := range []string{"25", "10", "5"} {
		c := longRun(e, branch)
		c.Tag, c.Motor.Power = hp, motor.HP(hp)
		f.Circuits = append(f.Circuits, motorcircuit.FeederCircuit{Circuit: c})
	}
	return f
}

func fed(t *testing.T, f motorcircuit.Feeder) motorcircuit.FeederResult {
	t.Helper()
	r, err := motorcircuit.SizeFeeder(f)
	require.NoError(t, err)
	return r
}

// The feeder's drop is that of the sum of the currents at 0.85; feeder and branch
// circuit together are held to 5 percent (NEC 215.2, CEC 8-102).
func TestFeederDrop(t *testing.T) {
	for _, e := range tables.Editions() {
		r := fed(t, longFeeder(e, "60", "60"))
		pf := motor.Factor("0.85").Figure("power factor")
		want, err := r.Feeder.Wiring.RunningDrop(e, r.Conductors, conductor.LineLoad{Volts: 460, Phases: 3, Current: motor.Amps("55.6").Figure("sum"), PowerFactor: pf})
		require.NoError(t, err)
		assert.Equal(t, want.String(), r.Drop.Running.String())
		require.Len(t, r.TotalDrop, 3)
		over := false
		for i, total := range r.TotalDrop {
			sum := r.Drop.Running.Value().Add(r.Circuits[i].Drop.Running.Value())
			assert.True(t, sum.Equal(total.Value()), "%v", total)
			five := total.Float() > 5
			over = over || five
			assert.Equal(t, five, told(r.Cautions, "circuit of "+r.Circuits[i].Circuit.Tag+" together drop"))
		}
		assert.False(t, over, "60 m and 60 m are well within 5 percent")
		assert.True(t, told(r.Cautions, "typical power factor of 0.85"))

		far := fed(t, longFeeder(e, "150", "150"))
		assert.Greater(t, far.TotalDrop[0].Float(), 5.0)
		assert.True(t, told(far.Cautions, "circuit of 25 together drop "+far.TotalDrop[0].String()))
		ref := "215.2, informational note"
		if e.Code() == tables.CEC {
			ref = "Rule 8-102"
		}
		assert.Equal(t, ref, far.TotalDrop[0].Citation().Ref)
	}
}

// Without a length of the feeder there is no drop; without one of a branch
// circuit no total for it.
func TestFeederDropAbsent(t *testing.T) {
	f := longFeeder(tables.NEC2023, "60", "60")
	f.Circuits[1].Circuit.Wiring.Length = tables.Length{}
	r := fed(t, f)
	assert.Equal(t, []bool{false, true, false}, []bool{r.TotalDrop[0].IsZero(), r.TotalDrop[1].IsZero(), r.TotalDrop[2].IsZero()})
	f.Wiring.Length = tables.Length{}
	r = fed(t, f)
	assert.Equal(t, motorcircuit.VoltageDrop{}, r.Drop)
	assert.Empty(t, r.TotalDrop)
}

// MaxDrop enlarges the feeder and its bonding conductor.
func TestFeederMaxDrop(t *testing.T) {
	for _, e := range tables.Editions() {
		f := longFeeder(e, "200", "5")
		before := fed(t, f)
		f.MaxDrop = motor.Factor("2")
		after := fed(t, f)
		assert.Greater(t, before.Drop.Running.Float(), 2.0)
		assert.LessOrEqual(t, after.Drop.Running.Float(), 2.0)
		assert.Contains(t, after.Conductors.Smaller.Why, "voltage drop running is")
		assert.LessOrEqual(t, after.Bonding.Size.Cmp(after.Conductors.Size), 0)
		if e.Code() == tables.NEC {
			assert.Positive(t, after.Bonding.Size.Cmp(before.Bonding.Size), "250.122(B)")
		}
		f.MaxDrop = tables.Ratio{}
		f.Wiring.Least = after.Conductors.Size.Smaller()
		assert.Greater(t, fed(t, f).Drop.Running.Float(), 2.0, "the next smaller size does not keep it")
	}
}

// The feeder takes its own run and device; its circuits have their own.
func TestFeederQuantities(t *testing.T) {
	for _, e := range tables.Editions() {
		r := fed(t, longFeeder(e, "60", "5"))
		assert.Equal(t, map[string]string{"conductor": "184.5", "bonding_conductor": "61.5", "raceway": "60", "device": "1", "disconnect": "1"}, amounts(r.Quantities()))
		assert.Equal(t, 4, r.Raceway.Conductors)
		assert.LessOrEqual(t, r.Raceway.Area.Cmp(r.Raceway.Limit), 0)
		bare := longFeeder(e, "60", "5")
		bare.Wiring.Length = tables.Length{}
		assert.Equal(t, map[string]string{"device": "1", "disconnect": "1"}, amounts(fed(t, bare).Quantities()))
	}
}

// Every figure of the feeder is cited, with its run.
func TestFeederFiguresAreCited(t *testing.T) {
	for _, e := range tables.Editions() {
		f := longFeeder(e, "60", "60")
		f.MaxDrop = motor.Factor("2.5")
		f.Continuous = motor.Amps("10")
		count := 0
		for fig := range fed(t, f).Figures() {
			count++
			if ref := fig.Citation().Ref; fig.Op() != tables.Given && ref != "sum of the currents that run together" {
				requireCited(t, e, motorcircuit.DropSection, fig)
			}
		}
		assert.Greater(t, count, 10)
	}
}
