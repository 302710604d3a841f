package motorcircuit_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A group of motors and what a feeder of them comes to.
type sumCase struct {
	name     string
	editions []tables.Edition
	circuits []motorcircuit.FeederCircuit
	ampacity string
	governs  string // tag of the motor that counts 125 percent
	limit    string // "" is not asked
	rating   string
	largest  string
}

func holdSums(t *testing.T, cases []sumCase) {
	t.Helper()
	for _, tt := range cases {
		for _, e := range tt.editions {
			t.Run(tt.name+"/"+e.String(), func(t *testing.T) {
				r := sized(t, feeder(e, tt.circuits...))
				assert.Equal(t, tt.ampacity, r.Ampacity.String(), "%s", r)
				assert.Equal(t, tt.governs, r.Governs)
				if tt.limit != "" {
					assert.Equal(t, tt.limit, r.Limit.String(), "%s", r)
					assert.Equal(t, tt.rating, r.Rating.String())
					assert.Equal(t, tt.largest, r.Largest)
				}
			})
		}
	}
}

type list = []motorcircuit.FeederCircuit

// NEC 430.24: 125 percent of the largest motor plus the rest; 430.62: the largest
// branch device plus the other currents. CEC Rules 28-108(1)(a), 28-204(1): the
// same, with the calculated limit of the device in place of its rating.
func TestFeederOfContinuousMotors(t *testing.T) {
	holdSums(t, []sumCase{
		// 40 × 1.75 = 70, a standard rating: both codes count 70.
		{"three", everyone, list{drawing("a", "20"), drawing("b", "40"), drawing("c", "10")}, "80 A", "b", "100 A", "100 A", "b"},
		// 30 × 1.75 = 52.5: the NEC counts the 60 A device, the CEC the limit itself.
		{"rounded up", necEditions, list{drawing("a", "30"), drawing("b", "20")}, "57.5 A", "a", "80 A", "80 A", "a"},
		{"calculated", cecEditions, list{drawing("a", "30"), drawing("b", "20")}, "57.5 A", "a", "72.5 A", "70 A", "a"},
		// Equal motors: one counts 125 percent, and one device is the largest.
		{"equal", everyone, list{drawing("a", "40"), drawing("b", "40"), drawing("c", "40")}, "130 A", "a", "150 A", "150 A", "a"},
		// 38 × 1.75 = 66.5, the NEC's device is 70 A too: the larger current is that of the largest device.
		{"equal devices", necEditions, list{drawing("a", "38"), drawing("b", "40")}, "88 A", "b", "108 A", "100 A", "b"},
		{"one", everyone, list{drawing("a", "40")}, "50 A", "a", "70 A", "70 A", "a"},
		// The largest current is not the largest device (NEC Annex D, Example D8; CEC C009).
		{"largest device", everyone, list{drawing("a", "40"), drawing("b", "30", behind(protection.NonTimeDelayFuse))}, "80 A", "a", "130 A", "125 A", "b"},
		// 15 A is always allowed under the CEC, though the sum is less.
		{"floor", cecEditions, list{drawing("a", "2"), drawing("b", "1")}, "3.5 A", "a", "4.5 A", "15 A", "a"},
		// A fuse of 3 A, NEC 240.6(A): 2 × 1.75 = 3.5, next up 6, plus 1 = 7.
		{"small fuse", necEditions, list{drawing("a", "2"), drawing("b", "1")}, "3.5 A", "a", "7 A", "6 A", "a"},
	})
}

// NEC 430.24 Exception No. 1: a motor of duty cycle counts what its duty asks for
// (Table 430.22(E)); where the largest is one, the greater of that and 125 percent
// of the largest continuous motor. CEC Rule 28-108(1)(b), (c): the 125 percent goes
// to the largest continuous motor, to none if there is none.
func TestFeederDutyCycle(t *testing.T) {
	short5, mid15, short15 := duty(motor.ShortTime, 5), duty(motor.Intermittent, 15), duty(motor.ShortTime, 15)
	exam := list{drawing("c40", "40"), drawing("c36", "36"), drawing("s50", "50", short5), drawing("i60", "60", mid15)}
	even := list{drawing("c", "40.8"), drawing("i", "60", mid15)}
	holdSums(t, []sumCase{
		// Trade exam guide of the CEC 2024: 40 × 1.25 + 36 + 50 × 1.1 + 60 × 0.85.
		{"mixed", cecEditions, exam, "192 A", "c40", "", "", ""},
		// 60 × 0.85 = 51 is above 40 × 1.25 = 50: 51 + 55 + 40 + 36.
		{"mixed", necEditions, exam, "182 A", "", "", "", ""},
		// 48 × 1.25 = 60 is above 51: 60 + 51.
		{"continuous greater", everyone, list{drawing("c", "48"), drawing("i", "60", mid15)}, "111 A", "c", "", "", ""},
		// 40.8 × 1.25 = 51 exactly, and 60 × 0.85 = 51.
		{"as great", necEditions, even, "91.8 A", "", "", "", ""},
		{"as great", cecEditions, even, "102 A", "c", "", "", ""},
		{"none continuous", everyone, list{drawing("s", "50", short5), drawing("i", "60", mid15)}, "106 A", "", "", "", ""},
		{"one, not continuous", everyone, list{drawing("i", "60", mid15)}, "51 A", "", "", "", ""},
		{"largest continuous", everyone, list{drawing("c", "60"), drawing("i", "50", mid15)}, "117.5 A", "c", "", "", ""},
		// Design text of the Ontario code: 12 × 1.25 + 9 + 5 × 1.2.
		{"design text", everyone, list{drawing("a", "12"), drawing("b", "9"), drawing("s", "5", short15)}, "30 A", "a", "", "", ""},
		// Duty does not change what a motor counts for in the device: 60 × 1.75 = 105
		// (the NEC's next rating up is 110), plus 40. Conductors: 51 + 40; CEC 51 + 50.
		{"device", necEditions, list{drawing("c", "40"), drawing("i", "60", mid15)}, "91 A", "", "150 A", "150 A", "i"},
		{"device", cecEditions, list{drawing("c", "40"), drawing("i", "60", mid15)}, "101 A", "c", "145 A", "125 A", "i"},
	})
}

// NEC 430.24 Exception No. 3, CEC Rule 28-108(2): of interlocked motors the set of
// the greatest sum. Conductors and device may come from different sets.
func TestFeederInterlocks(t *testing.T) {
	x := func(alternative string) change { return locked("x", alternative) }
	y := func(alternative string) change { return locked("y", alternative) }
	seasons := list{drawing("cool", "40", x("summer")), drawing("heat", "30", x("winter")), drawing("fan", "25", x("winter")), drawing("free", "20")}
	fuses := list{drawing("a", "40", x("1"), behind(protection.NonTimeDelayFuse)), drawing("b", "30", x("2")), drawing("c", "25", x("2"))}
	holdSums(t, []sumCase{
		{"each alone", everyone, list{drawing("a", "40", x("")), drawing("b", "30", x("")), drawing("free", "20")}, "70 A", "a", "90 A", "90 A", "a"},
		// {40, 20}: 70 A; {30, 25, 20}: 37.5 + 25 + 20. Devices 70 + 20 and 60 (CEC 52.5) + 45.
		{"alternatives", necEditions, seasons, "82.5 A", "heat", "105 A", "100 A", "heat"},
		{"alternatives", cecEditions, seasons, "82.5 A", "heat", "97.5 A", "90 A", "heat"},
		// Conductors 30 × 1.25 + 25; device 40 × 3 = 120 (NEC next up 125) above 60 + 25.
		{"different sets", necEditions, fuses, "62.5 A", "b", "125 A", "125 A", "a"},
		{"different sets", cecEditions, fuses, "62.5 A", "b", "120 A", "110 A", "a"},
		// x {40 | 30}, y {20 | 10 + 15}: 50 + 25.
		{"two interlocks", everyone, list{drawing("a", "40", x("1")), drawing("b", "30", x("2")), drawing("c", "20", y("1")), drawing("d", "10", y("2")), drawing("e", "15", y("2"))},
			"75 A", "a", "", "", ""},
		{"one of the same alternative", everyone, list{drawing("a", "40", x("1")), drawing("b", "30", x("1"))}, "80 A", "a", "", "", ""},
	})
	for _, e := range everyone {
		r := sized(t, feeder(e, seasons...))
		assert.True(t, testkit.Cautioned(r.Cautions, "", "interlocked"))
		assert.Equal(t, "heat 37.5, fan 25, free 20", terms(r), "the set that governs is shown")
		assert.Len(t, r.Circuits, 4, "every circuit is sized")
	}
}

// Single-phase motors load the lines that they name, three-phase motors every
// line; the line of the greatest sum governs. 10 hp 208 V: 30.8 A; 115 V 2 hp 24 A,
// 1 hp 16 A; 208 V 3 hp 18.7 A (NEC Tables 430.248, 430.250; CEC Tables 44, 45).
func TestFeederLines(t *testing.T) {
	pump := cage("pump", "10", 208)
	holdSums(t, []sumCase{
		// A 38.5 + 24; B 38.5 + 16 + 18.7; C 38.5 + 18.7. Device 30.8 × 1.75 = 53.9, NEC next up 60.
		{"by line", necEditions, list{pump, single("fan", "2", 115, "A"), single("saw", "1", 115, "B"), single("press", "3", 208, "BC")}, "73.2 A", "pump", "94.7 A", "90 A", "pump"},
		{"by line", cecEditions, list{pump, single("fan", "2", 115, "A"), single("saw", "1", 115, "B"), single("press", "3", 208, "BC")}, "73.2 A", "pump", "88.6 A", "80 A", "pump"},
		{"on every line", everyone, list{pump, single("fan", "2", 115, ""), single("saw", "1", 115, ""), single("press", "3", 208, "")}, "97.2 A", "pump", "", "", ""},
		// A 1.25 × 24 + 16; B 1.25 × 24; C 24: the largest of line A governs.
		{"single-phase only", everyone, list{single("a", "2", 115, "A"), single("b", "2", 115, "B"), single("c", "1", 115, "A")}, "46 A", "a", "", "", ""},
		{"only on C", everyone, list{single("a", "2", 115, "C")}, "30 A", "a", "", "", ""},
		{"between lines", everyone, list{single("a", "3", 208, "AB"), single("b", "3", 208, "CA")}, "42.075 A", "a", "", "", ""},
	})
	r := sized(t, feeder(tables.NEC2023, pump, single("fan", "2", 115, "A")))
	assert.True(t, testkit.Cautioned(r.Cautions, "", "line of most load"))
}

// Other loads: NEC 430.24(3), (4) a continuous one at 125 percent, any other at
// 100; CEC Rule 8-104 a continuous one ÷ 0.80. The device: NEC 430.63, CEC Rule
// 28-204(3).
func TestFeederOtherLoads(t *testing.T) {
	for _, e := range everyone {
		f := feeder(e, drawing("a", "40"), drawing("b", "20"))
		f.Continuous, f.Other = motor.Amps("20"), motor.Amps("10")
		r := sized(t, f)
		assert.Equal(t, "105 A", r.Ampacity.String(), "50 + 20 + 25 + 10")
		assert.Equal(t, "a 50, b 20, 25, 10", terms(r))
		assert.Equal(t, "125 A", r.Limit.String(), "70 + 20 + 25 + 10")
		assert.Equal(t, "125 A", r.Rating.String())
		continuous := r.Terms[2].Figure
		if e.Code() == tables.NEC {
			assert.Equal(t, "430.24(4)", continuous.Citation().Ref)
			assert.Equal(t, "430.63", r.Limit.Citation().Ref)
		} else {
			assert.Equal(t, "Rule 8-104", continuous.Citation().Ref)
			assert.Equal(t, "Rule 28-204(3)", r.Limit.Citation().Ref)
			assert.Equal(t, "Rule 28-110(1)", r.Ampacity.Citation().Ref)
		}
		f.Continuous, f.Other = motor.Amps("0"), motor.Amps("0")
		require.Equal(t, "70 A", sized(t, f).Ampacity.String(), "0 A is no load")
	}
}
