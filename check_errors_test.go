package motorcircuit_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// fieldsOf lists the fields of all faults.
func fieldsOf(err error) (fields []string) {
	for _, fault := range tables.Faults(err) {
		fields = append(fields, tables.FieldOf(fault))
	}
	return fields
}

// badInstalled are the faults of what is installed, each by its field.
var badInstalled = map[string]func(*motorcircuit.Installed){
	"installed.branch.size":                     func(in *motorcircuit.Installed) { in.Branch.Size = sizeOf("16 mm²") },
	"installed.motor_supply.size":               func(in *motorcircuit.Installed) { in.MotorSupply.Size = 250 },
	"installed.secondary.sets":                  func(in *motorcircuit.Installed) { in.Secondary.Sets = -1 },
	"installed.resistor.sets":                   func(in *motorcircuit.Installed) { in.Resistor.Sets = 13 },
	"installed.branch.insulation":               func(in *motorcircuit.Installed) { in.Branch.Insulation = strings.Repeat("x", 4096) },
	"installed.branch.insulation_rating":        func(in *motorcircuit.Installed) { in.Branch.Insulated = motor.Celsius("90") },
	"installed.windings":                        func(in *motorcircuit.Installed) { in.Windings = make([]motorcircuit.InstalledWinding, 3) },
	"installed.overload.setting_amperes":        func(in *motorcircuit.Installed) { in.Overload.Setting = motor.Amps("0") },
	"installed.overload.heater_amperes":         func(in *motorcircuit.Installed) { in.Overload.Heater = motor.Amps("1000001") },
	"installed.overload.units":                  func(in *motorcircuit.Installed) { in.Overload.Units = 10 },
	"installed.overload.share":                  func(in *motorcircuit.Installed) { in.Overload.Share = true },
	"installed.device.kind":                     func(in *motorcircuit.Installed) { in.Device.Kind = 99 },
	"installed.device.rating_amperes":           func(in *motorcircuit.Installed) { in.Device.Rating = motor.Amps("0") },
	"installed.device.instantaneous_amperes":    func(in *motorcircuit.Installed) { in.Device.Instantaneous = motor.Amps("0") },
	"installed.device.interrupting_amperes":     func(in *motorcircuit.Installed) { in.Device.Interrupting = motor.Amps("0") },
	"installed.disconnecting_means.amperes":     func(in *motorcircuit.Installed) { in.Disconnect.Amperes = motor.Amps("0") },
	"installed.controller.locked_rotor_amperes": func(in *motorcircuit.Installed) { in.Controller.LockedRotor = motor.Amps("0") },
	"installed.controller.horsepower":           func(in *motorcircuit.Installed) { in.Controller.Horsepower = motor.HP("100001") },
	"installed.bonding.size":                    func(in *motorcircuit.Installed) { in.Bonding.Size = 99 },
	"installed.bonding.material":                func(in *motorcircuit.Installed) { in.Bonding.Material = 9 },
	"installed.raceway.type":                    func(in *motorcircuit.Installed) { in.Raceway.Trade = "1" },
	"installed.flexible.type":                   func(in *motorcircuit.Installed) { in.Flexible.Trade = "1/2" },
	"installed.raceway.others[0].size":          func(in *motorcircuit.Installed) { in.Raceway.Others = []conductor.Pull{{Count: 3}} },
	"installed.raceway.others[1].count": func(in *motorcircuit.Installed) {
		in.Raceway.Others = []conductor.Pull{{Size: 5, Count: 1}, {Size: 5, Count: -1}}
	},
	"installed.raceway.others[0].insulation": func(in *motorcircuit.Installed) {
		in.Raceway.Others = []conductor.Pull{{Size: 5, Count: 1, Insulation: "cloth"}}
	},
	"wiring.raceway":               func(in *motorcircuit.Installed) { in.Raceway.Type = 99 },
	"wiring.flexible":              func(in *motorcircuit.Installed) { in.Flexible.Type = conductor.EMT },
	"wiring.length":                func(in *motorcircuit.Installed) { in.Length = conductor.Metres("10001") },
	"installed.raceway.trade_size": func(in *motorcircuit.Installed) { in.Raceway.Type, in.Raceway.Trade = conductor.EMT, "7" },
}

// Each fault alone is told with its path and the zero report.
func TestCheckErrors(t *testing.T) {
	for field, spoil := range badInstalled {
		for _, e := range everyone {
			var in motorcircuit.Installed
			spoil(&in)
			c := pump("50", 460, protection.InverseTimeBreaker)
			c.Edition = e
			report, err := motorcircuit.Check(c, in)
			assert.Equal(t, []string{field}, fieldsOf(err), "%v: %v", e, err)
			assert.Equal(t, motorcircuit.Report{}, report)
			assert.Less(t, len(err.Error()), 400)
			requireNamed(t, err)
		}
	}
}

// All faults are told at once, with those of the circuit.
func TestCheckTellsAllFaults(t *testing.T) {
	var in motorcircuit.Installed
	want := map[string]bool{"motor.nameplate.service_factor": true, "wiring.termination": true}
	for field, spoil := range badInstalled {
		switch field {
		case "installed.raceway.type", "installed.flexible.type", "installed.raceway.trade_size", "installed.raceway.others[0].size", "installed.raceway.others[1].count": // the same fields as others
		default:
			spoil(&in)
			want[field] = true
		}
	}
	c := pump("50", 460, protection.InverseTimeBreaker, plate("61", "3"))
	c.Edition, c.Wiring.Termination = tables.NEC2023, 70
	_, err := motorcircuit.Check(c, in)
	got := map[string]bool{}
	for _, field := range fieldsOf(err) {
		got[field] = true
	}
	assert.Equal(t, want, got)

	_, err = motorcircuit.Check(motorcircuit.Circuit{}, in)
	assert.Contains(t, fieldsOf(err), "edition")
	assert.Contains(t, fieldsOf(err), "motor.kind")
	c.Motor.Voltage = 4160
	_, err = motorcircuit.Check(c, in)
	assert.Contains(t, fieldsOf(err), "motor.voltage")
	assert.Contains(t, fieldsOf(err), "installed.overload.units")
	_, err = motorcircuit.Check(pump("51", 460, 0, func(c *motorcircuit.Circuit) { c.Edition = tables.CEC2021 }), motorcircuit.Installed{})
	require.ErrorAs(t, err, new(*tables.NotTabulatedError))
}

// A part that is not given is listed as not judged, and only then.
func TestCheckListsWhatIsNotJudged(t *testing.T) {
	c := pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) {
		c.Edition, c.Fault, c.Wiring.Raceway = tables.NEC2023, motor.Amps("14000"), conductor.EMT
		c.Wiring.Length = conductor.Metres("30")
	})
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	assert.Empty(t, checked(t, c, r.AsInstalled()).NotJudged)
	c.Wiring.Length = tables.Length{}
	var parts []string
	for _, n := range checked(t, c, motorcircuit.Installed{}).NotJudged {
		assert.NotEmpty(t, n.Why)
		parts = append(parts, n.Part)
	}
	assert.Equal(t, []string{"branch", "overload.units", "overload.setting_amperes", "device.rating_amperes", "device.interrupting_amperes",
		"disconnecting_means.amperes", "disconnecting_means.horsepower", "disconnecting_means.locked_rotor_amperes", "controller.horsepower", "bonding", "raceway", "length"}, parts)

	// What is given where nothing is asked of it is listed too.
	given := motorcircuit.Installed{Secondary: wire("4"), Controller: motorcircuit.Switch{LockedRotor: motor.Amps("400"), Horsepower: motor.KW("40")},
		Device: motorcircuit.InstalledDevice{Instantaneous: motor.Amps("900"), Interrupting: motor.Amps("10000")}, Disconnect: motorcircuit.Switch{Amperes: motor.Amps("30"), Horsepower: motor.HP("50"), Unfused: true}}
	c.Fault = tables.Current{}
	whys := map[string]string{}
	for _, n := range checked(t, c, given).NotJudged {
		whys[n.Part] = n.Why
	}
	assert.Contains(t, whys["secondary"], "does not treat such a run apart")
	assert.Contains(t, whys["controller.locked_rotor_amperes"], "nothing is required")
	assert.Contains(t, whys["controller.horsepower"], "powers are not converted")
	assert.Contains(t, whys["device.instantaneous_amperes"], "nothing is required")
	assert.Contains(t, whys["device.interrupting_amperes"], "no fault current")
	assert.Contains(t, whys["disconnecting_means.amperes"], "430.110(A) Exception")
}

// Insulation that may not be used where it is: found, and what rests on it is not
// judged. NEC Table 310.4(1): THHN is for dry and damp places.
func TestCheckFindsInsulation(t *testing.T) {
	for _, own := range []bool{true, false} {
		c := pump("50", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Edition, c.Wiring.Location = tables.NEC2023, tables.Wet })
		in := motorcircuit.Installed{Branch: wire("4")}
		if own {
			in.Branch.Insulation = "THHN"
		} else {
			c.Wiring.Insulation = "THHN"
		}
		report := checked(t, c, in)
		require.Len(t, report.Violations(), 1)
		f := report.Violations()[0]
		assert.Equal(t, "conductor_insulation branch.insulation", f.Code.String()+" "+f.Part)
		assert.NotEmpty(t, f.Cites)
		assert.Empty(t, found(report, motorcircuit.ConductorAmpacity))
		assert.Equal(t, "branch", report.NotJudged[0].Part)
	}
}

// NEC 440.22 and 430.52: no instantaneous trip for a compressor.
func TestCheckFindsKindOfDevice(t *testing.T) {
	for _, e := range everyone {
		fc := compressor("c", "38", "")
		fc.Circuit.Edition = e
		report := checked(t, fc.Circuit, motorcircuit.Installed{Device: motorcircuit.InstalledDevice{Kind: protection.InstantaneousBreaker, Instantaneous: motor.Amps("9")}})
		require.Len(t, report.Violations(), 1)
		assert.Equal(t, motorcircuit.DeviceKind, report.Violations()[0].Code)
		assert.Contains(t, report.Violations()[0].Text, "hermetic")
	}
}

// CEC Rule 28-104 and Table 37: a Class H motor asks for insulation of 110 °C.
func TestCheckMotorSupplyInsulation(t *testing.T) {
	for _, e := range cecEditions {
		c := pump("50", 575, protection.InverseTimeBreaker, plate("50", "1"))
		c.Edition, c.Wiring.Insulation, c.Motor.Nameplate.InsulationClass = e, "RW90", "H"
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		in := r.AsInstalled()
		least := r.MotorSupply.LeastRating
		assert.Equal(t, least.Text()+" °C", in.MotorSupply.Insulated.String())
		assert.Empty(t, checked(t, c, in).Violations())
		in.MotorSupply.Insulated = tables.Temperature{} // RW90
		bad := checked(t, c, in).Violations()
		require.Len(t, bad, 1)
		assert.Equal(t, motorcircuit.ConductorInsulation, bad[0].Code)
		assert.Equal(t, "90 °C", bad[0].Found.String())
		in.MotorSupply.Insulated = motor.Celsius("59")
		_, err = motorcircuit.Check(c, in)
		assert.Equal(t, "installed.motor_supply.insulation_rating", tables.FieldOf(err))
	}
}
