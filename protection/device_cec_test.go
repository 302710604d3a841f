package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// CEC 28-200(3), Table 29: never above the limit, so the standard rating at or
// below, but 15 A is always allowed.
func TestDeviceCEC(t *testing.T) {
	for _, tt := range []struct {
		name          string
		kind          tables.Device
		m             motor.Motor
		limit, rating string
		source        string
	}{
		{"62 A", timeDelay, drawing("62"), "108.5 A", "100 A", "design guide on the Ontario code"},
		{"27 A", timeDelay, drawing("27"), "47.25 A", "45 A", "design guide on the Ontario code"},
		{"11 A", timeDelay, drawing("11"), "19.25 A", "15 A", "design guide on the Ontario code"},
		{"62 A", nonTime, drawing("62"), "186 A", "175 A", "Table 29: 300 percent"},
		{"62 A", breaker, drawing("62"), "155 A", "150 A", "Table 29: 250 percent"},
		{"exactly standard", timeDelay, drawing("100"), "175 A", "175 A", "175 percent"},
		{"exactly standard", breaker, drawing("60"), "150 A", "150 A", "250 percent"},
		{"just below standard", breaker, drawing("59.99"), "149.975 A", "125 A", "250 percent"},
		{"15 A always", timeDelay, drawing("3"), "5.25 A", "15 A", "28-200(3)(a)"},
		{"15 A always", breaker, drawing("5.9"), "14.75 A", "15 A", "28-200(3)(a)"},
		{"above Table 13", nonTime, drawing("400"), "1200 A", "1200 A", "ratings above 800 A: common practice, no source"},
		{"single-phase", nonTime, as(motor.SinglePhase, drawing("62")), "186 A", "175 A", "Table 29"},
		{"synchronous", breaker, as(motor.Synchronous, drawing("62")), "155 A", "150 A", "Table 29"},
		{"wound rotor", nonTime, as(motor.WoundRotor, drawing("62")), "93 A", "90 A", "Table 29: 150 percent"},
		{"wound rotor", timeDelay, as(motor.WoundRotor, drawing("62")), "93 A", "90 A", "Table 29: 150 percent"},
		{"wound rotor", breaker, as(motor.WoundRotor, drawing("62")), "93 A", "90 A", "Table 29: 150 percent"},
		{"direct current", timeDelay, as(motor.DirectCurrent, drawing("62")), "93 A", "90 A", "Table 29: 150 percent"},
		{"direct current", breaker, as(motor.DirectCurrent, drawing("62")), "93 A", "90 A", "Table 29: 150 percent"},
	} {
		for _, e := range cecEditions {
			t.Run(tt.name+" "+tt.kind.String()+" "+e.String(), func(t *testing.T) {
				s := device(t, e, tt.kind, tt.m)
				assert.Equal(t, tt.limit, s.Limit.String(), tt.source)
				assert.Equal(t, "Rule 28-200(3)", ref(s.Limit))
				assert.True(t, testkit.Rests(s.Limit, "Table 29"))
				assert.Equal(t, tt.rating, s.Rating.String(), tt.source)
				assert.Equal(t, "Rule 28-200(3)", ref(s.Rating))
				assert.True(t, testkit.Cautioned(s.Cautions, "Rule 28-202", "marked"))
			})
		}
	}
}

// Autotransformer and star-delta starting split at 30 A; part-winding, resistor
// and soft starters take the full-voltage row. Table 29.
func TestReducedVoltageCEC(t *testing.T) {
	for _, tt := range []struct {
		start                       motor.Starting
		amps                        string
		nonTime, timeDelay, breaker string // limits
	}{
		{motor.Autotransformer, "30", "75 A", "52.5 A", "60 A"},             // 250, 175, 200 percent
		{motor.Autotransformer, "30.01", "60.02 A", "52.5175 A", "60.02 A"}, // 200, 175, 200 percent
		{motor.Autotransformer, "31", "62 A", "54.25 A", "62 A"},
		{motor.WyeDelta, "30", "75 A", "52.5 A", "60 A"},
		{motor.WyeDelta, "31", "62 A", "54.25 A", "62 A"},
		{motor.AcrossTheLine, "31", "93 A", "54.25 A", "77.5 A"}, // 300, 175, 250 percent
		{motor.Resistor, "31", "93 A", "54.25 A", "77.5 A"},
		{motor.SoftStarter, "31", "93 A", "54.25 A", "77.5 A"},
	} {
		for _, e := range cecEditions {
			for kind, want := range map[tables.Device]string{nonTime: tt.nonTime, timeDelay: tt.timeDelay, breaker: tt.breaker} {
				s := device(t, e, kind, started(tt.start, drawing(tt.amps)))
				assert.Equal(t, want, s.Limit.String(), "%v %s A %v", tt.start, tt.amps, kind)
				assert.Equal(t, tt.start == motor.SoftStarter, testkit.Cautioned(s.Cautions, "Table 29", "soft starter"))
			}
		}
	}
	// The way of starting does not matter to the other rows.
	for _, e := range cecEditions {
		assert.Equal(t, "46.5 A", device(t, e, breaker, started(motor.Resistor, as(motor.WoundRotor, drawing("31")))).Limit.String())
	}
	// Nor to the NEC.
	for _, e := range necEditions {
		assert.Equal(t, "77.5 A", device(t, e, breaker, started(motor.WyeDelta, drawing("31"))).Limit.String())
	}
}

// If the motor will not start, 28-200(4): the thresholds are on the rating of the
// device, so a breaker stays at 100 A until 300 percent reaches beyond it.
func TestStartRatingCEC(t *testing.T) {
	for _, tt := range []struct {
		kind         tables.Device
		amps         string
		limit, start string
	}{
		{breaker, "20", "80 A", "80 A"},
		{breaker, "24.99", "99.96 A", "90 A"},
		{breaker, "25", "100 A", "100 A"},
		{breaker, "30", "100 A", "100 A"}, // 400 percent is 120 A, 300 percent 90 A
		{breaker, "33.4", "100.2 A", "100 A"},
		{breaker, "36", "108 A", "100 A"},
		{breaker, "36.6", "109.8 A", "100 A"},
		{breaker, "37", "111 A", "110 A"},
		{breaker, "62", "186 A", "175 A"},
		{timeDelay, "62", "139.5 A", "125 A"},
		{timeDelay, "100", "225 A", "225 A"},
		{nonTime, "62", "248 A", "225 A"},
		{nonTime, "150", "600 A", "600 A"},
		{nonTime, "160", "600 A", "600 A"},
		{nonTime, "200", "600 A", "600 A"},
		{nonTime, "201", "603 A", "600 A"},
		{nonTime, "240", "720 A", "700 A"},
		{timeDelay, "3", "6.75 A", "15 A"},
		{breaker, "3", "12 A", "15 A"},
	} {
		for _, e := range cecEditions {
			s := device(t, e, tt.kind, drawing(tt.amps))
			assert.Equal(t, tt.limit, s.StartLimit.String(), "%v %s A", tt.kind, tt.amps)
			assert.Equal(t, tt.start, s.StartRating.String(), "%v %s A", tt.kind, tt.amps)
			assert.Equal(t, "Rule 28-200(4)", ref(s.StartLimit))
		}
	}
}
