package tables

import (
	"fmt"
	"slices"
	"strings"
)

// A Location is the moisture that a conductor lives in. The zero Location is dry.
type Location uint8

// The locations.
const (
	Dry Location = iota
	Damp
	Wet
	locationCount
)

var locationTexts = [...]string{"dry", "damp", "wet"}

// String returns the stable text form.
func (l Location) String() string { return TextOf(l, locationTexts[:]) }

// MarshalText is [Location.String].
func (l Location) MarshalText() ([]byte, error) { return []byte(l.String()), nil }

// UnmarshalText reads the text form; no text is Dry.
func (l *Location) UnmarshalText(text []byte) error {
	return ReadText(l, "wiring.location", text, locationTexts[:])
}

// An Insulation is a type of conductor insulation or of cable as the edition
// lists it.
type Insulation struct {
	Type      string // the edition's designation
	Citation  Citation
	Celsius   [3]int // rated temperature by Location, 0 where it may not be used
	Least     Size   // smallest size it is made in
	Most      Size   // largest size it is made in
	Thermoset bool   // thermoset, which stands more heat in a fault
	NoRaceway bool   // may not be pulled into a raceway
	Mark      Mark   // how sure the type's row is
	Note      string // conditions of use, often ""
}

// Insulation returns a type of insulation by its designation, in upper or lower
// case, such as "THWN-2" (NEC) or "RW90" (CEC, also "RW90XLPE"). An unknown type
// is an [*InputError] that lists the edition's types.
func (e Edition) Insulation(designation string) (Insulation, error) {
	if err := e.Check(); err != nil {
		return Insulation{}, err
	}
	t := e.book().insulations()
	i, ok := t.byName[designation]
	if !ok {
		i, ok = t.byName[canonicalInsulation(designation)]
	}
	if !ok {
		return Insulation{}, &InputError{"wiring.insulation", clip(designation), "one of " + strings.Join(t.names, ", "), t.rule.In(e)}
	}
	ins := t.list[i]
	ins.Citation = t.rule.In(e)
	return ins, nil
}

// Insulations returns the edition's types of insulation in the table's order.
func (e Edition) Insulations() []Insulation {
	if !e.IsValid() {
		return nil
	}
	t := e.book().insulations()
	all := slices.Clone(t.list)
	for i := range all {
		all[i].Citation = t.rule.In(e)
	}
	return all
}

// canonicalInsulation drops what the trade adds to a designation: spaces,
// and XLPE or EP, the compound of a thermoset.
func canonicalInsulation(s string) string {
	s = strings.ToUpper(strings.TrimSpace(s))
	s = strings.NewReplacer(" ", "_", "XLPE", "", "(EP)", "").Replace(s)
	return strings.TrimSuffix(s, "_")
}

type insulationTable struct {
	rule   *Rule
	list   []Insulation
	names  []string
	byName map[string]int
}

func (t *insulationTable) add(ins Insulation) error {
	if _, twice := t.byName[ins.Type]; twice {
		return fmt.Errorf("insulation %s is listed twice", ins.Type)
	}
	t.byName[ins.Type] = len(t.list)
	t.list, t.names = append(t.list, ins), append(t.names, ins.Type)
	return nil
}

// loadInsulationsNEC reads rated temperatures by location and the range of
// sizes; some types are carried from memory.
func loadInsulationsNEC(path string, rule *Rule, fromMemory ...string) func() *insulationTable {
	return loaded(func() (*insulationTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &insulationTable{rule: rule, byName: make(map[string]int)}
		for row, cells := range g.Rows {
			ins := Insulation{Type: cells[0], Thermoset: strings.HasPrefix(cells[1], "thermoset"), Note: condition(cells[7])}
			for i := range locationCount {
				if ins.Celsius[i], err = g.Int(row, 2+int(i), 0); err != nil {
					return nil, err
				}
			}
			if ins.Celsius[Damp] == 0 { // not printed apart: the wet value is the safe one
				ins.Celsius[Damp] = ins.Celsius[Wet]
			}
			if ins.Mark = rule.Mark; slices.Contains(fromMemory, ins.Type) {
				ins.Mark = MarkC
			}
			// 22 and 20 AWG machine-tool wire is below the library's series.
			if ins.Least, err = ParseSize(strings.Replace(cells[5], "22", "18", 1)); err != nil {
				return nil, err
			}
			if ins.Most, err = ParseSize(cells[6]); err != nil {
				return nil, err
			}
			if err := t.add(ins); err != nil {
				return nil, err
			}
		}
		return t, nil
	})
}

// condition drops from a note what is a remark on the copying.
func condition(note string) string {
	for _, remark := range []string{"table lists dry and wet; damp implied", "damp implied", "dual rating", "exempt from the rooftop temperature adder"} {
		note = strings.TrimPrefix(strings.TrimPrefix(note, remark), "; ")
	}
	return note
}

// loadInsulationsCEC reads one rated temperature and the conditions of use.
func loadInsulationsCEC(path string, rule *Rule) func() *insulationTable {
	return loaded(func() (*insulationTable, error) {
		g, err := open(path)
		if err != nil {
			return nil, err
		}
		t := &insulationTable{rule: rule, byName: make(map[string]int)}
		raceway, err := g.Col("in_raceway")
		if err != nil {
			return nil, err
		}
		for row, cells := range g.Rows {
			celsius, err := g.Int(row, 2, 0)
			if err != nil {
				return nil, err
			}
			ins := Insulation{Type: cells[0], Thermoset: strings.HasPrefix(cells[1], "thermoset"), Mark: rule.Mark, Least: 1, Most: Size(len(awgNames)), NoRaceway: cells[raceway] == "no"}
			for i := range locationCount {
				switch use := cells[3+int(i)]; use {
				case "no":
				case "yes":
					ins.Celsius[i] = celsius
				case "restricted", "as_marked", "with_jacket":
					ins.Celsius[i] = celsius
					ins.Note = "conditions apply in damp and wet locations: " + strings.ReplaceAll(use, "_", " ")
				default:
					return nil, fmt.Errorf("%s: unknown use %q", path, use)
				}
			}
			if err := t.add(ins); err != nil {
				return nil, err
			}
		}
		return t, nil
	})
}
