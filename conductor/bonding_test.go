package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

func bonded(t *testing.T, e tables.Edition, m tables.Material, device, awg, base string, sets int) conductor.Bonding {
	t.Helper()
	w := conductor.Wiring{Material: m, Termination: 75, Least: size(awg), Sets: sets}
	s := chosen(t, w, e, load("1"))
	require.Equal(t, size(awg), s.Size)
	var from tables.Size
	if base != "" {
		from = size(base)
	}
	b, err := conductor.SelectBonding(e, s.Material, amps(device), s, from)
	require.NoError(t, err)
	return b
}

// Table 250.122 and Table 16: by the device, never larger than the circuit
// conductors.
func TestBondingByDevice(t *testing.T) {
	for _, tt := range []struct {
		device, awg string
		nec, cec    string
	}{
		{"15", "14", "14", "14"}, {"20", "12", "12", "14"}, {"30", "10", "10", "12"}, {"60", "6", "10", "10"},
		{"100", "3", "8", "8"}, {"125", "1", "6", "6"}, {"200", "3/0", "6", "6"}, {"400", "500", "3", "3"},
		{"40", "14", "14", "14"}, // a motor branch: as large as the circuit conductors
		{"225", "4", "4", "4"},   // row of 300 A
		{"1200", "500", "3/0", "3/0"},
	} {
		for _, e := range tables.Editions() {
			want := tt.nec
			if e.Code() == tables.CEC {
				want = tt.cec
			}
			assert.Equal(t, want, bonded(t, e, conductor.Copper, tt.device, tt.awg, "", 1).Size.Name(), "%v, %s A, %s", e, tt.device, tt.awg)
			assert.Equal(t, want, bonded(t, e, conductor.Copper, tt.device, tt.awg, tt.awg, 1).Size.Name(), "of the base size: no increase")
		}
	}
}

// NEC 250.122(B): in proportion to the circular mils, next standard size up.
func TestBondingInProportion(t *testing.T) {
	for _, e := range necEditions {
		for _, tt := range []struct{ device, awg, base, want string }{
			{"200", "350", "3/0", "2"},    // 26 240 × 350 000 / 167 800 = 54 732 cmil
			{"60", "1", "4", "6"},         // 10 380 × 83 690 / 41 740 = 20 812
			{"100", "1/0", "3", "4"},      // 16 510 × 105 600 / 52 620 = 33 133
			{"20", "8", "12", "8"},        // 6530 × 16 510 / 6530 = 16 510, 8 AWG itself
			{"400", "1000", "500", "1/0"}, // 52 620 × 2 = 105 240, just within 105 600
			{"15", "4", "14", "4"},        // 14 AWG itself grows to the circuit conductors' size
		} {
			b := bonded(t, e, conductor.Copper, tt.device, tt.awg, tt.base, 1)
			assert.Equal(t, tt.want, b.Size.Name(), "%s A, %s from %s", tt.device, tt.awg, tt.base)
			assert.Contains(t, b.Why, "250.122(B)")
		}
	}
}

// CEC Rule 10-616(3)(b): enlarged conductors are bonded by their ampacity: 3/0
// AWG, 200 A at 75 °C, takes 6 AWG; 350 kcmil, 310 A, the row of 400 A, 3 AWG.
func TestBondingByAmpacityCEC(t *testing.T) {
	for _, e := range cecEditions {
		for _, tt := range []struct{ device, awg, base, want string }{
			{"100", "3/0", "3", "6"}, {"100", "350", "3", "3"}, {"100", "250", "3", "4"},
		} {
			b := bonded(t, e, conductor.Copper, tt.device, tt.awg, tt.base, 1)
			assert.Equal(t, tt.want, b.Size.Name(), "%s from %s", tt.awg, tt.base)
			assert.Contains(t, b.Why, "ampacity")
			assert.Equal(t, "6", bonded(t, e, conductor.Copper, "125", "3/0", "", 1).Size.Name(), "not enlarged: by the device")
		}
	}
}

// One with each set: full size under the NEC (250.122(F)), by the set's share of
// the device under the CEC (Rule 10-616(4)).
func TestBondingOfSets(t *testing.T) {
	for _, e := range tables.Editions() {
		b := bonded(t, e, conductor.Copper, "800", "500", "", 2)
		want, ref := "1/0", "250.122(F)"
		if e.Code() == tables.CEC {
			want, ref = "3", "Rule 10-616(4)" // 400 A each
		}
		assert.Equal(t, want, b.Size.Name())
		assert.True(t, testkit.Cautioned(b.Cautions, ref, "bonding conductor of its own"))
	}
}

// Never larger than the circuit conductors; under the NEC never smaller for an
// increase; every step of the series over devices and materials.
func TestBondingProperties(t *testing.T) {
	held := 0
	for _, e := range tables.Editions() {
		for _, m := range []tables.Material{conductor.Copper, conductor.Aluminum} {
			for _, device := range []string{"15", "35", "60", "100", "200", "400", "1000"} {
				for _, base := range []string{"12", "6", "1/0", "250"} {
					before := bonded(t, e, m, device, base, base, 1).Size
					for _, awg := range []string{"10", "4", "2/0", "300", "600", "1000"} {
						if size(awg).Cmp(size(base)) <= 0 {
							continue
						}
						b := bonded(t, e, m, device, awg, base, 1)
						assert.LessOrEqual(t, b.Size.Cmp(size(awg)), 0)
						assert.Equal(t, m, b.Material)
						if e.Code() == tables.NEC {
							assert.GreaterOrEqual(t, b.Size.Cmp(before), 0, "%v %v, %s A, %s from %s", e, m, device, awg, base)
							before = b.Size
						}
						held++
					}
				}
			}
		}
	}
	assert.Greater(t, held, 800)
}

func TestBondingRefused(t *testing.T) {
	for _, e := range tables.Editions() {
		s := chosen(t, conductor.Wiring{Termination: 75, Least: size("1/0")}, e, load("1"))
		b, err := conductor.SelectBonding(e, s.Material, amps("6001"), s, 0)
		var missing *tables.NotTabulatedError
		require.ErrorAs(t, err, &missing)
		assert.True(t, b.IsZero())
		assert.Equal(t, "device", missing.Field)
	}
}

// Copper beside aluminum is no larger than that, and aluminum beside copper may be:
// Table 250.122 has 14 AWG copper and 12 AWG aluminum to 15 A, 250.122(A).
func TestBondingOfAnotherMetal(t *testing.T) {
	for _, e := range necEditions {
		copper := chosen(t, conductor.Wiring{Termination: 75}, e, load("15"))
		b, err := conductor.SelectBonding(e, conductor.Aluminum, amps("15"), copper, 0)
		require.NoError(t, err)
		assert.Equal(t, "12 AWG aluminum", b.Size.String()+" "+b.Material.String())
		aluminum := chosen(t, conductor.Wiring{Termination: 75, Material: conductor.Aluminum}, e, load("15"))
		b, err = conductor.SelectBonding(e, conductor.Copper, amps("60"), aluminum, 0)
		require.NoError(t, err)
		assert.Equal(t, "12 AWG copper", b.Size.String()+" "+b.Material.String(), "10 AWG by the table")
	}
}
