package motorcircuit_test

import (
	"errors"
	"math/rand/v2"
	"slices"
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

// installedRun is a 25 hp motor on 6 AWG copper THWN in EMT 1, terminals of 75 °C.
func installedRun() (motorcircuit.Circuit, motorcircuit.Installed) {
	c := motorcircuit.Circuit{Tag: "SP-3", Edition: tables.NEC2023, Device: protection.InverseTimeBreaker,
		Motor:  motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("25"), Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("33")}},
		Wiring: conductor.Wiring{Termination: 75, Raceway: conductor.EMT}}
	in := motorcircuit.Installed{
		Branch:  motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("6"))},
		Bonding: motorcircuit.BondingConductors{Size: tables.Must(tables.ParseSize("6"))},
		Raceway: motorcircuit.InstalledRaceway{Trade: "1"},
	}
	return c, in
}

// 6 AWG copper THWN carries 65 A at 75 °C (NFPA 70-2023 Table 310.16).
//   - 65 ÷ 1.25 = 52 A, which is 40 hp at 460 V (Table 430.250); 50 hp asks 81.25 A.
//   - 34 A × 1.25 = 42.5 A; 42.5 ÷ 65 = 0.654: Table 310.15(B)(1)(1) gives 75 °C
//     conductors 0.67 to 55 °C and 0.58 to 60 °C.
//   - By Table 310.15(C)(1), 70 percent to 9 conductors (45.5 A) and 50 percent from
//     10 (32.5 A): 6 beside the 3. By area EMT 1 holds 0.346 in² (Chapter 9 Table 4),
//     that is 6 of 0.0507 in² (Table 5): 2 beside the 3 and the bonding conductor,
//     which 250.122(B) makes of 6 AWG, since 8 AWG would carry the load.
func TestReverseByHand(t *testing.T) {
	c, in := installedRun()
	h, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "40 hp", h.Power.String())
	assert.Equal(t, "40 hp", h.Motor.Value.String())
	assert.Equal(t, motorcircuit.ConductorAmpacity, h.Motor.Binds.Code)
	assert.Equal(t, "81.25 A", h.Motor.Binds.Required.String())
	assert.Equal(t, "55 °C", h.Ambient.Value.String())
	assert.Equal(t, motorcircuit.ConductorAmpacity, h.Ambient.Binds.Code)
	assert.Equal(t, "2", h.Conductors.Value.String())
	assert.Equal(t, motorcircuit.RacewayFilled, h.Conductors.Binds.Code)
	assert.Equal(t, motorcircuit.DropRunning, h.Run.Binds.Code)

	in.Raceway.Trade = "" // the fill is not judged: the factor binds
	h, err = motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "6", h.Conductors.Value.String())
	assert.Equal(t, motorcircuit.ConductorAmpacity, h.Conductors.Binds.Code)

	in.Disconnect.Horsepower = motor.HP("30") // a smaller switch binds first
	h, err = motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "30 hp", h.Power.String())
	assert.Equal(t, motorcircuit.SwitchHorsepower, h.Motor.Binds.Code)

	in.Disconnect.Horsepower = motor.HP("1/2") // the smallest of the table
	h, err = motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "1/2 hp", h.Power.String())
	assert.Equal(t, motorcircuit.SwitchHorsepower, h.Motor.Binds.Code)

	in.Branch.Size = tables.Must(tables.ParseSize("1000"))
	in.Disconnect, in.Bonding = motorcircuit.Switch{}, motorcircuit.BondingConductors{}
	h, err = motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "350 hp", h.Power.String(), "414 A × 1.25 = 517.5 A of 545 A; 400 hp has 477 A")
}

// The longest run is where the voltage drop reaches the limit: the code's, or the
// circuit's own. It is the one that Size tells of the same conductors.
func TestReverseLongestRun(t *testing.T) {
	c, in := installedRun()
	c.Wiring.Length, c.Wiring.Least = conductor.Metres("10"), in.Branch.Size
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	h, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, r.Drop.LongestRun.String(), h.Run.Value.String())
	c.MaxDrop = motor.Factor("1.5")
	half, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.InDelta(t, h.Run.Value.Float()/2, half.Run.Value.Float(), 0.2)
}

// Where nothing binds, the search ends where what may be given does: 1 hp of 1.8 A on
// 1/0 AWG, of which 35 percent of 150 A is left (NFPA 70-2023 Table 310.15(C)(1)).
func TestReverseWithoutABound(t *testing.T) {
	c, in := installedRun()
	c.Motor.Power, c.Motor.Nameplate = motor.HP("1"), motor.Nameplate{}
	in.Branch.Size, in.Bonding, in.Raceway = sizeOf("1/0"), motorcircuit.BondingConductors{}, motorcircuit.InstalledRaceway{}
	h, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Equal(t, "997", h.Conductors.Value.String())
	assert.Contains(t, h.Conductors.Why, "nothing binds")
	assert.Zero(t, h.Conductors.Binds.Code)
	assert.Contains(t, h.Ambient.Why, "covers ambients up to")
}

// What cannot be told is told why.
func TestReverseWithoutAnAnswer(t *testing.T) {
	c, in := installedRun()
	c.Motor = motor.Motor{Kind: motor.Torque, Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("12")}}
	c.Wiring.Run, c.Wiring.Raceway = tables.InCable, 0
	in.Raceway = motorcircuit.InstalledRaceway{}
	h, err := motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	assert.Contains(t, h.Motor.Why, "nameplate")
	assert.Contains(t, h.Conductors.Why, "not in a raceway")

	for why, change := range map[string]func(*motor.Motor){
		"goes by its nameplate": func(m *motor.Motor) { m.Kind, m.Power = motor.Hermetic, tables.Power{} },
		"another drive":         func(m *motor.Motor) { m.Starting, m.Nameplate.DriveInput = motor.Drive, motor.Amps("36") },
		"rectifier": func(m *motor.Motor) {
			m.Kind, m.Power, m.Voltage, m.Rectifier, m.Nameplate.RectifierInput = motor.DirectCurrent, motor.HP("10"), 240, motor.HalfWave, motor.Amps("44")
		},
		"several speeds": func(m *motor.Motor) {
			m.Nameplate = motor.Nameplate{Windings: []motor.Winding{{Amperes: motor.Amps("33")}, {Amperes: motor.Amps("20")}}}
		},
	} {
		c, in := installedRun()
		change(&c.Motor)
		h, err := motorcircuit.Reverse(c, in)
		require.NoError(t, err, why)
		assert.Contains(t, h.Motor.Why, why)
		assert.True(t, h.Motor.Value.IsZero() && h.Power.IsZero())
		assert.Contains(t, h.String(), "-  largest motor: "+h.Motor.Why[:20])
	}

	c, in = installedRun()
	in.Overload.Setting = motor.Amps("90") // stands over every motor that the conductors carry
	h, err = motorcircuit.Reverse(c, in)
	require.NoError(t, err)
	for name, x := range map[string]motorcircuit.Edge{"run": h.Run, "ambient": h.Ambient, "conductors": h.Conductors} {
		assert.True(t, x.Value.IsZero(), name)
		assert.Equal(t, motorcircuit.OverloadSetting, x.Binds.Code, name)
	}
	assert.True(t, h.Motor.Value.IsZero())
	assert.NotZero(t, h.Motor.Binds.Code)

	_, err = motorcircuit.Reverse(c, motorcircuit.Installed{Overload: motorcircuit.InstalledOverload{Units: -1}})
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
	assert.ErrorContains(t, err, "installed.overload.units")
	assert.ErrorContains(t, err, "installed.branch.size")
}

// Each answer passes the check, and one step more fails it.
func TestReverseAnswersAreEdges(t *testing.T) {
	count := 150
	if testing.Short() {
		count = 20
	}
	found := map[string]int{}
	randomDesigns(t, 11, count, func(_ *rand.Rand, r motorcircuit.Result) {
		c, in := r.Circuit, r.AsInstalled()
		h, err := motorcircuit.Reverse(c, in)
		require.NoError(t, err)
		edge := func(name string, x motorcircuit.Edge, step string, set func(v decimal.Decimal) (motorcircuit.Circuit, motorcircuit.Installed)) {
			if x.Value.IsZero() {
				return
			}
			found[name]++
			c, in := set(x.Value.Value())
			require.Empty(t, checked(t, c, in).Violations(), name)
			c, in = set(x.Value.Value().Add(decimal.RequireFromString(step)))
			report, err := motorcircuit.Check(c, in)
			if x.Binds.Code == 0 {
				require.NotEmpty(t, x.Why)
				return
			}
			require.NoError(t, err)
			require.NotEmpty(t, report.Violations(), name)
			require.Equal(t, x.Binds, report.Violations()[0], name)
		}
		edge("run", h.Run, "0.1", func(v decimal.Decimal) (motorcircuit.Circuit, motorcircuit.Installed) {
			c, in := c, in
			in.Length = conductor.Metres(v.String())
			if c.MaxDrop.IsZero() {
				c.MaxDrop = motor.Factor(dropFigure(c))
			}
			return c, in
		})
		edge("ambient", h.Ambient, "1", func(v decimal.Decimal) (motorcircuit.Circuit, motorcircuit.Installed) {
			c := c
			c.Wiring.Ambient = motor.Celsius(v.String())
			return c, in
		})
		edge("conductors", h.Conductors, "1", func(v decimal.Decimal) (motorcircuit.Circuit, motorcircuit.Installed) {
			c, in, n := c, in, int(v.IntPart())
			c.Wiring.Conductors = max(c.Wiring.Conductors, c.Motor.LineConductors()) + n
			if n > 0 && in.Raceway.Trade != "" {
				in.Raceway.Others = []conductor.Pull{{Size: in.Branch.Size, Count: n}}
			}
			return c, in
		})
		if !h.Power.IsZero() {
			found["motor"]++
			if c.Motor.Nameplate.Amperes.IsZero() {
				require.GreaterOrEqual(t, h.Power.Cmp(c.Motor.Power), 0, "it feeds its own motor: %+v", c)
			}
		}
	})
	for _, name := range []string{"run", "ambient", "conductors", "motor"} {
		assert.Positive(t, found[name], name)
	}
}

// dropFigure is the percent that Reverse holds a run to where the circuit gives none.
func dropFigure(c motorcircuit.Circuit) string {
	if c.Motor.Use == motor.FirePump { // NEC 695.7
		return "5"
	}
	return "3"
}

// The spare amperes of a feeder of 21 and 14 A: 21 × 1.25 + 14 = 40.25 A, on 6 AWG
// of 65 A (NFPA 70-2023 430.24, Tables 430.250 and 310.16). A motor of 15 hp draws
// 21 A: 61.25 A; one of 20 hp 27 A: 33.75 + 21 + 14 = 68.75 A.
func TestReverseFeederByHand(t *testing.T) {
	f := feeder(tables.NEC2023, cage("a", "15", 460), cage("b", "10", 460))
	f.Device, f.Wiring.Termination = protection.InverseTimeBreaker, 75
	in := motorcircuit.InstalledFeeder{Conductors: motorcircuit.Conductors{Size: tables.Must(tables.ParseSize("6"))}}
	h, err := motorcircuit.ReverseFeeder(f, in)
	require.NoError(t, err)
	assert.Equal(t, "24.75 A", h.Spare.Value.String())
	assert.Equal(t, motorcircuit.ConductorAmpacity, h.Spare.Binds.Code)
	assert.Equal(t, "15 hp", h.Power.String())
	assert.Equal(t, "68.75 A", h.Motor.Binds.Required.String())

	_, err = motorcircuit.ReverseFeeder(f, motorcircuit.InstalledFeeder{})
	assert.ErrorContains(t, err, "installed.conductors.size")
}

// The answers for feeders are edges too.
func TestReverseFeederAnswersAreEdges(t *testing.T) {
	rng := rand.New(rand.NewPCG(31, 32))
	found := 0
	for range 12 {
		e := everyone[rng.IntN(len(everyone))]
		f := randomFeeder(rng, e, 1+rng.IntN(4))
		in := motorcircuit.InstalledFeeder{Conductors: sized(t, f).AsInstalled().Conductors}
		for n := rng.IntN(6); n > 0 && in.Conductors.Size < tables.Must(tables.ParseSize("1000")); n-- {
			in.Conductors.Size = in.Conductors.Size.Larger()
		}
		h, err := motorcircuit.ReverseFeeder(f, in)
		require.NoError(t, err)
		if h.Spare.Value.IsZero() {
			t.Fatalf("what SizeFeeder designs stands: %v", h.Spare.Binds.Text)
		}
		with := func(extra decimal.Decimal) motorcircuit.Report {
			f := f
			f.Other = motor.Amps(f.Other.Decimal().Add(extra).String())
			report, err := motorcircuit.CheckFeeder(f, in)
			require.NoError(t, err)
			return report
		}
		spare := h.Spare.Value.Value()
		require.Empty(t, with(spare).Violations())
		require.Equal(t, h.Spare.Binds, with(spare.Add(decimal.New(1, -2))).Violations()[0])
		if h.Power.IsZero() {
			continue
		}
		found++
		added := slices.Clone(f.Circuits)
		added = append(added, cage("motor added", "1", 460, func(fc *motorcircuit.FeederCircuit) {
			fc.Circuit.Edition, fc.Circuit.Device, fc.Circuit.Motor.Power = e, f.Device, h.Power
		}))
		f.Circuits = added
		report, err := motorcircuit.CheckFeeder(f, in)
		require.NoError(t, err)
		require.Empty(t, report.Violations())
	}
	assert.Positive(t, found)
}

// Nothing of a search panics or hides an error of the input.
func TestReverseErrors(t *testing.T) {
	c, in := installedRun()
	c.Edition = 0
	_, err := motorcircuit.Reverse(c, in)
	assert.ErrorContains(t, err, "edition is not given")
	var circuit *motorcircuit.CircuitError
	f := feeder(tables.NEC2023, cage("a", "51", 460))
	_, err = motorcircuit.ReverseFeeder(f, motorcircuit.InstalledFeeder{})
	assert.True(t, errors.As(err, &circuit))
}
