package host

import (
	"context"
	"encoding/json"
	"errors"
	"fmt"
	"strings"

	"github.com/tetratelabs/wazero"
	"github.com/tetratelabs/wazero/api"

	"plumbrule/engine/rows"
	"plumbrule/wasm/abi"
)

// instance is one sandboxed copy of the module. It serves one caller at a time.
type instance struct {
	module    api.Module
	memory    api.Memory
	functions []api.Function  // by abi.Export
	programs  map[int64]int32 // by the host's number of a program
	in, out   buffer
	stack     [4]uint64
	job       run // a run that this instance does alone
	dead      bool
}

// buffer is a reserved stretch of the instance's memory.
type buffer struct {
	place uint32
	size  int
}

func (m *Module) start(ctx context.Context) (*instance, error) {
	settings := wazero.NewModuleConfig().WithName("").WithStartFunctions("_initialize")
	module, err := m.runtime.InstantiateModule(withMemory(ctx), m.compiled, settings)
	if err != nil {
		return nil, fmt.Errorf("the module does not start: %w", err)
	}
	i := &instance{module: module, memory: module.Memory(), programs: map[int64]int32{}}
	for _, name := range abi.Exports() {
		f := module.ExportedFunction(name)
		if f == nil {
			module.Close(ctx)
			return nil, fmt.Errorf("this is no module of Plumbrule: it does not export %s", name)
		}
		i.functions = append(i.functions, f)
	}
	return i, nil
}

// call calls an export. A trap ends the instance.
func (i *instance) call(ctx context.Context, export abi.Export, arguments ...uint64) (uint64, error) {
	// Arguments and result share the stack; an export has at most four.
	copy(i.stack[:], arguments)
	if err := i.functions[export].CallWithStack(ctx, i.stack[:]); err != nil {
		i.dead = true
		return 0, fmt.Errorf("the module trapped in %s, this instance is given up: %w", export, err)
	}
	return i.stack[0], nil
}

// document calls an export that gives a document and copies it out.
func (i *instance) document(ctx context.Context, export abi.Export, arguments ...uint64) ([]byte, error) {
	doc, err := i.call(ctx, export, arguments...)
	if err != nil {
		return nil, err
	}
	if doc == 0 {
		return nil, i.fault(ctx)
	}
	place, length := abi.DocAt(doc)
	view, ok := i.memory.Read(place, length)
	if !ok {
		i.dead = true
		return nil, errors.New("the module gave a document outside its memory")
	}
	return append([]byte(nil), view...), nil
}

func (i *instance) read(ctx context.Context, into any, export abi.Export, arguments ...uint64) error {
	text, err := i.document(ctx, export, arguments...)
	if err != nil {
		return err
	}
	return json.Unmarshal(text, into)
}

// fault gives the last call's failure in words.
func (i *instance) fault(ctx context.Context) error {
	var fault struct{ Fault string }
	doc, err := i.call(ctx, abi.ExportFault)
	if err != nil {
		return err
	}
	place, length := abi.DocAt(doc)
	view, ok := i.memory.Read(place, length)
	if !ok || json.Unmarshal(view, &fault) != nil || fault.Fault == "" {
		return errors.New("the module failed without a reason")
	}
	return errors.New(fault.Fault)
}

// ensure makes a buffer at least size bytes large.
func (i *instance) ensure(ctx context.Context, b *buffer, size int) error {
	if b.size >= size && b.place != 0 {
		return nil
	}
	if b.place != 0 {
		if _, err := i.call(ctx, abi.ExportRelease, uint64(b.place)); err != nil {
			return err
		}
		*b = buffer{}
	}
	size = max(size, 4096)
	place, err := i.call(ctx, abi.ExportReserve, uint64(size))
	if err != nil {
		return err
	}
	if place == 0 {
		return i.fault(ctx)
	}
	*b = buffer{uint32(place), size}
	return nil
}

// compile compiles a sheet in this instance.
func (i *instance) compile(ctx context.Context, text, choices string) (*abi.Compiled, error) {
	if err := i.ensure(ctx, &i.in, len(text)+len(choices)+16); err != nil {
		return nil, err
	}
	var second buffer
	if choices != "" {
		if err := i.ensure(ctx, &second, len(choices)); err != nil {
			return nil, err
		}
		defer i.call(ctx, abi.ExportRelease, uint64(second.place))
	}
	if !i.memory.WriteString(i.in.place, text) || !i.memory.WriteString(second.place, choices) {
		return nil, errors.New("the sheet does not fit the module's memory")
	}
	compiled := &abi.Compiled{}
	err := i.read(ctx, compiled, abi.ExportCompile, uint64(i.in.place), uint64(len(text)), uint64(second.place), uint64(len(choices)))
	return compiled, err
}

// choiceLines writes choices as the module reads them.
func choiceLines(choices map[string][]string) string {
	var b strings.Builder
	for name, list := range choices {
		for _, choice := range list {
			b.WriteString(name + "=" + choice + "\n")
		}
	}
	return strings.TrimSuffix(b.String(), "\n")
}

// Compile turns a sheet into a program that runs in the module; choices adds
// choices to text knowns. The error of a sheet with problems is a
// *rows.SheetError.
func (m *Module) Compile(ctx context.Context, text string, choices map[string][]string) (rows.Program, error) {
	i, err := m.take(ctx)
	if err != nil {
		return nil, err
	}
	defer m.give(ctx, i)
	p := &Program{module: m, text: text, choices: choiceLines(choices)}
	compiled, err := i.compile(ctx, p.text, p.choices)
	if err != nil {
		return nil, err
	}
	if compiled.Program == 0 {
		return nil, &rows.SheetError{Problems: compiled.Problems}
	}
	if err := i.read(ctx, &p.reasons, abi.ExportReasons, uint64(compiled.Program)); err != nil {
		return nil, err
	}
	p.description = compiled.Description
	p.rowsPerCall = rowsPerCall(&p.description)
	m.mu.Lock()
	m.ids++
	p.id = m.ids
	m.mu.Unlock()
	i.programs[p.id] = int32(compiled.Program)
	return p, nil
}
