package conductor

import (
	"math"
	"strconv"

	"example.org/motorcircuit/tables"
)

var (
	transformerRule = tables.Rule{Outside: true, Ref: "IEEE 141-1993 chapter 4", Mark: tables.MarkB, Note: "transformer on an infinite primary"}
	lineToLineRule  = tables.Rule{Outside: true, Ref: "IEEE 141-1993 chapter 4", Mark: tables.MarkB, Note: "line-to-line fault, root of three over two"}
)

// A Transformer feeds a circuit: what its nameplate says.
type Transformer struct {
	KVA     tables.Ratio // rated kilovolt-amperes
	Percent tables.Ratio // impedance in percent
}

// Fault returns the bolted fault current at the secondary of a transformer whose
// primary is infinitely strong, in amperes rounded up to 1 A: the full-load
// current times 100 over the impedance. A nameplate's impedance may be off by 10
// percent. Missing values are an [*tables.InputError].
func (t Transformer) Fault(e tables.Edition, volts, phases int) (tables.Figure, error) {
	if err := e.Check(); err != nil {
		return tables.Figure{}, err
	}
	for _, in := range []struct {
		field string
		q     tables.Ratio
	}{{"transformer.kva", t.KVA}, {"transformer.percent_impedance", t.Percent}} {
		if in.q.IsZero() || in.q.Decimal().Sign() <= 0 {
			return tables.Figure{}, &tables.InputError{Field: in.field, Value: in.q.String(), Want: "a number above 0"}
		}
	}
	if volts <= 0 {
		return tables.Figure{}, &tables.InputError{Field: "transformer.volts", Value: strconv.Itoa(volts), Want: "secondary volts above 0"}
	}
	kva, percent := t.KVA.Figure("kVA"), t.Percent.Figure("percent impedance")
	amps := kva.Float() * 1000 / float64(volts)
	if phases == 3 {
		amps /= math.Sqrt(3)
	}
	return tables.ComputedFigure("fault current at the transformer", e, &transformerRule, tables.Ampere, amps*100/percent.Float(), 0, true,
		t.KVA.String()+" kVA, "+t.Percent.String()+" %, "+strconv.Itoa(volts)+" V, rounded up to 1 A", kva, percent), nil
}

// LineToLine returns the line-to-line fault current of a three-phase one, in its
// unit, rounded up to 0.01.
func LineToLine(e tables.Edition, threePhase tables.Figure) tables.Figure {
	if threePhase.IsZero() {
		return tables.Figure{}
	}
	return tables.ComputedFigure("line-to-line fault current at the motor", e, &lineToLineRule, threePhase.Unit(), threePhase.Float()*math.Sqrt(3)/2, 2, true, roundedUp, threePhase)
}
