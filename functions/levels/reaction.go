package levels

import (
	"math"
	"strconv"
	"strings"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

// term is a gas of a reaction with its coefficient: above 0 for products.
type term struct {
	name  string
	times float64
}

// readReaction reads "N2 + 3 H2 = 2 NH3", "I2 -> 2 I" or "1/2 N2 = N" and checks
// that every gas is known and every element balances.
func readReaction(text string) (terms []term, complaint string) {
	if len(text) > 400 {
		return nil, "a reaction has at most 400 characters"
	}
	left, right, found := strings.Cut(text, "=")
	if !found {
		left, right, found = strings.Cut(text, "->")
	}
	if !found || strings.ContainsAny(right, "=>") {
		return nil, "a reaction has two sides: \"N2 + 3 H2 = 2 NH3\""
	}
	for side, sign := range []float64{-1, 1} {
		for _, part := range strings.Split([]string{left, right}[side], "+") {
			t, wrong := readTerm(part)
			if wrong != "" {
				return nil, wrong
			}
			t.times *= sign
			terms = append(terms, t)
		}
	}
	return terms, balance(terms)
}

// readTerm reads "2 N", "0.5 N2", "1/2 O2" or "CO".
func readTerm(part string) (t term, complaint string) {
	fields := strings.Fields(part)
	t.times = 1
	switch len(fields) {
	case 1:
	case 2:
		over, under, halved := strings.Cut(fields[0], "/")
		x, err := strconv.ParseFloat(over, 64)
		if err == nil && halved {
			var y float64
			y, err = strconv.ParseFloat(under, 64)
			x /= y
		}
		if err != nil || !(x > 0 && x <= 1000) {
			return t, "\"" + fields[0] + "\" is no coefficient between 0 and 1000"
		}
		t.times = x
	default:
		return t, "each part of a reaction is a coefficient and a gas: \"2 N\""
	}
	t.name = fields[len(fields)-1]
	return t, checkGas(t.name)
}

// balance says which element does not balance.
func balance(terms []term) string {
	var sums []elementCount
	for _, t := range terms {
		atoms, _ := countElements(t.name)
		for _, a := range atoms {
			at := -1
			for i := range sums {
				if sums[i].symbol == a.symbol {
					at = i
				}
			}
			if at < 0 {
				sums = append(sums, elementCount{symbol: a.symbol})
				at = len(sums) - 1
			}
			sums[at].count += float64(t.times * a.count)
		}
	}
	for _, s := range sums {
		if math.Abs(s.count) > 1e-9 {
			return "the reaction does not balance in " + s.symbol
		}
	}
	return ""
}

// reactionWork is a worker's room for one reaction.
type reactionWork struct {
	text     string
	terms    []term
	gases    []*gasWork
	enthalpy float64 // of formation at 298.15 K, products less reactants, over R in K
	ground   float64 // energy of the lowest levels likewise, in J
}

func reactionIn(work *law.Work, text string) *reactionWork {
	w, known := work.Keep.(*reactionWork)
	if known && w.text == text {
		return w
	}
	w = &reactionWork{text: text}
	terms, complaint := readReaction(text)
	if complaint == "" {
		w.terms = terms
	}
	for _, t := range w.terms {
		g := &gasWork{name: t.name}
		g.gas, g.ok = gasOf(t.name)
		w.gases = append(w.gases, g)
		w.enthalpy += float64(t.times*g.enthalpyOfFormation()) / nature.MolarGasConstant
		w.ground += float64(t.times * g.groundEnergy())
	}
	work.Keep = w
	return w
}

// fromFormation gives ln K from enthalpies of formation and entropies.
func (w *reactionWork) fromFormation(temperature float64) float64 {
	ln := -w.enthalpy / temperature
	for i, t := range w.terms {
		g := w.gases[i]
		ln += float64(t.times * (g.entropy(temperature, nature.StandardStatePressure) - g.increment(temperature, standardTemperature)/temperature))
	}
	return ln
}

// fromLevels gives ln K from partition sums and dissociation energies.
func (w *reactionWork) fromLevels(temperature float64) float64 {
	ln := -float64(w.ground * inverseOf(temperature))
	for i, t := range w.terms {
		ln += float64(t.times * w.gases[i].lnStandard(temperature))
	}
	return ln
}

func (w *reactionWork) ln(temperature float64, levels bool) float64 {
	switch {
	case len(w.terms) == 0 || !(temperature > 0):
		return notANumber
	case levels:
		return w.fromLevels(temperature)
	}
	return w.fromFormation(temperature)
}

func energiesParameter() law.Parameter {
	return law.Parameter{Name: "energies", Meaning: "what tells the heat of the reaction: enthalpies of formation at 298.15 K, or the dissociation energies D_0 of diatomic molecules",
		Type: law.Text, Default: `"formation"`, Choices: []string{"formation", "dissociation"}}
}

const (
	reactionSource = "Mayer J.E., Mayer M.G. (1940) Statistical Mechanics, chapter 9; enthalpies of formation: Chase M.W. (1998) NIST-JANAF Thermochemical Tables, 4th ed., of diatomic molecules that are not in it from the atoms and D_0; " +
		"dissociation energies: Barklem P.S., Collet R. (2016) Astron. Astrophys. 588, A96, table 1"
	reactionCaution = "Ideal gases at chemical equilibrium, standard pressure 1 bar. An error of 1 kJ/mol in the enthalpy is one of 0.17 in log10 K at 300 K. "
)

var equilibriumConstantLaw = &law.Law{
	Name:  "equilibrium_constant",
	Group: group,
	Gives: "the equilibrium constant of a reaction of ideal gases",
	Parameters: []law.Parameter{
		{Name: "reaction", Meaning: "its equation: \"N2 + 3 H2 = 2 NH3\", \"I2 = 2 I\", \"1/2 N2 = N\"", Type: law.Text,
			CheckText: func(text string) string { _, complaint := readReaction(text); return complaint }},
		gasTemperature(),
		energiesParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "K = product of (p_j/1 bar)^nu_j; ln K = sum of nu_j (S_j - (H_j - H_j(Tr))/T)/R - Delta_f H(Tr)/(R T), or sum of nu_j ln(q_j/N) - Delta E_0/(k_B T)",
	Source:   reactionSource,
	Caution:  reactionCaution + gasCaution,
	Refusal:  "the dissociation energy of one of the gases is not in the table (molecules of three and more atoms), or the constant is beyond what a number can hold",
	Examples: []law.Example{
		{Formula: `log10(equilibrium_constant("1/2 N2 + 1/2 O2 = NO", 1500[K]))`, Gives: "-2.49"},
		{Formula: `log10(equilibrium_constant("1/2 H2 = H", 800[K]))`, Gives: "-11.54"},
	},
	Body: func(dst []float64, arguments []law.Argument, work *law.Work) {
		w := reactionIn(work, arguments[0].Text)
		levels := arguments[2].Text == "dissociation"
		for i := range dst {
			dst[i] = gasExp(w.ln(arguments[1].At(i), levels))
		}
	},
}

var dissociatedFractionLaw = &law.Law{
	Name:  "dissociated_fraction",
	Group: group,
	Gives: "the share of the molecules of a diatomic gas that have broken up into atoms",
	Parameters: []law.Parameter{
		{Name: "species", Meaning: "a diatomic gas: \"H2\", \"O2\", \"HCl\"", Type: law.Text, CheckText: func(text string) string {
			if dissociation(text) == "" {
				return checkDiatomic(text)
			}
			return ""
		}},
		gasTemperature(),
		pressureParameter("100000[Pa(a)]"),
		energiesParameter(),
	},
	Result:   law.Result{Unit: "1"},
	Equation: "AB = A + B: alpha = sqrt(K/(K + p/1 bar)); A2 = 2 A: alpha = sqrt(K/(K + 4 p/1 bar)); p total pressure",
	Source:   reactionSource,
	Caution:  reactionCaution + gasCaution,
	Examples: []law.Example{
		{Formula: `dissociated_fraction("I2", 300[K]) < 1e-9 ? 1 : 0`, Gives: "1"},
		{Formula: `dissociated_fraction("H2", 3000[K])`, Gives: "0.08"},
	},
	Body: dissociatedFraction,
}

// dissociation gives the reaction of a diatomic gas into atoms, "" for others.
func dissociation(name string) string {
	g, ok := gasOf(name)
	if !ok || diatomicOf(name) == nil {
		return ""
	}
	parts := make([]string, len(g.atoms))
	for i, a := range g.atoms {
		if _, known := gasOf(a.symbol); !known {
			return ""
		}
		parts[i] = strconv.FormatFloat(a.count, 'g', -1, 64) + " " + a.symbol
	}
	return name + " = " + strings.Join(parts, " + ")
}

func checkDiatomic(text string) string {
	if complaint := checkGas(text); complaint != "" {
		return complaint
	}
	return "\"" + text + "\" is no diatomic gas with both atoms in the tables"
}

func dissociatedFraction(dst []float64, arguments []law.Argument, work *law.Work) {
	w := reactionIn(work, dissociation(arguments[0].Text))
	levels := arguments[3].Text == "dissociation"
	times := 1.0
	if len(w.terms) == 2 {
		times = 4
	}
	for i := range dst {
		ln := w.ln(arguments[1].At(i), levels)
		// sqrt(1/(1 + times p/(p0 K))), which no size of K overflows.
		rest := column.Exp(column.Ln(float64(times*arguments[2].At(i))/nature.StandardStatePressure) - ln)
		dst[i] = math.Sqrt(1 / (1 + rest))
		if ln != ln {
			dst[i] = notANumber
		}
	}
}
