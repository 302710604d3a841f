package protection_test

import (
	"testing"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The ladder of nameplate currents, fine at the small ones.
func currents() []string {
	var list []string
	for a := decimal.RequireFromString("0.3"); a.LessThan(decimal.NewFromInt(1900)); a = a.Mul(decimal.New(104, -2)).Round(2).Add(decimal.New(1, -2)) {
		list = append(list, a.String())
	}
	return list
}

// For every current, edition, type of motor and kind of device: ratings are
// standard ones; the NEC's is the first at or above its limit, the CEC's the last
// at or below it, or 15 A; under the higher ceiling it never is less, and more
// current never takes less.
func TestRatingsOverLadder(t *testing.T) {
	kinds := []motor.Kind{motor.SquirrelCage, motor.SinglePhase, motor.WoundRotor, motor.DirectCurrent}
	fifteen, tried := decimal.NewFromInt(15), 0
	for _, e := range tables.Editions() {
		for _, kind := range []tables.Device{nonTime, timeDelay, breaker} {
			var standard []decimal.Decimal
			for _, f := range e.StandardRatings(kind) {
				standard = append(standard, f.Value())
			}
			atOrBelow := func(limit decimal.Decimal) decimal.Decimal {
				best := decimal.Decimal{}
				for _, r := range standard {
					if r.LessThanOrEqual(limit) {
						best = r
					}
				}
				return best
			}
			for _, k := range kinds {
				before := decimal.Decimal{}
				for _, amps := range currents() {
					tried++
					s := device(t, e, kind, as(k, drawing(amps)))
					rating, start := s.Rating.Value(), s.StartRating.Value()
					var want, wantStart decimal.Decimal
					if e.Code() == tables.CEC {
						want = decimal.Max(fifteen, atOrBelow(s.Limit.Value()))
						wantStart = decimal.Max(fifteen, atOrBelow(s.StartLimit.Value()))
					} else {
						for _, r := range standard {
							if want = r; r.GreaterThanOrEqual(s.Limit.Value()) {
								break
							}
						}
						wantStart = decimal.Max(want, atOrBelow(s.StartLimit.Value()))
					}
					if !rating.Equal(want) || !start.Equal(wantStart) {
						t.Fatalf("%v %v %v %s A: %v and %v, want %v and %v", e, k, kind, amps, rating, start, want, wantStart)
					}
					if start.LessThan(rating) || rating.LessThan(before) {
						t.Fatalf("%v %v %v %s A: %v after %v, %v to start", e, k, kind, amps, rating, before, start)
					}
					before = rating
				}
			}
		}
	}
	if tried < 10_000 {
		t.Fatalf("the ladder shrank to %d", tried)
	}
}

// Every figure that protection gives rests on a rule of the edition.
func TestEveryFigureIsCited(t *testing.T) {
	for _, e := range tables.Editions() {
		for _, m := range []motor.Motor{drawing("61"), as(motor.SinglePhase, drawing("7")), as(motor.DirectCurrent, drawing("30")), compressor("38", "40", "200"), torque("12")} {
			o, x, c := overload(t, e, m), disconnect(t, e, m), controller(t, e, m)
			figures := []tables.Figure{o.Limit, o.StartLimit, o.Protector, o.Units, x.Amperes, x.LockedRotor, x.Sight, c.Amperes, c.LockedRotor, c.GeneralUse, c.SnapSwitch}
			for _, kind := range []tables.Device{nonTime, timeDelay, breaker} {
				s := device(t, e, kind, m)
				figures = append(figures, s.Limit, s.Rating, s.StartLimit, s.StartRating, s.Instantaneous)
			}
			for _, f := range figures {
				if !f.IsZero() && f.Citation().Edition != e {
					t.Errorf("%v %v: %s %v cites %v", e, m.Kind, f.Name(), f, f.Citation())
				}
			}
		}
	}
}
