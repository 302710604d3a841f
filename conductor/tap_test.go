package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

func amps(s string) tables.Figure {
	return tables.Must(tables.ParseCurrent(s)).Figure("current")
}

func length(s string) tables.Length { return tables.Must(tables.ParseLength(s)) }

// tap is a tap of 50 A from conductors of 380 A behind a device of 500 A: one-tenth
// of the device 50 A, one-third of the conductors 126.666667 A (rounded up).
func tap(long string, protected bool, changes ...func(*conductor.Tap)) conductor.Tap {
	t := conductor.Tap{Load: amps("20"), Source: amps("380"), Device: amps("500"), Length: length(long), Protected: protected}
	for _, c := range changes {
		c(&t)
	}
	return t
}

func group(t *conductor.Tap)   { t.Group = true }
func marked(t *conductor.Tap)  { t.Marked = true }
func highBay(t *conductor.Tap) { t.HighBay = true }

type tapCase struct {
	tap       conductor.Tap
	want, ref string
}

func holdTaps(t *testing.T, editions []tables.Edition, cases []tapCase) {
	t.Helper()
	for _, tt := range cases {
		for _, e := range editions {
			f, err := tt.tap.Ampacity(e)
			require.NoError(t, err)
			assert.Equal(t, tt.want, f.Value().Round(2).String(), "%v %+v: %v", e, tt.tap, f)
			assert.Equal(t, tt.ref, f.Citation().Ref, "%v %+v", e, tt.tap)
			assert.Equal(t, e, f.Citation().Edition)
		}
	}
}

// NEC 430.28: one-tenth of the device to 10 ft (3.0 m), one-third of the feeder to
// 25 ft (7.5 m), both protected; otherwise as the feeder. In a high bay one-third
// to 100 ft (30 m). Each unit is held to its own figure.
func TestFeederTapNEC(t *testing.T) {
	holdTaps(t, necEditions, []tapCase{
		{tap("10 ft", true), "50", "430.28(1)"},
		{tap("3 m", true), "50", "430.28(1)"},
		{tap("3.0 m", true), "50", "430.28(1)"},
		{tap("10.01 ft", true), "126.67", "430.28(2)"},
		{tap("3.01 m", true), "126.67", "430.28(2)"},
		{tap("25 ft", true), "126.67", "430.28(2)"},
		{tap("7.5 m", true), "126.67", "430.28(2)"},
		{tap("25.01 ft", true), "380", "430.28(3)"},
		{tap("7.51 m", true), "380", "430.28(3)"},
		{tap("10 ft", false), "380", "430.28(3)"},
		{tap("25 ft", false), "380", "430.28(3)"},
		{tap("100 ft", true, highBay), "126.67", "430.28 Exception"},
		{tap("30 m", true, highBay), "126.67", "430.28 Exception"},
		{tap("100.1 ft", true, highBay), "380", "430.28(3)"},
		{tap("30.1 m", true, highBay), "380", "430.28(3)"},
		{tap("100 ft", false, highBay), "380", "430.28(3)"},
		{tap("100 ft", true), "380", "430.28(3)"},
		{tap("10 ft", true, marked), "50", "430.28(1)"}, // the marking is for groups
	})
}

// NEC 430.53(D): a single motor's tap from a group's branch circuit: as the branch
// conductors; one-third to 25 ft, protected; one-tenth of the device to 10 ft to a
// manual controller marked for tap protection.
func TestGroupTapNEC(t *testing.T) {
	holdTaps(t, necEditions, []tapCase{
		{tap("10 ft", true, group, marked), "50", "430.53(D)(3)"},
		{tap("3 m", true, group, marked), "50", "430.53(D)(3)"},
		{tap("10.01 ft", true, group, marked), "126.67", "430.53(D)(2)"},
		{tap("3.01 m", true, group, marked), "126.67", "430.53(D)(2)"},
		{tap("10 ft", true, group), "126.67", "430.53(D)(2)"},
		{tap("25 ft", true, group), "126.67", "430.53(D)(2)"},
		{tap("7.5 m", true, group), "126.67", "430.53(D)(2)"},
		{tap("25.01 ft", true, group), "380", "430.53(D)(1)"},
		{tap("7.51 m", true, group), "380", "430.53(D)(1)"},
		{tap("10 ft", false, group, marked), "380", "430.53(D)(1)"},
		{tap("50 ft", true, group, highBay), "380", "430.53(D)(1)"}, // the high bay is for feeders
	})
}

// CEC Rule 28-110(2): a tap to 3 m in metal is sized by the load alone, one to
// 7.5 m that is protected has one-third of the feeder; otherwise as the feeder.
func TestFeederTapCEC(t *testing.T) {
	holdTaps(t, cecEditions, []tapCase{
		{tap("3 m", true), "20", "Rule 28-110(2)(a)"},
		{tap("9.84 ft", true), "20", "Rule 28-110(2)(a)"}, // 2.999 m
		{tap("3.01 m", true), "126.67", "Rule 28-110(2)(b)"},
		{tap("7.5 m", true), "126.67", "Rule 28-110(2)(b)"},
		{tap("24.6 ft", true), "126.67", "Rule 28-110(2)(b)"}, // 7.498 m
		{tap("7.51 m", true), "380", "Rule 28-110(2)"},
		{tap("25.1 ft", true), "380", "Rule 28-110(2)"},
		{tap("3 m", false), "380", "Rule 28-110(2)"},
		{tap("7.5 m", false), "380", "Rule 28-110(2)"},
		{tap("20 m", true, highBay), "380", "Rule 28-110(2)"}, // the NEC's
	})
}

// CEC Rule 28-106(3): a tap to a motor of a group of 7.5 m or less has one-third of
// the branch circuit's ampacity, whether it is protected or not; otherwise as that.
func TestGroupTapCEC(t *testing.T) {
	holdTaps(t, cecEditions, []tapCase{
		{tap("7.5 m", true, group), "126.67", "Rule 28-106(3)"},
		{tap("7.5 m", false, group), "126.67", "Rule 28-106(3)"},
		{tap("1 m", true, group, marked), "126.67", "Rule 28-106(3)"},
		{tap("7.51 m", true, group), "380", "Rule 28-106(3)"},
		{tap("26 ft", true, group), "380", "Rule 28-106(3)"},
	})
	f, err := tap("7.5 m", true, group).Ampacity(tables.CEC2024)
	require.NoError(t, err)
	assert.Equal(t, tables.MarkB, f.Mark())
}

// A tap never has less than its load asks for.
func TestTapCarriesItsLoad(t *testing.T) {
	heavy := func(t *conductor.Tap) { t.Load = amps("130") }
	for _, e := range tables.Editions() {
		for _, long := range []string{"1 m", "7 m"} {
			f, err := tap(long, true, heavy).Ampacity(e)
			require.NoError(t, err)
			assert.Equal(t, "130 A", f.String(), "%v %s", e, long)
		}
	}
}

func TestTapRefusals(t *testing.T) {
	for name, clear := range map[string]func(*conductor.Tap){
		"tap.load":   func(t *conductor.Tap) { t.Load = tables.Figure{} },
		"tap.source": func(t *conductor.Tap) { t.Source = tables.Figure{} },
		"tap.device": func(t *conductor.Tap) { t.Device = tables.Figure{} },
	} {
		f, err := tap("3 m", true, clear).Ampacity(tables.NEC2023)
		assert.Equal(t, name, tables.FieldOf(err))
		assert.True(t, f.IsZero())
	}
	_, err := tap("3 m", true).Ampacity(0)
	assert.Equal(t, "edition", tables.FieldOf(err))
	// A length that is not given is not a short one.
	none := tap("3 m", true)
	none.Length = tables.Length{}
	holdTaps(t, necEditions, []tapCase{{none, "380", "430.28(3)"}})
	holdTaps(t, cecEditions, []tapCase{{none, "380", "Rule 28-110(2)"}})
}
