package levels

import (
	_ "embed"
	"math"
	"strings"
	"sync"

	"plumbrule/engine/column"
	"plumbrule/engine/law"
	"plumbrule/functions/nature"
)

//go:embed data/diatomics.txt
var diatomicTable string

// diatomic is one molecule of two atoms: its electronic states, the ground
// state first, energies in J.
type diatomic struct {
	name         string
	states       []diatomicState
	dissociation float64 // D_0 in J
	equal        bool    // two equal nuclei
	spin1, spin2 float64
}

// diatomicState is one electronic state.
type diatomicState struct {
	electronicState
	term       float64 // T_e in J
	degeneracy float64
	turned     int // +1: a Sigma state with even symmetry of even J, -1: of odd J, 0: both
}

// highestTerm bounds the electronic states that are counted, in cm^-1.
const highestTerm = 45000

var diatomics = sync.OnceValue(func() []diatomic {
	var all []diatomic
	for line := range strings.Lines(diatomicTable) {
		f := strings.Split(strings.TrimSpace(line), "|")
		if len(f) != 17 {
			continue
		}
		at := func(i int) float64 { return readNumber(f[i]) * reciprocal }
		state := diatomicState{
			electronicState: electronicState{
				we: at(4), wexe: at(5), weye: at(6), be: at(7), alpha: at(8), gamma: at(9), de: at(10), beta: at(11),
			},
			term: at(3), degeneracy: readNumber(f[12]), turned: symmetryOf(f[1]),
		}
		if f[2] == "yes" {
			all = append(all, diatomic{
				name: f[0], dissociation: readNumber(f[16]) * nature.ElementaryCharge,
				equal: f[13] == "2", spin1: readNumber(f[14]), spin2: readNumber(f[15]),
			})
		}
		if m := len(all) - 1; m >= 0 && all[m].name == f[0] && readNumber(f[3]) < highestTerm {
			all[m].states = append(all[m].states, state)
		}
	}
	return all
})

// symmetryOf reads the name of a state: in Sigma_g+ and Sigma_u- states the
// nuclei of even levels stay as they are when exchanged, in the others of odd
// ones; where Lambda is not 0 each level has both.
func symmetryOf(state string) int {
	if !strings.Contains(state, "Sigma") {
		return 0
	}
	sign := 1
	if strings.Contains(state, "^-") {
		sign = -sign
	}
	if strings.Contains(state, "_u") {
		sign = -sign
	}
	return sign
}

func diatomicOf(name string) *diatomic {
	all := diatomics()
	for i := range all {
		if all[i].name == name {
			return &all[i]
		}
	}
	return nil
}

// polyatomic is a molecule of more than two atoms: a rigid rotor and harmonic
// oscillators. Constants in cm^-1.
type polyatomic struct {
	name                 string
	symmetry, electronic float64
	a, b, c              float64 // a and c are 0 for a linear molecule
	modes                [][2]float64
}

// polyatomics: fundamentals and how many modes have each.
var polyatomics = [...]polyatomic{
	{"CO2", 2, 1, 0, 0.39021, 0, [][2]float64{{1333, 1}, {667, 2}, {2349, 1}}},
	{"H2O", 2, 1, 27.877, 14.512, 9.285, [][2]float64{{3657, 1}, {1595, 1}, {3756, 1}}},
	{"SO2", 2, 1, 2.02736, 0.34417, 0.29354, [][2]float64{{1151, 1}, {518, 1}, {1362, 1}}},
	{"NH3", 3, 1, 9.9443, 9.9443, 6.196, [][2]float64{{3337, 1}, {950, 1}, {3444, 2}, {1627, 2}}},
	{"CH4", 12, 1, 5.2412, 5.2412, 5.2412, [][2]float64{{2917, 1}, {1534, 2}, {3019, 3}, {1306, 3}}},
	{"N2O", 1, 1, 0, 0.41901, 0, [][2]float64{{1285, 1}, {589, 2}, {2224, 1}}},
	{"O3", 2, 1, 3.5537, 0.44525, 0.39479, [][2]float64{{1103, 1}, {701, 1}, {1042, 1}}},
	{"C2H2", 2, 1, 0, 1.17665, 0, [][2]float64{{3374, 1}, {1974, 1}, {3289, 1}, {612, 2}, {730, 2}}},
	{"H2S", 2, 1, 10.3601, 9.0181, 4.7318, [][2]float64{{2615, 1}, {1183, 1}, {2626, 1}}},
	{"NO2", 2, 2, 8.0024, 0.43371, 0.41045, [][2]float64{{1318, 1}, {750, 1}, {1617, 1}}},
}

func polyatomicOf(name string) *polyatomic {
	for i := range polyatomics {
		if polyatomics[i].name == name {
			return &polyatomics[i]
		}
	}
	return nil
}

// quantity gives a quantity of the molecule at 1/(k_B T) = beta, counted from
// its lowest level.
func (p *polyatomic) quantity(beta float64, want quantity) float64 {
	scale := reciprocal * beta
	if want == partition {
		return column.Exp(p.quantity(beta, logarithm))
	}
	var sum float64
	if p.a == 0 {
		sum = rotorQuantity(p.b*scale, p.symmetry, want)
	} else {
		x := float64(float64(p.a*scale)*float64(p.b*scale)) * float64(p.c*scale)
		ln := float64(0.5*column.Ln(math.Pi/x)) - column.Ln(p.symmetry)
		switch want {
		case logarithm:
			sum = ln
		case entropic:
			sum = ln + 1.5
		default:
			sum = 1.5
		}
	}
	if want == logarithm || want == entropic {
		sum += column.Ln(p.electronic)
	}
	for _, mode := range p.modes {
		sum += float64(mode[1] * oscillatorQuantity(mode[0]*scale, want))
	}
	return sum
}

func moleculeNames() []string {
	all := diatomics()
	names := make([]string, 0, len(all)+len(polyatomics))
	for i := range all {
		names = append(names, all[i].name)
	}
	for i := range polyatomics {
		names = append(names, polyatomics[i].name)
	}
	return names
}

const moleculeSource = "diatomic constants: Huber K.P., Herzberg G. (1979) Constants of Diatomic Molecules, and Irikura K.K. (2007) J. Phys. Chem. Ref. Data 36, 389, " +
	"with dissociation energies as compiled by Barklem P.S., Collet R. (2016) Astron. Astrophys. 588, A96; H2, v = 0: Dabrowski I. (1984) Can. J. Phys. 62, 1639; " +
	"NO, OH: Hill E., Van Vleck J.H. (1928) Phys. Rev. 32, 250; polyatomic: Shimanouchi T. (1972) NSRDS-NBS 39, Herzberg G. (1966) Electronic Spectra of Polyatomic Molecules"

var moleculeLaw = &law.Law{
	Name:  "molecule",
	Group: group,
	Gives: "the ladder of a molecule from its published constants, counted from v = 0, J = 0 of the ground state",
	Parameters: []law.Parameter{
		{Name: "formula", Meaning: "\"CO\", \"N2\", \"OH\", \"H2O\" and some forty more", Type: law.Text,
			CheckText: func(text string) string { return checkName("molecule", text, moleculeNames()) }},
		{Name: "states", Meaning: "all electronic states below 45,000 cm^-1, or the ground state alone", Type: law.Text, Default: `"all"`, Choices: []string{"all", "ground"}},
		{Name: "spin", Meaning: "nuclear spin of two equal nuclei: weights that alternate with J and average 1/2 (JANAF's and the astronomers' convention), 1/2 for every level, or counted in full with all spin states (HITRAN's)",
			Type: law.Text, Default: `"alternating"`, Choices: []string{"alternating", "average", "full"}},
	},
	Result: law.Result{Type: law.Made, Made: madeLadder},
	Equation: "diatomic: the levels of vibrating_rotor for each electronic state, at T_e + G'(0) - G(0), with its degeneracy; NO and OH: F_1, F_2 of a 2Pi state between Hund's cases; " +
		"polyatomic: rigid rotor, classical unless linear, and harmonic oscillators",
	Source: moleculeSource,
	Caution: "Diatomic: good below about 3000 K, weakly bound ones below a twentieth of D_0/k_B. Polyatomic: anharmonicity is left out, some 0.1 J/(mol K) in the entropy at 298 K, more when hot; not below 100 K. " +
		"Hydrogen is that of equilibrium between ortho and para.",
	Refusal: "a single level is asked for of a molecule of more than two atoms, whose levels are summed in closed form",
	Examples: []law.Example{
		{Formula: `partition_sum(molecule("CO"), 296[K])`, Gives: "107.4"},
		{Formula: `partition_sum(molecule("N2", spin: "full"), 296[K])`, Gives: "467.1"},
	},
}

// spinOf gives the weights of even and odd J of a state.
func (d *diatomic) spinOf(state *diatomicState, ground bool, spin string) (even, odd float64) {
	all := float64(float64(2*d.spin1)+1) * (float64(2*d.spin2) + 1)
	whole := 1.0
	if spin == "full" {
		whole = all
	}
	switch {
	case !d.equal:
		return whole, whole
	case spin == "average" || !ground || state.turned == 0:
		return whole / 2, whole / 2
	}
	even, odd = spinWeights(d.spin1, "all")
	if state.turned < 0 {
		even, odd = odd, even
	}
	if spin != "full" {
		even, odd = even/all, odd/all
	}
	return even, odd
}

func buildMolecule(set *levelSet, items []law.Argument, _ []float64) bool {
	d := diatomicOf(items[0].Text)
	if d == nil || len(items) < 3 {
		return false
	}
	asGas := len(items) > 3 && items[3].Text == natural
	if pi := doubletOf(d.name); pi != nil {
		weight, _ := d.spinOf(&d.states[0], true, items[2].Text)
		state := d.states[0].electronicState
		if asGas {
			state.stretch()
		}
		return pi.add(set, &state, weight)
	}
	top := d.dissociation
	ground := &d.states[0]
	for i := range d.states {
		state := d.states[i].electronicState
		if asGas {
			state.scale(isotopeRatio(d.name))
			state.stretch()
		}
		even, odd := d.spinOf(&d.states[i], i == 0, items[2].Text)
		state.even, state.odd = float64(even*d.states[i].degeneracy), float64(odd*d.states[i].degeneracy)
		base := 0.0
		if i > 0 {
			base = d.states[i].term + zeroPoint(&state) - zeroPoint(&ground.electronicState)
		}
		if !asGas && (d.name == "D2" || d.name == "HD") {
			// Without the third power of J(J + 1) levels hold up to these bounds.
			state.mostVibration, top = 36000*reciprocal, 38000*reciprocal
		}
		if !state.add(set, base, top) {
			return false
		}
		if d.name == "H2" && i == 0 {
			for j := range min(len(hydrogenTerms), set.runs[0]) {
				set.energy[j] = hydrogenTerms[j] * reciprocal
			}
		}
		if items[1].Text == "ground" {
			break
		}
	}
	return true
}

// hydrogenTerms are the measured levels of H2, v = 0, J = 0 to 6, in cm^-1.
var hydrogenTerms = [...]float64{0, 118.4868, 354.3733, 705.5189, 1168.798, 1740.187, 2414.89}

// zeroPoint gives G(0).
func zeroPoint(e *electronicState) float64 {
	return float64(e.we/2) - float64(e.wexe/4) + float64(e.weye/8)
}

// doublet is a 2Pi ground state between Hund's cases a and b.
type doublet struct {
	name        string
	coupling    float64 // A in cm^-1
	centrifugal float64 // D in cm^-1
	highest     float64 // bound of the levels in cm^-1
}

// doublets: the centrifugal constant of OH is that of the table (0 here).
var doublets = [...]doublet{
	{"NO", 123.13, 5.4e-6, 52400},
	{"OH", -139.21, 0, 35600},
}

func doubletOf(name string) *doublet {
	for i := range doublets {
		if doublets[i].name == name {
			return &doublets[i]
		}
	}
	return nil
}

// mostDoubled bounds J + 1/2, beyond all bound levels of the doublets.
const mostDoubled = 400

// turn gives F_1 (upper false) or F_2 for n = J + 1/2, in the unit of b and d.
func (p *doublet) turn(n, b, d, yielding, coupling float64, upper bool) float64 {
	y := coupling / b
	root := math.Sqrt(float64(4*float64(n*n)) + float64(y*(y-4)))
	sign, far := -0.5, n-0.5
	if upper {
		sign, far = 0.5, n+0.5
	}
	square := float64(far * far)
	return float64(b*(float64(n*n)-1+float64(sign*root))) - float64(lessened(d, yielding, square)*float64(square*square))
}

func (p *doublet) add(set *levelSet, e *electronicState, weight float64) bool {
	coupling := p.coupling * reciprocal
	first := 1.0 // of F_1: J = 1/2 lies in F_1 where A is above 0, else in F_2
	if coupling < 0 {
		first = 2
	}
	b, d := e.turning(0)
	if p.centrifugal > 0 {
		d = p.centrifugal * reciprocal
	}
	lowest := p.turn(first, b, d, e.yielding(d), coupling, false)
	ceiling := set.ceiling(float64(8 * b))
	last := math.Inf(-1)
	for v := 0.0; ; v++ {
		swing := vibration(v, e.we, e.wexe, e.weye)
		if !(swing > last) || swing > p.highest*reciprocal {
			return true
		}
		if swing > ceiling {
			set.truncated = true
			return true
		}
		last = swing
		b, d := e.turning(v)
		if p.centrifugal > 0 {
			d = p.centrifugal * reciprocal
		}
		for _, upper := range [...]bool{false, true} {
			n := 1.0
			if upper == (coupling > 0) {
				n = 2
			}
			before := math.Inf(-1)
			for ; n <= mostDoubled; n++ {
				energy := swing + p.turn(n, b, d, e.yielding(d), coupling, upper) - lowest
				if energy > p.highest*reciprocal || !(energy > before) {
					break
				}
				before = energy
				if energy > ceiling {
					set.truncated = true
					break
				}
				if !set.add(energy, float64(4*n*weight)) {
					return false
				}
			}
			set.endRun()
		}
	}
}
