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

// Two motors in one raceway: six current-carrying conductors, 80 percent for
// each circuit (NEC 310.15(C)(1), CEC Table 5C), one bonding conductor by the
// largest device (NEC 250.122(C)), and the fill of all seven.
func TestSizeShared(t *testing.T) {
	for _, e := range tables.Editions() {
		a, b := longRun(e, "30"), longRun(e, "30")
		a.Tag, b.Tag, b.Motor.Power = "A", "B", motor.HP("10")
		s, err := motorcircuit.SizeShared(tables.RMC, []motorcircuit.Circuit{a, b})
		require.NoError(t, err)
		assert.Equal(t, 6, s.Count)
		require.Len(t, s.Circuits, 2)
		var pulls []conductor.Pull
		for i, c := range []motorcircuit.Circuit{a, b} {
			c.Wiring.Conductors, c.Wiring.Raceway, c.Wiring.Sets = 6, tables.RMC, 1
			alone := circuitOf(t, c)
			assert.Equal(t, alone.Branch, s.Circuits[i].Branch)
			share, _ := s.Circuits[i].Branch.Together.Value().Float64()
			if e.Code() == tables.NEC {
				share /= 100
			}
			assert.InDelta(t, 0.8, share, 1e-9)
			pulls = append(pulls, conductor.Pull{Insulation: alone.Branch.Insulation, Size: alone.Branch.Size, Count: 3})
			assert.GreaterOrEqual(t, s.Bonding.Size.Cmp(alone.Bonding.Size), 0)
		}
		assert.Equal(t, s.Circuits[0].Bonding, s.Bonding, "by the 25 hp motor's device")
		pulls = append(pulls, conductor.Pull{Insulation: pulls[0].Insulation, Size: s.Bonding.Size, Count: 1})
		want, err := conductor.SelectRaceway(e, tables.RMC, false, pulls...)
		require.NoError(t, err)
		assert.Equal(t, want.Name(e), s.Raceway.Name(e))
		assert.Equal(t, want.Area.String(), s.Raceway.Area.String())
		assert.Equal(t, 7, s.Raceway.Conductors)
		assert.True(t, told(s.Cautions, "one bonding conductor serves all circuits"))
		assert.True(t, told(s.Cautions[len(s.Cautions)-1:], "authority having jurisdiction"))
	}
}

// The answer does not depend on the order, and more circuits never take a
// smaller raceway.
func TestSizeSharedProperties(t *testing.T) {
	for _, e := range tables.Editions() {
		var circuits []motorcircuit.Circuit
		before := 0
		for _, hp := range []string{"10", "25", "5", "15"} {
			c := longRun(e, "10")
			c.Motor.Power = motor.HP(hp)
			circuits = append(circuits, c)
			if len(circuits) < 2 {
				continue
			}
			s, err := motorcircuit.SizeShared(tables.EMT, circuits)
			require.NoError(t, err)
			assert.Equal(t, 3*len(circuits), s.Count)
			assert.GreaterOrEqual(t, s.Raceway.Metric, before)
			before = s.Raceway.Metric
			turned := append([]motorcircuit.Circuit{circuits[len(circuits)-1]}, circuits[:len(circuits)-1]...)
			again, err := motorcircuit.SizeShared(tables.EMT, turned)
			require.NoError(t, err)
			assert.Equal(t, s.Raceway.Name(e), again.Raceway.Name(e))
			assert.Equal(t, s.Bonding.Size, again.Bonding.Size)
		}
	}
}

func TestSizeSharedRefusals(t *testing.T) {
	a, b := longRun(tables.NEC2023, "30"), longRun(tables.NEC2020, "30")
	b.Tag = "B"
	s, err := motorcircuit.SizeShared(tables.EMT, []motorcircuit.Circuit{a, b})
	var circuit *motorcircuit.CircuitError
	require.ErrorAs(t, err, &circuit)
	assert.Equal(t, motorcircuit.SharedResult{}, s)
	assert.Equal(t, []any{1, "B"}, []any{circuit.Index, circuit.Tag})
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
	assert.Equal(t, "edition", input.Field)

	for _, few := range [][]motorcircuit.Circuit{nil, {a}} {
		_, err = motorcircuit.SizeShared(tables.EMT, few)
		require.ErrorAs(t, err, &input)
		assert.Equal(t, "circuits", input.Field)
	}

	bad := a
	bad.Motor.Voltage = 1
	_, err = motorcircuit.SizeShared(tables.EMT, []motorcircuit.Circuit{a, bad})
	require.ErrorAs(t, err, &circuit)
	assert.Equal(t, 1, circuit.Index)

	a.Motor.Power = motor.HP("200") // 300 A at 80 percent and 50 percent of twelve
	var many []motorcircuit.Circuit
	for range 6 {
		many = append(many, a)
	}
	_, err = motorcircuit.SizeShared(tables.FMC, many)
	var none *tables.NoSizeError
	require.ErrorAs(t, err, &none)
}
