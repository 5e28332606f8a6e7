package main

import (
	"context"
	"errors"
	"io/fs"

	"plumbrule/engine/rows"
	"plumbrule/wasm/host"
)

// compilerFor gives the compiler of a run: this process, or the module where
// one is named. Runs in this process use so many workers; 0 means one a
// processor. release gives the module's memory back.
func (a *app) compilerFor(ctx context.Context, module string, workers int) (compiler rows.Compiler, release func(), err error) {
	if module == "" {
		return a.native(workers), func() {}, nil
	}
	m, err := host.Open(ctx, module)
	if err != nil {
		var path *fs.PathError
		if errors.As(err, &path) {
			return nil, nil, cannot("read", module, err)
		}
		if ctx.Err() != nil {
			return nil, nil, ctx.Err()
		}
		return nil, nil, unreadable("cannot load "+module+": "+err.Error(), "name a WebAssembly module built from wasm/module")
	}
	// What the module still held is gone with it; a failure to close loses nothing.
	return m, func() { _ = m.Close(context.WithoutCancel(ctx)) }, nil
}
