package motorcircuit_test

import (
	"math"
	"testing"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The baseline does the same job for the same motor in straight-line float64
// over bare slices: no types, no citations, no reasons, no checks of input.
var (
	floatHP       = []float64{0.5, 0.75, 1, 1.5, 2, 3, 5, 7.5, 10, 15, 20, 25, 30, 40, 50}
	floatFLC      = []float64{1.1, 1.6, 2.1, 3, 3.4, 4.8, 7.6, 11, 14, 21, 27, 34, 40, 52, 65}
	floatRotor    = []float64{10, 12.5, 15, 20, 25, 32, 46, 63.5, 81, 116, 145, 183, 218, 290, 363}
	floatSize     = []string{"14", "12", "10", "8", "6", "4", "3", "2", "1", "1/0", "2/0"}
	float60       = []float64{15, 20, 30, 40, 55, 70, 85, 95, 110, 125, 145}
	float90       = []float64{25, 30, 40, 55, 75, 95, 115, 130, 145, 170, 195}
	floatRatings  = []float64{10, 15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 90, 100, 110, 125, 150}
	floatAmbient  = []float64{1.15, 1.12, 1.08, 1.04, 1, 0.96, 0.91, 0.87}
	floatTop      = []float64{10, 15, 20, 25, 30, 35, 40, 45}
	floatCountTop = []int{3, 6, 9, 20, 30, 40}
	floatCount    = []float64{1, 0.8, 0.7, 0.5, 0.45, 0.4}
)

type floatResult struct {
	flc, ampacity, low, high, overload, start, limit, rating, startLimit, startRating, disconnect, rotor, usable float64
	size                                                                                                         string
}

func floatSizing(hp, volts, nameplate, service, ambient float64, count int) (r floatResult) {
	for i, p := range floatHP {
		if p == hp {
			r.flc, r.rotor = floatFLC[i], floatRotor[i]
		}
	}
	r.ampacity = 1.25 * r.flc
	r.low, r.high = 6.3*hp*1000/(volts*math.Sqrt(3)), 7.09*hp*1000/(volts*math.Sqrt(3))
	air, together := 1.0, 1.0
	for i, top := range floatTop {
		if ambient <= top {
			air = floatAmbient[i]
			break
		}
	}
	for i, top := range floatCountTop {
		if count <= top {
			together = floatCount[i]
			break
		}
	}
	for i, size := range floatSize {
		if r.usable = math.Min(float90[i]*air*together, float60[i]); r.usable >= r.ampacity {
			r.size = size
			break
		}
	}
	r.overload, r.start = nameplate*1.15, nameplate*1.3
	if service >= 1.15 {
		r.overload, r.start = nameplate*1.25, nameplate*1.4
	}
	r.limit, r.startLimit = r.flc*2.5, r.flc*4
	for _, rating := range floatRatings {
		if r.rating == 0 && rating >= r.limit {
			r.rating = rating
		}
		if rating <= r.startLimit {
			r.startRating = rating
		}
	}
	r.disconnect = r.flc * 1.15
	return r
}

var floatSink floatResult

func BenchmarkSize(b *testing.B) {
	b.Run("float64 baseline", func(b *testing.B) {
		b.ReportAllocs()
		for b.Loop() {
			floatSink = floatSizing(7.5, 460, 10.4, 1.15, 40, 6)
		}
	})
	b.Run("one motor", func(b *testing.B) {
		b.ReportAllocs()
		c := conveyor()
		for b.Loop() {
			if _, err := motorcircuit.Size(c); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("one motor, printed", func(b *testing.B) {
		b.ReportAllocs()
		c := conveyor()
		for b.Loop() {
			r, err := motorcircuit.Size(c)
			if err != nil || r.String() == "" {
				b.Fatal(err)
			}
		}
	})
}

// BenchmarkSizeWhole has bonding, raceway, voltage drop that enlarges the
// conductors, and fault duty in it.
func BenchmarkSizeWhole(b *testing.B) {
	b.ReportAllocs()
	c := whole()
	for b.Loop() {
		if _, err := motorcircuit.Size(c); err != nil {
			b.Fatal(err)
		}
	}
}

// whole is a circuit with all that a run brings.
func whole() motorcircuit.Circuit {
	c := conveyor()
	c.Wiring.Length, c.Wiring.Raceway = conductor.Feet("300"), tables.EMT
	c.MaxDrop, c.Fault, c.FaultXR = motor.Factor("2"), motor.Amps("10000"), motor.Factor("4")
	return c
}

// mixed is a batch of motors of every kind under both codes.
func mixed(n int) []motorcircuit.Circuit {
	list := make([]motorcircuit.Circuit, n)
	editions := tables.Editions()
	for i := range list {
		c := motorcircuit.Circuit{Edition: editions[i%len(editions)], Device: devices[i%3]}
		c.Motor = motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(ladder[3+i%18]), Voltage: 460}
		switch i % 7 {
		case 1:
			c.Motor.Kind, c.Motor.Power, c.Motor.Voltage = motor.SinglePhase, motor.HP(ladder[i%12]), 230
		case 2:
			c.Motor.Kind, c.Motor.Voltage = motor.WoundRotor, 575
		case 3:
			c.Motor.Kind, c.Motor.Power = motor.Synchronous, motor.HP(ladder[14+i%8])
		case 4:
			c.Motor.Kind, c.Motor.Power, c.Motor.Voltage = motor.DirectCurrent, motor.HP(ladder[3+i%12]), 240
		case 5:
			c.Motor.Duty = motor.Duty{Kind: motor.Intermittent, Minutes: 15}
			c.Wiring.Ambient = motor.Celsius("45")
		}
		list[i] = c
	}
	return list
}

func BenchmarkBatch(b *testing.B) {
	list := mixed(100_000)
	b.ReportAllocs()
	for b.Loop() {
		for _, c := range list {
			if _, err := motorcircuit.Size(c); err != nil {
				b.Fatalf("%v: %v", c, err)
			}
		}
	}
	b.ReportMetric(float64(b.N)*float64(len(list))/b.Elapsed().Seconds(), "motors/s")
}

// TestAllocations holds what repeats exactly from run to run.
func TestAllocations(t *testing.T) {
	c := conveyor()
	c.Wiring.Conductors = 0
	c.Motor.Nameplate.CodeLetter = ""
	got := testing.AllocsPerRun(100, func() {
		if _, err := motorcircuit.Size(c); err != nil {
			t.Fatal(err)
		}
	})
	if got > 100 {
		t.Errorf("%v allocations for one motor, want at most 100", got)
	}
}
