package motorcircuit

import (
	"slices"
	"strconv"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// Rules for the sums of a feeder.
var (
	necSeveral      = tables.Rule{Ref: "430.24"}
	necSeveralDuty  = tables.Rule{Ref: "430.24 Exception No. 1"}
	necLoads        = tables.Rule{Ref: "430.24(4)", Note: "continuous load that is not a motor's"}
	necDemand       = tables.Rule{Ref: "430.26"}
	necFeederDevice = tables.Rule{Ref: "430.62(A)"}
	necFeederLoads  = tables.Rule{Ref: "430.63"}
	feederDrive     = tables.Rule{Ref: "430.24", Moved: []tables.Move{{From: tables.NEC2020, Ref: "430.122(D)"}, {From: tables.CEC2021, Ref: "Rule 28-108(1)"}}}
	cecSeveral      = tables.Rule{Ref: "Rule 28-108(1)"}
	cecLoads        = tables.Rule{Ref: "Rule 28-110(1)"}
	cecContinuous   = tables.Rule{Ref: "Rule 8-104", Note: "device and conductors that are not marked for 100 percent"}
	cecDemand       = tables.Rule{Ref: "Rule 28-108(3)"}
	cecFeederDevice = tables.Rule{Ref: "Rule 28-204(1)"}
	cecFeederStart  = tables.Rule{Ref: "Rule 28-204(2)"}
	cecFeederLoads  = tables.Rule{Ref: "Rule 28-204(3)"}
	cecFeederDemand = tables.Rule{Ref: "Rule 28-204(4)"}
)

// ampacity sums the loads of every set that can run together, and takes the
// largest sum: NEC 430.24, CEC Rules 28-108 and 28-110.
func (r *FeederResult) ampacity(g *group) {
	for _, running := range g.running {
		terms, governs := g.terms(running)
		figures := make([]tables.Figure, 0, len(terms))
		for _, t := range terms {
			figures = append(figures, t.Figure)
		}
		if len(figures) == 0 && len(g.loadTerms()) == 0 {
			continue // a line that carries nothing
		}
		total := r.total(g, figures)
		if r.Ampacity.IsZero() || total.Cmp(r.Ampacity) > 0 {
			r.Ampacity, r.Terms, r.Governs, r.NotCounted = total, terms, governs, g.without(running)
		}
	}
	for _, t := range g.loadTerms() {
		r.Terms = append(r.Terms, Term{Figure: t})
	}
}

// without returns the tags of the members that are not in a set, in order.
func (g *group) without(running []*member) (tags []string) {
	for i := range g.members {
		if !slices.Contains(running, &g.members[i]) {
			tags = append(tags, g.members[i].tag)
		}
	}
	slices.Sort(tags)
	return tags
}

// total adds the motors, reduced by a demand factor, and the other loads.
func (r *FeederResult) total(g *group, motors []tables.Figure) tables.Figure {
	e := g.edition
	several, demand := &necSeveral, &necDemand
	if e.Code() == tables.CEC {
		several, demand = &cecSeveral, &cecDemand
	}
	sum := motors
	if !r.Feeder.Demand.IsZero() && len(motors) > 0 {
		all := tables.SumOf("motor load", e, several, motors...)
		sum = []tables.Figure{tables.ProductOf("motor load with the demand factor", e, demand, all, r.Feeder.Demand.Figure("demand factor"))}
	}
	sum = append(sum[:len(sum):len(sum)], g.loadTerms()...)
	if e.Code() == tables.CEC && len(sum) > len(motors) && r.Feeder.Demand.IsZero() {
		several = &cecLoads
	}
	return tables.SumOf("least ampacity of the feeder conductors", e, several, sum...)
}

// loadTerms are the other loads as they count: a continuous one at 125 percent.
func (g *group) loadTerms() []tables.Figure {
	var terms []tables.Figure
	if !g.continuous.IsZero() && g.continuous.Value().Sign() > 0 {
		if g.edition.Code() == tables.CEC {
			most := tables.StatedFigure("of the rating", g.edition, &cecContinuous, tables.Percent, 80, 0)
			terms = append(terms, tables.QuotientOf("other load that is continuous", g.edition, &cecContinuous, g.continuous, most))
		} else {
			terms = append(terms, percent("other load that is continuous", g.edition, &necLoads, g.continuous, 125))
		}
	}
	if !g.other.IsZero() && g.other.Value().Sign() > 0 {
		terms = append(terms, g.other)
	}
	return terms
}

// terms returns each motor's part in the sum, and the tag of the one that the
// 125 percent goes to.
func (g *group) terms(running []*member) (terms []Term, governs string) {
	at := g.governing(running)
	for i, m := range running {
		rule := &necSeveral
		switch {
		case g.edition.Code() == tables.CEC:
			rule = &cecSeveral
		case !m.continuous():
			rule = &necSeveralDuty
		}
		t := Term{Tag: m.tag, Figure: m.base.As(m.tag, g.edition, rule)}
		if i == at {
			t.Figure, governs = percent(m.tag, g.edition, rule, m.current, 125), m.tag
		}
		terms = append(terms, t)
	}
	return terms, governs
}

// governing returns the index of the motor that counts 125 percent, -1 if none
// does. Members stand in order of current, largest first.
//
// CEC: the largest of continuous duty, if there is one. NEC: the largest; where
// that is not of continuous duty, the largest that is, unless the first one's
// ampacity for its duty is the greater (430.24, Exception No. 1).
func (g *group) governing(running []*member) int {
	for i, m := range running {
		if !m.continuous() {
			continue
		}
		if i > 0 && g.edition.Code() == tables.NEC {
			raised := percent(m.tag, g.edition, &necSeveralDuty, m.current, 125)
			if running[0].base.Cmp(raised) >= 0 {
				return -1
			}
		}
		return i
	}
	return -1
}

// device works out the feeder's short-circuit device: NEC 430.62 and 430.63, CEC
// Rule 28-204. It is never rounded up.
func (r *FeederResult) device(g *group) error {
	e := g.edition
	rule, loads := &necFeederDevice, &necFeederLoads
	if e.Code() == tables.CEC {
		rule, loads = &cecFeederDevice, &cecFeederLoads
	}
	extra := g.loadTerms()
	if len(extra) > 0 {
		rule = loads
	}
	for _, running := range g.running {
		limit, largest := g.deviceLimit(running, rule, extra...)
		if r.Limit.IsZero() || limit.Cmp(r.Limit) > 0 {
			r.Limit, r.Largest = limit, largest
		}
	}
	if e.Code() == tables.CEC && !r.Feeder.Demand.IsZero() && r.Limit.Cmp(r.Conductors.Ampacity) > 0 {
		// With a demand factor the conductors' own protection holds, with the step up of Table 13.
		up := e.RatingAtOrAbove(r.Device, r.Conductors.Ampacity, "by the conductors' own protection", &cecFeederDemand)
		if up.IsZero() || up.Cmp(eightHundredAmps) > 0 {
			up = r.Conductors.Ampacity.As("by the conductors' own protection", e, &cecFeederDemand)
		}
		r.Limit = tables.SmallestOf(feederLimitName, e, &cecFeederDemand, r.Limit.Renamed("by the motors"), up)
	}
	if r.Rating = e.RatingAtOrBelow(r.Device, r.Limit, "standard rating of the feeder device", rule); r.Rating.IsZero() {
		if r.Rating = smallestRating(e, r.Device, r.Limit); r.Rating.IsZero() {
			return &tables.NoSizeError{Field: "device", Need: r.Limit, Cite: rule.In(e), Constraint: "no standard rating of a feeder device is at or below it"}
		}
	}
	r.startTogether(g)
	return nil
}

const feederLimitName = "greatest feeder device"

var eightHundredAmps = tables.Whole("rating", tables.Ampere, 800)

// smallestRating is the 15 A that the CEC always allows.
func smallestRating(e tables.Edition, d tables.Device, limit tables.Figure) tables.Figure {
	if e.Code() != tables.CEC {
		return tables.Figure{}
	}
	return e.RatingAtOrAbove(d, limit, "standard rating of the feeder device", &cecFeederDevice)
}

// deviceLimit returns the device of the motor that is allowed the largest, plus
// the currents of the others. Of several that are allowed the same, the one of
// most current counts as the largest. Other loads are added.
func (g *group) deviceLimit(running []*member, rule *tables.Rule, loads ...tables.Figure) (tables.Figure, string) {
	largest := 0
	for i, m := range running {
		if m.device.Cmp(running[largest].device) > 0 {
			largest = i
		}
	}
	terms := make([]tables.Figure, 0, len(running)+len(loads))
	switch {
	case len(running) == 0 && len(loads) == 0:
		return tables.Whole(feederLimitName, tables.Ampere, 0).As(feederLimitName, g.edition, rule), ""
	case len(running) == 0:
		return tables.SumOf(feederLimitName, g.edition, rule, loads...), ""
	}
	terms = append(terms, running[largest].device.Renamed("device of "+running[largest].tag))
	for i, m := range running {
		if i != largest {
			terms = append(terms, m.current.Renamed(m.tag))
		}
	}
	return tables.SumOf(feederLimitName, g.edition, rule, append(terms, loads...)...), running[largest].tag
}

// startTogether raises the limit for motors that must start together: the
// rating for one motor of their summed current, plus the rest, and not above
// three times the ampacity of the feeder (CEC Rule 28-204(2)).
func (r *FeederResult) startTogether(g *group) {
	if g.edition.Code() != tables.CEC || !r.Feeder.Demand.IsZero() {
		return
	}
	for _, running := range g.running {
		for _, name := range startSets(running) {
			var together, rest []tables.Figure
			var set []*member
			for _, m := range running {
				if m.fc.StartsWith == name {
					together, set = append(together, m.current.Renamed(m.tag)), append(set, m)
				} else {
					rest = append(rest, m.current.Renamed(m.tag))
				}
			}
			if len(together) < 2 {
				continue
			}
			sum := tables.SumOf("current of the motors that start together", g.edition, &cecFeederStart, together...)
			one := r.oneMotor(set, sum)
			if one.IsZero() {
				continue
			}
			terms := append([]tables.Figure{one.Renamed("one motor of " + sum.String())}, rest...)
			limit := tables.SumOf(feederLimitName+" for motors that start together", g.edition, &cecFeederStart, append(terms, g.loadTerms()...)...)
			cap := tables.ProductOf("300 percent of the feeder ampacity", g.edition, &cecFeederStart, r.Conductors.Ampacity, tables.StatedFigure("of the ampacity", g.edition, &cecFeederStart, tables.Percent, 300, 0))
			if limit.Cmp(cap) > 0 {
				limit = tables.SmallestOf(limit.Name(), g.edition, &cecFeederStart, limit, cap)
			}
			if limit.Cmp(r.Limit) > 0 && (r.StartLimit.IsZero() || limit.Cmp(r.StartLimit) > 0) {
				r.StartLimit = limit
				r.StartRating = g.edition.RatingAtOrBelow(r.Device, limit, "standard rating for motors that start together", &cecFeederStart)
			}
		}
	}
}

// oneMotor is the device of one motor of the summed current: of the kind and way
// of starting in the set that allows the least.
func (r *FeederResult) oneMotor(set []*member, sum tables.Figure) (least tables.Figure) {
	for _, m := range set {
		x := m.result.Circuit.Motor
		if x.Kind == motor.Hermetic {
			x.Kind = motor.SquirrelCage
		}
		device, err := protection.SizeShortCircuit(r.Feeder.Edition, r.Device, motor.Motor{Kind: x.Kind, Phases: x.Phases, Starting: x.Starting}, motor.Demand{Design: sum})
		if err == nil && (least.IsZero() || device.Limit.Cmp(least) < 0) {
			least = device.Limit
		}
	}
	return least
}

// startSets returns the names of the sets that start together, in order.
func startSets(running []*member) (names []string) {
	seen := map[string]bool{"": true}
	for _, m := range running {
		if name := m.fc.StartsWith; !seen[name] {
			seen[name] = true
			names = append(names, name)
		}
	}
	return names
}

// percent returns percent × current.
func percent(name string, e tables.Edition, rule *tables.Rule, current tables.Figure, percent int64) tables.Figure {
	return tables.ProductOf(name, e, rule, current, tables.StatedFigure("of the current", e, rule, tables.Percent, percent, 0))
}

func itoa(i int) string { return strconv.Itoa(i) }
