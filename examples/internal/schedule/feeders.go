package schedule

import (
	"cmp"
	"errors"
	"fmt"
	"io"
	"maps"
	"slices"
	"strconv"
	"strings"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// A feederList is the feeders of the feeders file with the motors that name
// them. The motors are answered as they are read; what is held of them until
// the feeders are answered is the circuit of each that names a feeder, not its
// result. So memory grows with those circuits, and with nothing else.
type feederList struct {
	sheet *sheet[mc.Feeder]
	rows  []*row[mc.Feeder]
	lines map[string][]string // lines of the file on which a tag stands
	loads map[string]*load    // by the tag of the feeder that the motors name
	lost  []string            // why some motor's feeder is not known
}

// A load is the motors that name one feeder.
type load struct {
	circuits []mc.FeederCircuit
	unsized  []string // tags of those that could not be sized
}

// readFeeders reads a feeders file to its end, before the first motor.
func readFeeders(r io.Reader) (*feederList, error) {
	s, err := openSheet(feederColumns, r)
	if err != nil {
		return nil, err
	}
	l := &feederList{sheet: s, lines: map[string][]string{}, loads: map[string]*load{}}
	for {
		r, err := s.next()
		if err == io.EOF {
			return l, nil
		} else if err != nil {
			return nil, err
		}
		l.rows = append(l.rows, r)
		if r.tag != "" {
			l.lines[r.tag] = append(l.lines[r.tag], strconv.Itoa(r.line))
		}
	}
}

// note keeps what the feeders need of a motor.
func (l *feederList) note(r *row[motorRow], sized bool) {
	feeder := r.value.feeder
	if r.broken && l.lines[feeder] == nil {
		l.lost = append(l.lost, fmt.Sprintf("line %d of the schedule is not shaped as its header, so its feeder is not known", r.line))
		return
	}
	if feeder == "" {
		return
	}
	at := l.loads[feeder]
	if at == nil {
		at = &load{}
		l.loads[feeder] = at
	}
	if sized {
		at.circuits = append(at.circuits, mc.FeederCircuit{Circuit: r.value.Circuit})
	} else {
		at.unsized = append(at.unsized, r.tag)
	}
}

// breakOff notes that the schedule could not be read to its end.
func (l *feederList) breakOff(err error) {
	l.lost = append(l.lost, "the schedule could not be read to its end: "+err.Error())
}

// answers answers the feeders in the order of the file, then the tags that
// motors name and the file lacks.
func (l *feederList) answers(give func(*answer[mc.FeederResult]) error) error {
	for _, r := range l.rows {
		if err := give(l.size(r)); err != nil {
			return err
		}
	}
	for _, tag := range slices.Sorted(maps.Keys(l.loads)) {
		if l.lines[tag] != nil {
			continue
		}
		a := &answer[mc.FeederResult]{entry: entry{tag: tag, passed: l.sheet.passed(nil)}}
		a.faults = []string{"no feeder of this tag is in the feeders file; named by " + someOf(l.loads[tag].tags())}
		if err := give(a); err != nil {
			return err
		}
	}
	return nil
}

// size answers a row of the feeders file. A feeder is not sized unless all its
// motors are.
func (l *feederList) size(r *row[mc.Feeder]) *answer[mc.FeederResult] {
	a := &answer[mc.FeederResult]{entry: r.entry}
	if r.broken {
		a.faults = r.faults.texts()
		return a
	}
	on := l.loads[r.tag]
	if on == nil {
		on = &load{}
	}
	f := r.value
	f.Circuits = on.sorted()
	result, err := mc.SizeFeeder(f)
	l.judge(r, on, err)
	if len(r.faults.list) == 0 {
		a.result, a.code = result, f.Edition.String()
	}
	a.faults = r.faults.texts()
	return a
}

// judge adds what the library says of a feeder, then what the program says of
// its tag and its motors.
func (l *feederList) judge(r *row[mc.Feeder], on *load, err error) {
	var own []error
	var ofMotors []string
	for _, e := range tables.Faults(err) {
		var ofMotor *mc.CircuitError
		switch {
		case errors.As(e, &ofMotor):
			words := faults[motorRow]{of: motors}
			words.judge(ofMotor.Err)
			for _, text := range words.texts() {
				ofMotors = append(ofMotors, "motor "+nameOf(ofMotor.Tag)+": "+text)
			}
		case len(on.circuits) == 0 && tables.FieldOf(e) == "circuits": // told below in words of its own
		default:
			own = append(own, e)
		}
	}
	r.faults.judge(errors.Join(own...))
	if lines := l.lines[r.tag]; len(lines) > 1 {
		r.faults.add(&tables.InputError{Value: clip(r.tag), Want: "a tag of its own; it stands on lines " + strings.Join(lines, ", ")}, r.faults.of.named("tag"))
	}
	for _, why := range l.lost {
		r.faults.say("its motors are not all known: " + why)
	}
	switch {
	case len(on.unsized) > 0:
		r.faults.say("not sized without all its motors; these were not: " + someOf(on.unsized))
	case len(on.circuits) == 0 && len(l.lost) == 0 && r.tag != "":
		r.faults.say("no motor of the schedule names this feeder")
	}
	for _, text := range ofMotors {
		r.faults.say(text)
	}
}

// sorted returns the circuits in the order of their tags, so that the answer
// does not hang on the order of the schedule.
func (on *load) sorted() []mc.FeederCircuit {
	slices.SortStableFunc(on.circuits, func(a, b mc.FeederCircuit) int { return cmp.Compare(a.Circuit.Tag, b.Circuit.Tag) })
	return on.circuits
}

// tags returns the tags of all its motors.
func (on *load) tags() []string {
	tags := slices.Clone(on.unsized)
	for _, c := range on.circuits {
		tags = append(tags, c.Circuit.Tag)
	}
	return tags
}

// someOf lists tags in order, and of many the first and how many more.
func someOf(tags []string) string {
	const most = 10
	slices.Sort(tags)
	var names []string
	for _, tag := range tags[:min(len(tags), most)] {
		names = append(names, clip(nameOf(tag)))
	}
	text := strings.Join(names, ", ")
	if len(tags) > most {
		text += fmt.Sprintf(" and %d more", len(tags)-most)
	}
	return text
}
