package motorcircuit_test

import (
	"slices"
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

// found returns the findings of a code.
func found(r motorcircuit.Report, code motorcircuit.FindingCode) (list []motorcircuit.Finding) {
	for _, f := range r.Findings {
		if f.Code == code {
			list = append(list, f)
		}
	}
	return list
}

// Two lines and a bonding conductor of their size are three conductors that may
// jam: 8 AWG THWN, 0.216 in, in EMT 1/2, 0.622 in, is 2.88 to 1 (NFPA 70-2023
// Chapter 9 Tables 1, 4 and 5).
func TestCheckFindsJam(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Motor: motor.Motor{Kind: motor.SinglePhase, Power: motor.HP("5"), Voltage: 230}, Wiring: conductor.Wiring{Raceway: conductor.EMT}}
	in := motorcircuit.Installed{
		Branch:  motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("8"))},
		Bonding: motorcircuit.BondingConductors{Size: tables.Must(tables.ParseSize("8"))},
		Raceway: motorcircuit.InstalledRaceway{Trade: "1/2"},
	}
	jams := found(checked(t, c, in), motorcircuit.RacewayJam)
	require.Len(t, jams, 1)
	assert.Equal(t, motorcircuit.Caution, jams[0].Severity)
	assert.Equal(t, "raceway", jams[0].Part)

	in.Bonding.Size = tables.Must(tables.ParseSize("10"))
	assert.Empty(t, found(checked(t, c, in), motorcircuit.RacewayJam), "the third is thinner")
}

// A fire pump may not be protected by an instantaneous-trip breaker alone (NFPA
// 70-2023 695.4(B)(2)(a)): found as any other kind that may not stand.
func TestCheckFindsKindOfFirePumpDevice(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Device: protection.InstantaneousBreaker, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460, Use: motor.FirePump}}
	kinds := found(checked(t, c, motorcircuit.Installed{}), motorcircuit.DeviceKind)
	require.Len(t, kinds, 1)
	assert.Equal(t, motorcircuit.Violation, kinds[0].Severity)
	assert.Equal(t, "695.4(B)(2)(a)", kinds[0].Cites[0].Ref)
}

// Conductors that are too small are not told to be larger than need be: 50 hp at
// 460 V asks for 81.25 A, 4 AWG at 75 °C (NFPA 70-2023 Tables 430.250, 310.16).
func TestCheckTellsOfLargerConductorsOnly(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460}, Wiring: conductor.Wiring{Termination: 75}}
	for size, larger := range map[string]bool{"6": false, "4": false, "3": true} {
		report := checked(t, c, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: tables.Must(tables.ParseSize(size))}})
		told := slices.ContainsFunc(report.Cautions, func(c tables.Caution) bool { return strings.Contains(c.Text, "are larger than the 4 AWG") })
		assert.Equal(t, larger, told, size)
	}
}

// One 1000 kcmil THWN for a phase carries 545 A × 0.82 at 45 °C, and 500 hp at 460 V
// asks for 590 A × 125 % (NFPA 70-2017 Tables 430.250, 310.15(B)(16) and
// 310.15(B)(2)(a)): no size does in one set. It is found, whatever the bonding
// conductor of such a run would be.
func TestCheckFindsWhatNoSizeMends(t *testing.T) {
	for _, e := range tables.Editions()[:3] {
		c := motorcircuit.Circuit{Edition: e, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("500"), Voltage: 460}, Wiring: conductor.Wiring{Ambient: motor.Celsius("45")}}
		report := checked(t, c, motorcircuit.Installed{Branch: motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("1000"))}})
		short := found(report, motorcircuit.ConductorAmpacity)
		require.Len(t, short, 1, e.String())
		assert.Equal(t, motorcircuit.Violation, short[0].Severity)
		assert.Equal(t, "446.9 A", short[0].Found.String())
		assert.Equal(t, "737.5 A", short[0].Required.String())
	}
}

// An insulation that the edition does not know is a slip of the pen, not a violation.
func TestCheckRefusesUnknownInsulation(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.NEC2023, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("50"), Voltage: 460}, Wiring: conductor.Wiring{Insulation: "THWN2"}}
	_, err := motorcircuit.Check(c, motorcircuit.Installed{})
	assert.Equal(t, "wiring.insulation", tables.FieldOf(err))
	_, err = motorcircuit.CheckFeeder(motorcircuit.Feeder{Edition: tables.NEC2023, Wiring: c.Wiring, Circuits: []motorcircuit.FeederCircuit{{Circuit: motorcircuit.Circuit{Edition: tables.NEC2023, Motor: c.Motor}}}}, motorcircuit.InstalledFeeder{})
	assert.Equal(t, "wiring.insulation", tables.FieldOf(err))
}
