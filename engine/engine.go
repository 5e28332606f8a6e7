// Package engine is the public face of Plumbrule: it turns the text of a sheet
// into a checked program, and a program turns rows into rows. The catalogue of
// laws is handed in, so that a host may add its own.
//
//	program, err := engine.Compile(text, functions.All())
//	if err != nil { ... }            // a *SheetError with every problem
//	var out engine.Outcome
//	err = program.Run(ctx, engine.Input{Rows: 1}, &out)
package engine

import (
	"context"
	"runtime"

	"plumbrule/engine/law"
	"plumbrule/engine/plan"
	"plumbrule/engine/problem"
	"plumbrule/engine/rows"
	"plumbrule/engine/sheet"
)

// The vocabulary that native and module share.
type (
	Problem     = problem.Problem
	Input       = rows.Input
	Outcome     = rows.Outcome
	Description = rows.Description
	State       = rows.State
	Session     = rows.Session
	SheetError  = rows.SheetError
)

// Native compiles sheets to programs that run in this process.
type Native struct {
	Catalogue *law.Catalogue
	// Workers is how many goroutines a run may use; 0 means one a processor.
	Workers int
}

// Compile turns a sheet into a program. choices adds choices to text knowns.
// The error of a sheet with problems is a *SheetError.
func (n Native) Compile(_ context.Context, text string, choices map[string][]string) (rows.Program, error) {
	p, _, err := compile(source{text, n.Catalogue, choices})
	if err != nil {
		return nil, err
	}
	p.workers = n.Workers
	return p, nil
}

// Compile turns a sheet into a program that runs in this process on all
// processors. The error of a sheet with problems is a *SheetError.
func Compile(text string, catalogue *law.Catalogue) (*Program, error) {
	p, _, err := compile(source{text: text, catalogue: catalogue})
	return p, err
}

// Program is a compiled sheet. It serves several goroutines at once.
type Program struct {
	plan        *plan.Program
	description rows.Description
	source      source
	workers     int
}

// source is what a program was made from. What explains a number is made from
// it again, so that a program holds no trees.
type source struct {
	text      string
	catalogue *law.Catalogue
	choices   map[string][]string
}

// Describe tells the program's knowns and entries.
func (p *Program) Describe() *rows.Description { return &p.description }

// Reasons is the table of reasons; index 0 is empty.
func (p *Program) Reasons() []rows.Reason { return p.plan.Reasons() }

// Run evaluates rows into out; see rows.Program.
func (p *Program) Run(ctx context.Context, in rows.Input, out *rows.Outcome) error {
	workers := p.workers
	if workers <= 0 {
		workers = runtime.GOMAXPROCS(0)
	}
	return p.plan.Run(ctx, in, out, workers)
}

// NewSession begins a session: one row whose numbers are kept, so that a change
// computes again only what depends on it.
func (p *Program) NewSession(context.Context) (Session, error) { return p.plan.NewSession(), nil }

// Close gives the program's memory back.
func (p *Program) Close() error { return nil }

// Tidy gives a sheet's text in the canonical layout, with every note kept. The
// error of a sheet that cannot be read is a *SheetError.
func Tidy(text string) (string, error) {
	var problems problem.List
	s := sheet.Parse(text, &problems)
	if !problems.Empty() {
		return "", &SheetError{Problems: problems.Sorted()}
	}
	return sheet.Tidy(s), nil
}
