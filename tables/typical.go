package tables

import "example.org/motorcircuit/internal/exact"

// TypicalPowerFactors returns typical power factors of a three-phase motor by
// horsepower, running and with the rotor locked, from the first row at or above
// the power. The running one is absent above 40 hp.
func TypicalPowerFactors(p Power) (running, lockedRotor Figure) {
	if !p.IsHP() {
		return Figure{}, Figure{}
	}
	for _, r := range typicals() {
		if p.Cmp(r.power) > 0 {
			continue
		}
		rule := &typicalRule
		if r.fromMemory {
			rule = &typicalMemory
		}
		lockedRotor = newFigure("typical locked-rotor power factor", Tabulated, 0, rule, r.locked, Plain).WithNote(r.power.String())
		if !r.running.IsZero() {
			running = newFigure("typical running power factor", Tabulated, 0, rule, r.running, Plain).WithNote(r.power.String())
		}
		return running, lockedRotor
	}
	return Figure{}, Figure{}
}

var (
	typicalRule   = Rule{Outside: true, Ref: "typical motor data by horsepower", Mark: MarkB}
	typicalMemory = Rule{Outside: true, Ref: "typical motor data by horsepower", Mark: MarkC}
)

type typicalRow struct {
	power           Power
	locked, running exact.Num
	fromMemory      bool
}

var typicals = loaded(func() ([]typicalRow, error) {
	g, err := open("physics/locked_rotor_power_factor.csv")
	if err != nil {
		return nil, err
	}
	var rows []typicalRow
	for _, cells := range g.Rows {
		r := typicalRow{fromMemory: cells[4] == "C"}
		if r.power, err = ParseHP(cells[0]); err != nil {
			return nil, err
		}
		if r.locked, err = exact.Parse(cells[1]); err != nil {
			return nil, err
		}
		if cells[2] != "" {
			if r.running, err = exact.Parse(cells[2]); err != nil {
				return nil, err
			}
		}
		rows = append(rows, r)
	}
	return rows, nil
})
