package tables

import (
	"fmt"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

var codeLetterRule = Rule{Ref: "Table 430.7(B)"}

type codeLetter struct{ low, high int64 } // hundredths of kVA/hp, high -1 for none

var codeLetters = loaded(func() (map[string]codeLetter, error) {
	g, err := open("nec/motor_code_letter.csv")
	if err != nil {
		return nil, err
	}
	letters := make(map[string]codeLetter, len(g.Rows))
	for row, cells := range g.Rows {
		var l codeLetter
		if l.low, err = g.Hundredths(row, 1); err != nil {
			return nil, err
		}
		if l.high, err = g.Hundredths(row, 2); err != nil {
			return nil, err
		}
		letters[cells[0]] = l
	}
	return letters, nil
})

// LockedRotorKVA returns the ends of a code letter's range of locked-rotor kVA
// per horsepower, as printed in Table 430.7(B). High is absent for letter V,
// which has no upper end. Letters I, O and Q are not in use. The CEC has no such
// table: a [*NotTabulatedError].
func (e Edition) LockedRotorKVA(letter string) (low, high Figure, err error) {
	if err := e.Check(); err != nil {
		return Figure{}, Figure{}, err
	}
	if e.Code() != NEC {
		return Figure{}, Figure{}, &NotTabulatedError{Field: "motor.nameplate.code_letter", Table: Citation{Edition: e, Ref: "Section 28"},
			Row: "table of code letters", Covers: "marked locked-rotor amperes, and six times full-load current"}
	}
	l, ok := codeLetters()[strings.ToUpper(letter)]
	if !ok {
		return Figure{}, Figure{}, &InputError{Field: "motor.nameplate.code_letter", Value: clip(letter),
			Want: "a letter from A to V, other than I, O and Q", Cite: codeLetterRule.In(e)}
	}
	low = newFigure("locked-rotor kVA per horsepower, low end", Tabulated, e, &codeLetterRule, exact.New(l.low, 2), KVAPerHorsepower)
	if l.high >= 0 {
		high = newFigure("locked-rotor kVA per horsepower, high end", Tabulated, e, &codeLetterRule, exact.New(l.high, 2), KVAPerHorsepower)
	}
	return low, high, nil
}

// LockedRotorOf turns locked-rotor kVA per horsepower into amperes at the rated
// voltage: kVA/hp × hp × 1000 ÷ volts, ÷ 1.732 for three phases or ÷ 2 for two.
// The low end is rounded down to 0.01 A, the high end up. It is absent for a
// power that is not in horsepower and for no voltage.
func (e Edition) LockedRotorOf(kva Figure, p Power, volts, phases int, up bool) Figure {
	if !p.IsHP() || volts <= 0 {
		return Figure{}
	}
	over := kva.value.Mul(exact.Int(p.num)).Mul(exact.Int(1000))
	under := exact.Int(p.den).Mul(exact.Int(int64(volts)))
	note := fmt.Sprintf("times %v, times 1000, over %d V", p, volts)
	switch phases {
	case 3:
		under = under.Mul(exact.New(1732, 3))
		note += " and 1.732"
	case 2:
		under = under.Mul(exact.Int(2))
		note += " and 2"
	}
	op, value := QuotientDown, exact.Num{}
	if up {
		op, value = QuotientUp, over.DivUp(under, 2)
		note += ", rounded up to 0.01 A"
	} else {
		value = over.DivDown(under, 2)
		note += ", rounded down to 0.01 A"
	}
	return newFigure("locked-rotor current", op, e, &codeLetterRule, value, Ampere, kva).WithNote(note)
}
