package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// Table 430.52 / 430.52(C)(1), every type of motor and kind of device, at 100 A:
// the percent is the limit in amperes. A limit that is a standard rating stays.
func TestDevicePercentNEC(t *testing.T) {
	two := drawing("100")
	two.Phases = 2
	efficient := drawing("100")
	efficient.Nameplate.DesignLetter, efficient.Nameplate.EfficiencyClass = "B", motor.EnergyEfficient
	for _, tt := range []struct {
		name                        string
		m                           motor.Motor
		nonTime, timeDelay, breaker string
	}{
		{"single-phase", as(motor.SinglePhase, drawing("100")), "300 A", "175 A", "250 A"},
		{"squirrel cage", drawing("100"), "300 A", "175 A", "250 A"},
		{"two-phase", two, "300 A", "175 A", "250 A"},
		{"Design B energy-efficient", efficient, "300 A", "175 A", "250 A"},
		{"synchronous", as(motor.Synchronous, drawing("100")), "300 A", "175 A", "250 A"},
		{"wound rotor", as(motor.WoundRotor, drawing("100")), "150 A", "150 A", "150 A"},
		{"direct current", as(motor.DirectCurrent, drawing("100")), "150 A", "150 A", "150 A"},
	} {
		for _, e := range necEditions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				table := "Table 430.52"
				if e == tables.NEC2023 {
					table = "Table 430.52(C)(1)"
				}
				for kind, want := range map[tables.Device]string{nonTime: tt.nonTime, timeDelay: tt.timeDelay, breaker: tt.breaker} {
					s := device(t, e, kind, tt.m)
					assert.Equal(t, kind, s.Device)
					assert.Equal(t, want, s.Limit.String(), kind)
					assert.Equal(t, "430.52(C)(1)", ref(s.Limit))
					assert.True(t, testkit.Rests(s.Limit, table))
					assert.Equal(t, want, s.Rating.String(), "%v: a standard rating stays", kind)
					assert.True(t, s.Instantaneous.IsZero())
				}
			})
		}
	}
}

// The next standard rating up: 430.52(C)(1) Exception No. 1 to 2020, (C)(1)(a)
// from 2023. 10 A is a breaker rating from 2023 on, 240.6(A).
func TestNextRatingUpNEC(t *testing.T) {
	hp := func(hp string) motor.Motor {
		return motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(hp), Voltage: 460}
	}
	for _, tt := range []struct {
		name          string
		editions      []tables.Edition
		kind          tables.Device
		m             motor.Motor
		limit, rating string
	}{
		{"50 hp", necEditions, timeDelay, hp("50"), "113.75 A", "125 A"},
		{"50 hp", necEditions, nonTime, hp("50"), "195 A", "200 A"},
		{"50 hp", necEditions, breaker, hp("50"), "162.5 A", "175 A"},
		{"100 hp, published feeder example", necEditions, breaker, hp("100"), "310 A", "350 A"},
		{"2 hp", to2020, breaker, hp("2"), "8.5 A", "15 A"},
		{"2 hp", from2023, breaker, hp("2"), "8.5 A", "10 A"},
		{"4 A: exactly 10 A", to2020, breaker, drawing("4"), "10 A", "15 A"},
		{"4 A: exactly 10 A", from2023, breaker, drawing("4"), "10 A", "10 A"},
		{"4.004 A", from2023, breaker, drawing("4.004"), "10.01 A", "15 A"},
		{"2 hp fuse", necEditions, timeDelay, hp("2"), "5.95 A", "6 A"},
		{"2 hp fuse", necEditions, nonTime, hp("2"), "10.2 A", "15 A"},
		{"1/2 hp fuse", necEditions, timeDelay, hp("1/2"), "1.925 A", "3 A"},
		{"0.5 A fuse", necEditions, timeDelay, drawing("0.5"), "0.875 A", "1 A"},
		{"500 hp", necEditions, nonTime, hp("500"), "1770 A", "2000 A"},
		{"500 hp", necEditions, breaker, hp("500"), "1475 A", "1600 A"},
		{"600.6 A of fuse", necEditions, nonTime, drawing("200.2"), "600.6 A", "601 A"},
		{"600.6 A of breaker", necEditions, breaker, drawing("240.24"), "600.6 A", "700 A"},
		{"the largest rating", necEditions, nonTime, drawing("2000"), "6000 A", "6000 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+tt.kind.String()+" "+e.String(), func(t *testing.T) {
				s := device(t, e, tt.kind, tt.m)
				assert.Equal(t, tt.limit, s.Limit.String())
				assert.Equal(t, tt.rating, s.Rating.String())
				want := "430.52(C)(1) Exception No. 1"
				if e == tables.NEC2023 {
					want = "430.52(C)(1)(a)"
				}
				assert.Equal(t, want, ref(s.Rating))
				assert.True(t, testkit.Rests(s.Rating, "240.6(A)"))
				assert.True(t, testkit.Cautioned(s.Cautions, "430.52(C)(2)", "lower maximum"))
			})
		}
	}
	for _, e := range necEditions {
		m := drawing("2000.01")
		s, err := protection.SizeShortCircuit(e, nonTime, m, demand(t, m, e))
		var none *tables.NoSizeError
		require.ErrorAs(t, err, &none, "6000.03 A is above every rating")
		assert.Equal(t, "device", none.Field)
		assert.Equal(t, "6000.03 A", none.Need.String())
		assert.Equal(t, protection.ShortCircuit{}, s)
	}
}

// If the motor will not start: 400 percent for non-time-delay fuses to 600 A and
// 300 above, 225 for time-delay fuses, 400 for breakers of motors to 100 A and 300
// above; never above, so the rating is the one at or below, and never less than
// the ordinary rating.
func TestStartRatingNEC(t *testing.T) {
	for _, tt := range []struct {
		name         string
		editions     []tables.Edition
		kind         tables.Device
		amps         string
		limit, start string
	}{
		{"breaker, 65 A", necEditions, breaker, "65", "260 A", "250 A"},
		{"breaker, 100 A", necEditions, breaker, "100", "400 A", "400 A"},
		{"breaker, 100.01 A", necEditions, breaker, "100.01", "300.03 A", "300 A"},
		{"breaker, 101 A", necEditions, breaker, "101", "303 A", "300 A"},
		{"time-delay, 65 A", necEditions, timeDelay, "65", "146.25 A", "125 A"},
		{"time-delay, exactly standard", necEditions, timeDelay, "100", "225 A", "225 A"},
		{"time-delay, ordinary rating stays", necEditions, timeDelay, "1.1", "2.475 A", "3 A"}, // next up of 1.925 A
		{"non-time-delay, exactly 600 A", necEditions, nonTime, "150", "600 A", "600 A"},
		{"non-time-delay, 151 A", necEditions, nonTime, "151", "600 A", "600 A"}, // 604 A belongs to the class above, which has 453 A
		{"non-time-delay, 200 A", necEditions, nonTime, "200", "600 A", "600 A"},
		{"non-time-delay, 201 A", necEditions, nonTime, "201", "603 A", "700 A"},   // ordinary: 603 A, next up 700 A
		{"non-time-delay, 233 A", necEditions, nonTime, "233", "699 A", "700 A"},   // ordinary: 699 A, next up 700 A
		{"non-time-delay, 590 A", necEditions, nonTime, "590", "1770 A", "2000 A"}, // ordinary: 1770 A, next up 2000 A
		{"breaker, 3.4 A", to2020, breaker, "3.4", "13.6 A", "15 A"},               // no rating to 13.6 A before 2023: the ordinary one
		{"breaker, 3.4 A", from2023, breaker, "3.4", "13.6 A", "10 A"},
	} {
		for _, e := range tt.editions {
			t.Run(tt.name+" "+e.String(), func(t *testing.T) {
				s := device(t, e, tt.kind, drawing(tt.amps))
				assert.Equal(t, tt.limit, s.StartLimit.String())
				assert.Equal(t, tt.start, s.StartRating.String())
				want := "430.52(C)(1) Exception No. 2"
				if e == tables.NEC2023 {
					want = "430.52(C)(1)(b)"
				}
				assert.Equal(t, want, ref(s.StartLimit))
				assert.Equal(t, want, ref(s.StartRating))
			})
		}
	}
}

// A wound-rotor motor shows the class of fuses above 600 A free of the ordinary
// rating: 150 percent ordinarily, then 300; 601 A is a fuse rating of its own.
func TestLargeFusesNEC(t *testing.T) {
	for amps, want := range map[string][2]string{
		"200": {"300 A", "600 A"}, "201": {"350 A", "601 A"}, "233": {"350 A", "601 A"}, "234": {"400 A", "700 A"},
	} {
		for _, e := range necEditions {
			s := device(t, e, nonTime, as(motor.WoundRotor, drawing(amps)))
			assert.Equal(t, want[0], s.Rating.String(), amps)
			assert.Equal(t, want[1], s.StartRating.String(), amps)
		}
	}
}

// Torque motors, 430.52(D): nameplate current and the next standard rating up.
func TestTorqueDeviceNEC(t *testing.T) {
	for _, tt := range []struct {
		editions     []tables.Edition
		kind         tables.Device
		amps, rating string
	}{
		{necEditions, timeDelay, "12", "15 A"},
		{necEditions, breaker, "12", "15 A"},
		{necEditions, breaker, "15", "15 A"},
		{necEditions, breaker, "15.01", "20 A"},
		{to2020, breaker, "9", "15 A"},
		{from2023, breaker, "9", "10 A"},
		{necEditions, nonTime, "800", "800 A"},
		{necEditions, nonTime, "700.1", "800 A"}, // 240.4(B) steps up to 800 A
	} {
		for _, e := range tt.editions {
			s := device(t, e, tt.kind, torque(tt.amps))
			assert.Equal(t, tt.amps+" A", s.Limit.String())
			assert.Equal(t, tt.rating, s.Rating.String(), "%v %v", tt.amps, e)
			assert.Equal(t, "430.52(D)", ref(s.Limit))
			assert.Equal(t, "430.52(D)", ref(s.Rating))
			assert.True(t, s.StartLimit.IsZero())
			assert.True(t, s.StartRating.IsZero())
		}
	}
}

// The note to the table: synchronous motors of about 450 r/min or less.
func TestLowSpeedSynchronous(t *testing.T) {
	for rpm, want := range map[int]bool{0: false, 450: true, 451: false} {
		m := as(motor.Synchronous, drawing("100"))
		m.Nameplate.SpeedRPM = rpm
		for _, e := range tables.Editions() {
			rule := map[tables.Edition]string{tables.NEC2017: "Table 430.52", tables.NEC2020: "Table 430.52", tables.NEC2023: "Table 430.52(C)(1)"}[e]
			if rule == "" {
				rule = "Table 29"
			}
			assert.Equal(t, want, testkit.Cautioned(device(t, e, breaker, m).Cautions, rule, "200 percent"), "%d r/min %v", rpm, e)
		}
	}
}

func TestDeviceRefused(t *testing.T) {
	for _, e := range tables.Editions() {
		m := cage50()
		for _, kind := range []tables.Device{0, 99} {
			s, err := protection.SizeShortCircuit(e, kind, m, demand(t, m, e))
			assert.Equal(t, "device", tables.FieldOf(err))
			assert.Equal(t, protection.ShortCircuit{}, s)
		}
	}
	m := cage50()
	_, err := protection.SizeShortCircuit(0, breaker, m, demand(t, m, tables.NEC2023))
	assert.Equal(t, "edition", tables.FieldOf(err))
}
