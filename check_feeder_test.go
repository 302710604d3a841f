package motorcircuit_test

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

func checkedFeeder(t *testing.T, f motorcircuit.Feeder, in motorcircuit.InstalledFeeder) motorcircuit.Report {
	t.Helper()
	report, err := motorcircuit.CheckFeeder(f, in)
	require.NoError(t, err)
	soundReport(t, report, nil)
	return report
}

// The feeder of 30 and 15 hp at 460 V under the NEC, 40 × 1.25 + 21 = 71 A (430.24,
// Table 430.250): 4 AWG copper carries 85 A at 75 °C and 6 AWG 65 A. The breaker: 40
// × 250 % is 100 A, and 21 A: 121 A, so 110 A (430.62, 240.6). One disconnecting
// means: 61 × 115 % = 70.15 A (430.110(C)(2)). 8 AWG bonds to 100 A and 6 AWG to 200
// A (Table 250.122).
func TestCheckFeederByHand(t *testing.T) {
	for _, e := range necEditions {
		f := feeder(e, cage("a", "30", 460), cage("b", "15", 460))
		f.Device, f.Wiring.Termination, f.Fault = protection.InverseTimeBreaker, 75, motor.Amps("18000")
		for i := range f.Circuits {
			f.Circuits[i].Circuit.Device = protection.InverseTimeBreaker
		}
		in := motorcircuit.InstalledFeeder{Conductors: wire("6"), Device: motorcircuit.InstalledDevice{Rating: motor.Amps("125"), Interrupting: motor.Amps("10000")},
			Disconnect: motorcircuit.Switch{Amperes: motor.Amps("60"), Horsepower: motor.HP("40")}, Bonding: motorcircuit.BondingConductors{Size: sizeOf("8")}, Length: conductor.Metres("400")}
		got := map[string]string{}
		for _, x := range checkedFeeder(t, f, in).Findings {
			got[x.Code.String()+" "+x.Part] = x.Severity.String() + " " + x.Required.String() + " " + x.Found.String()
		}
		for key, want := range map[string]string{
			"conductor_ampacity conductors":                    "violation 71 A 65 A",
			"device_rating device.rating_amperes":              "violation 121 A 125 A",
			"device_carries device.rating_amperes":             "note 61 A 125 A",
			"interrupting_rating device.interrupting_amperes":  "violation 18000 A 10000 A",
			"switch_amperes disconnecting_means.amperes":       "violation 70.15 A 60 A",
			"switch_horsepower disconnecting_means.horsepower": "violation 50 hp 40 hp",
			"bonding_size bonding":                             "violation 13.3 mm² 8.367 mm²",
		} {
			assert.Equal(t, want, got[key], key)
		}
		assert.Contains(t, got["drop_running length"], "caution 3 %")
		f.Circuits[1].Circuit.Wiring.Length = conductor.Metres("30")
		assert.Contains(t, fmt.Sprint(checkedFeeder(t, f, in).Cautions), "feeder and branch circuit of b together drop")
	}
}

// CEC Rule 28-204(2): motors that start together may have a larger device, to three
// times the ampacity of the conductors that are there.
func TestCheckFeederStartingTogether(t *testing.T) {
	together := func(fc *motorcircuit.FeederCircuit) { fc.StartsWith = "line" }
	for _, e := range cecEditions {
		f := feeder(e, cage("a", "30", 460, together), cage("b", "30", 460, together))
		f.Device, f.Wiring.Termination = protection.InverseTimeBreaker, 75
		r := sized(t, f)
		require.False(t, r.StartRating.IsZero())
		in := r.AsInstalled()
		in.Device.Rating = tables.CurrentAtMost(r.StartRating)
		assert.Empty(t, checkedFeeder(t, f, in).Violations())
		in.Device.Rating = more(last(r.StartLimit, r.StartRating))
		assert.Equal(t, motorcircuit.DeviceRating, checkedFeeder(t, f, in).Violations()[0].Code)
	}
}

// physicalFeeder is a random feeder with a length, a raceway, a fault current, a
// demand factor or a limit of drop.
func physicalFeeder(rng *rand.Rand, e tables.Edition) motorcircuit.Feeder {
	f := randomFeeder(rng, e, 1+rng.IntN(6))
	if rng.IntN(2) == 0 {
		f.Wiring.Length = conductor.Metres(decimal.New(int64(1+rng.IntN(200)), 0).String())
		if rng.IntN(2) == 0 {
			f.MaxDrop = motor.Factor("2")
		}
	}
	if rng.IntN(2) == 0 {
		f.Wiring.Raceway = anyOf(rng, conductor.EMT, conductor.RMC, conductor.PVC40)
	}
	if rng.IntN(3) == 0 {
		f.Fault = motor.Amps("22000")
	}
	if rng.IntN(5) == 0 {
		f.Demand = motor.Factor("0.8")
	}
	return f
}

// What SizeFeeder designs, CheckFeeder accepts, and one step over the line in any
// part is exactly the violation of that part.
func TestCheckFeederAcceptsDesigns(t *testing.T) {
	count := 600
	if testing.Short() {
		count = 60
	}
	rng := rand.New(rand.NewPCG(51, 52))
	taken := map[string]int{}
	for accepted := 0; accepted < count; {
		f := physicalFeeder(rng, everyone[rng.IntN(len(everyone))])
		r, err := motorcircuit.SizeFeeder(f)
		if err != nil { // no raceway is large enough, say
			continue
		}
		accepted++
		require.Empty(t, checkedFeeder(t, f, r.AsInstalled()).Violations(), "%v", r)
		for _, s := range []struct {
			code motorcircuit.FindingCode
			part string
			take func(in *motorcircuit.InstalledFeeder) bool
		}{
			{motorcircuit.DeviceRating, "device.rating_amperes", func(in *motorcircuit.InstalledFeeder) bool {
				in.Device.Rating = more(last(last(r.Limit, r.Rating), last(r.StartLimit, r.StartRating)))
				if f.Edition.Code() == tables.NEC && r.Conductors.Ampacity.Cmp(r.Limit) >= 0 { // 430.62(B)
					return false
				}
				return f.MaxDrop.IsZero() // larger conductors raise the ceilings that go by them, after the device is chosen
			}},
			{motorcircuit.InterruptingRating, "device.interrupting_amperes", func(in *motorcircuit.InstalledFeeder) bool {
				in.Device.Interrupting = less(r.FaultDuty.Source)
				return !r.FaultDuty.Source.IsZero()
			}},
			{motorcircuit.SwitchAmperes, "disconnecting_means.amperes", func(in *motorcircuit.InstalledFeeder) bool {
				in.Disconnect.Amperes = less(r.Disconnect.Amperes)
				return true
			}},
			{motorcircuit.SwitchHorsepower, "disconnecting_means.horsepower", func(in *motorcircuit.InstalledFeeder) bool {
				in.Disconnect.Horsepower = lower(r.Disconnect.Horsepower)
				return !in.Disconnect.Horsepower.IsZero()
			}},
			{motorcircuit.SwitchLockedRotor, "disconnecting_means.locked_rotor_amperes", func(in *motorcircuit.InstalledFeeder) bool {
				in.Disconnect.LockedRotor = less(r.Disconnect.LockedRotor)
				return !in.Disconnect.LockedRotor.IsZero()
			}},
			{motorcircuit.BondingSize, "bonding", func(in *motorcircuit.InstalledFeeder) bool {
				in.Bonding.Size = in.Bonding.Size.Smaller()
				return true
			}},
			{motorcircuit.RacewayFilled, "raceway", func(in *motorcircuit.InstalledFeeder) bool {
				in.Raceway.Trade = smallerTrade(f.Edition, r.Raceway)
				return in.Raceway.Trade != ""
			}},
			{motorcircuit.DropRunning, "length", func(in *motorcircuit.InstalledFeeder) bool {
				in.Length = conductor.Metres("10000")
				return !f.MaxDrop.IsZero()
			}},
		} {
			in := r.AsInstalled()
			if !s.take(&in) {
				continue
			}
			taken[s.part]++
			bad := checkedFeeder(t, f, in).Violations()
			require.Len(t, bad, 1, "%s: %v", s.part, r)
			require.Equal(t, s.code, bad[0].Code)
			require.Equal(t, s.part, bad[0].Part)
		}
		in := r.AsInstalled()
		in.Conductors.Size = in.Conductors.Size.Smaller()
		bad := checkedFeeder(t, f, in).Violations()
		require.NotEmpty(t, bad, "%v", r)
		for _, x := range bad { // smaller conductors carry too little or drop too much, and lower a ceiling that goes by them
			require.Contains(t, []string{"conductors", "length", "device.rating_amperes"}, x.Part)
		}
	}
	for part, n := range taken {
		assert.Positive(t, n, part)
	}
	assert.Len(t, taken, 8)
}

// Faults of the feeder, of its circuits and of what is installed.
func TestCheckFeederErrors(t *testing.T) {
	f := feeder(tables.NEC2023, cage("a", "30", 460))
	_, err := motorcircuit.CheckFeeder(f, motorcircuit.InstalledFeeder{Conductors: motorcircuit.Conductors{Sets: 13}, Device: motorcircuit.InstalledDevice{Kind: 77},
		Disconnect: motorcircuit.Switch{Amperes: motor.Amps("0")}, Bonding: motorcircuit.BondingConductors{Material: 7}, Raceway: motorcircuit.InstalledRaceway{Trade: "1"}})
	assert.Equal(t, []string{"installed.conductors.sets", "installed.device.kind", "installed.disconnecting_means.amperes", "installed.bonding.material", "installed.raceway.type"}, fieldsOf(err))
	_, err = motorcircuit.CheckFeeder(f, motorcircuit.InstalledFeeder{Device: motorcircuit.InstalledDevice{Kind: protection.InstantaneousBreaker}})
	assert.Equal(t, []string{"device"}, fieldsOf(err))
	_, err = motorcircuit.CheckFeeder(motorcircuit.Feeder{}, motorcircuit.InstalledFeeder{})
	assert.Equal(t, []string{"edition"}, fieldsOf(err))
	_, err = motorcircuit.CheckFeeder(feeder(tables.NEC2023, cage("a", "51", 460)), motorcircuit.InstalledFeeder{})
	require.ErrorAs(t, err, new(*motorcircuit.CircuitError))
	_, err = motorcircuit.CheckFeeder(f, motorcircuit.InstalledFeeder{Conductors: wire("2000"), Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: "x"}})
	assert.Equal(t, "installed.conductors.size", tables.FieldOf(err))

	// Insulation that may not be there is found, and the rest judged by what would be.
	f.Wiring.Insulation, f.Wiring.Location = "THHN", tables.Wet
	report := checkedFeeder(t, f, motorcircuit.InstalledFeeder{Conductors: wire("6"), Bonding: motorcircuit.BondingConductors{Size: sizeOf("8")}})
	assert.Equal(t, motorcircuit.ConductorInsulation, report.Violations()[0].Code)
	assert.NotEmpty(t, found(report, motorcircuit.BondingSize))
}

// Bonding conductors are judged by their own metal, and fill the raceway as they are:
// beside aluminum of 71 A a copper one of 6 AWG to 200 A (NEC Table 250.122); 3 × 2
// AWG of 0.1158 in² and 6 AWG of 0.0507 in² (Chapter 9 Table 5), or 4 AWG of 0.0824.
func TestCheckFeederBonding(t *testing.T) {
	f := feeder(tables.NEC2023, cage("a", "30", 460), cage("b", "15", 460))
	f.Device, f.Wiring.Termination, f.Wiring.Material, f.Wiring.Raceway = protection.InverseTimeBreaker, 75, conductor.Aluminum, conductor.EMT
	for size, fill := range map[string]string{"6": "0.3981 in²", "4": "0.4298 in²"} {
		report := checkedFeeder(t, f, motorcircuit.InstalledFeeder{Conductors: wire("2"), Bonding: motorcircuit.BondingConductors{Size: sizeOf(size)}, Raceway: motorcircuit.InstalledRaceway{Trade: "1-1/4"}})
		assert.Equal(t, "13.3 mm²", found(report, motorcircuit.BondingSize)[0].Required.String())
		assert.Equal(t, fill, found(report, motorcircuit.RacewayFilled)[0].Found.String())
	}
}

// A load that no conductors carry in as many sets as there may be: what does not go
// by them is judged all the same. 20 motors of 500 hp at 460 V: 590 × 20.25 A.
func TestCheckFeederThatNothingCarries(t *testing.T) {
	for _, e := range everyone {
		f := feeder(e)
		for i := range 20 {
			f.Circuits = append(f.Circuits, with(cage(fmt.Sprint("m", i), "500", 460), func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Edition = e }))
		}
		report := checkedFeeder(t, f, motorcircuit.InstalledFeeder{Bonding: motorcircuit.BondingConductors{Size: sizeOf("4/0")}, Disconnect: motorcircuit.Switch{Amperes: motor.Amps("4000")}, Length: conductor.Metres("20")})
		assert.Equal(t, motorcircuit.SwitchAmperes, report.Violations()[0].Code)
		assert.Empty(t, found(report, motorcircuit.BondingSize))
		_, err := motorcircuit.SizeFeeder(f)
		require.ErrorAs(t, err, new(*tables.NoSizeError))
	}
}

// NEC 430.62(B): conductors larger than the loads ask for let the device follow their
// ampacity. Two motors of 3 hp at 460 V, 4.8 × 1.25 + 4.8 = 10.8 A, behind breakers of
// 15 A: 15 + 4.8 = 19.8 A; 6 AWG copper carries 65 A at 75 °C. The CEC has no such rule.
func TestCheckFeederByAmpacity(t *testing.T) {
	for _, e := range everyone {
		breaker := func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Device = protection.InverseTimeBreaker }
		f := feeder(e, cage("a", "3", 460, breaker), cage("b", "3", 460, breaker))
		f.Device, f.Wiring.Termination = protection.InverseTimeBreaker, 75
		severity := func(amps, size string) motorcircuit.Severity {
			return found(checkedFeeder(t, f, motorcircuit.InstalledFeeder{Conductors: wire(size), Device: motorcircuit.InstalledDevice{Rating: motor.Amps(amps)}}), motorcircuit.DeviceRating)[0].Severity
		}
		nec := e.Code() == tables.NEC
		assert.Equal(t, nec, severity("60", "6") == motorcircuit.Note)
		assert.Equal(t, motorcircuit.Violation, severity("70", "6"))
		assert.Equal(t, motorcircuit.Violation, severity("25", "12"), "25 A at 75 °C, and 20 A for a small conductor (240.4(D))")
	}
}
