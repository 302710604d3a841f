package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// NEC 430.52(C)(3): 800 percent, 1100 for Design B energy-efficient and, from
// 2023, premium motors; raised to 1300 or 1700; direct current 250 percent.
func TestInstantaneousNEC(t *testing.T) {
	of := func(design string, class motor.Efficiency) motor.Motor {
		m := cage50() // 65 A
		m.Nameplate.DesignLetter, m.Nameplate.EfficiencyClass = design, class
		return m
	}
	for _, tt := range []struct {
		name         string
		editions     []tables.Edition
		m            motor.Motor
		limit, start string
	}{
		{"not marked", necEditions, of("", motor.StandardEfficiency), "520 A", "845 A"},
		{"Design B", necEditions, of("B", motor.StandardEfficiency), "520 A", "845 A"},
		{"Design B energy-efficient", necEditions, of("B", motor.EnergyEfficient), "715 A", "1105 A"},
		{"Design b energy-efficient", necEditions, of("b", motor.EnergyEfficient), "715 A", "1105 A"},
		{"Design B premium", to2020, of("B", motor.PremiumEfficiency), "520 A", "845 A"},
		{"Design B premium", from2023, of("B", motor.PremiumEfficiency), "715 A", "1105 A"},
		{"Design C energy-efficient", necEditions, of("C", motor.EnergyEfficient), "520 A", "845 A"},
		{"Design A premium", necEditions, of("A", motor.PremiumEfficiency), "520 A", "845 A"},
		{"no letter, premium", necEditions, of("", motor.PremiumEfficiency), "520 A", "845 A"},
		{"wound rotor, 40 hp", necEditions, motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("40"), Voltage: 460}, "416 A", "676 A"},
		{"single-phase, 3 hp", necEditions, motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 230}, "136 A", "221 A"},
		{"direct current, 10 hp", necEditions, motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}, "95 A", ""},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := device(t, e, magnetic, tt.m)
				assert.Equal(t, tt.limit, s.Limit.String())
				assert.Equal(t, "430.52(C)(3)", ref(s.Limit))
				assert.Equal(t, tt.limit, s.Instantaneous.String())
				assert.Equal(t, tt.start, s.StartLimit.String())
				if tt.start != "" {
					want := "430.52(C)(3) Exception No. 1"
					if e == tables.NEC2023 {
						want = "430.52(C)(3)(b)(2)"
					}
					assert.Equal(t, want, ref(s.StartLimit))
				}
				assert.True(t, s.Rating.IsZero(), "a setting has no standard rating")
				assert.True(t, s.StartRating.IsZero())
				assert.True(t, testkit.Cautioned(s.Cautions, "430.52(C)(3)", "listed combination controller"))
			})
		}
	}
}

// CEC 28-210: 1300 percent of full-load current or 215 percent of a marked
// locked-rotor current, the smaller where both are known; need not be below 15 A;
// direct current 250 percent to 50 hp and 200 above.
func TestInstantaneousCEC(t *testing.T) {
	rotor := func(amps, lr string) motor.Motor {
		m := drawing(amps)
		m.Nameplate.LockedRotor = motor.Amps(lr)
		return m
	}
	dc := func(power tables.Power, amps string) motor.Motor {
		return motor.Motor{Kind: motor.DirectCurrent, Power: power, Voltage: 240, Nameplate: motor.Nameplate{Amperes: motor.Amps(amps)}}
	}
	for _, tt := range []struct {
		name, want, work string
		m                motor.Motor
	}{
		{"full load", "793 A", "61 × 1300 %", drawing("61")},
		{"marked locked rotor", "752.5 A", "350 × 215 %", rotor("61", "350")},
		{"marked, but more", "793 A", "400 × 215 % = 860 A", rotor("61", "400")},
		{"15 A floor", "15 A", "1.1 × 1300 % = 14.3 A", drawing("1.1")},
		{"above the floor", "15.6 A", "1.2 × 1300 %", drawing("1.2")},
		{"floor over locked rotor", "15 A", "6 × 215 % = 12.9 A", rotor("1.2", "6")},
		{"wound rotor", "793 A", "61 × 1300 %", as(motor.WoundRotor, drawing("61"))},
		{"dc, 50 hp", "432.5 A", "173 × 250 %", dc(motor.HP("50"), "173")},
		{"dc, 51 hp", "352 A", "176 × 200 %", dc(motor.HP("51"), "176")},
		{"dc in amperes, 50 hp by Table D2", "432.5 A", "173 A is 50 hp", dc(tables.Power{}, "173")},
		{"dc in amperes, 60 hp by Table D2", "346.2 A", "173.1 × 200 %", dc(tables.Power{}, "173.1")},
		{"dc above Table D2", "1400 A", "700 × 200 %", dc(tables.Power{}, "700")},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := device(t, e, magnetic, tt.m)
				assert.Equal(t, tt.want, s.Limit.String(), tt.work)
				assert.Equal(t, tt.want, s.Instantaneous.String())
				assert.True(t, testkit.Rests(s.Limit, "Rule 28-210"))
				assert.True(t, s.Rating.IsZero())
				assert.True(t, s.StartLimit.IsZero(), "no second step")
				assert.True(t, testkit.Cautioned(s.Cautions, "Rule 28-210", "combination starter"))
				// 28-200(5): the same limit binds a breaker whose trip is adjusted apart.
				s = device(t, e, breaker, tt.m)
				assert.Equal(t, tt.want, s.Instantaneous.String())
				assert.True(t, testkit.Cautioned(s.Cautions, "Rule 28-200(5)", "instantaneous"))
				assert.True(t, device(t, e, timeDelay, tt.m).Instantaneous.IsZero())
			})
		}
	}
}

// Where the rules give no instantaneous-trip breaker: torque (430.52(D)) and
// hermetic motors (440.22, 28-708).
func TestInstantaneousRefused(t *testing.T) {
	for _, e := range tables.Editions() {
		motors := []motor.Motor{compressor("38", "", "")}
		if e.Code() == tables.NEC {
			motors = append(motors, torque("12"))
		}
		for _, m := range motors {
			s, err := protection.SizeShortCircuit(e, magnetic, m, demand(t, m, e))
			assert.Equal(t, "device", tables.FieldOf(err), "%v %v", m.Kind, e)
			assert.Equal(t, protection.ShortCircuit{}, s)
		}
	}
}
