package functions_test

import (
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"path/filepath"
	"strings"
	"testing"
)

// exact lists what engine and functions may take from package math: operations
// whose bits are the same on every platform, and names that compute nothing.
var exact = map[string]bool{
	"Abs": true, "Ceil": true, "Copysign": true, "Float64bits": true, "Float64frombits": true, "Floor": true, "Frexp": true,
	"Inf": true, "IsInf": true, "IsNaN": true, "Ldexp": true, "Max": true, "Min": true, "NaN": true, "Nextafter": true,
	"Signbit": true, "Sqrt": true, "Trunc": true, "Modf": true, "Round": true, "RoundToEven": true,
	"E": true, "Ln2": true, "Ln10": true, "Pi": true, "Sqrt2": true, "SqrtPi": true,
	"MaxFloat64": true, "SmallestNonzeroFloat64": true, "MaxInt": true, "MaxInt32": true, "MaxInt64": true, "MaxUint32": true, "MinInt64": true, "MaxInt8": true,
}

// TestNoPlatformMaths reads the code on the way to a result: it takes nothing
// from package math whose last bits depend on the platform, and nothing from
// gonum.
func TestNoPlatformMaths(t *testing.T) {
	files := 0
	for _, root := range []string{".", filepath.Join("..", "engine")} {
		err := filepath.WalkDir(root, func(path string, entry fs.DirEntry, err error) error {
			if err != nil {
				return err
			}
			if entry.IsDir() && (entry.Name() == "internal" || entry.Name() == "testdata") {
				return fs.SkipDir // generators run before the build
			}
			if !strings.HasSuffix(path, ".go") || strings.HasSuffix(path, "_test.go") {
				return nil
			}
			files++
			checkMaths(t, path)
			return nil
		})
		if err != nil {
			t.Fatal(err)
		}
	}
	if files < 50 {
		t.Errorf("only %d files were read", files)
	}
}

func checkMaths(t *testing.T, path string) {
	set := token.NewFileSet()
	file, err := parser.ParseFile(set, path, nil, 0)
	if err != nil {
		t.Fatal(err)
	}
	for _, imported := range file.Imports {
		if strings.Contains(imported.Path.Value, "gonum.org") {
			t.Errorf("%s imports %s", set.Position(imported.Pos()), imported.Path.Value)
		}
	}
	ast.Inspect(file, func(node ast.Node) bool {
		if selector, ok := node.(*ast.SelectorExpr); ok {
			if name, ok := selector.X.(*ast.Ident); ok && name.Name == "math" && name.Obj == nil && !exact[selector.Sel.Name] {
				t.Errorf("%s: math.%s may give other bits on another platform", set.Position(node.Pos()), selector.Sel.Name)
			}
		}
		return true
	})
}
