package motorcircuit_test

import (
	"testing"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// kindOf makes a motor of a kind, marked as its nameplate says.
func kindOf(kind motor.Kind, n motor.Nameplate) func(*motorcircuit.Circuit) {
	return func(c *motorcircuit.Circuit) { c.Motor.Kind, c.Motor.Nameplate = kind, n }
}

func started(how motor.Starting) func(*motorcircuit.Circuit) {
	return func(c *motorcircuit.Circuit) { c.Motor.Starting = how }
}

// compressorOf is a hermetic compressor, which has no horsepower.
func compressorOf(n motor.Nameplate) motorcircuit.Circuit {
	return pump("1", 460, protection.TimeDelayFuse, kindOf(motor.Hermetic, n), func(c *motorcircuit.Circuit) { c.Motor.Power, c.Motor.Phases = tables.Power{}, 3 })
}

func rated(amperes string) motorcircuit.InstalledDevice {
	return motorcircuit.InstalledDevice{Rating: motor.Amps(amperes)}
}

var (
	wyeDelta    = pump("50", 460, 0, plate("61", "1.15"), started(motor.WyeDelta))
	partWinding = pump("50", 460, 0, plate("61", "1.15"), started(motor.PartWinding))
	twoSpeeds   = pump("20", 460, protection.TimeDelayFuse, kindOf(motor.SquirrelCage, motor.Nameplate{Windings: []motor.Winding{{Amperes: motor.Amps("28")}, {Amperes: motor.Amps("12")}}}))
	crane       = pump("30", 460, protection.TimeDelayFuse, kindOf(motor.WoundRotor, motor.Nameplate{Secondary: motor.Amps("65")}), func(c *motorcircuit.Circuit) { c.Motor.Resistor = tables.ExtraHeavyStarting })
	chiller     = compressorOf(motor.Nameplate{Amperes: motor.Amps("38"), BranchSelection: motor.Amps("40")})
	torque      = pump("1", 460, protection.TimeDelayFuse, kindOf(motor.Torque, motor.Nameplate{Amperes: motor.Amps("12")}), func(c *motorcircuit.Circuit) { c.Motor.Power, c.Motor.Phases = tables.Power{}, 3 })
	hoist       = pump("10", 240, protection.TimeDelayFuse, kindOf(motor.DirectCurrent, motor.Nameplate{}))
	driven      = pump("30", 460, protection.TimeDelayFuse, kindOf(motor.SquirrelCage, motor.Nameplate{DriveInput: motor.Amps("36")}), started(motor.Drive))
	bypass      = pump("30", 460, protection.TimeDelayFuse, kindOf(motor.SquirrelCage, motor.Nameplate{DriveInput: motor.Amps("36")}), started(motor.Drive), func(c *motorcircuit.Circuit) { c.Motor.Bypass = true })
)

// Motors and ways of starting that rules of their own hold for, worked by hand.
var specialCases = []checkCase{
	{"second step inside the delta", necEditions, wyeDelta, motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("49"), Share: true}},
		map[string]string{"overload_setting overload.setting_amperes": "caution 44.225 A 49 A"}, "430.32(A)(1), (C): 58 % of 61 × 125 and 140 %, 49.532 A"},
	{"second step inside the delta, confirmed", necEditions, wyeDelta, motorcircuit.Installed{HardStart: true, Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("49"), Share: true}},
		map[string]string{"overload_setting overload.setting_amperes": "note 49.532 A 49 A"}, "58 % of 85.4 A"},
	{"above the second step inside the delta", necEditions, wyeDelta, motorcircuit.Installed{HardStart: true, Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("49.54"), Share: true}},
		map[string]string{"overload_setting overload.setting_amperes": "violation 49.532 A 49.54 A"}, "58 % of 85.4 A"},
	{"no second step inside the delta", cecEditions, wyeDelta, motorcircuit.Installed{HardStart: true, Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("49"), Share: true}},
		map[string]string{"overload_setting overload.setting_amperes": "violation 44.225 A 49 A"}, "Rule 28-306"},
	{"half of the winding", everyone, partWinding, motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Heater: motor.Amps("38.125"), Share: true}},
		map[string]string{"overload_setting overload.heater_amperes": "note 38.125 A 38.125 A"}, "430.4, 28-808: 50 % of 76.25 A"},
	{"one fuse for a part winding", everyone, pump("50", 460, protection.TimeDelayFuse, started(motor.PartWinding)), motorcircuit.Installed{HardStart: true, Device: rated("110")},
		map[string]string{"device_rating device.rating_amperes": "violation 97.5 A 110 A"}, "430.4, Rule 28-806: 65 × 150 %"},
	{"six leads, NEC", necEditions, wyeDelta, motorcircuit.Installed{MotorSupply: wire("8")},
		map[string]string{"conductor_ampacity motor_supply": "violation 46.8 A 40 A"}, "430.22(C): 65 × 72 %; 8 AWG 50 A × 80 % for six conductors"},
	{"six leads, CEC", cecEditions, wyeDelta, motorcircuit.Installed{MotorSupply: wire("8")},
		map[string]string{"conductor_ampacity motor_supply": "violation 43.92 A 40 A"}, "61 × 72 %; Tables 2 and 5C: 50 A × 80 %"},

	{"windings, NEC", necEditions, twoSpeeds, motorcircuit.Installed{Device: rated("50"), Windings: []motorcircuit.InstalledWinding{{Conductors: wire("12")}, {Conductors: wire("14"), Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("15.6")}}}},
		map[string]string{"conductor_ampacity windings[0].conductors": "violation 35 A 25 A", "conductor_ampacity windings[1].conductors": "note 15 A 20 A",
			"overload_setting windings[1].overload.setting_amperes": "caution 13.8 A 15.6 A", "device_rating device.rating_amperes": "note 50 A 50 A"},
		"430.22(B): 28 and 12 × 125 %; 430.32: 115 and 130 %; 430.52(C)(4): 28 × 175 % = 49 A"},
	{"windings, CEC", cecEditions, twoSpeeds, motorcircuit.Installed{Device: rated("50"), Windings: []motorcircuit.InstalledWinding{{}, {Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("15.6")}}}},
		map[string]string{"overload_setting windings[1].overload.setting_amperes": "violation 15 A 15.6 A", "device_rating device.rating_amperes": "caution 49 A 50 A"},
		"Rule 28-808: 12 × 125 %; 28-806: 28 × 175 %, 225 % if it will not start"},

	{"wound rotor", everyone, crane, motorcircuit.Installed{Secondary: wire("4"), Resistor: wire("10"), Device: rated("70")},
		map[string]string{"conductor_ampacity secondary": "note 81.25 A 85 A", "conductor_ampacity resistor": "violation 35.75 A 35 A", "device_rating device.rating_amperes": "caution 60 A 70 A"},
		"430.23, 28-112: 65 × 125 % and × 55 %; Tables 430.52, 29: 40 × 150 %"},

	{"branch selection current", necEditions, chiller, motorcircuit.Installed{Branch: wire("8"), Device: rated("80"), Overload: motorcircuit.InstalledOverload{Heater: motor.Amps("53.3")},
		Disconnect: motorcircuit.Switch{Amperes: motor.Amps("45")}, Controller: motorcircuit.Switch{Amperes: motor.Amps("40"), LockedRotor: motor.Amps("200")}},
		map[string]string{"conductor_ampacity branch": "note 50 A 50 A", "device_rating device.rating_amperes": "caution 70 A 80 A", "overload_setting overload.heater_amperes": "violation 53.2 A 53.3 A",
			"switch_amperes disconnecting_means.amperes": "violation 46 A 45 A", "switch_amperes controller.amperes": "note 40 A 40 A", "switch_locked_rotor controller.locked_rotor_amperes": "violation 228 A 200 A"},
		"440.32, .22, .12, .41 by 40 A; 440.52 by 38 A × 140 %; 440.12(C): 6 × 38 A where nothing is marked"},
	{"compressor to 2020", to2020, compressorOf(motor.Nameplate{Amperes: motor.Amps("30")}), motorcircuit.Installed{Device: rated("60")},
		map[string]string{"device_rating device.rating_amperes": "caution 52.5 A 60 A"}, "440.22(A): 175 %, no next size up; 225 %"},
	{"compressor since 2023", from2023, compressorOf(motor.Nameplate{Amperes: motor.Amps("30")}), motorcircuit.Installed{Device: rated("60")},
		map[string]string{"device_rating device.rating_amperes": "note 60 A 60 A"}, "440.22(A) Exception No. 1"},
	{"compressor, CEC", cecEditions, compressorOf(motor.Nameplate{Amperes: motor.Amps("38"), LockedRotor: motor.Amps("240")}),
		motorcircuit.Installed{Branch: wire("8"), Device: rated("150"), Overload: motorcircuit.InstalledOverload{Heater: motor.Amps("53.2")}, Disconnect: motorcircuit.Switch{LockedRotor: motor.Amps("239")}},
		map[string]string{"conductor_ampacity branch": "note 47.5 A 50 A", "device_rating device.rating_amperes": "caution 120 A 150 A", "overload_setting overload.heater_amperes": "note 53.2 A 53.2 A",
			"switch_locked_rotor disconnecting_means.locked_rotor_amperes": "violation 240 A 239 A"}, "28-706, 28-708: 50 and 65 % of 240 A, 28-710, 28-714"},

	{"torque, NEC", necEditions, torque, motorcircuit.Installed{Branch: wire("14"), Device: rated("20"), Disconnect: motorcircuit.Switch{Amperes: motor.Amps("13.8")}, Controller: motorcircuit.Switch{Amperes: motor.Amps("11")}},
		map[string]string{"conductor_ampacity branch": "note 15 A 20 A", "device_rating device.rating_amperes": "violation 15 A 20 A", "switch_amperes disconnecting_means.amperes": "note 13.8 A 13.8 A", "switch_amperes controller.amperes": "violation 12 A 11 A"},
		"430.6(B), 430.52(D) with 240.4(B), 430.110(B), 430.83(D)"},

	{"direct current, NEC", necEditions, hoist, motorcircuit.Installed{Branch: wire("8"), Device: rated("60"), Overload: motorcircuit.InstalledOverload{Units: 1}},
		map[string]string{"conductor_ampacity branch": "note 47.5 A 50 A", "device_rating device.rating_amperes": "note 60 A 60 A", "overload_units overload.units": "note 1 1"}, "Tables 430.247, 430.52, 430.37: 38 × 125 and 150 %"},
	{"direct current, CEC", cecEditions, hoist, motorcircuit.Installed{Device: rated("60")},
		map[string]string{"device_rating device.rating_amperes": "caution 57 A 60 A"}, "Table 29: 38 × 150 %, 28-200(4): 225 %"},
	{"instantaneous trip, direct current", necEditions, pump("10", 240, protection.InstantaneousBreaker, kindOf(motor.DirectCurrent, motor.Nameplate{})),
		motorcircuit.Installed{HardStart: true, Device: motorcircuit.InstalledDevice{Instantaneous: motor.Amps("95.1")}},
		map[string]string{"instantaneous_setting device.instantaneous_amperes": "violation 95 A 95.1 A"}, "Table 430.52: 38 × 250 %, and no more"},

	{"drive", everyone, driven, motorcircuit.Installed{Branch: wire("10"), Device: rated("40")},
		map[string]string{"conductor_ampacity branch": "violation 45 A 35 A", "device_carries device.rating_amperes": "note 36 A 40 A"}, "430.122(A), 28-106: 36 × 125 %"},
	{"drive with bypass", everyone, bypass, motorcircuit.Installed{Branch: wire("8"), Device: rated("38"), Disconnect: motorcircuit.Switch{Amperes: motor.Amps("45")}},
		map[string]string{"conductor_ampacity branch": "note 50 A 50 A", "switch_amperes disconnecting_means.amperes": "violation 46 A 45 A", "device_carries device.rating_amperes": "caution 40 A 38 A"},
		"430.122, 430.110(A): the greater of 36 A and the motor's 40 A"},

	{"unfused switch of too little power", necEditions, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("60"), Horsepower: motor.HP("40"), Unfused: true}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "violation 74.75 A 60 A", "switch_horsepower disconnecting_means.horsepower": "violation 50 hp 40 hp"}, "430.110(A) and its exception"},

	{"instantaneous trip of a marked breaker", cecEditions, pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Motor.Nameplate.MaximumDevice = motor.Amps("100") }),
		motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("100"), Instantaneous: motor.Amps("500")}},
		map[string]string{"device_rating device.rating_amperes": "note 100 A 100 A", "instantaneous_setting device.instantaneous_amperes": "note 845 A 500 A"}, "Rule 28-202 marks a rating, and 28-210 holds the setting: 65 × 1300 %"},

	{"bonding, CEC", cecEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("4"), Device: rated("150"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("8")}},
		map[string]string{"bonding_size bonding": "violation 13.3 mm² 8.367 mm²"}, "Rule 10-616, Table 16: 6 AWG to 200 A"},
	{"bonding by ampacity, CEC", cecEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("250"), Device: rated("150"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}},
		map[string]string{"bonding_size bonding": "violation 21.15 mm² 13.3 mm²"}, "Rule 10-616(3)(b): 255 A, 4 AWG to 300 A"},
	{"bonding of each set, NEC", necEditions, pump("200", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: sizeOf("1/0"), Sets: 2}, Device: rated("600"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("2")}},
		map[string]string{"bonding_size bonding": "violation 42.41 mm² 33.62 mm²"}, "250.122(F): 1 AWG to 600 A, in full with each set"},
	{"bonding of each set, CEC", cecEditions, pump("200", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: sizeOf("1/0"), Sets: 2}, Device: rated("600"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("4")}},
		map[string]string{"bonding_size bonding": "note 21.15 mm² 21.15 mm²"}, "Rule 10-616(4): 600 ÷ 2, 4 AWG to 300 A"},
}

func TestCheckSpecialCases(t *testing.T) { holdCases(t, specialCases) }
