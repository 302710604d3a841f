package conductor

import "example.org/motorcircuit/tables"

// Rules of CSA C22.1, Sections 4, 12 and 14.
var (
	cecMarked   = tables.Rule{Ref: "Rule 4-006(1)"}
	cecUnmarked = tables.Rule{Ref: "Rule 4-006(2)"}
	cecApart    = tables.Rule{Ref: "Rule 4-004(1)", Note: "single conductors kept apart"}
	cecSmall    = tables.Rule{Ref: "Rule 14-104(1)", Note: "motor circuits follow Section 28"}
	cecReading  = tables.Rule{Ref: "Rules 4-004 and 4-006", Mark: tables.MarkB}
)

var cec = rules{
	defaultInsulation: "RW75",
	defaultText:       "no insulation is given: RW75 taken, rated 75 °C wet and dry",
	least:             nec.least,
	leastRule:         tables.Rule{Ref: "Rule 4-002", Mark: tables.MarkB},
	parallel:          tables.Rule{Ref: "Rule 12-108", Mark: tables.MarkB},
	correction:        tables.Rule{Ref: "Rule 4-004"},
	terminalRule:      cecReading,

	termination: func(e tables.Edition, w Wiring, l Load, _ int) tables.Figure {
		if w.Termination != 0 {
			return tables.StatedFigure("termination temperature", e, &cecMarked, tables.Celsius, int64(w.Termination), 0).WithNote("terminals so marked")
		}
		return unmarked(e, l, &cecUnmarked, &cecUnmarked)
	},
	columns: func(w Wiring, insulation, termination int) columns {
		column := min(insulation, termination)
		if w.Reading == CorrectInsulation {
			return columns{insulation, column}
		}
		return columns{column, 0}
	},
	terminalRun: func(run tables.Run) tables.Run { return run },
	corrections: func(e tables.Edition, w Wiring, l Load, ins insulation, s *Selection) (run tables.Run, err error) {
		// Table 5A goes by the temperature marked on the conductor.
		if s.Ambient, err = e.AmbientFactor(ins.celsius, w.ambient(ins)); err != nil {
			return 0, err
		}
		n, err := w.Together(l.Count)
		if err != nil {
			return 0, err
		}
		if w.Run != tables.InFreeAir {
			s.Together, err = e.CountFactor(n)
			return w.Run, err
		}
		switch {
		case w.Conductors < 2:
			s.Together = tables.StatedFigure("factor for conductors together", e, &cecApart, tables.Plain, 1, 0).WithNote("kept apart by a diameter or more")
		case w.Conductors <= 4:
			s.Together, err = e.SpacingFactor(n)
		default: // more than four close together: the raceway table with its factor
			s.Together, err = e.CountFactor(n)
			return tables.InRaceway, err
		}
		return w.Run, err
	},
	afterwards: func(e tables.Edition, w Wiring, s *Selection) {
		if !s.Ambient.IsOne() || !s.Together.IsOne() {
			text := "the factors are applied to the column of the termination, the stricter reading of how the two rules combine"
			if w.Reading == CorrectInsulation {
				text = "the factors are applied to the column of the insulation and the termination column holds uncorrected, the less strict reading of how the two rules combine"
			}
			s.Cautions = append(s.Cautions, tables.Caution{Text: text, Cite: cecReading.In(e)})
		}
		if !s.SmallLimit.IsZero() {
			s.Cautions = append(s.Cautions, tables.Caution{Text: "the small-conductor limit does not bind a motor circuit, whose device follows Section 28", Cite: cecSmall.In(e)})
		}
	},
}
