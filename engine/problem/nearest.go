package problem

import "unicode"

// Nearest gives the candidate that is most like text, or "" when none is near
// enough to be a slip of the pen: at most one edit for three characters, and
// never more than three. A single letter is only taken for the same letter in
// the other case. Edits are counted as insertions, deletions,
// substitutions and exchanges of neighbours (Damerau 1964).
func Nearest(text string, candidates []string) string {
	target := []rune(text)
	most := (len(target) + 2) / 3
	if most > 3 {
		most = 3
	}
	best, bestCost := "", most+1
	var letters []rune
	var work edits
	for _, candidate := range candidates {
		if candidate == text {
			continue
		}
		letters = letters[:0]
		for _, r := range candidate {
			letters = append(letters, r)
		}
		if len(letters)-len(target) > most || len(target)-len(letters) > most {
			continue
		}
		if len(letters) == 0 || len(target) == 0 {
			continue
		}
		if short := min(len(letters), len(target)); short == 1 && (len(letters) != len(target) || unicode.ToLower(letters[0]) != unicode.ToLower(target[0])) {
			continue
		}
		cost := work.between(target, letters, bestCost)
		if cost < bestCost || cost == bestCost && best != "" && candidate < best {
			best, bestCost = candidate, cost
		}
	}
	return best
}

// edits holds the three rows that counting needs, for use again.
type edits struct{ beforeLast, last, now []int }

// between counts the edits from a to b; it may stop at any count above limit.
func (e *edits) between(a, b []rune, limit int) int {
	for len(e.last) <= len(b) {
		e.beforeLast, e.last, e.now = append(e.beforeLast, 0), append(e.last, 0), append(e.now, 0)
	}
	beforeLast, last, now := e.beforeLast, e.last, e.now
	for j := range b {
		last[j] = j
	}
	last[len(b)] = len(b)
	for i := 1; i <= len(a); i++ {
		now[0] = i
		least := i
		for j := 1; j <= len(b); j++ {
			cost := 1
			if a[i-1] == b[j-1] {
				cost = 0
			}
			now[j] = min(last[j]+1, now[j-1]+1, last[j-1]+cost)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				now[j] = min(now[j], beforeLast[j-2]+1)
			}
			least = min(least, now[j])
		}
		if least > limit+1 { // an exchange still to come saves one
			return least
		}
		beforeLast, last, now = last, now, beforeLast
	}
	return last[len(b)]
}
