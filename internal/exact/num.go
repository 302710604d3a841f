// Package exact is the arithmetic of the library: decimal numbers without
// rounding and without allocation in the ordinary range. A Num is an int64
// coefficient with a count of decimal places; where a result does not fit, it
// carries on with shopspring/decimal, so no answer depends on the range.
package exact

import (
	"math/bits"

	"github.com/shopspring/decimal"
)

// A Num is coef × 10^-places, or big where that does not fit. The zero Num is 0.
// Every Num is kept in lowest terms (no trailing zeros after the point), so
// equal numbers of the ordinary range have equal representations.
type Num struct {
	coef   int64
	places uint8
	big    *decimal.Decimal
}

// maxPlaces bounds the places kept in the ordinary representation.
const maxPlaces = 18

var pow10 = [maxPlaces + 1]int64{
	1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18,
}

// New returns coef × 10^-places.
func New(coef int64, places int) Num {
	if places < 0 || places > maxPlaces {
		return fromDecimal(decimal.New(coef, int32(-places)))
	}
	return lowest(coef, uint8(places))
}

// Int returns i.
func Int(i int64) Num { return Num{coef: i} }

func lowest(coef int64, places uint8) Num {
	for places > 0 && coef%10 == 0 {
		coef /= 10
		places--
	}
	return Num{coef: coef, places: places}
}

// fromDecimal takes d back to the ordinary representation where it fits.
func fromDecimal(d decimal.Decimal) Num {
	c, exp := d.Coefficient(), d.Exponent()
	if c.IsInt64() && exp <= 0 && exp >= -maxPlaces {
		return lowest(c.Int64(), uint8(-exp))
	}
	if r := d.Truncate(maxPlaces); exp < -maxPlaces && r.Equal(d) && r.Coefficient().IsInt64() {
		return lowest(r.Coefficient().Int64(), maxPlaces)
	}
	return Num{big: &d}
}

// Decimal returns n as a decimal.
func (n Num) Decimal() decimal.Decimal {
	if n.big != nil {
		return *n.big
	}
	return decimal.New(n.coef, -int32(n.places))
}

// String returns n as a plain decimal without trailing zeros.
func (n Num) String() string { return string(n.Append(make([]byte, 0, 24))) }

// Append appends the text of n to b.
func (n Num) Append(b []byte) []byte {
	if n.big != nil {
		return append(b, n.big.String()...)
	}
	var buf [24]byte
	i, u := len(buf), magnitude(n.coef)
	for p := n.places; u > 0 || p > 0 || i == len(buf); {
		i--
		buf[i] = byte('0' + u%10)
		u /= 10
		if p > 0 {
			if p--; p == 0 {
				i--
				buf[i] = '.'
				if u == 0 {
					i--
					buf[i] = '0'
				}
			}
		}
	}
	if n.coef < 0 {
		i--
		buf[i] = '-'
	}
	return append(b, buf[i:]...)
}

func magnitude(c int64) uint64 {
	if c < 0 {
		return -uint64(c)
	}
	return uint64(c)
}

// Sign returns -1, 0 or 1.
func (n Num) Sign() int {
	switch {
	case n.big != nil:
		return n.big.Sign()
	case n.coef < 0:
		return -1
	case n.coef > 0:
		return 1
	}
	return 0
}

// IsZero reports whether n is 0.
func (n Num) IsZero() bool { return n.Sign() == 0 }

// aligned brings both coefficients to one count of places.
func aligned(a, b Num) (x, y int64, places uint8, ok bool) {
	if a.big != nil || b.big != nil {
		return 0, 0, 0, false
	}
	x, y, places = a.coef, b.coef, max(a.places, b.places)
	if x, ok = mul64(x, pow10[places-a.places]); !ok {
		return 0, 0, 0, false
	}
	y, ok = mul64(y, pow10[places-b.places])
	return x, y, places, ok
}

func mul64(a, b int64) (int64, bool) {
	hi, lo := bits.Mul64(magnitude(a), magnitude(b))
	if hi != 0 || lo > 1<<63-1 {
		return 0, false
	}
	if (a < 0) != (b < 0) {
		return -int64(lo), true
	}
	return int64(lo), true
}

// Add returns n + m, exactly.
func (n Num) Add(m Num) Num {
	if x, y, places, ok := aligned(n, m); ok {
		if sum := x + y; (sum > x) == (y > 0) {
			return lowest(sum, places)
		}
	}
	return fromDecimal(n.Decimal().Add(m.Decimal()))
}

// Mul returns n × m, exactly.
func (n Num) Mul(m Num) Num {
	if n.big == nil && m.big == nil && n.places+m.places <= maxPlaces {
		if p, ok := mul64(n.coef, m.coef); ok {
			return lowest(p, n.places+m.places)
		}
	}
	return fromDecimal(n.Decimal().Mul(m.Decimal()))
}

// DivUp returns the least number of the given places that is not below n ÷ m.
// It panics if m is 0.
func (n Num) DivUp(m Num, places int32) Num {
	q, r := n.Decimal().QuoRem(m.Decimal(), places)
	if r.Sign() != 0 && r.Sign() == m.Sign() {
		q = q.Add(decimal.New(1, -places))
	}
	return fromDecimal(q)
}

// DivDown returns the greatest number of the given places that is not above
// n ÷ m, for n and m of one sign. It panics if m is 0.
func (n Num) DivDown(m Num, places int32) Num {
	q, _ := n.Decimal().QuoRem(m.Decimal(), places)
	return fromDecimal(q)
}

// Cmp compares n with m: -1, 0 or 1.
func (n Num) Cmp(m Num) int {
	x, y, _, ok := aligned(n, m)
	switch {
	case !ok:
		return n.Decimal().Cmp(m.Decimal())
	case x < y:
		return -1
	case x > y:
		return 1
	}
	return 0
}

// HundredthsUp returns n in hundredths, rounded up, and at most 1<<53: a key
// for searching a printed table for the first entry not below n.
func (n Num) HundredthsUp() int64 {
	const most = 1 << 53
	if n.big != nil {
		h := n.big.Shift(2).Ceil()
		if h.GreaterThan(decimal.New(most, 0)) {
			return most
		}
		return h.IntPart()
	}
	if n.places <= 2 {
		if h, ok := mul64(n.coef, pow10[2-n.places]); ok {
			return min(h, most)
		}
		return most
	}
	d := pow10[n.places-2]
	h := n.coef / d
	if n.coef%d > 0 {
		h++
	}
	return min(h, most)
}
