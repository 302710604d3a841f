package schedule

import (
	"errors"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/tables"
)

// A tally counts answers.
type tally struct{ sized, failed int }

func (t *tally) count(faults []string) {
	if len(faults) > 0 {
		t.failed++
	} else {
		t.sized++
	}
}

// answerAll answers the motors, then the feeders if there are any to answer. It
// returns how many failed.
func answerAll(s *sheet[motorRow], feeders *feederList, out output, p progress) (failed int, err error) {
	failed, broken, err := answerMotors(s, feeders, out, p)
	if feeders != nil && err == nil {
		var more int
		more, err = answerFeeders(feeders, out)
		failed += more
	}
	return failed, errors.Join(broken, err)
}

// answerMotors answers row by row and keeps no result; what the feeders need of
// a row is noted. It returns how many failed, what broke off the reading, and
// what the writing.
func answerMotors(s *sheet[motorRow], feeders *feederList, out output, p progress) (failed int, broken, err error) {
	if err := out.begin(s.passedNames()); err != nil {
		return 0, nil, err
	}
	var n tally
	broken, err = s.each(p, func(r *row[motorRow], whole bool) error {
		a := sizeMotor(r)
		n.count(a.faults)
		if feeders != nil && whole {
			feeders.note(r, len(a.faults) == 0)
		}
		return out.row(a)
	})
	if err != nil {
		return n.failed, broken, err
	}
	if feeders != nil && broken != nil {
		feeders.breakOff(broken)
	}
	return n.failed, broken, out.end(n.sized, n.failed)
}

// answerFeeders answers the feeders. It returns how many failed.
func answerFeeders(feeders *feederList, out output) (failed int, err error) {
	if err := out.beginFeeders(feeders.sheet.passedNames()); err != nil {
		return 0, err
	}
	var n tally
	err = feeders.answers(func(a *answer[mc.FeederResult]) error {
		n.count(a.faults)
		return out.feeder(a)
	})
	if err != nil {
		return n.failed, err
	}
	return n.failed, out.endFeeders(n.sized, n.failed)
}

// sizeMotor answers a row of the schedule.
func sizeMotor(r *row[motorRow]) *answer[mc.Result] {
	return answerTo(r, func(m *motorRow) (mc.Result, tables.Edition, error) {
		result, err := mc.Size(m.Circuit)
		return result, m.Edition, err
	})
}

// answerTo answers a row by what the library makes of it.
func answerTo[T, R any](r *row[T], ask func(*T) (R, tables.Edition, error)) *answer[R] {
	a := &answer[R]{entry: r.entry}
	if !r.broken {
		result, code, err := ask(&r.value)
		r.faults.judge(err)
		if len(r.faults.list) == 0 {
			a.result, a.code = result, code.String()
		}
	}
	a.faults = r.faults.texts()
	return a
}
