package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// Published worked values (apprenticeship module, classroom notes and exam
// guides on the CEC): the size carries exactly that, and a hundredth of an
// ampere more takes the next size.
func TestWorkedValuesCEC(t *testing.T) {
	for _, tt := range []struct {
		name       string
		w          conductor.Wiring
		amps       string
		size, next string
		work       string
	}{
		{"four 1/0 RW75 at 40 °C", conductor.Wiring{Insulation: "RW75", Termination: 75, Ambient: celsius("40"), Conductors: 4}, "105.6",
			"1/0 AWG", "2/0 AWG", "150 × 0.80 × 0.88"},
		{"25 of No. 4 RW90", conductor.Wiring{Insulation: "RW90", Termination: 90, Conductors: 25}, "57", "4 AWG", "3 AWG", "95 × 0.60"},
		{"six with the lowest rating 75 °C, No. 4", conductor.Wiring{Insulation: "RW75", Termination: 75, Conductors: 6}, "68", "4 AWG", "3 AWG", "85 × 0.80"},
		{"six with the lowest rating 75 °C, No. 1", conductor.Wiring{Insulation: "RW75", Termination: 75, Conductors: 6}, "104", "1 AWG", "1/0 AWG", "130 × 0.80"},
		{"500 kcmil RW90 on 75 °C", conductor.Wiring{Insulation: "RW90", Termination: 75}, "380", "500 kcmil", "600 kcmil", "75 °C column of Table 2"},
		{"2/0 in free air", conductor.Wiring{Insulation: "RW90", Termination: 90, Run: tables.InFreeAir}, "300", "2/0 AWG", "3/0 AWG", "Table 1"},
		{"2/0 in free air at 35 °C", conductor.Wiring{Insulation: "RW90", Termination: 90, Run: tables.InFreeAir, Ambient: celsius("35")}, "288", "2/0 AWG", "3/0 AWG", "300 × 0.96"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := chosen(t, tt.w, e, load(tt.amps))
				assert.Equal(t, tt.size, s.Size.String(), tt.work)
				assert.Equal(t, tt.amps+" A", s.Ampacity.String(), tt.work)
				assert.Equal(t, tt.next, chosen(t, tt.w, e, load(tt.amps+addHundredth(tt.amps))).Size.String())
			})
		}
	}
}

// addHundredth turns "57" into "57.01" and "105.6" into "105.601".
func addHundredth(amps string) string {
	for _, c := range amps {
		if c == '.' {
			return "01"
		}
	}
	return ".01"
}

// Table 5A goes by the temperature marked on the conductor: RW90 on 75 °C
// terminals at 40 °C takes 0.91 on the 75 °C column, not 0.88. The other reading
// corrects the insulation's column and holds the termination's uncorrected; it
// never gives a larger size.
func TestReadingsCEC(t *testing.T) {
	for _, tt := range []struct {
		name       string
		w          conductor.Wiring
		amps       string
		strict     string // correct_termination
		strictAmps string
		loose      string // correct_insulation
		looseAmps  string
	}{
		// 1/0: 150 × 0.91 = 136.5; other reading 170 × 0.91 = 154.7, terminals 150.
		{"hot", conductor.Wiring{Insulation: "RW90", Termination: 75, Ambient: celsius("40")}, "136.5", "1/0 AWG", "136.5 A", "1/0 AWG", "150 A"},
		// 2/0: 175 × 0.91 = 159.25; 1/0 other reading 150.
		{"hot, above", conductor.Wiring{Insulation: "RW90", Termination: 75, Ambient: celsius("40")}, "137", "2/0 AWG", "159.25 A", "1/0 AWG", "150 A"},
		// 1 AWG: 130 × 0.91 × 0.70 = 82.81; 2 AWG 115 -> 73.255; other reading 2 AWG 130 × 0.637 = 82.81.
		{"hot and full", conductor.Wiring{Insulation: "RW90", Termination: 75, Ambient: celsius("40"), Conductors: 7}, "82", "1 AWG", "82.81 A", "2 AWG", "82.81 A"},
		// Insulation not hotter than the terminals: both readings are one.
		{"75 °C wire", conductor.Wiring{Insulation: "RW75", Termination: 75, Ambient: celsius("40")}, "88", "3 AWG", "88 A", "3 AWG", "88 A"},
		{"nothing to correct", conductor.Wiring{Insulation: "RW90", Termination: 75}, "100", "3 AWG", "100 A", "3 AWG", "100 A"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				w := tt.w
				s := chosen(t, w, e, load(tt.amps))
				assert.Equal(t, tt.strict, s.Size.String())
				assert.Equal(t, tt.strictAmps, s.Ampacity.String())
				corrected := tt.name != "nothing to correct"
				assert.Equal(t, corrected, testkit.Cautioned(s.Cautions, "Rules 4-004 and 4-006", "the stricter reading"))
				w.Reading = conductor.CorrectInsulation
				s = chosen(t, w, e, load(tt.amps))
				assert.Equal(t, tt.loose, s.Size.String())
				assert.Equal(t, tt.looseAmps, s.Ampacity.String())
				assert.Equal(t, corrected, testkit.Cautioned(s.Cautions, "Rules 4-004 and 4-006", "the less strict reading"))
			})
		}
	}
}

// Single conductors in free air: apart, closer than a quarter of the diameter
// (Table 5B), and more than four close together (Table 2 with Table 5C). 2/0 RW90
// on 90 °C terminals: 300 A in Table 1, 195 A in Table 2.
func TestFreeAirCEC(t *testing.T) {
	for _, tt := range []struct {
		conductors, own int
		amps, factor    string
		ref             string
	}{
		{0, 3, "300", "1", "Rule 4-004(1)"},
		{1, 1, "300", "1", "Rule 4-004(1)"},
		{2, 2, "270", "0.9", "Table 5B"},
		{3, 3, "255", "0.85", "Table 5B"},
		{4, 3, "240", "0.8", "Table 5B"},
		{5, 3, "156", "0.8", "Table 5C"},
		{6, 6, "156", "0.8", "Table 5C"},
		{7, 3, "136.5", "0.7", "Table 5C"},
	} {
		for _, e := range cecEditions {
			l := load(tt.amps)
			l.Count = tt.own
			s := chosen(t, conductor.Wiring{Insulation: "RW90", Termination: 90, Run: tables.InFreeAir, Conductors: tt.conductors}, e, l)
			assert.Equal(t, "2/0 AWG", s.Size.String(), "%d conductors", tt.conductors)
			assert.Equal(t, tt.amps+" A", s.Ampacity.String())
			assert.Equal(t, tt.factor, s.Together.Text())
			assert.Equal(t, tt.ref, s.Together.Citation().Ref)
			table := "Table 1"
			if tt.conductors > 4 {
				table = "Table 2"
			}
			assert.True(t, testkit.Rests(s.Ampacity, table), "%d conductors", tt.conductors)
		}
	}
}

// Aluminum takes Tables 3 and 4.
func TestAluminumCEC(t *testing.T) {
	for _, e := range cecEditions {
		w := conductor.Wiring{Material: conductor.Aluminum, Insulation: "RW90", Termination: 75}
		s := chosen(t, w, e, load("100"))
		assert.Equal(t, "1 AWG", s.Size.String(), "Table 4, 75 °C: 100 A; 2 AWG 90 A")
		assert.True(t, testkit.Rests(s.Ampacity, "Table 4"))
		w.Run = tables.InFreeAir
		s = chosen(t, w, e, load("100"))
		assert.Equal(t, "4 AWG", s.Size.String(), "Table 3, 75 °C: 100 A; 6 AWG 75 A")
		assert.True(t, testkit.Rests(s.Ampacity, "Table 3"))
	}
}
