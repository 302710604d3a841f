package motorcircuit_test

import (
	"encoding/json"
	"errors"
	"regexp"
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

// conveyor is a circuit with every step in it.
func conveyor() motorcircuit.Circuit {
	return motorcircuit.Circuit{
		Tag:     "CV-204",
		Edition: tables.NEC2023,
		Motor: motor.Motor{
			Kind: motor.SquirrelCage, Phases: 3, Power: motor.HP("7-1/2"), Voltage: 460,
			Nameplate: motor.Nameplate{Amperes: motor.Amps("10.4"), ServiceFactor: motor.Factor("1.15"), CodeLetter: "H"},
		},
		Device: protection.InverseTimeBreaker,
		Wiring: conductor.Wiring{Insulation: "THWN-2", Ambient: motor.Celsius("40"), Conductors: 6},
	}
}

func TestSizeReportsAllFaultsTogether(t *testing.T) {
	c := conveyor()
	c.Motor.Nameplate.ServiceFactor = motor.Factor("3")
	c.Motor.Phases = 1
	c.Wiring.Ambient = motor.Celsius("200")
	c.Wiring.Insulation = "RW90"
	c.Device = 9
	r, err := motorcircuit.Size(c)
	require.Error(t, err)
	assert.Equal(t, motorcircuit.Result{}, r)
	for _, field := range []string{"motor.phases", "motor.nameplate.service_factor", "wiring.ambient", "wiring.insulation", "device"} {
		assert.Contains(t, err.Error(), field)
	}
	var input *tables.InputError
	require.ErrorAs(t, err, &input)
}

func TestSizeRefusals(t *testing.T) {
	for _, tt := range []struct {
		name   string
		change func(*motorcircuit.Circuit)
		field  string
		as     any
	}{
		{"no edition", func(c *motorcircuit.Circuit) { c.Edition = 0 }, "edition", new(*tables.InputError)},
		{"no kind", func(c *motorcircuit.Circuit) { c.Motor.Kind = 0 }, "motor.kind", new(*tables.InputError)},
		{"no power", func(c *motorcircuit.Circuit) {
			c.Motor.Power, c.Motor.Nameplate.Amperes = tables.Power{}, tables.Current{}
		}, "motor.power", new(*tables.InputError)},
		{"no voltage", func(c *motorcircuit.Circuit) { c.Motor.Voltage = 0 }, "motor.voltage", new(*tables.InputError)},
		{"over 1000 V", func(c *motorcircuit.Circuit) { c.Motor.Voltage = 2300 }, "motor.voltage", new(*tables.InputError)},
		{"power between rows", func(c *motorcircuit.Circuit) { c.Motor.Power = motor.HP("35") }, "motor.power", new(*tables.NotTabulatedError)},
		{"voltage between columns", func(c *motorcircuit.Circuit) { c.Motor.Voltage = 415 }, "motor.voltage", new(*tables.NotTabulatedError)},
		{"hot for the insulation", func(c *motorcircuit.Circuit) { c.Wiring.Ambient = motor.Celsius("86") }, "wiring.ambient", new(*tables.NotTabulatedError)},
		{"single-phase synchronous", func(c *motorcircuit.Circuit) { c.Motor.Kind, c.Motor.Phases = motor.Synchronous, 1 }, "motor.phases", new(*tables.InputError)},
		{"dc with phases", func(c *motorcircuit.Circuit) { c.Motor.Kind = motor.DirectCurrent }, "motor.phases", new(*tables.InputError)},
		{"too much for one set", func(c *motorcircuit.Circuit) {
			c.Motor.Power, c.Wiring.Sets, c.Wiring.Conductors = motor.HP("500"), 1, 40
		}, "wiring", new(*tables.NoSizeError)},
	} {
		t.Run(tt.name, func(t *testing.T) {
			c := conveyor()
			tt.change(&c)
			_, err := motorcircuit.Size(c)
			require.Error(t, err)
			assert.True(t, errors.As(err, tt.as), "%T %v", err, err)
			assert.Contains(t, err.Error(), tt.field)
		})
	}
}

// TestEveryFigureIsCited walks every result of the published examples: a figure
// is the caller's input or names a rule, and so are all that it was made from.
func TestEveryFigureIsCited(t *testing.T) {
	for _, x := range readExamples(t) {
		if x.in.isFeeder() {
			continue
		}
		for _, e := range tables.Editions() {
			if e.Code().String() != x.code {
				continue
			}
			bare := x.in.circuit(t, e)
			run := bare // with everything that a length and a raceway bring
			run.Wiring.Length, run.MaxDrop = conductor.Feet("140"), motor.Factor("2.5")
			run.Fault, run.FaultXR = motor.Amps("10000"), motor.Factor("4")
			if run.Wiring.Run == tables.InRaceway {
				run.Wiring.Raceway = tables.RMC
			}
			var counts [2]int
			for i, c := range []motorcircuit.Circuit{bare, run} {
				r, err := motorcircuit.Size(c)
				require.NoError(t, err, x.id)
				for section, f := range r.Figures() {
					counts[i]++
					requireCited(t, e, section, f)
				}
			}
			assert.Greater(t, counts[0], 15)
			assert.GreaterOrEqual(t, counts[1], counts[0]+6, "%s: limit, drop, longest run and fault duty", x.id)
		}
	}
}

// outside are sources that belong to no edition of a code.
var outside = regexp.MustCompile("^(IEEE|ICEA|NFPA 70 Chapter 9|typical motor data|conversion of units|wye start|sum of the currents)")

func requireCited(t *testing.T, e tables.Edition, s motorcircuit.Section, f tables.Figure) {
	t.Helper()
	require.NotEmpty(t, f.How(), "%v %s", s, f.Name())
	if f.Op() != tables.Given {
		require.NotEmpty(t, f.Citation().Ref, "%v %s", s, f.Name())
		if outside.MatchString(f.Citation().Ref) {
			require.Contains(t, []tables.Edition{0, e}, f.Citation().Edition, "%v %s", s, f.Name())
		} else {
			require.Equal(t, e, f.Citation().Edition, "%v %s", s, f.Name())
		}
	}
	for _, g := range f.Operands() {
		requireCited(t, e, s, g)
	}
}

func TestCautionsTellDefaultsAndConfidence(t *testing.T) {
	c := motorcircuit.Circuit{Edition: tables.CEC2024, Motor: motor.Motor{Kind: motor.DirectCurrent, Power: motor.HP("10"), Voltage: 240}}
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	all := ""
	for _, caution := range r.Cautions {
		all += caution.String() + "\n"
	}
	for _, want := range []string{"time-delay fuse is taken", "30 °C is taken", "RW75 taken", "nameplate", "CSA C22.1:24 Table D2", "from memory", "edition was read in part", "authority having jurisdiction"} {
		assert.Contains(t, all, want)
	}
	assert.True(t, strings.HasSuffix(strings.TrimSpace(all), "decide"), "the standing caution stands last")
}

func TestDefaultDeviceIsTimeDelayFuse(t *testing.T) {
	c := conveyor()
	c.Device = 0
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	assert.Equal(t, protection.TimeDelayFuse, r.ShortCircuit.Device)
}

// TestCircuitJSON holds that a circuit survives its JSON form.
func TestCircuitJSON(t *testing.T) {
	c := conveyor()
	b, err := json.Marshal(c)
	require.NoError(t, err)
	var back motorcircuit.Circuit
	require.NoError(t, json.Unmarshal(b, &back))
	assert.Equal(t, c, back)
}

// TestConcurrentUse is for the race detector: any goroutine may ask.
func TestConcurrentUse(t *testing.T) {
	done := make(chan string)
	for range 8 {
		go func() {
			r, err := motorcircuit.Size(conveyor())
			if err != nil {
				done <- err.Error()
				return
			}
			done <- r.String()
		}()
	}
	first := <-done
	for range 7 {
		assert.Equal(t, first, <-done)
	}
	assert.Contains(t, first, "CV-204")
}

// The ends of what may be given are sized: 1000 V, by the nameplate of a torque motor.
func TestSizeAtTheEnds(t *testing.T) {
	for _, e := range tables.Editions() {
		r, err := motorcircuit.Size(motorcircuit.Circuit{Edition: e, Motor: motor.Motor{Kind: motor.Torque, Voltage: motorcircuit.MaxVolts, Nameplate: motor.Nameplate{Amperes: motor.Amps("12")}}})
		require.NoError(t, err)
		assert.Equal(t, "15 A", r.Demand.Branch.String(), "12 × 125 %")
	}
}

// Conductors that share the raceway count for every run of a circuit: 9 are taken at 70
// percent by Table 310.15(C)(1) of NFPA 70 and Table 5C of CSA C22.1.
func TestSizeCountsForEveryRun(t *testing.T) {
	for _, e := range tables.Editions() {
		c := motorcircuit.Circuit{Edition: e, Motor: motor.Motor{Kind: motor.WoundRotor, Power: motor.HP("30"), Voltage: 460, Resistor: tables.LightStarting,
			Nameplate: motor.Nameplate{Secondary: motor.Amps("65")}}, Wiring: conductor.Wiring{Conductors: 9, Termination: 75}}
		r, err := motorcircuit.Size(c)
		require.NoError(t, err)
		runs := []conductor.Selection{r.Branch, r.Secondary, r.Resistor}
		if e.Code() == tables.CEC {
			runs = append(runs, r.MotorSupply)
		}
		for _, s := range runs {
			assert.Contains(t, []string{"70 %", "0.7"}, s.Together.String(), e)
		}
	}
}
