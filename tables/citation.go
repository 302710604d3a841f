package tables

// A Citation names the printed text that decided a number: an edition of a
// code and a rule or table of it.
type Citation struct {
	Edition Edition // zero for what no code says
	Ref     string  // "430.22", "Table 430.250", "Rule 28-106(1)"
	Note    string  // what a reader should know of the reading, often ""
}

// IsZero reports whether c names nothing.
func (c Citation) IsZero() bool { return c == Citation{} }

// String prints the citation the way the trade writes it, such as
// "NFPA 70-2023 430.52(C)(1)(a)" or "CSA C22.1:21 Rule 28-106(1)".
func (c Citation) String() string {
	s := c.Ref
	if c.Edition != 0 {
		s = c.Edition.Standard() + " " + s
	}
	if c.Note != "" {
		s += " (" + c.Note + ")"
	}
	return s
}

// MarshalText is [Citation.String].
func (c Citation) MarshalText() ([]byte, error) { return []byte(c.String()), nil }

// A Mark tells how sure a value or rule is.
type Mark uint8

// The marks, surest first.
const (
	MarkA Mark = iota // two or more independent public copies agree
	MarkB             // one public copy, consistent with memory or arithmetic
	MarkC             // from memory only; a figure built on it carries a caution
)

// String returns the letter of the mark.
func (m Mark) String() string { return string(rune('A' + m)) }

// A Rule is one rule or table of a code, with its number in each edition that
// numbers it otherwise. Rules are package data and never change.
type Rule struct {
	Ref   string
	Moved []Move // later numbers, oldest edition first
	Mark  Mark
	Note  string

	Outside bool // not of the edition itself: physics, or a table of another code
}

// A Move is the number that a rule has from an edition on.
type Move struct {
	From Edition
	Ref  string
}

// In returns the citation of the rule in edition e.
func (r *Rule) In(e Edition) Citation {
	if r == nil {
		return Citation{}
	}
	c := Citation{Edition: e, Ref: r.Ref, Note: r.Note}
	if r.Outside {
		c.Edition = 0
	}
	for _, m := range r.Moved {
		if e >= m.From {
			c.Ref = m.Ref
		}
	}
	return c
}
