package schedule

import (
	"errors"
	"io"

	mc "example.org/motorcircuit"
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
	for broken == nil {
		var r *row[motorRow]
		if r, broken = s.next(); r == nil {
			break
		}
		a := sizeMotor(r)
		n.count(a.faults)
		if feeders != nil && broken == nil {
			feeders.note(r, len(a.faults) == 0)
		}
		if err := out.row(a); err != nil {
			return n.failed, broken, err
		}
		p.report(n.sized + n.failed)
	}
	if broken == io.EOF {
		broken = nil
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
	a := &answer[mc.Result]{entry: r.entry}
	if !r.broken {
		result, err := mc.Size(r.value.Circuit)
		r.faults.judge(err)
		if len(r.faults.list) == 0 {
			a.result, a.code = result, r.value.Edition.String()
		}
	}
	a.faults = r.faults.texts()
	return a
}
