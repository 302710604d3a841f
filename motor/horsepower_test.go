package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The horsepower by which switches and controllers are chosen. A motor marked in
// amperes takes the first table row that carries them; a hermetic compressor
// the larger of its equivalents by rated-load and by locked-rotor current, next
// row up in each (440.12(A)).
func TestHorsepower(t *testing.T) {
	cage := func(power tables.Power, volts int, plate string) motor.Motor {
		return motor.Motor{Kind: motor.SquirrelCage, Power: power, Voltage: volts, Nameplate: motor.Nameplate{Amperes: amps(plate)}}
	}
	single := compressor("20", "", "110")
	single.Phases = 1
	larger := compressor("20", "", "200")
	larger.Phases = 1
	none := tables.Power{}
	for _, tt := range []struct {
		name     string
		editions []tables.Edition
		m        motor.Motor
		want     string // "" for none
		source   string
	}{
		{"marked", tables.Editions(), cage(motor.HP("7-1/2"), 460, ""), "7-1/2 hp", "the motor's own"},
		{"amperes below a row", tables.Editions(), cage(none, 460, "48"), "40 hp", "430.6(A); 40 hp is 52 A, 30 hp is 40 A"},
		{"amperes on a row", tables.Editions(), cage(none, 460, "52"), "40 hp", "52 A"},
		{"amperes above a row", tables.Editions(), cage(none, 460, "52.1"), "50 hp", "65 A"},
		{"amperes above the table", tables.Editions(), cage(none, 460, "590.1"), "", "500 hp is 590 A"},
		{"kilowatts", tables.Editions(), cage(motor.KW("30"), 460, "48.5"), "40 hp", "as marked in amperes"},
		{"torque", tables.Editions(), motor.Motor{Kind: motor.Torque, Voltage: 230, Nameplate: motor.Nameplate{Amperes: motor.Amps("12")}}, "", "not rated in horsepower"},
		{"hermetic by rated load", necEditions, compressor("38", "40", "200"), "15 hp", "40 A -> 15 hp (42 A); 200 A -> 15 hp (232 A)"},
		{"hermetic, locked rotor on a row", necEditions, compressor("38", "", "232"), "15 hp", "232 A is 15 hp"},
		{"hermetic by locked rotor", necEditions, compressor("38", "", "232.1"), "20 hp", "290 A is 20 hp"},
		{"hermetic, not marked", necEditions, compressor("38", "", ""), "15 hp", "6 × 38 = 228 A -> 15 hp (232 A)"},
		{"hermetic single-phase by rated load", necEditions, single, "5 hp", "20 A -> 5 hp (28 A); 110 A -> 5 hp (168 A)"},
		{"hermetic single-phase by locked rotor", necEditions, larger, "7-1/2 hp", "200 A -> 7-1/2 hp (240 A)"},
		{"hermetic above the locked-rotor table", necEditions, compressor("38", "", "4000"), "", "230 V ends at 2900 A"},
		{"hermetic", cecEditions, compressor("38", "", "290"), "15 hp", "28-704: 38 A -> 15 hp (42 A)"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				assert.Equal(t, tt.want, demand(t, tt.m, e).Horsepower.String(), tt.source)
			})
		}
	}
}

// What was taken for a motor that is not marked in horsepower is told.
func TestHorsepowerCautions(t *testing.T) {
	m := motor.Motor{Kind: motor.SquirrelCage, Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("48")}}
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "430.6(A)(1)", "amperes only"), e)
	}
	for _, e := range cecEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "Tables 44, 45 and D2", "not marked in horsepower"), e)
	}
	m.Power = motor.KW("30")
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "430.6(A)(1)", "kilowatts"), e)
	}
	m.Power, m.Nameplate.Amperes = tables.Power{}, motor.Amps("591")
	for _, e := range necEditions {
		assert.True(t, testkit.Cautioned(demand(t, m, e).Cautions, "430.6(A)(1)", "no horsepower follows"), e)
	}
}
