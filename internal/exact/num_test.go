package exact_test

import (
	"math/rand/v2"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/exact"
)

// TestAgainstDecimal holds every operation against shopspring/decimal, over
// numbers inside and outside of the ordinary range.
func TestAgainstDecimal(t *testing.T) {
	rnd := rand.New(rand.NewPCG(1, 2))
	pick := func() (exact.Num, decimal.Decimal) {
		coef := rnd.Int64() >> rnd.UintN(63)
		if rnd.UintN(3) == 0 {
			coef = -coef
		}
		if rnd.UintN(9) == 0 {
			coef *= 1000
		}
		places := rnd.IntN(22) - 2
		return exact.New(coef, places), decimal.New(coef, int32(-places))
	}
	for range 200_000 {
		a, da := pick()
		b, db := pick()
		require.True(t, a.Decimal().Equal(da), "%v", da)
		require.True(t, a.Add(b).Decimal().Equal(da.Add(db)), "%v + %v = %v", da, db, a.Add(b))
		require.True(t, a.Mul(b).Decimal().Equal(da.Mul(db)), "%v × %v = %v", da, db, a.Mul(b))
		require.Equal(t, da.Cmp(db), a.Cmp(b), "%v ? %v", da, db)
		require.Equal(t, da.Sign(), a.Sign())
		require.Equal(t, da.String(), a.String())
		if up := da.Shift(2).Ceil(); up.LessThan(decimal.New(1<<53, 0)) && up.GreaterThan(decimal.New(-1<<53, 0)) {
			require.Equal(t, up.IntPart(), a.HundredthsUp(), "%v", da)
		}
		if da.Sign() > 0 && db.Sign() > 0 {
			down, up := a.DivDown(b, 4).Decimal(), a.DivUp(b, 4).Decimal()
			require.True(t, down.Mul(db).LessThanOrEqual(da), "%v / %v down %v", da, db, down)
			require.True(t, up.Mul(db).GreaterThanOrEqual(da), "%v / %v up %v", da, db, up)
			require.True(t, up.Sub(down).LessThanOrEqual(decimal.New(1, -4)))
		}
	}
}

func TestParse(t *testing.T) {
	for _, tt := range []struct{ in, want string }{
		{"65", "65"}, {"7.6", "7.6"}, {"0", "0"}, {"007.50", "7.5"}, {".5", "0.5"}, {"0.000001", "0.000001"},
		{"999999999.999999", "999999999.999999"}, {"100", "100"},
	} {
		n, err := exact.Parse(tt.in)
		require.NoError(t, err, tt.in)
		assert.Equal(t, tt.want, n.String())
	}
	for in, want := range map[string]error{
		"": exact.ErrSyntax, ".": exact.ErrSyntax, "65.": exact.ErrSyntax, "-1": exact.ErrSyntax, "+1": exact.ErrSyntax,
		"1e9": exact.ErrSyntax, "1,5": exact.ErrSyntax, "٥": exact.ErrSyntax, " 1": exact.ErrSyntax, "1.2.3": exact.ErrSyntax,
		"0.0000001": exact.ErrPlaces, "1234567890": exact.ErrLarge,
	} {
		n, err := exact.Parse(in)
		assert.ErrorIs(t, err, want, in)
		assert.Equal(t, exact.Num{}, n)
	}
}

func FuzzParse(f *testing.F) {
	for _, s := range []string{"65", "7.6", "1e9999", "٥", "65.", "000000000000000000000000.5"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, s string) {
		n, err := exact.Parse(s)
		if err != nil {
			require.Equal(t, exact.Num{}, n)
			return
		}
		d, err := decimal.NewFromString(s)
		require.NoError(t, err)
		require.True(t, d.Equal(n.Decimal()), "%q %v", s, n)
		again, err := exact.Parse(n.String())
		require.NoError(t, err)
		require.Equal(t, n, again)
	})
}

var sink exact.Num

func BenchmarkHundredOperations(b *testing.B) {
	b.Run("exact", func(b *testing.B) {
		b.ReportAllocs()
		x, p := exact.Int(65), exact.New(125, 2)
		for b.Loop() {
			for range 50 {
				sink = x.Mul(p).Add(x)
			}
		}
	})
	b.Run("decimal", func(b *testing.B) {
		b.ReportAllocs()
		x, p := decimal.New(65, 0), decimal.New(125, -2)
		for b.Loop() {
			for range 50 {
				_ = x.Mul(p).Add(x)
			}
		}
	})
}
