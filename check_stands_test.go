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

// A breaker that is set between standard ratings bonds by its setting. NFPA 70: 60
// and 50 hp at 460 V behind time-delay fuses, 77 × 175 % is 150 A, and 65 A: 215 A,
// so 200 A (430.62, 240.6(A)). A setting of 210 A is within that, and 4 AWG bonds to
// 300 A, 6 AWG to 200 A (Table 250.122).
func TestCheckBondsByTheSetting(t *testing.T) {
	for _, e := range necEditions {
		f := feeder(e, cage("a", "60", 460), cage("b", "50", 460))
		f.Device = protection.InverseTimeBreaker
		in := motorcircuit.InstalledFeeder{Conductors: wire("2/0"), Device: rated("210"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}}
		report := checkedFeeder(t, f, in)
		assert.Equal(t, motorcircuit.Note, found(report, motorcircuit.DeviceRating)[0].Severity)
		assert.Equal(t, "21.15 mm²", found(report, motorcircuit.BondingSize)[0].Required.String())
		assert.False(t, told(report.Cautions, "may not stand"))
		in.Device = rated("220") // above the limit: judged by the 200 A that may be
		report = checkedFeeder(t, f, in)
		assert.Equal(t, "13.3 mm²", found(report, motorcircuit.BondingSize)[0].Required.String())
		assert.True(t, told(report.Cautions, "may not stand"))

		// A marked maximum of 210 A, 430.52(C)(2), is no standard rating: 200 A by that.
		c := pump("100", 460, protection.InverseTimeBreaker, func(c *motorcircuit.Circuit) { c.Edition, c.Motor.Nameplate.MaximumDevice = e, motor.Amps("210") })
		report = checked(t, c, motorcircuit.Installed{Branch: wire("2/0"), Device: rated("210"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("6")}})
		assert.Equal(t, motorcircuit.Note, found(report, motorcircuit.DeviceRating)[0].Severity)
		assert.Equal(t, "21.15 mm²", found(report, motorcircuit.BondingSize)[0].Required.String())
	}
}

// NEC 250.122(B) of 2017 counts from the size before correction, by the insulation
// that is there: 81.25 A asks TW for 3 AWG and THWN for 4 AWG (Table 310.15(B)(16)).
// 1 AWG TW carries 110 × 0.82 A at 40 °C. 6 AWG bonds to 200 A, and 13.3 × 42.41 ÷
// 26.67 = 21.149 mm², 4 AWG; from 4 AWG it would be 3 AWG.
func TestCheckEnlargesFromTheInsulationThatIsThere(t *testing.T) {
	c := pump("50", 460, protection.TimeDelayFuse, func(c *motorcircuit.Circuit) { c.Edition, c.Wiring.Ambient = tables.NEC2017, motor.Celsius("40") })
	in := motorcircuit.Installed{Branch: wire("1"), Device: rated("125"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("4")}}
	in.Branch.Insulation = "TW"
	report := checked(t, c, in)
	assert.Equal(t, "90.2 A", found(report, motorcircuit.ConductorAmpacity)[0].Found.String())
	assert.Equal(t, "21.15 mm²", found(report, motorcircuit.BondingSize)[0].Required.String())
}

// An ambient that the table of factors leaves blank is not allowed for the insulation:
// 60 °C conductors to 55 °C (NEC Table 310.15(B)(1)(1), CEC Table 5A). It is found,
// and what is not of those conductors is judged.
func TestCheckFindsInsulationTooCold(t *testing.T) {
	for _, e := range everyone {
		c := pump("50", 460, protection.TimeDelayFuse, func(c *motorcircuit.Circuit) { c.Edition, c.Wiring.Ambient = e, motor.Celsius("65") })
		in := motorcircuit.Installed{Branch: wire("1/0"), Overload: motorcircuit.InstalledOverload{Units: 3}}
		in.Branch.Insulation = "TW"
		report := checked(t, c, in)
		require.Len(t, report.Violations(), 1)
		f := report.Violations()[0]
		assert.Equal(t, "conductor_insulation branch.insulation", f.Code.String()+" "+f.Part)
		assert.Contains(t, f.Text, "65 °C")
		assert.Contains(t, map[tables.Code]string{tables.NEC: "Table 310.15(B)(2)(a) Table 310.15(B)(1) Table 310.15(B)(1)(1)", tables.CEC: "Table 5A"}[e.Code()], f.Cites[0].Ref)
		assert.NotEmpty(t, found(report, motorcircuit.OverloadUnits))
		soundReport(t, report, nil)
		if e.Code() == tables.CEC { // 60 °C insulation at the motor, which asks for more besides
			in = motorcircuit.Installed{MotorSupply: wire("1/0")}
			in.MotorSupply.Insulated = motor.Celsius("60")
			report = checked(t, c, in)
			require.Len(t, report.Violations(), 1)
			assert.Equal(t, "motor_supply.insulation", report.Violations()[0].Part)
		}
	}
	f := feeder(tables.NEC2023, cage("a", "30", 460))
	f.Wiring.Ambient = motor.Celsius("65")
	in := motorcircuit.InstalledFeeder{Conductors: wire("1/0"), Disconnect: motorcircuit.Switch{Amperes: motor.Amps("40")}}
	in.Conductors.Insulation = "TW"
	report := checkedFeeder(t, f, in)
	assert.Len(t, report.Violations(), 2, "the insulation and the switch of 40 A")
}

// The rating of an instantaneous-trip breaker, whose setting is what the codes limit,
// is listed as not judged.
func TestCheckListsRatingOfInstantaneousTrip(t *testing.T) {
	for _, e := range everyone {
		c := pump("50", 460, protection.InstantaneousBreaker, func(c *motorcircuit.Circuit) { c.Edition = e })
		parts := map[string]string{}
		for _, n := range checked(t, c, motorcircuit.Installed{Device: rated("100")}).NotJudged {
			parts[n.Part] = n.Why
		}
		assert.Contains(t, parts["device.rating_amperes"], "setting")
		assert.Equal(t, "not given", parts["device.instantaneous_amperes"])
		for _, n := range checked(t, c, motorcircuit.Installed{}).NotJudged {
			assert.NotEqual(t, "device.rating_amperes", n.Part, "it has none to give")
		}
	}
}

// Values of input errors are told, and shortened if long.
func TestCheckErrorsTellValues(t *testing.T) {
	c := pump("50", 460, 0, func(c *motorcircuit.Circuit) { c.Edition = tables.NEC2023 })
	_, err := motorcircuit.Check(c, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: 250}})
	assert.Contains(t, err.Error(), "250")
	_, err = motorcircuit.Check(c, motorcircuit.Installed{Branch: wire("4"), Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: strings.Repeat("7", 4096)}})
	assert.Equal(t, "installed.raceway.trade_size", tables.FieldOf(err))
	assert.Less(t, len(err.Error()), 400)
	_, err = motorcircuit.CheckFeeder(feeder(tables.NEC2023, cage("a", "30", 460)), motorcircuit.InstalledFeeder{Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: strings.Repeat("7", 4096)}})
	assert.Less(t, len(err.Error()), 400)
	_, err = motorcircuit.CheckFeeder(feeder(tables.NEC2023, cage(longText, "51", 460)), motorcircuit.InstalledFeeder{})
	assert.Less(t, len(err.Error()), 400)
}

// Where a hard start is confirmed, the higher ceiling is what is required, also of
// what exceeds that: 65 × 400 % = 260 A and 61 × 140 % = 85.4 A (NEC 430.52(C)(1),
// 430.32(C)).
func TestCheckHoldsHardStartToItsCeiling(t *testing.T) {
	for _, e := range necEditions {
		c := pump("50", 460, protection.InverseTimeBreaker, plate("61", "1.15"))
		c.Edition = e
		in := motorcircuit.Installed{HardStart: true, Device: rated("300"), Overload: motorcircuit.InstalledOverload{Setting: motor.Amps("90")}}
		bad := checked(t, c, in).Violations()
		require.Len(t, bad, 2)
		assert.Equal(t, "85.4 A -4.6 A", bad[0].Required.String()+" "+bad[0].Margin.String())
		assert.Equal(t, "260 A -40 A", bad[1].Required.String()+" "+bad[1].Margin.String())
		in.HardStart = false
		bad = checked(t, c, in).Violations()
		assert.Equal(t, "76.25 A 175 A", bad[0].Required.String()+" "+bad[1].Required.String())
	}
}
