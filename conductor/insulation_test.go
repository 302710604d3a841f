package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/tables"
)

// A type is rated by the moisture of its place; on 90 °C terminals 4 AWG copper
// shows the column: 70, 85 or 95 A. A type that the place forbids is refused.
// NEC Table 310.4, CEC Table 19.
func TestLocations(t *testing.T) {
	for _, tt := range []struct {
		editions   []tables.Edition
		insulation string
		location   tables.Location
		ampacity   string // of 4 AWG, "" if refused
	}{
		{necEditions, "THHW", tables.Dry, "95 A"},
		{necEditions, "THHW", tables.Wet, "85 A"},
		{necEditions, "XHHW", tables.Damp, "95 A"},
		{necEditions, "XHHW", tables.Wet, "85 A"},
		{necEditions, "THWN-2", tables.Wet, "95 A"},
		{necEditions, "THHN", tables.Damp, "95 A"},
		{necEditions, "THHN", tables.Wet, ""},
		{necEditions, "RHH", tables.Wet, ""},
		{necEditions, "SIS", tables.Dry, "95 A"},
		{necEditions, "SIS", tables.Damp, ""},
		{necEditions, "MTW", tables.Dry, "95 A"},
		{necEditions, "MTW", tables.Wet, "70 A"},
		{cecEditions, "RW90", tables.Wet, "95 A"},
		{cecEditions, "R90", tables.Damp, "95 A"},
		{cecEditions, "R90", tables.Wet, ""},
		{cecEditions, "T90 Nylon", tables.Damp, "95 A"},
		{cecEditions, "T90 Nylon", tables.Wet, ""},
		{cecEditions, "TWN75", tables.Wet, "85 A"},
		{cecEditions, "RW90XLPE", tables.Wet, "95 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.insulation+" "+tt.location.String()+" "+e.String(), func(t *testing.T) {
				w := conductor.Wiring{Insulation: tt.insulation, Location: tt.location, Termination: 90, Sets: 1}
				asked := tt.ampacity
				if asked == "" {
					asked = "66"
				}
				s, err := w.Select(e, load(asked[:2]))
				if tt.ampacity == "" {
					var input *tables.InputError
					require.ErrorAs(t, err, &input)
					assert.Equal(t, "wiring.insulation", input.Field)
					assert.Contains(t, input.Want, tt.location.String())
					return
				}
				require.NoError(t, err)
				assert.Equal(t, "4 AWG", s.Size.String())
				assert.Equal(t, tt.ampacity, s.Ampacity.String())
				assert.Equal(t, tt.location, s.Location)
			})
		}
	}
}

// Cables that may not be pulled into a raceway: CEC Table 19.
func TestCablesInRaceway(t *testing.T) {
	for insulation, allowed := range map[string]bool{
		"AC90": false, "ACG90": false, "NS75": false, "NS90": false, "RA90": false, "RC90": false, "MI": false,
		"TECK90": true, "ACWU90": true, "NMD90": true, "RWU90": true, "RW90": true,
	} {
		for _, e := range cecEditions {
			w := conductor.Wiring{Insulation: insulation, Termination: 75}
			_, err := w.Select(e, load("20"))
			if allowed {
				assert.NoError(t, err, insulation)
			} else {
				assert.Equal(t, "wiring.insulation", tables.FieldOf(err), insulation)
				assert.ErrorContains(t, err, "raceway", insulation)
			}
			for _, run := range []tables.Run{tables.InCable, tables.InFreeAir} {
				w.Run = run
				_, err = w.Select(e, load("20"))
				assert.NoError(t, err, insulation)
			}
		}
	}
}

// Conditions of use that the table notes are told.
func TestInsulationNotes(t *testing.T) {
	s := chosen(t, conductor.Wiring{Insulation: "UF"}, tables.NEC2023, load("20"))
	assert.True(t, testkit.Cautioned(s.Cautions, "Table 310.4(1)", "Article 340"))
	s = chosen(t, conductor.Wiring{Insulation: "TECK90"}, tables.CEC2024, load("20"))
	assert.True(t, testkit.Cautioned(s.Cautions, "Table 19", "jacket"))
	s = chosen(t, conductor.Wiring{Insulation: "XHHW"}, tables.NEC2023, load("20"))
	assert.False(t, testkit.Cautioned(s.Cautions, "Table 310.4(1)", ""), "no conditions")
}

// The CEC's types are not the NEC's.
func TestForeignInsulation(t *testing.T) {
	for e, insulation := range map[tables.Edition]string{tables.NEC2023: "RW90", tables.NEC2017: "TECK90", tables.CEC2021: "THHN", tables.CEC2024: "XHHW-2"} {
		_, err := conductor.Wiring{Insulation: insulation}.Select(e, load("20"))
		assert.Equal(t, "wiring.insulation", tables.FieldOf(err))
	}
}
