package schema

import (
	"encoding/json"
	"fmt"
	"reflect"
	"regexp"
	"slices"
	"strconv"
	"strings"
)

// Documents are schema documents, by their identifiers.
type Documents map[string]map[string]any

// Read reads schema documents.
func Read(files ...[]byte) (Documents, error) {
	d := Documents{}
	for _, file := range files {
		var doc map[string]any
		if err := json.Unmarshal(file, &doc); err != nil {
			return nil, err
		}
		id, _ := doc["$id"].(string)
		d[id] = doc
	}
	return d, nil
}

// Validate holds JSON against the definition of a name in a package's document. It
// returns what is wrong, each with the path in the JSON.
func (d Documents) Validate(path, name string, text []byte) ([]string, error) {
	var v any
	if err := json.Unmarshal(text, &v); err != nil {
		return nil, err
	}
	c := validation{docs: d}
	c.validate("", map[string]any{"$ref": idOf(path) + "#/$defs/" + name}, v)
	return c.wrong, nil
}

type validation struct {
	docs  Documents
	wrong []string
}

func (c *validation) add(path, format string, args ...any) {
	c.wrong = append(c.wrong, fmt.Sprintf("%s: ", path)+fmt.Sprintf(format, args...))
}

// validate holds a value against a schema, by the keywords that the library's
// schemas use: another one is wrong, so that nothing goes unchecked.
func (c *validation) validate(path string, schema map[string]any, v any) {
	for keyword, want := range schema {
		switch keyword {
		case "description", "additionalProperties": // the latter with properties
		case "$ref":
			c.refer(path, want.(string), v)
		case "type":
			if !slices.ContainsFunc(list(want), func(t any) bool { return isType(v, t.(string)) }) {
				c.add(path, "%v is not of type %v", v, want)
			}
		case "enum":
			if !slices.ContainsFunc(want.([]any), func(w any) bool { return reflect.DeepEqual(w, v) }) {
				c.add(path, "%v is none of %v", v, want)
			}
		case "pattern":
			if s, ok := v.(string); ok && !regexp.MustCompile(want.(string)).MatchString(s) {
				c.add(path, "%q does not match %v", s, want)
			}
		case "items":
			if items, ok := v.([]any); ok {
				for i, item := range items {
					c.validate(path+"["+strconv.Itoa(i)+"]", want.(map[string]any), item)
				}
			}
		case "required":
			if o, ok := v.(map[string]any); ok {
				for _, key := range want.([]any) {
					if _, ok := o[key.(string)]; !ok {
						c.add(path, "%v is missing", key)
					}
				}
			}
		case "properties":
			c.properties(path, want.(map[string]any), schema["additionalProperties"] != false, v)
		default:
			c.add(path, "the schema has a keyword that is not known here: %s", keyword)
		}
	}
}

func (c *validation) properties(path string, properties map[string]any, more bool, v any) {
	o, ok := v.(map[string]any)
	if !ok {
		return
	}
	for key, value := range o {
		s, ok := properties[key].(map[string]any)
		switch {
		case ok:
			c.validate(path+"."+key, s, value)
		case !more:
			c.add(path, "%s is no property of it", key)
		}
	}
}

// refer follows a reference: document, then a path within it.
func (c *validation) refer(path, ref string, v any) {
	id, within, _ := strings.Cut(ref, "#/")
	var at any = c.docs[id]
	for _, key := range strings.Split(within, "/") {
		o, _ := at.(map[string]any)
		at = o[key]
	}
	if s, ok := at.(map[string]any); ok {
		c.validate(path, s, v)
		return
	}
	c.add(path, "the schemas have no %s", ref)
}

func list(v any) []any {
	if all, ok := v.([]any); ok {
		return all
	}
	return []any{v}
}

func isType(v any, name string) bool {
	switch x := v.(type) {
	case nil:
		return name == "null"
	case bool:
		return name == "boolean"
	case string:
		return name == "string"
	case float64:
		return name == "number" || name == "integer" && x == float64(int64(x))
	case []any:
		return name == "array"
	}
	return name == "object"
}
