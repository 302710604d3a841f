package motor_test

import (
	"encoding"
	"encoding/json"
	"fmt"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// An enumeration as a test sees it: its texts by value, and a reader into a
// fresh value. "" stands for the zero value only where it has no text.
type enumeration struct {
	name  string
	field string
	texts map[uint8]string
	read  func(text string) (value uint8, printed string, err error)
}

type texter interface {
	encoding.TextMarshaler
	fmt.Stringer
}

// reader reads into a value that already holds another one, so that an error
// is seen to reset it.
func reader[T ~uint8, P interface {
	*T
	encoding.TextUnmarshaler
}](other T) func(string) (uint8, string, error) {
	return func(text string) (uint8, string, error) {
		v := other
		err := P(&v).UnmarshalText([]byte(text))
		printed, _ := any(v).(texter).MarshalText()
		return uint8(v), string(printed), err
	}
}

var enumerations = []enumeration{
	{"Kind", "motor.kind", map[uint8]string{
		1: "squirrel_cage", 2: "single_phase", 3: "wound_rotor", 4: "synchronous", 5: "dc", 6: "torque", 7: "hermetic",
	}, reader(motor.Torque)},
	{"Starting", "motor.starting", map[uint8]string{
		0: "across_the_line", 1: "wye_delta", 2: "part_winding", 3: "autotransformer", 4: "resistor", 5: "soft_starter", 6: "drive",
	}, reader(motor.Drive)},
	{"Efficiency", "motor.nameplate.efficiency_class", map[uint8]string{
		0: "standard", 1: "energy_efficient", 2: "premium",
	}, reader(motor.PremiumEfficiency)},
	{"Duty", "motor.duty.kind", map[uint8]string{
		0: "continuous", 1: "short_time", 2: "intermittent", 3: "periodic", 4: "varying",
	}, reader(tables.Varying)},
	{"Use", "motor.use", map[uint8]string{0: "ordinary", 1: "fire_pump", 2: "valve_actuator"}, reader(motor.FirePump)},
	{"Rectifier", "motor.rectifier", map[uint8]string{0: "none", 1: "half_wave", 2: "full_wave"}, reader(motor.FullWave)},
	{"ResistorDuty", "motor.resistor", map[uint8]string{
		1: "light_starting", 2: "heavy_starting", 3: "extra_heavy_starting", 4: "light_intermittent", 5: "medium_intermittent", 6: "heavy_intermittent", 7: "continuous",
	}, reader(tables.HeavyIntermittent)},
}

func TestEnumerationTexts(t *testing.T) {
	for _, x := range enumerations {
		t.Run(x.name, func(t *testing.T) {
			for value, text := range x.texts {
				spaced := " " + strings.ToUpper(strings.ReplaceAll(text, "_", " ")) + " "
				for _, in := range []string{text, spaced, strings.ReplaceAll(text, "_", "-")} {
					got, printed, err := x.read(in)
					require.NoError(t, err)
					assert.Equal(t, value, got, in)
					assert.Equal(t, text, printed)
				}
			}
			got, _, err := x.read("")
			require.NoError(t, err)
			assert.Zero(t, got, "no text is the zero value")
			for _, bad := range []string{"nothing", "_", "squirrel", "٥", "wye_delta_", strings.Repeat("x", 10000), "\xff"} {
				got, _, err := x.read(bad)
				var input *tables.InputError
				require.ErrorAs(t, err, &input)
				assert.Equal(t, x.field, input.Field)
				assert.Zero(t, got, "an error resets the value")
				assert.Less(t, len(err.Error()), 300)
			}
		})
	}
}

func TestUnknownValuesPrintNothing(t *testing.T) {
	assert.Empty(t, motor.Kind(0).String())
	assert.Empty(t, motor.Kind(99).String())
	assert.Empty(t, motor.Kind(99).Name())
	assert.Empty(t, motor.Starting(99).String())
	assert.Empty(t, motor.Efficiency(99).String())
	assert.Equal(t, "wound-rotor motor", motor.WoundRotor.Name())
}

// A motor goes through JSON unchanged, fields not given left out.
func TestMotorJSON(t *testing.T) {
	m := motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("7-1/2"), Voltage: 460, Starting: motor.Resistor,
		Duty:      motor.Duty{Kind: motor.Intermittent, Minutes: 30},
		Nameplate: motor.Nameplate{Amperes: motor.Amps("10.4"), ServiceFactor: motor.Factor("1.15"), CodeLetter: "H"}}
	text, err := json.Marshal(m)
	require.NoError(t, err)
	assert.JSONEq(t, `{"kind":"wound_rotor","power":"7-1/2 hp","voltage":460,"starting":"resistor",
		"nameplate":{"amperes":"10.4 A","service_factor":"1.15","code_letter":"H"},
		"duty":{"kind":"intermittent","minutes":30}}`, string(text))
	var back motor.Motor
	require.NoError(t, json.Unmarshal(text, &back))
	assert.Equal(t, m, back)
}
