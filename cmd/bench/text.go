package main

import (
	"bytes"
	"compress/gzip"
	"fmt"
	"strings"
)

// chain gives a sheet in which each of n entries needs the one before.
func chain(n int) string {
	var b strings.Builder
	b.WriteString("known x0 [m] = 1\n")
	for i := 1; i <= n; i++ {
		fmt.Fprintf(&b, "derive x%d [m] = x%d * 0.9 + %d[mm]\n", i, i-1, i%7)
	}
	return b.String()
}

// gzipped gives a file's size when compressed.
func gzipped(data []byte) (int, error) {
	var b bytes.Buffer
	w, err := gzip.NewWriterLevel(&b, gzip.BestCompression)
	if err != nil {
		return 0, err
	}
	if _, err := w.Write(data); err != nil {
		return 0, err
	}
	if err := w.Close(); err != nil {
		return 0, err
	}
	return b.Len(), nil
}
