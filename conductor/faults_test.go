package conductor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// CSA C22.1 Rule 28-104(1)(a): 60 °C wire is never good enough at a motor.
func TestMotorSupplySixtyDegreeWire(t *testing.T) {
	for _, e := range cecEditions {
		s, err := conductor.Wiring{Insulation: "TW"}.SelectMotorSupply(e, load("80"), conductor.MotorEnd{InsulationClass: "B"})
		require.NoError(t, err)
		assert.Equal(t, "75 °C insulation", s.Insulation)
		assert.True(t, testkit.Cautioned(s.Cautions, "Rule 28-104", "spliced"))
	}
}

// A load that is not given is refused, not sized by the smallest wire.
func TestSelectNeedsALoad(t *testing.T) {
	for _, e := range tables.Editions() {
		_, err := conductor.Wiring{}.Select(e, conductor.Load{Count: 3})
		assert.Equal(t, "load.ampacity", tables.FieldOf(err))
	}
}

// The rooftop adder is the NEC's: under the CEC the field alone is at fault.
func TestRooftopUnderTheCEC(t *testing.T) {
	err := conductor.Wiring{Rooftop: true, Ambient: motor.Celsius("60")}.Validate(tables.CEC2024)
	assert.ErrorContains(t, err, "wiring.rooftop")
	assert.NotContains(t, err.Error(), "wiring.ambient")
}
