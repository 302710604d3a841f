package motorcircuit

import (
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A Group is several motors on one branch circuit, behind one short-circuit
// device: NEC 430.53, CEC Rule 28-206.
type Group struct {
	Tag        string           `json:"tag,omitzero"`                    // the caller's name for it, carried through
	Edition    tables.Edition   `json:"edition"`                         // the code in force
	Circuits   []Circuit        `json:"circuits"`                        // the motors; their device is the group's
	Other      tables.Current   `json:"other_load_amperes,omitzero"`     // other load on the circuit
	Device     tables.Device    `json:"device,omitzero"`                 // zero takes a time-delay fuse
	Wiring     conductor.Wiring `json:"wiring,omitzero"`                 // how the branch circuit is run
	Listed     bool             `json:"listed,omitzero"`                 // controllers and overload devices listed for group installation (NEC 430.53(C))
	Machine    bool             `json:"machine,omitzero"`                // machine tool or woodworking machine in robust enclosures (CEC Rule 28-206(c))
	MarkedMost tables.Current   `json:"marked_maximum_amperes,omitzero"` // device marked on the control equipment of the smallest motor (CEC Rule 28-206(b))
}

// A GroupResult is a group sized by [SizeGroup].
type GroupResult struct {
	Group      Group               `json:"group"`      // the input
	Circuits   []Result            `json:"circuits"`   // each motor as if alone, in the order given
	Terms      []Term              `json:"terms"`      // the parts of the least ampacity
	Ampacity   tables.Figure       `json:"ampacity"`   // least ampacity of the branch circuit
	Conductors conductor.Selection `json:"conductors"` // branch-circuit conductors
	Ways       []GroupWay          `json:"ways"`       // each way in which the code allows a group, and whether it does this one
	Cautions   []tables.Caution    `json:"cautions"`   // assumptions, readings, limits; never empty
}

// A GroupWay is one of the ways in which a code allows motors behind one device.
type GroupWay struct {
	Cite    tables.Citation `json:"cite"`            // the rule of the way
	Allowed bool            `json:"allowed"`         // whether it allows this group
	Why     string          `json:"why"`             // what it asks for
	Limit   tables.Figure   `json:"limit,omitzero"`  // greatest device, if it is allowed
	Rating  tables.Figure   `json:"rating,omitzero"` // standard rating at or below the limit
}

// Rules for groups on one branch circuit.
var (
	necGroupSmall    = tables.Rule{Ref: "430.53(A)"}
	necGroupSmallest = tables.Rule{Ref: "430.53(B)"}
	necGroupListed   = tables.Rule{Ref: "430.53(C)"}
	necConductorUp   = tables.Rule{Ref: "240.4(B)", Mark: tables.MarkB}
	cecGroup15       = tables.Rule{Ref: "Rule 28-206(a)"}
	cecGroupSmallest = tables.Rule{Ref: "Rule 28-206(b)"}
	cecGroupMachine  = tables.Rule{Ref: "Rule 28-206(c)"}
)

// SizeGroup works out several motors on one branch circuit: the conductors, and
// for each way that the code has to put motors behind one device whether it
// allows this group and with what device. Errors are as of [SizeFeeder].
func SizeGroup(gr Group) (GroupResult, error) {
	f := Feeder{Tag: gr.Tag, Edition: gr.Edition, Other: gr.Other, Device: gr.Device, Wiring: gr.Wiring}
	for _, c := range gr.Circuits {
		if c.Device == 0 {
			c.Device = f.Device
		}
		f.Circuits = append(f.Circuits, FeederCircuit{Circuit: c})
	}
	fr, members, err := f.begin()
	if err != nil {
		return GroupResult{}, err
	}
	g := f.group(members)
	if err := g.plan(); err != nil {
		return GroupResult{}, err
	}
	fr.ampacity(&g)
	r := GroupResult{Group: gr, Circuits: fr.Circuits, Terms: fr.Terms, Ampacity: fr.Ampacity.Renamed("least ampacity of the branch-circuit conductors")}
	_, carrying := g.conductors()
	if r.Conductors, err = gr.Wiring.Select(gr.Edition, conductor.Load{Ampacity: r.Ampacity, Count: carrying}); err != nil {
		return GroupResult{}, err
	}
	if gr.Edition.Code() == tables.CEC {
		r.Ways = r.waysCEC(&g, fr.Device)
	} else {
		r.Ways = r.waysNEC(&g, fr.Device)
	}
	var list cautionList
	list.add(tables.Caution{Text: "each motor of a group keeps overload protection and a controller of its own, and a tap to a motor has the ampacity that the rules for taps ask for"})
	list.add(r.Conductors.Cautions...)
	list.finish(gr.Edition)
	r.Cautions = list
	return r, nil
}

var (
	sixAmps = tables.Whole("current", tables.Ampere, 6)
)

// smallMotors reports motors of 1 hp and 6 A at the most, each.
func (g *group) smallMotors() bool {
	for i := range g.members {
		m := &g.members[i]
		if p := m.result.Demand.Horsepower; p.IsZero() || !p.AtMost(1) || m.current.Cmp(sixAmps) > 0 {
			return false
		}
	}
	return true
}

// allAt120 reports a group whose motors are all on a circuit of 120 V.
func (g *group) allAt120() bool {
	for i := range g.members {
		if systemVolts(g.members[i].result.Circuit.Motor.Voltage) != 120 {
			return false
		}
	}
	return true
}

// smallestMotor is the member of least current; members stand largest first.
func (g *group) smallestMotor() *member { return &g.members[len(g.members)-1] }

func (r *GroupResult) waysNEC(g *group, d tables.Device) []GroupWay {
	e := g.edition
	way := func(rule *tables.Rule, allowed bool, why string, limit tables.Figure) GroupWay {
		w := GroupWay{Cite: rule.In(e), Allowed: allowed, Why: why}
		if allowed {
			w.Limit, w.Rating = limit, e.RatingAtOrBelow(d, limit, "standard rating of the group's device", rule)
		}
		return w
	}
	small := int64(15)
	if g.allAt120() {
		small = 20
	}
	listed, _ := g.deviceLimit(g.running[0], &necGroupListed)
	if extra := g.loadTerms(); len(extra) > 0 {
		listed = tables.SumOf(feederLimitName, e, &necGroupListed, append([]tables.Figure{listed.Renamed("motors")}, extra...)...)
	}
	listed = listed.Renamed("greatest device of the group")
	ways := []GroupWay{
		way(&necGroupSmall, g.smallMotors(), "each motor of 1 hp and 6 A at the most", tables.StatedFigure("greatest device of small motors", e, &necGroupSmall, tables.Ampere, small, 0)),
		way(&necGroupSmallest, true, "the device does not open in normal service", g.smallestMotor().device.As("greatest device, of the smallest motor "+g.smallestMotor().tag, e, &necGroupSmallest)),
		way(&necGroupListed, r.Group.Listed, "controllers and overload devices listed for group installation", listed),
	}
	if c := &ways[2]; c.Allowed && c.Rating.Cmp(r.Conductors.Ampacity) < 0 {
		if up := e.RatingAtOrAbove(d, r.Conductors.Ampacity, "standard rating of the group's device", &necConductorUp); !up.IsZero() && up.Cmp(eightHundredAmps) <= 0 {
			c.Limit, c.Rating = r.Conductors.Ampacity.As("ampacity of the conductors", e, &necConductorUp), up
		}
	}
	return ways
}

func (r *GroupResult) waysCEC(g *group, d tables.Device) []GroupWay {
	e := g.edition
	sum, _ := g.deviceLimit(g.running[0], &cecFeederDevice)
	way := func(rule *tables.Rule, allowed bool, why string, limit tables.Figure) GroupWay {
		w := GroupWay{Cite: rule.In(e), Allowed: allowed, Why: why}
		if allowed {
			w.Limit = tables.SmallestOf("greatest device of the group", e, rule, sum.Renamed("by Rule 28-204(1)"), limit)
			w.Rating = e.RatingAtOrBelow(d, w.Limit, "standard rating of the group's device", rule)
			if w.Rating.IsZero() { // no standard rating is as low
				w.Allowed, w.Limit = false, tables.Figure{}
			}
		}
		return w
	}
	fifteen := tables.StatedFigure("least device", e, &cecGroup15, tables.Ampere, 15, 0)
	byMarking := r.Group.MarkedMost.Figure("marked on the smallest motor's control equipment")
	if byMarking.IsZero() {
		byMarking = percent("by the smallest motor "+g.smallestMotor().tag, e, &cecGroupSmallest, g.smallestMotor().current, 400)
	}
	most := int64(200)
	if g.members[0].result.Circuit.Motor.Voltage > 250 {
		most = 100
	}
	small := GroupWay{Cite: cecGroup15.In(e), Allowed: g.fifteenDoes(), Why: "a device of 15 A or less"}
	if small.Allowed {
		small.Limit, small.Rating = fifteen, e.RatingAtOrBelow(d, fifteen, "standard rating of the group's device", &cecGroup15)
	}
	return []GroupWay{
		small,
		way(&cecGroupSmallest, true, "not above what the smallest motor's control equipment is marked for, or 400 percent of its current", byMarking),
		way(&cecGroupMachine, r.Group.Machine, "a machine tool or woodworking machine with its control in robust enclosures", tables.StatedFigure("greatest device of a machine", e, &cecGroupMachine, tables.Ampere, most, 0)),
	}
}

// fifteenDoes reports a group whose currents a 15 A device carries.
func (g *group) fifteenDoes() bool {
	var currents []tables.Figure
	for i := range g.members {
		currents = append(currents, g.members[i].current)
	}
	if !g.other.IsZero() {
		currents = append(currents, g.other)
	}
	total := tables.SumOf("currents", g.edition, &cecGroup15, currents...)
	return total.Cmp(tables.Whole("device", tables.Ampere, 15)) <= 0
}
