package motorcircuit_test

import (
	"bytes"
	"go/ast"
	"go/parser"
	"go/printer"
	"go/token"
	"io/fs"
	"os"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"example.org/motorcircuit/internal/testkit"
)

// TestVersion holds the newest release of the change log to the one whose names the
// list promises.
func TestVersion(t *testing.T) {
	text, err := os.ReadFile("CHANGELOG.md")
	require.NoError(t, err)
	for line := range strings.Lines(string(text)) {
		if released, ok := strings.CutPrefix(line, "## v"); ok {
			require.Equal(t, version, "v"+strings.Fields(released)[0])
			return
		}
	}
	t.Fatal("no release")
}

// TestAPI compares the exported names of every public package with the list in
// internal/testdata/api.txt. A line that vanishes is a broken user; one that
// appears is reviewed as a promise. `go test -run TestAPI -update` rewrites it.
func TestAPI(t *testing.T) {
	var lines []string
	for _, dir := range []string{".", "motor", "conductor", "protection", "tables"} {
		lines = append(lines, exported(t, dir)...)
	}
	slices.Sort(lines)
	lines = append([]string{"# " + version}, slices.Compact(lines)...)
	testkit.Golden(t, "internal/testdata/api.txt", strings.Join(lines, "\n")+"\n")
}

// version is the release whose names are promised.
const version = "v0.1.0"

func exported(t *testing.T, dir string) (lines []string) {
	t.Helper()
	files := token.NewFileSet()
	entries, err := os.ReadDir(dir)
	require.NoError(t, err)
	for _, entry := range entries {
		name := entry.Name()
		if entry.IsDir() || !strings.HasSuffix(name, ".go") || strings.HasSuffix(name, "_test.go") {
			continue
		}
		src, err := fs.ReadFile(os.DirFS(dir), name)
		require.NoError(t, err)
		file, err := parser.ParseFile(files, name, src, parser.SkipObjectResolution)
		require.NoError(t, err)
		line := func(parts ...string) {
			lines = append(lines, "pkg "+file.Name.Name+", "+strings.Join(parts, ""))
		}
		text := func(node any) string {
			var b bytes.Buffer
			require.NoError(t, (&printer.Config{Mode: printer.RawFormat}).Fprint(&b, files, node))
			return strings.Join(strings.Fields(b.String()), " ")
		}
		for _, decl := range file.Decls {
			switch d := decl.(type) {
			case *ast.FuncDecl:
				if d.Name.IsExported() && (d.Recv == nil || ast.IsExported(receiver(d.Recv.List[0].Type))) {
					d.Body, d.Doc = nil, nil
					line(text(d))
				}
			case *ast.GenDecl:
				for _, spec := range d.Specs {
					switch s := spec.(type) {
					case *ast.ValueSpec:
						for _, n := range s.Names {
							if n.IsExported() {
								line(d.Tok.String(), " ", n.Name)
							}
						}
					case *ast.TypeSpec:
						if s.Name.IsExported() {
							typeLines(s, line, text)
						}
					}
				}
			}
		}
	}
	return lines
}

func typeLines(s *ast.TypeSpec, line func(...string), text func(any) string) {
	x, isStruct := s.Type.(*ast.StructType)
	if !isStruct {
		equals := " "
		if s.Assign.IsValid() {
			equals = " = "
		}
		line("type ", s.Name.Name, equals, text(s.Type))
		return
	}
	line("type ", s.Name.Name, " struct")
	for _, f := range x.Fields.List {
		for _, n := range f.Names {
			if n.IsExported() {
				tag := ""
				if f.Tag != nil {
					tag = " " + f.Tag.Value
				}
				line("type ", s.Name.Name, " struct, ", n.Name, " ", text(f.Type), tag)
			}
		}
	}
}

func receiver(x ast.Expr) string {
	switch r := x.(type) {
	case *ast.StarExpr:
		return receiver(r.X)
	case *ast.IndexExpr:
		return receiver(r.X)
	case *ast.Ident:
		return r.Name
	}
	return ""
}
