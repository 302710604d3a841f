package tables

import (
	"math"

	"example.org/motorcircuit/internal/exact"
)

// ComputedFigure returns the outcome of a physical computation in floating
// point, rounded up or down to so many places, which the note must name. It is
// absent for a value that is not a number in range.
func ComputedFigure(name string, e Edition, rule *Rule, unit Unit, value float64, places int, up bool, note string, of ...Figure) Figure {
	scaled := value * math.Pow10(places)
	if math.IsNaN(scaled) || math.Abs(scaled) > 1e15 {
		return Figure{}
	}
	if up {
		scaled = math.Ceil(scaled - 1e-9)
	} else {
		scaled = math.Floor(scaled + 1e-9)
	}
	return newFigure(name, Computed, e, rule, exact.New(int64(scaled), places), unit, of...).WithNote(note)
}

// Float returns the value for a physical computation, 0 if the figure is absent.
func (f Figure) Float() float64 {
	v, _ := f.value.Decimal().Float64()
	return v
}
