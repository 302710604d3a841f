package tables

import (
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/internal/exact"
)

// A Length is a distance in metres or feet, kept exactly and in its own unit.
// The zero Length is "not given".
type Length struct {
	n     exact.Num
	feet  bool
	given bool
}

// ParseLength reads a length with its unit, m or ft: "42.7 m", "140 ft". An
// error is an [*InputError].
func ParseLength(s string) (Length, error) {
	text := strings.TrimSpace(s)
	for _, unit := range []string{"ft", "m"} {
		if number, ok := strings.CutSuffix(text, unit); ok {
			n, err := exact.Parse(strings.TrimSpace(number))
			if err != nil {
				break
			}
			return Length{n, unit == "ft", true}, nil
		}
	}
	return Length{}, &InputError{Field: "length", Value: clip(s), Want: `metres or feet, such as "42.7 m" or "140 ft"`}
}

// IsZero reports whether l is not given.
func (l Length) IsZero() bool { return !l.given }

// Metres returns the length in metres, exactly: a foot is 0.3048 m.
func (l Length) Metres() decimal.Decimal { return l.metres().Decimal() }

func (l Length) metres() exact.Num {
	if l.feet {
		return l.n.Mul(exact.New(3048, 4))
	}
	return l.n
}

// Figure returns l in metres as a figure of the given name, as the caller's
// input; absent if l is not given.
func (l Length) Figure(name string) Figure {
	if !l.given {
		return Figure{}
	}
	return Figure{value: l.metres(), unit: Metre, name: name, op: Given}
}

// Cmp compares two lengths: -1, 0 or 1.
func (l Length) Cmp(m Length) int { return l.metres().Cmp(m.metres()) }

// Equal reports whether both are the same length, or both not given.
func (l Length) Equal(m Length) bool { return l.given == m.given && l.Cmp(m) == 0 }

// Within reports whether l is given and at most the limit that a code prints in
// feet with metres beside it: each unit is held to its own figure.
func (l Length) Within(feet, tenthsOfMetre int64) bool {
	limit := exact.New(tenthsOfMetre, 1)
	if l.feet {
		limit = exact.Int(feet)
	}
	return l.given && l.n.Cmp(limit) <= 0
}

// String returns number and unit, "" if l is not given.
func (l Length) String() string {
	switch {
	case !l.given:
		return ""
	case l.feet:
		return l.n.String() + " ft"
	}
	return l.n.String() + " m"
}

// MarshalText is [Length.String].
func (l Length) MarshalText() ([]byte, error) { return []byte(l.String()), nil }

// UnmarshalText is [ParseLength]; no text is "not given".
func (l *Length) UnmarshalText(text []byte) error {
	return readOr(l, text, ParseLength)
}
