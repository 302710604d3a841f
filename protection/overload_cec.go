package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of CSA C22.1, Section 28, for overload. There is no second step, and a
// temperature rise does not count.
var (
	cecOverload      = tables.Rule{Ref: "Rule 28-306(1)"}
	cecOverloadShare = tables.Rule{Ref: "Rule 28-306(2)", Mark: tables.MarkB}
	cecOverloadSmall = tables.Rule{Ref: "Rule 28-308"}
	cecCompressorOL  = tables.Rule{Ref: "Rule 28-710", Mark: tables.MarkB}
	cecEachWinding   = tables.Rule{Ref: "Rule 28-808", Mark: tables.MarkB}
)

func (o *Overload) cec(e tables.Edition, m motor.Motor, d motor.Demand) {
	if m.Kind == motor.Hermetic {
		o.Limit = percentOf(overloadName, e, &cecCompressorOL, d.Overload, 140, "overload relay")
		o.caution(e, &cecCompressorOL, "the limit is that of an overload relay: other overload devices are held to 125 percent")
		return
	}
	percent, note := 115, "service factor below 1.15 or not marked"
	if highService(m.Nameplate) {
		percent, note = 125, "service factor of 1.15 or more"
	}
	o.Limit = percentOf(overloadName, e, &cecOverload, d.Overload, percent, note)
	o.share(e, &cecOverloadShare, m.Starting)
	for _, w := range d.Windings {
		o.Windings = append(o.Windings, WindingLimit{Limit: percentOf(overloadName+" of the winding", e, &cecEachWinding, w.Current, 125, "")})
	}
	if m.Power.IsHP() && m.Power.AtMost(1) {
		o.caution(e, &cecOverloadSmall, "a motor of 1 hp or less may need no overload device if it is started by hand and attended, or is in an assembly that protects it, or has inherent protection")
	}
	if m.Starting == motor.WyeDelta || m.Starting == motor.PartWinding {
		o.caution(e, &cecOverloadShare, "the limit is for a device that carries the whole motor current: one inside the delta or in half of the winding is set by the share that it carries")
	}
	if m.Nameplate.Multispeed || len(m.Nameplate.Windings) > 0 {
		o.caution(e, &cecEachWinding, "each winding has overload protection of its own, not above 125 percent of its own current")
	}
}
