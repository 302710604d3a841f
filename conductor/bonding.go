package conductor

import "example.org/motorcircuit/tables"

// A Bonding is a circuit's wire-type bonding conductor (in the NEC's words, its
// equipment grounding conductor); one for each set of conductors in parallel.
type Bonding struct {
	Size     tables.Size      `json:"size"`
	Material tables.Material  `json:"material"`
	Row      tables.Figure    `json:"row"` // the device rating of the table row that sizes it
	Why      string           `json:"why"` // what the size rests on
	Cautions []tables.Caution `json:"-"`
}

var (
	necBonding     = tables.Rule{Ref: "250.122(A)"}
	necBondingSets = tables.Rule{Ref: "250.122(F)"}
	cecBonding     = tables.Rule{Ref: "Rule 10-616", Mark: tables.MarkB}
	cecBondingSets = tables.Rule{Ref: "Rule 10-616(4)", Mark: tables.MarkB}
)

// IsZero reports whether no bonding conductor was selected.
func (b Bonding) IsZero() bool { return b.Size == 0 }

// SelectBonding chooses the bonding conductor of a circuit from the rating of
// the device ahead of it: NEC 250.122, CEC Rule 10-616 with Table 16. It is
// never larger than the circuit conductors. With conductors in parallel each
// set has one: of full size under the NEC, by its share of the device rating
// under the CEC.
func SelectBonding(e tables.Edition, device tables.Figure, circuit Selection) (Bonding, error) {
	b := Bonding{Material: circuit.Material}
	rating, rule, why := device, &necBonding, "by the rating of the device"
	if e.Code() == tables.CEC {
		rule = &cecBonding
	}
	if circuit.Sets > 1 {
		sets := &necBondingSets
		if e.Code() == tables.CEC {
			sets = &cecBondingSets
			rating = tables.QuotientOf("device rating of each set", e, sets, device, setsFigure(circuit.Sets))
			why = "by the share of the device rating of each set"
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
	// The NEC asks for full size with every set, and of no more than the circuit
	// conductors where there is one set.
	if capped := circuit.Sets <= 1 || e.Code() == tables.CEC; capped && circuit.Size.Cmp(size) < 0 {
		b.Size, b.Why = circuit.Size, "as large as the circuit conductors, which it need not exceed ("+rule.In(e).String()+")"
	}
	return b, nil
}
