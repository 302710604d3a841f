package tables

import (
	"fmt"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// A ResistorDuty is the duty of resistors that stand apart from a controller:
// in the secondary of a wound rotor, or for accelerating or braking a
// direct-current motor. The zero ResistorDuty is "no such resistor".
type ResistorDuty uint8

// The duties, by seconds on and off.
const (
	LightStarting      ResistorDuty = iota + 1 // 5 on, 75 off
	HeavyStarting                              // 10 on, 70 off
	ExtraHeavyStarting                         // 15 on, 75 off
	LightIntermittent                          // 15 on, 45 off
	MediumIntermittent                         // 15 on, 30 off
	HeavyIntermittent                          // 15 on, 15 off
	ContinuousResistor                         // continuous duty
	resistorDutyCount
)

var resistorTexts = [...]string{"", "light_starting", "heavy_starting", "extra_heavy_starting", "light_intermittent",
	"medium_intermittent", "heavy_intermittent", "continuous"}

// String returns the stable text form, "" for no resistor.
func (d ResistorDuty) String() string { return TextOf(d, resistorTexts[:]) }

// MarshalText is [ResistorDuty.String].
func (d ResistorDuty) MarshalText() ([]byte, error) { return []byte(d.String()), nil }

// UnmarshalText reads the text form; no text is no resistor.
func (d *ResistorDuty) UnmarshalText(text []byte) error {
	return ReadText(d, "motor.resistor", text, resistorTexts[:])
}

// IsValid reports whether d is one of the duties.
func (d ResistorDuty) IsValid() bool { return d > 0 && d < resistorDutyCount }

// ResistorPercent returns the percent of secondary current (wound rotor: NEC
// Table 430.23(C), CEC Table 28) or of full-load current (direct current: NEC
// Table 430.29) for which the conductors to a resistor are chosen. The CEC has
// no table for direct current: a [*NotTabulatedError].
func (e Edition) ResistorPercent(dc bool, d ResistorDuty) (Figure, error) {
	if err := e.Check(); err != nil {
		return Figure{}, err
	}
	load := e.book().secondaryResistor
	if dc {
		load = e.book().dcResistor
	}
	if load == nil {
		return Figure{}, &NotTabulatedError{Field: "motor.resistor", Table: Citation{Edition: e, Ref: "Section 28"}, Row: "table of direct-current resistors", Covers: "secondary resistors of wound-rotor motors"}
	}
	t := load()
	if !d.IsValid() {
		return Figure{}, &InputError{Field: "motor.resistor", Value: fmt.Sprint(uint8(d)), Want: "one of " + strings.Join(resistorTexts[1:], ", "), Cite: t.rule.In(e)}
	}
	return newFigure("resistor duty", Tabulated, e, t.rule, exact.New(t.percent[d], 2), Percent).WithNote(t.notes[d]), nil
}

type resistorTable struct {
	rule    *Rule
	percent [resistorDutyCount]int64
	notes   [resistorDutyCount]string
}

// loadResistors reads one row a duty, in their order; the percent stands last.
func loadResistors(path string, rule *Rule) func() *resistorTable {
	return loaded(func() (*resistorTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		if len(g.Rows) != int(resistorDutyCount)-1 {
			return nil, fmt.Errorf("%s: %d rows", path, len(g.Rows))
		}
		t := &resistorTable{rule: rule}
		for row := range g.Rows {
			d := row + 1
			if t.percent[d], err = g.Hundredths(row, len(g.Header)-1); err != nil {
				return nil, err
			}
			if d > 1 && t.percent[d] <= t.percent[d-1] {
				return nil, fmt.Errorf("%s: row %d is out of order", path, d)
			}
			t.notes[d] = strings.ReplaceAll(resistorTexts[d], "_", " ") + " duty"
		}
		return t, nil
	})
}
