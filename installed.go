package motorcircuit

import (
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// An Installed is what stands of a motor's branch circuit, for [Check]. Every part
// may be left out: what is not given is not judged.
type Installed struct {
	Branch      Conductors         `json:"branch,omitzero"`              // branch-circuit conductors
	MotorSupply Conductors         `json:"motor_supply,omitzero"`        // run to the motor, where the code treats it apart
	Secondary   Conductors         `json:"secondary,omitzero"`           // wound-rotor secondary conductors
	Resistor    Conductors         `json:"resistor,omitzero"`            // conductors to resistors apart from the controller
	Windings    []InstalledWinding `json:"windings,omitempty"`           // of a multispeed motor, in the order of its nameplate
	Overload    InstalledOverload  `json:"overload,omitzero"`            // overload protection of the motor
	Device      InstalledDevice    `json:"device,omitzero"`              // short-circuit and ground-fault device
	Disconnect  Switch             `json:"disconnecting_means,omitzero"` // disconnecting means
	Controller  Switch             `json:"controller,omitzero"`          // controller
	Bonding     BondingConductors  `json:"bonding,omitzero"`             // bonding conductor of each set of conductors
	Raceway     InstalledRaceway   `json:"raceway,omitzero"`             // raceway of each set of conductors
	Flexible    InstalledRaceway   `json:"flexible,omitzero"`            // flexible connection at the motor
	Length      tables.Length      `json:"length,omitzero"`              // of the run, one way; not given is the circuit's
	HardStart   bool               `json:"hard_start,omitzero"`          // the motor will not start under the ordinary limits, so that the higher ones hold
}

// An InstalledFeeder is what stands of a feeder, for [CheckFeeder]. What is not
// given is not judged.
type InstalledFeeder struct {
	Conductors Conductors        `json:"conductors,omitzero"`          // feeder conductors
	Device     InstalledDevice   `json:"device,omitzero"`              // short-circuit and ground-fault device
	Disconnect Switch            `json:"disconnecting_means,omitzero"` // disconnecting means of the whole group
	Bonding    BondingConductors `json:"bonding,omitzero"`             // bonding conductor of each set of conductors
	Raceway    InstalledRaceway  `json:"raceway,omitzero"`             // raceway of each set of conductors
	Length     tables.Length     `json:"length,omitzero"`              // of the run, one way; not given is the feeder's
}

// Conductors are the conductors of a run. Their metal, and how they are run, is
// the wiring's of the circuit.
type Conductors struct {
	Size       tables.Size `json:"size,omitzero"`       // AWG or kcmil; zero leaves the run out
	Sets       int         `json:"sets,omitzero"`       // in parallel for each phase, each set in its own raceway, at most [conductor.MaxSets]; zero is 1
	Insulation string      `json:"insulation,omitzero"` // the edition's designation; "" is the wiring's

	// Insulated is what the insulation of motor supply conductors is rated under the
	// CEC; not given is the rating of its designation.
	Insulated tables.Temperature `json:"insulation_rating,omitzero"`
}

// An InstalledWinding is what stands of the circuit to one winding of a multispeed
// motor.
type InstalledWinding struct {
	Conductors Conductors        `json:"conductors,omitzero"` // run to the winding
	Overload   InstalledOverload `json:"overload,omitzero"`   // overload protection of the winding
}

// An InstalledOverload is overload protection as it is set.
type InstalledOverload struct {
	Setting tables.Current `json:"setting_amperes,omitzero"` // current at which it is set to trip
	Heater  tables.Current `json:"heater_amperes,omitzero"`  // rated trip current of its heater
	Units   int            `json:"units,omitzero"`           // number of units
	Share   bool           `json:"share,omitzero"`           // stands inside the delta, or in half of a part winding, and carries its share only
}

// An InstalledDevice is a short-circuit and ground-fault device.
type InstalledDevice struct {
	Kind          tables.Device  `json:"kind,omitzero"`                  // zero is the circuit's
	Rating        tables.Current `json:"rating_amperes,omitzero"`        // ampere rating; for an adjustable breaker its setting
	Instantaneous tables.Current `json:"instantaneous_amperes,omitzero"` // setting of the instantaneous trip
	Interrupting  tables.Current `json:"interrupting_amperes,omitzero"`  // interrupting rating
}

// A Switch is a disconnecting means or a controller: what it is rated.
type Switch struct {
	Amperes     tables.Current `json:"amperes,omitzero"`              // ampere rating
	Horsepower  tables.Power   `json:"horsepower,omitzero"`           // horsepower rating, in the unit that it is marked in
	LockedRotor tables.Current `json:"locked_rotor_amperes,omitzero"` // locked-rotor rating
	Unfused     bool           `json:"unfused,omitzero"`              // a listed unfused motor-circuit switch (NEC 430.110(A) Exception)
}

// BondingConductors are the bonding conductors of a run, one with each set of
// conductors.
type BondingConductors struct {
	Size     tables.Size     `json:"size,omitzero"`     // zero leaves them out
	Material tables.Material `json:"material,omitzero"` // zero is copper
}

// An InstalledRaceway is the raceway of each set of conductors.
type InstalledRaceway struct {
	Type   tables.Raceway   `json:"type,omitzero"`       // zero is the wiring's
	Trade  string           `json:"trade_size,omitzero"` // in inches, "3/4", or the metric designator, "21"; "" leaves the raceway out
	Others []conductor.Pull `json:"others,omitempty"`    // conductors of other circuits in it, of the circuit's own insulation where none is named; those that carry current count in the wiring's Conductors too
}

// AsInstalled returns the circuit as it was designed, for [Check] to judge when
// the motor, the length or the surroundings have changed. Currents of more than six
// places are rounded to the side that stands: settings down, ratings up.
func (r Result) AsInstalled() Installed {
	x := &r.ShortCircuit
	in := Installed{
		Branch: asInstalled(&r.Branch), MotorSupply: asInstalled(&r.MotorSupply), Secondary: asInstalled(&r.Secondary), Resistor: asInstalled(&r.Resistor),
		Overload:   InstalledOverload{Setting: tables.CurrentAtMost(r.Overload.Limit), Units: int(r.Overload.Units.Value().IntPart())},
		Device:     InstalledDevice{Kind: x.Device, Rating: tables.CurrentAtMost(x.Rating), Instantaneous: tables.CurrentAtMost(x.Instantaneous), Interrupting: tables.CurrentAtLeast(r.FaultDuty.Source)},
		Disconnect: switchAsInstalled(r.Disconnect.Amperes, r.Disconnect.LockedRotor, r.Disconnect.Horsepower),
		Controller: switchAsInstalled(r.Controller.Amperes, r.Controller.LockedRotor, r.Controller.Horsepower),
		Bonding:    BondingConductors{Size: r.Bonding.Size, Material: r.Bonding.Material},
		Raceway:    InstalledRaceway{Type: r.Raceway.Raceway, Trade: r.Raceway.Trade},
		Flexible:   InstalledRaceway{Type: r.Flexible.Raceway, Trade: r.Flexible.Trade},
		Length:     r.Circuit.Wiring.Length,
	}
	if x.Device == protection.InstantaneousBreaker { // whose limit is a setting
		in.Device.Instantaneous = tables.CurrentAtMost(x.Limit)
	}
	if least := r.MotorSupply.LeastRating; !least.IsZero() {
		if _, err := r.Circuit.Edition.Insulation(r.MotorSupply.Insulation); err != nil { // hotter than the branch circuit's, of no certain type
			in.MotorSupply.Insulation, in.MotorSupply.Insulated = "", tables.TemperatureOf(least)
		}
	}
	for i := range r.Windings {
		w := InstalledWinding{Conductors: asInstalled(&r.Windings[i])}
		if i < len(r.Overload.Windings) {
			w.Overload.Setting = tables.CurrentAtMost(r.Overload.Windings[i].Limit)
		}
		in.Windings = append(in.Windings, w)
	}
	return in
}

// AsInstalled returns the feeder as it was designed, for [CheckFeeder].
func (r FeederResult) AsInstalled() InstalledFeeder {
	return InstalledFeeder{
		Conductors: asInstalled(&r.Conductors),
		Device:     InstalledDevice{Kind: r.Device, Rating: tables.CurrentAtMost(r.Rating), Interrupting: tables.CurrentAtLeast(r.FaultDuty.Source)},
		Disconnect: switchAsInstalled(r.Disconnect.Amperes, r.Disconnect.LockedRotor, r.Disconnect.Horsepower),
		Bonding:    BondingConductors{Size: r.Bonding.Size, Material: r.Bonding.Material},
		Raceway:    InstalledRaceway{Type: r.Raceway.Raceway, Trade: r.Raceway.Trade},
		Length:     r.Feeder.Wiring.Length,
	}
}

func asInstalled(s *conductor.Selection) Conductors {
	return Conductors{Size: s.Size, Sets: s.Sets, Insulation: s.Insulation}
}

func switchAsInstalled(amperes, rotor tables.Figure, horsepower tables.Power) Switch {
	return Switch{Amperes: tables.CurrentAtLeast(amperes), Horsepower: horsepower, LockedRotor: tables.CurrentAtLeast(rotor)}
}
