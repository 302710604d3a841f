package motorcircuit_test

import (
	"fmt"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

func sizeOf(s string) tables.Size { return tables.Must(tables.ParseSize(s)) }

// wire is one conductor for each phase.
func wire(size string) motorcircuit.Conductors { return motorcircuit.Conductors{Size: sizeOf(size)} }

// A checkCase is an installed circuit and what must be found of it: severity, what
// is required and found, by code and part.
type checkCase struct {
	name      string
	editions  []tables.Edition
	c         motorcircuit.Circuit
	installed motorcircuit.Installed
	want      map[string]string // "code part": "severity required found"
	source    string
}

func pump(hp string, volts int, device tables.Device, change ...func(*motorcircuit.Circuit)) motorcircuit.Circuit {
	c := motorcircuit.Circuit{Device: device, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(hp), Voltage: volts}, Wiring: conductor.Wiring{Termination: 75}}
	for _, set := range change {
		set(&c)
	}
	return c
}

var checkCases = []checkCase{
	{"conductors by the edition's tables", everyone, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("4")},
		map[string]string{"conductor_ampacity branch": "note 81.25 A 85 A", "conductor_least_size branch": "note 2.08 mm² 21.15 mm²"},
		"430.250 and CEC Table 44: 65 A × 125 %; 310.16 and Table 2: 4 AWG 85 A at 75 °C"},
	{"a size too small", everyone, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("6")},
		map[string]string{"conductor_ampacity branch": "violation 81.25 A 65 A"}, "6 AWG 65 A at 75 °C"},
	{"aluminum carries less", everyone, pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Wiring.Material = conductor.Aluminum }), motorcircuit.Installed{Branch: wire("4")},
		map[string]string{"conductor_ampacity branch": "violation 81.25 A 65 A"}, "310.16 and Table 4: 4 AWG aluminum 65 A at 75 °C"},
	{"parallel from 1/0", everyone, pump("200", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: sizeOf("1"), Sets: 3}},
		map[string]string{"conductor_parallel_size branch": "violation 53.49 mm² 42.41 mm²", "conductor_ampacity branch": "note 300 A 390 A"}, "240 A × 125 %; 3 × 130 A; 310.10, Rule 12-108; Chapter 9 Table 8"},

	{"next size up, NEC", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("175")}},
		map[string]string{"device_rating device.rating_amperes": "note 175 A 175 A", "device_carries device.rating_amperes": "note 65 A 175 A"}, "65 × 250 % = 162.5 A, 175 A by 430.52(C)(1), 240.6(A)"},
	{"no size up, CEC", cecEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("175")}},
		map[string]string{"device_rating device.rating_amperes": "caution 162.5 A 175 A"}, "28-200: 162.5 A; 28-204(4): 300 % = 195 A if the motor will not start"},
	{"above every ceiling, NEC", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{HardStart: true, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("300")}},
		map[string]string{"device_rating device.rating_amperes": "violation 260 A 300 A"}, "400 % to 100 A: 65 × 400 % = 260 A"},
	{"hard start confirmed", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{HardStart: true, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("250")}},
		map[string]string{"device_rating device.rating_amperes": "note 260 A 250 A"}, "430.52(C)(1), exception: 260 A"},
	{"hard start that is not needed", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{HardStart: true, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("175")}},
		map[string]string{"device_rating device.rating_amperes": "note 175 A 175 A"}, "430.52(C)(1): the ordinary rating stands by itself"},
	{"10 A breaker since 2023", from2023, pump("2", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("15")}},
		map[string]string{"device_rating device.rating_amperes": "violation 10 A 15 A"}, "3.4 × 250 % = 8.5 A, 10 A by 240.6(A) of 2023; × 400 % = 13.6 A if it will not start"},
	{"15 A before 2023", to2020, pump("2", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("15")}},
		map[string]string{"device_rating device.rating_amperes": "note 15 A 15 A"}, "240.6(A) begins at 15 A"},
	{"15 A always, CEC", cecEditions, pump("2", 460, protection.TimeDelayFuse), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("15")}},
		map[string]string{"device_rating device.rating_amperes": "note 15 A 15 A"}, "28-200(3)(a)"},
	{"a device that cannot carry", necEditions, pump("50", 460, protection.TimeDelayFuse), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Rating: motor.Amps("60")}},
		map[string]string{"device_carries device.rating_amperes": "caution 65 A 60 A", "device_rating device.rating_amperes": "note 125 A 60 A"}, "table current 65 A; 65 × 175 % = 113.75 A, 125 A"},
	{"what is marked wins", necEditions, pump("50", 460, protection.TimeDelayFuse, func(c *motorcircuit.Circuit) { c.Motor.Nameplate.MaximumDevice = motor.Amps("100") }),
		motorcircuit.Installed{HardStart: true, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("110")}},
		map[string]string{"device_rating device.rating_amperes": "violation 100 A 110 A"}, "430.52(C)(2)"},
	{"instantaneous trip, NEC", necEditions, pump("50", 460, protection.InstantaneousBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Instantaneous: motor.Amps("600")}},
		map[string]string{"instantaneous_setting device.instantaneous_amperes": "caution 520 A 600 A"}, "430.52: 800 % of 65 A; 1300 % if it will not start"},
	{"instantaneous trip, CEC", cecEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Instantaneous: motor.Amps("845.1")}},
		map[string]string{"instantaneous_setting device.instantaneous_amperes": "violation 845 A 845.1 A"}, "28-210: 1300 % of 65 A"},

	{"overload by service factor", everyone, pump("50", 460, 0, plate("61", "1.15")), motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("76.25"), Heater: motor.Amps("76.26"), Units: 2}},
		map[string]string{"overload_setting overload.setting_amperes": "note 76.25 A 76.25 A", "overload_units overload.units": "violation 3 2"}, "61 × 125 %; Table 430.37, Table 25"},
	{"second step, NEC alone", necEditions, pump("50", 460, 0, plate("61", "1.15")), motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("85.4")}},
		map[string]string{"overload_setting overload.setting_amperes": "caution 76.25 A 85.4 A"}, "430.32(C): 140 %"},
	{"no second step, CEC", cecEditions, pump("50", 460, 0, plate("61", "1.15")), motorcircuit.Installed{HardStart: true, Overload: motorcircuit.InstalledOverload{Heater: motor.Amps("80")}},
		map[string]string{"overload_setting overload.heater_amperes": "violation 76.25 A 80 A"}, "28-306(1)"},
	{"inside the delta", everyone, pump("50", 460, 0, plate("61", "1.15"), func(c *motorcircuit.Circuit) { c.Motor.Starting = motor.WyeDelta }),
		motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("60"), Share: true}},
		map[string]string{"overload_setting overload.setting_amperes": "violation 44.225 A 60 A"}, "58 % of 76.25 A"},

	{"interrupting rating", everyone, pump("50", 460, 0, func(c *motorcircuit.Circuit) { c.Fault = motor.Amps("22000") }), motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Interrupting: motor.Amps("18000")}},
		map[string]string{"interrupting_rating device.interrupting_amperes": "violation 22000 A 18000 A"}, "110.9, Rule 14-012: from memory"},
	{"switches", everyone, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("74.75"), Horsepower: motor.HP("40")}, Controller: motorcircuit.Switch{Horsepower: motor.HP("50")}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "note 74.75 A 74.75 A", "switch_horsepower disconnecting_means.horsepower": "violation 50 hp 40 hp", "switch_horsepower controller.horsepower": "note 50 hp 50 hp"},
		"430.110(A), 28-602(1): 65 × 115 %; 430.109, 28-602; 430.83, 28-500"},
	{"a switch by its amperes alone", everyone, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("74.7")}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "violation 74.75 A 74.7 A"}, "115 % of 65 A"},
	{"a switch by its power, CEC", cecEditions, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("60"), Horsepower: motor.HP("50")}},
		map[string]string{"switch_horsepower disconnecting_means.horsepower": "note 50 hp 50 hp", "switch_amperes disconnecting_means.amperes": ""}, "28-602(1): a motor-circuit switch by its power, a breaker by 115 %"},
	{"a switch by its power, NEC", necEditions, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{Amperes: motor.Amps("60"), Horsepower: motor.HP("50")}},
		map[string]string{"switch_amperes disconnecting_means.amperes": "violation 74.75 A 60 A"}, "430.110(A): an exception for listed unfused switches alone"},
	{"locked rotor of a switch", necEditions, pump("50", 460, 0), motorcircuit.Installed{Disconnect: motorcircuit.Switch{LockedRotor: motor.Amps("360")}},
		map[string]string{"switch_locked_rotor disconnecting_means.locked_rotor_amperes": "violation 363 A 360 A"}, "Table 430.251(B)"},

	{"bonding by the device", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("4"), Device: motorcircuit.InstalledDevice{Rating: motor.Amps("175")}, Bonding: motorcircuit.BondingConductors{Size: sizeOf("8")}},
		map[string]string{"bonding_size bonding": "violation 13.3 mm² 8.367 mm²"}, "Table 250.122: 6 AWG copper to 200 A"},
	{"bonding of copper beside aluminum", necEditions, pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Wiring.Material = conductor.Aluminum }),
		motorcircuit.Installed{Branch: wire("2"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}},
		map[string]string{"bonding_size bonding": "note 13.3 mm² 13.3 mm²"}, "Table 250.122, by its own metal"},
	{"bonding enlarged with the conductors", necEditions, pump("50", 460, protection.InverseTimeBreaker), motorcircuit.Installed{Branch: wire("1"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("4")}},
		map[string]string{"bonding_size bonding": "violation 26.67 mm² 21.15 mm²"}, "250.122(B): 13.3 × 42.41 ÷ 21.15 = 26.669 mm², 3 AWG"},
	{"raceway", necEditions, pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Wiring.Raceway = conductor.EMT }),
		motorcircuit.Installed{Branch: wire("4"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}, Raceway: motorcircuit.InstalledRaceway{Trade: "21"}},
		map[string]string{"raceway_fill raceway": "violation 0.213 in² 0.2979 in²"}, "Chapter 9 Tables 4 and 5: 3 × 0.0824 + 0.0507"},
	{"others in the raceway", necEditions, pump("50", 460, protection.InverseTimeBreaker),
		motorcircuit.Installed{Branch: wire("4"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}, Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: "1",
			Others: []conductor.Pull{{Size: sizeOf("12"), Count: 4, Insulation: "THHN"}}}},
		map[string]string{"raceway_fill raceway": "violation 0.346 in² 0.3511 in²"}, "0.2979 + 4 × 0.0133"},
	{"a caller's own limit of drop", necEditions, pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.MaxDrop = motor.Factor("1") }),
		motorcircuit.Installed{Branch: wire("4"), Length: conductor.Metres("100")}, map[string]string{"drop_running length": "violation 1 % 2.38 %"}, "Chapter 9 Table 9: 328 ft of 0.31 + j0.06 Ω/kft, 65 A at 0.86; the limit is the caller's"},
	{"a fire pump's drop", necEditions, pump("50", 460, protection.TimeDelayFuse, func(c *motorcircuit.Circuit) { c.Motor.Use = motor.FirePump }),
		motorcircuit.Installed{Branch: wire("4"), Length: conductor.Metres("400"), Device: motorcircuit.InstalledDevice{Rating: motor.Amps("350")}},
		map[string]string{"drop_starting length": "caution 15 % 27.87 %", "drop_running length": "caution 5 % 10.99 %", "device_carries device.rating_amperes": "violation 363 A 350 A"}, "695.7, 695.4(B)(2)(a); 115 % of 65 A and 363 A over 0.407 + j0.079 Ω"},
	{"the code's figure of drop", everyone, pump("50", 460, protection.InverseTimeBreaker),
		motorcircuit.Installed{Branch: wire("4"), Length: conductor.Metres("300")}, map[string]string{"drop_running length": "caution 3 % 7.15 %"}, "210.19 note, 8-102: 3 %; three times the run"},
}

func plate(amperes, factor string) func(*motorcircuit.Circuit) {
	return func(c *motorcircuit.Circuit) {
		c.Motor.Nameplate = motor.Nameplate{Amperes: motor.Amps(amperes), ServiceFactor: motor.Factor(factor)}
	}
}

func TestCheckCases(t *testing.T) { holdCases(t, checkCases) }

// holdCases holds what is found of each case, under each of its editions.
func holdCases(t *testing.T, cases []checkCase) {
	t.Helper()
	for _, tt := range cases {
		for _, e := range tt.editions {
			t.Run(tt.name+"/"+e.String(), func(t *testing.T) {
				tt.c.Edition = e
				got := map[string]string{}
				for _, f := range checked(t, tt.c, tt.installed).Findings {
					key := fmt.Sprintf("%v %s", f.Code, f.Part)
					require.NotContains(t, got, key, "code and part name a finding")
					got[key] = fmt.Sprintf("%v %v %v", f.Severity, f.Required, f.Found)
				}
				for key, want := range tt.want {
					assert.Equal(t, want, got[key], "%s: %s", key, tt.source)
				}
			})
		}
	}
}

// Each published answer, installed as it is printed, stands.
func TestCheckAcceptsPublishedAnswers(t *testing.T) {
	held := 0
	for _, x := range readExamples(t) {
		if x.in.isFeeder() {
			continue
		}
		for _, e := range everyone {
			if e.Code().String() != x.code {
				continue
			}
			c := x.in.circuit(t, e)
			var in motorcircuit.Installed
			answer := func(key string, set func(text string)) {
				if raw, ok := x.want[key]; ok && notYet[x.id+"/"+key] == "" {
					held++
					set(trimmed(string(raw)))
				}
			}
			if c.Motor.Starting != motor.WyeDelta { // whose answer is the run to the motor
				answer("conductor_size", func(s string) { in.Branch = wire(s) })
			}
			answer("overload_max_a", func(s string) { in.Overload.Setting = motor.Amps(s) })
			if c.Device != protection.InstantaneousBreaker {
				answer("ocpd_max_a", func(s string) { in.Device.Rating = motor.Amps(s) })
			}
			answer("egc_size", func(s string) {
				in.Bonding = motorcircuit.BondingConductors{Size: sizeOf(s), Material: c.Wiring.Material}
			})
			assert.Empty(t, checked(t, c, in).Violations(), "%s of %s under %v", x.id, x.publication, e)
		}
	}
	assert.Greater(t, held, 50)
}

// trimmed returns a JSON text or number as plain text.
func trimmed(raw string) string {
	if len(raw) > 1 && raw[0] == '"' {
		return raw[1 : len(raw)-1]
	}
	return raw
}

// The words and the rules of findings, by code.
func TestCheckWords(t *testing.T) {
	for _, e := range everyone {
		c := pump("200", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Edition, c.Fault = e, motor.Amps("22000") })
		report := checked(t, c, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: sizeOf("1/0"), Sets: 2}, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("200"), Interrupting: motor.Amps("25000")}})
		assert.Contains(t, found(report, motorcircuit.ConductorAmpacity)[0].Text, "ampacity of 2 × 1/0 AWG copper ")
		nec := e.Code() == tables.NEC
		assert.Equal(t, map[bool]string{true: "430.52(B)", false: "common practice"}[nec], found(report, motorcircuit.DeviceCarries)[0].Cites[0].Ref)
		assert.Equal(t, map[bool]string{true: "110.9", false: "Rule 14-012"}[nec], found(report, motorcircuit.InterruptingRating)[0].Cites[0].Ref)
		report = checked(t, c, motorcircuit.Installed{Branch: wire("1/0")})
		assert.Contains(t, found(report, motorcircuit.ConductorAmpacity)[0].Text, "ampacity of 1/0 AWG copper ")
	}
}

// The ends of what may be given are allowed: 1000 V, 12 sets, 9 units, 1000000 A.
func TestCheckEdges(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Motor: motor.Motor{Kind: motor.Torque, Voltage: motorcircuit.MaxVolts, Nameplate: motor.Nameplate{Amperes: motor.Amps("12")}}}
	report := checked(t, c, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: sizeOf("1/0"), Sets: conductor.MaxSets}, Overload: motorcircuit.InstalledOverload{Units: 9}, Device: motorcircuit.InstalledDevice{Rating: motor.Amps("1000000")}})
	assert.NotEmpty(t, found(report, motorcircuit.ConductorParallel))
	assert.Equal(t, motorcircuit.Violation, found(report, motorcircuit.DeviceRating)[0].Severity)
}
