package conductor

import "example.org/motorcircuit/tables"

// A Bonding is a circuit's wire-type bonding conductor (in the NEC's words, its
// equipment grounding conductor); one for each set of conductors in parallel.
type Bonding struct {
	Size     tables.Size      `json:"size"`     // of each conductor
	Material tables.Material  `json:"material"` // its metal
	Row      tables.Figure    `json:"row"`      // the device rating of the table row that sizes it
	Why      string           `json:"why"`      // what the size rests on
	Cautions []tables.Caution `json:"-"`
}

var (
	necBonding       = tables.Rule{Ref: "250.122(A)"}
	necBondingSets   = tables.Rule{Ref: "250.122(F)"}
	necBondingLarger = tables.Rule{Ref: "250.122(B)"}
	cecBondingLarger = tables.Rule{Ref: "Rule 10-616(3)(b)", Mark: tables.MarkB}
	cecBonding       = tables.Rule{Ref: "Rule 10-616", Mark: tables.MarkB}
	cecBondingSets   = tables.Rule{Ref: "Rule 10-616(4)", Mark: tables.MarkB}
)

// IsZero reports whether no bonding conductor was selected.
func (b Bonding) IsZero() bool { return b.Size == 0 }

// SelectBonding chooses the bonding conductor of a circuit, of a metal, from the
// rating of the device ahead of it: NEC 250.122, CEC Rule 10-616 with Table 16. It is
// never larger than the circuit conductors. With conductors in parallel each
// set has one: of full size under the NEC, by its share of the device rating
// under the CEC.
//
// Base is the size that the circuit conductors would have by ampacity alone. If
// they are larger, the bonding conductor grows in proportion to their area (NEC
// 250.122(B)), or goes by their ampacity in place of the device (CEC Rule
// 10-616(3)(b)); zero is no increase.
func SelectBonding(e tables.Edition, m tables.Material, device tables.Figure, circuit Selection, base tables.Size) (Bonding, error) {
	b := Bonding{Material: m}
	rating, rule, why := device, &necBonding, "by the rating of the device"
	if e.Code() == tables.CEC {
		rule = &cecBonding
	}
	larger := base != 0 && circuit.Size.Cmp(base) > 0
	if larger && e.Code() == tables.CEC {
		rating, why = tables.LargestOf("device rating or ampacity", e, &cecBondingLarger, device, circuit.Ampacity), "by the larger of the device rating and the ampacity of circuit conductors that are enlarged"
	}
	if circuit.Sets > 1 {
		sets := &necBondingSets
		if e.Code() == tables.CEC {
			sets = &cecBondingSets
			rating = tables.QuotientOf("share of each set", e, sets, rating, setsFigure(circuit.Sets))
			why += ", shared among the sets"
		}
		b.Cautions = append(b.Cautions, tables.Caution{Text: "each set of conductors in parallel has a bonding conductor of its own", Cite: sets.In(e)})
	}
	size, row, err := e.BondingSize(b.Material, rating)
	if err != nil {
		return Bonding{}, err
	}
	if circuit.Sets > 1 {
		why += ", one for each set"
	}
	b.Size, b.Row, b.Why = size, row, why
	if larger && e.Code() == tables.NEC {
		b.Size, b.Why = inProportion(size, circuit.Size, base), "enlarged from "+size.String()+" in proportion to the circuit conductors ("+necBondingLarger.In(e).String()+")"
	}
	// The NEC asks for full size with every set, and of no more than the circuit
	// conductors where there is one set; aluminum is not held to the size of copper.
	alike := m == circuit.Material || m == tables.Copper
	if capped := circuit.Sets <= 1 || e.Code() == tables.CEC; capped && alike && circuit.Size.Cmp(b.Size) < 0 {
		b.Size, b.Why = circuit.Size, "as large as the circuit conductors, which it need not exceed ("+rule.In(e).String()+")"
	}
	return b, nil
}

// inProportion returns the smallest size whose area is at least the table's,
// times the ratio of the installed to the base conductors.
func inProportion(size, installed, base tables.Size) tables.Size {
	need := size.Area().Mul(installed.Area())
	for _, s := range tables.Sizes() {
		if s.Area().Mul(base.Area()).GreaterThanOrEqual(need) {
			return s
		}
	}
	return installed
}
