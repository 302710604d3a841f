package motorcircuit_test

import (
	"fmt"
	"math/rand/v2"
	"strings"
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

// checked checks an installed circuit.
func checked(t *testing.T, c motorcircuit.Circuit, in motorcircuit.Installed) motorcircuit.Report {
	t.Helper()
	report, err := motorcircuit.Check(c, in)
	require.NoError(t, err)
	return report
}

// accepts holds that a design stands without a violation, and with all that it
// designs judged.
func accepts(t *testing.T, r motorcircuit.Result) {
	t.Helper()
	report := checked(t, r.Circuit, r.AsInstalled())
	require.Empty(t, report.Violations(), "%+v", r.Circuit)
	require.NotEmpty(t, report.Findings)
	for _, n := range report.NotJudged {
		require.True(t, n.Part == "length" && r.Circuit.Wiring.Length.IsZero(), "%+v", n)
	}
}

// What Size designs, Check accepts: the whole grid.
func TestCheckAcceptsTheGrid(t *testing.T) {
	count := 0
	grid(t, func(_ motorcircuit.Circuit, results []motorcircuit.Result) {
		for _, r := range results {
			count++
			accepts(t, r)
		}
	})
	assert.Greater(t, count, 20_000)
}

// anyOf returns one of the values.
func anyOf[T any](rnd *rand.Rand, values ...T) T { return values[rnd.IntN(len(values))] }

// anyCircuit draws a circuit of any kind that the library knows; not all can be
// sized.
func anyCircuit(rnd *rand.Rand) motorcircuit.Circuit {
	yes := func(percent int) bool { return rnd.IntN(100) < percent }
	amps := func(most int) tables.Current { return motor.Amps(fmt.Sprint(1 + rnd.IntN(most))) }
	e := anyOf(rnd, tables.Editions()...)
	m := motor.Motor{
		Kind:    anyOf(rnd, motor.SquirrelCage, motor.SquirrelCage, motor.SquirrelCage, motor.SinglePhase, motor.WoundRotor, motor.Synchronous, motor.DirectCurrent, motor.Torque, motor.Hermetic),
		Voltage: anyOf(rnd, 115, 200, 208, 230, 240, 460, 575),
		Power:   motor.HP(anyOf(rnd, ladder...)),
	}
	n := &m.Nameplate
	switch m.Kind {
	case motor.Hermetic, motor.Torque:
		m.Power, m.Phases = tables.Power{}, anyOf(rnd, 1, 3)
		n.Amperes = amps(200)
		if m.Kind == motor.Hermetic && yes(40) {
			n.BranchSelection = n.Amperes
		}
	case motor.DirectCurrent:
		m.Voltage = anyOf(rnd, 120, 240, 500)
	case motor.WoundRotor:
		if yes(70) {
			n.Secondary = amps(300)
			m.Resistor = anyOf(rnd, 0, tables.LightStarting, tables.ExtraHeavyStarting)
		}
	case motor.SquirrelCage:
		m.Starting = anyOf(rnd, motor.AcrossTheLine, motor.AcrossTheLine, motor.WyeDelta, motor.PartWinding, motor.Autotransformer, motor.SoftStarter, motor.Drive)
		if m.Starting == motor.Drive {
			n.DriveInput = amps(500)
		}
		if m.Starting == motor.AcrossTheLine && yes(10) {
			n.Windings = []motor.Winding{{Amperes: amps(300)}, {Amperes: amps(300)}}
		}
		if m.Starting == motor.AcrossTheLine && yes(4) && e.Code() == tables.NEC {
			m.Use = motor.FirePump
		}
	}
	if yes(30) && len(n.Windings) == 0 && n.Amperes.IsZero() {
		n.Amperes = amps(600)
	}
	if yes(40) {
		n.ServiceFactor = anyOf(rnd, motor.Factor("1"), motor.Factor("1.15"))
	}
	if yes(15) && m.Kind == motor.SquirrelCage {
		n.DesignLetter = anyOf(rnd, "A", "B", "C", "D")
	}
	if yes(15) && m.Kind != motor.DirectCurrent {
		n.CodeLetter = anyOf(rnd, "A", "F", "G", "K", "V")
	}
	if yes(20) {
		n.InsulationClass, n.NonVentilated = anyOf(rnd, "A", "B", "F", "H"), yes(30)
	}
	if yes(20) && m.Kind != motor.Torque && m.Kind != motor.Hermetic && m.Use == motor.Ordinary {
		m.Duty = motor.Duty{Kind: anyOf(rnd, motor.ShortTime, motor.Intermittent, motor.Periodic, motor.Varying), Minutes: anyOf(rnd, 0, 5, 15, 30, 60)}
	}
	w := conductor.Wiring{
		Material:    anyOf(rnd, conductor.Copper, conductor.Copper, conductor.Aluminum),
		Insulation:  anyOf(rnd, "", "", "THWN-2", "XHHW-2", "RW90"),
		Location:    anyOf(rnd, tables.Dry, tables.Dry, tables.Damp, tables.Wet),
		Run:         anyOf(rnd, tables.InRaceway, tables.InRaceway, tables.InRaceway, tables.InCable, tables.InFreeAir),
		Termination: anyOf(rnd, 0, 60, 75, 75, 90),
		Reading:     anyOf(rnd, conductor.CorrectTermination, conductor.CorrectInsulation),
	}
	if e.Code() == tables.CEC {
		w.Insulation = anyOf(rnd, "", "RW90", "TW75", "T90 NYLON")
	} else if w.Insulation == "RW90" {
		w.Insulation = "THHN"
	}
	if yes(50) {
		w.Ambient = motor.Celsius(fmt.Sprint(10 + rnd.IntN(50)))
	}
	if yes(30) {
		w.Conductors = 3 + rnd.IntN(30)
	}
	if yes(10) {
		w.Sets = 1 + rnd.IntN(3)
	}
	if yes(10) {
		w.Least = anyOf(rnd, tables.Sizes()...)
	}
	if w.Run == tables.InRaceway && yes(60) {
		w.Raceway = anyOf(rnd, conductor.EMT, conductor.RMC, conductor.PVC40, conductor.FMC)
		if yes(20) {
			w.Flexible = conductor.LFMC
		}
	}
	c := motorcircuit.Circuit{Tag: "r", Edition: e, Motor: m, Wiring: w, Device: anyOf(rnd, devices...)}
	if yes(10) {
		c.Device = 0
	}
	if yes(50) {
		c.Wiring.Length = conductor.Metres(fmt.Sprint(1 + rnd.IntN(200)))
		if yes(60) {
			c.MaxDrop = anyOf(rnd, motor.Factor("1"), motor.Factor("2.5"), motor.Factor("3"), motor.Factor("5"))
		}
	}
	if yes(40) {
		c.Fault = motor.Amps(anyOf(rnd, "5000", "14000", "42000"))
	}
	return c
}

// randomDesigns sizes so many random circuits.
func randomDesigns(t *testing.T, seed uint64, count int, visit func(rnd *rand.Rand, r motorcircuit.Result)) {
	t.Helper()
	rnd := rand.New(rand.NewPCG(seed, 1))
	refused := 0
	for sized := 0; sized < count; {
		r, err := motorcircuit.Size(anyCircuit(rnd))
		if err != nil {
			refused++
			continue
		}
		sized++
		visit(rnd, r)
	}
	require.Less(t, refused, 3*count, "circuits that the tables do not cover")
}

// What Size designs, Check accepts: random circuits of every kind of motor.
func TestCheckAcceptsRandomDesigns(t *testing.T) {
	count := 100_000
	if testing.Short() {
		count = 3_000
	}
	randomDesigns(t, 5, count, func(_ *rand.Rand, r motorcircuit.Result) { accepts(t, r) })
}

// A step takes one part of an installation a step over the line. It reports whether
// the design has such a part.
type step struct {
	code motorcircuit.FindingCode
	part string
	take func(r *motorcircuit.Result, in *motorcircuit.Installed) bool
}

// more and less are a current a hundredth of an ampere off.
func more(f tables.Figure) tables.Current {
	return motor.Amps(f.Value().Add(decimal.New(1, -2)).String())
}

func less(f tables.Figure) tables.Current {
	d := f.Value().Sub(decimal.New(1, -2))
	if f.IsZero() || d.Sign() <= 0 {
		return tables.Current{}
	}
	return motor.Amps(d.Truncate(6).String())
}

// lower returns the power of the ladder next below.
func lower(p tables.Power) (q tables.Power) {
	for _, hp := range ladder {
		if x := motor.HP(hp); p.IsHP() && x.Cmp(p) < 0 {
			q = x
		}
	}
	return q
}

// last returns the higher of two figures, of which the second may be absent.
func last(limit, start tables.Figure) tables.Figure {
	if start.Cmp(limit) > 0 {
		return start
	}
	return limit
}

// nextRating returns the standard rating next above what the code lets stand.
func nextRating(r *motorcircuit.Result) tables.Current {
	x := &r.ShortCircuit
	most := last(last(x.Limit, x.Rating), last(x.StartLimit, x.StartRating))
	if r.Circuit.Motor.Use == motor.FirePump {
		most = x.Rating
	}
	for _, rating := range r.Circuit.Edition.StandardRatings(x.Device) {
		if rating.Cmp(most) > 0 {
			return tables.CurrentOf(rating)
		}
	}
	return tables.Current{}
}

// smallerTrade returns the trade size next below.
func smallerTrade(e tables.Edition, f conductor.Filled) string {
	sizes, _ := e.RacewaySizes(f.Raceway)
	for i, s := range sizes {
		if s.Trade == f.Trade && i > 0 && sizes[i-1].Metric >= 16 {
			return sizes[i-1].Trade
		}
	}
	return ""
}

var steps = []step{
	{motorcircuit.OverloadSetting, "overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Setting = more(last(r.Overload.Limit, r.Overload.StartLimit))
		return !r.Overload.Limit.IsZero()
	}},
	{motorcircuit.OverloadSetting, "overload.heater_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Heater = more(last(r.Overload.Limit, r.Overload.StartLimit))
		return !r.Overload.Limit.IsZero()
	}},
	{motorcircuit.OverloadSetting, "overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Setting, in.Overload.Share = more(r.Overload.Share), true
		return !r.Overload.Share.IsZero()
	}},
	{motorcircuit.OverloadSetting, "windings[1].overload.setting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		if len(in.Windings) < 2 {
			return false
		}
		w := r.Overload.Windings[1]
		in.Windings[1].Overload.Setting = more(last(w.Limit, w.StartLimit))
		return true
	}},
	{motorcircuit.OverloadUnits, "overload.units", func(_ *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Units--
		return in.Overload.Units > 0
	}},
	{motorcircuit.OverloadAbsent, "overload", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Overload.Units = 3
		return r.Overload.Limit.IsZero()
	}},
	{motorcircuit.DeviceRating, "device.rating_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Rating = nextRating(r)
		return !r.ShortCircuit.Rating.IsZero() && !in.Device.Rating.IsZero()
	}},
	{motorcircuit.DeviceCarries, "device.rating_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Rating = less(r.ShortCircuit.Limit)
		return r.Circuit.Motor.Use == motor.FirePump
	}},
	{motorcircuit.InstantaneousSetting, "device.instantaneous_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		x := &r.ShortCircuit
		most := x.Instantaneous
		if x.Device == protection.InstantaneousBreaker {
			most = last(x.Limit, x.StartLimit)
		}
		in.Device.Instantaneous = more(most)
		return !most.IsZero()
	}},
	{motorcircuit.InterruptingRating, "device.interrupting_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Device.Interrupting = less(r.FaultDuty.Source)
		return !r.FaultDuty.Source.IsZero()
	}},
	{motorcircuit.SwitchAmperes, "disconnecting_means.amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.Amperes = less(r.Disconnect.Amperes)
		return !in.Disconnect.Amperes.IsZero()
	}},
	{motorcircuit.SwitchHorsepower, "disconnecting_means.horsepower", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.Horsepower = lower(r.Disconnect.Horsepower)
		return !in.Disconnect.Horsepower.IsZero()
	}},
	{motorcircuit.SwitchLockedRotor, "disconnecting_means.locked_rotor_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Disconnect.LockedRotor = less(r.Disconnect.LockedRotor)
		return !in.Disconnect.LockedRotor.IsZero()
	}},
	{motorcircuit.SwitchAmperes, "controller.amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.Amperes = less(r.Controller.Amperes)
		return !in.Controller.Amperes.IsZero()
	}},
	{motorcircuit.SwitchHorsepower, "controller.horsepower", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.Horsepower = lower(r.Controller.Horsepower)
		return !in.Controller.Horsepower.IsZero()
	}},
	{motorcircuit.SwitchLockedRotor, "controller.locked_rotor_amperes", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Controller.LockedRotor = less(r.Controller.LockedRotor)
		return !in.Controller.LockedRotor.IsZero()
	}},
	{motorcircuit.BondingSize, "bonding", func(_ *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Bonding.Size = in.Bonding.Size.Smaller()
		return in.Bonding.Size != 0
	}},
	{motorcircuit.RacewayFilled, "raceway", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Raceway.Trade = smallerTrade(r.Circuit.Edition, r.Raceway)
		return in.Raceway.Trade != ""
	}},
	{motorcircuit.RacewayFilled, "flexible", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Flexible.Trade = smallerTrade(r.Circuit.Edition, r.Flexible)
		return in.Flexible.Trade != ""
	}},
	{motorcircuit.DropRunning, "length", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		in.Length = conductor.Metres("10000")
		return !r.Circuit.MaxDrop.IsZero() && !r.Drop.Running.IsZero() && r.Circuit.Wiring.Least == 0 && r.Branch.Sets == 1
	}},
	{motorcircuit.ConductorInsulation, "motor_supply.insulation", func(r *motorcircuit.Result, in *motorcircuit.Installed) bool {
		least := r.MotorSupply.LeastRating
		in.MotorSupply.Insulated = motor.Celsius("60")
		return !least.IsZero() && least.Value().IntPart() > 60 && r.Circuit.Wiring.Ambient.Cmp(motor.Celsius("45")) < 0
	}},
}

// One step over the line in any part gives exactly the violation of that part.
func TestCheckFindsOneStep(t *testing.T) {
	count := 4_000
	if testing.Short() {
		count = 1_500
	}
	taken := map[string]int{}
	randomDesigns(t, 7, count, func(_ *rand.Rand, r motorcircuit.Result) {
		for _, s := range steps {
			in := r.AsInstalled()
			if !s.take(&r, &in) {
				continue
			}
			taken[s.part]++
			found := checked(t, r.Circuit, in).Violations()
			if s.code == motorcircuit.ConductorInsulation { // colder insulation also carries less in the heat
				require.Equal(t, s.code, found[len(found)-1].Code)
				continue
			}
			require.Len(t, found, 1, "%s: %+v", s.part, r.Circuit)
			require.Equal(t, s.code, found[0].Code)
			require.Equal(t, s.part, found[0].Part)
			require.NotEmpty(t, found[0].Cites, s.part)
			if s.code != motorcircuit.OverloadAbsent {
				require.Negative(t, found[0].Margin.Value().Sign(), s.part)
			}
		}
	})
	for _, s := range steps {
		assert.Positive(t, taken[s.part], s.part)
	}
}

// Conductors a size smaller carry too little, drop too much or may not be as small;
// nothing else is found.
func TestCheckFindsSmallerConductors(t *testing.T) {
	count := 6_000
	if testing.Short() {
		count = 500
	}
	runs := map[string]func(*motorcircuit.Installed) *motorcircuit.Conductors{
		"branch":                 func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.Branch },
		"motor_supply":           func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.MotorSupply },
		"secondary":              func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.Secondary },
		"resistor":               func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.Resistor },
		"windings[0].conductors": func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.Windings[0].Conductors },
	}
	taken := map[string]int{}
	randomDesigns(t, 9, count, func(_ *rand.Rand, r motorcircuit.Result) {
		if r.Circuit.Wiring.Least != 0 { // larger than need be
			return
		}
		for part, run := range runs {
			in := r.AsInstalled()
			if len(in.Windings) == 0 && strings.HasPrefix(part, "windings") || run(&in).Size.Smaller() == 0 {
				continue
			}
			taken[part]++
			run(&in).Size = run(&in).Size.Smaller()
			found := checked(t, r.Circuit, in).Violations()
			require.NotEmpty(t, found, "%s: %+v", part, r.Circuit)
			for _, f := range found {
				switch f.Code {
				case motorcircuit.ConductorAmpacity, motorcircuit.ConductorLeast, motorcircuit.ConductorParallel:
					require.Equal(t, part, f.Part)
				default:
					require.Equal(t, motorcircuit.DropRunning, f.Code, "%s", f.Text)
					require.Equal(t, "branch", part)
				}
			}
		}
	})
	for part := range runs {
		assert.Positive(t, taken[part], part)
	}
}
