package conductor

import (
	"strconv"

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
	Size       tables.Size `json:"size"`
	Count      int         `json:"count"`
	Bare       bool        `json:"bare,omitzero"` // bare: NEC Table 8; the CEC's tables have only insulated ones
}

// A Filled is a raceway chosen for what is pulled into it.
type Filled struct {
	Raceway    tables.Raceway   `json:"raceway"`
	Trade      string           `json:"trade_size"`        // in inches: "3/4", "1-1/4"
	Metric     int              `json:"metric_designator"` // "21", "35"
	Conductors int              `json:"conductors"`
	Area       tables.Figure    `json:"area"`         // of all conductors
	Limit      tables.Figure    `json:"limit"`        // area that may be filled
	Percent    tables.Figure    `json:"fill_percent"` // of the inside area
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
	sizes, err := e.RacewaySizes(r)
	if err != nil {
		return Filled{}, err
	}
	rule := &necFill
	if e.Code() == tables.CEC {
		rule = &cecFill
	}
	f := Filled{Raceway: r}
	var areas []tables.Figure
	var diameter tables.Figure
	for _, p := range pulls {
		d, area, err := e.ConductorDimensions(p.Insulation, p.Size)
		if bare := e.BareArea(p.Size); p.Bare && !bare.IsZero() {
			area, err = bare, nil
		}
		if err != nil {
			return Filled{}, err
		}
		areas = append(areas, tables.ProductOf(strconv.Itoa(p.Count)+" of "+p.Size.String(), e, rule, area, tables.Whole("conductors", tables.Plain, p.Count)))
		f.Conductors += p.Count
		if p.Count == 3 && !p.Bare {
			diameter = d
		}
	}
	if f.Conductors == 0 {
		return Filled{}, &tables.InputError{Field: "wiring.raceway", Want: "at least one conductor to pull into it"}
	}
	f.Area = tables.SumOf("area of the conductors", e, rule, areas...)
	for _, s := range sizes {
		if s.Metric < leastMetric {
			continue
		}
		limit := s.Limit(f.Conductors, nipple)
		if limit.IsZero() {
			limit = s.Limit(f.Conductors, false)
		}
		if f.Area.Cmp(limit) > 0 {
			continue
		}
		f.Trade, f.Metric, f.Limit = s.Trade, s.Metric, limit
		f.Percent = tables.PercentOf("fill", e, rule, f.Area, s.Area)
		if !diameter.IsZero() {
			if ratio := s.Diameter.Float() / diameter.Float(); ratio >= 2.8 && ratio <= 3.2 && e.Code() == tables.NEC && f.Conductors == 3 {
				f.Cautions = append(f.Cautions, tables.Caution{Text: "three conductors of this size may jam in this raceway while they are pulled", Cite: necJam.In(e)})
			}
		}
		return f, nil
	}
	return Filled{}, &tables.NoSizeError{Field: "wiring.raceway", Need: f.Area, Cite: rule.In(e), Constraint: "no trade size of " + r.Name() + " is large enough"}
}
