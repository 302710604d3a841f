package schedule

import (
	"encoding/json"
	"io"
	"strings"

	mc "example.org/motorcircuit"
)

// A jsonOutput writes an array, one element a line: the library's own result
// for a row that was sized, the tag and the error for one that was not. With
// feeders it writes an object of two such arrays.
type jsonOutput struct {
	jsonArray
	feeders bool
}

func (o *jsonOutput) begin([]string) error {
	if o.feeders {
		return o.write(`{"circuits":[`)
	}
	return o.write("[")
}

// badJSON is the tag of an input that was not sized.
type badJSON struct {
	Tag string `json:"tag"`
}

func (o *jsonOutput) row(a *answer[mc.Result]) error {
	if len(a.faults) == 0 {
		return o.element(&a.result)
	}
	return o.element(struct {
		Circuit badJSON `json:"circuit"`
		Error   string  `json:"error"`
	}{badJSON{a.tag}, strings.Join(a.faults, "; ")})
}

func (o *jsonOutput) end(_, _ int) error {
	if o.feeders {
		return nil // closed when the feeders begin
	}
	return o.write("\n]\n")
}

func (o *jsonOutput) beginFeeders([]string) error {
	o.rows = 0
	return o.write("\n],\"feeders\":[")
}

func (o *jsonOutput) feeder(a *answer[mc.FeederResult]) error {
	if len(a.faults) == 0 {
		return o.element(&a.result)
	}
	return o.element(struct {
		Feeder badJSON `json:"feeder"`
		Error  string  `json:"error"`
	}{badJSON{a.tag}, strings.Join(a.faults, "; ")})
}

func (o *jsonOutput) endFeeders(_, _ int) error { return o.write("\n]}\n") }

// A jsonArray writes an array, one element a line.
type jsonArray struct {
	w    io.Writer
	rows int
}

func (o *jsonArray) element(v any) error {
	text, err := json.Marshal(v)
	if err != nil {
		return err
	}
	separator := ",\n"
	if o.rows++; o.rows == 1 {
		separator = "\n"
	}
	return o.write(separator + string(text))
}

func (o *jsonArray) write(text string) error {
	_, err := io.WriteString(o.w, text)
	return err
}
