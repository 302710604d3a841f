package tables_test

import (
	"slices"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

func TestParseSize(t *testing.T) {
	for in, want := range map[string]string{ // "" for an error
		"14": "14 AWG", "14 AWG": "14 AWG", "14awg": "14 AWG", "#14": "14 AWG", "# 14": "14 AWG", "No. 12": "12 AWG", "no.12 awg": "12 AWG",
		"1/0": "1/0 AWG", "1/0 AWG": "1/0 AWG", "0": "1/0 AWG", "00": "2/0 AWG", "000": "3/0 AWG", "0000": "4/0 AWG", "#4/0": "4/0 AWG", "4/0": "4/0 AWG",
		"250": "250 kcmil", "250 kcmil": "250 kcmil", "250 MCM": "250 kcmil", "250KCMIL": "250 kcmil", " 500 ": "500 kcmil", "2000": "2000 kcmil",
		"16 mm2": "16 mm²", "16 mm²": "16 mm²", "16MM2": "16 mm²", "2.5mm2": "2.5 mm²", "0.5 mm²": "0.5 mm²", "1000 mm²": "1000 mm²",
		"18": "18 AWG", "16": "16 AWG",
		"": "", "17": "", "-1": "", "1e9999": "", "٥": "", "14.": "", "5/0": "", "0/0": "", "00000": "", "14 mm2": "", "16 mm": "", "#16 mm2": "",
		"250 AWG": "", "4 kcmil": "", "4/0 kcmil": "", "0 MCM": "", "AWG": "", "kcmil": "", "mm2": "", "#": "", "No.": "", "14 14": "",
		"14 AWG kcmil": "", "20": "", "1/0/0": "", "2500": "", "no 12": "",
	} {
		t.Run(in, func(t *testing.T) {
			s, err := tables.ParseSize(in)
			assert.Equal(t, want, s.String())
			if want == "" {
				var input *tables.InputError
				require.ErrorAs(t, err, &input)
				assert.Zero(t, s)
				assert.Equal(t, "size", input.Field)
				return
			}
			require.NoError(t, err)
			assert.True(t, s.IsValid())
			again, err := tables.ParseSize(s.String())
			require.NoError(t, err)
			assert.Equal(t, s, again)
		})
	}
}

func TestSizeNames(t *testing.T) {
	for in, want := range map[string]string{"#4": "4", "00": "2/0", "250 MCM": "250", "16 mm2": "16", "2.5 mm²": "2.5"} {
		assert.Equal(t, want, tables.Must(tables.ParseSize(in)).Name())
	}
	var none tables.Size
	assert.Empty(t, none.Name())
	assert.Empty(t, none.String())
	assert.False(t, none.IsValid())
	assert.True(t, none.Area().IsZero())
	for _, s := range []tables.Size{31, 99, 124, 255} {
		assert.False(t, s.IsValid(), "%d", s)
		assert.Empty(t, s.String())
		assert.Empty(t, s.Name())
		assert.True(t, s.Area().IsZero())
		assert.Zero(t, s.Smaller())
	}
}

func TestSizeOrder(t *testing.T) {
	size := func(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }
	all := tables.Sizes()
	require.Len(t, all, 30)
	assert.True(t, slices.IsSortedFunc(all, tables.Size.Cmp))
	for i, s := range all[1:] {
		assert.Equal(t, 1, s.Area().Cmp(all[i].Area()), "%v is larger than %v", s, all[i])
		assert.Equal(t, all[i], s.Smaller())
	}
	assert.Zero(t, all[0].Smaller())
	assert.Zero(t, size("0.5 mm2").Smaller())
	assert.Equal(t, size("10 mm2"), size("16 mm2").Smaller())
	assert.Equal(t, -1, size("16 mm2").Cmp(size("25 mm2")))
	// Across the series by area: 4 AWG is 21.15 mm² (NFPA 70 Chapter 9 Table 8).
	assert.Equal(t, 1, size("4").Cmp(size("16 mm2")))
	assert.Equal(t, -1, size("16 mm2").Cmp(size("4")))
	assert.Equal(t, -1, size("4").Cmp(size("25 mm2")))
	assert.Equal(t, "16", size("16 mm2").Area().String())
	assert.True(t, size("16 mm2").IsMetric())
	assert.False(t, size("16").IsMetric())
	assert.Equal(t, -1, tables.Size(0).Cmp(all[0]))
	assert.Equal(t, -1, tables.Size(0).Cmp(size("0.5 mm2")))
	all[0] = 0
	assert.Equal(t, "18 AWG", tables.Sizes()[0].String(), "a copy is handed out")
}

// The series both ways, and circular mils: NFPA 70 Chapter 9 Table 8.
func TestSeriesOfSizes(t *testing.T) {
	for _, list := range [][]tables.Size{tables.Sizes(), {tables.Must(tables.ParseSize("1.5 mm²")), tables.Must(tables.ParseSize("2.5 mm²")), tables.Must(tables.ParseSize("4 mm²"))}} {
		for i, s := range list[1:] {
			assert.Equal(t, s, list[i].Larger())
			assert.Equal(t, list[i], s.Smaller())
		}
	}
	for _, last := range []string{"2000", "1000 mm²"} {
		assert.Zero(t, tables.Must(tables.ParseSize(last)).Larger())
	}
	assert.Zero(t, tables.Size(0).Larger())
	for size, mils := range map[string]string{"18": "1620", "14": "4110", "4/0": "211600", "250": "250000", "2000": "2000000"} {
		assert.Equal(t, mils, tables.Must(tables.ParseSize(size)).CircularMils().String(), size)
	}
	assert.True(t, tables.Must(tables.ParseSize("16 mm²")).CircularMils().IsZero())
}
