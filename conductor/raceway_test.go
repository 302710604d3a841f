package conductor_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

func pull(insulation, awg string, n int) conductor.Pull {
	return conductor.Pull{Insulation: insulation, Size: size(awg), Count: n}
}

// Worked fills of exam guides and a design text on the CEC, and of NFPA 70
// Chapter 9 by hand from Tables 1, 4 and 5.
func TestFillWorked(t *testing.T) {
	for _, tt := range []struct {
		name     string
		editions []tables.Edition
		raceway  tables.Raceway
		pulls    []conductor.Pull
		want     string
		area     float64
		near     float64
		percent  float64
	}{
		{"three 6 AWG RW90XLPE", cecEditions, conductor.RMC, []conductor.Pull{pull("RW90", "6", 3)}, "RMC 21", 114, 0.5, 32.2},
		{"eight 3 AWG TW", cecEditions, conductor.EMT, []conductor.Pull{pull("TW", "3", 8)}, "EMT 53", 584, 2, 0},
		{"six 12 AWG RW90XLPE and four 8 AWG T90 Nylon", cecEditions, conductor.EMT, []conductor.Pull{pull("RW90", "12", 6), pull("T90 Nylon", "8", 4)}, "EMT 27", 164.2, 0.3, 0},
		{"98 of 14 AWG TW75", cecEditions, conductor.RMC, []conductor.Pull{pull("TW75", "14", 98)}, "RMC 53", 872.2, 4, 39.66},
		// 3 × 0.0507 = 0.1521 in² of 0.213 in²; the next smaller allows 0.122 in².
		{"three 6 AWG THWN", necEditions, conductor.EMT, []conductor.Pull{pull("THWN", "6", 3)}, "EMT 3/4", 0.1521, 0, 28.54},
		// 3 × 0.0824 + 0.0211 = 0.2683 in² of 0.346 in²; 3/4 allows 0.213 in².
		{"three 4 AWG and one 10 AWG THWN", necEditions, conductor.EMT, []conductor.Pull{pull("THWN", "4", 3), pull("THWN", "10", 1)}, "EMT 1", 0.2683, 0, 31.06},
		// 3 × 0.2223 + 0.0507 = 0.7176 in², of 0.814 in² in 1-1/2 EMT; 1-1/4 allows 0.598 in².
		{"three 2/0 and one 6 AWG THWN-2", necEditions, conductor.EMT, []conductor.Pull{pull("THWN-2", "2/0", 3), pull("THWN-2", "6", 1)}, "EMT 1-1/2", 0.7176, 0, 35.25},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				f, err := conductor.SelectRaceway(e, tt.raceway, false, tt.pulls...)
				require.NoError(t, err)
				assert.Equal(t, tt.want, f.Name(e))
				assert.InDelta(t, tt.area, f.Area.Float(), tt.near)
				if tt.percent > 0 {
					assert.InDelta(t, tt.percent, f.Percent.Float(), 0.15)
				}
				assert.Equal(t, e, f.Area.Citation().Edition)
			})
		}
	}
}

// 98 fill 39.66 percent as printed, by the printed area of 8.9 mm²; by that of the
// diameter (8.87 mm²) one more fits, and the hundredth does not.
func TestFillIsTheMost(t *testing.T) {
	for n, want := range map[int]string{98: "RMC 53", 99: "RMC 53", 100: "RMC 63"} {
		f, err := conductor.SelectRaceway(tables.CEC2024, conductor.RMC, false, pull("TW75", "14", n))
		require.NoError(t, err)
		assert.Equal(t, want, f.Name(tables.CEC2024))
		assert.Equal(t, n, f.Conductors)
	}
}

// One conductor 53 percent, two 31, three and more 40, a nipple 60: NEC Chapter 9
// Table 1 and note 4, CEC Table 8.
func TestFillLimits(t *testing.T) {
	for _, e := range tables.Editions() {
		for n, want := range map[int]float64{1: 53, 2: 31, 3: 40, 9: 40} {
			f, err := conductor.SelectRaceway(e, conductor.EMT, false, pull("TW", "3", n))
			require.NoError(t, err)
			sizes, err := e.RacewaySizes(conductor.EMT)
			require.NoError(t, err)
			for _, s := range sizes {
				if s.Metric == f.Metric {
					assert.InDelta(t, want, 100*f.Limit.Float()/s.Area.Float(), 0.1, "%v, %d conductors", e, n)
				}
			}
			nipple, err := conductor.SelectRaceway(e, conductor.EMT, true, pull("TW", "3", n))
			require.NoError(t, err)
			if e.Code() == tables.CEC {
				assert.Equal(t, f, nipple, "the CEC has no such limit")
			} else {
				assert.LessOrEqual(t, nipple.Metric, f.Metric)
			}
		}
	}
	// Eight 3 AWG TW (0.1134 in²) are 0.9072 in²: 1-1/2 EMT holds 0.814 at 40 and 1.221 at 60 percent.
	long, err := conductor.SelectRaceway(tables.NEC2023, conductor.EMT, false, pull("TW", "3", 8))
	require.NoError(t, err)
	short, err := conductor.SelectRaceway(tables.NEC2023, conductor.EMT, true, pull("TW", "3", 8))
	require.NoError(t, err)
	assert.Equal(t, []string{"2", "1-1/2"}, []string{long.Trade, short.Trade})
	assert.Equal(t, "1.221 in²", short.Limit.String())
}

// The chosen fill is within the limit and the next smaller trade size would not
// be; more conductors never take a smaller one.
func TestFillProperties(t *testing.T) {
	chosen := 0
	for _, e := range tables.Editions() {
		for _, r := range []tables.Raceway{conductor.EMT, conductor.ENT, conductor.FMC, conductor.LFMC, conductor.LFNCB, conductor.PVC40, conductor.RMC, conductor.IMC, conductor.PVC80} {
			sizes, err := e.RacewaySizes(r)
			if err != nil {
				continue
			}
			for _, awg := range []string{"14", "8", "1", "4/0", "500"} {
				before := 0
				for _, n := range []int{1, 3, 4, 6, 7, 9, 20} {
					f, err := conductor.SelectRaceway(e, r, false, pull("TW", awg, n))
					if err != nil {
						var none *tables.NoSizeError
						require.ErrorAs(t, err, &none)
						largest := sizes[len(sizes)-1]
						require.Positive(t, none.Need.Cmp(largest.Limit(n, false)), "%v %s, %d of %s", e, r.Name(), n, awg)
						continue
					}
					chosen++
					require.LessOrEqual(t, f.Area.Cmp(f.Limit), 0)
					require.GreaterOrEqual(t, f.Metric, 16, "trade size 1/2 is the smallest in general use")
					for _, s := range sizes {
						if s.Metric < f.Metric && s.Metric >= 16 {
							require.Negative(t, s.Limit(n, false).Cmp(f.Area), "%v %s %s would do for %d of %s", e, r.Name(), s.Trade, n, awg)
						}
					}
					require.GreaterOrEqual(t, f.Metric, before)
					before = f.Metric
				}
			}
		}
	}
	assert.Greater(t, chosen, 800)
}

// NEC informational note to Table 1: three conductors may jam where the bore is
// 2.8 to 3.2 times their diameter. Three 6 AWG RHW without such a ratio do not.
func TestJamming(t *testing.T) {
	told, silent := 0, 0
	for _, awg := range []string{"14", "12", "10", "8", "6", "4", "3", "2", "1", "1/0", "2/0", "3/0", "4/0", "250", "350", "500"} {
		for _, r := range []tables.Raceway{conductor.EMT, conductor.RMC, conductor.PVC80} {
			f, err := conductor.SelectRaceway(tables.NEC2023, r, false, pull("THWN", awg, 3))
			require.NoError(t, err)
			d, _, err := tables.NEC2023.ConductorDimensions("THWN", size(awg))
			require.NoError(t, err)
			sizes, err := tables.NEC2023.RacewaySizes(r)
			require.NoError(t, err)
			for _, s := range sizes {
				if s.Metric == f.Metric {
					ratio := s.Diameter.Float() / d.Float()
					jams := ratio >= 2.8 && ratio <= 3.2
					assert.Equal(t, jams, testkit.Cautioned(f.Cautions, "Chapter 9 Table 1", "jam"), "%s in %s %s: %v", awg, r.Name(), s.Trade, ratio)
					if jams {
						told++
					} else {
						silent++
					}
				}
			}
		}
	}
	assert.Positive(t, told)
	assert.Positive(t, silent)
	// Four of one size hardly jam.
	f, err := conductor.SelectRaceway(tables.NEC2023, conductor.EMT, false, pull("THWN", "4/0", 4))
	require.NoError(t, err)
	assert.Empty(t, f.Cautions)
	// Two lines and a third conductor jam if it is as thick as they are: 0.622 in
	// over 0.216 in is 2.88.
	for awg, jams := range map[string]bool{"8": true, "10": false} {
		f, err := conductor.RateRaceway(tables.NEC2023, conductor.EMT, "1/2", false, pull("THWN", "8", 2), pull("THWN", awg, 1))
		require.NoError(t, err)
		assert.Equal(t, jams, testkit.Cautioned(f.Cautions, "Chapter 9 Table 1", "jam"), awg)
	}
}

// A trade size that no table has is told shortened.
func TestLongTradeSize(t *testing.T) {
	_, err := conductor.RateRaceway(tables.NEC2023, conductor.EMT, strings.Repeat("9", 1<<20), false, pull("THWN", "8", 3))
	require.ErrorAs(t, err, new(*tables.NotTabulatedError))
	assert.Less(t, len(err.Error()), 500)
}

// A bare bonding conductor takes its own area, NEC Chapter 9 Table 8 note 8: 6
// AWG 0.027 in² against 0.0507 in² of THWN. The CEC's tables have none.
func TestBareBonding(t *testing.T) {
	bare := pull("THWN", "6", 1)
	bare.Bare = true
	f, err := conductor.SelectRaceway(tables.NEC2023, conductor.EMT, false, pull("THWN", "2/0", 3), bare)
	require.NoError(t, err)
	assert.Equal(t, "0.6939 in²", f.Area.String()) // 3 × 0.2223 + 0.027
	bare.Insulation = "RW90"
	f, err = conductor.SelectRaceway(tables.CEC2024, conductor.EMT, false, pull("RW90", "2/0", 3), bare)
	require.NoError(t, err)
	bare.Bare = false
	covered, err := conductor.SelectRaceway(tables.CEC2024, conductor.EMT, false, pull("RW90", "2/0", 3), bare)
	require.NoError(t, err)
	assert.Equal(t, covered.Area.String(), f.Area.String())
}

func TestRacewayErrors(t *testing.T) {
	for _, e := range tables.Editions() {
		var none *tables.NoSizeError
		f, err := conductor.SelectRaceway(e, conductor.FMC, false, pull("TW", "500", 40))
		require.ErrorAs(t, err, &none)
		assert.Equal(t, conductor.Filled{}, f)
		assert.Equal(t, "wiring.raceway", none.Field)
		assert.Contains(t, none.Constraint, "FMC")
		assert.False(t, none.Need.IsZero())
		for _, pulls := range [][]conductor.Pull{nil, {pull("TW", "6", 0)}} {
			_, err = conductor.SelectRaceway(e, conductor.EMT, false, pulls...)
			assert.Equal(t, "wiring.raceway", tables.FieldOf(err))
		}
		_, err = conductor.SelectRaceway(e, 0, false, pull("TW", "6", 3))
		assert.Equal(t, "wiring.raceway", tables.FieldOf(err))
		_, err = conductor.SelectRaceway(e, conductor.EMT, false, pull("TW", "18", 3))
		assert.Equal(t, "wiring.insulation", tables.FieldOf(err))
	}
	assert.Empty(t, conductor.Filled{}.Name(tables.NEC2023))
}
