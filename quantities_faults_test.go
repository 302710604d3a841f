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

// totals sums quantities by kind.
func totals(list []motorcircuit.Quantity) map[string]string {
	sums := map[string]decimal.Decimal{}
	for _, q := range list {
		sums[q.Kind] = sums[q.Kind].Add(q.Amount)
	}
	texts := map[string]string{}
	for kind, sum := range sums {
		texts[kind] = sum.String()
	}
	return texts
}

// Two circuits of 40 m in one raceway: 40 m of raceway and 41.5 m of bonding
// conductor once, (40 + 1.5) × 3 × 2 of conductor.
func TestSharedQuantities(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("10"), Voltage: 460}}
	c.Wiring.Length = conductor.Metres("40")
	s, err := motorcircuit.SizeShared(conductor.EMT, []motorcircuit.Circuit{c, c})
	require.NoError(t, err)
	got := totals(s.Quantities())
	assert.Equal(t, "40", got["raceway"])
	assert.Equal(t, "41.5", got["bonding_conductor"])
	assert.Equal(t, "249", got["conductor"])
	assert.Equal(t, "2", got["device"])
}

// A feeder has the lines that its single-phase motors name, and a neutral where
// one is connected to it: NFPA 70 310.15(E), CSA C22.1 Rule 4-004, on what counts.
func TestFeederConductorsFollowTheLines(t *testing.T) {
	for _, e := range everyone {
		for _, tt := range []struct {
			name     string
			circuits []motorcircuit.FeederCircuit
			want     int
		}{
			{"two lines", list{single("a", "2", 230, "AB"), single("b", "2", 230, "AB")}, 2},
			{"three lines", list{single("a", "2", 230, "AB"), single("b", "2", 230, "BC"), single("c", "2", 230, "CA")}, 3},
			{"lines not named", list{single("a", "2", 230, "")}, 2},
			{"three phases", list{cage("a", "10", 208)}, 3},
			{"three phases and neutral", list{cage("a", "10", 208), single("b", "1/2", 115, "A")}, 4},
			{"one line and neutral", list{single("b", "1/2", 115, "A")}, 2},
		} {
			f := feeder(e, tt.circuits...)
			f.Wiring.Length, f.Wiring.Raceway = conductor.Metres("40"), conductor.EMT
			r := sized(t, f)
			assert.Equal(t, tt.want, r.Count, "%v %s", e, tt.name)
			assert.Equal(t, tt.want+1, r.Raceway.Conductors, "%v %s", e, tt.name)
			want := decimal.RequireFromString("41.5").Mul(decimal.New(int64(tt.want*r.Conductors.Sets), 0))
			assert.Equal(t, want.String(), totals(r.Quantities())["conductor"], "%v %s", e, tt.name)
			assert.Equal(t, "1", totals(r.Quantities())["disconnect"])
		}
	}
}

// Fuses come in sets, and a length of nothing is no length.
func TestFusesInSetsAndLengthAboveZero(t *testing.T) {
	c := pumpRun(tables.NEC2023)
	c.Device = tables.TimeDelayFuse
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	for _, q := range r.Quantities() {
		if q.Kind == "device" {
			assert.Equal(t, "set", q.Unit)
		}
	}
	c.Wiring.Length = conductor.Metres("0")
	_, err = motorcircuit.Size(c)
	assert.ErrorContains(t, err, "wiring.length")
}
