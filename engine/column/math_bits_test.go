package column

import (
	"crypto/sha256"
	"encoding/binary"
	"encoding/hex"
	"go/ast"
	"go/importer"
	"go/parser"
	"go/token"
	"go/types"
	"math"
	"math/rand/v2"
	"path/filepath"
	"strings"
	"testing"
)

// digestCount is the number of random arguments behind each digest.
const digestCount = 100_000

// digests are SHA-256 of the results' bits, little end first, NaN as one
// pattern. They are what one platform computed; the test's worth is that every
// platform and every compiler flag must compute the same.
var digests = map[string]string{
	"Exp":   "be1c3546116860be703d493bee63e67e683297b53a9334537816a5e202680877",
	"Expm1": "dd3ff8c96d7a4f7420b056e5f8ded37f0eeb2417ca31df0f8a230acbcef20198",
	"Ln":    "deecd97e10601e7cbad107463507959453acea721324bb4cfb658927b1e6678b",
	"Log1p": "d5045cfa7299ca36816759e343b0f020784a3021eaa6573fc085c0da07bdee53",
	"Log10": "5e87854c02dd91893d1d1ada7f19d6060356eea8d7d9ca846460d8eda830e7a9",
	"Sin":   "8ae7b5624204ff5f03a6eeb24dd5ffb782d9536b7a8fa2cbae8f32dfd5d6003f",
	"Cos":   "0f037766032ec761444bd213493ae4601edb48289f053adea066c1fae353114e",
	"Tan":   "74b73dc9ffe097858789161b16454f6ede12e3a721e5111ddff921a93f1953f2",
	"Asin":  "821ae78d247b11b2861defd6a7bbbe23c64fadc3205eed18867e83f6387131a4",
	"Acos":  "e8f58eeb0963930f2a018b682276678624052a3b0abff041a35c57ded5a9e43e",
	"Atan":  "04b76e125b7ecf28f1579a0576ad1b1e4d6a1298fd2b40910f2b723979dfd1f6",
	"Sinh":  "4f0d4172a43ee3bb1a7337440da74cb136ea5b5af5a92e271ba7fa9b4dc27e8e",
	"Cosh":  "34252e3a747bea2b0c3024e5c3817c0d4dc2616a686178779649c461d7e87a2f",
	"Tanh":  "623be9b1b3375f7828d4c8923e2cf4c6a6f6d7b9d7c3a5497e44fc063487b735",
	"Cbrt":  "2141f1fa8678b88d59c978831c2a2117d14d242a5f2127d315787ed631b311e2",
	"Erf":   "168eee367179a552cb1ebe12fc3e7500a5548a6ec443f169a512a997ccc8f0b7",
	"Erfc":  "9a37a485cc4c41cc88efcafbfa5f04337e20159f5e8c3e0182cd3b4e0b09b53e",
	"Pow":   "d1b814b7659a46683ab1cafab6887b5d424ac786df4dfae8871db28311b6753a",
	"Atan2": "840d6ace605e928445cab3813f29df784b5d1956fd94fe034e0d9e1b89359948",
	"Hypot": "30583831081b5753304b39e0654230e802719abf008ecf52dfea89aaef40b018",
}

// digestOf hashes numbers.
func digestOf(numbers []float64) string {
	hash := sha256.New()
	var bytes [8]byte
	for _, x := range numbers {
		pattern := math.Float64bits(x)
		if math.IsNaN(x) {
			pattern = 0x7ff8000000000001
		}
		binary.LittleEndian.PutUint64(bytes[:], pattern)
		hash.Write(bytes[:])
	}
	return hex.EncodeToString(hash.Sum(nil))
}

// TestSameBitsEverywhere compares the digests. Run it with GOAMD64=v1 and v3,
// on arm64 and under WebAssembly.
func TestSameBitsEverywhere(t *testing.T) {
	check := func(name string, numbers []float64) {
		if got := digestOf(numbers); got != digests[name] {
			t.Errorf("%q: %q,", name, got)
		}
	}
	for _, f := range elementaryFunctions {
		random := rand.New(rand.NewPCG(19, 85))
		arguments := make([]float64, digestCount)
		for i := range arguments {
			arguments[i] = f.ranges[i%len(f.ranges)].draw(random)
		}
		f.column(arguments, arguments)
		check(f.name, arguments)
	}
	for _, f := range elementaryPairs {
		random := rand.New(rand.NewPCG(19, 85))
		numbers := make([]float64, digestCount)
		for i := range numbers {
			x, y := f.draw(random, i)
			numbers[i] = f.scalar(x, y)
		}
		check(f.name, numbers)
	}
}

// TestProductsAreConverted reads the code of the elementary functions and
// requires that every floating-point product that is not a constant, and every
// quotient by a constant, is the operand of an explicit conversion, without
// which the language allows a fused multiplication and addition.
func TestProductsAreConverted(t *testing.T) {
	paths, err := filepath.Glob("math_*.go")
	if err != nil {
		t.Fatal(err)
	}
	files := token.NewFileSet()
	var parsed []*ast.File
	for _, path := range paths {
		if strings.HasSuffix(path, "_test.go") {
			continue
		}
		file, err := parser.ParseFile(files, path, nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		parsed = append(parsed, file)
	}
	info := &types.Info{Types: map[ast.Expr]types.TypeAndValue{}}
	config := types.Config{Importer: importer.ForCompiler(files, "source", nil)}
	if _, err := config.Check("column", files, parsed, info); err != nil {
		t.Fatal(err)
	}
	products, converted := map[ast.Expr]bool{}, map[ast.Expr]bool{}
	for _, file := range parsed {
		ast.Inspect(file, func(node ast.Node) bool {
			switch node := node.(type) {
			case *ast.AssignStmt:
				if node.Tok == token.MUL_ASSIGN || node.Tok == token.QUO_ASSIGN {
					t.Errorf("%s: *= and /= cannot be converted", files.Position(node.Pos()))
				}
			case *ast.BinaryExpr:
				value := info.Types[node]
				basic, ok := value.Type.Underlying().(*types.Basic)
				product := node.Op == token.MUL || node.Op == token.QUO && info.Types[node.Y].Value != nil
				if product && value.Value == nil && ok && basic.Info()&types.IsFloat != 0 {
					products[node] = true
				}
			case *ast.CallExpr:
				if name, ok := node.Fun.(*ast.Ident); ok && name.Name == "float64" {
					converted[ast.Unparen(node.Args[0])] = true
				}
			}
			return true
		})
	}
	if len(products) < 100 {
		t.Errorf("only %d products found", len(products))
	}
	for product := range products {
		if !converted[product] {
			t.Errorf("%s: a product that is not converted", files.Position(product.Pos()))
		}
	}
}
