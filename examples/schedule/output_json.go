package main

import (
	"encoding/json"
	"io"
	"strings"
)

// A jsonOutput writes an array, one element a line: the library's own result
// for a row that was sized, the tag and the error for one that was not.
type jsonOutput struct {
	w    io.Writer
	rows int
}

func (o *jsonOutput) begin([]string) error {
	_, err := io.WriteString(o.w, "[")
	return err
}

func (o *jsonOutput) row(a *answer) error {
	var element any = &a.result
	if len(a.faults) > 0 {
		type circuit struct {
			Tag string `json:"tag"`
		}
		element = struct {
			Circuit circuit `json:"circuit"`
			Error   string  `json:"error"`
		}{circuit{a.tag}, strings.Join(a.faults, "; ")}
	}
	text, err := json.Marshal(element)
	if err != nil {
		return err
	}
	separator := ",\n"
	if o.rows++; o.rows == 1 {
		separator = "\n"
	}
	_, err = io.WriteString(o.w, separator+string(text))
	return err
}

func (o *jsonOutput) end(_, _ int) error {
	_, err := io.WriteString(o.w, "\n]\n")
	return err
}
