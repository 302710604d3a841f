package conductor_test

import (
	"errors"
	"testing"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// The referee: a plain linear search over sets and sizes, written from the rules
// with factors typed here. Only the cells of the ampacity tables are read from
// the library.

// factorBand is a factor up to a bound; bounds rise.
type factorBand struct {
	upTo   int64
	factor string
}

// Ambient factors by conductor temperature. Both codes print the same above
// 30 °C; below it the CEC gives no credit.
var ambientBands = map[int][]factorBand{
	60: {{10, "1.29"}, {15, "1.22"}, {20, "1.15"}, {25, "1.08"}, {30, "1"}, {35, "0.91"}, {40, "0.82"}, {45, "0.71"}, {50, "0.58"}, {55, "0.41"}},
	75: {{10, "1.20"}, {15, "1.15"}, {20, "1.11"}, {25, "1.05"}, {30, "1"}, {35, "0.94"}, {40, "0.88"}, {45, "0.82"}, {50, "0.75"}, {55, "0.67"}, {60, "0.58"}, {65, "0.47"}, {70, "0.33"}},
	90: {{10, "1.15"}, {15, "1.12"}, {20, "1.08"}, {25, "1.04"}, {30, "1"}, {35, "0.96"}, {40, "0.91"}, {45, "0.87"}, {50, "0.82"}, {55, "0.76"}, {60, "0.71"}, {65, "0.65"}, {70, "0.58"}, {75, "0.50"}, {80, "0.41"}},
}

var countBands = map[tables.Code][]factorBand{
	tables.NEC: {{3, "1"}, {6, "0.8"}, {9, "0.7"}, {20, "0.5"}, {30, "0.45"}, {40, "0.4"}, {1 << 40, "0.35"}},
	tables.CEC: {{3, "1"}, {6, "0.8"}, {24, "0.7"}, {42, "0.6"}, {1 << 40, "0.5"}},
}

func band(bands []factorBand, n int64) (decimal.Decimal, bool) {
	for _, b := range bands {
		if n <= b.upTo {
			return decimal.RequireFromString(b.factor), true
		}
	}
	return decimal.Decimal{}, false
}

// A trial is one row of the grid.
type trial struct {
	e           tables.Edition
	material    tables.Material
	insulation  string
	celsius     int    // of the insulation, dry
	most        string // largest size it is made in
	run         tables.Run
	termination int // 0 not marked
	ambient     int
	together    int // 0 the circuit's own three
	reading     conductor.Reading
	amps        string
}

func (x trial) wiring() conductor.Wiring {
	return conductor.Wiring{Material: x.material, Insulation: x.insulation, Run: x.run, Termination: x.termination,
		Ambient: celsius(decimal.NewFromInt(int64(x.ambient)).String()), Conductors: x.together, Reading: x.reading}
}

// An answer is what the referee finds; no sets is nothing found.
type answer struct {
	sets   int
	size   tables.Size
	usable decimal.Decimal
}

// factor returns what the table ampacity is multiplied by, and the run whose
// table it is; false if the ambient is not allowed.
func (x trial) factor() (decimal.Decimal, tables.Run, bool) {
	code := x.e.Code()
	hot := decimal.NewFromInt(1)
	if code == tables.NEC || x.ambient > 30 {
		var ok bool
		if hot, ok = band(ambientBands[x.celsius], int64(x.ambient)); !ok {
			return hot, x.run, false
		}
	}
	if x.run == tables.InFreeAir && x.together == 0 {
		return hot, x.run, true // kept apart
	}
	n := int64(max(x.together, 3))
	if code == tables.CEC && x.run == tables.InFreeAir && n <= 4 { // Table 5B
		close, _ := band([]factorBand{{2, "0.90"}, {3, "0.85"}, {4, "0.80"}}, n)
		return hot.Mul(close), x.run, true
	}
	run := x.run
	if code == tables.CEC && run == tables.InFreeAir { // more than four close together
		run = tables.InRaceway
	}
	together, _ := band(countBands[code], n)
	return hot.Mul(together), run, true
}

// search tries every number of sets, and in each every size from the smallest.
func (x trial) search() (answer, bool) {
	factor, run, ok := x.factor()
	if !ok {
		return answer{}, false
	}
	asked := decimal.RequireFromString(x.amps)
	terminal := x.termination
	if terminal == 0 {
		terminal = 75
		if asked.LessThanOrEqual(decimal.NewFromInt(100)) {
			terminal = 60
		}
	}
	weaker := min(x.celsius, terminal)
	table, _ := x.e.Ampacities(run, x.material)
	raceway, _ := x.e.Ampacities(tables.InRaceway, x.material)
	held := raceway // the NEC holds terminals to the raceway table, the CEC to the run's own
	column := x.celsius
	if x.e.Code() == tables.CEC {
		if held = table; x.reading == conductor.CorrectTermination {
			column = weaker
		}
	}
	least := map[tables.Material]string{conductor.Copper: "14", conductor.Aluminum: "12"}[x.material]
	for sets := 1; sets <= 12; sets++ {
		n := decimal.NewFromInt(int64(sets))
		for _, s := range tables.Sizes() {
			if s < size(least) || s > size(x.most) || sets > 1 && s < size("1/0") {
				continue
			}
			usable := table.Ampacity(s, column).Value().Mul(factor).Mul(n)
			if x.e.Code() == tables.NEC || x.reading == conductor.CorrectInsulation {
				usable = decimal.Min(usable, held.Ampacity(s, weaker).Value().Mul(n))
			}
			if usable.GreaterThanOrEqual(asked) {
				return answer{sets, s, usable}, true
			}
		}
	}
	return answer{}, true
}

// grid yields every trial but the amperes.
func grid(yield func(trial)) {
	type wire struct {
		name    string
		celsius int
		most    string
	}
	wires := map[tables.Code][]wire{
		tables.NEC: {{"TW", 60, "2000"}, {"THWN", 75, "1000"}, {"XHHW-2", 90, "2000"}},
		tables.CEC: {{"TW", 60, "2000"}, {"RW75", 75, "2000"}, {"RW90", 90, "2000"}},
	}
	for _, e := range tables.Editions() {
		readings := []conductor.Reading{conductor.CorrectTermination}
		if e.Code() == tables.CEC {
			readings = append(readings, conductor.CorrectInsulation)
		}
		for _, material := range []tables.Material{conductor.Copper, conductor.Aluminum} {
			for _, w := range wires[e.Code()] {
				for _, run := range []tables.Run{tables.InRaceway, tables.InFreeAir} {
					for _, termination := range []int{0, 60, 75, 90} {
						for _, reading := range readings {
							for _, ambient := range []int{5, 30, 40, 56} {
								for _, together := range []int{0, 4, 9, 24} {
									yield(trial{e, material, w.name, w.celsius, w.most, run, termination, ambient, together, reading, ""})
								}
							}
						}
					}
				}
			}
		}
	}
}

// Select finds what the referee finds, over the grid of rules and a ladder of
// amperes that stands on and beside table values.
func TestSelectAgainstReferee(t *testing.T) {
	ladder := []string{"0.01", "20", "20.01", "76.25", "85", "99.99", "100", "100.01", "173.6", "230", "545", "1200.5", "5000"}
	trials, none := 0, 0
	grid(func(x trial) {
		for _, x.amps = range ladder {
			trials++
			want, allowed := x.search()
			got, err := x.wiring().Select(x.e, load(x.amps))
			var hot *tables.NotTabulatedError
			var large *tables.NoSizeError
			switch {
			case !allowed:
				if !errors.As(err, &hot) {
					t.Fatalf("%+v: ambient not allowed, got %v, %v", x, got.Size, err)
				}
			case want.sets == 0:
				none++
				if !errors.As(err, &large) {
					t.Fatalf("%+v: no size does, got %v, %v", x, got.Size, err)
				}
			case err != nil || got.Sets != want.sets || got.Size != want.size || !got.Ampacity.Value().Equal(want.usable):
				t.Fatalf("%+v: want %d × %v, %v A, got %d × %v, %v, %v", x, want.sets, want.size, want.usable, got.Sets, got.Size, got.Ampacity, err)
			}
		}
	})
	if trials < 20_000 || none == 0 {
		t.Fatalf("the grid shrank: %d trials, %d without a size", trials, none)
	}
}
