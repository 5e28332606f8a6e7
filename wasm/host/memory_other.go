//go:build !unix

package host

import "context"

// withMemory leaves instances' memory to the runtime.
func withMemory(ctx context.Context) context.Context { return ctx }
