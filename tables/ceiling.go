package tables

import (
	"fmt"

	"example.org/motorcircuit/internal/exact"
)

// A Ceiling is one of the higher limits that a short-circuit device may be
// raised to if the motor will not start. It holds for device ratings above Over
// and up to UpTo, where those are given.
type Ceiling struct {
	Percent    Figure
	Over, UpTo Figure // ratings in amperes; absent for no bound
}

// StartCeilings returns the ceilings for a kind of device and a full-load
// current, lowest ratings first: NEC 430.52(C)(1), CEC Rule 28-200(4). It is
// empty for instantaneous breakers, which have rules of their own.
func (e Edition) StartCeilings(d Device, current Figure) []Ceiling {
	if !e.IsValid() {
		return nil
	}
	var found []Ceiling
	t := e.book().ceilings()
	for _, r := range t.rows {
		if r.device != d || !r.flcOver.IsZero() && current.value.Cmp(r.flcOver) <= 0 || !r.flcTo.IsZero() && current.value.Cmp(r.flcTo) > 0 {
			continue
		}
		c := Ceiling{Percent: newFigure("ceiling if the motor will not start", Stated, e, t.rule, r.percent, Percent).WithNote(r.note)}
		if !r.over.IsZero() {
			c.Over = newFigure("device ratings over", Stated, e, t.rule, r.over, Ampere)
		}
		if !r.upTo.IsZero() {
			c.UpTo = newFigure("device ratings up to", Stated, e, t.rule, r.upTo, Ampere)
		}
		found = append(found, c)
	}
	return found
}

type ceilingTable struct {
	rule *Rule
	rows []ceilingRow
}

type ceilingRow struct {
	device                     Device
	flcOver, flcTo, over, upTo exact.Num
	percent                    exact.Num
	note                       string
}

func loadCeilings(path string, rule *Rule) func() *ceilingTable {
	return loaded(func() (*ceilingTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &ceilingTable{rule: rule}
		for row, cells := range g.Rows {
			var r ceilingRow
			if err := ReadText(&r.device, path, []byte(cells[0]), deviceTexts[:]); err != nil {
				return nil, err
			}
			for col, head := range g.Header[1:] {
				h, err := g.Hundredths(row, col+1)
				if err != nil {
					return nil, err
				}
				if h < 0 {
					continue
				}
				n := exact.New(h, 2)
				switch head {
				case "flc_over_a":
					r.flcOver, r.note = n, "full-load current over "+cells[col+1]+" A"
				case "flc_to_a":
					r.flcTo, r.note = n, "full-load current of "+cells[col+1]+" A or less"
				case "device_rating_from_a":
					// Printed as the first rating of the class: above the one before it.
					r.over, r.note = n.Add(exact.Int(-1)), "device rated "+cells[col+1]+" A or more"
				case "device_rating_to_a":
					r.upTo, r.note = n, "device rated "+cells[col+1]+" A or less"
				case "max_pct_of_flc":
					r.percent = n
				default:
					return nil, fmt.Errorf("%s: unknown column %q", path, head)
				}
			}
			t.rows = append(t.rows, r)
		}
		return t, nil
	})
}

// InstantaneousCaps returns what the CEC, Rule 28-210, allows an
// instantaneous-trip breaker: percents of full-load and of locked-rotor
// current, and a least setting that need not be gone below. Absent figures do
// not apply; all are absent under the NEC, whose percents stand in its table. A
// direct-current motor of which no horsepower is known takes the lower limit, of large motors.
func (e Edition) InstantaneousCaps(dc bool, p Power) (ofFullLoad, ofLockedRotor, floor Figure) {
	if !e.IsValid() || e.book().instantaneous == nil {
		return
	}
	t := e.book().instantaneous()
	for _, r := range t.rows {
		if r.dc != dc || r.hpTo > 0 && !(p.IsHP() && p.AtMost(r.hpTo)) || r.hpOver > 0 && p.IsHP() && p.AtMost(r.hpOver) {
			continue
		}
		ofFullLoad = newFigure("instantaneous-trip limit, of full-load current", Stated, e, t.rule, r.ofFullLoad, Percent)
		if !r.ofLockedRotor.IsZero() {
			ofLockedRotor = newFigure("instantaneous-trip limit, of locked-rotor current", Stated, e, t.rule, r.ofLockedRotor, Percent)
		}
		if !r.floor.IsZero() {
			floor = newFigure("least setting that need not be gone below", Stated, e, t.rule, r.floor, Ampere)
		}
		return
	}
	return
}

type instantaneousTable struct {
	rule *Rule
	rows []instantaneousRow
}

type instantaneousRow struct {
	dc                               bool
	hpOver, hpTo                     int64
	ofFullLoad, ofLockedRotor, floor exact.Num
}

func loadInstantaneous(path string, rule *Rule) func() *instantaneousTable {
	return loaded(func() (*instantaneousTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &instantaneousTable{rule: rule}
		for row, cells := range g.Rows {
			r := instantaneousRow{dc: cells[0] == "dc"}
			for col := 1; col < len(cells); col++ {
				h, err := g.Hundredths(row, col)
				if err != nil {
					return nil, err
				}
				n := exact.New(max(h, 0), 2)
				switch g.Header[col] {
				case "power_hp_from_exclusive":
					r.hpOver = max(h, 0) / 100
				case "power_hp_to_inclusive":
					r.hpTo = max(h, 0) / 100
				case "max_pct_of_flc":
					r.ofFullLoad = n
				case "max_pct_of_locked_rotor_current":
					r.ofLockedRotor = n
				case "floor_a":
					r.floor = n
				default:
					return nil, fmt.Errorf("%s: unknown column %q", path, g.Header[col])
				}
			}
			t.rows = append(t.rows, r)
		}
		return t, nil
	})
}
