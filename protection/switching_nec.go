package protection

import (
	"strings"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of NFPA 70 for disconnecting means and controllers.
var (
	necDisconnect       = tables.Rule{Ref: "430.110(A)"}
	necDisconnectTorque = tables.Rule{Ref: "430.110(B)"}
	necDisconnectRotor  = tables.Rule{Ref: "430.110(C)(1)"}
	necDisconnectDrive  = tables.Rule{Ref: "430.128"}
	necDrivePart        = tables.Rule{Ref: "430.130(A)"}
	necDisconnectHerm   = tables.Rule{Ref: "440.12(A)"}
	necDisconnectType   = tables.Rule{Ref: "430.109"}
	necIsolating        = tables.Rule{Ref: "430.109(E)"}
	necSight            = tables.Rule{Ref: "430.102", Mark: tables.MarkB}
	necUnfused          = tables.Rule{Ref: "430.110(A) Exception"}
	necController       = tables.Rule{Ref: "430.83"}
	necControllerTorque = tables.Rule{Ref: "430.83(D)"}
	necControllerHerm   = tables.Rule{Ref: "440.41"}
	necGeneralUse       = tables.Rule{Ref: "430.83(C)"}
)

func disconnectNEC(e tables.Edition, m motor.Motor, d motor.Demand) Disconnect {
	x := Disconnect{
		Horsepower: d.Horsepower,
		Sight:      tables.StatedFigure("in sight within", e, &necSight, tables.Metre, 15, 0).WithNote("visible, and not more than 15 m (50 ft) off"),
	}
	caution := func(rule *tables.Rule, text string) {
		x.Cautions = append(x.Cautions, tables.Caution{Text: text, Cite: rule.In(e)})
	}
	rule, base := &necDisconnect, d.Design
	switch {
	case m.Starting == motor.Drive && m.Bypass: // the line feeds drive or motor
		base = tables.LargestOf("current at the disconnecting means", e, &necDisconnect, d.Input, d.Design)
	case m.Starting == motor.Drive: // in the incoming line of the drive, rated by its input
		rule, base = &necDisconnectDrive, d.Input
		x.Horsepower = tables.Power{}
		caution(&necDrivePart, "the drive maker's marked maximum device and least disconnect win, and the listed drive's own protection of the motor is set from the nameplate")
	case m.Kind == motor.Torque:
		rule = &necDisconnectTorque
	case m.Kind == motor.Hermetic:
		rule = &necDisconnectHerm
	}
	x.Amperes = percentOf(disconnectName, e, rule, base, 115, "")
	if m.Starting != motor.Drive || m.Bypass {
		x.LockedRotor = rotorToBreak(e, m, d)
	}
	if !x.Horsepower.IsZero() {
		x.Cite = necDisconnectType.In(e)
		if m.Kind == motor.Hermetic {
			x.Cite = rule.In(e)
		}
	}
	if rule == &necDisconnect {
		x.ByPower = necUnfused.In(e)
		caution(&necUnfused, "a listed unfused switch rated in horsepower not below the motor's may have a lower ampere rating")
	}
	ac, dc := !m.Power.AtMost(100), !m.Power.AtMost(40)
	if m.Power.IsHP() && (m.Kind == motor.DirectCurrent && dc || m.Kind != motor.DirectCurrent && ac) {
		caution(&necIsolating, "for a motor over 100 hp, or direct-current over 40 hp, a general-use or isolating switch marked not to be operated under load may serve")
	}
	if m.Kind == motor.Torque {
		caution(&necDisconnectType, "a general-use switch may serve a torque motor")
	}
	return x
}

// rotorToBreak is the locked-rotor current by which the NEC rates switches: the
// table's, or for Design A and motors outside of it what is known of the motor.
func rotorToBreak(e tables.Edition, m motor.Motor, d motor.Demand) tables.Figure {
	if m.Kind == motor.Hermetic {
		return d.LockedRotor.High.As("locked-rotor current for the switch", e, &necDisconnectHerm)
	}
	cage := m.Kind == motor.SquirrelCage || m.Kind == motor.SinglePhase
	if cage && !strings.EqualFold(m.Nameplate.DesignLetter, "A") {
		if f, err := e.LockedRotorCurrent(m.PhaseCount(), d.Horsepower, m.Voltage); err == nil {
			return f.As("locked-rotor current for the switch", e, &necDisconnectRotor)
		}
	}
	return d.LockedRotor.High.As("locked-rotor current for the switch", e, &necDisconnectRotor)
}

func controllerNEC(e tables.Edition, m motor.Motor, d motor.Demand) Controller {
	x := Controller{Horsepower: d.Horsepower}
	if !x.Horsepower.IsZero() {
		x.Cite = necController.In(e)
	}
	switch m.Kind {
	case motor.Torque:
		x.Amperes = d.Design.As("least continuous rating of the controller", e, &necControllerTorque)
		return x
	case motor.Hermetic:
		x.Cite = necControllerHerm.In(e)
		x.Amperes = d.Design.As("least full-load rating of the controller", e, &necControllerHerm)
		x.LockedRotor = d.LockedRotor.High.As("least locked-rotor rating of the controller", e, &necControllerHerm)
		return x
	}
	if m.Power.IsHP() && m.Power.AtMost(2) && m.Voltage <= 300 {
		x.GeneralUse = percentOf("least general-use switch", e, &necGeneralUse, d.Design, 200, "stationary motor of 2 hp or less at 300 V or less")
		if m.Kind != motor.DirectCurrent {
			most := tables.StatedFigure("of the switch rating", e, &necGeneralUse, tables.Percent, 80, 0)
			x.SnapSwitch = tables.QuotientOf("least ac-only snap switch", e, &necGeneralUse, d.Design, most)
		}
	}
	x.Cautions = append(x.Cautions, tables.Caution{Text: "an inverse-time breaker or molded-case switch rated in amperes may control any motor", Cite: necController.In(e)})
	return x
}
