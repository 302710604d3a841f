package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

var (
	necInterrupting = tables.Rule{Ref: "110.9", Mark: tables.MarkC}
	cecInterrupting = tables.Rule{Ref: "Rule 14-012", Mark: tables.MarkC}
	carriesLoad     = tables.Rule{Outside: true, Ref: "common practice", Mark: tables.MarkC, Note: "a device carries the current of its load"}
	necCarries      = tables.Rule{Ref: "430.52(B)", Mark: tables.MarkC, Note: "it must carry the starting current, and so the full-load current at the least"}
)

// device judges the short-circuit device.
func (k *checker) device() (err error) {
	c, in, x := &k.r.Circuit, k.in.Device, &k.r.ShortCircuit
	*x, err = protection.SizeShortCircuit(k.edition, c.device(), c.Motor, k.r.Demand)
	if k.unsuited(c, err) { // by a use of the motor, which its kind does not tell
		*x, err = protection.SizeShortCircuit(k.edition, c.device(), c.Motor, k.r.Demand)
	}
	if err != nil {
		return err
	}
	rating := claim{code: DeviceRating, part: "device.rating_amperes", found: in.Rating.Figure("rating of the device")}
	setting := claim{code: InstantaneousSetting, part: "device.instantaneous_amperes", found: in.Instantaneous.Figure("instantaneous-trip setting")}
	switch most := (ceiling{limit: x.Limit, start: x.StartLimit, confirmed: k.in.HardStart, over: Violation}); {
	case k.misplaced:
		k.skip("device.rating_amperes", "a device of its kind may not protect the motor")
	case x.Device == protection.InstantaneousBreaker:
		if !in.Rating.IsZero() {
			k.skip(rating.part, "of an instantaneous-trip breaker the setting is limited")
		}
		k.atMost(setting, most)
	default:
		most.limit, most.start = greater(x.Limit, x.Rating), greater(x.StartLimit, x.StartRating)
		if c.Motor.Use == motor.FirePump { // a least device, which the next standard rating meets
			most = ceiling{limit: x.Rating, over: Violation}
		}
		k.atMost(rating, most)
		k.carries(rating)
		k.atMost(setting, ceiling{limit: x.Instantaneous, over: Violation})
	}
	k.interrupts(in.Interrupting, c.Fault)
	return nil
}

// greater returns the greater of two figures, such as a calculated limit and the
// standard rating that the code lets stand, which may be above or below it.
func greater(a, b tables.Figure) tables.Figure {
	if b.Cmp(a) > 0 {
		return b
	}
	return a
}

// carries judges whether the device carries the motor's current: of a fire pump
// with its rotor locked.
func (k *checker) carries(rating claim) {
	rating.code = DeviceCarries
	switch {
	case rating.found.IsZero():
	case k.r.Circuit.Motor.Use == motor.FirePump:
		k.atLeast(rating, k.r.ShortCircuit.Limit, Violation)
	default:
		rule := &carriesLoad
		if k.edition.Code() == tables.NEC {
			rule = &necCarries
		}
		rating.cites = []tables.Citation{rule.In(k.edition)}
		k.atLeast(rating, k.r.lineCurrent(), Caution)
	}
}

// interrupts judges the interrupting rating of a device.
func (k *judge) interrupts(rating, fault tables.Current) {
	rule := &necInterrupting
	if k.edition.Code() == tables.CEC {
		rule = &cecInterrupting
	}
	c := claim{code: InterruptingRating, part: "device.interrupting_amperes", found: rating.Figure("interrupting rating")}
	if fault.IsZero() && !rating.IsZero() {
		k.skip(c.part, "no fault current is given")
		return
	}
	k.atLeast(c, fault.Figure("fault current").As("fault current at the source", k.edition, rule), Violation)
}

// switches judges the disconnecting means and the controller.
func (k *checker) switches() error {
	m, d := k.r.Circuit.Motor, k.r.Demand
	k.r.Disconnect = protection.SizeDisconnect(k.edition, m, d)
	k.r.Controller = protection.SizeController(k.edition, m, d)
	x, y, in := k.r.Disconnect, &k.r.Controller, k.in.Disconnect
	if suited := in.Unfused || k.edition.Code() == tables.CEC; suited && !x.ByPower.IsZero() && in.Horsepower.Unit() == x.Horsepower.Unit() && in.Horsepower.Cmp(x.Horsepower) >= 0 {
		k.skip("disconnecting_means.amperes", "a switch of the motor's horsepower needs no such ampere rating ("+x.ByPower.String()+")")
		in.Amperes, x.Amperes = tables.Current{}, tables.Figure{}
	}
	k.rated("disconnecting_means", in, x.Amperes, x.LockedRotor, x.Horsepower, x.Cite)
	k.rated("controller", k.in.Controller, y.Amperes, y.LockedRotor, y.Horsepower, y.Cite)
	return nil
}

// rated judges the ratings of a switch.
func (k *judge) rated(part string, in Switch, amperes, rotor tables.Figure, horsepower tables.Power, cite tables.Citation) {
	k.atLeast(claim{code: SwitchAmperes, part: part + ".amperes", found: in.Amperes.Figure("ampere rating")}, amperes, Violation)
	power := claim{code: SwitchHorsepower, part: part + ".horsepower", found: in.Horsepower.Figure("horsepower rating"), cites: []tables.Citation{cite}}
	if !in.Horsepower.IsZero() && !horsepower.IsZero() && in.Horsepower.Unit() != horsepower.Unit() {
		k.skip(power.part, "given in "+in.Horsepower.Unit().String()+" and asked for in "+horsepower.Unit().String()+": powers are not converted")
	} else {
		k.atLeast(power, horsepower.Figure("least horsepower rating"), Violation)
	}
	k.atLeast(claim{code: SwitchLockedRotor, part: part + ".locked_rotor_amperes", found: in.LockedRotor.Figure("locked-rotor rating")}, rotor, Violation)
}

// bonding judges the bonding conductor by the device that stands.
func (k *checker) bonding() error {
	if k.r.Branch.IsZero() {
		k.skip("bonding", noConductors)
		return nil
	}
	x := &k.r.ShortCircuit
	rating := x.Rating
	if !rating.IsZero() && !k.misplaced { // an instantaneous trip has none
		rating = k.counted(k.in.Device.Rating, rating, x.Limit, x.StartLimit, x.StartRating)
	}
	material := k.r.Branch.Material
	if k.in.Bonding.Size != 0 {
		material = k.in.Bonding.Material
	}
	err := k.r.bonding(k.r.Circuit, rating, material)
	return k.bonded(k.in.Bonding, &k.r.Bonding, err)
}

// counted returns the rating by which the bonding conductor is judged: that of the
// device that stands, if it may by any of the ceilings; otherwise the ordinary one.
func (k *judge) counted(given tables.Current, rating tables.Figure, ceilings ...tables.Figure) tables.Figure {
	in, most := given.Figure("rating of the device"), rating
	for _, c := range ceilings {
		most = greater(most, c)
	}
	switch {
	case in.IsZero():
		return rating
	case in.Cmp(most) > 0:
		k.cautions.add(tables.Caution{Text: "the bonding conductor is judged by a device of " + rating.String() + ", since the one that is installed, of " + in.String() + ", may not stand"})
		return rating
	}
	return in
}

// bonded judges a bonding conductor against the least one.
func (k *judge) bonded(in BondingConductors, least *conductor.Bonding, err error) error {
	var missing *tables.NotTabulatedError
	if errors.As(err, &missing) {
		k.skip("bonding", missing.Error())
		return nil
	}
	if err != nil {
		return err
	}
	c := claim{code: BondingSize, part: "bonding", found: in.Size.Figure("bonding conductor of " + in.Size.String() + " " + in.Material.String()), cites: least.Row.Citations()}
	k.atLeast(c, least.Size.Figure("least bonding conductor, "+least.Size.String()+" "+least.Material.String()+" "+least.Why), Violation)
	return nil
}

// raceways judges the raceway and the flexible connection at the motor.
func (k *checker) raceways() error {
	w := &k.r.Circuit.Wiring
	bonding := k.r.Bonding.Size
	if k.in.Bonding.Size != 0 {
		bonding = k.in.Bonding.Size
	}
	pulls := pullsOf(&k.r.Branch, k.r.Circuit.Motor.LineConductors(), bonding)
	if err := k.filled("raceway", w.Raceway, k.in.Raceway, pulls); err != nil {
		return err
	}
	return k.filled("flexible", w.Flexible, k.in.Flexible, pulls)
}

// filled judges how full a raceway is.
func (k *judge) filled(part string, kind tables.Raceway, in InstalledRaceway, pulls []conductor.Pull) error {
	switch {
	case kind == 0 && in.Trade == "":
		return nil
	case in.Trade == "":
		k.skip(part, "not given")
		return nil
	case pulls[0].Size == 0 || pulls[1].Size == 0:
		k.skip(part, noConductors)
		return nil
	}
	for _, other := range in.Others {
		if other.Insulation == "" {
			other.Insulation = pulls[0].Insulation
		}
		pulls = append(pulls, other)
	}
	f, err := conductor.RateRaceway(k.edition, kind, in.Trade, false, pulls...)
	var missing *tables.NotTabulatedError
	switch {
	case errors.As(err, &missing) && missing.Field != "trade_size": // an insulation that the tables have no area of
		k.skip(part, missing.Error())
		return nil
	case err != nil:
		return within("installed."+part, err)
	}
	k.atMost(claim{code: RacewayFilled, part: part, found: f.Area.Renamed("area of " + itoa(f.Conductors) + " conductors in " + f.Name(k.edition))}, ceiling{limit: f.Limit, over: Violation})
	for _, jam := range f.Cautions {
		k.say(RacewayJam, part, Caution, jam.Text, jam.Cite)
	}
	return nil
}

// drop judges the voltage drop along the run.
func (k *checker) drop() error {
	c := k.r.Circuit
	if c.Wiring.Length.IsZero() || k.r.Branch.IsZero() {
		k.skip("length", noLength)
		return nil
	}
	err := k.r.drops(c)
	d := &k.r.Drop
	if err := k.dropped(d.Running, d.Limit, c.MaxDrop, err); err != nil || c.Motor.Use != motor.FirePump {
		return err
	}
	k.atMost(claim{code: DropStarting, part: "length", found: d.Starting}, ceiling{limit: pumpStart(k.edition), over: Caution})
	return nil
}

// dropped judges a running drop: a caller's limit binds, the code's figure is told.
func (k *judge) dropped(running, limit tables.Figure, most tables.Ratio, err error) error {
	var missing *tables.NotTabulatedError
	if errors.As(err, &missing) {
		k.skip("length", missing.Error())
		return nil
	}
	if err != nil {
		return err
	}
	c := ceiling{limit: limit, over: Caution}
	if !most.IsZero() {
		c = ceiling{limit: tables.PercentFigure("limit of voltage drop", most), over: Violation}
	}
	k.atMost(claim{code: DropRunning, part: "length", found: running}, c)
	return nil
}
