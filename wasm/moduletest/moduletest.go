// Package moduletest builds the module for the tests that need it. Nothing
// but tests uses it.
package moduletest

import (
	"os"
	"os/exec"
	"path/filepath"
	"runtime"
	"strconv"
	"sync"
	"testing"
)

var built struct {
	sync.Once
	path string
	err  error
}

// Path builds the module from the tree as it stands, once a test process, and
// gives the file's path. The go command's cache makes an unchanged module
// quick.
func Path(t testing.TB) string {
	t.Helper()
	built.Do(func() {
		_, here, _, _ := runtime.Caller(0)
		root := filepath.Join(filepath.Dir(here), "..", "..")
		folder := filepath.Join(root, "build", "test")
		if built.err = os.MkdirAll(folder, 0o755); built.err != nil {
			return
		}
		// Test processes run side by side: each builds under a name of its own
		// and the complete file takes the common one.
		own := filepath.Join(folder, strconv.Itoa(os.Getpid())+".wasm")
		build := exec.Command("go", "build", "-trimpath", "-ldflags=-s -w", "-buildmode=c-shared", "-o", own, "./wasm/module")
		build.Dir = root
		build.Env = append(os.Environ(), "GOOS=wasip1", "GOARCH=wasm", "GOFLAGS=-buildvcs=false")
		if output, err := build.CombinedOutput(); err != nil {
			t.Log(string(output))
			built.err = err
			return
		}
		built.path = filepath.Join(folder, "plumbrule.wasm")
		built.err = os.Rename(own, built.path)
	})
	if built.err != nil {
		t.Fatalf("the module does not build: %v", built.err)
	}
	return built.path
}
