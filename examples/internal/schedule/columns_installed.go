package schedule

import (
	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// An installedRow is a row of the installed circuits: a motor's circuit and what
// stands of it.
type installedRow struct {
	circuit mc.Circuit
	stands  mc.Installed
}

// installed are the columns of the installed circuits: those of the circuit, then
// those of what stands.
var installed = newLayout("file of installed circuits", "circuit",
	lift(circuitColumns, func(r *installedRow) *mc.Circuit { return &r.circuit }),
	[]column[installedRow]{
		{name: "flexible", set: read(func(r *installedRow) textReader { return &r.circuit.Wiring.Flexible }), field: "wiring.flexible"},
	},
	lift([]column[mc.Installed]{
		{name: "branch_size", set: read(func(in *mc.Installed) textReader { return &in.Branch.Size }), field: "installed.branch.size", needs: "insulation"},
		{name: "branch_sets", set: whole(func(in *mc.Installed) *int { return &in.Branch.Sets }), field: "installed.branch.sets"},
		{name: "motor_supply_size", set: read(func(in *mc.Installed) textReader { return &in.MotorSupply.Size }), field: "installed.motor_supply.size", needs: "insulation"},
		{name: "motor_supply_sets", set: whole(func(in *mc.Installed) *int { return &in.MotorSupply.Sets }), field: "installed.motor_supply.sets"},
		{name: "motor_supply_insulation_c", set: read(func(in *mc.Installed) textReader { return &in.MotorSupply.Insulated }), field: "installed.motor_supply.insulation_rating"},
		{name: "secondary_size", set: read(func(in *mc.Installed) textReader { return &in.Secondary.Size }), field: "installed.secondary.size", needs: "insulation"},
		{name: "resistor_size", set: read(func(in *mc.Installed) textReader { return &in.Resistor.Size }), field: "installed.resistor.size", needs: "insulation"},
		{name: "overload_setting_a", set: read(func(in *mc.Installed) textReader { return &in.Overload.Setting }), field: "installed.overload.setting_amperes"},
		{name: "overload_heater_a", set: read(func(in *mc.Installed) textReader { return &in.Overload.Heater }), field: "installed.overload.heater_amperes"},
		{name: "overload_units", set: whole(func(in *mc.Installed) *int { return &in.Overload.Units }), field: "installed.overload.units"},
		{name: "overload_share", set: yes(func(in *mc.Installed) *bool { return &in.Overload.Share }), field: "installed.overload.share", needs: "starting", said: saidYes},
		{name: "hard_start", set: yes(func(in *mc.Installed) *bool { return &in.HardStart })},
		{name: "device_rating_a", set: read(func(in *mc.Installed) textReader { return &in.Device.Rating }), field: "installed.device.rating_amperes"},
		{name: "instantaneous_a", set: read(func(in *mc.Installed) textReader { return &in.Device.Instantaneous }), field: "installed.device.instantaneous_amperes"},
		{name: "interrupting_ka", set: kiloamperes(func(in *mc.Installed) *tables.Current { return &in.Device.Interrupting }), field: "installed.device.interrupting_amperes", said: saidInKiloamperes},
		{name: "disconnect_a", set: read(func(in *mc.Installed) textReader { return &in.Disconnect.Amperes }), field: "installed.disconnecting_means.amperes"},
		{name: "disconnect_power", set: read(func(in *mc.Installed) textReader { return &in.Disconnect.Horsepower }), field: "installed.disconnecting_means.horsepower"},
		{name: "disconnect_locked_rotor_a", set: read(func(in *mc.Installed) textReader { return &in.Disconnect.LockedRotor }), field: "installed.disconnecting_means.locked_rotor_amperes"},
		{name: "disconnect_unfused", set: yes(func(in *mc.Installed) *bool { return &in.Disconnect.Unfused })},
		{name: "controller_a", set: read(func(in *mc.Installed) textReader { return &in.Controller.Amperes }), field: "installed.controller.amperes"},
		{name: "controller_power", set: read(func(in *mc.Installed) textReader { return &in.Controller.Horsepower }), field: "installed.controller.horsepower"},
		{name: "controller_locked_rotor_a", set: read(func(in *mc.Installed) textReader { return &in.Controller.LockedRotor }), field: "installed.controller.locked_rotor_amperes"},
		{name: "bonding_size", set: read(func(in *mc.Installed) textReader { return &in.Bonding.Size }), field: "installed.bonding.size"},
		{name: "bonding_material", set: read(func(in *mc.Installed) textReader { return &in.Bonding.Material }), field: "installed.bonding.material"},
		{name: "raceway_size", set: word(func(in *mc.Installed) *string { return &in.Raceway.Trade }), field: "installed.raceway.trade_size", needs: "raceway"},
		{name: "flexible_size", set: word(func(in *mc.Installed) *string { return &in.Flexible.Trade }), field: "installed.flexible.trade_size", needs: "flexible"},
	}, func(r *installedRow) *mc.Installed { return &r.stands }),
)
