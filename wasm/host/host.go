// Package host loads the engine as a WebAssembly module and offers the same
// small interface as the native engine: a host swaps one for the other in one
// line. Programs run in a pool of sandboxed instances that are given no file,
// clock, network or environment; their memory is capped, and a run's context
// is looked at between blocks of rows.
//
//	module, err := host.Open(ctx, "plumbrule.wasm")
//	if err != nil { ... }
//	defer module.Close(ctx)
//	program, err := module.Compile(ctx, text, nil)
package host

import (
	"context"
	"errors"
	"fmt"
	"os"
	"path/filepath"
	"runtime"
	"sync"

	"github.com/tetratelabs/wazero"
	"github.com/tetratelabs/wazero/imports/wasi_snapshot_preview1"

	"plumbrule/wasm/abi"
)

// Config says how a module is loaded. It does not change: each With method
// gives a changed copy. The zero Config is ready for use.
type Config struct {
	instances int
	memory    uint64
	cache     string
	noCache   bool
}

// WithInstances bounds how many instances run at once; the default is one a
// processor.
func (c Config) WithInstances(n int) Config { c.instances = n; return c }

// WithMemory caps the memory of one instance in bytes; the default is 1 GiB.
func (c Config) WithMemory(bytes uint64) Config { c.memory = bytes; return c }

// WithCache names the folder for compiled code; the default is a folder of the
// user's cache.
func (c Config) WithCache(folder string) Config { c.cache, c.noCache = folder, false; return c }

// WithoutCache compiles the module anew at every start.
func (c Config) WithoutCache() Config { c.noCache = true; return c }

const (
	defaultMemory = 1 << 30
	pageSize      = 64 << 10
)

// Module is a loaded module with its pool of instances. It serves several
// goroutines at once.
type Module struct {
	runtime  wazero.Runtime
	compiled wazero.CompiledModule
	cache    wazero.CompilationCache
	slots    chan struct{} // one for each instance that may run
	mu       sync.Mutex
	idle     []*instance
	closed   bool
	ended    chan struct{} // closed when the module is
	ids      int64
	limit    uint64
}

// ErrClosed is the error of a call after Close.
var ErrClosed = errors.New("the module is closed")

// Open loads a module from a file with the default configuration.
func Open(ctx context.Context, path string) (*Module, error) {
	code, err := os.ReadFile(path)
	if err != nil {
		return nil, err
	}
	return Load(ctx, code, Config{})
}

// Load loads a module from its bytes.
func Load(ctx context.Context, code []byte, config Config) (*Module, error) {
	if config.instances <= 0 {
		config.instances = runtime.GOMAXPROCS(0)
	}
	if config.memory == 0 {
		config.memory = defaultMemory
	}
	m := &Module{slots: make(chan struct{}, config.instances), ended: make(chan struct{}), limit: config.memory}
	settings := wazero.NewRuntimeConfig().WithMemoryLimitPages(uint32(min(config.memory/pageSize, 65536)))
	if !config.noCache {
		cache, err := openCache(config.cache)
		if err != nil {
			return nil, err
		}
		if cache != nil {
			m.cache = cache
			settings = settings.WithCompilationCache(cache)
		}
	}
	m.runtime = wazero.NewRuntimeWithConfig(ctx, settings)
	if _, err := wasi_snapshot_preview1.Instantiate(ctx, m.runtime); err != nil {
		m.Close(ctx)
		return nil, err
	}
	compiled, err := m.runtime.CompileModule(ctx, code)
	if err != nil {
		m.Close(ctx)
		return nil, fmt.Errorf("this is no module of Plumbrule: %w", err)
	}
	m.compiled = compiled
	i, err := m.start(ctx)
	if err != nil {
		m.Close(ctx)
		return nil, err
	}
	if version, err := i.call(ctx, abi.ExportVersion); err != nil || version != abi.Version {
		m.Close(ctx)
		return nil, fmt.Errorf("the module speaks version %d of the agreement, this host version %d", version, abi.Version)
	}
	m.idle = append(m.idle, i)
	return m, nil
}

// openCache opens the folder for compiled code. Where the user has no cache
// folder the module is compiled at every start.
func openCache(folder string) (wazero.CompilationCache, error) {
	if folder == "" {
		user, err := os.UserCacheDir()
		if err != nil {
			return nil, nil
		}
		folder = filepath.Join(user, "plumbrule")
		if os.MkdirAll(folder, 0o755) != nil {
			return nil, nil
		}
	}
	return wazero.NewCompilationCacheWithDir(folder)
}

// Close waits for the runs that are under way and ends every instance.
// Programs of the module cannot run any more. Where the context ends first the
// module stays open for those runs and the context's error is given.
func (m *Module) Close(ctx context.Context) error {
	m.mu.Lock()
	again := m.closed
	m.closed = true
	m.mu.Unlock()
	if again {
		return nil
	}
	close(m.ended)
	for range cap(m.slots) {
		select {
		case m.slots <- struct{}{}:
		case <-ctx.Done():
			return ctx.Err()
		}
	}
	m.idle = nil
	err := m.runtime.Close(ctx)
	if m.cache != nil {
		err = errors.Join(err, m.cache.Close(ctx))
	}
	return err
}

// hold waits for the right to use an instance; Close waits until it is given
// back.
func (m *Module) hold(ctx context.Context) error {
	select {
	case m.slots <- struct{}{}:
	default:
		select {
		case m.slots <- struct{}{}:
		case <-m.ended: // the slots are taken for good
			return ErrClosed
		case <-ctx.Done():
			return ctx.Err()
		}
	}
	return nil
}

// take gives an idle instance or starts one, waiting for a free slot.
func (m *Module) take(ctx context.Context) (*instance, error) {
	if err := m.hold(ctx); err != nil {
		return nil, err
	}
	m.mu.Lock()
	if m.closed {
		m.mu.Unlock()
		<-m.slots
		return nil, ErrClosed
	}
	if n := len(m.idle); n > 0 {
		i := m.idle[n-1]
		m.idle = m.idle[:n-1]
		m.mu.Unlock()
		return i, nil
	}
	m.mu.Unlock()
	i, err := m.start(ctx)
	if err != nil {
		<-m.slots
		return nil, err
	}
	return i, nil
}

// give takes an instance back. One that has trapped is dead, one that has grown
// to half its memory never shrinks, and one may hold many programs that were
// closed while it was busy: these are ended.
func (m *Module) give(ctx context.Context, i *instance) {
	m.mu.Lock()
	if i.dead || m.closed || uint64(i.memory.Size()) > m.limit/2 || len(i.programs) > abi.MostPrograms/2 {
		m.mu.Unlock()
		i.module.Close(ctx)
	} else {
		m.idle = append(m.idle, i)
		m.mu.Unlock()
	}
	<-m.slots
}

// Catalogue gives every law and constant that the module knows, as JSON.
func (m *Module) Catalogue(ctx context.Context) ([]byte, error) {
	i, err := m.take(ctx)
	if err != nil {
		return nil, err
	}
	defer m.give(ctx, i)
	return i.document(ctx, abi.ExportCatalogue)
}

// Limits gives the module's limits by name.
func (m *Module) Limits(ctx context.Context) (map[string]int, error) {
	i, err := m.take(ctx)
	if err != nil {
		return nil, err
	}
	defer m.give(ctx, i)
	limits := map[string]int{}
	err = i.read(ctx, &limits, abi.ExportLimits)
	return limits, err
}
