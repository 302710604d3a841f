package motor

import "example.org/motorcircuit/tables"

// A Use is a use of a motor that rules of its own hold for. The zero Use is
// ordinary.
type Use uint8

// The uses that the codes treat apart.
const (
	Ordinary      Use = iota
	FirePump          // drives a fire pump (NEC Article 695)
	ValveActuator     // part of a valve actuator motor assembly (NEC 430.6(D))
	useCount
)

var useTexts = [...]string{"ordinary", "fire_pump", "valve_actuator"}

// String returns the stable text form.
func (u Use) String() string { return tables.TextOf(u, useTexts[:]) }

// MarshalText is [Use.String].
func (u Use) MarshalText() ([]byte, error) { return []byte(u.String()), nil }

// UnmarshalText reads the text form; no text is Ordinary.
func (u *Use) UnmarshalText(text []byte) error {
	return tables.ReadText(u, "motor.use", text, useTexts[:])
}

// A Rectifier is a single-phase rectifier that feeds a direct-current motor. The
// zero Rectifier is none.
type Rectifier uint8

// The rectifiers whose form factor NEC 430.22(A) reckons with.
const (
	NoRectifier Rectifier = iota
	HalfWave              // single-phase half-wave: 190 percent
	FullWave              // single-phase full-wave: 150 percent
	rectifierCount
)

var rectifierTexts = [...]string{"none", "half_wave", "full_wave"}

// String returns the stable text form.
func (r Rectifier) String() string { return tables.TextOf(r, rectifierTexts[:]) }

// MarshalText is [Rectifier.String].
func (r Rectifier) MarshalText() ([]byte, error) { return []byte(r.String()), nil }

// UnmarshalText reads the text form; no text is NoRectifier.
func (r *Rectifier) UnmarshalText(text []byte) error {
	return tables.ReadText(r, "motor.rectifier", text, rectifierTexts[:])
}

// A Winding is one winding, or one connection of the winding, of a multispeed
// motor.
type Winding struct {
	Power   tables.Power   `json:"power,omitzero"` // rated output at that speed
	Amperes tables.Current `json:"amperes"`        // nameplate current at that speed
}

// A WindingDemand is what one winding of a multispeed motor asks for: the run
// from the controller to it, and its own overload protection.
type WindingDemand struct {
	Current  tables.Figure `json:"current"`  // nameplate current of the winding
	Ampacity tables.Figure `json:"ampacity"` // least ampacity of the conductors to it
}

// largestWinding returns the index of the winding of most current, -1 for none.
func (n Nameplate) largestWinding() int {
	best := -1
	for i, w := range n.Windings {
		if best < 0 || w.Amperes.Cmp(n.Windings[best].Amperes) > 0 {
			best = i
		}
	}
	return best
}

// amperes returns the nameplate current: of the largest winding, if windings
// are given.
func (n Nameplate) amperes() tables.Current {
	if i := n.largestWinding(); i >= 0 {
		return n.Windings[i].Amperes
	}
	return n.Amperes
}

// windings works out what each winding of a multispeed motor asks for.
func (d *Demand) windings(m Motor, e tables.Edition, rule, duty *tables.Rule) error {
	for _, w := range m.Nameplate.Windings {
		x := WindingDemand{Current: w.Amperes.Figure("nameplate current of the winding")}
		x.Ampacity = percentOf("least ampacity of the conductors to the winding", e, rule, x.Current, 125, 0)
		if m.Duty.Kind != Continuous {
			var err error
			if x.Ampacity, err = m.dutyAmpacity("least ampacity of the conductors to the winding", e, duty, x.Current); err != nil {
				return err
			}
		}
		d.Windings = append(d.Windings, x)
	}
	return nil
}

// secondary works out the conductors of a wound rotor's secondary, and those to
// resistors that stand apart from the controller.
func (d *Demand) secondary(m Motor, e tables.Edition, continuous, duty, resistor *tables.Rule) (err error) {
	current := m.Nameplate.Secondary.Figure("secondary full-load current")
	if current.IsZero() {
		return nil
	}
	if m.Duty.Kind == Continuous {
		d.Secondary = percentOf(secondaryName, e, continuous, current, 125, 0)
	} else if d.Secondary, err = m.dutyAmpacity(secondaryName, e, duty, current); err != nil {
		return err
	}
	return d.resistor(m, e, resistor, current)
}

func (d *Demand) resistor(m Motor, e tables.Edition, rule *tables.Rule, current tables.Figure) error {
	if m.Resistor == 0 {
		return nil
	}
	percent, err := e.ResistorPercent(m.Kind == DirectCurrent, m.Resistor)
	if err != nil {
		return err
	}
	d.Resistor = tables.ProductOf("least ampacity of the conductors to the resistors", e, rule, current, percent)
	return nil
}
