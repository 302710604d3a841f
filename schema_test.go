package motorcircuit_test

import (
	"encoding/json"
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"math/rand/v2"
	"os"
	"path/filepath"
	"reflect"
	"strings"
	"testing"

	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	"example.org/motorcircuit"
	"example.org/motorcircuit/conductor"
	"example.org/motorcircuit/internal/schema"
	"example.org/motorcircuit/internal/testkit"
	"example.org/motorcircuit/motor"
	"example.org/motorcircuit/tables"
)

const modulePath = "example.org/motorcircuit"

// schemaFiles are the schema documents, by the path of the package that owns the
// types.
var schemaFiles = map[string]string{
	modulePath:                 "internal/schema/motorcircuit.json",
	modulePath + "/tables":     "tables/schema.json",
	modulePath + "/motor":      "motor/schema.json",
	modulePath + "/conductor":  "conductor/schema.json",
	modulePath + "/protection": "protection/schema.json",
}

// TestSchemas holds the schema files to the Go types, with the words of the
// comments; -update rewrites them.
func TestSchemas(t *testing.T) {
	files := schema.Generate(comments(t),
		reflect.TypeFor[motorcircuit.Circuit](), reflect.TypeFor[motorcircuit.Result](), reflect.TypeFor[motorcircuit.Quantity](),
		reflect.TypeFor[motorcircuit.Feeder](), reflect.TypeFor[motorcircuit.FeederResult](),
		reflect.TypeFor[motorcircuit.Group](), reflect.TypeFor[motorcircuit.GroupResult](), reflect.TypeFor[motorcircuit.SharedResult](),
		reflect.TypeFor[motorcircuit.Comparison](),
		reflect.TypeFor[motorcircuit.Installed](), reflect.TypeFor[motorcircuit.InstalledFeeder](), reflect.TypeFor[motorcircuit.Report](),
		reflect.TypeFor[motorcircuit.Headroom](), reflect.TypeFor[motorcircuit.FeederHeadroom]())
	require.Len(t, files, len(schemaFiles))
	for path, text := range files {
		described(t, path, text)
	}
	for path, file := range schemaFiles {
		testkit.Golden(t, file, string(files[path]))
	}
}

// described holds that every type and every property says what it is.
func described(t *testing.T, path string, text []byte) {
	t.Helper()
	var doc struct {
		Defs map[string]struct {
			Description string `json:"description"`
			Properties  map[string]struct {
				Description string `json:"description"`
			} `json:"properties"`
		} `json:"$defs"`
	}
	require.NoError(t, json.Unmarshal(text, &doc))
	for name, def := range doc.Defs {
		assert.NotEmpty(t, def.Description, "%s %s", path, name)
		for key, p := range def.Properties {
			assert.NotEmpty(t, p.Description, "%s %s.%s", path, name, key)
		}
	}
}

// comments reads what the source says of types and fields.
func comments(t *testing.T) schema.Comment {
	t.Helper()
	said := map[string]string{}
	words := func(groups ...*ast.CommentGroup) string {
		for _, g := range groups {
			if text := strings.Join(strings.Fields(g.Text()), " "); text != "" {
				return text
			}
		}
		return ""
	}
	for _, dir := range []string{".", "tables", "motor", "conductor", "protection"} {
		entries, err := os.ReadDir(dir)
		require.NoError(t, err)
		path := filepath.ToSlash(filepath.Join(modulePath, dir))
		for _, entry := range entries {
			if name := entry.Name(); entry.IsDir() || !strings.HasSuffix(name, ".go") || strings.HasSuffix(name, "_test.go") {
				continue
			}
			src, err := fs.ReadFile(os.DirFS(dir), entry.Name())
			require.NoError(t, err)
			file, err := parser.ParseFile(token.NewFileSet(), entry.Name(), src, parser.ParseComments|parser.SkipObjectResolution)
			require.NoError(t, err)
			for _, decl := range file.Decls {
				d, ok := decl.(*ast.GenDecl)
				if !ok {
					continue
				}
				for _, spec := range d.Specs {
					s, ok := spec.(*ast.TypeSpec)
					if !ok {
						continue
					}
					name := path + "." + s.Name.Name
					said[name] = words(s.Doc, s.Comment)
					if said[name] == "" && len(d.Specs) == 1 {
						said[name] = words(d.Doc)
					}
					if x, ok := s.Type.(*ast.StructType); ok {
						for _, f := range x.Fields.List {
							for _, n := range f.Names {
								said[name+"."+n.Name] = words(f.Comment, f.Doc)
							}
						}
					}
				}
			}
		}
	}
	quantity := map[reflect.Type]string{reflect.TypeFor[tables.Current](): "Current", reflect.TypeFor[tables.Temperature](): "Temperature", reflect.TypeFor[tables.Ratio](): "Ratio"}
	return func(typ reflect.Type, field string) string {
		name := typ.Name()
		if q, ok := quantity[typ]; ok {
			name = q
		}
		key := typ.PkgPath() + "." + name
		if field != "" {
			key += "." + field
		}
		return said[key]
	}
}

// schemas reads the committed schema files.
func schemas(t *testing.T) schema.Documents {
	t.Helper()
	var files [][]byte
	for _, file := range schemaFiles {
		text, err := os.ReadFile(filepath.FromSlash(file))
		require.NoError(t, err)
		files = append(files, text)
	}
	docs, err := schema.Read(files...)
	require.NoError(t, err)
	return docs
}

// valid holds a value of a type of the root package against its schema.
func valid(t *testing.T, docs schema.Documents, v any) {
	t.Helper()
	text, err := json.Marshal(v)
	require.NoError(t, err)
	wrong, err := docs.Validate(modulePath, reflect.TypeOf(v).Name(), text)
	require.NoError(t, err)
	require.Empty(t, wrong, "%T", v)
}

// Every golden JSON file and every document of the library validates.
func TestGoldenJSONValidates(t *testing.T) {
	docs := schemas(t)
	files, err := filepath.Glob("internal/testdata/golden/*.json")
	require.NoError(t, err)
	require.Greater(t, len(files), 10)
	for _, file := range files {
		text, err := os.ReadFile(file)
		require.NoError(t, err)
		wrong, err := docs.Validate(modulePath, "Result", text)
		require.NoError(t, err)
		assert.Empty(t, wrong, file)
	}
	count := map[string]int{}
	for _, file := range []string{"sample.json", "feeders.json", "check.json"} {
		text, err := os.ReadFile("examples/internal/schedule/testdata/golden/" + file)
		require.NoError(t, err)
		var both map[string][]json.RawMessage
		if json.Unmarshal(text, &both) != nil {
			both = map[string][]json.RawMessage{}
			var one []json.RawMessage
			require.NoError(t, json.Unmarshal(text, &one))
			both[map[string]string{"sample.json": "circuits", "check.json": "reports"}[file]] = one
		}
		for kind, elements := range both {
			name := map[string]string{"circuits": "Result", "feeders": "FeederResult", "reports": "Report"}[kind]
			for _, element := range elements {
				var failed struct {
					Error string `json:"error"`
				}
				require.NoError(t, json.Unmarshal(element, &failed))
				if failed.Error != "" { // the example's own
					continue
				}
				count[name]++
				wrong, err := docs.Validate(modulePath, name, element)
				require.NoError(t, err)
				assert.Empty(t, wrong, "%s %s", file, name)
			}
		}
	}
	for _, name := range []string{"Result", "FeederResult", "Report"} {
		assert.Greater(t, count[name], 3, name)
	}
}

func TestDocumentsValidate(t *testing.T) {
	docs := schemas(t)
	for _, d := range documents(t) {
		valid(t, docs, d)
	}
	randomDesigns(t, 41, 300, func(_ *rand.Rand, r motorcircuit.Result) {
		valid(t, docs, r)
		valid(t, docs, r.Circuit)
		valid(t, docs, r.AsInstalled())
		valid(t, docs, checked(t, r.Circuit, r.AsInstalled()))
		for _, q := range r.Quantities() {
			valid(t, docs, q)
		}
	})
	f := feeder(tables.NEC2023, cage("a", "1", 460), cage("b", "1/2", 460))
	valid(t, docs, f)
	valid(t, docs, sized(t, f).AsInstalled())
	group := motorcircuit.Group{Edition: tables.NEC2023, Circuits: []motorcircuit.Circuit{f.Circuits[0].Circuit, f.Circuits[1].Circuit}}
	valid(t, docs, group)
	gr, err := motorcircuit.SizeGroup(group)
	require.NoError(t, err)
	valid(t, docs, gr)
	shared, err := motorcircuit.SizeShared(conductor.EMT, group.Circuits)
	require.NoError(t, err)
	valid(t, docs, shared)
}

// A schema refuses what is not as it says.
func TestSchemaRefuses(t *testing.T) {
	docs := schemas(t)
	wrong, err := docs.Validate(modulePath, "Circuit", []byte(circuitJSON))
	require.NoError(t, err)
	// The schemas are of the texts that the library writes, of which it reads more.
	assert.ElementsMatch(t, []string{
		".device: inverse-time breaker is none of [ non_time_delay_fuse time_delay_fuse inverse_time_breaker instantaneous_breaker]",
		".motor.kind: squirrel cage is none of [ squirrel_cage single_phase wound_rotor synchronous dc torque hermetic]",
		".wiring.raceway: EMT is none of [ emt ent fmc imc lfmc lfnc_a lfnc_b pvc_40 pvc_80 pvc_a pvc_eb rmc]",
	}, wrong)
	r, err := motorcircuit.Size(motorcircuit.Circuit{Edition: tables.CEC2024, Motor: motor.Motor{Kind: motor.SquirrelCage, Power: motor.HP("10"), Voltage: 575}})
	require.NoError(t, err)
	text, err := json.Marshal(r)
	require.NoError(t, err)
	for _, tt := range []struct{ old, new, want string }{
		{`"edition":"CEC-2024"`, `"edition":""`, ".circuit.edition:  is none of"},
		{`"edition":"CEC-2024",`, ``, ".circuit: edition is missing"},
		{`"voltage":575`, `"voltage":"575"`, ".circuit.motor.voltage: 575 is not of type integer"},
		{`"voltage":575`, `"voltage":575.5`, ".circuit.motor.voltage: 575.5 is not of type integer"},
		{`"voltage":575`, `"volts":575`, ".circuit.motor: volts is no property of it"},
		{`"power":"10 hp"`, `"power":"10"`, ".circuit.motor.power: \"10\" does not match"},
		{`"op":"tabulated"`, `"op":"guessed"`, ": guessed is none of"},
		{`"value":"11"`, `"value":11`, ": 11 is not of type string"},
		{`"sets":1`, `"sets":null`, ".branch.sets: <nil> is not of type integer"},
		{`"cautions":[`, `"cautions":["x",`, ".cautions[0]: x is not of type object"},
	} {
		changed := strings.Replace(string(text), tt.old, tt.new, 1)
		require.NotEqual(t, string(text), changed, tt.old)
		wrong, err := docs.Validate(modulePath, "Result", []byte(changed))
		require.NoError(t, err)
		assert.Contains(t, strings.Join(wrong, "\n"), tt.want)
	}
	wrong, err = docs.Validate(modulePath, "Nothing", []byte(`{}`))
	require.NoError(t, err)
	assert.Len(t, wrong, 1)
	strange, err := schema.Read([]byte(`{"$id":"https://example.org/motorcircuit/schema.json","$defs":{"A":{"minimum":1}}}`))
	require.NoError(t, err)
	wrong, err = strange.Validate(modulePath, "A", []byte(`0`))
	require.NoError(t, err)
	assert.Equal(t, []string{": the schema has a keyword that is not known here: minimum"}, wrong)
}
