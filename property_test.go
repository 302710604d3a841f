package motorcircuit_test

import (
	"errors"
	"fmt"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

var ladder = []string{"1/6", "1/4", "1/3", "1/2", "3/4", "1", "1-1/2", "2", "3", "5", "7-1/2", "10", "15", "20", "25", "30", "40",
	"50", "60", "75", "100", "125", "150", "200", "250", "300", "350", "400", "450", "500"}

var devices = []tables.Device{protection.NonTimeDelayFuse, protection.TimeDelayFuse, protection.InverseTimeBreaker, protection.InstantaneousBreaker}

// grid sizes every motor that the tables print, rising in power within a row:
// edition, kind, voltage, device, duty, material and ambient are the row.
func grid(t *testing.T, visit func(row motorcircuit.Circuit, results []motorcircuit.Result)) {
	t.Helper()
	kinds := []struct {
		kind   motor.Kind
		phases int
		volts  []int
	}{
		{motor.SquirrelCage, 3, []int{115, 200, 208, 230, 460, 575}}, {motor.SquirrelCage, 2, []int{115, 230, 460, 575}},
		{motor.SinglePhase, 1, []int{115, 200, 208, 230}}, {motor.WoundRotor, 3, []int{230, 575}},
		{motor.Synchronous, 3, []int{230, 460}}, {motor.DirectCurrent, 0, []int{120, 240, 500}},
	}
	duties := []motor.Duty{{}, {Kind: motor.Intermittent, Minutes: 15}, {Kind: motor.Varying}}
	for _, e := range tables.Editions() {
		for _, k := range kinds {
			for _, volts := range k.volts {
				for i, device := range devices {
					for _, duty := range duties {
						for _, ambient := range []string{"30", "46"} {
							row := motorcircuit.Circuit{Edition: e, Device: device,
								Motor: motor.Motor{Kind: k.kind, Phases: k.phases, Voltage: volts, Duty: duty, Nameplate: motor.Nameplate{}}}
							row.Wiring.Ambient, row.Wiring.Termination = motor.Celsius(ambient), 75
							row.Wiring.Material = tables.Material(i % 2)
							var results []motorcircuit.Result
							for _, hp := range ladder {
								row.Motor.Power = motor.HP(hp)
								r, err := motorcircuit.Size(row)
								var none *tables.NotTabulatedError
								if err != nil {
									require.True(t, errors.As(err, &none), "%+v: %v", row, err)
									continue
								}
								results = append(results, r)
							}
							if k.phases != 2 || e.Code() == tables.NEC {
								require.NotEmpty(t, results, "%+v", row)
							}
							visit(row, results)
						}
					}
				}
			}
		}
	}
}

// notSmaller compares conductors: more sets count as larger, since a set more
// may make each conductor smaller than by its share.
func notSmaller(a, b conductor.Selection) bool {
	return a.Sets > b.Sets || a.Sets == b.Sets && a.Size.Cmp(b.Size) >= 0
}

func TestProperties(t *testing.T) {
	count := 0
	cooler := map[string]conductor.Selection{}
	grid(t, func(row motorcircuit.Circuit, results []motorcircuit.Result) {
		for i, r := range results {
			count++
			carriesLoad(t, r)
			standardRating(t, r)
			if i > 0 { // more power never gets a smaller conductor
				require.True(t, notSmaller(r.Branch, results[i-1].Branch), "%v below %v", r, results[i-1])
				require.GreaterOrEqual(t, r.Demand.Branch.Cmp(results[i-1].Demand.Branch), 0)
				if r.ShortCircuit.Device != protection.InstantaneousBreaker { // whose percent falls over 50 hp dc, CEC Rule 28-210
					require.GreaterOrEqual(t, r.ShortCircuit.Limit.Cmp(results[i-1].ShortCircuit.Limit), 0)
				}
			}
			// Hotter never gets a smaller one: the cool row of a pair comes first.
			same := r.Circuit
			same.Wiring.Ambient = tables.Temperature{}
			key := fmt.Sprint(same)
			if cool, ok := cooler[key]; ok {
				require.True(t, notSmaller(r.Branch, cool), "%v", r)
			} else {
				cooler[key] = r.Branch
			}
		}
	})
	assert.Greater(t, count, 20_000, "circuits in the grid")
}

// carriesLoad holds that the chosen size carries the load and the next smaller
// one does not, or is not allowed.
func carriesLoad(t *testing.T, r motorcircuit.Result) {
	t.Helper()
	s := r.Branch
	require.GreaterOrEqual(t, s.Ampacity.Cmp(s.Required), 0, "%v", r)
	require.NotZero(t, s.Smaller.Size, "%v", r)
	if s.Smaller.Ampacity.IsZero() {
		require.False(t, s.Smaller.Cite.IsZero(), "%v", r)
	} else {
		require.Negative(t, s.Smaller.Ampacity.Cmp(s.Required), "%v", r)
	}
}

// standardRating holds that the NEC rating is at or the first above the limit,
// the CEC one at or the last below it (or 15 A), and that the higher ceiling
// never gives less.
func standardRating(t *testing.T, r motorcircuit.Result) {
	t.Helper()
	x := r.ShortCircuit
	if x.Device == protection.InstantaneousBreaker {
		require.True(t, x.Rating.IsZero())
		return
	}
	var want tables.Figure
	for _, rating := range r.Circuit.Edition.StandardRatings(x.Device) {
		switch nec := r.Circuit.Edition.Code() == tables.NEC; {
		case nec && want.IsZero() && rating.Cmp(x.Limit) >= 0:
			want = rating
		case !nec && (rating.Cmp(x.Limit) <= 0 || want.IsZero()):
			want = rating
		}
	}
	require.Zero(t, want.Cmp(x.Rating), "%v", r)
	require.GreaterOrEqual(t, x.StartRating.Cmp(x.Rating), 0, "%v", r)
	require.True(t, x.StartRating.Cmp(x.StartLimit) <= 0 || x.StartRating.Cmp(x.Rating) == 0, "%v", r)
}

// TestOrderDoesNotMatter sizes a list of motors in two orders.
func TestOrderDoesNotMatter(t *testing.T) {
	var list []motorcircuit.Circuit
	for _, hp := range ladder[3:] {
		c := conveyor()
		c.Motor.Power, c.Motor.Nameplate = motor.HP(hp), motor.Nameplate{}
		list = append(list, c)
	}
	first := make(map[string]string)
	for _, c := range list {
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		first[c.Motor.Power.String()] = r.String()
	}
	rand.New(rand.NewPCG(3, 4)).Shuffle(len(list), func(i, j int) { list[i], list[j] = list[j], list[i] })
	for _, c := range list {
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		assert.Equal(t, first[c.Motor.Power.String()], r.String())
	}
}
