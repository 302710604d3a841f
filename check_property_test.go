package motorcircuit_test

import (
	"math/rand/v2"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
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
		byPower := n.Part == "disconnecting_means.amperes" && r.Circuit.Edition.Code() == tables.CEC
		require.True(t, byPower || n.Part == "length" && r.Circuit.Wiring.Length.IsZero(), "%+v", n)
	}
}

// What Size designs, Check accepts: the whole grid.
func TestCheckAcceptsTheGrid(t *testing.T) {
	if testing.Short() {
		t.Skip("the random designs stand for it")
	}
	count := 0
	grid(t, func(_ motorcircuit.Circuit, results []motorcircuit.Result) {
		for _, r := range results {
			count++
			accepts(t, r)
		}
	})
	assert.Greater(t, count, 20_000)
}

// What Size designs, Check accepts: random circuits of every kind of motor.
func TestCheckAcceptsRandomDesigns(t *testing.T) {
	count := 100_000
	if testing.Short() {
		count = 3_000
	}
	randomDesigns(t, 5, count, func(_ *rand.Rand, r motorcircuit.Result) { accepts(t, r) })
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
		"windings[1].conductors": func(in *motorcircuit.Installed) *motorcircuit.Conductors { return &in.Windings[1].Conductors },
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
