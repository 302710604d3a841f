package tables

import (
	"errors"
	"fmt"
	"strings"
)

// An InputError reports a value that cannot stand: one field of an input, or
// a text that does not parse.
type InputError struct {
	Field string   // path of the field, such as "motor.nameplate.service_factor"
	Value string   // what was given, shortened in the message if long; "" if nothing was
	Want  string   // what is allowed
	Cite  Citation // the rule that says so, if one does
}

func (e *InputError) Error() string {
	var b strings.Builder
	b.WriteString(e.Field)
	if e.Value != "" {
		fmt.Fprintf(&b, " %q", clip(e.Value))
	} else {
		b.WriteString(" is not given")
	}
	b.WriteString(": want ")
	b.WriteString(e.Want)
	if !e.Cite.IsZero() {
		fmt.Fprintf(&b, " [%v]", e.Cite)
	}
	return b.String()
}

// A NotTabulatedError reports a table that was asked for what it does not
// print. Nothing is interpolated or guessed in its place.
type NotTabulatedError struct {
	Field  string // path of the input field that chose the missing entry
	Table  Citation
	Row    string // "51 hp"
	Col    string // "460 V"
	Covers string // what the table does print

	Instead string // what else would size it, where the code says so; often ""
}

func (e *NotTabulatedError) Error() string {
	at := ""
	if e.Col != "" {
		at = " at " + e.Col
	}
	s := fmt.Sprintf("%s: %v has no %s%s; it covers %s", e.Field, e.Table, e.Row, at, e.Covers)
	if e.Instead != "" {
		s += "; " + e.Instead
	}
	return s
}

// A NoSizeError reports a requirement that no size or rating meets.
type NoSizeError struct {
	Field      string // path of the input field that sets the requirement
	Constraint string // the limit that no size meets
	Need       Figure // the figure required, if there is one
	Cite       Citation
}

func (e *NoSizeError) Error() string {
	s := e.Field + ": "
	if !e.Need.IsZero() {
		s += fmt.Sprintf("%s %v: ", e.Need.Name(), e.Need)
	}
	s += e.Constraint
	if !e.Cite.IsZero() {
		s += fmt.Sprintf(" [%v]", e.Cite)
	}
	return s
}

// Faults takes joined errors apart, those joined within them too, in the order
// in which they were found: all that is wrong with an input, one by one.
func Faults(err error) []error {
	if err == nil {
		return nil
	}
	joined, ok := err.(interface{ Unwrap() []error })
	if !ok {
		return []error{err}
	}
	var all []error
	for _, e := range joined.Unwrap() {
		all = append(all, Faults(e)...)
	}
	return all
}

// FieldOf returns the path of the input field that an error is about, such as
// "motor.nameplate.service_factor"; "" for an error that is of no field.
func FieldOf(err error) string {
	var input *InputError
	var missing *NotTabulatedError
	var none *NoSizeError
	switch {
	case errors.As(err, &input):
		return input.Field
	case errors.As(err, &missing):
		return missing.Field
	case errors.As(err, &none):
		return none.Field
	}
	return ""
}

// clip shortens text that goes into a message.
func clip(s string) string {
	const most = 40
	if len(s) <= most {
		return s
	}
	return strings.ToValidUTF8(s[:most], "") + "..."
}

// A Caution is what a designer should know of a result although it stands: an
// assumption, a default taken, a limit that is near, a reading of a rule.
type Caution struct {
	Text string   `json:"text"`          // in plain words
	Cite Citation `json:"cite,omitzero"` // the rule behind it, if there is one
}

// FromMemory returns the caution of a figure that rests on a mark C.
func FromMemory(cite Citation) Caution {
	return Caution{Text: "carried from memory and not yet held against a readable copy: check it before use", Cite: cite}
}

// String returns the text with its citation.
func (c Caution) String() string {
	if c.Cite.IsZero() {
		return c.Text
	}
	return c.Text + " [" + c.Cite.String() + "]"
}
