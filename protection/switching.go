package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// A Disconnect is the disconnecting means of a motor circuit: what its switch
// must at least be rated.
type Disconnect struct {
	Amperes     tables.Figure    `json:"amperes"`                  // least ampere rating
	Horsepower  tables.Power     `json:"horsepower,omitzero"`      // least horsepower rating; zero where none follows from the code
	Cite        tables.Citation  `json:"horsepower_cite,omitzero"` // the rule that asks for the horsepower rating
	LockedRotor tables.Figure    `json:"locked_rotor,omitzero"`    // locked-rotor current that the switch must be able to break
	ByPower     tables.Citation  `json:"by_power_cite,omitzero"`   // the rule under which a switch of that horsepower needs no such ampere rating: under the NEC a listed unfused one; zero where there is none
	Sight       tables.Figure    `json:"in_sight"`                 // farthest that "in sight" reaches, in metres
	Cautions    []tables.Caution `json:"-"`
}

// A Controller is the controller of a motor: what it must at least be rated.
type Controller struct {
	Horsepower  tables.Power     `json:"horsepower,omitzero"`         // least horsepower rating; zero where none follows from the code
	Cite        tables.Citation  `json:"horsepower_cite,omitzero"`    // the rule that asks for the horsepower rating
	Amperes     tables.Figure    `json:"amperes,omitzero"`            // least continuous rating, for motors that are not rated in horsepower
	LockedRotor tables.Figure    `json:"locked_rotor,omitzero"`       // least locked-rotor rating, for a hermetic motor-compressor
	GeneralUse  tables.Figure    `json:"general_use_switch,omitzero"` // least rating of a general-use switch that may serve instead; absent if none may
	SnapSwitch  tables.Figure    `json:"snap_switch,omitzero"`        // least rating of an ac-only snap switch that may serve instead; absent if none may
	Cautions    []tables.Caution `json:"-"`
}

// SizeDisconnect works out the least ratings of the disconnecting means; the
// zero Disconnect without an edition.
func SizeDisconnect(e tables.Edition, m motor.Motor, d motor.Demand) Disconnect {
	switch e.Code() {
	case tables.NEC:
		return disconnectNEC(e, m, d)
	case tables.CEC:
		return disconnectCEC(e, m, d)
	}
	return Disconnect{}
}

// SizeController works out the least ratings of the controller; the zero
// Controller without an edition.
func SizeController(e tables.Edition, m motor.Motor, d motor.Demand) Controller {
	switch e.Code() {
	case tables.NEC:
		return controllerNEC(e, m, d)
	case tables.CEC:
		return controllerCEC(e, m, d)
	}
	return Controller{}
}

const disconnectName = "least ampere rating of the disconnecting means"
