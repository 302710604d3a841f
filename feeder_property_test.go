package motorcircuit_test

import (
	"fmt"
	"math/rand/v2"
	"slices"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// randomCircuit is a motor of a 480 V system, with whatever a circuit of a feeder
// may say of it.
func randomCircuit(rng *rand.Rand, e tables.Edition, tag string) motorcircuit.FeederCircuit {
	powers := ladder[10:24] // 7-1/2 to 200 hp: below that a fuse may be less than the smallest breaker
	fc := cage(tag, powers[rng.IntN(len(powers))], 460)
	fc.Circuit.Edition, fc.Circuit.Device = e, devices[rng.IntN(len(devices))]
	fc.Circuit.Wiring.Termination = 75
	m := &fc.Circuit.Motor
	switch rng.IntN(8) {
	case 0:
		m.Kind = motor.WoundRotor
	case 1:
		m.Nameplate.Amperes, m.Nameplate.HighTorque = motor.Amps(fmt.Sprintf("%d.%d", 9+rng.IntN(200), rng.IntN(10))), true
	case 2:
		fc.Circuit = compressor(tag, fmt.Sprint(9+rng.IntN(100)), "").Circuit
		fc.Circuit.Edition, fc.Circuit.Device, fc.Circuit.Wiring.Termination = e, devices[rng.IntN(3)], 75
	case 3:
		onDrive(fmt.Sprint(5+rng.IntN(100)), "")(&fc)
		m.Bypass = rng.IntN(2) == 0
	case 4:
		m.Starting = []motor.Starting{motor.Autotransformer, motor.WyeDelta, motor.PartWinding, motor.SoftStarter}[rng.IntN(4)]
	}
	if k := fc.Circuit.Motor.Kind; fc.Circuit.Motor.Starting != motor.Drive && k != motor.Hermetic && rng.IntN(3) == 0 {
		fc.Circuit.Motor.Duty = motor.Duty{Kind: motor.Intermittent + tables.Duty(rng.IntN(3)), Minutes: []int{5, 15, 30, 60, 0}[rng.IntN(5)]}
	}
	if rng.IntN(4) == 0 {
		fc.Interlock, fc.Alternative = []string{"x", "y"}[rng.IntN(2)], []string{"", "1", "2"}[rng.IntN(3)]
	}
	if rng.IntN(5) == 0 {
		fc.StartsWith = "s"
	}
	fc.HardStart = rng.IntN(6) == 0
	return fc
}

func randomFeeder(rng *rand.Rand, e tables.Edition, n int) motorcircuit.Feeder {
	f := motorcircuit.Feeder{Edition: e, Device: devices[rng.IntN(3)]}
	f.Wiring.Termination = 75
	for i := range n {
		f.Circuits = append(f.Circuits, randomCircuit(rng, e, fmt.Sprint("m", i)))
	}
	if rng.IntN(3) == 0 {
		f.Continuous, f.Other = motor.Amps(fmt.Sprint(rng.IntN(50))), motor.Amps(fmt.Sprint(rng.IntN(50)))
	}
	return f
}

// The order of the motors does not matter: the whole result is the same but for
// the order of the circuits.
func TestFeederOrderDoesNotMatter(t *testing.T) {
	rng := rand.New(rand.NewPCG(11, 12))
	for range 300 {
		f := randomFeeder(rng, everyone[rng.IntN(len(everyone))], 2+rng.IntN(8))
		first := sized(t, f)
		f.Circuits = slices.Clone(f.Circuits)
		rng.Shuffle(len(f.Circuits), func(i, j int) { f.Circuits[i], f.Circuits[j] = f.Circuits[j], f.Circuits[i] })
		second := sized(t, f)
		for i, one := range second.Circuits {
			require.Equal(t, f.Circuits[i].Circuit.Tag, one.Circuit.Tag, "circuits stand in the order given")
		}
		require.Equal(t, first.String(), second.String())
		first.Feeder, first.Circuits, second.Feeder, second.Circuits = motorcircuit.Feeder{}, nil, motorcircuit.Feeder{}, nil
		require.Equal(t, first, second)
	}
}

// One motor more never makes ampacity, conductors, device limit or rating, or
// disconnecting means smaller. The terminals are marked: where they are not, the
// codes' own step from 60 to 75 °C at 100 A makes conductors smaller.
func TestFeederGrows(t *testing.T) {
	rng := rand.New(rand.NewPCG(13, 14))
	for range 150 {
		e := everyone[rng.IntN(len(everyone))]
		f := randomFeeder(rng, e, 1)
		last := sized(t, f)
		for n := range 8 {
			f.Circuits = append(slices.Clone(f.Circuits), randomCircuit(rng, e, fmt.Sprint("more", n)))
			next := sized(t, f)
			require.GreaterOrEqual(t, next.Ampacity.Cmp(last.Ampacity), 0, "%v\n%v", last, next)
			require.GreaterOrEqual(t, next.Limit.Cmp(last.Limit), 0, "%v\n%v", last, next)
			require.GreaterOrEqual(t, next.Rating.Cmp(last.Rating), 0, "%v\n%v", last, next)
			require.GreaterOrEqual(t, next.Disconnect.Amperes.Cmp(last.Disconnect.Amperes), 0, "%v\n%v", last, next)
			require.True(t, notSmaller(next.Conductors, last.Conductors), "%v\n%v", last, next)
			last = next
		}
	}
}

// The feeder of one motor is that motor's branch circuit: the same least ampacity
// and conductors and, where the device has a rating, one not above the motor's.
func TestFeederOfOneMotor(t *testing.T) {
	rng := rand.New(rand.NewPCG(15, 16))
	for range 400 {
		f := randomFeeder(rng, everyone[rng.IntN(len(everyone))], 1)
		f.Continuous, f.Other = tables.Current{}, tables.Current{}
		r := sized(t, f)
		one := r.Circuits[0]
		require.Zero(t, r.Ampacity.Cmp(one.Demand.Branch), "%v\n%v", one, r)
		require.Equal(t, one.Branch.Size, r.Conductors.Size)
		require.Equal(t, one.Branch.Sets, r.Conductors.Sets)
		require.Zero(t, one.Branch.Ampacity.Cmp(r.Conductors.Ampacity))
		if f.Device == one.ShortCircuit.Device && one.ShortCircuit.Device != protection.InstantaneousBreaker {
			want := one.ShortCircuit.Rating
			if f.Circuits[0].HardStart {
				want = one.ShortCircuit.StartRating
			}
			require.Zero(t, want.Cmp(r.Rating), "%v\n%v", one, r)
		}
	}
}

// A plain walk over every set of motors that can run together referees the sums:
// for each motor that runs, its current or the ampacity for its duty, and the
// raise of the one that the rule names.
func TestFeederReferee(t *testing.T) {
	rng := rand.New(rand.NewPCG(17, 18))
	compared := 0
	for range 300 {
		e := everyone[rng.IntN(len(everyone))]
		f := randomFeeder(rng, e, 2+rng.IntN(6))
		f.Continuous, f.Other = tables.Current{}, tables.Current{}
		r := sized(t, f)
		best := 0.0
		for mask := 1; mask < 1<<len(f.Circuits); mask++ {
			if sum := plainSum(r, mask); sum > best && together(f, mask) {
				best = sum
			}
		}
		got, _ := r.Ampacity.Value().Float64()
		assert.InDelta(t, best, got, 1e-6, "%v", r)
		compared++
	}
	assert.Equal(t, 300, compared)
}

// together reports a set of motors that its interlocks let run together.
func together(f motorcircuit.Feeder, mask int) bool {
	alternative := map[string]string{}
	for i, fc := range f.Circuits {
		if mask&(1<<i) == 0 || fc.Interlock == "" {
			continue
		}
		name := fc.Alternative
		if name == "" {
			name = fmt.Sprint("alone ", i)
		}
		if other, ok := alternative[fc.Interlock]; ok && other != name {
			return false
		}
		alternative[fc.Interlock] = name
	}
	return true
}

// plainSum is the sum for the motors of the set, in float64.
func plainSum(r motorcircuit.FeederResult, mask int) (sum float64) {
	nec := r.Feeder.Edition.Code() == tables.NEC
	var largest, largestBase, largestSteady float64
	for i, one := range r.Circuits {
		if mask&(1<<i) == 0 {
			continue
		}
		d, m := one.Demand, one.Circuit.Motor
		current, _ := d.Design.Value().Float64()
		if m.Starting == motor.Drive {
			input, _ := d.Input.Value().Float64()
			if current < input || !m.Bypass {
				current = input
			}
		}
		base := current
		steady := m.Duty.Kind == motor.Continuous
		if !steady {
			base, _ = d.Branch.Value().Float64()
		}
		sum += base
		if steady {
			largestSteady = max(largestSteady, current)
		}
		if current > largest || current == largest && base > largestBase {
			largest, largestBase = current, base
		}
	}
	if !nec || largestBase < 1.25*largestSteady-1e-9 { // a steady largest is below its own 125 percent
		sum += 0.25 * largestSteady
	}
	return sum
}
