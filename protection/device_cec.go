package protection

import (
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of CSA C22.1, Section 28, for the branch-circuit device. The rating is
// never above the limit, but 15 A is always allowed.
var (
	cecLimit       = tables.Rule{Ref: "Rule 28-200(3)"}
	cecStart       = tables.Rule{Ref: "Rule 28-200(4)"}
	cecFloor       = tables.Rule{Ref: "Rule 28-200(3)", Note: "15 A is always allowed"}
	cecMagnetic    = tables.Rule{Ref: "Rule 28-200(5)"}
	cecInstant     = tables.Rule{Ref: "Rule 28-210"}
	cecMarkedMax   = tables.Rule{Ref: "Rule 28-202"}
	cecCompressor  = tables.Rule{Ref: "Rule 28-708", Mark: tables.MarkB}
	cecSyncDevice  = tables.Rule{Ref: "Table 29", Note: "note on low-speed synchronous motors", Mark: tables.MarkB}
	cecPartWinding = tables.Rule{Ref: "Rule 28-806", Mark: tables.MarkB}
	cecSoft        = tables.Rule{Ref: "Table 29", Note: "soft starters are not listed", Mark: tables.MarkB}
)

func (s *ShortCircuit) cec(e tables.Edition, m motor.Motor, d motor.Demand) error {
	s.caution(e, &cecMarkedMax, "a lower maximum marked on the motor control equipment wins")
	if s.Device == InstantaneousBreaker {
		s.cecInstantaneous(e, m, d)
		s.Limit = s.Instantaneous
		s.caution(e, &cecInstant, "an instantaneous-trip breaker must be part of a combination starter that also gives overload protection")
		return nil
	}
	if m.Kind == motor.Hermetic {
		s.Limit = percentOf(limitName, e, &cecCompressor, d.LockedRotor.High, 50, "")
		s.StartLimit = percentOf(startLimitName, e, &cecCompressor, d.LockedRotor.High, 65, "")
		s.cecRatings(e, &cecCompressor, &cecCompressor)
		return nil
	}
	percent, err := e.DevicePercent(tables.DeviceQuery{Device: s.Device, Motor: motorType(e, m), ReducedVoltage: m.Starting.ReducedVoltage(), Current: d.Design})
	if err != nil {
		return err
	}
	s.Limit = tables.ProductOf(limitName, e, &cecLimit, d.Design, percent)
	s.StartLimit = startLimit(e, &cecStart, s.Device, d.Design)
	s.cecRatings(e, &cecLimit, &cecStart)
	if m.Starting == motor.PartWinding {
		s.Half = percentOf("greatest device for each half of the winding", e, &cecPartWinding, s.Limit, 50, "two devices")
	}
	if m.Starting == motor.PartWinding && s.Device == TimeDelayFuse {
		if err := s.oneFuse(e, &cecPartWinding, d, cecFloorRating(e)); err != nil {
			return err
		}
	}
	if i := smallest(d.Windings); i >= 0 {
		s.Smallest = tables.ProductOf(limitName+" by the smallest winding", e, &cecPartWinding, d.Windings[i].Current, percent)
		s.caution(e, &cecPartWinding, "a run to a winding of less current that the device does not protect has a device of its own")
	}
	if s.Device == InverseTimeBreaker {
		s.cecInstantaneous(e, m, d)
		s.caution(e, &cecMagnetic, "the instantaneous limit binds a breaker whose instantaneous trip is adjusted apart")
	}
	if n := m.Nameplate; m.Kind == motor.Synchronous && n.SpeedRPM > 0 && n.SpeedRPM <= 450 {
		s.caution(e, &cecSyncDevice, "a low-torque synchronous motor of about 450 r/min or less that starts unloaded needs no more than 200 percent")
	}
	if m.Starting == motor.SoftStarter {
		s.caution(e, &cecSoft, "the full-voltage row is taken for a soft starter: the starter's own marking may ask for less")
	}
	return nil
}

// cecRatings takes the standard ratings at or below the limits, and 15 A where
// that is more.
func (s *ShortCircuit) cecRatings(e tables.Edition, limit, start *tables.Rule) {
	floor := cecFloorRating(e)
	s.Rating = atLeast(e, ratingName, e.RatingAtOrBelow(s.Device, s.Limit, ratingName, limit), floor)
	s.StartRating = atLeast(e, startRatingName, e.RatingAtOrBelow(s.Device, s.StartLimit, startRatingName, start), floor)
}

// cecFloorRating is the rating that is always allowed.
func cecFloorRating(e tables.Edition) tables.Figure {
	return tables.StatedFigure("rating that is always allowed", e, &cecFloor, tables.Ampere, 15, 0)
}

func atLeast(e tables.Edition, name string, rating, floor tables.Figure) tables.Figure {
	if rating.IsZero() {
		return floor.As(name, e, &cecFloor)
	}
	return rating
}

// cecInstantaneous returns the greatest instantaneous-trip setting: 1300
// percent of full-load current or 215 percent of a marked locked-rotor current,
// the smaller where both are known, and 15 A always; direct current by power.
func (s *ShortCircuit) cecInstantaneous(e tables.Edition, m motor.Motor, d motor.Demand) {
	ofFullLoad, ofLockedRotor, floor := e.InstantaneousCaps(m.Kind == motor.DirectCurrent, d.Horsepower)
	s.Instantaneous = tables.ProductOf(instantaneousName, e, &cecInstant, d.Design, ofFullLoad)
	if d.LockedRotor.Source == motor.FromNameplate && !ofLockedRotor.IsZero() {
		marked := tables.ProductOf("by locked-rotor current", e, &cecInstant, d.LockedRotor.High, ofLockedRotor)
		s.Instantaneous = s.Instantaneous.Renamed("by full-load current")
		s.Instantaneous = tables.SmallestOf(instantaneousName, e, &cecInstant, s.Instantaneous, marked)
	}
	if !floor.IsZero() {
		s.Instantaneous = tables.RaisedTo(instantaneousName, e, &cecInstant, s.Instantaneous, floor, "need not be set below 15 A")
	}
}
