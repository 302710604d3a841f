package conductor

import (
	"strconv"

	"example.org/motorcircuit/tables"
)

// Rate returns what conductors that are there come to under a wiring: a
// [Selection] of their size, so many in parallel (0 is 1), with the ampacity that
// may be used of them, whether or not it carries the load. The ampacity is absent
// where the table prints none for the size. Least and Sets of the wiring, which
// say what to choose, are not used. Errors are as of [Wiring.Select].
func (w Wiring) Rate(e tables.Edition, l Load, size tables.Size, sets int) (Selection, error) {
	w.Least, w.Sets = 0, 0
	c, err := w.choice(e, l)
	if err != nil {
		return Selection{}, err
	}
	return c.rate(size, sets)
}

// RateMotorSupply is [Wiring.Rate] for conductors that enter a motor's terminal
// box, by the rule of [Wiring.SelectMotorSupply].
func (w Wiring) RateMotorSupply(e tables.Edition, l Load, end MotorEnd, size tables.Size, sets int) (Selection, error) {
	w.Least, w.Sets = 0, 0
	if end.Insulated.IsZero() {
		ins, err := w.insulation(e)
		if err != nil {
			return Selection{}, err
		}
		end.Insulated = tables.Must(tables.ParseTemperature(strconv.Itoa(ins.celsius)))
	}
	c, err := w.supplyChoice(e, l, end)
	if err != nil {
		return Selection{}, err
	}
	return c.rate(size, sets)
}

func (c *choice) rate(size tables.Size, sets int) (Selection, error) {
	if !size.IsValid() || size.IsMetric() || size > c.ins.Most {
		return Selection{}, &tables.InputError{Field: "size", Value: size.String(), Want: "an AWG or kcmil size up to " + c.ins.Most.String() + ", the largest of " + c.ins.Type}
	}
	if sets < 0 || sets > MaxSets {
		return Selection{}, &tables.InputError{Field: "sets", Value: strconv.Itoa(sets), Want: "1 to " + strconv.Itoa(MaxSets) + ", or 0 for 1"}
	}
	sets = max(sets, 1)
	c.need(sets)
	c.finish(size, sets)
	return c.s, nil
}

// LeastSize returns the smallest size that the code allows for conductors of a
// wiring's metal and insulation, so many in parallel, and the rule that says so.
func (w Wiring) LeastSize(e tables.Edition, sets int) (tables.Size, tables.Citation, error) {
	if err := w.Validate(e); err != nil {
		return 0, tables.Citation{}, err
	}
	ins, err := w.insulation(e)
	if err != nil {
		return 0, tables.Citation{}, err
	}
	size, rule := (&choice{w: w, r: rulesOf(e), ins: ins}).least(sets)
	return size, rule.In(e), nil
}
