package motorcircuit

import (
	"errors"

	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// CheckFeeder holds an installed feeder against the rules that [SizeFeeder] designs
// by; its branch circuits are judged by [Check], one by one. What is not given is
// listed as not judged. Errors are as of [SizeFeeder], and [*tables.InputError] for
// what is installed, with the path in [InstalledFeeder] after "installed.".
func CheckFeeder(f Feeder, in InstalledFeeder) (Report, error) {
	k := feederChecker{judge: newJudge(f.Tag, f.Edition), in: in}
	f = in.stands(f)
	if err := f.Edition.Check(); err != nil {
		return Report{}, err
	}
	k.strip("conductors", in.Conductors, &f.Wiring)
	r, members, err := f.begin()
	if err := errors.Join(err, in.validate(f)); err != nil {
		return Report{}, err
	}
	k.r, k.g = r, f.group(members)
	if err := k.g.plan(); err != nil {
		return Report{}, err
	}
	for _, part := range []func() error{k.conductors, k.device, k.disconnect, k.bonding, k.raceway, k.drop} {
		if err := part(); err != nil {
			return Report{}, err
		}
	}
	return k.finish(k.r.cautions(&k.g)), nil
}

// A feederChecker is a check of a feeder under way.
type feederChecker struct {
	judge
	in   InstalledFeeder
	r    FeederResult
	g    group
	load conductor.Load
}

// stands returns the feeder as it stands, as far as it is described by one.
func (in *InstalledFeeder) stands(f Feeder) Feeder {
	if in.Device.Kind.IsValid() {
		f.Device = in.Device.Kind
	}
	f.Wiring = in.Raceway.stands(f.Wiring, in.Length)
	return f
}

// conductors judges the feeder's conductors. Where they are not given, or may not
// be used, those that SizeFeeder would choose stand in for the rest, if any would.
func (k *feederChecker) conductors() (err error) {
	r, w := &k.r, k.r.Feeder.Wiring
	r.ampacity(&k.g)
	k.load.Ampacity = r.Ampacity
	r.Count, k.load.Count = k.g.conductors()
	if r.Conductors, err = k.run("conductors", w, k.in.Conductors, k.load, nil); err != nil || !r.Conductors.IsZero() {
		return err
	}
	r.Conductors, err = chosen(w.Select(k.edition, k.load))
	return err
}

// device judges the feeder's short-circuit device.
func (k *feederChecker) device() error {
	r, in := &k.r, k.in.Device
	if r.Conductors.IsZero() && k.edition.Code() == tables.CEC { // whose ceilings may go by them
		k.skip("device", noConductors)
		return nil
	}
	if err := r.device(&k.g); err != nil {
		return err
	}
	rating := claim{code: DeviceRating, part: "device.rating_amperes", found: in.Rating.Figure("rating of the device")}
	k.atMost(rating, ceiling{limit: greater(greater(r.Limit, r.Rating), k.byAmpacity()), start: greater(r.StartLimit, r.StartRating), confirmed: true, over: Violation})
	if rating.code, rating.cites = DeviceCarries, []tables.Citation{carriesLoad.In(k.edition)}; !rating.found.IsZero() {
		k.atLeast(rating, r.lineLoad(&k.g).Current, Caution)
	}
	k.atMost(claim{code: InstantaneousSetting, part: "device.instantaneous_amperes", found: in.Instantaneous.Figure("instantaneous-trip setting")}, ceiling{})
	k.interrupts(in.Interrupting, r.Feeder.Fault)
	return nil
}

var necLargerFeeder = tables.Rule{Ref: "430.62(B)"}

// byAmpacity is the greatest device by the ampacity of conductors that are larger than
// the loads ask for, under the NEC; without the step to the next standard rating, and
// of small conductors not above their own limit.
func (k *feederChecker) byAmpacity() tables.Figure {
	s := &k.r.Conductors
	if k.edition.Code() != tables.NEC || s.Ampacity.Cmp(k.r.Ampacity) <= 0 {
		return tables.Figure{}
	}
	return tables.SmallestOf("greatest feeder device, by the ampacity of the conductors", k.edition, &necLargerFeeder, s.Ampacity, s.SmallLimit)
}

// disconnect judges the disconnecting means of the group.
func (k *feederChecker) disconnect() error {
	k.r.Disconnect = k.g.disconnect()
	x := &k.r.Disconnect
	k.rated("disconnecting_means", k.in.Disconnect, x.Amperes, x.LockedRotor, x.Horsepower, x.Cite)
	return nil
}

// bonding judges the bonding conductor of the feeder.
func (k *feederChecker) bonding() error {
	r, w := &k.r, k.r.Feeder.Wiring
	if r.Conductors.IsZero() {
		k.skip("bonding", noConductors)
		return nil
	}
	base, err := bySize(k.edition, w, &r.Conductors, k.load)
	if err != nil {
		return err
	}
	if base, err = bondingBase(k.edition, w, r.Conductors, k.load, base); err != nil {
		return err
	}
	material := r.Conductors.Material
	if k.in.Bonding.Size != 0 {
		material = k.in.Bonding.Material
	}
	r.Bonding, err = conductor.SelectBonding(k.edition, material, k.counted(k.in.Device.Rating, r.Rating, r.Limit, r.StartLimit, r.StartRating), r.Conductors, base)
	return k.bonded(k.in.Bonding, &r.Bonding, err)
}

// raceway judges the raceway of each set.
func (k *feederChecker) raceway() error {
	bonding := k.r.Bonding.Size
	if k.in.Bonding.Size != 0 {
		bonding = k.in.Bonding.Size
	}
	return k.filled("raceway", k.r.Feeder.Wiring.Raceway, k.in.Raceway, pullsOf(&k.r.Conductors, k.r.Count, bonding))
}

// drop judges the voltage drop along the feeder.
func (k *feederChecker) drop() (err error) {
	r, f := &k.r, &k.r.Feeder
	if f.Wiring.Length.IsZero() || r.Conductors.IsZero() {
		k.skip("length", noLength)
		return nil
	}
	r.Drop.Limit = dropLimit(k.edition)
	if r.Drop.Running, err = f.Wiring.RunningDrop(k.edition, r.Conductors, r.lineLoad(&k.g)); err == nil {
		r.totalDrops()
	}
	return k.dropped(r.Drop.Running, r.Drop.Limit, f.MaxDrop, err)
}
