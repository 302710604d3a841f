package tables_test

import (
	"math"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func awg(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }

// Cells of NFPA 70 Chapter 9 Table 5 and CSA C22.1 Tables 6, the latter with the
// values of an exam guide (38 mm² for 6 AWG RW90XLPE, 73 mm² for 3 AWG TW) and
// a design text (98 of 14 AWG TW75 are 872.2 mm²).
func TestConductorDimensions(t *testing.T) {
	for _, tt := range []struct {
		editions []tables.Edition
		name     string
		size     string
		diameter string
		area     float64
		near     float64
		unit     tables.Unit
	}{
		{[]tables.Edition{tables.NEC2017, tables.NEC2023}, "THHN", "12", "0.13 in", 0.0133, 0, tables.SquareInch},
		{[]tables.Edition{tables.NEC2017, tables.NEC2023}, "THWN", "6", "0.254 in", 0.0507, 0, tables.SquareInch},
		{[]tables.Edition{tables.NEC2020, tables.NEC2023}, "THWN-2", "4/0", "0.642 in", 0.3237, 0, tables.SquareInch},
		{[]tables.Edition{tables.NEC2020, tables.NEC2023}, "THHN", "500", "0.949 in", 0.7073, 0, tables.SquareInch},
		{[]tables.Edition{tables.NEC2020, tables.NEC2023}, "XHHW", "8", "0.236 in", 0.0437, 0, tables.SquareInch},
		{[]tables.Edition{tables.NEC2020, tables.NEC2023}, "TW", "14", "0.133 in", 0.0139, 0, tables.SquareInch},
		{[]tables.Edition{tables.CEC2021, tables.CEC2024}, "RW90", "6", "", 38, 0.2, tables.SquareMillimetre},
		{[]tables.Edition{tables.CEC2021, tables.CEC2024}, "RW90", "12", "", 69.5 / 6, 0.02, tables.SquareMillimetre},
		{[]tables.Edition{tables.CEC2021, tables.CEC2024}, "TW", "3", "", 73, 0.5, tables.SquareMillimetre},
		{[]tables.Edition{tables.CEC2021, tables.CEC2024}, "TW75", "14", "", 872.2 / 98, 0.05, tables.SquareMillimetre},
		{[]tables.Edition{tables.CEC2021, tables.CEC2024}, "T90 Nylon", "8", "", 94.7 / 4, 0.05, tables.SquareMillimetre},
	} {
		for _, e := range tt.editions {
			d, area, err := e.ConductorDimensions(tt.name, awg(tt.size))
			require.NoError(t, err, "%v %s", e, tt.name)
			assert.InDelta(t, tt.area, area.Float(), tt.near, "%v %s %s", e, tt.size, tt.name)
			assert.Equal(t, tt.unit, area.Unit())
			if tt.diameter != "" {
				assert.Equal(t, tt.diameter, d.String())
			}
			ref := "Chapter 9 Table 5"
			if e.Code() == tables.CEC {
				ref = "Tables 6A to 6K"
			}
			assert.Equal(t, tables.Citation{Edition: e, Ref: ref}, area.Citation())
		}
	}
}

// With an outer covering RHW is larger than without (0.0293 in² against 0.0209
// for 14 AWG): Table 5 prints both, the larger is taken.
func TestOuterCovering(t *testing.T) {
	_, area, err := tables.NEC2023.ConductorDimensions("RHW", awg("14"))
	require.NoError(t, err)
	assert.Equal(t, "0.0293 in²", area.String())
}

func TestDimensionsRefused(t *testing.T) {
	for _, tt := range []struct {
		e          tables.Edition
		name, size string
	}{{tables.NEC2023, "MI", "12"}, {tables.NEC2023, "THHN", "18"}, {tables.CEC2024, "TECK90", "6"}, {tables.CEC2024, "RW90", "18"}} {
		d, area, err := tt.e.ConductorDimensions(tt.name, awg(tt.size))
		var missing *tables.NotTabulatedError
		require.ErrorAs(t, err, &missing, "%s %s", tt.name, tt.size)
		assert.Equal(t, "wiring.insulation", missing.Field)
		assert.NotEmpty(t, missing.Covers)
		assert.True(t, d.IsZero() && area.IsZero())
	}
	_, _, err := tables.NEC2023.ConductorDimensions("no such type", awg("12"))
	assert.Error(t, err)
}

// NFPA 70 Chapter 9 Table 8, overall area of stranded conductors.
func TestBareArea(t *testing.T) {
	for size, want := range map[string]string{"14": "0.004 in²", "10": "0.011 in²", "8": "0.017 in²", "6": "0.027 in²", "1/0": "0.109 in²", "2000": "2.092 in²"} {
		area := tables.NEC2023.BareArea(awg(size))
		assert.Equal(t, want, area.String(), size)
		assert.Contains(t, area.Citation().Ref, "Chapter 9 Table 8")
	}
	assert.True(t, tables.CEC2024.BareArea(awg("8")).IsZero())
	assert.True(t, tables.Edition(0).BareArea(awg("8")).IsZero())
	assert.True(t, tables.NEC2023.BareArea(0).IsZero())
}

// NFPA 70 Chapter 9 Table 9, in ohms to neutral by 1000 ft; the CEC prints none.
func TestImpedanceCells(t *testing.T) {
	for _, tt := range []struct {
		material tables.Material
		size     string
		raceway  tables.Raceway
		r, x     string
		standIn  string
	}{
		{tables.Copper, "4", tables.RMC, "0.31 Ω/kft", "0.06 Ω/kft", ""},
		{tables.Copper, "4", 0, "0.31 Ω/kft", "0.06 Ω/kft", ""}, // not given counts as steel
		{tables.Copper, "4", tables.PVC40, "0.31 Ω/kft", "0.048 Ω/kft", ""},
		{tables.Copper, "500", tables.EMT, "0.029 Ω/kft", "0.048 Ω/kft", ""},
		{tables.Copper, "500", tables.LFNCB, "0.027 Ω/kft", "0.039 Ω/kft", ""},
		{tables.Aluminum, "12", tables.ENT, "3.2 Ω/kft", "0.054 Ω/kft", ""},
		{tables.Aluminum, "750", tables.IMC, "0.031 Ω/kft", "0.048 Ω/kft", ""},
		{tables.Copper, "700", tables.EMT, "0.025 Ω/kft", "0.048 Ω/kft", "600"},
		{tables.Copper, "900", tables.EMT, "0.021 Ω/kft", "0.048 Ω/kft", "750"},
		{tables.Copper, "1250", tables.PVC80, "0.015 Ω/kft", "0.037 Ω/kft", "1000"},
		{tables.Aluminum, "2000", tables.EMT, "0.025 Ω/kft", "0.046 Ω/kft", "1000"},
	} {
		for _, e := range tables.Editions() {
			z, err := e.Impedance(tt.material, awg(tt.size), tt.raceway)
			require.NoError(t, err)
			assert.Equal(t, tt.r, z.Resistance.String(), "%s %v in %s", tt.size, tt.material, tt.raceway.Name())
			assert.Equal(t, tt.x, z.Reactance.String(), "%s %v in %s", tt.size, tt.material, tt.raceway.Name())
			assert.Equal(t, tt.standIn, z.StandIn.Name())
			assert.Equal(t, tables.Citation{Ref: "NFPA 70 Chapter 9 Table 9"}, z.Resistance.Citation())
		}
	}
	for _, tt := range []struct {
		m tables.Material
		s tables.Size
	}{{tables.Aluminum, awg("14")}, {tables.Copper, awg("16")}, {tables.Copper, 0}, {9, awg("4")}, {tables.Copper, awg("16 mm²")}} {
		_, err := tables.NEC2023.Impedance(tt.m, tt.s, tables.EMT)
		var missing *tables.NotTabulatedError
		assert.ErrorAs(t, err, &missing, "%v %v", tt.m, tt.s)
	}
	_, err := tables.Edition(0).Impedance(tables.Copper, awg("4"), tables.EMT)
	assert.Error(t, err)
}

// NFPA 70 Chapter 9 Table 8, stranded, at 75 °C.
func TestDCResistanceCells(t *testing.T) {
	for _, tt := range []struct {
		material   tables.Material
		size, want string
	}{
		{tables.Copper, "14", "3.14 Ω/kft"}, {tables.Copper, "12", "1.98 Ω/kft"}, {tables.Copper, "10", "1.24 Ω/kft"}, {tables.Copper, "1/0", "0.122 Ω/kft"},
		{tables.Copper, "500", "0.0258 Ω/kft"}, {tables.Aluminum, "2", "0.319 Ω/kft"}, {tables.Aluminum, "1250", "0.0169 Ω/kft"}, {tables.Copper, "2000", "0.00643 Ω/kft"},
	} {
		r, err := tables.CEC2024.DCResistance(tt.material, awg(tt.size))
		require.NoError(t, err)
		assert.Equal(t, tt.want, r.String(), "%s %v", tt.size, tt.material)
		assert.Equal(t, "NFPA 70 Chapter 9 Table 8", r.Citation().Ref)
	}
	for _, s := range tables.Sizes() {
		cu, err1 := tables.NEC2023.DCResistance(tables.Copper, s)
		al, err2 := tables.NEC2023.DCResistance(tables.Aluminum, s)
		require.NoError(t, err1)
		require.NoError(t, err2)
		assert.Negative(t, cu.Cmp(al), s.String())
	}
	var missing *tables.NotTabulatedError
	_, err := tables.NEC2023.DCResistance(9, awg("4"))
	assert.ErrorAs(t, err, &missing)
	_, err = tables.NEC2023.DCResistance(tables.Copper, awg("16 mm²"))
	assert.ErrorAs(t, err, &missing)
	_, err = tables.Edition(0).DCResistance(tables.Copper, awg("4"))
	assert.Error(t, err)
}

// Typical power factors: the row at or above the power; above 40 hp from memory,
// and none running.
func TestTypicalPowerFactors(t *testing.T) {
	for _, tt := range []struct {
		power, running, locked string
		memory                 bool
	}{
		{"1/6", "0.55", "0.82", false}, {"10", "0.87", "0.53", false}, {"25", "0.89", "0.44", false}, {"35", "0.9", "0.39", false},
		{"41", "", "0.36", true}, {"100", "", "0.31", true}, {"450", "", "0.19", true}, {"500", "", "0.19", true}, {"501", "", "", false},
	} {
		running, locked := tables.TypicalPowerFactors(tables.Must(tables.ParseHP(tt.power)))
		assert.Equal(t, tt.running, running.String(), tt.power)
		assert.Equal(t, tt.locked, locked.String(), tt.power)
		assert.Equal(t, tt.memory, len(locked.FromMemory()) > 0, tt.power)
	}
	running, locked := tables.TypicalPowerFactors(tables.Power{})
	assert.True(t, running.IsZero() && locked.IsZero())
}

// A computed figure is rounded to the side that its note names, and absent when
// it is no number.
func TestComputedFigure(t *testing.T) {
	rule := tables.Rule{Ref: "a rule"}
	figure := func(v float64, up bool) tables.Figure {
		return tables.ComputedFigure("n", tables.NEC2023, &rule, tables.Percent, v, 2, up, "note")
	}
	for _, tt := range []struct {
		value    float64
		up, down string
	}{{1.3801, "1.39", "1.38"}, {1.38, "1.38", "1.38"}, {0.1 + 0.2, "0.3", "0.3"}, {0.0001, "0.01", "0"}} {
		assert.True(t, decimal.RequireFromString(tt.up).Equal(figure(tt.value, true).Value()), "%v", figure(tt.value, true))
		assert.True(t, decimal.RequireFromString(tt.down).Equal(figure(tt.value, false).Value()), "%v", figure(tt.value, false))
	}
	for _, v := range []float64{math.NaN(), math.Inf(1), math.Inf(-1), 1e14} {
		assert.True(t, figure(v, true).IsZero(), "%v", v)
	}
	assert.Equal(t, tables.Computed, figure(1, true).Op())
	assert.True(t, strings.HasSuffix(figure(1, true).How(), "note"), figure(1, true).How())
}
