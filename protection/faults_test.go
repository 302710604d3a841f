package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// CSA C22.1 Rules 28-704 and 28-708, NFPA 70 440.12(C): six times the
// rated-load current, also where a branch-circuit selection current is marked.
func TestHermeticSixTimesRatedLoad(t *testing.T) {
	for _, e := range cecEditions {
		s := device(t, e, breaker, compressor("38", "45", ""))
		assert.Equal(t, "114 A", s.Limit.String())
		assert.Equal(t, "110 A", s.Rating.String())
	}
	for _, e := range necEditions {
		assert.Equal(t, "228 A", demand(t, compressor("38", "45", ""), e).LockedRotor.High.String())
	}
}

// NFPA 70 430.4 and CSA C22.1 Rule 28-806: one time-delay fuse for both halves
// of a part winding, not above 150 percent.
func TestPartWindingFuse(t *testing.T) {
	for _, e := range tables.Editions() {
		s := device(t, e, timeDelay, started(motor.PartWinding, drawing("100")))
		assert.Equal(t, "150 A", s.Limit.String())
		assert.Equal(t, "150 A", s.StartRating.String())
	}
}

// NFPA 70 430.52(D) with 240.4(B): the step up ends at 800 A.
func TestTorqueAbove800(t *testing.T) {
	for _, e := range necEditions {
		assert.Equal(t, "800 A", device(t, e, breaker, torque("800")).Rating.String())
		assert.Equal(t, "800 A", device(t, e, breaker, torque("801")).Rating.String())
	}
}

func TestNoEdition(t *testing.T) {
	m := compressor("38", "", "")
	d := demand(t, m, tables.NEC2023)
	_, err := protection.SizeShortCircuit(0, breaker, m, d)
	assert.Equal(t, "edition", tables.FieldOf(err))
	_, err = protection.SizeOverload(0, m, d)
	assert.Equal(t, "edition", tables.FieldOf(err))
	assert.Equal(t, protection.Disconnect{}, protection.SizeDisconnect(0, m, d))
	assert.Equal(t, protection.Controller{}, protection.SizeController(0, m, d))
}
