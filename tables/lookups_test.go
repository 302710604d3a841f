package tables_test

import (
	"fmt"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/tables"
)

// TestSystemVoltages: a column of rated motor volts serves the system voltages
// that the notes of the tables name: NFPA 70-2023 Tables 430.248 to 430.250,
// CSA C22.1 Tables 44 and 45.
func TestSystemVoltages(t *testing.T) {
	for _, tt := range []struct {
		e     tables.Edition
		table tables.MotorTable
		volts int
		want  string // 5 hp, or 1 hp for the 115 V column; "" for no column
	}{
		{tables.NEC2023, tables.InductionTable, 440, "7.6 A"}, {tables.NEC2023, tables.InductionTable, 480, "7.6 A"},
		{tables.NEC2023, tables.InductionTable, 439, ""}, {tables.NEC2023, tables.InductionTable, 481, ""},
		{tables.NEC2023, tables.InductionTable, 220, "15.2 A"}, {tables.NEC2023, tables.InductionTable, 240, "15.2 A"},
		{tables.NEC2023, tables.InductionTable, 208, "16.7 A"}, {tables.NEC2023, tables.InductionTable, 200, "17.5 A"},
		{tables.NEC2023, tables.InductionTable, 209, ""}, {tables.NEC2023, tables.InductionTable, 600, "6.1 A"},
		{tables.NEC2023, tables.InductionTable, 550, "6.1 A"}, {tables.NEC2023, tables.InductionTable, 601, ""},
		{tables.NEC2023, tables.SinglePhaseTable, 120, "56 A"}, {tables.NEC2023, tables.SinglePhaseTable, 109, ""},
		{tables.NEC2023, tables.DirectCurrentTable, 240, "20 A"}, {tables.NEC2023, tables.DirectCurrentTable, 230, ""},
		{tables.CEC2024, tables.InductionTable, 480, "7.6 A"}, {tables.CEC2024, tables.InductionTable, 440, ""},
		{tables.CEC2024, tables.InductionTable, 600, "6.1 A"}, {tables.CEC2024, tables.InductionTable, 208, "16.7 A"},
		{tables.CEC2024, tables.SinglePhaseTable, 208, "30.8 A"}, {tables.CEC2024, tables.SinglePhaseTable, 200, "32.2 A"},
		{tables.CEC2024, tables.SinglePhaseTable, 240, "28 A"}, {tables.CEC2024, tables.SinglePhaseTable, 0, ""},
	} {
		f, err := tt.e.FullLoadCurrent(tt.table, hp("5"), tt.volts)
		assert.Equal(t, tt.want, f.String(), "%v %v %d V", tt.e, tt.table, tt.volts)
		assert.Equal(t, tt.want == "", err != nil)
	}
}

// TestPowerAtOrAbove: the handbook example of NFPA 70 430.110(C)(1), 230 V
// three-phase: 53.3 A picks 20 hp (54 A), 220.1 A locked picks 15 hp (232 A).
func TestPowerAtOrAbove(t *testing.T) {
	p, err := tables.NEC2023.PowerAtOrAbove(tables.InductionTable, 230, amps("53.3"))
	require.NoError(t, err)
	assert.Equal(t, "20 hp", p.String())
	p, err = tables.NEC2023.PowerAtOrAboveLockedRotor(3, 230, amps("220.1"))
	require.NoError(t, err)
	assert.Equal(t, "15 hp", p.String())
	for _, tt := range []struct{ amperes, want string }{{"0", "1/2 hp"}, {"65", "50 hp"}, {"65.000001", "60 hp"}, {"590", "500 hp"}} {
		p, err = tables.NEC2023.PowerAtOrAbove(tables.InductionTable, 460, amps(tt.amperes))
		require.NoError(t, err)
		assert.Equal(t, tt.want, p.String(), tt.amperes)
	}
	p, err = tables.CEC2024.PowerAtOrAbove(tables.SinglePhaseTable, 208, amps("44"))
	require.NoError(t, err)
	assert.Equal(t, "7-1/2 hp", p.String(), "40 A × 1.10, note of Table 45")
	_, err = tables.NEC2023.PowerAtOrAbove(tables.InductionTable, 460, amps("590.01"))
	assert.ErrorContains(t, err, "has no row at or above 590.01 A at 460 V")
	_, err = tables.NEC2023.PowerAtOrAbove(tables.InductionTable, 400, amps("1"))
	assert.ErrorContains(t, err, "has no 1 A at 400 V")
	_, err = tables.CEC2024.PowerAtOrAbove(tables.TwoPhaseTable, 460, amps("1"))
	assert.ErrorAs(t, err, new(*tables.NotTabulatedError))
	_, err = tables.CEC2024.PowerAtOrAboveLockedRotor(3, 460, amps("1"))
	assert.ErrorAs(t, err, new(*tables.NotTabulatedError))
	for _, tt := range []struct {
		table       tables.MotorTable
		volts       int
		first, last string
	}{{tables.InductionTable, 460, "1/2 hp", "500 hp"}, {tables.InductionTable, 208, "1/2 hp", "200 hp"}, {tables.SinglePhaseTable, 230, "1/6 hp", "10 hp"}, {tables.DirectCurrentTable, 90, "1/4 hp", "1 hp"}} {
		powers, err := tables.NEC2023.MotorPowers(tt.table, tt.volts)
		require.NoError(t, err)
		assert.Equal(t, tt.first, powers[0].String())
		assert.Equal(t, tt.last, powers[len(powers)-1].String())
		assert.True(t, slices.IsSortedFunc(powers, tables.Power.Cmp))
	}
	for _, volts := range []int{0, 400} {
		_, err = tables.NEC2023.MotorPowers(tables.InductionTable, volts)
		assert.ErrorAs(t, err, new(*tables.NotTabulatedError))
	}
}

// TestStandardRatings: next up and next down by NFPA 70 240.6(A). 10 A came to
// breakers in 2023; 601 A is a fuse only.
func TestStandardRatings(t *testing.T) {
	rule := tables.Rule{Ref: "430.52(C)(1)"}
	for _, tt := range []struct {
		e        tables.Edition
		device   tables.Device
		limit    string
		up, down string
	}{
		{tables.NEC2023, tables.InverseTimeBreaker, "162.5", "175 A", "150 A"}, // 250 % of 65 A
		{tables.NEC2023, tables.InverseTimeBreaker, "175", "175 A", "175 A"},
		{tables.NEC2023, tables.InverseTimeBreaker, "175.000001", "200 A", "175 A"},
		{tables.NEC2023, tables.InverseTimeBreaker, "5.5", "10 A", ""},
		{tables.NEC2020, tables.InverseTimeBreaker, "5.5", "15 A", ""},
		{tables.NEC2020, tables.TimeDelayFuse, "5.5", "6 A", "3 A"},
		{tables.NEC2017, tables.NonTimeDelayFuse, "600.5", "601 A", "600 A"},
		{tables.NEC2017, tables.InverseTimeBreaker, "600.5", "700 A", "600 A"},
		{tables.NEC2023, tables.InstantaneousBreaker, "9", "10 A", ""},
		{tables.NEC2023, tables.TimeDelayFuse, "6000", "6000 A", "6000 A"},
		{tables.NEC2023, tables.TimeDelayFuse, "6000.01", "", "6000 A"},
		{tables.NEC2023, tables.TimeDelayFuse, "999999999", "", "6000 A"},
		{tables.CEC2024, tables.TimeDelayFuse, "108.5", "110 A", "100 A"}, // 175 % of 62 A, Ontario design text
		{tables.CEC2024, tables.TimeDelayFuse, "47.25", "50 A", "45 A"},   // 175 % of 27 A, the same
		{tables.CEC2021, tables.InverseTimeBreaker, "14.99", "15 A", ""},
		{tables.CEC2021, tables.InverseTimeBreaker, "900", "1000 A", "800 A"},
		{tables.NEC2023, tables.Device(0), "100", "", ""},
		{tables.NEC2023, tables.Device(9), "100", "", ""},
	} {
		up := tt.e.RatingAtOrAbove(tt.device, amps(tt.limit), "device", &rule)
		down := tt.e.RatingAtOrBelow(tt.device, amps(tt.limit), "device", &rule)
		assert.Equal(t, tt.up, up.String(), "%v %v up from %s A", tt.e, tt.device, tt.limit)
		assert.Equal(t, tt.down, down.String(), "%v %v down from %s A", tt.e, tt.device, tt.limit)
		for _, f := range []tables.Figure{up, down} {
			if !f.IsZero() {
				assert.Equal(t, tt.e.Standard()+" 430.52(C)(1)", f.Citation().String())
				assert.Len(t, f.Citations(), 2, "the rule and the list of ratings")
			}
		}
	}
}

// TestTable13: each line of CSA C22.1 Table 13 gives its rating for every
// ampacity of its range (from memory of the page).
func TestTable13(t *testing.T) {
	rule := tables.Rule{Ref: "Rule 14-104(1)"}
	above := 0
	for line := range strings.FieldsSeq("15 20 25 30 35 40 45 50 60 70 80 90 100 110 125 150 175 200 225 250 300 350 400 450 500 600 700 800") {
		for _, ampacity := range []string{fmt.Sprintf("%d.01", above), itoa(above + 1), line} {
			f := tables.CEC2024.RatingAtOrAbove(tables.InverseTimeBreaker, amps(ampacity), "device", &rule)
			assert.Equal(t, line, f.Text(), ampacity)
		}
		above = volts(line)
	}
}

// TestInstantaneousCaps: CSA C22.1 Rule 28-210; a dc motor of unknown power
// takes the lower limit.
func TestInstantaneousCaps(t *testing.T) {
	for _, tt := range []struct {
		power tables.Power
		want  string
	}{{hp("50"), "250 %"}, {hp("50.000001"), "200 %"}, {hp("1/4"), "250 %"}, {tables.Power{}, "200 %"}} {
		f, _, _ := tables.CEC2021.InstantaneousCaps(true, tt.power)
		assert.Equal(t, tt.want, f.String(), tt.power.String())
	}
}

// TestLockedRotorOf: 30 hp, 460 V, code letter G (5.6 to 6.29), by the formula
// of NFPA 70-2023 430.7(B) and by hand: 30 × 5.6 × 1000 ÷ (460 × 1.732) = 210.867.
func TestLockedRotorOf(t *testing.T) {
	low, high, err := tables.NEC2023.LockedRotorKVA("g")
	require.NoError(t, err)
	assert.Equal(t, "5.6 kVA/hp", low.String())
	assert.Equal(t, "210.86 A", tables.NEC2023.LockedRotorOf(low, hp("30"), 460, 3, false).String())
	assert.Equal(t, "236.85 A", tables.NEC2023.LockedRotorOf(high, hp("30"), 460, 3, true).String(), "236.848, rounded up")
	assert.Equal(t, "205.11 A", tables.NEC2023.LockedRotorOf(high, hp("30"), 460, 2, true).String(), "30 × 6290 ÷ 920 = 205.109")
	one := tables.NEC2023.LockedRotorOf(high, hp("7-1/2"), 230, 1, true)
	assert.Equal(t, "205.11 A", one.String(), "7.5 × 6290 ÷ 230 = 205.109")
	assert.Contains(t, one.Note(), "times 7-1/2 hp, times 1000, over 230 V, rounded up to 0.01 A")
	assert.Equal(t, "NFPA 70-2023 Table 430.7(B)", one.Citation().String())
}

// TestInsulationSpellings: what the trade adds to a designation is dropped.
func TestInsulationSpellings(t *testing.T) {
	for _, tt := range []struct {
		e        tables.Edition
		in, want string
	}{
		{tables.NEC2023, "thwn-2", "THWN-2"}, {tables.NEC2023, " XHHW ", "XHHW"},
		{tables.CEC2024, "RW90XLPE", "RW90"}, {tables.CEC2024, "rw90 xlpe", "RW90"}, {tables.CEC2024, "RW90(EP)", "RW90"},
		{tables.CEC2024, "T90 NYLON", "T90_NYLON"}, {tables.CEC2024, "T90_NYLON", "T90_NYLON"}, {tables.CEC2024, "Teck90", "TECK90"},
	} {
		ins, err := tt.e.Insulation(tt.in)
		require.NoError(t, err)
		assert.Equal(t, tt.want, ins.Type)
	}
	for _, s := range []string{"", "RW90", "THWN2", "٥", "XLPE"} {
		ins, err := tables.NEC2023.Insulation(s)
		assert.ErrorAs(t, err, new(*tables.InputError), s)
		assert.Zero(t, ins)
	}
	_, err := tables.CEC2024.Insulation("THHN")
	assert.ErrorContains(t, err, `wiring.insulation "THHN": want one of R90, RW75, RW90,`)
	list := tables.NEC2023.Insulations()
	list[0].Type = ""
	assert.Equal(t, "TW", tables.NEC2023.Insulations()[0].Type, "a copy is handed out")
}

// TestTextForms: each enumeration reads what it writes, in loose spelling too.
func TestTextForms(t *testing.T) {
	checkTexts[tables.Device, *tables.Device](t, "non_time_delay_fuse time_delay_fuse inverse_time_breaker instantaneous_breaker", 1)
	checkTexts[tables.Duty, *tables.Duty](t, "continuous short_time intermittent periodic varying", 0)
	checkTexts[tables.Material, *tables.Material](t, "copper aluminum", 0)
	checkTexts[tables.Run, *tables.Run](t, "raceway cable free_air", 0)
	checkTexts[tables.Location, *tables.Location](t, "dry damp wet", 0)
	var m tables.Material
	for in, want := range map[string]tables.Material{"cu": tables.Copper, "Al": tables.Aluminum, "ALUMINIUM": tables.Aluminum, "": tables.Copper} {
		require.NoError(t, m.UnmarshalText([]byte(in)))
		assert.Equal(t, want, m)
	}
	assert.Equal(t, "inverse-time breaker", tables.InverseTimeBreaker.Name())
	assert.Empty(t, tables.Device(9).Name())
	assert.True(t, tables.TimeDelayFuse.IsFuse() && tables.NonTimeDelayFuse.IsFuse() && !tables.InverseTimeBreaker.IsFuse())
	assert.False(t, tables.Device(0).IsValid() || tables.Device(5).IsValid())
	assert.Empty(t, tables.MotorTable(9).String())
}

func checkTexts[T ~uint8, P interface {
	*T
	UnmarshalText([]byte) error
}](t *testing.T, words string, first int) {
	t.Helper()
	for i, word := range strings.Fields(words) {
		want := T(first + i)
		text, err := any(want).(interface{ MarshalText() ([]byte, error) }).MarshalText()
		require.NoError(t, err)
		assert.Equal(t, word, string(text))
		for _, spelling := range []string{word, strings.ToUpper(word), strings.ReplaceAll(word, "_", " "), " " + strings.ReplaceAll(word, "_", "-") + " "} {
			var got T
			require.NoError(t, P(&got).UnmarshalText([]byte(spelling)))
			assert.Equal(t, want, got, spelling)
		}
	}
	got := T(1)
	require.NoError(t, P(&got).UnmarshalText(nil))
	assert.Zero(t, got, "no text is the zero value")
	got = T(1)
	assert.ErrorAs(t, P(&got).UnmarshalText([]byte("bogus")), new(*tables.InputError))
	assert.Zero(t, got, "an error comes with the zero value")
	assert.Empty(t, fmt.Sprint(T(200)))
}
