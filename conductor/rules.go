package conductor

import (
	"strconv"

	"github.com/shopspring/decimal"

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

// Together returns the number of current-carrying conductors that the factor for
// conductors together is for: the wiring's or, if it gives none, the circuit's
// own. Fewer than those are an [*tables.InputError].
func (w Wiring) Together(own int) (int, error) {
	if w.Conductors == 0 {
		return max(own, 1), nil
	}
	if w.Conductors < own {
		return 0, &tables.InputError{Field: "wiring.conductors", Value: strconv.Itoa(w.Conductors), Want: "at least the circuit's own " + strconv.Itoa(own) + " current-carrying conductors"}
	}
	return w.Conductors, nil
}

// ambient returns the ambient of the run, 30 °C if none is given, with what is
// added close above a roof.
func (w Wiring) ambient(ins insulation) tables.Temperature {
	ambient := w.Ambient
	if ambient.IsZero() {
		ambient = baseAmbient
	}
	if w.onRoof(ins) {
		ambient = tables.Must(tables.ParseTemperature(ambient.Decimal().Add(rooftopAdder).String()))
	}
	return ambient
}

// onRoof reports a run that is hotter than the ambient for lying close above a
// roof: NEC, and XHHW-2 is exempt.
func (w Wiring) onRoof(ins insulation) bool {
	return w.Rooftop && ins.Type != "XHHW-2" && ins.Citation.Edition.Code() == tables.NEC
}

// rooftopAdder is what is added to the ambient of a run close above a roof, in °C.
var rooftopAdder = decimal.New(33, 0)

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
