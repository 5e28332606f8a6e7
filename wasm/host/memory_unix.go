//go:build unix

package host

import (
	"context"
	"syscall"

	"github.com/tetratelabs/wazero/experimental"
)

// withMemory lets the runtime take each instance's memory as one reservation
// of address space outside the Go heap: growing then copies nothing, pages
// that were never touched cost nothing, and the host's garbage collector does
// not count them.
func withMemory(ctx context.Context) context.Context {
	return experimental.WithMemoryAllocator(ctx, experimental.MemoryAllocatorFunc(reserve))
}

// reservation is one instance's memory.
type reservation struct {
	all  []byte
	heap bool
}

func reserve(_, most uint64) experimental.LinearMemory {
	all, err := syscall.Mmap(-1, 0, int(most), syscall.PROT_READ|syscall.PROT_WRITE, syscall.MAP_ANON|syscall.MAP_PRIVATE)
	if err != nil {
		return &reservation{heap: true}
	}
	return &reservation{all: all}
}

// Reallocate gives the first size bytes.
func (r *reservation) Reallocate(size uint64) []byte {
	if r.heap {
		if uint64(cap(r.all)) < size {
			r.all = append(make([]byte, 0, size), r.all...)
		}
		r.all = r.all[:size]
		return r.all
	}
	if size > uint64(len(r.all)) {
		return nil
	}
	return r.all[:size:len(r.all)]
}

// Free gives the memory back.
func (r *reservation) Free() {
	if !r.heap && r.all != nil {
		_ = syscall.Munmap(r.all) // nothing can be done where it fails
	}
	r.all = nil
}
