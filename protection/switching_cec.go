package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of CSA C22.1, Section 28, for disconnecting means and controllers.
var (
	cecDisconnect     = tables.Rule{Ref: "Rule 28-602(1)"}
	cecDisconnectHerm = tables.Rule{Ref: "Rule 28-714", Mark: tables.MarkB}
	cecDisconnectAt   = tables.Rule{Ref: "Rule 28-602(3)"}
	cecSight          = tables.Rule{Ref: "Rule 28-604"}
	cecController     = tables.Rule{Ref: "Rule 28-500"}
	cecControllerHerm = tables.Rule{Ref: "Rule 28-712", Mark: tables.MarkB}
	cecGeneralUse     = tables.Rule{Ref: "Rule 28-500", Note: "with Rule 14-510", Mark: tables.MarkB}
)

func disconnectCEC(e tables.Edition, m motor.Motor, d motor.Demand) Disconnect {
	x := Disconnect{
		Horsepower: d.Horsepower,
		Sight:      tables.StatedFigure("in sight within", e, &cecSight, tables.Metre, 9, 0).WithNote("within sight of motor, machine and starter"),
	}
	rule := &cecDisconnect
	if m.Kind == motor.Hermetic {
		rule = &cecDisconnectHerm
		x.Sight = tables.StatedFigure("in sight within", e, &cecSight, tables.Metre, 3, 0).WithNote("refrigeration and air-conditioning equipment")
		x.LockedRotor = d.LockedRotor.High.As("locked-rotor current for the switch", e, rule)
	}
	if !x.Horsepower.IsZero() {
		x.Cite = rule.In(e)
	}
	if rule == &cecDisconnect { // a motor-circuit switch by its power, a breaker by its amperes
		x.ByPower = x.Cite
	}
	base := d.Design
	if m.Starting == motor.Drive {
		base = tables.LargestOf("current at the disconnecting means", e, rule, d.Design, d.Input)
	}
	x.Amperes = percentOf(disconnectName, e, rule, base, 115, "")
	limit := int64(50)
	if m.PhaseCount() == 3 {
		limit = 100
	}
	if m.Power.IsHP() && !m.Power.AtMost(limit) {
		x.Cautions = append(x.Cautions, tables.Caution{Text: "at a motor over 100 hp three-phase, or over 50 hp otherwise, a lockable isolating or general-use switch may serve", Cite: cecDisconnectAt.In(e)})
	}
	return x
}

func controllerCEC(e tables.Edition, m motor.Motor, d motor.Demand) Controller {
	x := Controller{Horsepower: d.Horsepower}
	if !x.Horsepower.IsZero() {
		x.Cite = cecController.In(e)
	}
	if m.Kind == motor.Hermetic {
		x.Amperes = d.Design.As("least full-load rating of the controller", e, &cecControllerHerm)
		x.LockedRotor = d.LockedRotor.High.As("least locked-rotor rating of the controller", e, &cecControllerHerm)
		return x
	}
	if m.Kind == motor.Torque {
		x.Amperes = d.Design.As("least continuous rating of the controller", e, &cecController)
		return x
	}
	if m.PhaseCount() == 1 {
		x.GeneralUse = percentOf("least general-use switch", e, &cecGeneralUse, d.Design, 125, "single-phase motor")
	}
	return x
}
