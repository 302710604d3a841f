package conductor

import (
	"strconv"

	"example.org/motorcircuit/tables"
)

// A DropMethod is a way to reckon voltage drop running.
type DropMethod uint8

// The methods. A motor with its rotor locked is always reckoned by impedance.
const (
	ByImpedance DropMethod = iota // exact form, from the impedance table
	ByTableD3                     // CEC-2024 Table D3: K × f × I × L ÷ 1000
	dropMethodCount
)

var dropMethodTexts = [...]string{"impedance", "table_d3"}

// String returns the stable text form.
func (m DropMethod) String() string { return tables.TextOf(m, dropMethodTexts[:]) }

// MarshalText is [DropMethod.String].
func (m DropMethod) MarshalText() ([]byte, error) { return []byte(m.String()), nil }

// UnmarshalText reads the text form; no text is ByImpedance.
func (m *DropMethod) UnmarshalText(text []byte) error {
	return tables.ReadText(m, "wiring.drop_method", text, dropMethodTexts[:])
}

var (
	d3Rule = tables.Rule{Ref: "Table D3", Mark: tables.MarkB, Note: "K × f × I × L ÷ 1000"}
	d3Warm = map[int]int64{60: 95, 75: 100, 90: 105} // by operating temperature, in percent
)

// perMetre returns the volts that the method loses on one metre of one set.
func (w Wiring) perMetre(e tables.Edition, s Selection, l LineLoad) (tables.Figure, error) {
	k, err := e.DropFactor(s.Material, s.Size, s.Run == tables.InCable, l.PowerFactor)
	if err != nil {
		return tables.Figure{}, err
	}
	f := tables.StatedFigure("f", e, &d3Rule, tables.Plain, 2, 0)
	if l.Phases == 3 {
		f = tables.StatedFigure("f", e, &d3Rule, tables.Plain, 173, 2)
	}
	warm := tables.StatedFigure("at operating temperature", e, &d3Rule, tables.Percent, d3Warm[celsiusOf(s.Termination)], 0)
	thousandth := tables.StatedFigure("per metre", e, &d3Rule, tables.Plain, 1, 3)
	return tables.ProductOf("volts lost on a metre", e, &d3Rule, l.Current, k, f, warm, thousandth), nil
}

// dropD3 is [Wiring.RunningDrop] by Table D3, exactly.
func (w Wiring) dropD3(e tables.Edition, s Selection, l LineLoad) (tables.Figure, error) {
	metre, err := w.perMetre(e, s, l)
	if err != nil {
		return tables.Figure{}, err
	}
	length := w.Length.Figure("length")
	lost := tables.ProductOf("volts lost", e, &d3Rule, metre, length)
	whole := tables.Whole("volts", tables.Volt, l.Volts)
	if s.Sets > 1 { // each set carries its share
		whole = tables.ProductOf("volts times sets", e, &d3Rule, whole, setsFigure(s.Sets))
	}
	return tables.PercentOf("voltage drop running", e, &d3Rule, lost, whole), nil
}

// longestD3 is [Wiring.LongestRun] by Table D3.
func (w Wiring) longestD3(e tables.Edition, s Selection, l LineLoad, limit tables.Figure) (tables.Figure, error) {
	metre, err := w.perMetre(e, s, l)
	if err != nil {
		return tables.Figure{}, err
	}
	metres := limit.Float() / 100 * float64(l.Volts) * float64(max(s.Sets, 1)) / metre.Float()
	return tables.ComputedFigure("longest run within the limit", e, &d3Rule, tables.Metre, metres, 1, false, "on "+strconv.Itoa(l.Volts)+" V, rounded down to 0.1 m", limit, metre), nil
}
