package motorcircuit

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

var (
	necGroupSwitch = tables.Rule{Ref: "430.110(C)(2)"}
	necGroupHP     = tables.Rule{Ref: "430.110(C)(1)"}
	cecGroupRotor  = tables.Rule{Ref: "Rule 28-714", Mark: tables.MarkB}
	cecGroupSwitch = tables.Rule{Ref: "Rule 28-602(2)"}
)

// disconnect works out one disconnecting means for the whole group. NEC
// 430.110(C): 115 percent of the summed currents, and the horsepower whose table
// currents are at or above the sums of full-load and of locked-rotor current,
// all motors starting at once. CEC Rule 28-602(2): 115 percent of the largest
// plus the rest, and the horsepower of the largest.
func (g *group) disconnect() protection.Disconnect {
	var best protection.Disconnect
	for _, running := range g.running {
		if len(running) == 0 {
			continue
		}
		x := g.disconnectNEC(running)
		if g.edition.Code() == tables.CEC {
			x = g.disconnectCEC(running)
		}
		if best.Amperes.IsZero() || x.Amperes.Cmp(best.Amperes) > 0 {
			best.Amperes, best.Cite = x.Amperes, x.Cite
		}
		if x.LockedRotor.Cmp(best.LockedRotor) > 0 {
			best.LockedRotor = x.LockedRotor
		}
		if x.Horsepower.Cmp(best.Horsepower) > 0 {
			best.Horsepower = x.Horsepower
		}
		if len(x.Cautions) > 0 {
			best.Cautions = x.Cautions
		}
	}
	if len(best.Cautions) > 0 { // one set is beyond the tables, so no horsepower is enough for all
		best.Horsepower, best.Cite = tables.Power{}, tables.Citation{}
	}
	return best
}

func (g *group) disconnectNEC(running []*member) protection.Disconnect {
	e := g.edition
	var full, rotor []tables.Figure
	for _, m := range running {
		full = append(full, m.current.Renamed(m.tag))
		rotor = append(rotor, m.rotor.Renamed(m.tag))
	}
	for _, load := range []tables.Figure{g.continuous, g.other} {
		if !load.IsZero() {
			full, rotor = append(full, load), append(rotor, load)
		}
	}
	sum := tables.SumOf("equivalent full-load current", e, &necGroupHP, full...)
	x := protection.Disconnect{
		Amperes:     percent("least ampere rating of the disconnecting means", e, &necGroupSwitch, sum, 115),
		LockedRotor: tables.SumOf("equivalent locked-rotor current", e, &necGroupHP, rotor...),
		Cite:        necGroupHP.In(e),
	}
	system := systemOf(g.members).result.Circuit.Motor
	table := tables.InductionTable
	switch system.PhaseCount() {
	case 0:
		table = tables.DirectCurrentTable
	case 1:
		table = tables.SinglePhaseTable
	case 2:
		table = tables.TwoPhaseTable
	}
	p, err := e.PowerAtOrAbove(table, system.Voltage, sum)
	if err == nil && system.Kind != motor.DirectCurrent {
		var q tables.Power
		if q, err = e.PowerAtOrAboveLockedRotor(system.PhaseCount(), system.Voltage, x.LockedRotor); q.Cmp(p) > 0 {
			p = q
		}
	}
	if err != nil {
		x.Cautions = append(x.Cautions, tables.Caution{Text: "the group draws more than any horsepower of the tables: choose the disconnecting means by its ampere and locked-rotor ratings", Cite: necGroupHP.In(e)})
		return x
	}
	x.Horsepower = p
	return x
}

func (g *group) disconnectCEC(running []*member) protection.Disconnect {
	e := g.edition
	terms := []tables.Figure{percent(running[0].tag, e, &cecGroupSwitch, running[0].current, 115)}
	x := protection.Disconnect{Cite: cecGroupSwitch.In(e)}
	for i, m := range running {
		if i > 0 {
			terms = append(terms, m.current.Renamed(m.tag))
		}
		if p := m.result.Demand.Horsepower; p.Cmp(x.Horsepower) > 0 {
			x.Horsepower = p
		}
	}
	for _, load := range []tables.Figure{g.continuous, g.other} {
		if !load.IsZero() {
			terms = append(terms, load)
		}
	}
	x.Amperes = tables.SumOf("least ampere rating of the disconnecting means", e, &cecGroupSwitch, terms...)
	x.LockedRotor = g.compressorRotor(running)
	return x
}

// compressorRotor is the largest locked-rotor current of the compressors in a
// set, plus the currents of the rest (CEC Rule 28-714); absent without one.
func (g *group) compressorRotor(running []*member) tables.Figure {
	largest := -1
	for i, m := range running {
		if m.result.Circuit.Motor.Kind == motor.Hermetic && (largest < 0 || m.rotor.Cmp(running[largest].rotor) > 0) {
			largest = i
		}
	}
	if largest < 0 {
		return tables.Figure{}
	}
	terms := []tables.Figure{running[largest].rotor.Renamed("locked rotor of " + running[largest].tag)}
	for i, m := range running {
		if i != largest {
			terms = append(terms, m.current.Renamed(m.tag))
		}
	}
	return tables.SumOf("locked-rotor current for the switch", g.edition, &cecGroupRotor, terms...)
}
