package conductor

import (
	"errors"
	"strconv"

	"example.org/motorcircuit/tables"
)

// The materials of a conductor.
const (
	Copper   = tables.Copper
	Aluminum = tables.Aluminum
)

// A Wiring says how a circuit is run. The zero Wiring is copper in a raceway of
// its own, in a dry place at the ampacity table's own ambient, with the
// edition's default insulation and with terminations that are not marked.
type Wiring struct {
	Material    tables.Material    `json:"material,omitzero"`    // zero is copper
	Insulation  string             `json:"insulation,omitzero"`  // the edition's designation; "" takes THWN (NEC) or RW75 (CEC) and says so
	Location    tables.Location    `json:"location,omitzero"`    // zero is dry
	Run         tables.Run         `json:"run,omitzero"`         // zero is in raceway
	Ambient     tables.Temperature `json:"ambient,omitzero"`     // of the air around the run; not given is the table's 30 °C
	Rooftop     bool               `json:"rooftop,omitzero"`     // in direct sun, less than 23 mm (7/8 in) above a roof (NEC)
	Conductors  int                `json:"conductors,omitzero"`  // current-carrying conductors in the raceway or cable, or bundled in free air; zero is the circuit's own, and in free air conductors kept apart
	Termination int                `json:"termination,omitzero"` // marked temperature of the terminals: 60, 75 or 90 °C; zero is not marked
	Length      tables.Length      `json:"length,omitzero"`      // one way; not given leaves voltage drop out
	Raceway     tables.Raceway     `json:"raceway,omitzero"`     // type of raceway; not given leaves its size out, and impedance counts as in steel
	Flexible    tables.Raceway     `json:"flexible,omitzero"`    // type of the flexible connection at the motor; not given is none
	DropMethod  DropMethod         `json:"drop_method,omitzero"` // how voltage drop running is reckoned; zero is by impedance
	Least       tables.Size        `json:"least_size,omitzero"`  // smallest size to use; zero is the code's
	Sets        int                `json:"sets,omitzero"`        // conductors in parallel for each phase, each set in its own raceway; zero is as few as will do
	Reading     Reading            `json:"reading,omitzero"`     // how the CEC's termination rule and its corrections combine
}

// A Reading is one of the two readings of how CEC Rule 4-006 combines with
// the corrections of Rule 4-004. The NEC says it outright and ignores this.
type Reading uint8

// The readings.
const (
	CorrectTermination Reading = iota // corrections apply to the column of the termination: the stricter
	CorrectInsulation                 // corrections apply to the column of the insulation, and the termination column holds uncorrected
	readingCount
)

var readingTexts = [...]string{"correct_termination", "correct_insulation"}

// String returns the stable text form.
func (r Reading) String() string { return tables.TextOf(r, readingTexts[:]) }

// MarshalText is [Reading.String].
func (r Reading) MarshalText() ([]byte, error) { return []byte(r.String()), nil }

// UnmarshalText reads the text form; no text is CorrectTermination.
func (r *Reading) UnmarshalText(text []byte) error {
	return tables.ReadText(r, "wiring.reading", text, readingTexts[:])
}

// Feet returns a length in feet, such as Feet("140"). It panics on a typing slip;
// to read input use [tables.ParseLength].
func Feet(s string) tables.Length { return tables.Must(tables.ParseLength(s + " ft")) }

// Metres returns a length in metres, such as Metres("42.7"). It panics on a
// typing slip; to read input use [tables.ParseLength].
func Metres(s string) tables.Length { return tables.Must(tables.ParseLength(s + " m")) }

// MaxSets is the most conductors in parallel that [Wiring.Select] tries.
const MaxSets = 12

var (
	coldest = tables.Must(tables.ParseTemperature("-60"))
	longest = tables.Must(tables.ParseLength("10000 m"))
	hottest = tables.Must(tables.ParseTemperature("150"))
)

// Validate reports every field that cannot stand under an edition, joined: each
// error is a [*tables.InputError] or, for an ambient that the insulation does
// not allow, a [*tables.NotTabulatedError].
func (w Wiring) Validate(e tables.Edition) error {
	if err := e.Check(); err != nil {
		return err
	}
	var faults []error
	add := func(field, value, want string) {
		faults = append(faults, &tables.InputError{Field: "wiring." + field, Value: value, Want: want})
	}
	if _, err := e.Ampacities(w.Run, w.Material); err != nil {
		faults = append(faults, err)
	}
	if w.Location > tables.Wet {
		add("location", strconv.Itoa(int(w.Location)), "dry, damp or wet")
	} else if ins, err := w.insulation(e); err != nil {
		faults = append(faults, err)
	} else if _, err := e.AmbientFactor(ins.celsius, w.ambient(ins)); err != nil && w.Ambient.Cmp(hottest) <= 0 {
		faults = append(faults, err)
	}
	if a := w.Ambient; !a.IsZero() && (a.Cmp(coldest) < 0 || a.Cmp(hottest) > 0) {
		add("ambient", a.String(), "-60 to 150 °C")
	}
	if w.Rooftop && e.Code() != tables.NEC {
		add("rooftop", "true", "false under "+e.Standard()+", which has no such adder: give the ambient itself")
	}
	if w.Conductors < 0 || w.Conductors > 1000 {
		add("conductors", strconv.Itoa(w.Conductors), "1 to 1000, or 0 for the circuit's own")
	}
	switch w.Termination {
	case 0, 60, 75, 90:
	default:
		add("termination", strconv.Itoa(w.Termination), "60, 75 or 90 °C, or 0 for terminals that are not marked")
	}
	if w.Raceway != 0 {
		if _, err := e.RacewaySizes(w.Raceway); err != nil {
			faults = append(faults, err)
		}
		if w.Run != tables.InRaceway {
			add("raceway", w.Raceway.String(), "none for a run that is not in raceway")
		}
	}
	if w.Flexible != 0 {
		if _, err := e.RacewaySizes(w.Flexible); err != nil {
			faults = append(faults, err)
		} else if !w.Flexible.IsFlexible() {
			add("flexible", w.Flexible.String(), "a flexible raceway")
		}
	}
	switch {
	case w.DropMethod >= dropMethodCount:
		add("drop_method", strconv.Itoa(int(w.DropMethod)), "impedance or table_d3")
	case w.DropMethod == ByTableD3 && e != tables.CEC2024:
		add("drop_method", w.DropMethod.String(), "impedance under "+e.Standard()+": Table D3 has this form from CSA C22.1:24 on")
	}
	if l := w.Length; !l.IsZero() && (l.Metres().Sign() <= 0 || l.Cmp(longest) > 0) {
		add("length", l.String(), "above 0, at most 10000 m")
	}
	if w.Least.IsMetric() {
		add("least_size", w.Least.String(), "an AWG or kcmil size")
	}
	if w.Sets < 0 || w.Sets > MaxSets {
		add("sets", strconv.Itoa(w.Sets), "1 to "+strconv.Itoa(MaxSets)+", or 0 for as few as will do")
	}
	if w.Reading >= readingCount {
		add("reading", strconv.Itoa(int(w.Reading)), "correct_termination or correct_insulation")
	}
	return errors.Join(faults...)
}

// An insulation is a type of insulation with its rating where it is run.
type insulation struct {
	tables.Insulation
	celsius int
}

// insulation looks up the wiring's insulation, or the edition's default, and
// checks that it may be used in the location and the run.
func (w Wiring) insulation(e tables.Edition) (insulation, error) {
	name := w.Insulation
	if name == "" {
		name = rulesOf(e).defaultInsulation
	}
	ins, err := e.Insulation(name)
	if err != nil {
		return insulation{}, err
	}
	celsius := ins.Celsius[w.Location]
	if celsius == 0 {
		return insulation{}, &tables.InputError{Field: "wiring.insulation", Value: ins.Type, Want: "a type that may be used in a " + w.Location.String() + " place", Cite: ins.Citation}
	}
	if ins.NoRaceway && w.Run == tables.InRaceway {
		return insulation{}, &tables.InputError{Field: "wiring.insulation", Value: ins.Type, Want: `a type that may be pulled into a raceway, or a run in "cable" or "free_air"`, Cite: ins.Citation}
	}
	return insulation{ins, celsius}, nil
}
