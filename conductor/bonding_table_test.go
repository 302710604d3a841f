package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// circuit is what a bonding conductor needs to know of its circuit.
func circuit(m tables.Material, name string, sets int) conductor.Selection {
	return conductor.Selection{Material: m, Size: size(name), Sets: sets}
}

// NEC 250.122(A) with Table 250.122, CEC Rule 10-616 with Table 16: by the rating
// of the device, not larger than the circuit conductors. The codes differ to 30 A.
func TestBondingByTableRow(t *testing.T) {
	for _, tt := range []struct {
		device   string
		material tables.Material
		circuit  string
		nec, cec string
		row      string // NEC
	}{
		{"15", tables.Copper, "4/0", "14", "14", "15 A"},
		{"20", tables.Copper, "4/0", "12", "14", "20 A"},
		{"25", tables.Copper, "4/0", "10", "12", "60 A"},
		{"30", tables.Copper, "4/0", "10", "12", "60 A"},
		{"35", tables.Copper, "4/0", "10", "10", "60 A"},
		{"60", tables.Copper, "4/0", "10", "10", "60 A"},
		{"70", tables.Copper, "4/0", "8", "8", "100 A"},
		{"100", tables.Copper, "4/0", "8", "8", "100 A"},
		{"110", tables.Copper, "4/0", "6", "6", "200 A"},
		{"20", tables.Aluminum, "4/0", "10", "12", "20 A"},
		{"60", tables.Aluminum, "4/0", "8", "8", "60 A"},
		{"400", tables.Aluminum, "500", "1", "1", "400 A"},
		// A 14 AWG branch behind 40 A needs no more than 14 AWG.
		{"40", tables.Copper, "14", "14", "14", "60 A"},
		{"40", tables.Copper, "10", "10", "10", "60 A"},
		{"70", tables.Copper, "10", "10", "10", "100 A"},
	} {
		for _, e := range tables.Editions() {
			b, err := conductor.SelectBonding(e, tt.material, amps(tt.device), circuit(tt.material, tt.circuit, 1), 0)
			require.NoError(t, err)
			want := tt.nec
			if e.Code() == tables.CEC {
				want = tt.cec
			}
			assert.Equal(t, want, b.Size.Name(), "%v %s A %v", e, tt.device, tt.material)
			assert.Equal(t, tt.material, b.Material)
			assert.Empty(t, b.Cautions)
			assert.False(t, b.IsZero())
			if e.Code() == tables.NEC {
				assert.Equal(t, tt.row, b.Row.String(), "%s A", tt.device)
				assert.Equal(t, "Table 250.122", b.Row.Citation().Ref)
			} else {
				assert.Equal(t, "Table 16", b.Row.Citation().Ref)
			}
		}
	}
}

// What the size rests on is said.
func TestBondingWhy(t *testing.T) {
	for e, rule := range map[tables.Edition]string{tables.NEC2017: "NFPA 70-2017 250.122(A)", tables.NEC2023: "NFPA 70-2023 250.122(A)",
		tables.CEC2021: "CSA C22.1:21 Rule 10-616", tables.CEC2024: "CSA C22.1:24 Rule 10-616"} {
		b, err := conductor.SelectBonding(e, tables.Copper, amps("40"), circuit(tables.Copper, "14", 1), 0)
		require.NoError(t, err)
		assert.Contains(t, b.Why, rule)
		b, err = conductor.SelectBonding(e, tables.Copper, amps("40"), circuit(tables.Copper, "8", 1), 0)
		require.NoError(t, err)
		assert.Equal(t, "by the rating of the device", b.Why)
	}
}

// Conductors in parallel: NEC 250.122(F) a full-size one in each raceway; CEC Rule
// 10-616(4) each by its share of the device rating.
func TestBondingInParallel(t *testing.T) {
	for _, tt := range []struct {
		device, circuit string
		sets            int
		nec, cec        string
	}{
		{"500", "3/0", 2, "2", "4"},    // CEC 250 A: the row of 300
		{"400", "3/0", 2, "3", "6"},    // CEC 200 A, exactly a row
		{"1000", "350", 3, "2/0", "3"}, // CEC 333.3 A: the row of 400
		{"1600", "600", 4, "4/0", "3"}, // CEC 400 A
		{"2000", "500", 6, "250", "3"}, // CEC 333.3 A
	} {
		for _, e := range tables.Editions() {
			b, err := conductor.SelectBonding(e, tables.Copper, amps(tt.device), circuit(tables.Copper, tt.circuit, tt.sets), 0)
			require.NoError(t, err)
			want, rule := tt.nec, "250.122(F)"
			if e.Code() == tables.CEC {
				want, rule = tt.cec, "Rule 10-616(4)"
			}
			assert.Equal(t, want, b.Size.Name(), "%v %s A", e, tt.device)
			assert.True(t, testkit.Cautioned(b.Cautions, rule, "of its own"))
		}
	}
}

// Above the last row, 6000 A, there is no size.
func TestBondingRefusals(t *testing.T) {
	for _, e := range tables.Editions() {
		b, err := conductor.SelectBonding(e, tables.Copper, amps("6000"), circuit(tables.Copper, "2000", 1), 0)
		require.NoError(t, err)
		assert.Equal(t, "800", b.Size.Name())
		b, err = conductor.SelectBonding(e, tables.Copper, amps("6000.01"), circuit(tables.Copper, "2000", 1), 0)
		assert.Equal(t, "device", tables.FieldOf(err))
		assert.True(t, b.IsZero())
	}
	_, err := conductor.SelectBonding(0, tables.Copper, amps("20"), circuit(tables.Copper, "14", 1), 0)
	assert.Equal(t, "edition", tables.FieldOf(err))
	_, err = conductor.SelectBonding(tables.NEC2023, 9, amps("20"), circuit(9, "14", 1), 0)
	assert.Equal(t, "wiring.material", tables.FieldOf(err))
}
