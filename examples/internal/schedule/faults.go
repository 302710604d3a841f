package schedule

import (
	"errors"
	"slices"
	"strings"

	"example.org/motorcircuit/tables"
)

// faults are the faults of one row, by column.
type faults[T any] struct {
	of   *layout[T]
	list []fault
}

type fault struct {
	column int // in the layout; -1 for the row as a whole
	text   string
}

// add adds an error of the library in the words of its column; an error that is
// of no column is told of the row.
func (f *faults[T]) add(err error, column int) {
	name := "row"
	if column >= 0 {
		name = f.of.columns[column].name
	}
	text := err.Error()
	var input *tables.InputError
	var missing *tables.NotTabulatedError
	var noSize *tables.NoSizeError
	switch {
	case errors.As(err, &input):
		e := *input
		e.Field, e.Want = name, f.of.words.Replace(e.Want)
		text = e.Error()
	case errors.As(err, &missing):
		e := *missing
		e.Field, e.Instead = name, f.of.words.Replace(e.Instead)
		text = e.Error()
	case errors.As(err, &noSize):
		e := *noSize
		e.Field = name
		text = e.Error()
	default:
		text = name + ": " + text
	}
	f.list = append(f.list, fault{column, text})
}

// say adds a fault of the row as a whole, in words of its own.
func (f *faults[T]) say(text string) { f.list = append(f.list, fault{-1, text}) }

// texts returns the faults in the order of columns, each on one line.
func (f *faults[T]) texts() []string {
	slices.SortStableFunc(f.list, func(a, b fault) int { return a.column - b.column })
	texts := make([]string, len(f.list))
	for i, x := range f.list {
		texts[i] = oneLine(x.text)
	}
	return texts
}

// judge adds what the library has to say of a row. A verdict on a cell that
// could not be read, or that rests on one, is left out: it is told already.
func (f *faults[T]) judge(err error) {
	unread := slices.Clone(f.list)
	for _, e := range tables.Faults(err) {
		column := f.of.of(tables.FieldOf(e))
		e = f.of.said(e, column)
		told := func(x fault) bool { return x.column == column || column >= 0 && f.rests(column, x.column) }
		if !slices.ContainsFunc(unread, told) {
			f.add(e, column)
		}
	}
}

// said words what the library says of the value of a column as the column does.
func (l *layout[T]) said(err error, column int) error {
	var input *tables.InputError
	if column < 0 || l.columns[column].said == nil || !errors.As(err, &input) {
		return err
	}
	e := *input
	e.Value, e.Want = l.columns[column].said(e.Value), l.columns[column].said(e.Want)
	return &e
}

// rests reports whether the verdict on a column rests on another.
func (f *faults[T]) rests(column, on int) bool {
	return on >= 0 && slices.Contains(strings.Fields(f.of.columns[column].needs), f.of.columns[on].name)
}
