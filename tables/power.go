package tables

import (
	"math/bits"
	"strconv"
	"strings"

	"example.org/motorcircuit/internal/exact"
)

// A Power is a motor's rated output in horsepower or kilowatts, kept exactly
// (1/3 hp is a third) and in its own unit: it is never converted to pick a
// table row. The zero Power is "not given". Powers of one number and unit are ==.
type Power struct {
	num, den int64 // lowest terms; den 0 is not given
	kw       bool
}

// ParsePower reads a power with its unit, hp or kW, as the trade writes it:
// "40 hp", "7-1/2 hp", "1/3 hp", "0.5 hp", "30 kW". An error is an [*InputError].
func ParsePower(s string) (Power, error) {
	text := strings.TrimSpace(s)
	if cut := len(text) - 2; cut > 0 {
		switch unit := text[cut:]; {
		case strings.EqualFold(unit, "hp"):
			return parsePower(s, text[:cut], false)
		case strings.EqualFold(unit, "kw"):
			return parsePower(s, text[:cut], true)
		}
	}
	return Power{}, powerError(s)
}

// ParseHP reads a number of horsepower: "40", "7-1/2", "1/3", "0.5".
func ParseHP(s string) (Power, error) { return parsePower(s, s, false) }

// ParseKW reads a number of kilowatts: "30", "0.37".
func ParseKW(s string) (Power, error) { return parsePower(s, s, true) }

func powerError(s string) error {
	return &InputError{Field: "power", Value: clip(s), Want: `horsepower or kilowatts above 0, such as "40 hp", "7-1/2 hp" or "30 kW"`}
}

// parsePower reads "7", "7.5", "1/2", "7-1/2" and "7 1/2".
func parsePower(all, number string, kw bool) (Power, error) {
	number = strings.TrimSpace(number)
	frac := ""
	if strings.Contains(number, "/") {
		if i := strings.IndexAny(number, "- "); i >= 0 {
			number, frac = number[:i], strings.TrimSpace(number[i+1:])
		} else {
			number, frac = "0", number
		}
		if strings.Contains(number, ".") {
			return Power{}, powerError(all)
		}
	}
	n, err := exact.Parse(number)
	if err != nil {
		return Power{}, powerError(all)
	}
	p := Power{num: 0, den: 1_000_000, kw: kw}
	p.num = n.Mul(exact.Int(p.den)).Decimal().IntPart()
	if frac != "" {
		over, under, ok := strings.Cut(frac, "/")
		a, errA := strconv.ParseUint(over, 10, 8)
		b, errB := strconv.ParseUint(under, 10, 8)
		if !ok || errA != nil || errB != nil || a == 0 || a >= b {
			return Power{}, powerError(all)
		}
		p.num = p.num/p.den*int64(b) + int64(a)
		p.den = int64(b)
	}
	if p.num == 0 {
		return Power{}, powerError(all)
	}
	for a, b := p.num, p.den; ; a, b = b, a%b {
		if b == 0 {
			p.num, p.den = p.num/a, p.den/a
			return p, nil
		}
	}
}

// IsZero reports whether p is not given.
func (p Power) IsZero() bool { return p.den == 0 }

// IsHP reports whether p is given in horsepower.
func (p Power) IsHP() bool { return p.den != 0 && !p.kw }

// Unit returns [Horsepower] or [Kilowatt].
func (p Power) Unit() Unit {
	if p.kw {
		return Kilowatt
	}
	return Horsepower
}

// Cmp compares two powers of one unit: -1, 0 or 1. It does not convert.
func (p Power) Cmp(q Power) int {
	// p.num/p.den ? q.num/q.den, with 128-bit products.
	h1, l1 := bits.Mul64(uint64(p.num), uint64(max(q.den, 1)))
	h2, l2 := bits.Mul64(uint64(q.num), uint64(max(p.den, 1)))
	switch {
	case h1 < h2 || h1 == h2 && l1 < l2:
		return -1
	case h1 > h2 || l1 > l2:
		return 1
	}
	return 0
}

// AtMost reports whether p is at most n of its unit.
func (p Power) AtMost(n int64) bool { return p.Cmp(Power{num: n, den: 1}) <= 0 }

// Text returns the number alone as the trade writes it: "7-1/2", "1/3", "40";
// kilowatts as a decimal.
func (p Power) Text() string {
	switch {
	case p.den == 0:
		return ""
	case p.den == 1:
		return strconv.FormatInt(p.num, 10)
	case p.den <= 16 && !p.kw || 1_000_000%p.den != 0:
		s := strconv.FormatInt(p.num%p.den, 10) + "/" + strconv.FormatInt(p.den, 10)
		if whole := p.num / p.den; whole > 0 {
			s = strconv.FormatInt(whole, 10) + "-" + s
		}
		return s
	}
	return exact.New(p.num*(1_000_000/p.den), 6).String()
}

// String returns number and unit: "7-1/2 hp", "30 kW".
func (p Power) String() string {
	if p.den == 0 {
		return ""
	}
	return p.Text() + " " + p.Unit().String()
}

// Figure returns p as a figure of the given name, as the caller's input; absent if
// p is not given. A fraction that is no decimal, such as 1/3, is rounded down to
// six places, and a note says so.
func (p Power) Figure(name string) Figure {
	if p.den == 0 {
		return Figure{}
	}
	f := newFigure(name, Given, 0, nil, exact.Int(p.num).DivDown(exact.Int(p.den), 6), p.Unit())
	if 1_000_000%p.den != 0 {
		f = f.WithNote(p.String() + ", rounded down to six places")
	}
	return f
}

// MarshalText is [Power.String].
func (p Power) MarshalText() ([]byte, error) { return []byte(p.String()), nil }

// UnmarshalText is [ParsePower]; no text is "not given".
func (p *Power) UnmarshalText(text []byte) error {
	return readOr(p, text, ParsePower)
}
