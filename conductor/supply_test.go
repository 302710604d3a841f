package conductor_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// Motor supply conductors, CEC 28-104: the 75 °C column whatever the insulation,
// the 90 °C column for 90 °C wire of a Class A motor; insulation as Table 37 says
// (A 75, B 75, F 90, H 110 °C; totally enclosed non-ventilated 75, 90, 110, 110).
func TestMotorSupplyColumn(t *testing.T) {
	for _, tt := range []struct {
		name                 string
		insulation           string
		class                string
		closed               bool
		amps                 string
		least, column        string
		size, ampacity, used string
	}{
		{"class B", "RW90", "B", false, "100", "75 °C", "75 °C", "3 AWG", "100 A", "RW90"},     // exam guide: 30 hp, 240 V
		{"class B, 68 A", "RW90", "B", false, "68", "75 °C", "75 °C", "4 AWG", "85 A", "RW90"}, // exam guide: No. 6 is 65 A
		{"class B, 95 A", "RW90", "B", false, "95", "75 °C", "75 °C", "3 AWG", "100 A", "RW90"},
		{"class A, 90 °C wire", "RW90", "A", false, "95", "75 °C", "90 °C", "4 AWG", "95 A", "RW90"},
		{"class a, 90 °C wire", "RW90", "a", false, "95", "75 °C", "90 °C", "4 AWG", "95 A", "RW90"},
		{"class A, 75 °C wire", "RW75", "A", false, "95", "75 °C", "75 °C", "3 AWG", "100 A", "RW75"},
		{"class F", "RW90", "F", false, "95", "90 °C", "75 °C", "3 AWG", "100 A", "RW90"},
		{"class F, 75 °C wire", "RW75", "F", false, "95", "90 °C", "75 °C", "3 AWG", "100 A", "90 °C insulation"},
		{"class H", "RW90", "H", false, "95", "110 °C", "75 °C", "3 AWG", "100 A", "110 °C insulation"},
		{"class A, closed", "RW90", "A", true, "95", "75 °C", "90 °C", "4 AWG", "95 A", "RW90"},
		{"class B, closed", "RW90", "B", true, "95", "90 °C", "75 °C", "3 AWG", "100 A", "RW90"},
		{"class F, closed", "RW90", "F", true, "95", "110 °C", "75 °C", "3 AWG", "100 A", "110 °C insulation"},
		{"class H, closed", "RW90", "H", true, "95", "110 °C", "75 °C", "3 AWG", "100 A", "110 °C insulation"},
		{"class not given", "RW75", "", false, "100", "75 °C", "75 °C", "3 AWG", "100 A", "RW75"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				w := conductor.Wiring{Insulation: tt.insulation, Termination: 60} // the terminals' marking does not count here
				s, err := w.SelectMotorSupply(e, load(tt.amps), conductor.MotorEnd{InsulationClass: tt.class, NonVentilated: tt.closed})
				require.NoError(t, err)
				assert.Equal(t, tt.least, s.LeastRating.String())
				assert.True(t, testkit.Rests(s.LeastRating, "Table 37"))
				assert.Equal(t, tt.column, s.Termination.String())
				assert.Equal(t, "Rule 28-104", s.Termination.Citation().Ref)
				assert.Equal(t, tt.size, s.Size.String())
				assert.Equal(t, tt.ampacity, s.Ampacity.String())
				assert.Equal(t, tt.used, s.Insulation)
				apart := tt.least != "75 °C"
				assert.Equal(t, apart, testkit.Cautioned(s.Cautions, "Rule 28-104", "at least 1.2 m"))
				assert.Equal(t, tt.used != tt.insulation, testkit.Cautioned(s.Cautions, "Rule 28-104", "spliced"))
				assert.Equal(t, tt.class == "", testkit.Cautioned(s.Cautions, "Table 37", "class B taken"))
			})
		}
	}
}

// Above 30 °C what the ambient exceeds it by is added to Table 37; the factor of
// Table 5A goes by the wire's own temperature.
func TestMotorSupplyAmbient(t *testing.T) {
	for _, tt := range []struct {
		ambient, insulation string
		least, used         string
		factor              string
		size, ampacity      string // for 80 A
	}{
		{"", "RW75", "75 °C", "RW75", "1", "4 AWG", "85 A"},
		{"-10", "RW75", "75 °C", "RW75", "1", "4 AWG", "85 A"},
		{"30", "RW75", "75 °C", "RW75", "1", "4 AWG", "85 A"},
		{"40", "RW90", "85 °C", "RW90", "0.91", "3 AWG", "91 A"},             // 100 × 0.91; 4 AWG 77.35
		{"40", "RW75", "85 °C", "85 °C insulation", "0.88", "3 AWG", "88 A"}, // the 75 °C column of Table 5A for 85 °C wire
		{"45", "RW90", "90 °C", "RW90", "0.87", "3 AWG", "87 A"},
		{"45.5", "RW90", "90.5 °C", "90.5 °C insulation", "0.82", "3 AWG", "82 A"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.ambient+" "+tt.insulation+" "+e.String(), func(t *testing.T) {
				s, err := conductor.Wiring{Insulation: tt.insulation, Ambient: celsius(tt.ambient)}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{InsulationClass: "B"})
				require.NoError(t, err)
				assert.Equal(t, tt.least, s.LeastRating.String())
				assert.Equal(t, tt.used, s.Insulation)
				assert.Equal(t, tt.factor, s.Ambient.Text())
				assert.Equal(t, tt.size, s.Size.String())
				assert.Equal(t, tt.ampacity, s.Ampacity.String())
			})
		}
	}
}

// The hotter conductors end 600 mm from a motor under 100 hp and 1.2 m from a
// motor of 100 hp and more.
func TestMotorSupplyDistance(t *testing.T) {
	for power, far := range map[string]bool{"1": false, "99.9": false, "100": true, "125": true, "": false} {
		end := conductor.MotorEnd{InsulationClass: "F"}
		if power != "" {
			end.Power = tables.Must(tables.ParseHP(power))
		}
		for _, e := range cecEditions {
			s, err := conductor.Wiring{Insulation: "RW90"}.SelectMotorSupply(e, load("80"), end)
			require.NoError(t, err)
			var told string
			for _, c := range s.Cautions {
				if strings.Contains(c.Text, "at least 1.2 m") {
					told = c.Text
				}
			}
			assert.Equal(t, far, strings.Contains(told, "end them at least 1.2 m from the motor"), told)
			assert.Equal(t, !far, strings.Contains(told, "end them at least 600 mm from the motor"), told)
		}
	}
}

// The NEC does not treat them apart; an unknown class and bad wiring are refused.
func TestMotorSupplyRefused(t *testing.T) {
	for _, e := range necEditions {
		_, err := conductor.Wiring{}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{})
		var table *tables.NotTabulatedError
		require.ErrorAs(t, err, &table, e)
	}
	for _, e := range cecEditions {
		_, err := conductor.Wiring{}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{InsulationClass: "Z"})
		assert.Equal(t, "motor.nameplate.insulation_class", tables.FieldOf(err))
		_, err = conductor.Wiring{Insulation: "THHN"}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{})
		assert.Equal(t, "wiring.insulation", tables.FieldOf(err))
		_, err = conductor.Wiring{Conductors: 2}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{})
		assert.Equal(t, "wiring.conductors", tables.FieldOf(err))
	}
	_, err := conductor.Wiring{}.SelectMotorSupply(0, load("80"), conductor.MotorEnd{})
	assert.Equal(t, "edition", tables.FieldOf(err))
}
