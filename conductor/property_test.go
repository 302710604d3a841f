package conductor_test

import (
	"errors"
	"strconv"
	"testing"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// steps are the amperes of the ladder: fine at the small sizes.
func steps() []string {
	var list []string
	for a := decimal.NewFromInt(3); a.LessThan(decimal.NewFromInt(4000)); a = a.Mul(decimal.New(117, -2)).Round(2) {
		list = append(list, a.String())
	}
	return list
}

// rank orders selections: more sets, then a larger size. Area alone would not do:
// two sets of 400 kcmil follow one of 2000 kcmil.
func rank(s conductor.Selection) int { return s.Sets*100 + int(s.Size) }

// tried selects; a load or an ambient that nothing serves ranks above everything.
func tried(t *testing.T, x trial) (conductor.Selection, int) {
	return ranked(t, x.wiring(), x.e, x.amps)
}

func ranked(t *testing.T, w conductor.Wiring, e tables.Edition, amps string) (conductor.Selection, int) {
	s, err := w.Select(e, load(amps))
	if err == nil {
		return s, rank(s)
	}
	var hot *tables.NotTabulatedError
	var large *tables.NoSizeError
	if !errors.As(err, &hot) && !errors.As(err, &large) {
		t.Fatalf("%+v: %v", w, err)
	}
	return s, 1 << 30
}

// The chosen size carries the load, and the next smaller one of as many sets
// carries less or is not allowed.
func TestChosenIsLeast(t *testing.T) {
	ladder, chosen := steps(), 0
	grid(func(x trial) {
		for i := 0; i < len(ladder); i++ {
			x.amps = ladder[i]
			s, _ := tried(t, x)
			if s.IsZero() {
				continue
			}
			chosen++
			if s.Ampacity.Cmp(s.Required) < 0 {
				t.Fatalf("%+v: %v carries %v", x, s.Size, s.Ampacity)
			}
			if s.Smaller.Why == "" || s.Smaller.Size != s.Size.Smaller() {
				t.Fatalf("%+v: %v does not say why %v fails", x, s.Size, s.Size.Smaller())
			}
			if !s.Smaller.Ampacity.IsZero() && s.Smaller.Ampacity.Cmp(s.Required) >= 0 {
				t.Fatalf("%+v: %v would have carried %v", x, s.Smaller.Size, s.Smaller.Ampacity)
			}
		}
	})
	if chosen < 40_000 {
		t.Fatalf("the grid shrank to %d", chosen)
	}
}

// More amperes never take less, with marked terminals (unmarked ones pass from 60
// to 75 °C at 100 A, and may).
func TestMoreAmperesNeverLess(t *testing.T) {
	ladder := steps()
	grid(func(x trial) {
		if x.termination == 0 {
			return
		}
		before := 0
		for i := 0; i < len(ladder); i++ {
			x.amps = ladder[i]
			_, now := tried(t, x)
			if now < before {
				t.Fatalf("%+v takes less than a smaller load", x)
			}
			before = now
		}
	})
}

// A hotter place or a fuller raceway never takes less.
func TestHotterOrFullerNeverLess(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, material := range []tables.Material{conductor.Copper, conductor.Aluminum} {
			for _, insulation := range []string{"TW", "", map[tables.Code]string{tables.NEC: "XHHW-2", tables.CEC: "RW90"}[e.Code()]} {
				for _, termination := range []int{0, 60, 75, 90} {
					for _, amps := range []string{"12.5", "41", "81.25", "100", "156.25", "310", "737.5", "1500"} {
						before := 0
						for _, ambient := range []string{"-20", "10", "11", "18", "26", "30", "31", "36", "41", "46", "51", "56", "61", "66", "71", "76", "81"} {
							_, now := ranked(t, conductor.Wiring{Material: material, Insulation: insulation, Termination: termination, Ambient: celsius(ambient)}, e, amps)
							if now < before {
								t.Fatalf("%v %v %q, %d °C terminals, %s A: less at %s °C", e, material, insulation, termination, amps, ambient)
							}
							before = now
						}
						before = 0
						for n := 3; n < 50; n += 3 {
							_, now := ranked(t, conductor.Wiring{Material: material, Insulation: insulation, Termination: termination, Conductors: n}, e, amps)
							if now < before {
								t.Fatal("less in a fuller raceway: " + e.String() + " " + amps + " A, " + strconv.Itoa(n) + " conductors")
							}
							before = now
						}
					}
				}
			}
		}
	}
}

// The stricter reading of the CEC never takes less than the other.
func TestStricterReading(t *testing.T) {
	ladder := steps()
	grid(func(x trial) {
		if x.e.Code() != tables.CEC || x.reading != conductor.CorrectTermination {
			return
		}
		for i := 0; i < len(ladder); i += 2 {
			x.amps = ladder[i]
			_, strict := tried(t, x)
			y := x
			y.reading = conductor.CorrectInsulation
			if _, loose := tried(t, y); loose > strict {
				t.Fatalf("%+v: the stricter reading takes less", x)
			}
		}
	})
}
