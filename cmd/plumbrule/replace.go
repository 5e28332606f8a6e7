package main

import (
	"context"
	"errors"
	"io"
	"os"
	"path/filepath"
	"strconv"
)

// replace writes a file under a temporary name in the same folder and renames
// it only when it is complete, so that nobody ever reads half of it. What was
// there before stays if fill fails or the context ends.
func (a *app) replace(ctx context.Context, file string, fill func(w io.Writer) error) (err error) {
	info, err := os.Stat(file)
	if err == nil && !info.Mode().IsRegular() {
		return a.overwrite(file, fill) // a device or a pipe cannot be renamed to
	}
	existing := err == nil
	temporary, err := unfinished(file)
	if err != nil {
		return cannot("write", file, err)
	}
	defer func() {
		if err != nil {
			err = errors.Join(err, discard(temporary))
		}
	}()
	if err := fill(temporary); err != nil {
		return err
	}
	if err := ctx.Err(); err != nil {
		return err
	}
	if existing {
		if err := temporary.Chmod(info.Mode().Perm()); err != nil {
			return cannot("write", file, err)
		}
	}
	if err := temporary.Sync(); err != nil {
		return cannot("write", file, err)
	}
	if err := temporary.Close(); err != nil {
		return cannot("write", file, err)
	}
	if err := os.Rename(temporary.Name(), file); err != nil {
		return cannot("write", file, err)
	}
	return nil
}

// unfinished makes an empty file beside the one named.
func unfinished(file string) (*os.File, error) {
	const most = 1000
	stem := filepath.Join(filepath.Dir(file), "."+filepath.Base(file)+"."+strconv.Itoa(os.Getpid())+".")
	for n := 0; ; n++ {
		f, err := os.OpenFile(stem+strconv.Itoa(n)+".part", os.O_WRONLY|os.O_CREATE|os.O_EXCL, 0o666)
		if err == nil || !errors.Is(err, os.ErrExist) || n == most {
			return f, err
		}
	}
}

// overwrite writes straight to what is no regular file.
func (a *app) overwrite(file string, fill func(w io.Writer) error) error {
	f, err := os.OpenFile(file, os.O_WRONLY, 0)
	if err != nil {
		return cannot("write", file, err)
	}
	if err := fill(f); err != nil {
		return errors.Join(err, f.Close())
	}
	if err := f.Close(); err != nil {
		return cannot("write", file, err)
	}
	return nil
}

// discard removes an unfinished file.
func discard(f *os.File) error {
	closed := f.Close()
	if errors.Is(closed, os.ErrClosed) {
		closed = nil
	}
	return errors.Join(closed, os.Remove(f.Name()))
}

// resolved follows links to the file itself; a file that is not there yet is
// itself.
func resolved(file string) (string, error) {
	target, err := filepath.EvalSymlinks(file)
	if errors.Is(err, os.ErrNotExist) {
		return file, nil
	}
	return target, err
}
