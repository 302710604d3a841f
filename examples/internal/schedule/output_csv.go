package schedule

import (
	"encoding/csv"
	"io"
	"strconv"
	"strings"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/tables"
)

// A cell is a computed column of the CSV output.
type cell[R any] struct {
	name string
	text func(r *R) string
}

// motorCells are the columns of a motor after tag, code and error, in order.
var motorCells = []cell[mc.Result]{
	{"table_current_a", func(r *mc.Result) string { return r.Demand.Table.Text() }},
	{"design_current_a", func(r *mc.Result) string { return r.Demand.Design.Text() }},
	{"overload_current_a", func(r *mc.Result) string { return r.Demand.Overload.Text() }},
	{"locked_rotor_a", func(r *mc.Result) string { return r.Demand.LockedRotor.High.Text() }},
	{"branch_min_ampacity_a", func(r *mc.Result) string { return r.Branch.Required.Text() }},
	{"branch_conductor", func(r *mc.Result) string { return r.Branch.Size.Name() }},
	{"branch_sets", func(r *mc.Result) string { return sets(&r.Branch) }},
	{"branch_ampacity_a", func(r *mc.Result) string { return r.Branch.Ampacity.Text() }},
	{"motor_supply_min_ampacity_a", func(r *mc.Result) string { return r.MotorSupply.Required.Text() }},
	{"motor_supply_conductor", func(r *mc.Result) string { return r.MotorSupply.Size.Name() }},
	{"secondary_min_ampacity_a", func(r *mc.Result) string { return r.Secondary.Required.Text() }},
	{"secondary_conductor", func(r *mc.Result) string { return r.Secondary.Size.Name() }},
	{"overload_max_a", func(r *mc.Result) string { return r.Overload.Limit.Text() }},
	{"overload_start_max_a", func(r *mc.Result) string { return r.Overload.StartLimit.Text() }},
	{"device", func(r *mc.Result) string { return r.ShortCircuit.Device.String() }},
	{"device_limit_a", func(r *mc.Result) string { return r.ShortCircuit.Limit.Text() }},
	{"device_rating_a", func(r *mc.Result) string { return r.ShortCircuit.Rating.Text() }},
	{"device_start_limit_a", func(r *mc.Result) string { return r.ShortCircuit.StartLimit.Text() }},
	{"device_start_rating_a", func(r *mc.Result) string { return r.ShortCircuit.StartRating.Text() }},
	{"instantaneous_max_a", func(r *mc.Result) string { return r.ShortCircuit.Instantaneous.Text() }},
	{"disconnect_min_a", func(r *mc.Result) string { return r.Disconnect.Amperes.Text() }},
	{"disconnect_min_hp", func(r *mc.Result) string { return r.Disconnect.Horsepower.Text() }},
	{"bonding_conductor", func(r *mc.Result) string { return r.Bonding.Size.Name() }},
	{"raceway", func(r *mc.Result) string { return r.Raceway.Name(r.Circuit.Edition) }},
	{"raceway_fill_percent", func(r *mc.Result) string { return r.Raceway.Percent.Text() }},
	{"drop_running_percent", func(r *mc.Result) string { return r.Drop.Running.Text() }},
	{"drop_starting_percent", func(r *mc.Result) string { return r.Drop.Starting.Text() }},
	{"fault_at_motor_ka", func(r *mc.Result) string { return r.FaultDuty.AtMotor.Text() }},
	{"cautions", func(r *mc.Result) string { return cautions(r.Cautions) }},
}

// feederCells are those of a feeder.
var feederCells = []cell[mc.FeederResult]{
	{"feeder_min_ampacity_a", func(r *mc.FeederResult) string { return r.Ampacity.Text() }},
	{"feeder_conductor", func(r *mc.FeederResult) string { return r.Conductors.Size.Name() }},
	{"feeder_sets", func(r *mc.FeederResult) string { return sets(&r.Conductors) }},
	{"feeder_ampacity_a", func(r *mc.FeederResult) string { return r.Conductors.Ampacity.Text() }},
	{"feeder_device_limit_a", func(r *mc.FeederResult) string { return r.Limit.Text() }},
	{"feeder_device_rating_a", func(r *mc.FeederResult) string { return r.Rating.Text() }},
	{"bonding_conductor", func(r *mc.FeederResult) string { return r.Bonding.Size.Name() }},
	{"raceway", func(r *mc.FeederResult) string { return r.Raceway.Name(r.Feeder.Edition) }},
	{"drop_running_percent", func(r *mc.FeederResult) string { return r.Drop.Running.Text() }},
	{"cautions", func(r *mc.FeederResult) string { return cautions(r.Cautions) }},
}

func sets(s *conductor.Selection) string {
	if s.IsZero() {
		return ""
	}
	return strconv.Itoa(s.Sets)
}

func cautions(list []tables.Caution) string {
	texts := make([]string, len(list))
	for i, c := range list {
		texts[i] = c.String()
	}
	return strings.Join(texts, " | ")
}

// A csvOutput writes one line for each motor and, after a blank line and a
// header of their own, one for each feeder.
type csvOutput struct {
	to    io.Writer
	w     *csv.Writer
	cells []string
}

func newCSVOutput(w io.Writer) output { return &csvOutput{to: w, w: csv.NewWriter(w)} }

func (o *csvOutput) begin(passed []string) error { return writeHeader(o, motorCells, passed) }

func (o *csvOutput) row(a *answer[mc.Result]) error { return writeCells(o, motorCells, a) }

func (o *csvOutput) end(_, _ int) error {
	o.w.Flush()
	return o.w.Error()
}

func (o *csvOutput) beginFeeders(passed []string) error {
	if _, err := io.WriteString(o.to, "\n"); err != nil {
		return err
	}
	return writeHeader(o, feederCells, passed)
}

func (o *csvOutput) feeder(a *answer[mc.FeederResult]) error { return writeCells(o, feederCells, a) }

func (o *csvOutput) endFeeders(sized, failed int) error { return o.end(sized, failed) }

func writeHeader[R any](o *csvOutput, cells []cell[R], passed []string) error {
	o.cells = append(o.cells[:0], "tag", "code", "error")
	for _, c := range cells {
		o.cells = append(o.cells, c.name)
	}
	return o.w.Write(append(o.cells, passed...))
}

func writeCells[R any](o *csvOutput, cells []cell[R], a *answer[R]) error {
	o.cells = append(o.cells[:0], a.tag, a.code, strings.Join(a.faults, "; "))
	for _, c := range cells {
		text := ""
		if len(a.faults) == 0 {
			text = c.text(&a.result)
		}
		o.cells = append(o.cells, text)
	}
	return o.w.Write(append(o.cells, a.passed...))
}
