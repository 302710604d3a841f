package tables

import (
	"encoding/json"
	"slices"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/internal/exact"
)

// An Op tells how a figure came about.
type Op uint8

// The ways in which a figure comes about.
const (
	Given        Op = iota // the caller's input
	Assumed                // a default, or a stand-in that a caution tells of
	Tabulated              // read from a table, at the place that Note names
	Stated                 // printed in the rule itself
	Taken                  // the operand, as the rule takes it for a purpose
	Product                // of the operands; percents count as hundredths
	Sum                    // of the operands
	Difference             // first operand less the second
	QuotientUp             // first operand ÷ the others, rounded up
	QuotientDown           // first operand ÷ the others, rounded down
	Largest                // of the operands
	Smallest               // of the operands
	NextUp                 // the first standard rating at or above the operand
	NextDown               // the highest standard rating not above the operand
	AtLeast                // the operand, raised to a least value that Note names
	Tried                  // found step by step, as the last that stands
	Computed               // by physics, in floating point; the note says how it is rounded
)

var opTexts = [...]string{
	"given", "assumed", "tabulated", "stated", "taken", "product", "sum", "difference", "quotient_rounded_up", "quotient_rounded_down",
	"largest", "smallest", "next_standard_up", "next_standard_down", "at_least", "tried", "computed",
}

// String returns the stable text form.
func (o Op) String() string {
	if int(o) < len(opTexts) {
		return opTexts[o]
	}
	return ""
}

// MarshalText is [Op.String].
func (o Op) MarshalText() ([]byte, error) { return []byte(o.String()), nil }

// A Figure is a number of a result and the way it came about: what it is, its
// value and unit, the operation and operands, and the rule that decided it.
// Words are made only when somebody asks. The zero Figure is "does not apply".
type Figure struct {
	value   exact.Num
	name    string
	note    string
	rule    *Rule
	of      []Figure
	edition Edition
	unit    Unit
	op      Op
	mark    Mark
}

// IsZero reports whether the figure is absent: not asked for or not applicable.
func (f Figure) IsZero() bool { return f.name == "" }

// Name says what the number is, in the trade's words.
func (f Figure) Name() string { return f.name }

// Value returns the number, exactly.
func (f Figure) Value() decimal.Decimal { return f.value.Decimal() }

// Unit returns the unit of the value.
func (f Figure) Unit() Unit { return f.unit }

// Op returns how the figure came about.
func (f Figure) Op() Op { return f.op }

// Note returns the place in a table, or another detail of how; often "".
func (f Figure) Note() string { return f.note }

// Operands returns a copy of the figures that this one was worked out from.
func (f Figure) Operands() []Figure { return slices.Clone(f.of) }

// Citation returns the rule or table that decided this figure; zero for a
// caller's input.
func (f Figure) Citation() Citation { return f.rule.In(f.edition) }

// Citations returns the citation of the figure, then those of its operands and
// theirs, each once.
func (f Figure) Citations() []Citation {
	var all []Citation
	f.walk(func(g Figure) {
		if c := g.Citation(); !c.IsZero() && !slices.Contains(all, c) {
			all = append(all, c)
		}
	})
	return all
}

// Mark returns how sure the figure is: the weakest mark among its own rule or
// table and those of its operands.
func (f Figure) Mark() Mark { return f.mark }

// FromMemory returns the citations of mark C that the figure rests on, each
// once: what nobody has yet held against a readable copy.
func (f Figure) FromMemory() []Citation {
	if f.mark != MarkC {
		return nil
	}
	var all []Citation
	f.walk(func(g Figure) {
		if g.rule == nil || g.rule.Mark != MarkC {
			return
		}
		if c := g.Citation(); !slices.Contains(all, c) {
			all = append(all, c)
		}
	})
	return all
}

func (f Figure) walk(visit func(Figure)) {
	visit(f)
	for _, g := range f.of {
		g.walk(visit)
	}
}

// Cmp compares the values: -1, 0 or 1.
func (f Figure) Cmp(g Figure) int { return f.value.Cmp(g.value) }

// Text returns the value alone, as a plain decimal; "" for the zero Figure.
func (f Figure) Text() string {
	if f.IsZero() {
		return ""
	}
	return f.value.String()
}

// String returns value and unit, such as "81.25 A"; "" for the zero Figure.
func (f Figure) String() string {
	if f.IsZero() {
		return ""
	}
	return withUnit(f.value, f.unit)
}

// How says in one line how the figure came about, such as
// "design current 65 A × 125 %".
func (f Figure) How() string {
	var b strings.Builder
	list := func(before, between string, of []Figure) {
		b.WriteString(before)
		for i, g := range of {
			if i > 0 {
				b.WriteString(between)
			}
			b.WriteString(g.asOperand())
		}
	}
	switch f.op {
	case Given:
		b.WriteString("as given")
	case Assumed:
		list("assumed from ", ", ", f.of)
	case Tabulated:
		b.WriteString("from the table")
	case Stated:
		b.WriteString("as the rule says")
	case Taken:
		list("the ", "", f.of)
	case Product:
		list("", " × ", f.of)
	case Sum:
		list("", " + ", f.of)
	case Difference:
		list("", " − ", f.of)
	case QuotientUp, QuotientDown:
		list("", " ÷ ", f.of)
	case Largest:
		list("the largest of ", ", ", f.of)
	case Smallest:
		list("the smallest of ", ", ", f.of)
	case NextUp:
		list("the first standard rating at or above ", "", f.of[:1])
	case NextDown:
		list("the highest standard rating not above ", "", f.of[:1])
	case AtLeast:
		list("raised from ", ", ", f.of)
	case Tried:
		b.WriteString("found step by step")
	case Computed:
		list("computed from ", ", ", f.of)
	}
	if f.note != "" {
		b.WriteString(", " + f.note)
	}
	return b.String()
}

// asOperand words a figure inside of another's How: currents and temperatures
// by name, percents and factors by what they are for.
func (f Figure) asOperand() string {
	switch {
	case f.unit == Percent && f.note != "":
		return f.String() + " (" + f.note + ")"
	case f.unit == Plain && f.op == Tabulated:
		return f.String() + " (" + f.name + ")"
	case f.unit == Percent || f.unit == Plain || f.unit == KVAPerHorsepower:
		return f.String()
	}
	return f.name + " " + f.String()
}

// MarshalJSON writes name, value (a string, so that no reader rounds it), unit,
// op, how and the citations.
func (f Figure) MarshalJSON() ([]byte, error) {
	if f.IsZero() {
		return []byte("null"), nil
	}
	return json.Marshal(struct {
		Name  string     `json:"name"`
		Value string     `json:"value"`
		Unit  Unit       `json:"unit,omitzero"`
		Op    Op         `json:"op"`
		How   string     `json:"how"`
		Cites []Citation `json:"cites,omitempty"`
	}{f.name, f.Text(), f.unit, f.op, f.How(), f.Citations()})
}
