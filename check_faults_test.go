package motorcircuit_test

import (
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
