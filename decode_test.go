package motorcircuit_test

import (
	"encoding/json"
	"errors"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// written marshals a value, reads it back and holds that it is the same.
func written[T any](t *testing.T, v T) {
	t.Helper()
	text, err := json.Marshal(v)
	require.NoError(t, err)
	var back T
	require.NoError(t, json.Unmarshal(text, &back), "%s", text)
	require.Equal(t, v, back)
}

// What is written is read back as it was.
func TestJSONRoundTrip(t *testing.T) {
	count := 2_000
	if testing.Short() {
		count = 200
	}
	randomDesigns(t, 21, count, func(_ *rand.Rand, r motorcircuit.Result) {
		written(t, r.Circuit)
		written(t, r.AsInstalled())
	})
	rng := rand.New(rand.NewPCG(22, 1))
	for range 50 {
		f := randomFeeder(rng, everyone[rng.IntN(len(everyone))], 1+rng.IntN(5))
		written(t, f)
		written(t, sized(t, f).AsInstalled())
	}
	// Limits of more places than can be read back are written to the side that stands.
	c := pump("50", 460, protection.InverseTimeBreaker, plate("50.123457", "1"))
	c.Edition = tables.NEC2023
	c.Motor.Starting, c.Motor.Nameplate.DriveInput = motor.Drive, motor.Amps("61.234567")
	r, err := motorcircuit.Size(c)
	require.NoError(t, err)
	written(t, r.AsInstalled())
	require.Empty(t, checked(t, c, r.AsInstalled()).Violations())
	written(t, motorcircuit.Group{Tag: "g", Edition: tables.CEC2024, Circuits: []motorcircuit.Circuit{{Tag: "a"}}, Listed: true, MarkedMost: motor.Amps("15")})
	written(t, motorcircuit.Installed{Raceway: motorcircuit.InstalledRaceway{Type: conductor.EMT, Trade: "3/4", Others: []conductor.Pull{{Size: tables.Must(tables.ParseSize("12")), Count: 3, Bare: true}}},
		Overload: motorcircuit.InstalledOverload{Share: true}, Windings: []motorcircuit.InstalledWinding{{}, {}}, HardStart: true})
}

// Sketch of a circuit as an integrator writes it.
const circuitJSON = `{
	"tag": "CV-204", "edition": "NEC-2023", "device": "inverse-time breaker",
	"motor": {"kind": "squirrel cage", "power": "7-1/2 hp", "voltage": 460, "nameplate": {"amperes": 10.4, "service_factor": "1.15", "design_letter": "B"}},
	"wiring": {"insulation": "THWN-2", "ambient": "35 °C", "termination": 75, "length": "140 ft", "raceway": "EMT", "least_size": 12}
}`

func TestJSONCircuit(t *testing.T) {
	var c motorcircuit.Circuit
	require.NoError(t, json.Unmarshal([]byte(circuitJSON), &c))
	assert.Equal(t, motorcircuit.Circuit{Tag: "CV-204", Edition: tables.NEC2023, Device: protection.InverseTimeBreaker,
		Motor:  motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("7-1/2"), Voltage: 460, Nameplate: motor.Nameplate{Amperes: motor.Amps("10.4"), ServiceFactor: motor.Factor("1.15"), DesignLetter: "B"}},
		Wiring: conductor.Wiring{Insulation: "THWN-2", Ambient: motor.Celsius("35"), Termination: 75, Length: conductor.Feet("140"), Raceway: conductor.EMT, Least: tables.Must(tables.ParseSize("12"))}}, c)
	_, err := motorcircuit.Size(c)
	require.NoError(t, err)
}

// Every fault is told with its path, and nothing is read.
func TestJSONFaults(t *testing.T) {
	f := motorcircuit.Feeder{Tag: "as it was"}
	err := json.Unmarshal([]byte(`{"edition": "NEC-1899", "colour": "red", "circuits": [
		{"circuit": {"motor": {"kind": "squirrel_cage", "power": "51", "nameplate": {"windings": [{"amperes": "x"}]}}}, "lines": 3},
		{"circuit": {"wiring": {"length": 40, "sets": 1.5, "conductors": "three"}, "wiring": {}}}
	], "demand_factor": 0.8}`), &f)
	assert.Equal(t, motorcircuit.Feeder{}, f)
	var texts []string
	for _, fault := range tables.Faults(err) {
		var input *tables.InputError
		require.ErrorAs(t, fault, &input)
		texts = append(texts, input.Field)
	}
	assert.Equal(t, []string{"edition", "colour", "circuits[0].circuit.motor.power", "circuits[0].circuit.motor.nameplate.windings[0].amperes", "circuits[0].lines",
		"circuits[1].circuit.wiring.length", "circuits[1].circuit.wiring.sets", "circuits[1].circuit.wiring.conductors", "circuits[1].circuit.wiring"}, texts)
	assert.ErrorContains(t, err, `circuits[1].circuit.wiring.length "40": want metres or feet, such as "42.7 m" or "140 ft"`)
	assert.ErrorContains(t, err, `edition "NEC-1899": want one of NEC-2017, NEC-2020, NEC-2023, CEC-2021, CEC-2024`)

	var in motorcircuit.Installed
	err = json.Unmarshal([]byte(`{"device": {"rating": 5}, "raceway": {"others": [{"size": "5"}]}}`), &in)
	assert.ErrorContains(t, err, `device.rating "rating": want one of kind, `)
	assert.ErrorContains(t, err, `raceway.others[0].size "5": want a size`)

	var syntax *json.SyntaxError
	assert.True(t, errors.As(json.Unmarshal([]byte(`{"tag": "a"`), &f), &syntax))
}

// readJSON holds what must be of any text that is offered as JSON.
func readJSON[T any](t *testing.T, text []byte, into T) (ok bool) {
	t.Helper()
	err := json.Unmarshal(text, &into)
	var syntax *json.SyntaxError
	if errors.As(err, &syntax) {
		return false
	}
	if err != nil {
		requireNamed(t, err)
		return false
	}
	again, err := json.Marshal(into)
	require.NoError(t, err)
	var back T
	require.NoError(t, json.Unmarshal(again, &back), "%s", again)
	third, err := json.Marshal(back)
	require.NoError(t, err)
	require.Equal(t, string(again), string(third))
	return true
}

// FuzzCircuitJSON reads arbitrary text as a circuit and, with another, checks it.
func FuzzCircuitJSON(f *testing.F) {
	f.Add([]byte(circuitJSON), []byte(`{"branch": {"size": "6"}, "device": {"rating_amperes": 30}, "raceway": {"trade_size": "1/2"}}`))
	f.Add([]byte(`{"edition":"CEC-2021","motor":{"kind":"dc","power":"10 hp","voltage":240},"wiring":{"sets":99}}`), []byte(`{"windings":[{"conductors":{"size":"1/0"}}],"overload":{"units":-1}}`))
	f.Add([]byte(`[`), []byte(`{"a":{}}`))
	f.Add([]byte(`{"tag":"\ud800","motor":{"nameplate":{"windings":[{},null]}}}`), []byte(`null`))
	f.Fuzz(func(t *testing.T, circuit, installed []byte) {
		var c motorcircuit.Circuit
		var in motorcircuit.Installed
		if readJSON(t, circuit, c) && readJSON(t, installed, in) {
			require.NoError(t, json.Unmarshal(circuit, &c))
			require.NoError(t, json.Unmarshal(installed, &in))
			report, err := motorcircuit.Check(c, in)
			soundReport(t, report, err)
			again, _ := motorcircuit.Check(c, in)
			require.Equal(t, report, again)
			if h, err := motorcircuit.Reverse(c, in); err == nil {
				require.NotEmpty(t, h.String())
			}
		}
	})
}

// soundReport holds what must be of every report: with an error it is empty; each
// finding has its words and rules, its own code and part, and a margin that goes
// with its severity.
func soundReport(t *testing.T, report motorcircuit.Report, err error) {
	t.Helper()
	if err != nil {
		requireNamed(t, err)
		require.Equal(t, motorcircuit.Report{}, report)
		return
	}
	require.NotEmpty(t, report.Cautions)
	seen := map[string]bool{}
	for _, f := range report.Findings {
		require.True(t, f.Code.String() != "" && f.Part != "" && f.Text != "" && len(f.Cites) > 0, "%+v", f)
		require.False(t, seen[f.Code.String()+f.Part], "%+v", f)
		seen[f.Code.String()+f.Part] = true
		if f.Margin.IsZero() {
			require.NotEqual(t, motorcircuit.Note, f.Severity, "%+v", f)
			continue
		}
		require.Equal(t, f.Margin.Value().Sign() >= 0, f.Severity == motorcircuit.Note, "%+v", f)
		require.Equal(t, f.Required.Unit(), f.Found.Unit(), "%+v", f)
		margin := f.Found.Value().Sub(f.Required.Value())
		if f.Ceiling {
			margin = margin.Neg()
		}
		require.True(t, f.Margin.Value().Equal(margin), "%+v", f)
	}
	for _, n := range report.NotJudged {
		require.True(t, n.Part != "" && n.Why != "")
	}
	_, err = json.Marshal(report)
	require.NoError(t, err)
	require.NotEmpty(t, report.Text(40))
}

// FuzzFeederJSON reads arbitrary text as a feeder, as a group and as what is
// installed of one, and checks it.
func FuzzFeederJSON(f *testing.F) {
	f.Add([]byte(`{"edition":"NEC-2023","circuits":[{"circuit":`+circuitJSON+`}],"other_load_amperes":"5"}`), []byte(`{"conductors":{"size":"4","sets":2},"bonding":{"size":"8","material":"aluminum"},"device":{"rating_amperes":"40"}}`))
	f.Add([]byte(`{"edition":"CEC-2024","circuits":[{},null],"listed":true}`), []byte(`{"length":"5 m","disconnecting_means":{"horsepower":"5 kW"}}`))
	f.Add([]byte(`{"edition":"CEC-2021","demand_factor":0.8,"fault_amperes":5000,"circuits":[{"starts_with":"s","circuit":{"edition":"CEC-2021","motor":{"kind":"squirrel_cage","power":"50 hp","voltage":575}}},{"starts_with":"s","circuit":{"edition":"CEC-2021","motor":{"kind":"squirrel_cage","power":"40 hp","voltage":575}}}]}`), []byte(`{"conductors":{"size":"1/0"},"raceway":{"type":"emt","trade_size":"53"},"device":{"interrupting_amperes":4000}}`))
	f.Fuzz(func(t *testing.T, feeder, installed []byte) {
		readJSON(t, feeder, motorcircuit.Group{})
		var x motorcircuit.Feeder
		var in motorcircuit.InstalledFeeder
		if readJSON(t, feeder, x) && readJSON(t, installed, in) {
			require.NoError(t, json.Unmarshal(feeder, &x))
			require.NoError(t, json.Unmarshal(installed, &in))
			report, err := motorcircuit.CheckFeeder(x, in)
			soundReport(t, report, err)
		}
	})
}
