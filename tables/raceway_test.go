package tables_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

var raceways = map[string]tables.Raceway{
	"emt": tables.EMT, "ent": tables.ENT, "fmc": tables.FMC, "imc": tables.IMC, "lfmc": tables.LFMC, "lfnc_a": tables.LFNCA,
	"lfnc_b": tables.LFNCB, "pvc_40": tables.PVC40, "pvc_80": tables.PVC80, "pvc_a": tables.PVCA, "pvc_eb": tables.PVCEB, "rmc": tables.RMC,
}

func TestRacewayText(t *testing.T) {
	for text, r := range raceways {
		assert.Equal(t, text, r.String())
		assert.True(t, r.IsValid())
		b, err := r.MarshalText()
		require.NoError(t, err)
		for _, form := range []string{string(b), r.Name()} {
			var back tables.Raceway
			require.NoError(t, back.UnmarshalText([]byte(form)), form)
			assert.Equal(t, r, back, form)
		}
	}
	assert.Equal(t, "PVC-40", tables.PVC40.Name())
	assert.Equal(t, "LFNC-B", tables.LFNCB.Name())
	back := tables.RMC
	require.NoError(t, back.UnmarshalText(nil))
	assert.Zero(t, back, "no text is not given")
	var input *tables.InputError
	require.ErrorAs(t, back.UnmarshalText([]byte("gutter")), &input)
	assert.Equal(t, "wiring.raceway", input.Field)
	assert.Empty(t, tables.Raceway(0).Name())
	assert.False(t, tables.Raceway(0).IsValid() || tables.Raceway(99).IsValid())
}

// What a raceway is made of: steel counts for impedance, and a flexible one does
// not bond as such (NEC 250.118, CEC 10-616).
func TestRacewayMakes(t *testing.T) {
	metal := map[tables.Raceway]bool{tables.EMT: true, tables.FMC: true, tables.IMC: true, tables.LFMC: true, tables.RMC: true}
	flexible := map[tables.Raceway]bool{tables.FMC: true, tables.LFMC: true, tables.LFNCA: true, tables.LFNCB: true}
	for _, r := range raceways {
		assert.Equal(t, metal[r], r.IsMetal(), r.Name())
		assert.Equal(t, flexible[r], r.IsFlexible(), r.Name())
	}
}

func racewaySize(t *testing.T, e tables.Edition, r tables.Raceway, metric int) tables.RacewaySize {
	t.Helper()
	sizes, err := e.RacewaySizes(r)
	require.NoError(t, err)
	for _, s := range sizes {
		if s.Metric == metric {
			return s
		}
	}
	t.Fatalf("%v has no %s %d", e, r.Name(), metric)
	return tables.RacewaySize{}
}

// Cells of NFPA 70 Chapter 9 Table 4 and CSA C22.1 Tables 9, typed from the pages
// and from a design text on the CEC (2199 and 4839 mm² of rigid metal).
func TestRacewayCells(t *testing.T) {
	for _, tt := range []struct {
		e                              tables.Edition
		r                              tables.Raceway
		metric                         int
		trade                          string
		diameter, area, one, two, more string
		nipple                         string
		mark                           tables.Mark
	}{
		{tables.NEC2023, tables.EMT, 16, "1/2", "0.622 in", "0.304 in²", "0.161 in²", "0.094 in²", "0.122 in²", "0.182 in²", tables.MarkB},
		{tables.NEC2017, tables.EMT, 27, "1", "1.049 in", "0.864 in²", "0.458 in²", "0.268 in²", "0.346 in²", "0.519 in²", tables.MarkB},
		{tables.NEC2020, tables.EMT, 35, "1-1/4", "1.38 in", "1.496 in²", "0.793 in²", "0.464 in²", "0.598 in²", "0.897 in²", tables.MarkB},
		{tables.NEC2023, tables.EMT, 53, "2", "2.067 in", "3.356 in²", "1.778 in²", "1.04 in²", "1.342 in²", "2.013 in²", tables.MarkB},
		{tables.NEC2023, tables.PVC40, 41, "1-1/2", "1.59 in", "1.986 in²", "1.052 in²", "0.616 in²", "0.794 in²", "1.191 in²", tables.MarkC},
		{tables.NEC2023, tables.PVC80, 41, "1-1/2", "1.476 in", "1.711 in²", "0.907 in²", "0.53 in²", "0.684 in²", "1.027 in²", tables.MarkC},
		{tables.NEC2023, tables.RMC, 21, "3/4", "0.836 in", "0.549 in²", "0.291 in²", "0.17 in²", "0.22 in²", "0.329 in²", tables.MarkC},
		{tables.CEC2021, tables.RMC, 53, "2", "52.91 mm", "2198.7 mm²", "1165.31 mm²", "681.6 mm²", "879.48 mm²", "", tables.MarkB},
		{tables.CEC2024, tables.RMC, 78, "3", "78.49 mm", "4838.59 mm²", "2564.45 mm²", "1499.96 mm²", "1935.43 mm²", "", tables.MarkB},
	} {
		s := racewaySize(t, tt.e, tt.r, tt.metric)
		assert.Equal(t, tt.trade, s.Trade)
		assert.Equal(t, tt.diameter, s.Diameter.String())
		assert.Equal(t, tt.area, s.Area.String())
		for n, want := range map[int]string{1: tt.one, 2: tt.two, 3: tt.more, 98: tt.more} {
			limit := s.Limit(n, false)
			assert.Equal(t, want, limit.String(), "%s %s, %d conductors", tt.r.Name(), tt.trade, n)
			assert.Equal(t, tt.e, limit.Citation().Edition)
		}
		assert.Equal(t, tt.nipple, s.Limit(3, true).String(), "CEC Table 8 has no nipple")
		ref := "Chapter 9 Table 4"
		if tt.e.Code() == tables.CEC {
			ref = "Tables 9A to 9H"
		}
		for _, f := range []tables.Figure{s.Area, s.Diameter, s.Limit(3, false)} {
			assert.Equal(t, tables.Citation{Edition: tt.e, Ref: ref}, f.Citation())
			assert.Equal(t, tt.mark == tables.MarkC, len(f.FromMemory()) > 0, tt.r.Name())
		}
	}
}

// Rows from memory: LFMC, RMC and PVC under the NEC.
func TestRacewayMarks(t *testing.T) {
	memory := map[tables.Raceway]bool{tables.LFMC: true, tables.RMC: true, tables.PVC40: true, tables.PVC80: true, tables.PVCA: true, tables.PVCEB: true}
	for _, r := range raceways {
		sizes, err := tables.NEC2023.RacewaySizes(r)
		require.NoError(t, err, r.Name())
		for _, s := range sizes {
			assert.Equal(t, memory[r], len(s.Limit(3, false).FromMemory()) == 1, "%s %s", r.Name(), s.Trade)
		}
	}
}

// A type that a code lacks is refused, and so is one that is none.
func TestRacewayRefused(t *testing.T) {
	for _, tt := range []struct {
		e    tables.Edition
		r    tables.Raceway
		name string
	}{
		{tables.CEC2024, tables.IMC, "IMC"}, {tables.CEC2024, tables.LFNCA, "LFNC-A"}, {tables.CEC2021, tables.PVC80, "PVC-80"},
		{tables.CEC2021, tables.PVCA, "PVC-A"}, {tables.NEC2023, 0, `""`}, {tables.NEC2023, 99, ""},
	} {
		sizes, err := tt.e.RacewaySizes(tt.r)
		var missing *tables.NotTabulatedError
		require.ErrorAs(t, err, &missing)
		assert.Empty(t, sizes)
		assert.Equal(t, "wiring.raceway", missing.Field)
		assert.Contains(t, missing.Row, tt.name)
		assert.Contains(t, missing.Covers, "EMT")
	}
	_, err := tables.Edition(0).RacewaySizes(tables.EMT)
	assert.Error(t, err)
}

// What is handed out is a copy.
func TestRacewaySizesAreCopies(t *testing.T) {
	sizes, err := tables.NEC2023.RacewaySizes(tables.EMT)
	require.NoError(t, err)
	sizes[0] = tables.RacewaySize{}
	again, err := tables.NEC2023.RacewaySizes(tables.EMT)
	require.NoError(t, err)
	assert.Equal(t, "1/2", again[0].Trade)
}
