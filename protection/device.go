package protection

import (
	"strconv"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// The kinds of branch-circuit short-circuit and ground-fault device. A
// time-delay Class CC fuse counts as NonTimeDelayFuse.
const (
	NonTimeDelayFuse     = tables.NonTimeDelayFuse
	TimeDelayFuse        = tables.TimeDelayFuse
	InverseTimeBreaker   = tables.InverseTimeBreaker
	InstantaneousBreaker = tables.InstantaneousBreaker
)

// A ShortCircuit is the branch-circuit short-circuit and ground-fault
// protection of a motor. For an instantaneous-trip breaker the limits are
// settings and there is no rating.
type ShortCircuit struct {
	Device        tables.Device    `json:"kind"`                            // of device
	Limit         tables.Figure    `json:"limit"`                           // calculated ceiling: percent times current
	Rating        tables.Figure    `json:"rating,omitzero"`                 // standard rating that the code lets stand
	Half          tables.Figure    `json:"half_limit,omitzero"`             // ceiling of each of two devices, one for each half of a part winding
	Smallest      tables.Figure    `json:"smallest_winding_limit,omitzero"` // ceiling by the smallest winding of a multispeed motor
	StartLimit    tables.Figure    `json:"start_limit,omitzero"`            // ceiling if the motor will not start
	StartRating   tables.Figure    `json:"start_rating,omitzero"`           // standard rating under that ceiling
	Instantaneous tables.Figure    `json:"instantaneous,omitzero"`          // greatest instantaneous-trip setting, where the code limits it
	Cautions      []tables.Caution `json:"-"`
}

// SizeShortCircuit works out the branch-circuit device of a motor. An unknown
// kind of device is a [*tables.InputError]; a limit that no standard rating
// meets is a [*tables.NoSizeError].
func SizeShortCircuit(e tables.Edition, device tables.Device, m motor.Motor, d motor.Demand) (ShortCircuit, error) {
	err := ValidateDevice(e, device, m.Kind)
	if err != nil {
		return ShortCircuit{}, err
	}
	s := ShortCircuit{Device: device}
	if e.Code() == tables.CEC {
		err = s.cec(e, m, d)
	} else {
		err = s.nec(e, m, d)
	}
	if err == nil {
		err = s.heldToMarking(e, m)
	}
	if err != nil {
		return ShortCircuit{}, err
	}
	return s, nil
}

// heldToMarking holds limits and ratings to the maximum device rating marked on
// the equipment or its controller, which wins over every other.
func (s *ShortCircuit) heldToMarking(e tables.Edition, m motor.Motor) error {
	marked := m.Nameplate.MaximumDevice.Figure("marked maximum device rating")
	if marked.IsZero() {
		return nil
	}
	rule := &necMarkedMax
	switch {
	case e.Code() == tables.CEC:
		rule = &cecMarkedMax
	case m.Kind == motor.Hermetic:
		rule = &necCompressorMax
	}
	if m.Use == motor.FirePump && s.Rating.Cmp(marked) > 0 {
		return &tables.NoSizeError{Field: "motor.nameplate.maximum_device_rating", Need: s.Limit, Cite: rule.In(e), Constraint: "the marked maximum of " + marked.String() + " is below what a fire pump's device must carry"}
	}
	limits := []*tables.Figure{&s.Limit, &s.StartLimit, &s.Half, &s.Smallest}
	if s.Device == InstantaneousBreaker { // of a breaker with a rating, that is what is marked, and its trip is always above it
		limits = append(limits, &s.Instantaneous)
	}
	for _, limit := range limits {
		if !limit.IsZero() && limit.Cmp(marked) > 0 {
			*limit = tables.SmallestOf(limit.Name(), e, rule, limit.Renamed("by rule"), marked)
		}
	}
	for _, rating := range []*tables.Figure{&s.Rating, &s.StartRating} {
		if rating.IsZero() || rating.Cmp(marked) <= 0 {
			continue
		}
		if *rating = e.RatingAtOrBelow(s.Device, marked, rating.Name(), rule); rating.IsZero() {
			return noRating(e, s.Device, marked.As("marked maximum device rating", e, rule))
		}
	}
	return nil
}

// ValidateDevice returns an [*tables.InputError] for an unknown kind of device,
// or one that may not protect a motor of that kind.
func ValidateDevice(e tables.Edition, device tables.Device, kind motor.Kind) error {
	if err := e.Check(); err != nil {
		return err
	}
	if !device.IsValid() {
		return &tables.InputError{Field: "device", Value: strconv.Itoa(int(device)), Want: "non_time_delay_fuse, time_delay_fuse, inverse_time_breaker or instantaneous_breaker"}
	}
	rule := necFuseOrBreaker
	if e.Code() == tables.CEC {
		rule = cecCompressor
	}
	if device == InstantaneousBreaker && (kind == motor.Hermetic || kind == motor.Torque && e.Code() == tables.NEC) {
		return &tables.InputError{Field: "device", Value: device.String(), Want: "a fuse or an inverse-time breaker for a " + kind.Name(), Cite: rule.In(e)}
	}
	return nil
}

func (s *ShortCircuit) caution(e tables.Edition, rule *tables.Rule, text string) {
	s.Cautions = append(s.Cautions, tables.Caution{Text: text, Cite: rule.In(e)})
}

// The names of the device figures.
const (
	limitName         = "greatest short-circuit device"
	ratingName        = "standard rating"
	startLimitName    = "greatest short-circuit device if the motor will not start"
	startRatingName   = "standard rating if the motor will not start"
	instantaneousName = "greatest instantaneous-trip setting"
	instantStartName  = "greatest instantaneous-trip setting if the motor will not start"
)

// motorType returns the row of the device tables that a motor stands in.
func motorType(e tables.Edition, m motor.Motor) tables.MotorType {
	switch {
	case m.Kind == motor.DirectCurrent:
		return tables.DirectCurrentType
	case m.Kind == motor.WoundRotor:
		return tables.WoundRotorType
	case m.Kind == motor.Synchronous:
		return tables.SynchronousType
	case m.PhaseCount() == 1:
		return tables.SinglePhaseType
	case efficientDesignB(e, m.Nameplate):
		return tables.EfficientCageType
	}
	return tables.CageType
}

// startLimit returns the ceiling if the motor will not start. Where the percent
// falls for higher ratings, the class of ratings that its own percent reaches
// holds, and otherwise the top of the class below.
func startLimit(e tables.Edition, rule *tables.Rule, device tables.Device, current tables.Figure) tables.Figure {
	var limit tables.Figure
	for _, c := range e.StartCeilings(device, current) {
		f := tables.ProductOf(startLimitName, e, rule, current, c.Percent)
		if !c.Over.IsZero() && f.Cmp(c.Over) <= 0 {
			continue
		}
		if !c.UpTo.IsZero() && f.Cmp(c.UpTo) > 0 {
			f = tables.SmallestOf(startLimitName, e, rule, f, c.UpTo)
		}
		limit = f
	}
	return limit
}

// oneFuse holds one time-delay fuse for both halves of a part winding to 150
// percent, and to the standard rating at or below that or the floor.
func (s *ShortCircuit) oneFuse(e tables.Edition, rule *tables.Rule, d motor.Demand, floor tables.Figure) error {
	s.Limit = percentOf(limitName, e, rule, d.Design, 150, "one time-delay fuse for both halves of the winding")
	s.Rating = e.RatingAtOrBelow(s.Device, s.Limit, ratingName, rule)
	if s.Rating.IsZero() {
		s.Rating = floor
	}
	if s.Rating.IsZero() {
		return noRating(e, s.Device, s.Limit)
	}
	s.StartLimit, s.StartRating = s.Limit.Renamed(startLimitName), s.Rating.Renamed(startRatingName)
	return nil
}

// noRating reports a limit that no standard rating meets.
func noRating(e tables.Edition, device tables.Device, limit tables.Figure) error {
	return &tables.NoSizeError{Field: "device", Need: limit, Cite: limit.Citation(), Constraint: "no standard rating meets it (" + device.Name() + ")"}
}
