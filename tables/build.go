package tables

import "example.org/motorcircuit/internal/exact"

// This file holds the ways to make figures. A figure's mark is the weakest of
// its rule and its operands.

func newFigure(name string, op Op, e Edition, rule *Rule, value exact.Num, unit Unit, of ...Figure) Figure {
	f := Figure{value: value, name: name, rule: rule, of: of, edition: e, unit: unit, op: op}
	if rule != nil {
		f.mark = rule.Mark
	}
	for i := range of {
		f.mark = max(f.mark, of[i].mark)
	}
	return f
}

// StatedFigure returns coef × 10^-places of the unit, as the rule prints it.
func StatedFigure(name string, e Edition, rule *Rule, unit Unit, coef int64, places int) Figure {
	return newFigure(name, Stated, e, rule, exact.New(coef, places), unit)
}

// StepFigure returns coef × 10^-places of the unit, found by trying step by step
// under what the rule names.
func StepFigure(name string, e Edition, rule *Rule, unit Unit, coef int64, places int) Figure {
	return newFigure(name, Tried, e, rule, exact.New(coef, places), unit)
}

// ProductOf returns the product of the factors, in the unit of the first.
// Percents count as hundredths.
func ProductOf(name string, e Edition, rule *Rule, factors ...Figure) Figure {
	product := exact.Int(1)
	for i, f := range factors {
		product = product.Mul(f.value)
		if f.unit == Percent && i > 0 {
			product = product.Mul(exact.New(1, 2))
		}
	}
	return newFigure(name, Product, e, rule, product, factors[0].unit, factors...)
}

// SumOf returns the sum of the terms, in the unit of the first.
func SumOf(name string, e Edition, rule *Rule, terms ...Figure) Figure {
	var sum exact.Num
	for _, t := range terms {
		sum = sum.Add(t.value)
	}
	return newFigure(name, Sum, e, rule, sum, terms[0].unit, terms...)
}

// DifferenceOf returns whole less part, in their unit.
func DifferenceOf(name string, e Edition, rule *Rule, whole, part Figure) Figure {
	return newFigure(name, Difference, e, rule, whole.value.Add(part.value.Mul(exact.Int(-1))), whole.unit, whole, part)
}

// LargestOf returns the largest of the figures; absent ones are left out. It is
// absent if all are.
func LargestOf(name string, e Edition, rule *Rule, figures ...Figure) Figure {
	return extreme(name, Largest, e, rule, 1, figures)
}

// SmallestOf returns the smallest of the figures; absent ones are left out. It
// is absent if all are.
func SmallestOf(name string, e Edition, rule *Rule, figures ...Figure) Figure {
	return extreme(name, Smallest, e, rule, -1, figures)
}

func extreme(name string, op Op, e Edition, rule *Rule, sign int, figures []Figure) Figure {
	present := make([]Figure, 0, len(figures))
	best := -1
	for _, f := range figures {
		if f.IsZero() {
			continue
		}
		present = append(present, f)
		if best < 0 || f.Cmp(present[best])*sign > 0 {
			best = len(present) - 1
		}
	}
	if best < 0 {
		return Figure{}
	}
	return newFigure(name, op, e, rule, present[best].value, present[best].unit, present...)
}

// RaisedTo returns f, or the least value if f is below it; the note says why.
func RaisedTo(name string, e Edition, rule *Rule, f, least Figure, note string) Figure {
	if f.Cmp(least) >= 0 {
		return f
	}
	g := newFigure(name, AtLeast, e, rule, least.value, f.unit, f)
	g.note = note
	return g
}

// As returns f under another name, as the value that a rule takes for a purpose.
func (f Figure) As(name string, e Edition, rule *Rule) Figure {
	if f.IsZero() {
		return f
	}
	return newFigure(name, Taken, e, rule, f.value, f.unit, f)
}

// Renamed returns f under another name, worked out in the same way.
func (f Figure) Renamed(name string) Figure {
	if !f.IsZero() {
		f.name = name
	}
	return f
}

// StandIn returns f as an assumed value of another name: it stands in for what
// was not given, and a caution must say so.
func (f Figure) StandIn(name string, e Edition, rule *Rule) Figure {
	return newFigure(name, Assumed, e, rule, f.value, f.unit, f)
}

// WithNote returns f with a note on how it came about.
func (f Figure) WithNote(note string) Figure {
	f.note = note
	return f
}

// QuotientOf returns dividend ÷ divisors, rounded up to a hundredth, in the unit
// of the dividend. Percents count as hundredths. A divisor must not be 0.
func QuotientOf(name string, e Edition, rule *Rule, dividend Figure, divisors ...Figure) Figure {
	under := exact.Int(1)
	for _, d := range divisors {
		under = under.Mul(d.value)
		if d.unit == Percent {
			under = under.Mul(exact.New(1, 2))
		}
	}
	of := append([]Figure{dividend}, divisors...)
	return newFigure(name, QuotientUp, e, rule, dividend.value.DivUp(under, 2), dividend.unit, of...).WithNote("rounded up to 0.01")
}

// PercentOf returns part ÷ whole in percent, rounded up to a hundredth.
func PercentOf(name string, e Edition, rule *Rule, part, whole Figure) Figure {
	f := newFigure(name, QuotientUp, e, rule, part.value.Mul(exact.Int(100)).DivUp(whole.value, 2), Percent, part, whole)
	return f.WithNote("in percent, rounded up to 0.01")
}

// Whole returns a whole number as a figure: a count that the caller chose or
// that follows from the circuit.
func Whole(name string, unit Unit, n int) Figure {
	return newFigure(name, Given, 0, nil, exact.Int(int64(n)), unit)
}

// IsOne reports a factor of 1 or 100 %, which changes nothing.
func (f Figure) IsOne() bool {
	if f.unit == Percent {
		return f.value.Cmp(exact.Int(100)) == 0
	}
	return f.value.Cmp(exact.Int(1)) == 0
}
