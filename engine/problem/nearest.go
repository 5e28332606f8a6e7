package problem

// Nearest gives the candidate that is most like text, or "" when none is near
// enough to be a slip of the pen: at most one edit for three characters, and
// never more than three. Edits are counted as insertions, deletions,
// substitutions and exchanges of neighbours (Damerau 1964).
func Nearest(text string, candidates []string) string {
	target := []rune(text)
	most := (len(target) + 2) / 3
	if most > 3 {
		most = 3
	}
	best, bestCost := "", most+1
	for _, candidate := range candidates {
		if candidate == text {
			continue
		}
		letters := []rune(candidate)
		if len(letters)-len(target) > most || len(target)-len(letters) > most {
			continue
		}
		cost := edits(target, letters)
		if cost < bestCost || cost == bestCost && best != "" && candidate < best {
			best, bestCost = candidate, cost
		}
	}
	return best
}

func edits(a, b []rune) int {
	beforeLast := make([]int, len(b)+1)
	last := make([]int, len(b)+1)
	now := make([]int, len(b)+1)
	for j := range last {
		last[j] = j
	}
	for i := 1; i <= len(a); i++ {
		now[0] = i
		for j := 1; j <= len(b); j++ {
			cost := 1
			if a[i-1] == b[j-1] {
				cost = 0
			}
			now[j] = min(last[j]+1, now[j-1]+1, last[j-1]+cost)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				now[j] = min(now[j], beforeLast[j-2]+1)
			}
		}
		beforeLast, last, now = last, now, beforeLast
	}
	return last[len(b)]
}
