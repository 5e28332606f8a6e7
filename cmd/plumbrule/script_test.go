package main

import (
	"errors"
	"flag"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
	"testing"

	"github.com/rogpeppe/go-internal/testscript"

	"plumbrule/wasm/moduletest"
)

var update = flag.Bool("update", false, "rewrite what the scripts expect")

func TestMain(m *testing.M) {
	testscript.Main(m, map[string]func(){"plumbrule": main})
}

// TestScripts runs every script of testdata/scripts, one a command and more
// for what goes wrong, against what it has on record.
func TestScripts(t *testing.T) {
	module := moduletest.Path(t)
	cache, err := os.UserCacheDir()
	if err != nil {
		t.Fatal(err)
	}
	testscript.Run(t, testscript.Params{
		Dir:                 "../../testdata/scripts",
		UpdateScripts:       *update,
		RequireExplicitExec: true,
		RequireUniqueNames:  true,
		Cmds:                map[string]func(*testscript.TestScript, bool, []string){"exits": exits},
		Setup: func(env *testscript.Env) error {
			env.Setenv("MODULE", module)
			// Compiled modules are kept where every other test finds them too.
			env.Setenv("XDG_CACHE_HOME", cache)
			return os.CopyFS(filepath.Join(env.WorkDir, "sheets"), os.DirFS("../../testdata/sheets"))
		},
	})
}

// exits is the script command "exits STATUS PROGRAM ARGUMENT ...": it runs the
// program and demands that very exit status.
func exits(ts *testscript.TestScript, neg bool, args []string) {
	if neg || len(args) < 2 {
		ts.Fatalf("usage: exits STATUS PROGRAM ARGUMENT ...")
	}
	want, err := strconv.Atoi(args[0])
	if err != nil {
		ts.Fatalf("%s is no exit status", args[0])
	}
	got := 0
	if err := ts.Exec(args[1], args[2:]...); err != nil {
		var exit *exec.ExitError
		if !errors.As(err, &exit) {
			ts.Fatalf("%v", err)
		}
		got = exit.ExitCode()
	}
	if got != want {
		ts.Fatalf("exit status %d, not %d", got, want)
	}
}
