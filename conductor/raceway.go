package conductor

import (
	"strconv"
	"strings"

	"example.org/motorcircuit/tables"
)

// The types of raceway.
const (
	EMT   = tables.EMT
	ENT   = tables.ENT
	FMC   = tables.FMC
	IMC   = tables.IMC
	LFMC  = tables.LFMC
	LFNCA = tables.LFNCA
	LFNCB = tables.LFNCB
	PVC40 = tables.PVC40
	PVC80 = tables.PVC80
	PVCA  = tables.PVCA
	PVCEB = tables.PVCEB
	RMC   = tables.RMC
)

// A Pull is conductors of one size and insulation that are pulled into a raceway.
type Pull struct {
	Insulation string      `json:"insulation,omitzero"` // the edition's designation; of a bare conductor that of the others
	Size       tables.Size `json:"size"`                // of each conductor
	Count      int         `json:"count"`               // of conductors
	Bare       bool        `json:"bare,omitzero"`       // bare: NEC Table 8; the CEC's tables have only insulated ones
}

// A Filled is a raceway chosen for what is pulled into it.
type Filled struct {
	Raceway    tables.Raceway   `json:"raceway"`           // its type
	Trade      string           `json:"trade_size"`        // in inches: "3/4", "1-1/4"
	Metric     int              `json:"metric_designator"` // "21", "35"
	Conductors int              `json:"conductors"`        // that are pulled into it
	Area       tables.Figure    `json:"area"`              // of all conductors
	Limit      tables.Figure    `json:"limit"`             // area that may be filled
	Percent    tables.Figure    `json:"fill_percent"`      // of the inside area
	Cautions   []tables.Caution `json:"-"`
}

// IsZero reports whether no raceway was chosen.
func (f Filled) IsZero() bool { return f.Raceway == 0 }

// Name returns the raceway as the trade writes it: "EMT 3/4" under the NEC,
// "EMT 21" by metric designator otherwise.
func (f Filled) Name(e tables.Edition) string {
	if f.IsZero() {
		return ""
	}
	if e.Code() == tables.CEC {
		return f.Raceway.Name() + " " + strconv.Itoa(f.Metric)
	}
	return f.Raceway.Name() + " " + f.Trade
}

var (
	necFill = tables.Rule{Ref: "Chapter 9 Table 1"}
	necJam  = tables.Rule{Ref: "Chapter 9 Table 1", Note: "informational note on jamming"}
	cecFill = tables.Rule{Ref: "Rule 12-910 and Table 8", Mark: tables.MarkB}
)

// leastMetric is the smallest trade size in general use: 16, or 1/2 inch.
const leastMetric = 16

// SelectRaceway chooses the smallest trade size of a type of raceway for what is
// pulled into it: 53 percent full for one conductor, 31 for two, 40 for more; 60
// in a nipple (NEC). Errors are [*tables.InputError], [*tables.NotTabulatedError]
// and [*tables.NoSizeError].
func SelectRaceway(e tables.Edition, r tables.Raceway, nipple bool, pulls ...Pull) (Filled, error) {
	p, sizes, err := pulled(e, r, nipple, pulls)
	if err != nil {
		return Filled{}, err
	}
	for _, s := range sizes {
		if s.Metric < leastMetric {
			continue
		}
		if p.Area.Cmp(p.limit(s)) <= 0 {
			return p.in(s), nil
		}
	}
	return Filled{}, &tables.NoSizeError{Field: "wiring.raceway", Need: p.Area, Cite: p.rule.In(e), Constraint: "no trade size of " + r.Name() + " is large enough"}
}

// RateRaceway returns how full a raceway that is there gets of what is pulled into
// it, whether or not it may be as full. The trade size is in inches, "3/4", or the
// metric designator, "21". Errors are as of [SelectRaceway]; a trade size that the
// type has not is a [*tables.NotTabulatedError].
func RateRaceway(e tables.Edition, r tables.Raceway, trade string, nipple bool, pulls ...Pull) (Filled, error) {
	p, sizes, err := pulled(e, r, nipple, pulls)
	if err != nil {
		return Filled{}, err
	}
	names := make([]string, len(sizes))
	for i, s := range sizes {
		if trade == s.Trade || trade == strconv.Itoa(s.Metric) {
			return p.in(s), nil
		}
		names[i] = s.Trade + " (" + strconv.Itoa(s.Metric) + ")"
	}
	return Filled{}, &tables.NotTabulatedError{Field: "trade_size", Table: sizes[0].Area.Citation(), Row: r.Name() + " of trade size " + strconv.Quote(trade[:min(len(trade), 40)]), Covers: strings.Join(names, ", ")}
}

// A pulling is what is pulled into a raceway of some size.
type pulling struct {
	Filled
	e        tables.Edition
	rule     *tables.Rule
	diameter tables.Figure // of one of three insulated conductors that are alike; absent for others
	nipple   bool
}

// pulled adds up what is pulled into a type of raceway, and lists its sizes.
func pulled(e tables.Edition, r tables.Raceway, nipple bool, pulls []Pull) (pulling, []tables.RacewaySize, error) {
	sizes, err := e.RacewaySizes(r)
	if err != nil {
		return pulling{}, nil, err
	}
	p := pulling{Filled: Filled{Raceway: r}, e: e, rule: &necFill, nipple: nipple}
	if e.Code() == tables.CEC {
		p.rule = &cecFill
	}
	var areas []tables.Figure
	alike := true
	for i, c := range pulls {
		d, area, err := e.ConductorDimensions(c.Insulation, c.Size)
		if bare := e.BareArea(c.Size); c.Bare && !bare.IsZero() {
			area, err = bare, nil
		}
		if err != nil {
			return pulling{}, nil, err
		}
		areas = append(areas, tables.ProductOf(strconv.Itoa(c.Count)+" of "+c.Size.String(), e, p.rule, area, tables.Whole("conductors", tables.Plain, c.Count)))
		p.Conductors += c.Count
		alike = alike && !c.Bare && (i == 0 || d.Cmp(p.diameter) == 0)
		p.diameter = d
	}
	if !alike || p.Conductors != 3 {
		p.diameter = tables.Figure{}
	}
	if p.Conductors == 0 {
		return pulling{}, nil, &tables.InputError{Field: "wiring.raceway", Want: "at least one conductor to pull into it"}
	}
	p.Area = tables.SumOf("area of the conductors", e, p.rule, areas...)
	return p, sizes, nil
}

// limit is the area of a size that may be filled.
func (p *pulling) limit(s tables.RacewaySize) tables.Figure {
	if limit := s.Limit(p.Conductors, p.nipple); !limit.IsZero() {
		return limit
	}
	return s.Limit(p.Conductors, false)
}

// in returns the raceway of a size, filled.
func (p *pulling) in(s tables.RacewaySize) Filled {
	f := p.Filled
	f.Trade, f.Metric, f.Limit = s.Trade, s.Metric, p.limit(s)
	f.Percent = tables.PercentOf("fill", p.e, p.rule, f.Area, s.Area)
	if !p.diameter.IsZero() {
		if ratio := s.Diameter.Float() / p.diameter.Float(); ratio >= 2.8 && ratio <= 3.2 && p.e.Code() == tables.NEC {
			f.Cautions = append(f.Cautions, tables.Caution{Text: "three conductors of this size may jam in this raceway while they are pulled", Cite: necJam.In(p.e)})
		}
	}
	return f
}
