package schedule

import (
	"encoding"
	"errors"
	"regexp"
	"slices"
	"strconv"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A column is a column of an input whose rows become values of type T.
type column[T any] struct {
	name string
	must bool // the header must have it

	// set puts the text of a cell into the value; no text is "not given".
	set func(v *T, text string) error

	field string // the library's name for it, in errors; "" if it has none
	needs string // columns whose faults leave this one undecided

	// said turns what the library says of a value into the words of the column;
	// nil where they are the same.
	said func(text string) string
}

// lift makes columns of a part into columns of the whole.
func lift[T, U any](columns []column[T], part func(*U) *T) []column[U] {
	lifted := make([]column[U], len(columns))
	for i, c := range columns {
		set := c.set
		lifted[i] = column[U]{c.name, c.must, func(v *U, text string) error { return set(part(v), text) }, c.field, c.needs, c.said}
	}
	return lifted
}

// A layout is the columns that the program knows of one kind of input.
type layout[T any] struct {
	file    string // what the input is
	row     string // what a row of it is
	columns []column[T]
	words   *strings.Replacer // the library's names of fields to those of columns
}

func newLayout[T any](file, row string, columns ...[]column[T]) *layout[T] {
	l := &layout[T]{file: file, row: row, columns: slices.Concat(columns...)}
	var pairs []string
	for _, c := range l.columns {
		if strings.Contains(c.field, ".") {
			pairs = append(pairs, c.field, c.name)
		}
	}
	l.words = strings.NewReplacer(pairs...)
	return l
}

// named returns the place of a column, -1 if none has the name.
func (l *layout[T]) named(name string) int {
	return slices.IndexFunc(l.columns, func(c column[T]) bool { return c.name == name })
}

// elsewhere are fields of the library that are told at the column of another.
var elsewhere = map[string]string{
	"wiring":                  "conductor", // that no size suits
	"installed.raceway.type":  "raceway",
	"installed.flexible.type": "flexible",
}

// of returns the column that the library's field stands in, -1 if none does. The
// wiring of an installed run is that of the circuit.
func (l *layout[T]) of(field string) int {
	if field == "" {
		return -1
	}
	if name, ok := elsewhere[field]; ok {
		return l.named(name)
	}
	if _, rest, ok := strings.Cut(field, ".wiring."); ok {
		field = "wiring." + rest
	}
	return slices.IndexFunc(l.columns, func(c column[T]) bool { return c.field == field })
}

// runColumns are the columns that motors and feeders share: the short-circuit
// device and how the conductors are run.
func runColumns[T any](device func(*T) *tables.Device, wiring func(*T) *conductor.Wiring) []column[T] {
	return []column[T]{
		{name: "device", set: read(func(v *T) textReader { return device(v) }), field: "device"},
		{name: "conductor", set: read(func(v *T) textReader { return &wiring(v).Material }), field: "wiring.material", needs: "insulation"},
		{name: "insulation", set: word(func(v *T) *string { return &wiring(v).Insulation }), field: "wiring.insulation"},
		{name: "termination_c", set: whole(func(v *T) *int { return &wiring(v).Termination }), field: "wiring.termination"},
		{name: "ambient_c", set: read(func(v *T) textReader { return &wiring(v).Ambient }), field: "wiring.ambient", needs: "insulation"},
		{name: "conductors_in_raceway", set: whole(func(v *T) *int { return &wiring(v).Conductors }), field: "wiring.conductors", needs: "phases"},
		{name: "raceway", set: raceway(wiring), field: "wiring.raceway"},
		{name: "length_m", set: length(wiring, "m"), field: "wiring.length"},
		{name: "length_ft", set: length(wiring, "ft"), field: "wiring.length"},
	}
}

// raceway sets the type of raceway, or "cable" or "free_air" in its place.
func raceway[T any](wiring func(*T) *conductor.Wiring) func(*T, string) error {
	return func(v *T, text string) error {
		w := wiring(v)
		if err := w.Run.UnmarshalText([]byte(text)); err == nil {
			return nil
		}
		err := w.Raceway.UnmarshalText([]byte(text))
		var input *tables.InputError
		if errors.As(err, &input) {
			input.Want += ", cable, free_air"
		}
		return err
	}
}

// length sets the length of the run, which stands in one column of two.
func length[T any](wiring func(*T) *conductor.Wiring, unit string) func(*T, string) error {
	return func(v *T, text string) error {
		if text == "" {
			return nil
		}
		l := &wiring(v).Length
		if !l.IsZero() {
			return &tables.InputError{Value: clip(text), Want: "length_m or length_ft, not both"}
		}
		p, err := tables.ParseLength(text + " " + unit)
		if err != nil {
			return &tables.InputError{Value: clip(text), Want: "a plain decimal such as 42.7"}
		}
		*l = p
		return nil
	}
}

// kiloamperes sets a current that the column gives in kiloamperes.
func kiloamperes[T any](field func(*T) *tables.Current) func(*T, string) error {
	return func(v *T, text string) error {
		if text == "" {
			return nil
		}
		ka, err := tables.ParseRatio(text)
		if err == nil {
			*field(v), err = tables.ParseCurrent(ka.Decimal().Shift(3).String())
		}
		if err != nil {
			return &tables.InputError{Value: clip(text), Want: "a plain decimal in kiloamperes, below a million"}
		}
		return nil
	}
}

var amperes = regexp.MustCompile(`[0-9]+(\.[0-9]+)? A\b`)

// saidInKiloamperes turns amperes into kiloamperes.
func saidInKiloamperes(text string) string {
	return amperes.ReplaceAllStringFunc(text, func(amps string) string {
		n, _ := decimal.NewFromString(strings.TrimSuffix(amps, " A"))
		return n.Shift(-3).String() + " kA"
	})
}

// yes sets a field that the column answers with yes or no.
func yes[T any](field func(*T) *bool) func(*T, string) error {
	return func(v *T, text string) error {
		switch strings.ToLower(text) {
		case "yes":
			*field(v) = true
		case "no", "":
			*field(v) = false
		default:
			return &tables.InputError{Value: clip(text), Want: "yes or no"}
		}
		return nil
	}
}

// saidYes turns truth values into yes and no.
var saidYes = strings.NewReplacer("true", "yes", "false", "no").Replace

type textReader = encoding.TextUnmarshaler

// read sets a field that reads its own text form.
func read[T any](field func(*T) textReader) func(*T, string) error {
	return func(v *T, text string) error { return field(v).UnmarshalText([]byte(text)) }
}

// word sets a field of text, which the library judges.
func word[T any](field func(*T) *string) func(*T, string) error {
	return func(v *T, text string) error {
		*field(v) = text
		return nil
	}
}

// whole sets a field that is a whole number.
func whole[T any](field func(*T) *int) func(*T, string) error {
	return func(v *T, text string) error {
		*field(v) = 0
		if text == "" {
			return nil
		}
		n, err := strconv.Atoi(text)
		if err != nil || text[0] == '+' {
			return &tables.InputError{Value: clip(text), Want: "a whole number in the digits 0 to 9"}
		}
		*field(v) = n
		return nil
	}
}

func clip(s string) string {
	const most = 40
	if len(s) <= most {
		return s
	}
	return strings.ToValidUTF8(s[:most], "") + "..."
}

// oneLine returns a text on one line.
func oneLine(s string) string { return strings.Join(strings.Fields(s), " ") }
