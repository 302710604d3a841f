// Package schema makes JSON Schemas (draft 2020-12) of the library's types, and
// holds JSON against them. Only tests use it: the schemas are files beside the
// packages that own the types.
package schema

import (
	"bytes"
	"encoding"
	"encoding/json"
	"fmt"
	"reflect"
	"strings"

	"github.com/shopspring/decimal"

	"example.org/motorcircuit/tables"
)

const (
	module  = "example.org/motorcircuit"
	dialect = "https://json-schema.org/draft/2020-12/schema"
)

// A Comment returns what the source says of a type, or of a field of it; of the
// type itself where the field is "".
type Comment func(t reflect.Type, field string) string

// Generate returns the schema document of each package, by its path, of the types
// given and all that they hold.
func Generate(comment Comment, types ...reflect.Type) map[string][]byte {
	g := generator{comment: comment, defs: map[string]*object{}, done: map[reflect.Type]bool{}}
	for _, t := range types {
		g.schemaOf(t)
	}
	files := map[string][]byte{}
	for path, defs := range g.defs {
		doc := object{{"$schema", dialect}, {"$id", idOf(path)}, {"$defs", *defs}}
		files[path] = doc.pretty()
	}
	return files
}

// idOf is the identifier of a package's document.
func idOf(path string) string { return "https://" + path + "/schema.json" }

type generator struct {
	comment Comment
	defs    map[string]*object // by package path
	done    map[reflect.Type]bool
}

// schemaOf returns the schema of a value: a reference for a type with a name.
func (g *generator) schemaOf(t reflect.Type) object {
	switch {
	case t == reflect.TypeFor[decimal.Decimal]():
		return object{{"type", "string"}, {"pattern", `^-?[0-9]+(\.[0-9]+)?$`}}
	case t.Kind() == reflect.Slice:
		return object{{"type", "array"}, {"items", g.schemaOf(t.Elem())}}
	case t.PkgPath() == "":
		return object{{"type", map[reflect.Kind]string{reflect.String: "string", reflect.Int: "integer", reflect.Bool: "boolean"}[t.Kind()]}}
	}
	name := nameOf(t)
	if !g.done[t] {
		g.done[t] = true
		defs := g.defs[t.PkgPath()]
		if defs == nil {
			defs = &object{}
			g.defs[t.PkgPath()] = defs
		}
		at := len(*defs)
		*defs = append(*defs, pair{name, nil}) // keeps its place before what it holds
		def := g.define(t)
		(*defs)[at].value = append(object{{"description", g.comment(t, "")}}, def...)
	}
	return object{{"$ref", idOf(t.PkgPath()) + "#/$defs/" + name}}
}

// nameOf is the name of a type's definition; the quantities are instances of one.
func nameOf(t reflect.Type) string {
	for name, q := range quantities {
		if q == t {
			return name
		}
	}
	return t.Name()
}

var quantities = map[string]reflect.Type{
	"Current": reflect.TypeFor[tables.Current](), "Temperature": reflect.TypeFor[tables.Temperature](), "Ratio": reflect.TypeFor[tables.Ratio](),
}

// define returns the definition of a type with a name.
func (g *generator) define(t reflect.Type) object {
	if t == reflect.TypeFor[tables.Figure]() {
		return g.figure()
	}
	if text, ok := texts[nameOf(t)]; ok && t.Implements(reflect.TypeFor[encoding.TextMarshaler]()) {
		return text
	}
	if t.Kind() == reflect.Uint8 {
		return object{{"type", "string"}, {"enum", enumOf(t)}}
	}
	if t.Kind() != reflect.Struct {
		panic(fmt.Sprintf("no schema of a %v", t))
	}
	var properties object
	var required []string
	for i := range t.NumField() {
		f := t.Field(i)
		name, options, _ := strings.Cut(f.Tag.Get("json"), ",")
		if name == "" || name == "-" {
			continue
		}
		s := g.schemaOf(f.Type)
		if options == "" {
			required = append(required, name)
			if s[0].value == "array" { // one of nothing is written as null
				s[0].value = []string{"array", "null"}
			}
		}
		if text := g.comment(t, f.Name); text != "" {
			s = append(object{{"description", text}}, s...)
		}
		properties = append(properties, pair{name, s})
	}
	def := object{{"type", "object"}, {"properties", properties}}
	if len(required) > 0 {
		def = append(def, pair{"required", required})
	}
	return append(def, pair{"additionalProperties", false})
}

// enumOf lists the texts of an enumeration; that of the zero value too, which may
// be "", but of an edition, which has no default.
func enumOf(t reflect.Type) (texts []string) {
	for i := range 100 {
		v := reflect.New(t).Elem()
		v.SetUint(uint64(i))
		text, err := v.Interface().(encoding.TextMarshaler).MarshalText()
		switch {
		case err != nil || i > 0 && len(text) == 0:
			return texts
		case i == 0 && t == reflect.TypeFor[tables.Edition]():
		default:
			texts = append(texts, string(text))
		}
	}
	return texts
}

// figure is what a figure writes of itself: null where it is absent.
func (g *generator) figure() object {
	text := object{{"type", "string"}}
	return object{{"type", []string{"object", "null"}}, {"properties", object{
		{"name", append(object{{"description", "what the number is"}}, text...)},
		{"value", object{{"description", "exactly; a string, so that no reader rounds it"}, {"type", "string"}, {"pattern", `^-?[0-9]+(\.[0-9]+)?$`}}},
		{"unit", append(object{{"description", "of the value; none for a plain number"}}, g.schemaOf(reflect.TypeFor[tables.Unit]())...)},
		{"op", append(object{{"description", "the way in which it came about"}}, g.schemaOf(reflect.TypeFor[tables.Op]())...)},
		{"how", append(object{{"description", "how it was worked out, in one line"}}, text...)},
		{"cites", object{{"description", "the rules and tables that it rests on, the deciding one first"}, {"type", "array"}, {"items", g.schemaOf(reflect.TypeFor[tables.Citation]())}}},
	}}, {"required", []string{"name", "value", "op", "how"}}, {"additionalProperties", false}}
}

// texts are the types that write themselves as text of many forms. "" is not given.
var texts = map[string]object{
	"Current":     number(`^([0-9]*\.?[0-9]+( ?A)?)?$`),
	"Temperature": number(`^(-?[0-9]*\.?[0-9]+( ?°C)?)?$`),
	"Ratio":       number(`^([0-9]*\.?[0-9]+)?$`),
	"Size":        number(`^((#|[Nn][Oo]\. ?)?[0-9]+(\.[0-9]+)?(/0)?( ?([Aa][Ww][Gg]|[Kk][Cc][Mm][Ii][Ll]|[Mm][Cc][Mm]|mm²|mm2))?)?$`),
	"Length":      {{"type", "string"}, {"pattern", `^([0-9]*\.?[0-9]+ ?(m|ft))?$`}},
	"Power":       {{"type", "string"}, {"pattern", `^(([0-9]+[- ])?[0-9]+/[0-9]+ ?([Hh][Pp]|[Kk][Ww])|[0-9]*\.?[0-9]+ ?([Hh][Pp]|[Kk][Ww]))?$`}},
	"Citation":    {{"type", "string"}},
}

// number is a quantity, which may be read from a number too.
func number(pattern string) object {
	return object{{"type", []string{"string", "number"}}, {"pattern", pattern}}
}

// An object is a JSON object whose keys keep their order.
type object []pair

type pair struct {
	key   string
	value any
}

// MarshalJSON writes the keys in their order.
func (o object) MarshalJSON() ([]byte, error) {
	var b bytes.Buffer
	b.WriteByte('{')
	for i, p := range o {
		if i > 0 {
			b.WriteByte(',')
		}
		key, err := json.Marshal(p.key)
		if err != nil {
			return nil, err
		}
		b.Write(append(key, ':'))
		if err := plain(&b, p.value); err != nil {
			return nil, err
		}
	}
	b.WriteByte('}')
	return b.Bytes(), nil
}

// plain writes a value without the escapes that HTML would need.
func plain(b *bytes.Buffer, v any) error {
	e := json.NewEncoder(b)
	e.SetEscapeHTML(false)
	return e.Encode(v)
}

// pretty returns the object as a file.
func (o object) pretty() []byte {
	var b, pretty bytes.Buffer
	if err := plain(&b, o); err != nil {
		panic(err)
	}
	if err := json.Indent(&pretty, b.Bytes(), "", "  "); err != nil {
		panic(err)
	}
	return pretty.Bytes()
}
