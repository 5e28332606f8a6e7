package nature

// element is one row of the periodic table.
type element struct {
	symbol, name string
	// weight is the abridged standard atomic weight in ten-thousandths, so that
	// sums are exact; the digits stand as printed. 0 marks an element without a
	// standard atomic weight: it has no stable isotope and no characteristic
	// natural mixture.
	weight int64
}

// weightUnits is what element.weight counts: 1/weightUnits g/mol.
const weightUnits = 10_000

// atomicWeights names the source of the weights.
const atomicWeights = "IUPAC Commission on Isotopic Abundances and Atomic Weights: abridged standard atomic weights (Prohaska T. et al. (2022) Standard atomic weights of the elements 2021, Pure Appl. Chem. 94, 573-600; zirconium as revised in 2024), from memory"

// elements holds the periodic table in the order of the atomic number.
var elements = [...]element{
	{"H", "hydrogen", 1_0080},
	{"He", "helium", 4_0026},
	{"Li", "lithium", 6_9400},
	{"Be", "beryllium", 9_0122},
	{"B", "boron", 10_8100},
	{"C", "carbon", 12_0110},
	{"N", "nitrogen", 14_0070},
	{"O", "oxygen", 15_9990},
	{"F", "fluorine", 18_9980},
	{"Ne", "neon", 20_1800},
	{"Na", "sodium", 22_9900},
	{"Mg", "magnesium", 24_3050},
	{"Al", "aluminium", 26_9820},
	{"Si", "silicon", 28_0850},
	{"P", "phosphorus", 30_9740},
	{"S", "sulfur", 32_0600},
	{"Cl", "chlorine", 35_4500},
	{"Ar", "argon", 39_9500},
	{"K", "potassium", 39_0980},
	{"Ca", "calcium", 40_0780},
	{"Sc", "scandium", 44_9560},
	{"Ti", "titanium", 47_8670},
	{"V", "vanadium", 50_9420},
	{"Cr", "chromium", 51_9960},
	{"Mn", "manganese", 54_9380},
	{"Fe", "iron", 55_8450},
	{"Co", "cobalt", 58_9330},
	{"Ni", "nickel", 58_6930},
	{"Cu", "copper", 63_5460},
	{"Zn", "zinc", 65_3800},
	{"Ga", "gallium", 69_7230},
	{"Ge", "germanium", 72_6300},
	{"As", "arsenic", 74_9220},
	{"Se", "selenium", 78_9710},
	{"Br", "bromine", 79_9040},
	{"Kr", "krypton", 83_7980},
	{"Rb", "rubidium", 85_4680},
	{"Sr", "strontium", 87_6200},
	{"Y", "yttrium", 88_9060},
	{"Zr", "zirconium", 91_2220},
	{"Nb", "niobium", 92_9060},
	{"Mo", "molybdenum", 95_9500},
	{"Tc", "technetium", 0},
	{"Ru", "ruthenium", 101_0700},
	{"Rh", "rhodium", 102_9100},
	{"Pd", "palladium", 106_4200},
	{"Ag", "silver", 107_8700},
	{"Cd", "cadmium", 112_4100},
	{"In", "indium", 114_8200},
	{"Sn", "tin", 118_7100},
	{"Sb", "antimony", 121_7600},
	{"Te", "tellurium", 127_6000},
	{"I", "iodine", 126_9000},
	{"Xe", "xenon", 131_2900},
	{"Cs", "caesium", 132_9100},
	{"Ba", "barium", 137_3300},
	{"La", "lanthanum", 138_9100},
	{"Ce", "cerium", 140_1200},
	{"Pr", "praseodymium", 140_9100},
	{"Nd", "neodymium", 144_2400},
	{"Pm", "promethium", 0},
	{"Sm", "samarium", 150_3600},
	{"Eu", "europium", 151_9600},
	{"Gd", "gadolinium", 157_2500},
	{"Tb", "terbium", 158_9300},
	{"Dy", "dysprosium", 162_5000},
	{"Ho", "holmium", 164_9300},
	{"Er", "erbium", 167_2600},
	{"Tm", "thulium", 168_9300},
	{"Yb", "ytterbium", 173_0500},
	{"Lu", "lutetium", 174_9700},
	{"Hf", "hafnium", 178_4900},
	{"Ta", "tantalum", 180_9500},
	{"W", "tungsten", 183_8400},
	{"Re", "rhenium", 186_2100},
	{"Os", "osmium", 190_2300},
	{"Ir", "iridium", 192_2200},
	{"Pt", "platinum", 195_0800},
	{"Au", "gold", 196_9700},
	{"Hg", "mercury", 200_5900},
	{"Tl", "thallium", 204_3800},
	{"Pb", "lead", 207_2000},
	{"Bi", "bismuth", 208_9800},
	{"Po", "polonium", 0},
	{"At", "astatine", 0},
	{"Rn", "radon", 0},
	{"Fr", "francium", 0},
	{"Ra", "radium", 0},
	{"Ac", "actinium", 0},
	{"Th", "thorium", 232_0400},
	{"Pa", "protactinium", 231_0400},
	{"U", "uranium", 238_0300},
	{"Np", "neptunium", 0},
	{"Pu", "plutonium", 0},
	{"Am", "americium", 0},
	{"Cm", "curium", 0},
	{"Bk", "berkelium", 0},
	{"Cf", "californium", 0},
	{"Es", "einsteinium", 0},
	{"Fm", "fermium", 0},
	{"Md", "mendelevium", 0},
	{"No", "nobelium", 0},
	{"Lr", "lawrencium", 0},
	{"Rf", "rutherfordium", 0},
	{"Db", "dubnium", 0},
	{"Sg", "seaborgium", 0},
	{"Bh", "bohrium", 0},
	{"Hs", "hassium", 0},
	{"Mt", "meitnerium", 0},
	{"Ds", "darmstadtium", 0},
	{"Rg", "roentgenium", 0},
	{"Cn", "copernicium", 0},
	{"Nh", "nihonium", 0},
	{"Fl", "flerovium", 0},
	{"Mc", "moscovium", 0},
	{"Lv", "livermorium", 0},
	{"Ts", "tennessine", 0},
	{"Og", "oganesson", 0},
}

// elementOf finds the element with that symbol; nil when there is none.
func elementOf(symbol string) *element {
	for i := range elements {
		if elements[i].symbol == symbol {
			return &elements[i]
		}
	}
	return nil
}
