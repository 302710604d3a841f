package main

import (
	"encoding"
	"strconv"
	"strings"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// A column is a column of the input.
type column struct {
	name string
	must bool // the header must have it

	// set puts the text of a cell into the circuit; no text is "not given". It is
	// nil for a column that is known but not used yet.
	set func(c *mc.Circuit, text string) error

	field string // the library's name for it, in errors
	needs string // columns whose faults leave this one undecided
}

// columns are the columns that the program knows.
var columns = []column{
	{name: "tag", must: true, set: word(func(c *mc.Circuit) *string { return &c.Tag }), field: "tag"},
	{name: "code", must: true, set: read(func(c *mc.Circuit) textReader { return &c.Edition }), field: "edition"},
	{name: "kind", must: true, set: read(func(c *mc.Circuit) textReader { return &c.Motor.Kind }), field: "motor.kind"},
	{name: "power", must: true, set: read(func(c *mc.Circuit) textReader { return &c.Motor.Power }), field: "motor.power", needs: "volts phases nameplate_amps"},
	{name: "volts", must: true, set: whole(func(c *mc.Circuit) *int { return &c.Motor.Voltage }), field: "motor.voltage", needs: "phases"},
	{name: "phases", set: whole(func(c *mc.Circuit) *int { return &c.Motor.Phases }), field: "motor.phases"},
	{name: "nameplate_amps", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.Amperes }), field: "motor.nameplate.amperes"},
	{name: "service_factor", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.ServiceFactor }), field: "motor.nameplate.service_factor"},
	{name: "temperature_rise_c", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.TemperatureRise }), field: "motor.nameplate.temperature_rise"},
	{name: "power_factor", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.PowerFactor }), field: "motor.nameplate.power_factor"},
	{name: "efficiency", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.Efficiency }), field: "motor.nameplate.efficiency"},
	{name: "speed_rpm", set: whole(func(c *mc.Circuit) *int { return &c.Motor.Nameplate.SpeedRPM }), field: "motor.nameplate.speed_rpm"},
	{name: "code_letter", set: word(func(c *mc.Circuit) *string { return &c.Motor.Nameplate.CodeLetter }), field: "motor.nameplate.code_letter"},
	{name: "design_letter", set: word(func(c *mc.Circuit) *string { return &c.Motor.Nameplate.DesignLetter }), field: "motor.nameplate.design_letter"},
	{name: "locked_rotor_amps", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.LockedRotor }), field: "motor.nameplate.locked_rotor_amperes", needs: "nameplate_amps"},
	{name: "secondary_amps", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.Secondary }), field: "motor.nameplate.secondary_amperes"},
	{name: "branch_selection_amps", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.BranchSelection }), field: "motor.nameplate.branch_selection_amperes"},
	{name: "duty", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Duty.Kind }), field: "motor.duty.kind"},
	{name: "duty_minutes", set: whole(func(c *mc.Circuit) *int { return &c.Motor.Duty.Minutes }), field: "motor.duty.minutes", needs: "duty"},
	{name: "starting", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Starting }), field: "motor.starting"},
	{name: "drive_input_amps", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Nameplate.DriveInput }), field: "motor.nameplate.drive_input_amperes", needs: "starting"},
	{name: "device", set: read(func(c *mc.Circuit) textReader { return &c.Device }), field: "device"},
	{name: "conductor", set: read(func(c *mc.Circuit) textReader { return &c.Wiring.Material }), field: "wiring.material", needs: "insulation"},
	{name: "insulation", set: word(func(c *mc.Circuit) *string { return &c.Wiring.Insulation }), field: "wiring.insulation"},
	{name: "termination_c", set: whole(func(c *mc.Circuit) *int { return &c.Wiring.Termination }), field: "wiring.termination"},
	{name: "ambient_c", set: read(func(c *mc.Circuit) textReader { return &c.Wiring.Ambient }), field: "wiring.ambient", needs: "insulation"},
	{name: "conductors_in_raceway", set: whole(func(c *mc.Circuit) *int { return &c.Wiring.Conductors }), field: "wiring.conductors", needs: "phases"},

	{name: "raceway"},
	{name: "length_m"},
	{name: "length_ft"},
	{name: "max_drop_percent"},
	{name: "fault_ka"},
	{name: "feeder"},
}

type textReader = encoding.TextUnmarshaler

// read sets a field that reads its own text form.
func read(field func(*mc.Circuit) textReader) func(*mc.Circuit, string) error {
	return func(c *mc.Circuit, text string) error { return field(c).UnmarshalText([]byte(text)) }
}

// word sets a field of text, which the library judges.
func word(field func(*mc.Circuit) *string) func(*mc.Circuit, string) error {
	return func(c *mc.Circuit, text string) error {
		*field(c) = text
		return nil
	}
}

// whole sets a field that is a whole number.
func whole(field func(*mc.Circuit) *int) func(*mc.Circuit, string) error {
	return func(c *mc.Circuit, text string) error {
		*field(c) = 0
		if text == "" {
			return nil
		}
		n, err := strconv.Atoi(text)
		if err != nil || text[0] == '+' {
			return &tables.InputError{Value: clip(text), Want: "a whole number in the digits 0 to 9"}
		}
		*field(c) = n
		return nil
	}
}

// columnNamed returns the place of a column in columns, -1 if none has the name.
func columnNamed(name string) int {
	for i := range columns {
		if columns[i].name == name {
			return i
		}
	}
	return -1
}

// columnOf returns the column that the library's field stands in. A wiring that
// no size suits is told at the conductor.
func columnOf(field string) int {
	if field == "wiring" {
		return columnNamed("conductor")
	}
	for i := range columns {
		if columns[i].set != nil && columns[i].field == field {
			return i
		}
	}
	return -1
}

// inColumns rewords the library's names of fields as those of columns.
var inColumns = func() *strings.Replacer {
	var pairs []string
	for _, c := range columns {
		if strings.Contains(c.field, ".") {
			pairs = append(pairs, c.field, c.name)
		}
	}
	return strings.NewReplacer(pairs...)
}()

func clip(s string) string {
	const most = 40
	if len(s) <= most {
		return s
	}
	return strings.ToValidUTF8(s[:most], "") + "..."
}
