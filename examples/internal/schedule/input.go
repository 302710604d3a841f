package schedule

import (
	"bufio"
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"slices"
	"strings"

	"example.org/motorcircuit/tables"
)

// A sheet is a CSV input that is being read.
type sheet[T any] struct {
	of     *layout[T]
	csv    *csv.Reader
	header []string // names as the file writes them
	known  []int    // for each cell the place in the layout, -1 if passed through
	at     []int    // for each column of the layout its cell, -1 if the file has none
}

// An entry is what a row and the answer to it share.
type entry struct {
	line   int      // of the file, from 1; 0 for an answer to no row
	tag    string   // as the row has it
	code   string   // as the row has it
	passed []string // the passed-through cells
}

// A row is one row as it was read.
type row[T any] struct {
	entry
	value  T
	faults faults[T] // of its cells
	broken bool      // not shaped as the header, so that no cell can be trusted
}

// An answer is what becomes of one row.
type answer[R any] struct {
	entry
	faults []string // in the words of the columns, each on one line; none for a good row
	result R
}

// openSheet reads the header.
func openSheet[T any](of *layout[T], r io.Reader) (*sheet[T], error) {
	buffered := bufio.NewReaderSize(r, 64<<10)
	if mark, _ := buffered.Peek(3); bytes.Equal(mark, []byte("\uFEFF")) {
		buffered.Discard(3)
	}
	s := &sheet[T]{of: of, csv: csv.NewReader(buffered), at: make([]int, len(of.columns))}
	s.csv.FieldsPerRecord = -1 // counted row by row
	s.csv.ReuseRecord = true
	record, err := s.csv.Read()
	if err == io.EOF {
		return nil, fmt.Errorf("the %s is empty: the first line must name the columns", of.file)
	} else if err != nil {
		return nil, s.wordRead(err)
	}
	s.header = slices.Clone(record)
	for i := range s.at {
		s.at[i] = -1
	}
	var faults []error
	for cell, name := range s.header {
		i := of.named(strings.ToLower(strings.TrimSpace(name)))
		s.known = append(s.known, i)
		if i < 0 {
			continue
		}
		if s.at[i] >= 0 {
			faults = append(faults, fmt.Errorf("the header names column %s twice", of.columns[i].name))
		}
		s.at[i] = cell
	}
	var missing []string
	for i, c := range of.columns {
		if c.must && s.at[i] < 0 {
			missing = append(missing, c.name)
		}
	}
	if len(missing) > 0 {
		faults = append(faults, fmt.Errorf("the header has no column %s", strings.Join(missing, ", ")))
	}
	if len(faults) > 0 {
		return nil, errors.Join(faults...)
	}
	return s, nil
}

// passedNames returns the names of the passed-through columns.
func (s *sheet[T]) passedNames() []string { return s.passed(s.header) }

// passed returns the cells of a record that are passed through; a cell that a
// short record lacks is empty.
func (s *sheet[T]) passed(record []string) []string {
	var cells []string
	for cell, i := range s.known {
		if i < 0 {
			cells = append(cells, at(record, cell))
		}
	}
	return cells
}

// next reads the next row. At the end it returns no row and [io.EOF]. A row that
// breaks the reading comes with the error.
func (s *sheet[T]) next() (*row[T], error) {
	record, err := s.csv.Read()
	if err == io.EOF {
		return nil, err
	}
	r := &row[T]{faults: faults[T]{of: s.of}}
	if err != nil {
		var broken *csv.ParseError
		if errors.As(err, &broken) {
			r.line = broken.StartLine
		}
		err = s.wordRead(err)
		r.passed, r.broken = s.passed(nil), true
		r.faults.say(err.Error())
		return r, err
	}
	line, _ := s.csv.FieldPos(0)
	r.entry = entry{line, s.cell(record, "tag"), s.cell(record, "code"), s.passed(record)}
	s.fill(r, record)
	return r, nil
}

// each visits row by row, and reports how far it has come. What breaks the reading
// off is returned by itself; the row that broke it is visited as not whole.
func (s *sheet[T]) each(p progress, visit func(r *row[T], whole bool) error) (broken, err error) {
	for rows := 1; broken == nil; rows++ {
		var r *row[T]
		if r, broken = s.next(); r == nil {
			break
		}
		if err := visit(r, broken == nil); err != nil {
			return broken, err
		}
		p.report(rows)
	}
	if broken == io.EOF {
		broken = nil
	}
	return broken, nil
}

// fill reads the cells of a record. In a record that is not shaped as the header
// they are read as far as they go, and their faults are not told.
func (s *sheet[T]) fill(r *row[T], record []string) {
	for cell, i := range s.known {
		if i < 0 {
			continue
		}
		if err := s.of.columns[i].set(&r.value, strings.TrimSpace(at(record, cell))); err != nil {
			r.faults.add(err, i)
		}
	}
	if r.tag == "" {
		r.faults.add(&tables.InputError{Want: "a name for the " + s.of.row}, s.of.named("tag"))
	}
	if len(record) != len(s.header) {
		r.broken, r.faults.list = true, nil
		r.faults.say(fmt.Sprintf("row: %d cells where the header names %d columns", len(record), len(s.header)))
	}
}

// cell returns the trimmed cell of a known column, "" if the record has none.
func (s *sheet[T]) cell(record []string, name string) string {
	return strings.TrimSpace(at(record, s.at[s.of.named(name)]))
}

func at(record []string, cell int) string {
	if cell < 0 || cell >= len(record) {
		return ""
	}
	return record[cell]
}

// wordRead words an error of reading.
func (s *sheet[T]) wordRead(err error) error {
	var broken *csv.ParseError
	if !errors.As(err, &broken) {
		return fmt.Errorf("reading the %s: %w", s.of.file, err)
	}
	from := ""
	if broken.StartLine != broken.Line {
		from = fmt.Sprintf(", in the row from line %d", broken.StartLine)
	}
	return fmt.Errorf("line %d, column %d%s: %w; reading ends there", broken.Line, broken.Column, from, broken.Err)
}
