package motorcircuit_test

import (
	"fmt"
	"testing"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// motorControlCenter is a feeder of 30 motors with two interlocks, duty-cycle
// motors, drives and other loads.
func motorControlCenter(e tables.Edition) motorcircuit.Feeder {
	f := feeder(e)
	f.Device, f.Continuous, f.Other = protection.InverseTimeBreaker, motor.Amps("20"), motor.Amps("10")
	for i := range 30 {
		fc := cage(fmt.Sprint("M-", i+1), ladder[3+i%16], 460, behind(protection.InverseTimeBreaker))
		switch {
		case i < 4:
			fc.Interlock, fc.Alternative = []string{"x", "y"}[i%2], fmt.Sprint(i)
		case i%7 == 0:
			duty(motor.Intermittent, 15)(&fc)
		case i%5 == 0:
			onDrive("30", "")(&fc)
		}
		fc.Circuit.Edition = e
		f.Circuits = append(f.Circuits, fc)
	}
	return f
}

func BenchmarkSizeFeeder(b *testing.B) {
	b.Run("30 motors", func(b *testing.B) {
		b.ReportAllocs()
		f := motorControlCenter(tables.NEC2023)
		for b.Loop() {
			if _, err := motorcircuit.SizeFeeder(f); err != nil {
				b.Fatal(err)
			}
		}
	})
	b.Run("30 motors, printed", func(b *testing.B) {
		b.ReportAllocs()
		f := motorControlCenter(tables.CEC2024)
		for b.Loop() {
			r, err := motorcircuit.SizeFeeder(f)
			if err != nil || r.String() == "" {
				b.Fatal(err)
			}
		}
	})
	b.Run("1000 feeders of 3 to 12 motors", func(b *testing.B) {
		list := make([]motorcircuit.Feeder, 1000)
		for i := range list {
			f := motorControlCenter(everyone[i%len(everyone)])
			f.Circuits = f.Circuits[i%15 : i%15+3+i%10]
			list[i] = f
		}
		b.ReportAllocs()
		for b.Loop() {
			for _, f := range list {
				if _, err := motorcircuit.SizeFeeder(f); err != nil {
					b.Fatal(err)
				}
			}
		}
		b.ReportMetric(float64(b.N)*float64(len(list))/b.Elapsed().Seconds(), "feeders/s")
	})
}

// TestFeederAllocations holds what repeats exactly from run to run: a feeder
// allocates little beside its circuits.
func TestFeederAllocations(t *testing.T) {
	f := motorControlCenter(tables.NEC2023)
	circuits := testing.AllocsPerRun(20, func() {
		for _, fc := range f.Circuits {
			if _, err := motorcircuit.Size(fc.Circuit); err != nil {
				t.Fatal(err)
			}
		}
	})
	whole := testing.AllocsPerRun(20, func() {
		if _, err := motorcircuit.SizeFeeder(f); err != nil {
			t.Fatal(err)
		}
	})
	if per := (whole - circuits) / 30; per > 40 {
		t.Errorf("%.1f allocations for each motor beside those of its circuit, want at most 40", per)
	}
}
