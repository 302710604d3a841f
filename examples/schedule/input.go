package main

import (
	"bufio"
	"bytes"
	"encoding/csv"
	"errors"
	"fmt"
	"io"
	"slices"
	"strings"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// A schedule is a motor schedule that is being read.
type schedule struct {
	csv    *csv.Reader
	header []string // names as the file writes them
	known  []int    // for each cell the place in columns, -1 if passed through
	at     []int    // for each of columns its cell, -1 if the file has none
}

// An answer is what becomes of one row.
type answer struct {
	line   int      // of the file, from 1
	tag    string   // as the row has it
	code   string   // as the row has it
	faults []string // in the words of the columns, each on one line; none for a good row
	passed []string // the passed-through cells
	result mc.Result
}

// newSchedule reads the header.
func newSchedule(r io.Reader) (*schedule, error) {
	buffered := bufio.NewReaderSize(r, 64<<10)
	if mark, _ := buffered.Peek(3); bytes.Equal(mark, []byte("\uFEFF")) {
		buffered.Discard(3)
	}
	s := &schedule{csv: csv.NewReader(buffered), at: make([]int, len(columns))}
	s.csv.FieldsPerRecord = -1 // counted row by row
	s.csv.ReuseRecord = true
	record, err := s.csv.Read()
	if err == io.EOF {
		return nil, errors.New("the schedule is empty: the first line must name the columns")
	} else if err != nil {
		return nil, wordRead(err)
	}
	s.header = slices.Clone(record)
	for i := range s.at {
		s.at[i] = -1
	}
	var faults []error
	for cell, name := range s.header {
		i := columnNamed(strings.ToLower(strings.TrimSpace(name)))
		s.known = append(s.known, i)
		if i < 0 {
			continue
		}
		if s.at[i] >= 0 {
			faults = append(faults, fmt.Errorf("the header names column %s twice", columns[i].name))
		}
		s.at[i] = cell
	}
	var missing []string
	for i, c := range columns {
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
func (s *schedule) passedNames() []string { return s.passed(s.header) }

// passed returns the cells of a record that are passed through; a cell that a
// short record lacks is empty.
func (s *schedule) passed(record []string) []string {
	var cells []string
	for cell, i := range s.known {
		if i < 0 {
			cells = append(cells, at(record, cell))
		}
	}
	return cells
}

// unused returns the columns of the file that are known but not used yet.
func (s *schedule) unused() []string {
	var names []string
	for i, c := range columns {
		if c.set == nil && s.at[i] >= 0 {
			names = append(names, c.name)
		}
	}
	return names
}

// next answers the next row. At the end it returns no answer and [io.EOF]. A
// row that breaks the reading comes with its own answer and the error.
func (s *schedule) next() (*answer, error) {
	record, err := s.csv.Read()
	if err == io.EOF {
		return nil, err
	}
	if err != nil {
		a := &answer{passed: s.passed(nil)}
		var broken *csv.ParseError
		if errors.As(err, &broken) {
			a.line = broken.StartLine
		}
		err = wordRead(err)
		a.faults = []string{err.Error()}
		return a, err
	}
	line, _ := s.csv.FieldPos(0)
	return s.answer(line, record), nil
}

// answer sizes the motor of a record.
func (s *schedule) answer(line int, record []string) *answer {
	a := &answer{line: line, tag: s.cell(record, "tag"), code: s.cell(record, "code"), passed: s.passed(record)}
	if len(record) != len(s.header) {
		a.faults = []string{fmt.Sprintf("row: %d cells where the header names %d columns", len(record), len(s.header))}
		return a
	}
	var c mc.Circuit
	var f faults
	for cell, i := range s.known {
		if i < 0 || columns[i].set == nil {
			continue
		}
		text := strings.TrimSpace(record[cell])
		if err := columns[i].set(&c, text); err != nil {
			f.add(err, i)
		}
	}
	if c.Tag == "" {
		f.add(&tables.InputError{Want: "a name for the motor"}, columnNamed("tag"))
	}
	if r := size(c, &f); len(f.list) == 0 {
		a.result, a.code = r, c.Edition.String()
	}
	a.faults = f.texts()
	return a
}

// cell returns the trimmed cell of a known column, "" if the record has none.
func (s *schedule) cell(record []string, name string) string {
	return strings.TrimSpace(at(record, s.at[columnNamed(name)]))
}

func at(record []string, cell int) string {
	if cell < 0 || cell >= len(record) {
		return ""
	}
	return record[cell]
}

// wordRead words an error of reading.
func wordRead(err error) error {
	var broken *csv.ParseError
	if !errors.As(err, &broken) {
		return fmt.Errorf("reading the schedule: %w", err)
	}
	from := ""
	if broken.StartLine != broken.Line {
		from = fmt.Sprintf(", in the row from line %d", broken.StartLine)
	}
	return fmt.Errorf("line %d, column %d%s: %w; reading ends there", broken.Line, broken.Column, from, broken.Err)
}
