package protection_test

import (
	"testing"

	"github.com/stretchr/testify/assert"

	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// NEC 430.32(A)(1) and (C), percent of nameplate current: 125 and 140 for a
// service factor of 1.15 or more or a temperature rise of 40 °C or less, 115 and
// 130 otherwise. CEC 28-306(1): 125 for the service factor, 115 otherwise; a
// temperature rise does not count and there is no second step. Nameplate 61 A.
func TestOverload(t *testing.T) {
	for _, tt := range []struct {
		factor, rise string
		limit, start string // NEC
		cec          string
	}{
		{"", "", "70.15 A", "79.3 A", "70.15 A"},
		{"1", "", "70.15 A", "79.3 A", "70.15 A"},
		{"1.14", "", "70.15 A", "79.3 A", "70.15 A"},
		{"1.149999", "", "70.15 A", "79.3 A", "70.15 A"},
		{"1.15", "", "76.25 A", "85.4 A", "76.25 A"},
		{"1.25", "", "76.25 A", "85.4 A", "76.25 A"},
		{"", "40", "76.25 A", "85.4 A", "70.15 A"},
		{"", "39", "76.25 A", "85.4 A", "70.15 A"},
		{"", "40.1", "70.15 A", "79.3 A", "70.15 A"},
		{"", "41", "70.15 A", "79.3 A", "70.15 A"},
		{"1", "40", "76.25 A", "85.4 A", "70.15 A"},
		{"1.15", "80", "76.25 A", "85.4 A", "76.25 A"},
	} {
		m := cage50()
		m.Nameplate.Amperes = motor.Amps("61")
		if tt.factor != "" {
			m.Nameplate.ServiceFactor = motor.Factor(tt.factor)
		}
		if tt.rise != "" {
			m.Nameplate.TemperatureRise = motor.Celsius(tt.rise)
		}
		for _, e := range necEditions {
			o := overload(t, e, m)
			assert.Equal(t, tt.limit, o.Limit.String(), "%+v %v", tt, e)
			assert.Equal(t, "430.32(A)(1)", ref(o.Limit))
			assert.Equal(t, tt.start, o.StartLimit.String(), "%+v %v", tt, e)
			assert.Equal(t, "430.32(C)", ref(o.StartLimit))
			assert.Contains(t, o.Limit.How(), map[bool]string{true: "40 °C or less", false: "service factor"}[tt.rise != "" && tt.limit == "76.25 A" && tt.factor != "1.15"], "%+v", tt)
			assert.True(t, testkit.Rests(o.Limit, "430.6(A)(2)"))
			assert.True(t, o.Protector.IsZero())
		}
		for _, e := range cecEditions {
			o := overload(t, e, m)
			assert.Equal(t, tt.cec, o.Limit.String(), "%+v %v", tt, e)
			assert.Equal(t, "Rule 28-306(1)", ref(o.Limit))
			assert.True(t, o.StartLimit.IsZero())
			assert.True(t, o.Protector.IsZero())
		}
	}
}

// NEC 430.32(A)(2): ultimate trip of a thermal protector, percent of the table
// current: 170 to 9 A, 156 to 20 A, 140 above. The table prints nothing between 9
// and 9.1 A: the lower percent is taken.
func TestThermalProtector(t *testing.T) {
	for amps, want := range map[string]string{
		"9": "15.3 A", "9.05": "14.118 A", "9.1": "14.196 A", "20": "31.2 A", "20.1": "28.14 A", "100": "140 A",
	} {
		m := drawing(amps)
		m.Nameplate.ThermalProtect = true
		for _, e := range necEditions {
			o := overload(t, e, m)
			assert.Equal(t, want, o.Protector.String(), amps)
			assert.Equal(t, "430.32(A)(2)", ref(o.Protector))
		}
		for _, e := range cecEditions {
			assert.True(t, overload(t, e, m).Protector.IsZero(), "the CEC has no such limit")
		}
	}
	// The base is the table's 17 A, not the nameplate's 15 A: 17 × 156 %.
	m := motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 230}
	m.Nameplate.Amperes, m.Nameplate.ThermalProtect = motor.Amps("15"), true
	for _, e := range necEditions {
		assert.Equal(t, "26.52 A", overload(t, e, m).Protector.String())
	}
}

// Hermetic compressors: 140 percent of rated-load current, NEC 440.52(A), CEC
// 28-710; the branch-circuit selection current does not count in the NEC.
func TestHermeticOverload(t *testing.T) {
	for _, tt := range []struct {
		editions  []tables.Edition
		selection string
		ref       string
	}{
		{necEditions, "", "440.52(A)"},
		{necEditions, "40", "440.52(A)"},
		{cecEditions, "", "Rule 28-710"},
	} {
		for _, e := range tt.editions {
			o := overload(t, e, compressor("38", tt.selection, ""))
			assert.Equal(t, "53.2 A", o.Limit.String(), e)
			assert.Equal(t, tt.ref, ref(o.Limit))
			assert.True(t, o.StartLimit.IsZero())
			assert.True(t, testkit.Cautioned(o.Cautions, tt.ref, "125 percent"))
		}
	}
}

// Torque motors take the ordinary percents of the current that they are rated by.
func TestTorqueOverload(t *testing.T) {
	for _, e := range tables.Editions() {
		assert.Equal(t, "13.8 A", overload(t, e, torque("12")).Limit.String(), "12 × 115 %")
	}
}

// Number of units: NEC Table 430.37, CEC Table 25.
func TestOverloadUnits(t *testing.T) {
	plate := motor.Nameplate{Amperes: motor.Amps("20")}
	for _, tt := range []struct {
		m    motor.Motor
		want string
	}{
		{motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("10"), Voltage: 230, Nameplate: plate}, "3"},
		{motor.Motor{Kind: motor.SquirrelCage, Phases: 2, Power: motor.HP("10"), Voltage: 230, Nameplate: plate}, "2"},
		{motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("3"), Voltage: 230, Nameplate: plate}, "1"},
		{motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("5"), Voltage: 240, Nameplate: plate}, "1"},
	} {
		for _, e := range tables.Editions() {
			o := overload(t, e, tt.m)
			assert.Equal(t, tt.want, o.Units.Text())
			want := "Table 430.37"
			if e.Code() == tables.CEC {
				want = "Table 25"
			}
			assert.Equal(t, want, ref(o.Units))
			assert.NotEmpty(t, o.Units.Note(), "in which conductors")
		}
	}
}

// What a designer should know beside the figures.
func TestOverloadCautions(t *testing.T) {
	marked := func(set func(*motor.Motor)) motor.Motor { m := drawing("61"); set(&m); return m }
	for _, tt := range []struct {
		name, nec, cec string // rules; "" where the code has none
		on, off        motor.Motor
	}{
		{"1 hp and less", "430.32(B), (D)", "Rule 28-308", marked(func(m *motor.Motor) { m.Power = motor.HP("1") }), marked(func(m *motor.Motor) { m.Power = motor.HP("1-1/2") })},
		{"over 1500 hp", "430.32(A)(4)", "", marked(func(m *motor.Motor) { m.Power = motor.HP("1501") }), marked(func(m *motor.Motor) { m.Power = motor.HP("1500") })},
		{"intermittent", "430.33", "", marked(func(m *motor.Motor) { m.Duty = motor.Duty{Kind: motor.Periodic, Minutes: 5} }), drawing("61")},
		{"wye-delta", "430.32(A)(1)", "Rule 28-306(2)", started(motor.WyeDelta, drawing("61")), started(motor.Autotransformer, drawing("61"))},
		{"part-winding", "430.32(A)(1)", "Rule 28-306(2)", started(motor.PartWinding, drawing("61")), drawing("61")},
		{"multispeed", "430.32(A)", "Rule 28-808", marked(func(m *motor.Motor) { m.Nameplate.Multispeed = true }), drawing("61")},
	} {
		for _, e := range tables.Editions() {
			rule := tt.nec
			if e.Code() == tables.CEC {
				rule = tt.cec
			}
			if rule == "" {
				continue
			}
			assert.True(t, testkit.Cautioned(overload(t, e, tt.on).Cautions, rule, ""), "%s %v", tt.name, e)
			assert.False(t, testkit.Cautioned(overload(t, e, tt.off).Cautions, rule, ""), "%s %v", tt.name, e)
		}
	}
}

func TestOverloadNeedsAnEdition(t *testing.T) {
	m := cage50()
	o, err := protection.SizeOverload(0, m, demand(t, m, tables.NEC2023))
	assert.Equal(t, "edition", tables.FieldOf(err))
	assert.Equal(t, protection.Overload{}, o)
}
