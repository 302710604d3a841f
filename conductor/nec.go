package conductor

import "example.org/motorcircuit/tables"

// Rules of NFPA 70, Articles 110 and 310.
var (
	necUnmarked60 = tables.Rule{Ref: "110.14(C)(1)(a)"}
	necUnmarked75 = tables.Rule{Ref: "110.14(C)(1)(b)"}
	necMotor75    = tables.Rule{Ref: "110.14(C)(1)(a)(4)"}
	necMarked     = tables.Rule{Ref: "110.14(C)(1)"}
	necRooftop    = tables.Rule{Ref: "310.15(B)(3)(c)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "310.15(B)(2)"}}}
	necApart      = tables.Rule{Ref: "310.15(B)(3)(a)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "310.15(C)(1)"}}, Note: "single conductors kept apart"}
	necSmall      = tables.Rule{Ref: "240.4(G)", Mark: tables.MarkB}
)

var nec = rules{
	defaultInsulation: "THWN",
	defaultText:       "no insulation is given: THWN taken, rated 75 °C wet and dry",
	least:             [2]tables.Size{tables.Copper: tables.Must(tables.ParseSize("14")), tables.Aluminum: tables.Must(tables.ParseSize("12"))},
	leastRule:         tables.Rule{Ref: "310.106(A)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "310.3(A)"}}},
	parallel:          tables.Rule{Ref: "310.10(H)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "310.10(G)"}}},
	correction:        tables.Rule{Ref: "310.15(B)", Moved: []tables.Move{{From: tables.NEC2020, Ref: "310.15"}}},
	terminalRule:      tables.Rule{Ref: "110.14(C)"},

	termination: func(e tables.Edition, w Wiring, l Load, insulation int) tables.Figure {
		switch {
		case w.Termination != 0:
			return tables.StatedFigure("termination temperature", e, &necMarked, tables.Celsius, int64(w.Termination), 0).WithNote("terminals so marked")
		case l.Motor75 && insulation >= 75 && l.Ampacity.Cmp(hundredAmps) <= 0:
			return tables.StatedFigure("termination temperature", e, &necMotor75, tables.Celsius, 75, 0).WithNote("motor marked Design B, C or D")
		}
		return unmarked(e, l, &necUnmarked60, &necUnmarked75)
	},
	// Factors apply to the column of the insulation; the termination column of the
	// raceway table holds uncorrected: 310.14(A), 310.15, 110.14(C).
	columns: func(_ Wiring, insulation, termination int) columns {
		return columns{insulation, min(insulation, termination)}
	},
	terminalRun: func(tables.Run) tables.Run { return tables.InRaceway },
	corrections: func(e tables.Edition, w Wiring, l Load, ins insulation, s *Selection) (run tables.Run, err error) {
		if s.Ambient, err = e.AmbientFactor(ins.celsius, w.ambient(ins)); err != nil {
			return 0, err
		}
		if w.onRoof(ins) {
			s.Cautions = append(s.Cautions, tables.Caution{Text: "33 °C added to the ambient for a run close above a roof: " + w.ambient(ins).String(), Cite: necRooftop.In(e)})
		}
		n, err := w.Together(l.Count)
		if err != nil {
			return 0, err
		}
		if w.Run == tables.InFreeAir && w.Conductors == 0 {
			s.Together = tables.StatedFigure("factor for conductors together", e, &necApart, tables.Percent, 100, 0).WithNote("kept apart")
			return w.Run, nil
		}
		s.Together, err = e.CountFactor(n)
		return w.Run, err
	},
	afterwards: func(e tables.Edition, _ Wiring, s *Selection) {
		if celsiusOf(s.Termination) > 75 {
			s.Cautions = append(s.Cautions, tables.Caution{Text: "terminals marked 90 °C are rare below 1000 V: both ends must be listed and marked for it", Cite: necMarked.In(e)})
		}
		if !s.SmallLimit.IsZero() {
			s.Cautions = append(s.Cautions, tables.Caution{Text: "the small-conductor limit does not bind a motor circuit, whose device follows Article 430", Cite: necSmall.In(e)})
		}
	},
}
