package schedule

import (
	"slices"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A motorRow is a row of the schedule: a motor's circuit and the tag of the
// feeder that supplies it, "" for none.
type motorRow struct {
	mc.Circuit
	feeder string
}

// circuitColumns are the columns of a motor and of how its circuit is run.
var circuitColumns = slices.Concat(
	[]column[mc.Circuit]{
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
		{name: "resistor_duty", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Resistor }), field: "motor.resistor", needs: "kind"},
		{name: "use", set: read(func(c *mc.Circuit) textReader { return &c.Motor.Use }), field: "motor.use", needs: "kind duty starting"},
	},
	runColumns(func(c *mc.Circuit) *tables.Device { return &c.Device }, func(c *mc.Circuit) *conductor.Wiring { return &c.Wiring }),
	[]column[mc.Circuit]{
		{name: "max_drop_percent", set: read(func(c *mc.Circuit) textReader { return &c.MaxDrop }), field: "max_drop_percent", needs: "length_m length_ft"},
		{name: "fault_ka", set: kiloamperes(func(c *mc.Circuit) *tables.Current { return &c.Fault }), field: "fault_amperes", said: saidInKiloamperes},
	},
)

// motors are the columns of the schedule.
var motors = newLayout("schedule", "motor",
	lift(circuitColumns, func(r *motorRow) *mc.Circuit { return &r.Circuit }),
	[]column[motorRow]{{name: "feeder", set: word(func(r *motorRow) *string { return &r.feeder })}},
)
