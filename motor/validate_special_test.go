package motor_test

import (
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Fields of special motors that cannot stand, and the field that the error names.
func TestValidateSpecial(t *testing.T) {
	plain := func() motor.Motor { return cage50() }
	rectified := func() motor.Motor {
		m := dc()
		m.Rectifier, m.Nameplate.RectifierInput = motor.HalfWave, motor.Amps("44")
		return m
	}
	pump := func() motor.Motor { m := cage50(); m.Use = motor.FirePump; return m }
	for _, tt := range []struct {
		name  string
		start func() motor.Motor
		alter func(*motor.Motor)
		want  []string
	}{
		{"bypass without a drive", plain, func(m *motor.Motor) { m.Bypass = true }, []string{"motor.bypass"}},
		{"unknown resistor", wound, func(m *motor.Motor) { m.Resistor = 99 }, []string{"motor.resistor"}},
		{"resistor of a cage motor", plain, func(m *motor.Motor) { m.Resistor = tables.LightStarting }, []string{"motor.resistor"}},
		{"resistor without secondary current", wound, func(m *motor.Motor) {
			m.Resistor, m.Nameplate.Secondary = tables.LightStarting, tables.Current{}
		}, []string{"motor.nameplate.secondary_amperes"}},
		{"unknown rectifier", dc, func(m *motor.Motor) { m.Rectifier = 3 }, []string{"motor.rectifier"}},
		{"rectifier of an ac motor", plain, func(m *motor.Motor) { m.Rectifier = motor.FullWave }, []string{"motor.rectifier"}},
		{"rectifier without input", dc, func(m *motor.Motor) { m.Rectifier = motor.FullWave }, []string{"motor.nameplate.rectifier_input_amperes"}},
		{"input without a rectifier", dc, func(m *motor.Motor) { m.Nameplate.RectifierInput = motor.Amps("9") }, []string{"motor.nameplate.rectifier_input_amperes"}},
		{"input of 0 A", rectified, func(m *motor.Motor) { m.Nameplate.RectifierInput = motor.Amps("0") }, []string{"motor.nameplate.rectifier_input_amperes"}},
		{"unknown use", plain, func(m *motor.Motor) { m.Use = 3 }, []string{"motor.use"}},
		{"fire pump of direct current", dc, func(m *motor.Motor) { m.Use = motor.FirePump }, []string{"motor.use"}},
		{"fire pump on a drive", pump, func(m *motor.Motor) { m.Starting, m.Nameplate.DriveInput = motor.Drive, motor.Amps("60") }, []string{"motor.use"}},
		{"fire pump of short duty", pump, func(m *motor.Motor) { m.Duty = motor.Duty{Kind: motor.ShortTime, Minutes: 30} }, []string{"motor.use"}},
		{"minimum ampacity of a cage motor", plain, func(m *motor.Motor) { m.Nameplate.MinimumAmpacity = motor.Amps("60") }, []string{"motor.nameplate.minimum_circuit_ampacity"}},
		{"minimum ampacity of 0 A", func() motor.Motor { return compressor("38", "", "") }, func(m *motor.Motor) { m.Nameplate.MinimumAmpacity = motor.Amps("0") },
			[]string{"motor.nameplate.minimum_circuit_ampacity"}},
		{"maximum device of 0 A", plain, func(m *motor.Motor) { m.Nameplate.MaximumDevice = motor.Amps("0") }, []string{"motor.nameplate.maximum_device_rating"}},
		{"one winding", twoSpeed, func(m *motor.Motor) { m.Nameplate.Windings = m.Nameplate.Windings[:1] }, []string{"motor.nameplate.windings"}},
		{"five windings", twoSpeed, func(m *motor.Motor) {
			w := m.Nameplate.Windings[0]
			m.Nameplate.Windings = []motor.Winding{w, w, w, w, w}
		}, []string{"motor.nameplate.windings"}},
		{"windings and amperes", twoSpeed, func(m *motor.Motor) { m.Nameplate.Amperes = motor.Amps("28") }, []string{"motor.nameplate.amperes"}},
		{"windings in wye-delta", twoSpeed, func(m *motor.Motor) { m.Starting = motor.WyeDelta }, []string{"motor.nameplate.windings"}},
		{"windings of a torque motor", twoSpeed, func(m *motor.Motor) { m.Kind = motor.Torque }, []string{"motor.nameplate.windings"}},
		{"winding without current", twoSpeed, func(m *motor.Motor) { m.Nameplate.Windings[1].Amperes = tables.Current{} }, []string{"motor.nameplate.windings[1].amperes"}},
		{"winding of 0 A", twoSpeed, func(m *motor.Motor) { m.Nameplate.Windings[0].Amperes = motor.Amps("0") }, []string{"motor.nameplate.windings[0].amperes"}},
		{"winding of too much", twoSpeed, func(m *motor.Motor) { m.Nameplate.Windings[0].Amperes = motor.Amps("100001") }, []string{"motor.nameplate.windings[0].amperes"}},
		{"several", plain, func(m *motor.Motor) { m.Bypass, m.Resistor, m.Use = true, 99, 9 }, []string{"motor.bypass", "motor.resistor", "motor.use"}},
	} {
		t.Run(tt.name, func(t *testing.T) {
			m := tt.start()
			require.NoError(t, m.Validate(), "sound before it is altered")
			tt.alter(&m)
			var fields []string
			for _, one := range tables.Faults(m.Validate()) {
				fields = append(fields, tables.FieldOf(one))
			}
			assert.Equal(t, tt.want, fields)
		})
	}
	four := twoSpeed()
	four.Nameplate.Windings = append(four.Nameplate.Windings, four.Nameplate.Windings...)
	assert.NoError(t, four.Validate(), "four speeds are the most")
}
