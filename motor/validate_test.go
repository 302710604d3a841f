package motor_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Each bad value of each field, alone: one *tables.InputError that names it.
func TestValidateFields(t *testing.T) {
	const n = "motor.nameplate."
	for _, tt := range []struct {
		field string
		name  string
		set   func(*motor.Motor)
	}{
		{"motor.kind", "none", func(m *motor.Motor) { m.Kind = 0 }},
		{"motor.kind", "unknown", func(m *motor.Motor) { m.Kind = 99 }},
		{"motor.kind", "the first unknown", func(m *motor.Motor) { m.Kind = motor.Hermetic + 1 }},
		{n + "efficiency_class", "the first unknown", func(m *motor.Motor) { m.Nameplate.EfficiencyClass = motor.PremiumEfficiency + 1 }},
		{n + "windings[1].amperes", "0 A", func(m *motor.Motor) {
			m.Nameplate.Amperes, m.Nameplate.Windings = tables.Current{}, []motor.Winding{{Amperes: motor.Amps("100000")}, {Amperes: motor.Amps("0")}}
		}},
		{"motor.phases", "single-phase cage", func(m *motor.Motor) { m.Phases = 1 }},
		{"motor.phases", "four", func(m *motor.Motor) { m.Phases = 4 }},
		{"motor.phases", "negative", func(m *motor.Motor) { m.Phases = -1 }},
		{"motor.phases", "three-phase single-phase motor", func(m *motor.Motor) { m.Kind, m.Phases = motor.SinglePhase, 3 }},
		{"motor.phases", "single-phase synchronous", func(m *motor.Motor) { m.Kind, m.Phases = motor.Synchronous, 1 }},
		{"motor.phases", "two-phase synchronous", func(m *motor.Motor) { m.Kind, m.Phases = motor.Synchronous, 2 }},
		{"motor.phases", "single-phase wound rotor", func(m *motor.Motor) { m.Kind, m.Phases = motor.WoundRotor, 1 }},
		{"motor.phases", "dc with phases", func(m *motor.Motor) { m.Kind, m.Phases = motor.DirectCurrent, 3 }},
		{"motor.phases", "hermetic with four", func(m *motor.Motor) { m.Kind, m.Phases = motor.Hermetic, 4 }},
		{"motor.power", "neither power nor amperes", func(m *motor.Motor) { m.Power, m.Nameplate.Amperes = tables.Power{}, tables.Current{} }},
		{n + "amperes", "torque, neither", func(m *motor.Motor) {
			m.Kind, m.Power, m.Nameplate.Amperes = motor.Torque, tables.Power{}, tables.Current{}
		}},
		{"motor.power", "absurd", func(m *motor.Motor) { m.Power = motor.HP("100000.1") }},
		{"motor.power", "absurd kilowatts", func(m *motor.Motor) { m.Power = motor.KW("100001") }},
		{"motor.voltage", "none", func(m *motor.Motor) { m.Voltage = 0 }},
		{"motor.voltage", "negative", func(m *motor.Motor) { m.Voltage = -460 }},
		{"motor.voltage", "absurd", func(m *motor.Motor) { m.Voltage = 35001 }},
		{n + "amperes", "hermetic, neither", func(m *motor.Motor) {
			m.Kind, m.Power, m.Nameplate.Amperes = motor.Hermetic, tables.Power{}, tables.Current{}
		}},
		{n + "amperes", "zero", func(m *motor.Motor) { m.Nameplate.Amperes = motor.Amps("0") }},
		{n + "amperes", "absurd", func(m *motor.Motor) { m.Nameplate.Amperes = motor.Amps("100000.1") }},
		{n + "secondary_amperes", "of a cage motor", func(m *motor.Motor) { m.Nameplate.Secondary = motor.Amps("40") }},
		{n + "secondary_amperes", "zero", func(m *motor.Motor) { m.Kind, m.Nameplate.Secondary = motor.WoundRotor, motor.Amps("0") }},
		{n + "locked_rotor_amperes", "zero", func(m *motor.Motor) { m.Nameplate.Amperes, m.Nameplate.LockedRotor = tables.Current{}, motor.Amps("0") }},
		{n + "locked_rotor_amperes", "below full load", func(m *motor.Motor) { m.Nameplate.LockedRotor = motor.Amps("60.9") }},
		{n + "branch_selection_amperes", "of a cage motor", func(m *motor.Motor) { m.Nameplate.BranchSelection = motor.Amps("40") }},
		{n + "branch_selection_amperes", "zero", func(m *motor.Motor) { m.Kind, m.Nameplate.BranchSelection = motor.Hermetic, motor.Amps("0") }},
		{n + "drive_input_amperes", "without a drive", func(m *motor.Motor) { m.Nameplate.DriveInput = motor.Amps("40") }},
		{n + "drive_input_amperes", "drive without it", func(m *motor.Motor) { m.Starting = motor.Drive }},
		{n + "drive_input_amperes", "zero", func(m *motor.Motor) { m.Starting, m.Nameplate.DriveInput = motor.Drive, motor.Amps("0") }},
		{n + "service_factor", "below 1", func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("0.99") }},
		{n + "service_factor", "zero", func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("0") }},
		{n + "service_factor", "3", func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("3") }},
		{n + "service_factor", "just above 2", func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("2.01") }},
		{n + "temperature_rise", "5", func(m *motor.Motor) { m.Nameplate.TemperatureRise = motor.Celsius("5") }},
		{n + "temperature_rise", "negative", func(m *motor.Motor) { m.Nameplate.TemperatureRise = motor.Celsius("-40") }},
		{n + "temperature_rise", "just above 180", func(m *motor.Motor) { m.Nameplate.TemperatureRise = motor.Celsius("180.1") }},
		{n + "power_factor", "0", func(m *motor.Motor) { m.Nameplate.PowerFactor = motor.Factor("0") }},
		{n + "power_factor", "1.01", func(m *motor.Motor) { m.Nameplate.PowerFactor = motor.Factor("1.01") }},
		{n + "power_factor", "0.85 synchronous", func(m *motor.Motor) { m.Kind, m.Nameplate.PowerFactor = motor.Synchronous, motor.Factor("0.85") }},
		{n + "power_factor", "dc", func(m *motor.Motor) { m.Kind, m.Nameplate.PowerFactor = motor.DirectCurrent, motor.Factor("0.9") }},
		{n + "efficiency", "0", func(m *motor.Motor) { m.Nameplate.Efficiency = motor.Factor("0") }},
		{n + "efficiency", "1", func(m *motor.Motor) { m.Nameplate.Efficiency = motor.Factor("1") }},
		{n + "efficiency", "in percent", func(m *motor.Motor) { m.Nameplate.Efficiency = motor.Factor("93") }},
		{n + "speed_rpm", "negative", func(m *motor.Motor) { m.Nameplate.SpeedRPM = -1 }},
		{n + "speed_rpm", "absurd", func(m *motor.Motor) { m.Nameplate.SpeedRPM = 60001 }},
		{n + "code_letter", "I", func(m *motor.Motor) { m.Nameplate.CodeLetter = "I" }},
		{n + "code_letter", "O", func(m *motor.Motor) { m.Nameplate.CodeLetter = "O" }},
		{n + "code_letter", "Q", func(m *motor.Motor) { m.Nameplate.CodeLetter = "Q" }},
		{n + "code_letter", "W", func(m *motor.Motor) { m.Nameplate.CodeLetter = "W" }},
		{n + "code_letter", "two letters", func(m *motor.Motor) { m.Nameplate.CodeLetter = "GH" }},
		{n + "code_letter", "dc", func(m *motor.Motor) { m.Kind, m.Nameplate.CodeLetter = motor.DirectCurrent, "G" }},
		{n + "design_letter", "E", func(m *motor.Motor) { m.Nameplate.DesignLetter = "E" }},
		{n + "design_letter", "Z", func(m *motor.Motor) { m.Nameplate.DesignLetter = "Z" }},
		{n + "design_letter", "two letters", func(m *motor.Motor) { m.Nameplate.DesignLetter = "BC" }},
		{n + "design_letter", "of a wound rotor", func(m *motor.Motor) { m.Kind, m.Nameplate.DesignLetter = motor.WoundRotor, "B" }},
		{n + "efficiency_class", "unknown", func(m *motor.Motor) { m.Nameplate.EfficiencyClass = 9 }},
		{n + "insulation_class", "C", func(m *motor.Motor) { m.Nameplate.InsulationClass = "C" }},
		{n + "insulation_class", "long text", func(m *motor.Motor) { m.Nameplate.InsulationClass = strings.Repeat("é", 500) }},
		{"motor.duty.kind", "unknown", func(m *motor.Motor) { m.Duty.Kind = 9 }},
		{"motor.duty.kind", "intermittent torque", func(m *motor.Motor) { m.Kind, m.Duty.Kind = motor.Torque, motor.Intermittent }},
		{"motor.duty.kind", "varying hermetic", func(m *motor.Motor) { m.Kind, m.Duty.Kind = motor.Hermetic, motor.Varying }},
		{"motor.duty.minutes", "7", func(m *motor.Motor) { m.Duty = motor.Duty{Kind: motor.Intermittent, Minutes: 7} }},
		{"motor.duty.minutes", "negative", func(m *motor.Motor) { m.Duty = motor.Duty{Kind: motor.Periodic, Minutes: -5} }},
		{"motor.duty.minutes", "with continuous duty", func(m *motor.Motor) { m.Duty.Minutes = 30 }},
		{"motor.starting", "unknown", func(m *motor.Motor) { m.Starting = 99 }},
		{"motor.starting", "wye-delta single-phase", func(m *motor.Motor) { m.Kind, m.Starting = motor.SinglePhase, motor.WyeDelta }},
		{"motor.starting", "part-winding two-phase", func(m *motor.Motor) { m.Phases, m.Starting = 2, motor.PartWinding }},
		{"motor.starting", "wye-delta torque", func(m *motor.Motor) { m.Kind, m.Starting = motor.Torque, motor.WyeDelta }},
		{"motor.starting", "soft-started dc", func(m *motor.Motor) { m.Kind, m.Starting = motor.DirectCurrent, motor.SoftStarter }},
		{"motor.starting", "wye-delta wound rotor", func(m *motor.Motor) { m.Kind, m.Starting = motor.WoundRotor, motor.WyeDelta }},
	} {
		t.Run(tt.field+" "+tt.name, func(t *testing.T) {
			m := marked50()
			require.NoError(t, m.Validate())
			tt.set(&m)
			list := tables.Faults(m.Validate())
			require.Len(t, list, 1, "%v", m.Validate())
			var input *tables.InputError
			require.ErrorAs(t, list[0], &input)
			assert.Equal(t, tt.field, input.Field)
			assert.NotEmpty(t, input.Want)
			assert.Less(t, len(input.Value), 60)
			for _, e := range tables.Editions() {
				d, err := m.Demand(e)
				require.Error(t, err)
				assert.Equal(t, motor.Demand{}, d)
			}
		})
	}
}

// The ends of each range are allowed.
func TestValidateEdges(t *testing.T) {
	for name, set := range map[string]func(*motor.Motor){
		"voltage 1":                 func(m *motor.Motor) { m.Voltage = 1 },
		"voltage 35000":             func(m *motor.Motor) { m.Voltage = 35000 },
		"power 100000":              func(m *motor.Motor) { m.Power = motor.HP("100000") },
		"amperes 100000":            func(m *motor.Motor) { m.Nameplate.Amperes = motor.Amps("100000") },
		"locked rotor at full load": func(m *motor.Motor) { m.Nameplate.LockedRotor = motor.Amps("61") },
		"service factor 1":          func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("1") },
		"service factor 2":          func(m *motor.Motor) { m.Nameplate.ServiceFactor = motor.Factor("2") },
		"rise 10":                   func(m *motor.Motor) { m.Nameplate.TemperatureRise = motor.Celsius("10") },
		"rise 180":                  func(m *motor.Motor) { m.Nameplate.TemperatureRise = motor.Celsius("180") },
		"power factor 1":            func(m *motor.Motor) { m.Nameplate.PowerFactor = motor.Factor("1") },
		"power factor 0.85":         func(m *motor.Motor) { m.Nameplate.PowerFactor = motor.Factor("0.85") },
		"efficiency 0.999":          func(m *motor.Motor) { m.Nameplate.Efficiency = motor.Factor("0.999") },
		"60000 r/min":               func(m *motor.Motor) { m.Nameplate.SpeedRPM = 60000 },
		"premium":                   func(m *motor.Motor) { m.Nameplate.EfficiencyClass = motor.PremiumEfficiency },
		"two-phase":                 func(m *motor.Motor) { m.Phases = 2 },
		"wye-delta":                 func(m *motor.Motor) { m.Starting = motor.WyeDelta },
		"wye-delta synchronous":     func(m *motor.Motor) { m.Kind, m.Starting = motor.Synchronous, motor.WyeDelta },
		"drive":                     func(m *motor.Motor) { m.Starting, m.Nameplate.DriveInput = motor.Drive, motor.Amps("55") },
		"dc with resistor":          func(m *motor.Motor) { m.Kind, m.Starting = motor.DirectCurrent, motor.Resistor },
		"dc without phases":         func(m *motor.Motor) { m.Kind = motor.DirectCurrent },
		"wound rotor with a drive": func(m *motor.Motor) {
			m.Kind, m.Starting, m.Nameplate.DriveInput = motor.WoundRotor, motor.Drive, motor.Amps("55")
		},
		"single-phase hermetic":      func(m *motor.Motor) { m.Kind, m.Phases = motor.Hermetic, 1 },
		"amperes without power":      func(m *motor.Motor) { m.Power = tables.Power{} },
		"duty without a time rating": func(m *motor.Motor) { m.Duty.Kind = motor.Periodic },
		"secondary of a wound rotor": func(m *motor.Motor) { m.Kind, m.Nameplate.Secondary = motor.WoundRotor, motor.Amps("40") },
		"lower-case letters": func(m *motor.Motor) {
			m.Nameplate.CodeLetter, m.Nameplate.DesignLetter, m.Nameplate.InsulationClass = "g", "b", "f"
		},
		"unity synchronous":          func(m *motor.Motor) { m.Kind, m.Nameplate.PowerFactor = motor.Synchronous, motor.Factor("1.0") },
		"locked rotor, no full load": func(m *motor.Motor) { m.Nameplate.Amperes, m.Nameplate.LockedRotor = tables.Current{}, motor.Amps("1") },
	} {
		t.Run(name, func(t *testing.T) {
			m := marked50()
			set(&m)
			assert.NoError(t, m.Validate())
		})
	}
}

// Everything that is wrong with one motor comes back together.
func TestValidateJoins(t *testing.T) {
	m := motor.Motor{Kind: motor.Synchronous, Phases: 1, Voltage: -1, Starting: motor.WyeDelta, Duty: motor.Duty{Minutes: 7}}
	m.Nameplate = motor.Nameplate{
		Secondary: motor.Amps("4"), BranchSelection: motor.Amps("4"), DriveInput: motor.Amps("4"), LockedRotor: motor.Amps("0"),
		ServiceFactor: motor.Factor("3"), TemperatureRise: motor.Celsius("5"), PowerFactor: motor.Factor("0.85"), Efficiency: motor.Factor("1.2"),
		SpeedRPM: -1, CodeLetter: "Q", DesignLetter: "E", EfficiencyClass: 9, InsulationClass: "Z",
	}
	want := []string{
		"motor.phases", "motor.power", "motor.voltage", "motor.duty.minutes", "motor.starting",
		"motor.nameplate.secondary_amperes", "motor.nameplate.branch_selection_amperes", "motor.nameplate.drive_input_amperes",
		"motor.nameplate.locked_rotor_amperes", "motor.nameplate.service_factor", "motor.nameplate.temperature_rise",
		"motor.nameplate.power_factor", "motor.nameplate.efficiency", "motor.nameplate.speed_rpm", "motor.nameplate.code_letter",
		"motor.nameplate.design_letter", "motor.nameplate.efficiency_class", "motor.nameplate.insulation_class",
	}
	for _, e := range tables.Editions() {
		_, err := m.Demand(e)
		var got []string
		for _, one := range tables.Faults(err) {
			var input *tables.InputError
			require.ErrorAs(t, one, &input)
			got = append(got, input.Field)
		}
		assert.ElementsMatch(t, want, got)
	}
}

func TestDemandNeedsAnEdition(t *testing.T) {
	for _, e := range []tables.Edition{0, 99} {
		d, err := cage50().Demand(e)
		assert.Equal(t, "edition", tables.FieldOf(err))
		assert.Equal(t, motor.Demand{}, d)
	}
}

// What is not given says so.
func TestNotGivenIsToldSo(t *testing.T) {
	err := motor.Motor{}.Validate()
	assert.ErrorContains(t, err, "motor.kind is not given")
	assert.ErrorContains(t, err, "motor.voltage is not given")
	assert.ErrorContains(t, motor.Motor{Kind: 99, Voltage: -1}.Validate(), `motor.kind "99"`)
}
