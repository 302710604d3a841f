package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A demand factor reduces the motors, not other loads: NEC 430.26, CEC Rule
// 28-108(3). Under the CEC the device then goes by the conductors, with the step
// up of Table 13 (28-204(4)).
func TestFeederDemand(t *testing.T) {
	for _, e := range everyone {
		f := feeder(e, drawing("a", "40"), drawing("b", "20"))
		f.Demand, f.Other = motor.Factor("0.8"), motor.Amps("5")
		r := sized(t, f)
		assert.Equal(t, "61 A", r.Ampacity.String(), "(50 + 20) × 0.8 + 5")
		assert.Equal(t, "a 50, b 20, 5", terms(r), "terms are before the factor")
		assert.Equal(t, "6", r.Conductors.Size.Name(), "65 A at 75 °C")
		if e.Code() == tables.NEC {
			assert.Equal(t, "95 A", r.Limit.String(), "70 + 20 + 5: the factor is not for the device")
			assert.True(t, testkit.Cautioned(r.Cautions, "430.26", "demand factor"))
			continue
		}
		assert.Equal(t, "70 A", r.Limit.String(), "65 A of the conductors, next up, below 95")
		assert.Equal(t, "70 A", r.Rating.String())
		assert.Equal(t, "Rule 28-204(4)", r.Limit.Citation().Ref)
		assert.True(t, testkit.Cautioned(r.Cautions, "Rule 28-108(3)", "demand factor"))
	}
	// Where the conductors carry the limit anyway, it stands: (12.5 + 19 × 10) × 0.99
	// = 200.475 A takes 4/0 (230 A); 17.5 + 190 = 207.5 A.
	var many list
	for range 20 {
		many = append(many, drawing("m", "10"))
	}
	for _, e := range cecEditions {
		f := feeder(e, many...)
		f.Demand = motor.Factor("0.99")
		r := sized(t, f)
		assert.Equal(t, "200.475 A", r.Ampacity.String())
		assert.Equal(t, "207.5 A", r.Limit.String())
		assert.Equal(t, "200 A", r.Rating.String())
	}
	f := feeder(tables.NEC2023, drawing("a", "40"))
	f.Demand = motor.Factor("1")
	assert.Equal(t, "50 A", sized(t, f).Ampacity.String(), "a factor of 1 is allowed")
}

// A drive counts by its rated input current (NEC 430.24, from 2020 430.122(D);
// CEC common practice), with a bypass by the motor's if that is more; one that
// feeds several motors counts once.
func TestFeederDrives(t *testing.T) {
	holdSums(t, []sumCase{
		{"input", everyone, list{drawing("vfd", "40", onDrive("36", "")), drawing("b", "20")}, "65 A", "vfd", "90 A", "90 A", "vfd"},
		{"bypass", everyone, list{drawing("vfd", "40", onDrive("36", ""), bypassed), drawing("b", "20")}, "70 A", "vfd", "90 A", "90 A", "vfd"},
		{"bypass, more input", everyone, list{drawing("vfd", "40", onDrive("44", ""), bypassed), drawing("b", "20")}, "75 A", "vfd", "", "", ""},
		{"not the largest", everyone, list{drawing("vfd", "40", onDrive("36", "")), drawing("b", "60")}, "111 A", "b", "", "", ""},
		// Motors of 40 and 20 A behind one drive of 36 A: 45 + 20 of the motor beside it.
		{"drive group", everyone, list{drawing("v1", "20", onDrive("36", "D")), drawing("v2", "40", onDrive("36", "D")), drawing("b", "20")}, "65 A", "v2", "90 A", "90 A", "v2"},
		{"two drives", everyone, list{drawing("v1", "20", onDrive("36", "D")), drawing("v2", "20", onDrive("36", "E"))}, "81 A", "v1", "", "", ""},
	})
	for _, e := range everyone {
		r := sized(t, feeder(e, drawing("vfd", "40", onDrive("36", ""))))
		want := e == tables.NEC2017
		assert.Equal(t, want, testkit.Cautioned(r.Cautions, "430.24", "how a drive counts"), e)
	}
}

// Hermetic motor-compressors: the larger of rated-load and branch-circuit
// selection current, NEC 440.6, 440.7, 440.33; device NEC 440.22(A) 175 percent,
// from 2023 the next rating up; CEC Rule 28-708 half of locked-rotor current,
// which is six times rated-load current if not marked.
func TestFeederHermetics(t *testing.T) {
	holdSums(t, []sumCase{
		{"selection current", necEditions, list{compressor("ac", "38", "40"), drawing("b", "20")}, "70 A", "ac", "90 A", "90 A", "ac"},
		// 38 × 6 × 0.5 = 114, plus 20.
		{"selection current", cecEditions, list{compressor("ac", "38", "40"), drawing("b", "20")}, "70 A", "ac", "134 A", "125 A", "ac"},
		// 33 × 1.75 = 57.75: 50 A to 2020, 60 A from 2023, plus 20.
		{"round down", to2020, list{compressor("ac", "33", ""), drawing("b", "20")}, "61.25 A", "ac", "70 A", "70 A", "ac"},
		{"round up", from2023, list{compressor("ac", "33", ""), drawing("b", "20")}, "61.25 A", "ac", "80 A", "80 A", "ac"},
		{"not the largest", necEditions, list{compressor("ac", "20", ""), drawing("b", "40")}, "70 A", "b", "90 A", "90 A", "b"},
	})
}

// An instantaneous-trip breaker has no rating: it counts as the feeder's own kind
// of device, NEC 430.62(A) Exception No. 1. 40 A: 100 A as a breaker, 70 A as a
// time-delay fuse, 120 A (NEC 125) as a non-time-delay fuse.
func TestFeederInstantaneous(t *testing.T) {
	for _, e := range everyone {
		for device, want := range map[tables.Device]string{protection.InverseTimeBreaker: "120 A", protection.TimeDelayFuse: "90 A"} {
			f := feeder(e, drawing("mcp", "40", behind(protection.InstantaneousBreaker)), drawing("b", "20"))
			f.Device = device
			r := sized(t, f)
			assert.Equal(t, want, r.Limit.String(), "%v %v", e, device)
			assert.Equal(t, "mcp", r.Largest)
			rule := "430.62(A)"
			if e.Code() == tables.CEC {
				rule = "Rule 28-204(1)"
			}
			assert.True(t, testkit.Cautioned(r.Cautions, rule, "instantaneous-trip breaker"))
		}
	}
}

// A motor that will not start counts its higher ceiling: time-delay fuse 225
// percent of 40 A.
func TestFeederHardStart(t *testing.T) {
	holdSums(t, []sumCase{
		{"hard start", everyone, list{drawing("a", "40", hardStart), drawing("b", "20")}, "70 A", "a", "110 A", "110 A", "a"},
		// 20 × 2.25 = 45 is below 40 × 1.75.
		{"small one", everyone, list{drawing("a", "40"), drawing("b", "20", hardStart)}, "70 A", "a", "90 A", "90 A", "a"},
	})
	r := sized(t, feeder(tables.CEC2024, drawing("a", "40", hardStart)))
	assert.True(t, testkit.Cautioned(r.Cautions, "", "higher ceiling"))
}

// CEC Rule 28-204(2): motors that must start together count as one motor of their
// summed current, plus the rest; never above 300 percent of the feeder's ampacity.
func TestFeederStartTogether(t *testing.T) {
	pair := list{drawing("a", "40", startsWith("pair")), drawing("b", "40", startsWith("pair")), drawing("c", "20")}
	for _, e := range cecEditions {
		r := sized(t, feeder(e, pair...))
		assert.Equal(t, "130 A", r.Limit.String(), "70 + 40 + 20")
		assert.Equal(t, "160 A", r.StartLimit.String(), "80 × 1.75 + 20")
		assert.Equal(t, "150 A", r.StartRating.String())
		assert.Equal(t, "Rule 28-204(2)", r.StartLimit.Citation().Ref)

		// Non-time-delay fuses: 120 × 3 = 360 A. The motors are of intermittent duty, so
		// the feeder carries 120 × 0.85 = 102 A: 2 AWG, 115 A, three times which is 345.
		f := feeder(e)
		f.Device = protection.NonTimeDelayFuse
		for _, tag := range []string{"a", "b", "c"} {
			fc := drawing(tag, "40", duty(motor.Intermittent, 15), startsWith("all"), behind(protection.NonTimeDelayFuse))
			fc.Circuit.Edition = e
			f.Circuits = append(f.Circuits, fc)
		}
		r = sized(t, f)
		assert.Equal(t, "102 A", r.Ampacity.String())
		assert.Equal(t, "345 A", r.StartLimit.String())
		assert.Equal(t, "300 A", r.StartRating.String())

		// One motor does not start together with itself; sets are not added up.
		assert.True(t, sized(t, feeder(e, drawing("a", "40", startsWith("x")), drawing("b", "40", startsWith("y")))).StartLimit.IsZero())
		lone := feeder(e, drawing("a", "40", startsWith("x")), drawing("b", "20"))
		lone.Device = protection.NonTimeDelayFuse // by which one motor of 40 A would be let 120, not 70
		assert.True(t, sized(t, lone).StartLimit.IsZero())
		// Breakers: 60 × 3 + 20 for a motor that will not start is 80 × 2.5 already.
		breaker := behind(protection.InverseTimeBreaker)
		same := feeder(e, drawing("a", "60", startsWith("x"), hardStart, breaker), drawing("b", "20", startsWith("x"), breaker))
		same.Device = protection.InverseTimeBreaker
		assert.Equal(t, "200 A", sized(t, same).Limit.String())
		assert.True(t, sized(t, same).StartLimit.IsZero(), "nothing to raise")
		two := sized(t, feeder(e, append(list{drawing("d", "10", startsWith("few")), drawing("e", "10", startsWith("few"))}, pair...)...))
		assert.Equal(t, "180 A", two.StartLimit.String(), "80 × 1.75 + 20 + 10 + 10, above 20 × 1.75 + 100")
	}
	for _, e := range necEditions {
		assert.True(t, sized(t, feeder(e, pair...)).StartLimit.IsZero(), "the NEC has no such rule")
	}
}

// The feeder's device is never rounded up: NEC 430.62(A), CEC Rule 28-204(1).
func TestFeederDeviceIsNotRoundedUp(t *testing.T) {
	for _, e := range everyone {
		for _, tt := range []struct{ a, b, limit, rating string }{
			{"40", "30", "100 A", "100 A"}, // exactly on a standard size
			{"40", "29.99", "99.99 A", "90 A"},
			{"40", "39.9", "109.9 A", "100 A"},
		} {
			// 39.9 A and less have a branch device of 70 A or less, so a is the largest.
			r := sized(t, feeder(e, drawing("a", tt.a), drawing("b", tt.b)))
			assert.Equal(t, tt.limit, r.Limit.String())
			assert.Equal(t, tt.rating, r.Rating.String())
		}
	}
}

// One disconnecting means for a group: CEC Rule 28-602(2) 115 percent of the
// largest plus the rest, and the largest horsepower.
func TestFeederDisconnectCEC(t *testing.T) {
	for _, e := range cecEditions {
		f := feeder(e, cage("a", "30", 460), cage("b", "10", 460), drawing("c", "14"))
		f.Other = motor.Amps("5")
		r := sized(t, f)
		assert.Equal(t, "79 A", r.Disconnect.Amperes.String(), "40 × 1.15 + 14 + 14 + 5")
		assert.Equal(t, "30 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "Rule 28-602(2)", r.Disconnect.Cite.Ref)
	}
}

// NEC 430.110(C): 115 percent of all currents; the horsepower by the sums of
// full-load and of locked-rotor current, the larger.
func TestFeederDisconnectNEC(t *testing.T) {
	for _, e := range necEditions {
		// 460 V: 30 hp 40 A, 10 hp 14 A, sum 54; locked rotor 218 + 81 = 299. By
		// Tables 430.250 and 430.251(B): 50 hp (65 A) and 50 hp (363 A).
		r := sized(t, feeder(e, cage("a", "30", 460), cage("b", "10", 460)))
		assert.Equal(t, "62.1 A", r.Disconnect.Amperes.String())
		assert.Equal(t, "299 A", r.Disconnect.LockedRotor.String())
		assert.Equal(t, "50 hp", r.Disconnect.Horsepower.String())
		assert.Equal(t, "430.110(C)(2)", r.Disconnect.Amperes.Citation().Ref)
		assert.Equal(t, "430.110(C)(1)", r.Disconnect.Cite.Ref)

		// A sum beyond the tables (590 A of 500 hp is the last row) has no horsepower.
		r = sized(t, feeder(e, cage("a", "500", 460), cage("b", "10", 460)))
		assert.True(t, r.Disconnect.Horsepower.IsZero())
		assert.Equal(t, "694.6 A", r.Disconnect.Amperes.String(), "604 × 1.15")
		assert.True(t, testkit.Cautioned(r.Cautions, "430.110(C)(1)", "more than any horsepower"))
	}
}

// The bonding conductor: NEC 250.122 by the device, of full size in each set; CEC
// Rule 10-616 by each set's share; never larger than the circuit conductors.
func TestFeederBonding(t *testing.T) {
	for _, e := range everyone {
		// Rating 100 A: 8 AWG.
		r := sized(t, feeder(e, drawing("a", "40"), drawing("b", "30")))
		assert.Equal(t, "100 A", r.Rating.String())
		assert.Equal(t, "8", r.Bonding.Size.Name())
		assert.Contains(t, r.Bonding.Why, "rating of the device")

		// 14 A behind a breaker of 35 A asks for 10 AWG; the conductors are 14 AWG.
		f := feeder(e, drawing("a", "14", behind(protection.InverseTimeBreaker)))
		f.Device = protection.InverseTimeBreaker
		r = sized(t, f)
		assert.Equal(t, "35 A", r.Rating.String())
		assert.Equal(t, "14", r.Conductors.Size.Name())
		assert.Equal(t, "14", r.Bonding.Size.Name())
		assert.Contains(t, r.Bonding.Why, "need not exceed")

		// 500 A over two sets of 3/0 AWG: NEC 2 AWG in each; CEC 250 A, 4 AWG in each.
		f = feeder(e, fourMotors()...)
		f.Device, f.Wiring.Sets = protection.InverseTimeBreaker, 2
		r = sized(t, f)
		assert.Equal(t, "500 A", r.Rating.String())
		assert.Equal(t, "3/0", r.Conductors.Size.Name())
		want, row, rule := "2", "500 A", "250.122(F)"
		if e.Code() == tables.CEC {
			want, row, rule = "4", "300 A", "Rule 10-616(4)"
		}
		assert.Equal(t, want, r.Bonding.Size.Name())
		assert.Equal(t, row, r.Bonding.Row.String())
		assert.True(t, testkit.Cautioned(r.Cautions, rule, "of its own"))
	}
}

// fourMotors are those of the check values of NEC 430.24 and 430.62: 460 V, 100,
// 100, 60 and 7-1/2 hp behind inverse-time breakers.
func fourMotors() list {
	breaker := behind(protection.InverseTimeBreaker)
	return list{cage("P-1", "100", 460, breaker), cage("P-2", "100", 460, breaker), cage("F-3", "60", 460, breaker), cage("F-4", "7-1/2", 460, breaker)}
}

// The text names the governing motors and every term.
func TestFeederText(t *testing.T) {
	f := feeder(tables.NEC2023, append(fourMotors(), drawing("", "5"))...)
	f.Device, f.Continuous, f.Other = protection.InverseTimeBreaker, motor.Amps("8"), motor.Amps("3")
	text := sized(t, f).String()
	for _, want := range []string{
		"F-1: feeder of 5 motors, under NFPA 70-2023",
		"155 A  P-1: ", "124 A  P-2: ", "77 A  F-3: ", "11 A  F-4: ", "5 A  circuit 5: ", "10 A  other load that is continuous: ", "3 A  other load: ",
		"P-1 governs the conductors", "the device of P-1 governs", "[430.24", "[430.62(A)", "[430.63", "[430.110(C)(2)", "Bonding conductor: ", "Cautions\n",
	} {
		assert.Contains(t, text, want)
	}
	text = sized(t, feeder(tables.CEC2024, drawing("only", "20", duty(motor.Intermittent, 15)))).String()
	assert.NotContains(t, text, "governs the conductors", "nothing counts 125 percent")
	assert.Contains(t, text, "the device of only governs")
	var none motorcircuit.FeederResult
	assert.NotPanics(t, func() { _ = none.String() }, "the zero result prints")
}

// Other loads may be as large as a feeder could carry, and not larger: 100000 A.
func TestFeederLargestLoad(t *testing.T) {
	f := feeder(tables.NEC2023, cage("a", "5", 460))
	f.Other, f.Continuous = motor.Amps("100000"), motor.Amps("100000")
	_, err := motorcircuit.SizeFeeder(f)
	require.ErrorAs(t, err, new(*tables.NoSizeError), "it stands as input, and no conductors carry it")
}

// A neutral is pulled beside three lines and does not count as carrying current (NEC
// 310.15(E), CEC Rule 4-004(3): common practice for a balanced system): 30 hp at 208 V
// and a motor of 115 V to line A.
func TestFeederNeutral(t *testing.T) {
	for _, e := range everyone {
		f := feeder(e, cage("a", "30", 208), single("b", "1", 115, "A"))
		f.Wiring.Raceway = conductor.EMT
		r := sized(t, f)
		assert.Equal(t, 4, r.Count)
		assert.True(t, r.Conductors.Together.IsOne(), "%v", r.Conductors.Together)
		assert.Equal(t, 5, r.Raceway.Conductors)
		r = sized(t, feeder(e, cage("a", "30", 208), single("b", "2", 208, "AB")))
		assert.Equal(t, 3, r.Count, "no neutral between lines")
	}
}

// One disconnecting means serves the set of most load, whichever comes first: NEC
// 430.110(C)(2), CEC Rule 28-602(2), 115 percent of 40 A and of 14 A.
func TestFeederDisconnectOfInterlocks(t *testing.T) {
	lock := func(fc *motorcircuit.FeederCircuit) { fc.Interlock = "x" }
	for _, e := range everyone {
		for _, order := range [][]string{{"10", "30"}, {"30", "10"}} {
			r := sized(t, feeder(e, cage("a", order[0], 460, lock), cage("b", order[1], 460, lock)))
			assert.Equal(t, "46 A", r.Disconnect.Amperes.String())
			assert.Equal(t, "30 hp", r.Disconnect.Horsepower.String())
		}
	}
}

// CEC Rule 28-714: the largest locked-rotor current of the compressors, and the
// currents of the rest.
func TestFeederLargestCompressor(t *testing.T) {
	marked := func(rotor string) change {
		return func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Nameplate.LockedRotor = motor.Amps(rotor) }
	}
	for _, e := range cecEditions {
		for _, order := range [][2]string{{"150", "240"}, {"240", "150"}} {
			r := sized(t, feeder(e, with(compressor("a", "30", ""), marked(order[0])), with(compressor("b", "30", ""), marked(order[1])), cage("c", "10", 460)))
			assert.Equal(t, "284 A", r.Disconnect.LockedRotor.String(), "240 + 30 + 14")
		}
	}
}
