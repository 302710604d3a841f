package main

import (
	"encoding/csv"
	"io"
	"strconv"
	"strings"

	mc "example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
)

// A cell is a computed column of the CSV output.
type cell struct {
	name string
	text func(r *mc.Result) string // nil for a column that is not worked out yet
}

// computed are the columns after tag, code and error, in order.
var computed = []cell{
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
	{"bonding_conductor", nil},
	{"raceway", nil},
	{"raceway_fill_percent", nil},
	{"drop_running_percent", nil},
	{"drop_starting_percent", nil},
	{"fault_at_motor_ka", nil},
	{"cautions", cautions},
}

func sets(s *conductor.Selection) string {
	if s.IsZero() {
		return ""
	}
	return strconv.Itoa(s.Sets)
}

func cautions(r *mc.Result) string {
	texts := make([]string, len(r.Cautions))
	for i, c := range r.Cautions {
		texts[i] = c.String()
	}
	return strings.Join(texts, " | ")
}

// A csvOutput writes one line for each row.
type csvOutput struct {
	w     *csv.Writer
	cells []string
}

func newCSVOutput(w io.Writer) output { return &csvOutput{w: csv.NewWriter(w)} }

func (o *csvOutput) begin(passed []string) error {
	o.cells = append(o.cells[:0], "tag", "code", "error")
	for _, c := range computed {
		o.cells = append(o.cells, c.name)
	}
	return o.write(passed)
}

func (o *csvOutput) row(a *answer) error {
	o.cells = append(o.cells[:0], a.tag, a.code, strings.Join(a.faults, "; "))
	for _, c := range computed {
		text := ""
		if c.text != nil && len(a.faults) == 0 {
			text = c.text(&a.result)
		}
		o.cells = append(o.cells, text)
	}
	return o.write(a.passed)
}

func (o *csvOutput) end(_, _ int) error {
	o.w.Flush()
	return o.w.Error()
}

func (o *csvOutput) write(passed []string) error {
	return o.w.Write(append(o.cells, passed...))
}
