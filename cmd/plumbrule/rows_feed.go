package main

import (
	"bytes"
	"errors"
	"io"
	"sync/atomic"
)

// Memory depends on the size of a stretch and on the number of workers, not on
// the data's length. A stretch and what is made of it fit into a core's cache.
const (
	blockBytes = 1 << 18
	blockRows  = 8192
)

// mostRecord bounds one row of text data in bytes, so that a quote that is
// never closed does not read the whole file into memory.
const mostRecord = 16 << 20

var errLongRow = errors.New("a row is longer than 16 MiB; a quote may not be closed")

// feed cuts text data into stretches of whole rows.
type feed struct {
	in      io.Reader
	file    string
	size    int                   // of a stretch, in bytes
	cut     func(text []byte) int // the end of the last row that is whole
	pending []byte                // read, but not given yet
	line    int                   // the line that pending begins in, counted from 1
	taken   atomic.Int64          // bytes read
	ended   bool
}

func newFeed(in io.Reader, file string, size int, cut func([]byte) int) *feed {
	return &feed{in: in, file: file, size: size, cut: cut, line: 1}
}

// fill puts the next stretch of rows into text, whose memory is used again,
// and tells the line it begins in. At the end of the data it gives io.EOF.
func (f *feed) fill(text []byte) (filled []byte, line int, err error) {
	for want := f.size; ; want *= 2 {
		if err := f.read(want); err != nil {
			return text[:0], 0, unreadable("cannot read " + f.file + ": " + err.Error())
		}
		view := f.pending[:min(want, len(f.pending))]
		last := f.ended && len(view) == len(f.pending)
		end := len(view)
		if !last {
			end = f.cut(view)
		}
		if end == 0 && last {
			return text[:0], f.line, io.EOF
		}
		if end == 0 {
			if want > mostRecord {
				return text[:0], 0, unreadable("cannot read " + rowText(f.file, f.line) + ": " + errLongRow.Error())
			}
			continue
		}
		text = append(text[:0], view[:end]...)
		line = f.line
		f.line += bytes.Count(text, []byte{'\n'})
		f.pending = append(f.pending[:0], f.pending[end:]...)
		if cap(f.pending) > 8*f.size && len(f.pending) < f.size {
			f.pending = append(make([]byte, 0, 2*f.size), f.pending...) // a giant row has gone by
		}
		return text, line, nil
	}
}

// read reads until so many bytes are pending or the data ends.
func (f *feed) read(want int) error {
	if cap(f.pending) < want {
		f.pending = append(make([]byte, 0, want), f.pending...)
	}
	empty := 0
	for !f.ended && len(f.pending) < want {
		n, err := f.in.Read(f.pending[len(f.pending):want])
		begin := f.taken.Add(int64(n)) == int64(n)
		f.pending = f.pending[:len(f.pending)+n]
		switch {
		case errors.Is(err, io.EOF):
			f.ended = true
		case err != nil:
			return err
		case n > 0:
			empty = 0
		default:
			if empty++; empty > 100 {
				return io.ErrNoProgress
			}
		}
		if begin || f.ended {
			f.dropMark()
		}
	}
	return nil
}

// dropMark drops the byte order mark that some programs write before the text.
func (f *feed) dropMark() {
	mark := []byte("\xef\xbb\xbf")
	if f.taken.Load() == int64(len(f.pending)) && bytes.HasPrefix(f.pending, mark) {
		f.pending = append(f.pending[:0], f.pending[len(mark):]...)
	}
}

// giveBack puts text that was given, and begins in a line, back before the rest.
func (f *feed) giveBack(text []byte, line int) {
	f.pending = append(append(make([]byte, 0, max(2*f.size, len(text)+len(f.pending))), text...), f.pending...)
	f.line = line
}
