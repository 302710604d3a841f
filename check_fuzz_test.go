package motorcircuit_test

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// anyInstalled draws what might stand of a circuit, good or bad, and now and then
// what cannot be.
func anyInstalled(rnd *rand.Rand, of motorcircuit.Circuit) (in motorcircuit.Installed) {
	yes := func(percent int) bool { return rnd.IntN(100) < percent }
	amps := func() tables.Current {
		if yes(40) {
			return tables.Current{}
		}
		return motor.Amps(fmt.Sprintf("%d.%d", rnd.IntN(700), rnd.IntN(100)))
	}
	insulation := func() string {
		switch {
		case yes(80):
			return ""
		case yes(2):
			return "cloth"
		case of.Edition.Code() == tables.CEC:
			return anyOf(rnd, "RW90", "TW75", "T90 NYLON")
		}
		return anyOf(rnd, "THHN", "XHHW-2", "THWN")
	}
	run := func() motorcircuit.Conductors {
		c := motorcircuit.Conductors{Size: tables.Size(rnd.IntN(31)), Sets: rnd.IntN(5), Insulation: insulation()}
		if yes(2) {
			c.Size, c.Sets = tables.Size(rnd.IntN(256)), rnd.IntN(40)-20
		}
		if yes(1) {
			c.Insulated = motor.Celsius(fmt.Sprint(50 + rnd.IntN(220)))
		}
		return c
	}
	overload := func() motorcircuit.InstalledOverload {
		return motorcircuit.InstalledOverload{Setting: amps(), Heater: amps(), Units: rnd.IntN(5), Share: yes(2) || of.Motor.Starting == motor.WyeDelta && yes(50)}
	}
	rated := func() motorcircuit.Switch {
		return motorcircuit.Switch{Amperes: amps(), LockedRotor: amps(), Horsepower: anyOf(rnd, tables.Power{}, motor.HP("1/3"), motor.HP("30"), motor.KW("22"), motor.HP("500")), Unfused: yes(10)}
	}
	raceway := func() motorcircuit.InstalledRaceway {
		if of.Wiring.Run != tables.InRaceway && yes(95) {
			return motorcircuit.InstalledRaceway{}
		}
		r := motorcircuit.InstalledRaceway{Type: anyOf(rnd, of.Wiring.Raceway, conductor.EMT, conductor.LFMC, tables.Raceway(rnd.IntN(14))), Trade: anyOf(rnd, "", "1/2", "3/4", "1", "21", "53", "4")}
		if r.Type == 0 || yes(2) {
			r.Trade = ""
		}
		if yes(20) {
			r.Others = []conductor.Pull{{Insulation: insulation(), Size: tables.Size(3 + rnd.IntN(20)), Count: 1 + rnd.IntN(20), Bare: yes(10)}}
		}
		return r
	}
	in = motorcircuit.Installed{Branch: run(), Overload: overload(), Disconnect: rated(), Controller: rated(), HardStart: yes(20),
		Device:  motorcircuit.InstalledDevice{Kind: anyOf(rnd, devices...), Rating: amps(), Instantaneous: amps(), Interrupting: amps()},
		Bonding: motorcircuit.BondingConductors{Size: tables.Size(rnd.IntN(31)), Material: tables.Material(rnd.IntN(2))}}
	if yes(50) {
		in.MotorSupply, in.Secondary, in.Resistor = run(), run(), run()
	}
	if yes(50) {
		in.Raceway = raceway()
	}
	for range min(rnd.IntN(3), len(of.Motor.Nameplate.Windings)) {
		in.Windings = append(in.Windings, motorcircuit.InstalledWinding{Conductors: run(), Overload: overload()})
	}
	if yes(50) {
		in.Length = conductor.Metres(fmt.Sprint(1 + rnd.IntN(400)))
	}
	return in
}

// FuzzCheck checks whatever may stand of whatever circuit: a sound report, the same
// each time, or errors that name their fields.
func FuzzCheck(f *testing.F) {
	for seed := range uint64(40) {
		f.Add(seed)
	}
	f.Fuzz(func(t *testing.T, seed uint64) {
		rnd := rand.New(rand.NewPCG(seed, 3))
		c := anyCircuit(rnd)
		in := anyInstalled(rnd, c)
		report, err := motorcircuit.Check(c, in)
		soundReport(t, report, err)
		again, _ := motorcircuit.Check(c, in)
		require.Equal(t, report, again)
		x := randomFeeder(rnd, c.Edition, 1+rnd.IntN(3))
		x.Wiring, x.Fault, x.MaxDrop = c.Wiring, c.Fault, c.MaxDrop
		report, err = motorcircuit.CheckFeeder(x, motorcircuit.InstalledFeeder{Conductors: in.Branch, Device: in.Device, Disconnect: in.Disconnect, Bonding: in.Bonding, Raceway: in.Raceway, Length: in.Length})
		soundReport(t, report, err)
	})
}

// Many of what may stand can be judged, and every code of a finding occurs.
func TestCheckWhateverStands(t *testing.T) {
	count := 20_000
	if testing.Short() {
		count = 2_000
	}
	rnd := rand.New(rand.NewPCG(61, 62))
	judged, codes := 0, map[motorcircuit.FindingCode]bool{}
	for range count {
		c := anyCircuit(rnd)
		report, err := motorcircuit.Check(c, anyInstalled(rnd, c))
		soundReport(t, report, err)
		if err == nil {
			judged++
		}
		for _, f := range report.Findings {
			codes[f.Code] = true
		}
	}
	require.Greater(t, judged, count/4)
	if !testing.Short() {
		require.GreaterOrEqual(t, len(codes), len(motorcircuit.FindingCodes())-2, "%v", codes)
	}
}
