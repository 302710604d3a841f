package protection

import (
	"strings"

	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

// Rules of NFPA 70, 430.52 and 440.22, for the branch-circuit device. The next
// higher standard rating is allowed for the first limit, never for the second.
var (
	necLimit         = tables.Rule{Ref: "430.52(C)(1)"}
	necNextUp        = tables.Rule{Ref: "430.52(C)(1) Exception No. 1", Moved: []tables.Move{{From: tables.NEC2023, Ref: "430.52(C)(1)(a)"}}}
	necStart         = tables.Rule{Ref: "430.52(C)(1) Exception No. 2", Moved: []tables.Move{{From: tables.NEC2023, Ref: "430.52(C)(1)(b)"}}}
	necInstant       = tables.Rule{Ref: "430.52(C)(3)"}
	necInstantStart  = tables.Rule{Ref: "430.52(C)(3) Exception No. 1", Moved: []tables.Move{{From: tables.NEC2023, Ref: "430.52(C)(3)(b)(2)"}}}
	necCompressorMax = tables.Rule{Ref: "440.22(C)"}
	necWindings      = tables.Rule{Ref: "430.52(C)(4)"}
	necFirePump      = tables.Rule{Ref: "695.4(B)(2)(a)", Mark: tables.MarkB}
	necPartWinding   = tables.Rule{Ref: "430.4"}
	necDriveInstant  = tables.Rule{Ref: "430.130(A)(4)"}
	necMarkedMax     = tables.Rule{Ref: "430.52(C)(2)"}
	necTorqueDevice  = tables.Rule{Ref: "430.52(D)"}
	necFuseOrBreaker = tables.Rule{Ref: "430.52(D), 440.22"}
	necSyncDevice    = tables.Rule{Ref: "Table 430.52", Moved: []tables.Move{{From: tables.NEC2023, Ref: "Table 430.52(C)(1)"}}, Note: "note on low-speed synchronous motors"}

	necCompressor      = tables.Rule{Ref: "440.22(A)"}
	necCompressorUp    = tables.Rule{Ref: "440.22(A) Exception No. 1"}
	necCompressorStart = tables.Rule{Ref: "440.22(A)", Moved: []tables.Move{{From: tables.NEC2023, Ref: "440.22(A) Exception No. 2"}}}
	necCompressorFloor = tables.Rule{Ref: "440.22(A)", Moved: []tables.Move{{From: tables.NEC2023, Ref: "440.22(A) Exception No. 3"}}, Note: "need not be below 15 A"}
)

// efficientDesignB reports a motor whose instantaneous-trip limits are the
// higher ones: Design B energy-efficient and, from 2023, premium efficiency.
func efficientDesignB(e tables.Edition, n motor.Nameplate) bool {
	return strings.EqualFold(n.DesignLetter, "B") &&
		(n.EfficiencyClass == motor.EnergyEfficient || n.EfficiencyClass == motor.PremiumEfficiency && e >= tables.NEC2023)
}

func (s *ShortCircuit) nec(e tables.Edition, m motor.Motor, d motor.Demand) error {
	switch {
	case m.Kind == motor.Torque: // nameplate current, next standard rating up
		s.Limit = d.Design.As(limitName, e, &necTorqueDevice)
		if s.Limit.Cmp(eightHundred) > 0 { // the step up of 240.4(B) ends there
			s.Rating = e.RatingAtOrBelow(s.Device, s.Limit, ratingName, &necTorqueDevice)
			return nil
		}
		return s.nextUp(e, &necTorqueDevice)
	case m.Kind == motor.Hermetic:
		return s.necCompressor(e, d)
	case m.Use == motor.FirePump:
		return s.firePump(e, d)
	case s.Device == InstantaneousBreaker:
		return s.necInstantaneous(e, m, d)
	}
	percent, err := e.DevicePercent(tables.DeviceQuery{Device: s.Device, Motor: motorType(e, m)})
	if err != nil {
		return err
	}
	s.Limit = tables.ProductOf(limitName, e, &necLimit, d.Design, percent)
	if i := smallest(d.Windings); i >= 0 {
		s.Smallest = tables.ProductOf(limitName+" by the smallest winding", e, &necWindings, d.Windings[i].Current, percent)
		s.caution(e, &necWindings, "one device sized by the largest winding asks that each winding has overload protection of its own, conductors that suit the largest and controllers rated for it; otherwise the limit by the smallest winding holds")
	}
	if m.Starting == motor.PartWinding {
		s.Half = percentOf("greatest device for each half of the winding", e, &necPartWinding, s.Limit, 50, "two devices")
		s.caution(e, &necPartWinding, "two devices, one for each half of the winding, are each sized at one-half of these figures; one device for both must let the motor start")
		if s.Device == TimeDelayFuse {
			return s.oneFuse(e, &necPartWinding, d, tables.Figure{})
		}
	}
	if err := s.nextUp(e, &necNextUp); err != nil {
		return err
	}
	s.StartLimit = startLimit(e, &necStart, s.Device, d.Design)
	s.startRating(e, &necStart)
	s.caution(e, &necMarkedMax, "a lower maximum in the overload relay table or marked on the equipment wins")
	if n := m.Nameplate; m.Kind == motor.Synchronous && n.SpeedRPM > 0 && n.SpeedRPM <= 450 {
		s.caution(e, &necSyncDevice, "a low-torque synchronous motor of about 450 r/min or less that starts unloaded needs no more than 200 percent")
	}
	return nil
}

// startRating takes the standard rating at or below the higher ceiling, or the
// ordinary one where the next size up has brought that above the ceiling already.
func (s *ShortCircuit) startRating(e tables.Edition, rule *tables.Rule) {
	s.StartRating = e.RatingAtOrBelow(s.Device, s.StartLimit, startRatingName, rule)
	if s.StartRating.IsZero() || s.StartRating.Cmp(s.Rating) < 0 {
		s.StartRating = s.Rating.As(startRatingName, e, rule).WithNote("which stands above this ceiling already")
		s.caution(e, rule, "the ordinary rating, rounded up, already stands at or above what the higher ceiling allows")
	}
}

// firePump takes the standard rating that carries the locked-rotor current of
// the pump motor for as long as it lasts.
func (s *ShortCircuit) firePump(e tables.Edition, d motor.Demand) error {
	if s.Device == InstantaneousBreaker {
		return &tables.InputError{Field: "device", Value: s.Device.String(), Want: "a fuse or an inverse-time breaker for a fire pump", Cite: necFirePump.In(e)}
	}
	s.Limit = d.LockedRotor.High.As("least short-circuit device", e, &necFirePump)
	if s.Limit.IsZero() {
		return &tables.InputError{Field: "motor.nameplate.locked_rotor_amperes", Want: "the locked-rotor current that the device of a fire pump must carry", Cite: necFirePump.In(e)}
	}
	s.caution(e, &necFirePump, "FIRE PUMP: the device must carry locked-rotor current for as long as it lasts, in an assembly listed for fire pump service; add the full-load currents of the other pump motors and accessories on the circuit; Article 695 and the authority having jurisdiction decide every part of this circuit")
	return s.nextUp(e, &necFirePump)
}

// smallest returns the index of the winding of least current, -1 for none.
func smallest(windings []motor.WindingDemand) int {
	best := -1
	for i, w := range windings {
		if best < 0 || w.Current.Cmp(windings[best].Current) < 0 {
			best = i
		}
	}
	return best
}

// nextUp takes the standard rating at or above the limit.
func (s *ShortCircuit) nextUp(e tables.Edition, rule *tables.Rule) error {
	if s.Rating = e.RatingAtOrAbove(s.Device, s.Limit, ratingName, rule); s.Rating.IsZero() {
		return noRating(e, s.Device, s.Limit)
	}
	return nil
}

// necInstantaneous returns the settings of an instantaneous-trip breaker: 800
// or 1100 percent, raised to 1300 or 1700; direct current 250 percent.
func (s *ShortCircuit) necInstantaneous(e tables.Edition, m motor.Motor, d motor.Demand) error {
	percent, err := e.DevicePercent(tables.DeviceQuery{Device: s.Device, Motor: motorType(e, m)})
	if err != nil {
		return err
	}
	s.Limit = tables.ProductOf(instantaneousName, e, &necInstant, d.Design, percent)
	s.Instantaneous = s.Limit
	if m.Starting == motor.Drive {
		s.caution(e, &necDriveInstant, "ahead of a drive an instantaneous-trip breaker stands only in an assembly listed with the drive")
	}
	s.caution(e, &necInstant, "an instantaneous-trip breaker must be adjustable and part of a listed combination controller")
	if m.Kind == motor.DirectCurrent {
		return nil
	}
	start, note := 1300, "other than Design B energy-efficient"
	if efficientDesignB(e, m.Nameplate) {
		start, note = 1700, "Design B energy-efficient or premium"
	}
	s.StartLimit = percentOf(instantStartName, e, &necInstantStart, d.Design, start, note)
	s.caution(e, &necInstantStart, "the higher setting asks for an engineering evaluation or a trial at the lower one")
	return nil
}

// necCompressor follows 440.22: 175 percent, 225 if it will not start, and 15 A
// always. The next size up is allowed from 2023 on, for the first limit only.
func (s *ShortCircuit) necCompressor(e tables.Edition, d motor.Demand) error {
	floor := tables.StatedFigure("rating that it need not be below", e, &necCompressorFloor, tables.Ampere, 15, 0)
	s.Limit = percentOf(limitName, e, &necCompressor, d.Design, 175, "")
	if e >= tables.NEC2023 {
		if err := s.nextUp(e, &necCompressorUp); err != nil {
			return err
		}
	} else {
		s.Rating = e.RatingAtOrBelow(s.Device, s.Limit, ratingName, &necCompressor)
	}
	if s.Rating.IsZero() || s.Rating.Cmp(floor) < 0 {
		s.Rating = floor.As(ratingName, e, &necCompressorFloor)
	}
	s.StartLimit = percentOf(startLimitName, e, &necCompressorStart, d.Design, 225, "")
	s.startRating(e, &necCompressorStart)
	s.caution(e, &necCompressor, "a maximum device rating marked on the equipment wins")
	return nil
}
