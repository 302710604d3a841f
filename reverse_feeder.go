package motorcircuit

import (
	"errors"
	"slices"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A FeederHeadroom is what else an installed feeder would carry, each thing alone.
type FeederHeadroom struct {
	Tag   string       `json:"tag,omitzero"`   // of the feeder
	Spare Edge         `json:"spare_amperes"`  // of other load that is not continuous, in amperes
	Power tables.Power `json:"power,omitzero"` // of the largest motor
	Motor Edge         `json:"largest_motor"`  // the largest standard motor that may be added: continuous, across the line, of the feeder's system
}

// mostSpare is where the search for spare amperes ends, in hundredths.
const mostSpare = 10_000_000

// ReverseFeeder finds the spare amperes of an installed feeder and the largest motor
// that may be added, by asking [CheckFeeder]. The conductors of the feeder must be
// given. Errors are as of CheckFeeder.
func ReverseFeeder(f Feeder, in InstalledFeeder) (FeederHeadroom, error) {
	_, err := CheckFeeder(f, in)
	if in.Conductors.Size == 0 {
		err = errors.Join(err, &tables.InputError{Field: "installed.conductors.size", Want: "the size of the conductors that are there"})
	}
	if err != nil {
		return FeederHeadroom{}, err
	}
	h := FeederHeadroom{Tag: f.Tag}
	other := f.Other.Decimal()
	h.Spare = search("spare amperes", f.Edition, tables.Ampere, 2, 0, mostSpare, func(step int) (Report, error) {
		f := f
		if step > 0 {
			f.Other = motor.Amps(other.Add(decimal.New(int64(step), -2)).String())
		}
		return CheckFeeder(f, in)
	})
	h.Power, h.Motor = largestAdded(f, in)
	return h, nil
}

// largestAdded finds the largest motor that may be added.
func largestAdded(f Feeder, in InstalledFeeder) (tables.Power, Edge) {
	_, members, err := f.begin()
	if err != nil {
		return tables.Power{}, Edge{Why: err.Error()}
	}
	system := systemOf(members).result.Circuit.Motor
	m := motor.Motor{Kind: motor.SquirrelCage, Phases: system.PhaseCount(), Voltage: system.Voltage}
	switch m.Phases {
	case 0:
		m.Kind = motor.DirectCurrent
	case 1:
		m.Kind = motor.SinglePhase
	}
	powers, err := f.Edition.MotorPowers(m.Table(), m.Voltage)
	if err != nil {
		return tables.Power{}, Edge{Why: err.Error()}
	}
	return largest(powers, func(p tables.Power) (Report, error) {
		f, m := f, m
		m.Power = p
		f.Circuits = append(slices.Clone(f.Circuits), FeederCircuit{Circuit: Circuit{Tag: "motor added", Edition: f.Edition, Motor: m, Device: f.Device}})
		return CheckFeeder(f, in)
	})
}

// String tells what else the feeder would carry, and what binds.
func (h FeederHeadroom) String() string { return h.Text(0) }

// Text is [FeederHeadroom.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (h FeederHeadroom) Text(width int) string { return h.document().Text(width) }

// Markdown returns the headroom in Markdown.
func (h FeederHeadroom) Markdown() string { return h.document().Markdown() }

func (h *FeederHeadroom) document() *layout.Doc {
	return headroomDocument(h.Tag, h.Spare.row("spare amperes", tables.Power{}), h.Motor.row("largest motor", h.Power))
}
