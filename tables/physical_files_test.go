package tables

import (
	"math"
	"slices"
	"strconv"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/csvgrid"
)

// The files of raceways, conductor dimensions and impedances are held as a whole
// by the arithmetic between their own columns.

// column reads a column of numbers; a blank cell is NaN.
func column(t *testing.T, g *csvgrid.Grid, name string) []float64 {
	t.Helper()
	col, err := g.Col(name)
	require.NoError(t, err)
	values := make([]float64, len(g.Rows))
	for i, row := range g.Rows {
		values[i] = math.NaN()
		if row[col] != "" {
			values[i], err = strconv.ParseFloat(row[col], 64)
			require.NoError(t, err, "%v", row)
		}
	}
	return values
}

func opened(t *testing.T, path string) *csvgrid.Grid {
	t.Helper()
	g, err := open(path)
	require.NoError(t, err)
	return g
}

// Areas are pi/4 of the squared inside diameter, whole and by percent, to the
// last printed place: NFPA 70 Chapter 9 Table 4, CSA C22.1 Tables 9.
func TestRacewayAreas(t *testing.T) {
	for _, f := range []struct {
		path, diameter string
		areas          map[string]float64
		places         float64 // half of the last printed place
		rows           int
	}{
		{"nec/raceway_dimensions.csv", "internal_diameter_in", map[string]float64{"area_100_in2": 1, "area_60_in2": 0.6, "area_1wire_53_in2": 0.53, "area_2wires_31_in2": 0.31, "area_over2_40_in2": 0.4}, 0.0006, 114},
		{"cec/raceway_dimensions.csv", "internal_diameter_mm", map[string]float64{"area_100pct_mm2": 1, "area_53pct_mm2": 0.53, "area_31pct_mm2": 0.31, "area_40pct_mm2": 0.4}, 0.006, 78},
	} {
		g := opened(t, f.path)
		require.Len(t, g.Rows, f.rows)
		diameters := column(t, g, f.diameter)
		for name, share := range f.areas {
			for i, area := range column(t, g, name) {
				near := f.places
				if row := g.Rows[i]; row[0] == "electrical_metallic_tubing" && (row[1] == "129" || row[1] == "155") {
					near = 0.5 // printed to the whole mm²
				}
				assert.InDelta(t, share*math.Pi/4*diameters[i]*diameters[i], area, near, "%s %v %s", f.path, g.Rows[i], name)
			}
		}
		for i := 1; i < len(g.Rows); i++ {
			if g.Rows[i][0] == g.Rows[i-1][0] {
				assert.Greater(t, diameters[i], diameters[i-1], "%s: %v is not wider than the trade size before it", f.path, g.Rows[i])
			}
		}
	}
}

// Metric and inch diameters are one, but for IMC 4, which is printed 105.4 mm
// with 4.166 in; metric designators and trade sizes pair as in every table.
func TestRacewayUnits(t *testing.T) {
	pairs := map[string]string{"0.375": "12", "0.5": "16", "0.75": "21", "1": "27", "1.25": "35", "1.5": "41", "2": "53", "2.5": "63", "3": "78", "3.5": "91", "4": "103", "5": "129", "6": "155", "8": "200"}
	g := opened(t, "nec/raceway_dimensions.csv")
	inch, mm := column(t, g, "internal_diameter_in"), column(t, g, "internal_diameter_mm")
	for i, row := range g.Rows {
		assert.Equal(t, pairs[row[2]], row[3], "%v", row)
		if row[0] == "IMC" && row[2] == "4" {
			assert.Equal(t, []float64{4.166, 105.4}, []float64{inch[i], mm[i]})
			continue
		}
		assert.InDelta(t, inch[i]*25.4, mm[i], 0.06, "%v", row)
	}
	for _, row := range opened(t, "cec/raceway_dimensions.csv").Rows {
		assert.Equal(t, pairs[row[2]], row[1], "%v", row)
	}
}

// Areas of conductors are pi/4 of the squared diameter, and rise with the size
// within a type: NFPA 70 Chapter 9 Table 5, CSA C22.1 Tables 6.
func TestConductorAreas(t *testing.T) {
	g := opened(t, "nec/conductor_dimensions.csv")
	d, area := column(t, g, "diameter_in"), column(t, g, "area_in2")
	require.Len(t, g.Rows, 436)
	for i, row := range g.Rows {
		assert.InDelta(t, math.Pi/4*d[i]*d[i], area[i], 0.00006, "%v", row)
		if i > 0 && row[0] == g.Rows[i-1][0] && row[1] == g.Rows[i-1][1] {
			assert.Greater(t, d[i], d[i-1], "%v", row)
		}
	}
	g = opened(t, "cec/conductor_dimensions.csv")
	d, area = column(t, g, "diameter_mm"), column(t, g, "area_mm2")
	printed := column(t, g, "area_printed_mm2")
	require.Len(t, g.Rows, 86)
	for i, row := range g.Rows {
		assert.InDelta(t, math.Pi/4*d[i]*d[i], area[i], 0.006, "%v", row)
		if !math.IsNaN(printed[i]) {
			assert.InEpsilon(t, area[i], printed[i], 0.01, "%v", row)
		}
		if i > 0 && row[0] == g.Rows[i-1][0] && row[1] == g.Rows[i-1][1] {
			assert.Greater(t, d[i], d[i-1], "%v", row)
		}
	}
}

// Table 9: the printed impedance at 0.85 power factor is R pf + X sin within 5.5
// percent, which is the rounding of R; columns by kilometre are those by 1000 ft
// times 3.28084 within one percent; R and X fall as the size rises; steel has
// more reactance than PVC, and aluminum more resistance than copper.
func TestImpedanceIdentities(t *testing.T) {
	g := opened(t, "nec/conductor_impedance.csv")
	require.Len(t, g.Rows, 21)
	sin := math.Sin(math.Acos(0.85))
	at := func(name string) []float64 { return column(t, g, name+"_ohm_per_kft") }
	held := 0
	for _, where := range []string{"pvc", "al_conduit", "steel"} {
		x := at("x_pvc_al")
		if where == "steel" {
			x = at("x_steel")
		}
		for _, material := range []string{"cu", "al"} {
			r, z := at("r_"+material+"_"+where), at("z085_"+material+"_"+where)
			for i, row := range g.Rows {
				if math.IsNaN(r[i]) {
					assert.Equal(t, []string{"14", "al"}, []string{row[0], material}, "the one cell that is not printed")
					continue
				}
				held++
				assert.InEpsilon(t, z[i], r[i]*0.85+x[i]*sin, 0.055, "%s %s in %s", row[0], material, where)
				if i > 0 && !math.IsNaN(r[i-1]) {
					assert.Less(t, r[i], r[i-1], "%s %s in %s", row[0], material, where)
				}
				if material == "al" {
					assert.Greater(t, r[i], at("r_cu_" + where)[i])
				}
			}
		}
	}
	assert.Equal(t, 123, held)
	plastic, steel := at("x_pvc_al"), at("x_steel")
	for i, row := range g.Rows {
		assert.InDelta(t, 1.25*plastic[i], steel[i], 0.0021, "%s: steel adds a quarter", row[0])
		if i > 0 {
			assert.LessOrEqual(t, plastic[i], plastic[i-1]+0.002, row[0])
		}
	}
	for _, name := range g.Header[1:] {
		if km, ok := map[bool]string{true: name[:max(len(name)-3, 0)] + "km"}[name[len(name)-3:] == "kft"]; ok {
			long := column(t, g, km)
			for i, short := range column(t, g, name) {
				assert.Equal(t, math.IsNaN(short), math.IsNaN(long[i]))
				if !math.IsNaN(short) {
					assert.InEpsilon(t, short*3.28084, long[i], 0.01, "%s %s", g.Rows[i][0], name)
				}
			}
		}
	}
}

// Table 8: resistance times area is one figure for each metal (10.4 and 17.0
// ohm cmil/ft at 20 °C come to 12.9 and 21.2 at 75 °C, stranded), areas and
// diameters agree, and Table 9 is not below it.
func TestDCResistanceIdentities(t *testing.T) {
	g := opened(t, "nec/conductor_properties.csv")
	cmil := column(t, g, "area_cmil")
	cu, al := column(t, g, "dc_cu_uncoated_ohm_per_kft"), column(t, g, "dc_al_ohm_per_kft")
	inch, square, mm := column(t, g, "overall_diameter_in"), column(t, g, "overall_area_in2"), column(t, g, "overall_diameter_mm")
	ac := impedances()
	for i, row := range g.Rows {
		stranded := row[1] == "stranded"
		k := map[bool][2]float64{true: {12.9, 21.2}, false: {12.65, 20.8}}[stranded]
		assert.InEpsilon(t, k[0], cu[i]*cmil[i]/1000, 0.008, "%v", row[:2])
		assert.InEpsilon(t, k[1], al[i]*cmil[i]/1000, 0.008, "%v", row[:2])
		assert.InDelta(t, inch[i]*25.4, mm[i], 0.018, "%v", row[:2])
		assert.InDelta(t, math.Pi/4*inch[i]*inch[i], square[i], 0.0013, "%v", row[:2])
		for name, short := range map[string][]float64{"dc_cu_uncoated_ohm_per_km": cu, "dc_al_ohm_per_km": al} {
			assert.InEpsilon(t, short[i]*3.28084, column(t, g, name)[i], 0.006, "%v %s", row[:2], name)
		}
		if !stranded {
			continue
		}
		if i > 0 {
			assert.Less(t, cu[i], cu[i-1]*1.03, "%v", row[:2])
		}
		if cell, ok := ac[Must(ParseSize(row[0]))]; ok {
			steel, _ := cell.resistance[Copper][1].Decimal().Float64()
			assert.GreaterOrEqual(t, steel, 0.96*cu[i], "%s: alternating current meets no less", row[0])
		}
	}
	assert.Contains(t, slices.Collect(func(yield func(string) bool) {
		for _, row := range g.Rows {
			if !yield(row[0]) {
				return
			}
		}
	}), "2000")
}

// Typical power factors fall with the rotor locked and rise running.
func TestTypicalPowerFactorRows(t *testing.T) {
	g := opened(t, "physics/locked_rotor_power_factor.csv")
	hp, locked, running := column(t, g, "power_hp"), column(t, g, "locked_rotor_pf"), column(t, g, "running_pf_typical")
	for i := 1; i < len(g.Rows); i++ {
		assert.Greater(t, hp[i], hp[i-1])
		assert.LessOrEqual(t, locked[i], locked[i-1], "%v", g.Rows[i])
		if !math.IsNaN(running[i]) {
			assert.GreaterOrEqual(t, running[i], running[i-1], "%v", g.Rows[i])
			assert.Equal(t, "B", g.Rows[i][4])
		}
		assert.True(t, locked[i] > 0.1 && locked[i] < 0.9)
	}
}

// Files of another table, or none, are refused when they are first read.
func TestPhysicalLoadersPanic(t *testing.T) {
	for _, path := range []string{"nec/motor_flc_dc.csv", "nec/none.csv"} {
		assert.Panics(t, func() { loadRaceways(path, necRaceways)() })
		assert.Panics(t, func() { loadBareAreas(path)() })
		assert.Panics(t, func() {
			loadDimensions(path, &necTable5, "size_awg_kcmil", "diameter_in", "area_in2", Inch, SquareInch, "", func(row []string) []string { return row[:1] })()
		})
	}
	const path = "nec/conductor_dimensions.csv"
	all := func(row []string) []string { return row[:1] }
	assert.Panics(t, func() {
		loadDimensions(path, &necTable5, "insulation_type", "diameter_in", "area_in2", Inch, SquareInch, "", all)()
	}, "no sizes")
	assert.Panics(t, func() {
		loadDimensions(path, &necTable5, "size_awg_kcmil", "insulation_type", "area_in2", Inch, SquareInch, "", all)()
	}, "no diameters")
	assert.Panics(t, func() {
		loadDimensions(path, &necTable5, "size_awg_kcmil", "diameter_in", "insulation_type", Inch, SquareInch, "", all)()
	}, "no areas")
	falling := necRaceways
	falling.area = "nec_article"
	assert.Panics(t, func() { loadRaceways("nec/raceway_dimensions.csv", falling)() }, "areas that do not rise")
}
