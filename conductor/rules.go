package conductor

import (
	"strconv"

	"example.org/motorcircuit/tables"
)

// leastParallel is the smallest size that both codes let run in parallel.
var leastParallel = tables.Must(tables.ParseSize("1/0"))

// rules are what a code decides in the selection that all codes share.
type rules struct {
	defaultInsulation string
	defaultText       string
	least             [2]tables.Size // smallest size by material
	leastRule         tables.Rule
	parallel          tables.Rule
	correction        tables.Rule // that ampacities are corrected by the factors
	terminalRule      tables.Rule // that the termination limits the ampacity

	// termination returns the temperature that the terminals allow.
	termination func(tables.Edition, Wiring, Load, int) tables.Figure
	// columns returns which column the factors apply to and which holds uncorrected.
	columns func(w Wiring, insulation, termination int) columns
	// corrections finds the factors, and the run whose table they apply to.
	corrections func(tables.Edition, Wiring, Load, insulation, *Selection) (tables.Run, error)
	// terminalRun returns the run whose table the termination is held to.
	terminalRun func(tables.Run) tables.Run
	// afterwards adds what the code would have a designer know of a selection.
	afterwards func(tables.Edition, Wiring, *Selection)
}

func rulesOf(e tables.Edition) *rules {
	if e.Code() == tables.CEC {
		return &cec
	}
	return &nec
}

// ownCount returns the number of conductors that the factor is for: the
// wiring's, or the circuit's own.
func (w Wiring) ownCount(l Load) (int, error) {
	if w.Conductors == 0 {
		return max(l.Count, 1), nil
	}
	if w.Conductors < l.Count {
		return 0, &tables.InputError{Field: "wiring.conductors", Value: strconv.Itoa(w.Conductors), Want: "at least the circuit's own " + strconv.Itoa(l.Count) + " current-carrying conductors"}
	}
	return w.Conductors, nil
}

// ambient returns the ambient of the run, 30 °C if none is given.
func (w Wiring) ambient() tables.Temperature {
	if w.Ambient.IsZero() {
		return baseAmbient
	}
	return w.Ambient
}

var baseAmbient = tables.Must(tables.ParseTemperature("30"))

// unmarked returns what terminals that are not marked are taken at: 60 °C for
// circuits up to 100 A, 75 °C above.
func unmarked(e tables.Edition, l Load, upTo100, above *tables.Rule) tables.Figure {
	if l.Ampacity.Cmp(hundredAmps) <= 0 {
		return tables.StatedFigure("termination temperature", e, upTo100, tables.Celsius, 60, 0).WithNote("terminals not marked, circuit of 100 A or less")
	}
	return tables.StatedFigure("termination temperature", e, above, tables.Celsius, 75, 0).WithNote("terminals not marked, circuit over 100 A")
}

var hundredAmps = tables.Whole("circuit", tables.Ampere, 100)
