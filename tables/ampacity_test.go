package tables_test

import (
	"math"
	"strconv"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func itoa(i int) string { return strconv.Itoa(i) }

var (
	runs      = []tables.Run{tables.InRaceway, tables.InCable, tables.InFreeAir}
	materials = []tables.Material{tables.Copper, tables.Aluminum}
	columns   = []int{60, 75, 90, 110, 125, 200}
)

// TestAmpacityOrder: ampacity rises with size and does not fall with the
// column; copper carries more than aluminum, free air more than raceway.
func TestAmpacityOrder(t *testing.T) {
	cells := 0
	for _, e := range tables.Editions() {
		at := func(run tables.Run, m tables.Material, s tables.Size, column int) float64 {
			table, err := e.Ampacities(run, m)
			require.NoError(t, err)
			return current(table.Ampacity(s, column), nil)
		}
		for _, run := range runs {
			for _, m := range materials {
				for _, column := range columns {
					before := 0.0
					for _, s := range tables.Sizes() {
						now := at(run, m, s, column)
						if now == 0 {
							continue
						}
						cells++
						where := []any{"%v %v %v %v %d °C", e, run, m, s, column}
						assert.Greater(t, now, before, where...)
						assert.InDelta(t, 0, math.Mod(now, 5)*boolTo1(s.Name() != "18" && s.Name() != "16"), 1e-9, where...) // printed in fives
						if column > 60 {
							for _, cooler := range columns {
								if cooler < column {
									assert.GreaterOrEqual(t, now, at(run, m, s, cooler), where...)
								}
							}
						}
						if m == tables.Aluminum {
							assert.Less(t, now, at(run, tables.Copper, s, column), where...)
						}
						if run != tables.InFreeAir && column <= 90 {
							assert.Less(t, now, at(tables.InFreeAir, m, s, column), where...)
						}
						before = now
					}
				}
			}
		}
	}
	// Printed cells: NFPA 70 86 and 81 a page, CSA C22.1 Tables 2, 4, 1 and 3.
	assert.Equal(t, 3*3*(86+81)+2*(2*(149+143)+84+81), cells)
}

func boolTo1(b bool) float64 {
	if b {
		return 1
	}
	return 0
}

// TestAmpacityTablesAgree: the 60, 75 and 90 °C columns of CSA C22.1 Tables 2
// and 4 equal those of NFPA 70 Table 310.16 (both read, cell by cell).
func TestAmpacityTablesAgree(t *testing.T) {
	for _, m := range materials {
		nec, err := tables.NEC2023.Ampacities(tables.InRaceway, m)
		require.NoError(t, err)
		cec, err := tables.CEC2024.Ampacities(tables.InRaceway, m)
		require.NoError(t, err)
		for _, s := range tables.Sizes()[2:] {
			for _, column := range []int{60, 75, 90} {
				assert.Equal(t, nec.Ampacity(s, column).Text(), cec.Ampacity(s, column).Text(), "%v %v %d", s, m, column)
			}
		}
	}
}

// TestAmbientFormula: every printed factor is sqrt((Tc-Ta)/(Tc-30)) at the top
// of its band, to 0.01 (NFPA 70 310.15(B), CSA C22.1 Table 5A).
func TestAmbientFormula(t *testing.T) {
	cells := 0
	for _, e := range tables.Editions() {
		for _, celsius := range []int{60, 75, 90, 105, 110, 125, 150, 200, 250} {
			before := 2.0
			for ambient := 10; ambient <= 140; ambient += 5 {
				f, err := e.AmbientFactor(celsius, tables.Must(tables.ParseTemperature(itoa(ambient))))
				if err != nil || e.Code() == tables.NEC && celsius > 90 {
					continue
				}
				cells++
				top := ambient
				if e.Code() == tables.CEC && ambient > 80 {
					top = (ambient + 9) / 10 * 10 // single rows 80, 90, 100 ...
				}
				want := math.Sqrt(float64(celsius-top) / float64(celsius-30))
				if e.Code() == tables.CEC && ambient <= 30 {
					want = 1 // no credit for cold
				}
				assert.InDelta(t, want, current(f, nil), 0.01, "%v %d °C conductor, %d °C ambient", e, celsius, ambient)
				assert.LessOrEqual(t, current(f, nil), before)
				before = current(f, nil)
			}
		}
	}
	assert.Equal(t, 3*(10+13+16)+2*180, cells)
}

// TestAmbientEdges: between rows the hotter row holds, and past the last
// factor the table says what it covers.
func TestAmbientEdges(t *testing.T) {
	for _, tt := range []struct {
		e       tables.Edition
		celsius int
		ambient string
		want    string // factor, or how the message ends
	}{
		{tables.NEC2023, 90, "-40", "1.15"}, // the band is "10 °C or less"
		{tables.NEC2023, 90, "30.5", "0.96"},
		{tables.NEC2023, 60, "55", "0.41"},
		{tables.NEC2023, 60, "55.1", "it covers ambients up to 55 °C for it"},
		{tables.NEC2023, 250, "85", "0.29"}, // a hotter conductor takes the hottest column
		{tables.NEC2023, 90, "85.000001", "it covers ambients up to 85 °C for it"},
		{tables.NEC2023, 59, "30", "it covers 60 °C conductors and hotter"},
		{tables.CEC2024, 90, "-40", "1"}, // no credit below 30 °C
		{tables.CEC2024, 60, "30", "1"},
		{tables.CEC2024, 90, "30.1", "0.96"},
		{tables.CEC2024, 105, "81", "0.45"},
		{tables.CEC2024, 250, "140", "0.71"},
		{tables.CEC2024, 110, "100.1", "it covers ambients up to 100 °C for it"},
	} {
		f, err := tt.e.AmbientFactor(tt.celsius, tables.Must(tables.ParseTemperature(tt.ambient)))
		if err == nil {
			assert.Equal(t, tt.want, f.Text(), "%v %d %s", tt.e, tt.celsius, tt.ambient)
			continue
		}
		assert.True(t, f.IsZero())
		assert.ErrorAs(t, err, new(*tables.NotTabulatedError))
		assert.Regexp(t, tt.want+"$", err.Error())
	}
}

func TestAmpacityAtLeast(t *testing.T) {
	table, err := tables.NEC2023.Ampacities(tables.InRaceway, tables.Copper)
	require.NoError(t, err)
	all := tables.Sizes()
	least, most := all[2], all[len(all)-1]
	for _, tt := range []struct {
		need   string
		column int
		want   string // NFPA 70-2023 Table 310.16
	}{
		{"0", 75, "14"}, {"20", 75, "14"}, {"20.01", 75, "12"}, {"81.25", 75, "4"}, {"85", 75, "4"}, {"85.000001", 75, "3"},
		{"665", 75, "2000"}, {"665.01", 75, ""}, {"40", 70, ""},
	} {
		assert.Equal(t, tt.want, table.AtLeast(amps(tt.need), tt.column, least, most).Name(), "%s A at %d °C", tt.need, tt.column)
	}
	assert.Equal(t, "1/0", table.AtLeast(amps("20"), 75, all[11], most).Name(), "not below the least size")
	assert.Zero(t, table.AtLeast(amps("100"), 75, least, all[5]), "not above the largest size")
	assert.Equal(t, "NFPA 70-2023 Table 310.16", table.Citation().String())
	f := table.Ampacity(all[7], 75)
	assert.Equal(t, "85 A", f.String())
	assert.Equal(t, "from the table, 4 AWG copper", f.How())
	assert.True(t, table.Ampacity(tables.Must(tables.ParseSize("16 mm2")), 75).IsZero(), "metric")
	assert.True(t, table.Ampacity(0, 75).IsZero(), "no size")
	assert.True(t, table.Ampacity(all[7], 80).IsZero(), "no such column")
}

// Columns and ends of a search: NFPA 70-2023 Table 310.16, copper.
func TestAmpacityEnds(t *testing.T) {
	table, err := tables.NEC2023.Ampacities(tables.InRaceway, tables.Copper)
	require.NoError(t, err)
	for celsius, want := range map[int]int{59: 0, 60: 60, 74: 60, 75: 75, 89: 75, 90: 90, 250: 90} {
		assert.Equal(t, want, table.Column(celsius), celsius)
	}
	size := func(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }
	assert.Equal(t, size("14"), table.AtLeast(amps("15"), 60, size("14"), size("2000")), "the first column")
	assert.Equal(t, size("6"), table.AtLeast(amps("65"), 75, size("14"), size("6")), "just the largest that may be")
	assert.Zero(t, table.AtLeast(amps("65.01"), 75, size("14"), size("6")))
	assert.Zero(t, table.AtLeast(amps("1"), 70, size("14"), size("6")), "no such column")
	last := tables.Sizes()[len(tables.Sizes())-1]
	assert.False(t, table.Ampacity(last, 75).IsZero())
	assert.True(t, table.Ampacity(last+1, 75).IsZero())
	assert.Zero(t, tables.AmpacityTable{}.Column(75))
}

// The first value that is none of an enumeration.
func TestFirstUnknown(t *testing.T) {
	for _, e := range tables.Editions() {
		_, err := e.Ampacities(tables.InFreeAir+1, tables.Copper)
		assert.Equal(t, "wiring.run", tables.FieldOf(err))
		_, err = e.Ampacities(tables.InRaceway, tables.Aluminum+1)
		assert.Equal(t, "wiring.material", tables.FieldOf(err))
		_, _, err = e.BondingSize(tables.Aluminum+1, amps("15"))
		assert.Equal(t, "wiring.material", tables.FieldOf(err))
	}
	for _, e := range []tables.Edition{tables.NEC2023, tables.CEC2024} {
		_, err := e.FullLoadCurrent(tables.DirectCurrentTable+1, tables.Must(tables.ParseHP("10")), 240)
		assert.Equal(t, "motor.kind", tables.FieldOf(err))
		_, err = e.DutyPercent(tables.Varying+1, 60)
		assert.Equal(t, "motor.duty.kind", tables.FieldOf(err))
		_, err = e.Impedance(tables.Aluminum+1, tables.Sizes()[10], tables.EMT)
		assert.Error(t, err)
		_, err = e.DCResistance(tables.Aluminum+1, tables.Sizes()[10])
		assert.Error(t, err)
	}
	assert.Empty(t, (tables.DirectCurrentTable + 1).String())
	assert.Empty(t, (tables.Computed + 1).String())
	assert.Empty(t, (tables.InstantaneousBreaker + 1).Name())
	assert.False(t, (tables.InstantaneousBreaker + 1).IsValid())
}
