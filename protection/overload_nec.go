package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of NFPA 70, Articles 430 Part III and 440 Part VI, for overload.
var (
	necOverload         = tables.Rule{Ref: "430.32(A)(1)"}
	necOverloadStart    = tables.Rule{Ref: "430.32(C)"}
	necProtector        = tables.Rule{Ref: "430.32(A)(2)"}
	necFirePumpOverload = tables.Rule{Ref: "695.6(C)", Mark: tables.MarkB}
	necOverloadBig      = tables.Rule{Ref: "430.32(A)(4)"}
	necOverloadSmall    = tables.Rule{Ref: "430.32(B), (D)"}
	necOverloadDuty     = tables.Rule{Ref: "430.33"}
	necOverloadShare    = tables.Rule{Ref: "430.32(A)(1)", Note: "device that does not carry the whole motor current"}
	necCompressorOL     = tables.Rule{Ref: "440.52(A)"}
	necEachWinding      = tables.Rule{Ref: "430.32(A)", Note: "each winding connection on its own"}
)

func (o *Overload) nec(e tables.Edition, m motor.Motor, d motor.Demand) {
	if m.Kind == motor.Hermetic {
		o.Limit = percentOf(overloadName, e, &necCompressorOL, d.Overload, 140, "overload relay")
		o.caution(e, &necCompressorOL, "the limit is that of an overload relay: a fuse or inverse-time breaker that serves as overload protection is held to 125 percent")
		return
	}
	// 125 and 140 percent by either marking, 115 and 130 percent otherwise.
	n := m.Nameplate
	base, start, note := 115, 130, "service factor below 1.15 or not marked"
	switch {
	case highService(n):
		base, start, note = 125, 140, "service factor of 1.15 or more"
	case !n.TemperatureRise.IsZero() && n.TemperatureRise.Cmp(risePoint) <= 0:
		base, start, note = 125, 140, "temperature rise of 40 °C or less"
	}
	o.Limit = percentOf(overloadName, e, &necOverload, d.Overload, base, note)
	o.StartLimit = percentOf(overloadStartName, e, &necOverloadStart, d.Overload, start, note)
	o.share(e, &necOverloadShare, m.Starting)
	for _, w := range d.Windings {
		o.Windings = append(o.Windings, WindingLimit{
			Limit:      percentOf(overloadName+" of the winding", e, &necEachWinding, w.Current, base, note),
			StartLimit: percentOf(overloadStartName, e, &necOverloadStart, w.Current, start, note),
		})
	}
	if n.ThermalProtect {
		o.Protector = protector(e, d.Design)
	}
	o.necCautions(e, m)
}

// protector returns the greatest ultimate trip current of a thermal protector:
// 170 percent of the table current to 9 A, 156 to 20 A, 140 above.
func protector(e tables.Edition, current tables.Figure) tables.Figure {
	percent, note := 140, "more than 20 A"
	switch {
	case current.Cmp(nineAmps) <= 0:
		percent, note = 170, "9 A or less"
	case current.Cmp(twentyAmps) <= 0:
		percent, note = 156, "more than 9 A, not more than 20 A"
	}
	return percentOf("greatest ultimate trip current of the thermal protector", e, &necProtector, current, percent, note)
}

var (
	nineAmps   = tables.Whole("current", tables.Ampere, 9)
	twentyAmps = tables.Whole("current", tables.Ampere, 20)
)

func (o *Overload) necCautions(e tables.Edition, m motor.Motor) {
	switch p := m.Power; {
	case p.IsHP() && p.AtMost(1):
		o.caution(e, &necOverloadSmall, "a motor of 1 hp or less may also be protected by a thermal protector, an integral device or its impedance, and one that is not started automatically, not permanently installed and in sight of its controller by the branch-circuit device")
	case p.IsHP() && !p.AtMost(1500):
		o.caution(e, &necOverloadBig, "a motor over 1500 hp is protected by embedded temperature detectors, set for its temperature rise")
	}
	if m.Duty.Kind != motor.Continuous {
		o.caution(e, &necOverloadDuty, "a motor of inherently intermittent duty may rely on the branch-circuit device, if that is not above its table limit")
	}
	if m.Starting == motor.WyeDelta || m.Starting == motor.PartWinding {
		o.caution(e, &necOverloadShare, "the limits are for a device that carries the whole motor current: one inside the delta or in half of the winding is set by the share that it carries")
	}
	if m.Nameplate.Multispeed || len(m.Nameplate.Windings) > 0 {
		o.caution(e, &necEachWinding, "each winding connection has overload protection of its own, set by its own current")
	}
}
