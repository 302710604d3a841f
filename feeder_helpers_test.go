package motorcircuit_test

import (
	"errors"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

var (
	necEditions = []tables.Edition{tables.NEC2017, tables.NEC2020, tables.NEC2023}
	cecEditions = []tables.Edition{tables.CEC2021, tables.CEC2024}
	to2020      = []tables.Edition{tables.NEC2017, tables.NEC2020}
	from2023    = []tables.Edition{tables.NEC2023}
	everyone    = tables.Editions()
)

// A change alters a circuit of a feeder.
type change = func(*motorcircuit.FeederCircuit)

// drawing is a 460 V motor whose nameplate current serves for every purpose under
// both codes: built for high torque, NEC 430.6(A)(1); by its rating, CEC.
func drawing(tag, amps string, changes ...change) motorcircuit.FeederCircuit {
	fc := motorcircuit.FeederCircuit{Circuit: motorcircuit.Circuit{Tag: tag,
		Motor: motor.Motor{Kind: motor.SquirrelCage, Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps(amps), HighTorque: true}}}}
	return with(fc, changes...)
}

// cage is a squirrel cage motor that goes by the tables.
func cage(tag, hp string, volts int, changes ...change) motorcircuit.FeederCircuit {
	fc := motorcircuit.FeederCircuit{Circuit: motorcircuit.Circuit{Tag: tag,
		Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP(hp), Voltage: volts}}}
	return with(fc, changes...)
}

// single is a single-phase motor that goes by the tables.
func single(tag, hp string, volts int, lines string) motorcircuit.FeederCircuit {
	fc := cage(tag, hp, volts)
	fc.Circuit.Motor.Kind, fc.Lines = motor.SinglePhase, lines
	return fc
}

// compressor is a 460 V three-phase hermetic motor-compressor.
func compressor(tag, rated, selection string) motorcircuit.FeederCircuit {
	fc := drawing(tag, rated)
	fc.Circuit.Motor.Kind, fc.Circuit.Motor.Nameplate.HighTorque = motor.Hermetic, false
	if selection != "" {
		fc.Circuit.Motor.Nameplate.BranchSelection = motor.Amps(selection)
	}
	return fc
}

func with(fc motorcircuit.FeederCircuit, changes ...change) motorcircuit.FeederCircuit {
	for _, c := range changes {
		c(&fc)
	}
	return fc
}

func duty(kind tables.Duty, minutes int) change {
	return func(fc *motorcircuit.FeederCircuit) {
		fc.Circuit.Motor.Duty = motor.Duty{Kind: kind, Minutes: minutes}
	}
}

func behind(d tables.Device) change {
	return func(fc *motorcircuit.FeederCircuit) { fc.Circuit.Device = d }
}

func locked(interlock, alternative string) change {
	return func(fc *motorcircuit.FeederCircuit) { fc.Interlock, fc.Alternative = interlock, alternative }
}

func startsWith(set string) change {
	return func(fc *motorcircuit.FeederCircuit) { fc.StartsWith = set }
}

func hardStart(fc *motorcircuit.FeederCircuit) { fc.HardStart = true }

// onDrive feeds a motor from a drive of the given input, with others if a group
// is named.
func onDrive(input, group string) change {
	return func(fc *motorcircuit.FeederCircuit) {
		fc.Circuit.Motor.Starting, fc.Circuit.Motor.Nameplate.DriveInput = motor.Drive, motor.Amps(input)
		fc.DriveGroup = group
	}
}

func bypassed(fc *motorcircuit.FeederCircuit) { fc.Circuit.Motor.Bypass = true }

// feeder puts circuits on a feeder with terminals marked 75 °C, all under one
// edition. The device is the default, a time-delay fuse.
func feeder(e tables.Edition, circuits ...motorcircuit.FeederCircuit) motorcircuit.Feeder {
	f := motorcircuit.Feeder{Tag: "F-1", Edition: e}
	f.Wiring.Termination = 75
	for _, fc := range circuits {
		fc.Circuit.Edition = e
		f.Circuits = append(f.Circuits, fc)
	}
	return f
}

// sized sizes a feeder, which must not fail, and holds what is so of all.
func sized(t *testing.T, f motorcircuit.Feeder) motorcircuit.FeederResult {
	t.Helper()
	r, err := motorcircuit.SizeFeeder(f)
	require.NoError(t, err)
	requireWhole(t, r)
	return r
}

// requireWhole holds what is so of every feeder: the terms shown add up to the
// ampacity, the conductors carry it, the rating is not rounded up, and every
// figure is cited.
func requireWhole(t *testing.T, r motorcircuit.FeederResult) {
	t.Helper()
	f := r.Feeder
	require.Len(t, r.Circuits, len(f.Circuits))
	if f.Demand.IsZero() {
		sum := motor.Factor("0").Decimal()
		for _, term := range r.Terms {
			sum = sum.Add(term.Figure.Value())
		}
		require.True(t, sum.Equal(r.Ampacity.Value()), "terms %v, ampacity %v", sum, r.Ampacity)
	}
	require.GreaterOrEqual(t, r.Conductors.Ampacity.Cmp(r.Ampacity), 0)
	if f.Edition.Code() == tables.NEC || r.Rating.Text() != "15" { // 15 A is always allowed under the CEC
		require.LessOrEqual(t, r.Rating.Cmp(r.Limit), 0)
	}
	require.LessOrEqual(t, r.StartRating.Cmp(r.StartLimit), 0)
	if r.Conductors.Sets == 1 {
		require.LessOrEqual(t, r.Bonding.Size.Cmp(r.Conductors.Size), 0)
	}
	count := 0
	for figure := range r.Figures() {
		requireCited(t, f.Edition, motorcircuit.BranchConductors, figure)
		count++
	}
	for _, term := range r.Terms {
		requireCited(t, f.Edition, motorcircuit.BranchConductors, term.Figure)
	}
	require.Greater(t, count, 5)
	require.NotEmpty(t, r.Cautions)
}

// terms joins the printed forms of terms, in order.
func terms(r motorcircuit.FeederResult) string {
	var texts []string
	for _, term := range r.Terms {
		texts = append(texts, strings.TrimSpace(term.Tag+" "+term.Figure.Text()))
	}
	return strings.Join(texts, ", ")
}

// circuitFaults returns the fields at fault by index of circuit, from joined errors.
func circuitFaults(err error) map[int][]string {
	found := make(map[int][]string)
	var walk func(error, int)
	walk = func(err error, at int) {
		for _, one := range tables.Faults(err) {
			var circuit *motorcircuit.CircuitError
			if errors.As(one, &circuit) && at < 0 {
				walk(circuit.Err, circuit.Index)
				continue
			}
			field := tables.FieldOf(one)
			if field == "" {
				field = "untyped"
			}
			found[at] = append(found[at], field)
		}
	}
	walk(err, -1)
	return found
}
