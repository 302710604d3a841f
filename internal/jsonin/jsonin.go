// Package jsonin decodes JSON into Go values, strictly, and tells all faults at
// once, each with its path: what encoding/json stops at, or leaves out.
package jsonin

import (
	"bytes"
	"encoding"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"reflect"
	"strconv"
	"strings"

	"example.org/motorcircuit/tables"
)

// Decode reads one JSON document into the value that into points to: structs by
// their json tags, slices, strings, whole numbers, booleans, and types that read
// their own text, which may be written as a number too ("10.4" or 10.4, exactly).
// null is "not given". Faults are joined: each a [*tables.InputError] with the path
// of its field, such as "motor.nameplate.windings[1].amperes"; unknown and repeated
// keys are faults. A syntax error stands alone.
func Decode(data []byte, into any) error {
	d := decoder{json.NewDecoder(bytes.NewReader(data)), nil}
	d.UseNumber()
	err := d.value("", reflect.ValueOf(into).Elem())
	if err == nil {
		if _, err = d.Token(); err == io.EOF {
			return errors.Join(d.faults...)
		} else if err == nil {
			err = errors.New("more follows after the document")
		}
	}
	if err == io.EOF {
		err = io.ErrUnexpectedEOF
	}
	return fmt.Errorf("JSON, near byte %d: %w", d.InputOffset(), err)
}

type decoder struct {
	*json.Decoder
	faults []error
}

// mostFaults is how many faults are told: input that is of something else altogether
// would bring as many as it has keys.
const mostFaults = 100

func (d *decoder) fault(path, value, want string) {
	switch n := len(d.faults); {
	case n == mostFaults:
		path, value, want = "", "", "fewer faults than these: the rest is not told"
	case n > mostFaults:
		return
	}
	if path == "" {
		path = "document"
	}
	const most = 40
	if len(value) > most {
		value = strings.ToValidUTF8(value[:most], "") + "..."
	}
	d.faults = append(d.faults, &tables.InputError{Field: path, Value: value, Want: want})
}

// value reads the next value. It returns errors of syntax only.
func (d *decoder) value(path string, v reflect.Value) error {
	token, err := d.Token()
	if err != nil || token == nil {
		return err
	}
	if reader, ok := v.Addr().Interface().(encoding.TextUnmarshaler); ok {
		return d.text(path, token, reader)
	}
	switch v.Kind() {
	case reflect.Struct:
		if token == json.Delim('{') {
			return d.object(path, v)
		}
		return d.wrong(path, token, "an object")
	case reflect.Slice:
		if token == json.Delim('[') {
			return d.list(path, v)
		}
		return d.wrong(path, token, "a list")
	case reflect.String:
		if s, ok := token.(string); ok {
			v.SetString(s)
			return nil
		}
		return d.wrong(path, token, "text")
	case reflect.Bool:
		if b, ok := token.(bool); ok {
			v.SetBool(b)
			return nil
		}
		return d.wrong(path, token, "true or false")
	case reflect.Int:
		if n, ok := token.(json.Number); ok {
			if i, err := strconv.ParseInt(n.String(), 10, 32); err == nil {
				v.SetInt(i)
				return nil
			}
		}
		return d.wrong(path, token, "a whole number")
	}
	return fmt.Errorf("%s: a %v cannot be decoded", path, v.Type())
}

// text reads a value that reads its own text.
func (d *decoder) text(path string, token json.Token, reader encoding.TextUnmarshaler) error {
	var text string
	switch t := token.(type) {
	case string:
		text = t
	case json.Number:
		text = t.String()
	default:
		return d.wrong(path, token, "text")
	}
	err := reader.UnmarshalText([]byte(text))
	var input *tables.InputError
	switch {
	case errors.As(err, &input):
		d.fault(path, input.Value, input.Want)
	case err != nil:
		d.fault(path, text, err.Error())
	}
	return nil
}

// wrong tells a value of a wrong type, and reads past it.
func (d *decoder) wrong(path string, token json.Token, want string) error {
	value := fmt.Sprint(token)
	if delim, ok := token.(json.Delim); ok {
		value = map[json.Delim]string{'{': "an object", '[': "a list"}[delim]
		d.fault(path, value, want)
		return d.skip(1)
	}
	d.fault(path, value, want)
	return nil
}

// skip reads past so many open objects and lists; of none, past one value.
func (d *decoder) skip(open int) error {
	for {
		token, err := d.Token()
		if err != nil {
			return err
		}
		switch token {
		case json.Delim('{'), json.Delim('['):
			open++
		case json.Delim('}'), json.Delim(']'):
			open--
		}
		if open <= 0 {
			return nil
		}
	}
}

func (d *decoder) object(path string, v reflect.Value) error {
	fields := fieldsOf(v.Type())
	seen := map[string]bool{}
	for d.More() {
		token, err := d.Token()
		if err != nil {
			return err
		}
		key := token.(string)
		at := within(path, key)
		field, known := fields.index[key]
		switch {
		case !known:
			d.fault(at, key, "one of "+strings.Join(fields.names, ", "))
		case seen[key]:
			d.fault(at, key, "each key once")
		default:
			seen[key] = true
			if err := d.value(at, v.Field(field)); err != nil {
				return err
			}
			continue
		}
		if err := d.skip(0); err != nil {
			return err
		}
	}
	_, err := d.Token()
	return err
}

// within returns the path of a key, which may be any text.
func within(path, key string) string {
	if len(key) > 60 {
		key = strings.ToValidUTF8(key[:60], "") + "..."
	}
	if path == "" {
		return key
	}
	return path + "." + key
}

func (d *decoder) list(path string, v reflect.Value) error {
	for i := 0; d.More(); i++ {
		v.Set(reflect.Append(v, reflect.Zero(v.Type().Elem())))
		if err := d.value(path+"["+strconv.Itoa(i)+"]", v.Index(i)); err != nil {
			return err
		}
	}
	_, err := d.Token()
	return err
}

// fields are the fields of a struct by their names in JSON.
type fields struct {
	names []string
	index map[string]int
}

func fieldsOf(t reflect.Type) fields {
	f := fields{index: map[string]int{}}
	for i := range t.NumField() {
		name, _, _ := strings.Cut(t.Field(i).Tag.Get("json"), ",")
		if name != "" && name != "-" {
			f.names = append(f.names, name)
			f.index[name] = i
		}
	}
	return f
}
