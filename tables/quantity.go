package tables

import (
	"errors"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/internal/exact"
)

// A Quantity is an exact number of one unit. The zero Quantity is "not given",
// which is not the same as 0: an ambient that is not given is not 0 °C.
// Quantities are compared with Cmp or Equal.
type Quantity[U measure] struct {
	n     exact.Num
	given bool
}

// The quantities of the library. Each is read from a plain decimal, with or
// without its unit: "10.4" or "10.4 A".
type (
	Current     = Quantity[ampere]  // in amperes
	Temperature = Quantity[celsius] // in degrees Celsius; may be negative
	Ratio       = Quantity[ratio]   // a factor, such as a service or power factor
)

// A measure says what a Quantity is of.
type measure interface {
	unit() Unit
	article() string
}

type (
	ampere  struct{}
	celsius struct{}
	ratio   struct{}
)

func (ampere) unit() Unit       { return Ampere }
func (ampere) article() string  { return "amperes" }
func (celsius) unit() Unit      { return Celsius }
func (celsius) article() string { return "degrees Celsius" }
func (ratio) unit() Unit        { return Plain }
func (ratio) article() string   { return "ratio" }

// ParseCurrent reads amperes: "65", "7.6" or "7.6 A".
func ParseCurrent(s string) (Current, error) { return parseQuantity[ampere](s) }

// ParseTemperature reads degrees Celsius: "40", "-5" or "40 °C".
func ParseTemperature(s string) (Temperature, error) { return parseQuantity[celsius](s) }

// ParseRatio reads a factor: "1.15" or "0.9".
func ParseRatio(s string) (Ratio, error) { return parseQuantity[ratio](s) }

// Must returns q, and panics on an error: for constants, where an error is a
// typing slip.
func Must[T any](q T, err error) T {
	if err != nil {
		panic(err)
	}
	return q
}

func parseQuantity[U measure](s string) (Quantity[U], error) {
	var u U
	text, negative := strings.TrimSpace(s), false
	if u.unit() != Plain {
		text = strings.TrimSpace(strings.TrimSuffix(text, u.unit().String()))
	}
	if u.unit() == Celsius {
		text, negative = strings.CutPrefix(text, "-")
	}
	n, err := exact.Parse(text)
	if err != nil {
		want := "a plain decimal in " + u.article()
		if u.unit() == Plain {
			want = "a plain decimal such as 0.93"
		}
		if !errors.Is(err, exact.ErrSyntax) {
			want += ", with at most nine digits before the point and six after"
		}
		return Quantity[U]{}, &InputError{Field: u.article(), Value: clip(s), Want: want}
	}
	if negative {
		n = n.Mul(exact.Int(-1))
	}
	return Quantity[U]{n, true}, nil
}

// IsZero reports whether q is not given.
func (q Quantity[U]) IsZero() bool { return !q.given }

// Decimal returns the number, 0 if q is not given.
func (q Quantity[U]) Decimal() decimal.Decimal { return q.n.Decimal() }

// Cmp compares the numbers of q and r: -1, 0 or 1.
func (q Quantity[U]) Cmp(r Quantity[U]) int { return q.n.Cmp(r.n) }

// Equal reports whether both are the same number, or both not given.
func (q Quantity[U]) Equal(r Quantity[U]) bool { return q.given == r.given && q.Cmp(r) == 0 }

// String returns number and unit, "" if q is not given.
func (q Quantity[U]) String() string {
	if !q.given {
		return ""
	}
	var u U
	return withUnit(q.n, u.unit())
}

// CurrentAtMost returns a figure in amperes as a quantity of at most six places,
// which can be written and read, rounded down; not given for an absent figure.
func CurrentAtMost(f Figure) Current { return currentOf(f, exact.Num.DivDown) }

// CurrentAtLeast is [CurrentAtMost] rounded up.
func CurrentAtLeast(f Figure) Current { return currentOf(f, exact.Num.DivUp) }

func currentOf(f Figure, round func(n, by exact.Num, places int32) exact.Num) Current {
	if f.IsZero() {
		return Current{}
	}
	return Current{round(f.value, exact.Int(1), 6), true}
}

// TemperatureOf returns a figure in degrees Celsius as a quantity; not given for
// an absent figure.
func TemperatureOf(f Figure) Temperature { return Temperature{f.value, !f.IsZero()} }

// Figure returns q as a figure of the given name, as the caller's input.
func (q Quantity[U]) Figure(name string) Figure {
	var u U
	if !q.given {
		return Figure{}
	}
	return Figure{value: q.n, unit: u.unit(), name: name, op: Given}
}

// PercentFigure returns a number of percent as a figure of the given name, as the
// caller's input; absent if it is not given.
func PercentFigure(name string, percent Ratio) Figure {
	f := percent.Figure(name)
	if !f.IsZero() {
		f.unit = Percent
	}
	return f
}

// MarshalText is [Quantity.String].
func (q Quantity[U]) MarshalText() ([]byte, error) { return []byte(q.String()), nil }

// UnmarshalText reads what MarshalText writes; no text is "not given".
func (q *Quantity[U]) UnmarshalText(text []byte) error {
	return readOr(q, text, parseQuantity[U])
}

func withUnit(n exact.Num, u Unit) string {
	b := n.Append(make([]byte, 0, 32))
	if u != Plain {
		b = append(append(b, ' '), u.String()...)
	}
	return string(b)
}
