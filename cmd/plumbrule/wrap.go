package main

import (
	"strings"

	"golang.org/x/term"
)

// mostWidth is how many columns running text takes at most: longer lines are
// hard to read, on a terminal, in a pipe and in a file alike.
const mostWidth = 100

// width is how many columns running text may take on standard output.
func (a *app) width() int {
	f := terminal(a.stdout)
	if f == nil {
		return mostWidth
	}
	columns, _, err := term.GetSize(int(f.Fd()))
	if err != nil || columns <= 0 {
		return mostWidth
	}
	return min(columns, mostWidth)
}

// wrapped breaks a text at its blanks into lines of at most so many columns.
// first stands before the first line and rest before the others; both count. A
// word that is longer than a line keeps a line of its own.
func wrapped(text, first, rest string, columns int) string {
	const leastColumns = 20 // deep inside of a tree a line still holds a few words
	line, used := first, textWidth(first)
	room := max(columns, textWidth(rest)+leastColumns)
	var b strings.Builder
	empty := true
	for _, word := range strings.Fields(printable(text)) {
		wide := textWidth(word)
		if !empty && used+1+wide > room {
			b.WriteString(line + "\n")
			line, used, empty = rest, textWidth(rest), true
		}
		if !empty {
			line += " "
			used++
		}
		line += word
		used += wide
		empty = false
	}
	b.WriteString(line + "\n")
	return b.String()
}

// textWidth is how many columns a text takes on a terminal.
func textWidth(text string) int {
	n := 0
	for _, c := range text {
		n += runeWidth(c)
	}
	return n
}
