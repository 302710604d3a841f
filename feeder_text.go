package motorcircuit

import (
	"fmt"
	"iter"
	"strings"

	"example.org/motorcircuit/internal/layout"
	"example.org/motorcircuit/tables"
)

// Figures yields every figure of the feeder that is present, in the order of the
// derivation; those of its circuits are in [FeederResult.Circuits].
func (r FeederResult) Figures() iter.Seq[tables.Figure] {
	return func(yield func(tables.Figure) bool) {
		list := r.disconnectFigures(r.deviceFigures(selectionFigures(nil, &r.Conductors)))
		list = dropFigures(racewayFigures(append(list, &r.Bonding.Row), &r.Raceway), &r.Drop)
		for _, f := range append(list, &r.FaultDuty.Source, &r.FaultDuty.AtMotor, &r.FaultDuty.Withstand) {
			if !f.IsZero() && !yield(*f) {
				return
			}
		}
	}
}

// motors counts motors in words.
func motors(n int) string {
	if n == 1 {
		return "1 motor"
	}
	return fmt.Sprintf("%d motors", n)
}

func (r *FeederResult) deviceFigures(list []*tables.Figure) []*tables.Figure {
	return append(list, &r.Limit, &r.Rating, &r.StartLimit, &r.StartRating)
}

func (r *FeederResult) disconnectFigures(list []*tables.Figure) []*tables.Figure {
	if of := r.Disconnect.Amperes.Operands(); len(of) > 0 && of[0].Op() == tables.Sum {
		list = append(list, &of[0])
	}
	return append(list, &r.Disconnect.Amperes, &r.Disconnect.LockedRotor)
}

// String returns the derivation as text: the motors with their part in the sum,
// then each figure with how it came about and the rule behind it.
func (r FeederResult) String() string { return r.Text(0) }

// Text is [FeederResult.String] in lines of at most so many characters, 40 at the
// least; 0 leaves them as long as they are.
func (r FeederResult) Text(width int) string { return r.document().Text(width) }

// Markdown returns the derivation in Markdown, a table for each section.
func (r FeederResult) Markdown() string { return r.document().Markdown() }

func (r *FeederResult) document() *layout.Doc {
	d := &layout.Doc{Title: fmt.Sprintf("%s: feeder of %s, under %s", oneLine(r.Feeder.Tag), motors(len(r.Circuits)), r.Feeder.Edition.Standard()), Columns: derivationColumns}
	add := func(heading, chosen string, rows ...layout.Row) {
		d.Sections = append(d.Sections, layout.Section{Heading: heading, Chosen: chosen, Rows: rows})
	}
	remark := func(text string) layout.Row { return layout.Row{Name: text} }
	add("Loads that size the conductors", "", r.termRows()...)
	add("Feeder conductors", wires(&r.Conductors), append(figureRows(selectionFigures(nil, &r.Conductors)), whySmallerFails(&r.Conductors)...)...)
	add("Feeder short-circuit and ground-fault device", r.Rating.String()+" "+r.Device.Name(), append(figureRows(r.deviceFigures(nil)), remark("the device of "+oneLine(r.Largest)+" governs"))...)
	add("Disconnecting means of the group", rating(r.Disconnect.Amperes, r.Disconnect.Horsepower, r.Disconnect.Cite), figureRows(r.disconnectFigures(nil))...)
	add("Bonding conductor", fmt.Sprintf("%v %v, %s", r.Bonding.Size, r.Bonding.Material, r.Bonding.Why), figureRow(r.Bonding.Row))
	if !r.Raceway.IsZero() {
		add("Raceway", r.Raceway.Name(r.Feeder.Edition), figureRows(racewayFigures(nil, &r.Raceway))...)
	}
	if !r.Drop.Running.IsZero() {
		rows := figureRows(dropFigures(nil, &r.Drop))
		for i, total := range r.TotalDrop {
			if !total.IsZero() {
				rows = append(rows, figureRow(total.Renamed("feeder and branch circuit of "+oneLine(r.Circuits[i].Circuit.Tag))))
			}
		}
		add("Voltage drop", r.Drop.Running.String(), rows...)
	}
	if f := &r.FaultDuty; !f.AtMotor.IsZero() {
		add("Fault duty", f.AtMotor.String()+" at the end of the feeder", figureRows([]*tables.Figure{&f.Source, &f.AtMotor, &f.Withstand})...)
	}
	d.Sections = append(d.Sections, cautionSection(r.Cautions))
	return d
}

// termRows are the parts of the sum, and which motor counts more.
func (r *FeederResult) termRows() (rows []layout.Row) {
	for _, t := range r.Terms {
		rows = append(rows, figureRow(t.Figure))
	}
	if r.Governs != "" {
		rows = append(rows, layout.Row{Name: oneLine(r.Governs) + " governs the conductors"})
	} else {
		rows = append(rows, layout.Row{Name: "no motor counts 125 percent: none is of continuous duty, or one that is not counts as much by its duty"})
	}
	if len(r.NotCounted) > 0 {
		rows = append(rows, layout.Row{Name: "not counted: " + oneLine(strings.Join(r.NotCounted, ", "))})
	}
	return rows
}

// The cautions that a feeder as such gives rise to.
var (
	interlocked  = tables.Caution{Text: "motors are counted as interlocked: they must not be able to run together, and the set of the greatest sum is taken"}
	branchDevice = tables.Caution{Text: "no kind of device is given for a branch circuit: a time-delay fuse is taken, which counts in the feeder's device"}
	hardStarts   = tables.Caution{Text: "the device of a motor that will not start is counted at its higher ceiling"}
	unequalLine  = tables.Caution{Text: "single-phase motors are counted on the lines that they name, and the line of most load sizes every conductor"}
	driveBefore  = tables.Rule{Ref: "430.24", Note: "drives in a group"}
)

// cautions gathers what a designer should know of the feeder; each once, the
// standing caution last.
func (r *FeederResult) cautions(g *group) []tables.Caution {
	e := r.Feeder.Edition
	var list cautionList
	if r.Feeder.Device == 0 {
		list.add(noDevice)
	}
	if r.Feeder.Wiring.Ambient.IsZero() {
		list.add(noAmbient)
	}
	if r.Feeder.Wiring.Termination == 0 {
		list.add(noTermination)
	}
	cite := func(nec, cec *tables.Rule) tables.Citation {
		if e.Code() == tables.CEC {
			return cec.In(e)
		}
		return nec.In(e)
	}
	kinds := map[tables.Device]bool{r.Device: true}
	for i := range g.members {
		m := &g.members[i]
		kinds[m.result.ShortCircuit.Device] = true
		if m.fc.Circuit.Device == 0 {
			list.add(branchDevice)
		}
		if m.fc.Interlock != "" {
			list.add(interlocked)
		}
		if m.fc.HardStart {
			list.add(hardStarts)
		}
		if m.fc.Lines != "" {
			list.add(unequalLine)
		}
		if !m.result.Demand.Input.IsZero() && e == tables.NEC2017 {
			list.add(tables.Caution{Text: "this edition does not say how a drive counts in a group: its rated input current is taken, as later editions say", Cite: driveBefore.In(e)})
		}
	}
	if len(kinds) > 1 {
		list.add(tables.Caution{Text: "the branch devices are not all of the feeder device's kind: each counts as the kind that it is, or as the feeder's if it is an instantaneous-trip breaker", Cite: cite(&necFeederDevice, &cecFeederDevice)})
	}
	if !r.Feeder.Demand.IsZero() {
		list.add(tables.Caution{Text: "a demand factor is applied: the authority having jurisdiction must allow it, and the conductors must still carry the greatest demand", Cite: cite(&necDemand, &cecDemand)})
	}
	list.add(r.Conductors.Cautions...)
	list.add(r.Disconnect.Cautions...)
	list.add(r.Bonding.Cautions...)
	list.add(r.Raceway.Cautions...)
	list.add(r.dropCautions()...)
	for f := range r.Figures() {
		for _, c := range f.FromMemory() {
			list.add(tables.FromMemory(c))
		}
	}
	list.finish(e)
	return list
}
