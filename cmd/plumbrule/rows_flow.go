package main

import (
	"bufio"
	"context"
	"errors"
	"io"
	"sync"
)

// flow reads blocks one after the other, evaluates them side by side and
// writes them in their order. There are never more blocks than workers and two,
// so that memory does not grow with the data. It does not wait for data that
// does not come when the run is cancelled.
func (r *rowsRun) flow(parent context.Context, to io.Writer, progress *progress) error {
	ctx, cancel := context.WithCancelCause(parent)
	var group sync.WaitGroup
	defer group.Wait() // no worker outlives the program
	defer cancel(nil)
	w := bufio.NewWriterSize(to, 1<<16)
	r.out = r.newOutput(w)
	if err := r.out.begin(); err != nil {
		return unwritten(err)
	}
	inFlight := r.workers + 2
	free := make(chan *block, inFlight)
	for range inFlight {
		free <- nil // made when it is needed
	}
	// Neither channel can be full: there are no more blocks than places.
	todo := make(chan *block, inFlight)
	ordered := make(chan *block, inFlight)
	go r.readBlocks(ctx, cancel, free, todo, ordered)
	for range r.workers {
		group.Go(func() { work(ctx, todo) })
	}
	for {
		var b *block
		var more bool
		select {
		case <-ctx.Done():
			return context.Cause(ctx)
		case b, more = <-ordered:
		}
		if !more {
			break
		}
		select {
		case <-ctx.Done():
			return context.Cause(ctx)
		case err := <-b.done:
			if err != nil {
				return err
			}
		}
		if err := r.out.write(b); err != nil {
			return unwritten(err)
		}
		r.total.add(b)
		progress.at(b.taken, r.total.rows)
		free <- b
	}
	if err := context.Cause(ctx); err != nil {
		return err
	}
	if err := r.out.end(); err != nil {
		return unwritten(err)
	}
	if err := w.Flush(); err != nil {
		return unwritten(err)
	}
	return nil
}

// work evaluates blocks until there are no more.
func work(ctx context.Context, todo <-chan *block) {
	for {
		select {
		case <-ctx.Done():
			return
		case b, more := <-todo:
			if !more {
				return
			}
			b.done <- b.evaluate(ctx)
		}
	}
}

func unwritten(err error) error { return unreadable("cannot write the rows: " + err.Error()) }

// readBlocks fills free blocks with rows until the data ends.
func (r *rowsRun) readBlocks(ctx context.Context, cancel context.CancelCauseFunc, free, todo, ordered chan *block) {
	defer close(todo)
	defer close(ordered)
	for number := 0; ; number++ {
		var b *block
		select {
		case <-ctx.Done():
			return
		case b = <-free:
		}
		if b == nil {
			b = newBlock(r)
		}
		b.number = number
		err := b.stretch.fill(ctx)
		if errors.Is(err, io.EOF) {
			return
		}
		if err != nil {
			cancel(err)
			return
		}
		b.taken = r.in.taken()
		ordered <- b
		todo <- b
	}
}
