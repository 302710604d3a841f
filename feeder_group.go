package motorcircuit

import (
	"cmp"
	"slices"
	"strings"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/protection"
	"example.org/motorcircuit/tables"
)

// A member is a motor of a group with what the sums need of it.
type member struct {
	index   int // in the feeder's circuits
	rank    int // in order of current
	tag     string
	result  Result
	fc      FeederCircuit
	current tables.Figure // full-load current: table or nameplate, drive input
	base    tables.Figure // its part in the sum: the current, or the ampacity for its duty
	device  tables.Figure // what its branch device counts for in the feeder's
	rotor   tables.Figure // locked-rotor current, for the disconnecting means
}

// continuous reports a motor that may count 125 percent: of continuous duty, or
// behind a drive, which runs on whatever the motor does. Equipment marked with
// its own ampacity has the 125 percent in that.
func (m *member) continuous() bool {
	x := &m.result.Circuit.Motor
	return (x.Duty.Kind == motor.Continuous || x.Starting == motor.Drive) && x.Nameplate.MinimumAmpacity.IsZero()
}

// member works out what a sized circuit counts for.
func (r *FeederResult) member(i int, fc FeederCircuit, one Result) (member, error) {
	e, d := r.Feeder.Edition, &one.Demand
	m := member{index: i, tag: memberTag(i, fc.Circuit.Tag), result: one, fc: fc, current: d.Design, rotor: one.Disconnect.LockedRotor}
	onDrive := fc.Circuit.Motor.Starting == motor.Drive
	if onDrive { // 430.122(D): the drive's input stands for the motor
		m.current = d.Input
		if fc.Circuit.Motor.Bypass {
			m.current = tables.LargestOf("current", e, &feederDrive, d.Input, d.Design)
		}
	}
	if input := fc.Circuit.Motor.Nameplate.RectifierInput; !input.IsZero() { // 430.22(A): the line feeds the rectifier
		m.current = input.Figure("rated input current of the rectifier")
	}
	m.base = m.current
	if !m.continuous() {
		m.base = d.Branch
	}
	if m.rotor.IsZero() {
		m.rotor = m.current
	}
	return m, m.branchDevice(r, e)
}

// memberTag names a motor that has no tag by its place.
func memberTag(i int, tag string) string {
	if tag == "" {
		return "circuit " + itoa(i+1)
	}
	return tag
}

// branchDevice finds what the motor's branch device counts for: under the NEC
// the rating that is allowed, under the CEC the calculated limit. One that has
// no rating counts as the feeder's own kind of device.
func (m *member) branchDevice(r *FeederResult, e tables.Edition) error {
	x := m.result.ShortCircuit
	if x.Device == protection.InstantaneousBreaker {
		var err error
		if x, err = protection.SizeShortCircuit(e, r.Device, m.result.Circuit.Motor, m.result.Demand); err != nil {
			return err
		}
		m.device = x.Limit // the table's percent, not rounded up: 430.62(A) Exception No. 1
		return nil
	}
	switch nec := e.Code() == tables.NEC; {
	case nec && m.fc.HardStart && !x.StartRating.IsZero():
		m.device = x.StartRating
	case nec:
		m.device = x.Rating
	case m.fc.HardStart && !x.StartLimit.IsZero():
		m.device = x.StartLimit
	default:
		m.device = x.Limit
	}
	return nil
}

// A group is the motors and other loads that share a feeder.
type group struct {
	edition           tables.Edition
	members           []member
	continuous, other tables.Figure
	running           [][]*member // every set that can run together, on the line of most load
}

// An interlock is a group of which one alternative runs at a time.
type interlock struct {
	name string
	sets [][]*member
}

// maxCombinations bounds the sets of motors that are compared.
const maxCombinations = 4096

// plan puts the members into a fixed order, which makes the answer independent
// of theirs, and lists the sets of motors that can run together on a line.
func (g *group) plan() error {
	slices.SortStableFunc(g.members, func(a, b member) int {
		return cmp.Or(b.current.Cmp(a.current), b.base.Cmp(a.base), b.device.Cmp(a.device), strings.Compare(a.tag, b.tag), cmp.Compare(a.index, b.index))
	})
	for i := range g.members {
		g.members[i].rank = i
	}
	free, locked, err := g.interlocks()
	if err != nil {
		return err
	}
	combinations := [][]*member{free}
	for _, lock := range locked {
		if len(combinations)*len(lock.sets) > maxCombinations {
			return &tables.InputError{Field: "circuits", Value: lock.name, Want: "interlocks with at most 4096 combinations in all"}
		}
		var next [][]*member
		for _, base := range combinations {
			for _, set := range lock.sets {
				next = append(next, append(slices.Clone(base), set...))
			}
		}
		combinations = next
	}
	for _, all := range combinations {
		slices.SortFunc(all, func(a, b *member) int { return cmp.Compare(a.rank, b.rank) })
		all = onceADrive(all)
		for _, line := range g.lineNames() {
			g.running = append(g.running, onLine(all, line))
		}
	}
	return nil
}

// onceADrive counts a drive that feeds several of the motors once.
func onceADrive(all []*member) []*member {
	seen := map[string]bool{}
	var kept []*member
	for _, m := range all {
		if name := m.fc.DriveGroup; name != "" {
			if seen[name] {
				continue
			}
			seen[name] = true
		}
		kept = append(kept, m)
	}
	return kept
}

// interlocks parts the members that always may run from those of interlocks, and
// checks that the motors of one drive name one input current.
func (g *group) interlocks() (free []*member, locked []interlock, err error) {
	drives := map[string]*member{}
	for i := range g.members {
		m := &g.members[i]
		if name := m.fc.DriveGroup; name != "" {
			first, counted := drives[name]
			switch {
			case m.result.Circuit.Motor.Starting != motor.Drive:
				return nil, nil, &CircuitError{m.index, m.fc.Circuit.Tag, &tables.InputError{Field: "drive_group", Value: name, Want: `only for a motor of starting "drive"`}}
			case counted && first.current.Cmp(m.current) != 0:
				return nil, nil, &CircuitError{m.index, m.fc.Circuit.Tag, &tables.InputError{Field: "motor.nameplate.drive_input_amperes", Value: m.current.String(), Want: first.current.String() + ", as for the other motors of drive " + name}}
			case !counted:
				drives[name] = m
			}
		}
		if m.fc.Interlock == "" {
			free = append(free, m)
			continue
		}
		at := slices.IndexFunc(locked, func(x interlock) bool { return x.name == m.fc.Interlock })
		if at < 0 {
			locked, at = append(locked, interlock{name: m.fc.Interlock}), len(locked)
		}
		lock := &locked[at]
		set := slices.IndexFunc(lock.sets, func(s []*member) bool {
			return m.fc.Alternative != "" && s[0].fc.Alternative == m.fc.Alternative
		})
		if set < 0 {
			lock.sets = append(lock.sets, []*member{m})
		} else {
			lock.sets[set] = append(lock.sets[set], m)
		}
	}
	return free, locked, nil
}

// lineNames are the lines of the feeder that can differ in load.
func (g *group) lineNames() []string {
	for i := range g.members {
		if g.members[i].fc.Lines != "" {
			return []string{"A", "B", "C"}
		}
	}
	return []string{""}
}

// onLine returns the motors that load a line.
func onLine(all []*member, line string) []*member {
	if line == "" {
		return all
	}
	var on []*member
	for _, m := range all {
		if m.fc.Lines == "" || strings.Contains(m.fc.Lines, line) {
			on = append(on, m)
		}
	}
	return on
}

// conductors returns how many conductors a set of the feeder has, and how many of
// them count as carrying current. Lines that single-phase motors name are lines
// of the feeder; a motor to neutral brings a neutral, which counts beside one or
// two lines and not beside three, whose loads balance.
func (g *group) conductors() (pulled, carrying int) {
	system := systemOf(g.members).result.Circuit.Motor
	lines, named, neutral := 0, "", false
	for i := range g.members {
		m := &g.members[i]
		x := m.result.Circuit.Motor
		lines = max(lines, x.LineConductors())
		for _, line := range []string{"A", "B", "C"} {
			if strings.Contains(m.fc.Lines, line) && !strings.Contains(named, line) {
				named += line
			}
		}
		lower := x.PhaseCount() == 1 && systemVolts(x.Voltage) < systemVolts(system.Voltage)
		neutral = neutral || len(m.fc.Lines) == 1 || lower
	}
	if lines == 2 && named != "" { // single-phase motors alone: the lines that they name
		lines = len(named)
	}
	if !neutral {
		return lines, lines
	}
	if lines >= 3 {
		return lines + 1, lines
	}
	return lines + 1, lines + 1
}

// checkVoltages reports circuits whose voltage no one feeder can have: all must
// be of one system, or single-phase to its neutral.
func checkVoltages(members []member) (faults []error) {
	if len(members) == 0 {
		return nil
	}
	most := systemOf(members)
	system := most.result.Circuit.Motor
	for _, m := range members {
		x := m.result.Circuit.Motor
		if x.Rectifier != motor.NoRectifier {
			continue // fed with alternating current of a voltage that is not given
		}
		same := systemVolts(x.Voltage) == systemVolts(system.Voltage) && (x.PhaseCount() == 0) == (system.PhaseCount() == 0) && (x.PhaseCount() == 2) == (system.PhaseCount() == 2)
		if same || x.PhaseCount() == 1 && systemVolts(x.Voltage) == 120 && (systemVolts(system.Voltage) == 208 || systemVolts(system.Voltage) == 240) && system.PhaseCount() != 0 {
			continue
		}
		faults = append(faults, &CircuitError{m.index, m.fc.Circuit.Tag, &tables.InputError{Field: "motor.voltage", Value: itoa(x.Voltage),
			Want: "the system of the feeder, which " + most.tag + " has at " + itoa(system.Voltage) + " V"}})
	}
	return faults
}

// systemOf returns the member whose motor names the feeder's system: of most
// phases, then of most volts, and by tag where they are alike.
func systemOf(members []member) member {
	most := members[0]
	for _, m := range members[1:] {
		a, b := m.result.Circuit.Motor, most.result.Circuit.Motor
		if cmp.Or(cmp.Compare(a.PhaseCount(), b.PhaseCount()), cmp.Compare(systemVolts(a.Voltage), systemVolts(b.Voltage)), cmp.Compare(a.Voltage, b.Voltage), strings.Compare(most.tag, m.tag)) > 0 {
			most = m
		}
	}
	return most
}

// systemVolts returns the nominal system that a motor voltage belongs to.
func systemVolts(volts int) int {
	for _, s := range []struct{ low, high, nominal int }{{110, 120, 120}, {200, 208, 208}, {220, 240, 240}, {440, 480, 480}, {550, 600, 600}} {
		if s.low <= volts && volts <= s.high {
			return s.nominal
		}
	}
	return volts
}
