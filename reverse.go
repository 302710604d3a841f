package motorcircuit

import (
	"errors"
	"fmt"
	"strings"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A Headroom is what else an installed circuit would do, each thing alone, all else
// as it is.
type Headroom struct {
	Tag        string       `json:"tag,omitzero"`    // of the circuit
	Power      tables.Power `json:"power,omitzero"`  // of the largest motor
	Motor      Edge         `json:"largest_motor"`   // the largest standard motor of its kind that the circuit may feed
	Run        Edge         `json:"longest_run"`     // in metres: within the circuit's limit of voltage drop or, without one, the code's figure
	Ambient    Edge         `json:"highest_ambient"` // in °C
	Conductors Edge         `json:"more_conductors"` // of other circuits, current-carrying and like the circuit's own, that may join it in the raceway
}

// An Edge is the last value that [Check] accepts, and what it finds one step
// further.
type Edge struct {
	Value tables.Figure `json:"value,omitzero"` // absent if none is accepted
	Binds Finding       `json:"binds,omitzero"` // the first violation one step further; with no value that of the first step
	Why   string        `json:"why,omitzero"`   // in place of Binds: what else bounds the value, or why there is none
}

// steps of a search, and the ends of it.
const (
	longestRun   = 100_000 // tenths of a metre
	coldestAir   = -60     // °C
	hottestAir   = 150
	mostTogether = 1000
)

var lastAccepted = tables.Rule{Outside: true, Ref: "the last step that the check accepts"}

// Reverse finds the edges of an installed circuit: the largest standard motor, the
// longest run, the highest ambient and the most conductors that may join it, each
// by asking [Check]. The conductors of the branch circuit must be given. A motor of
// another size is taken without what the nameplate says of this one's currents.
// Errors are as of Check.
func Reverse(c Circuit, in Installed) (Headroom, error) {
	_, err := Check(c, in)
	if in.Branch.Size == 0 {
		err = errors.Join(err, &tables.InputError{Field: "installed.branch.size", Want: "the size of the conductors that are there"})
	}
	if err != nil {
		return Headroom{}, err
	}
	h := Headroom{Tag: c.Tag}
	h.Power, h.Motor = largestMotor(c, in)
	h.Run = longest(c, in)
	h.Ambient = search("highest ambient", c.Edition, tables.Celsius, 0, coldestAir, hottestAir, func(step int) (Report, error) {
		c := c
		c.Wiring.Ambient = motor.Celsius(itoa(step))
		return Check(c, in)
	})
	h.Conductors = joining(c, in)
	return h, nil
}

// longest finds the longest run.
func longest(c Circuit, in Installed) Edge {
	if c.MaxDrop.IsZero() {
		limit := dropLimit(c.Edition)
		if c.Motor.Use == motor.FirePump {
			limit = pumpRunning(c.Edition)
		}
		c.MaxDrop = motor.Factor(limit.Text())
	}
	return search("longest run", c.Edition, tables.Metre, 1, 1, longestRun, func(step int) (Report, error) {
		in := in
		in.Length = conductor.Metres(fmt.Sprintf("%d.%d", step/10, step%10))
		return Check(c, in)
	})
}

// joining finds how many conductors may join the circuit's own.
func joining(c Circuit, in Installed) Edge {
	if c.Wiring.Run != tables.InRaceway {
		return Edge{Why: "the circuit is not in a raceway"}
	}
	own := max(c.Wiring.Conductors, c.Motor.LineConductors())
	others := in.Raceway.Others
	return search("conductors that may join", c.Edition, tables.Plain, 0, 0, mostTogether-own, func(step int) (Report, error) {
		c, in := c, in
		c.Wiring.Conductors = own + step
		if step > 0 && in.Raceway.Trade != "" {
			in.Raceway.Others = append(others[:len(others):len(others)], conductor.Pull{Insulation: in.Branch.Insulation, Size: in.Branch.Size, Count: step})
		}
		return Check(c, in)
	})
}

// largestMotor finds the largest motor of the table that the circuit may feed.
func largestMotor(c Circuit, in Installed) (tables.Power, Edge) {
	m := &c.Motor
	n := &m.Nameplate
	switch {
	case m.Kind == motor.Hermetic || m.Kind == motor.Torque:
		return tables.Power{}, Edge{Why: "a " + m.Kind.Name() + " goes by its nameplate, not by a table of powers"}
	case m.Starting == motor.Drive || m.Rectifier != motor.NoRectifier:
		return tables.Power{}, Edge{Why: "the input current of another drive or rectifier is not known"}
	case len(n.Windings) > 0:
		return tables.Power{}, Edge{Why: "the currents of another motor of several speeds are not known"}
	}
	n.Amperes, n.LockedRotor, n.Secondary, n.MaximumDevice = tables.Current{}, tables.Current{}, tables.Current{}, tables.Current{}
	m.Resistor = 0
	powers, err := c.Edition.MotorPowers(m.Table(), m.Voltage)
	if err != nil {
		return tables.Power{}, Edge{Why: err.Error()}
	}
	return largest(powers, func(p tables.Power) (Report, error) {
		c := c
		c.Motor.Power = p
		return Check(c, in)
	})
}

// largest finds the largest power that is accepted. A smaller one may not be, where
// a device is too large for it.
func largest(powers []tables.Power, try func(tables.Power) (Report, error)) (tables.Power, Edge) {
	above := Edge{Why: "the table ends there"}
	for i := len(powers) - 1; i >= 0; i-- {
		report, err := try(powers[i])
		binds, why := refusal(report, err)
		if binds.Code == 0 && why == "" {
			above.Value = powers[i].Figure("largest motor")
			return powers[i], above
		}
		above = Edge{Binds: binds, Why: why}
	}
	return tables.Power{}, above
}

// search finds the last step that is accepted, of steps of which none is once one
// is not.
func search(name string, e tables.Edition, unit tables.Unit, places, first, last int, try func(int) (Report, error)) Edge {
	refused := func(step int) (x Edge, no bool) {
		x.Binds, x.Why = refusal(try(step))
		return x, x.Binds.Code != 0 || x.Why != ""
	}
	accepted := func(step int, x Edge) Edge {
		x.Value = tables.StepFigure(name, e, &lastAccepted, unit, int64(step), places)
		return x
	}
	if x, no := refused(first); no {
		return x
	}
	x, no := refused(last)
	if !no {
		return accepted(last, Edge{Why: "nothing binds as far as it is tried"})
	}
	for first+1 < last {
		at := first + (last-first)/2
		if y, no := refused(at); no {
			last, x = at, y
		} else {
			first = at
		}
	}
	return accepted(first, x)
}

// refusal returns the first violation of a report, or the error in its place.
func refusal(r Report, err error) (Finding, string) {
	if err != nil {
		return Finding{}, strings.Join(strings.Fields(err.Error()), " ")
	}
	for _, f := range r.Findings {
		if f.Severity == Violation {
			return f, ""
		}
	}
	return Finding{}, ""
}

// String tells what else the circuit would do, and what binds.
func (h Headroom) String() string { return h.Text(0) }

// Text is [Headroom.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (h Headroom) Text(width int) string { return h.document().Text(width) }

// Markdown returns the headroom in Markdown.
func (h Headroom) Markdown() string { return h.document().Markdown() }

func (h *Headroom) document() *layout.Doc {
	return headroomDocument(h.Tag, h.Motor.row("largest motor", h.Power), h.Run.row("longest run", tables.Power{}),
		h.Ambient.row("highest ambient", tables.Power{}), h.Conductors.row("conductors that may join", tables.Power{}))
}

func headroomDocument(tag string, rows ...layout.Row) *layout.Doc {
	return &layout.Doc{Title: oneLine(tag) + ": headroom, each thing alone", Columns: [4]string{"Edge", "What", "One step further", "Rule"},
		Sections: []layout.Section{{Heading: "What else it would carry", Rows: rows}, cautionSection([]tables.Caution{standing})}}
}

// row sets an edge. A power is written as the trade does.
func (x *Edge) row(name string, p tables.Power) layout.Row {
	row := layout.Row{Value: x.Value.String(), Name: name, How: x.Why}
	switch {
	case !p.IsZero():
		row.Value = p.String()
	case x.Value.IsZero():
		row.Value = "-"
	}
	if x.Binds.Code != 0 {
		row.How, row.Rule = "one step further, "+x.Binds.Part+": "+x.Binds.Text, refsOf(x.Binds.Cites)
	}
	return row
}
