package air

import (
	"sync"

	"plumbrule/engine/column"
	"plumbrule/functions/nature"
)

// Cells of height between 86 km and 1000 km. Every height where the model
// changes a formula is an edge of a cell. Close to 115 km, where eddy diffusion
// ends with all its derivatives, and to 91 km the cells are small.
const (
	fineCells   = 136 // of 0.25 km, 86 km to 120 km
	middleCells = 40  // of 2 km, to 200 km
	wideCells   = 80  // of 10 km, to 1000 km
	upperCells  = fineCells + middleCells + wideCells

	fineStep, middleStep, wideStep = 0.25, 2.0, 10.0 // km
	fineTop, middleTop             = 120.0, 200.0    // km

	hydrogenCell = fineCells + 15                                          // the one that begins at 150 km
	anchorCell   = fineCells + middleCells + int((500-middleTop)/wideStep) // the one that begins at 500 km
)

// upperEdge gives the lower edge of a cell in km.
func upperEdge(cell int) float64 {
	switch {
	case cell <= fineCells:
		return upperBase + float64(fineStep*float64(cell))
	case cell <= fineCells+middleCells:
		return fineTop + float64(middleStep*float64(cell-fineCells))
	}
	return middleTop + float64(wideStep*float64(cell-fineCells-middleCells))
}

// upperQuantity is what the table holds the logarithm of: the number densities
// of the six gases, then pressure and density.
const (
	upperPressure = upperGases + iota
	upperDensity
	upperQuantities
)

// upperCell holds the logarithm of a quantity over one cell as a polynomial in
// x = (H - centre) scale, H the geopotential height in gpm.
type upperCell struct {
	centre, scale float64
	logarithm     polynomial
}

// upperTable is the integrated atmosphere.
type upperTable struct {
	edges [upperCells + 1]float64 // gpm
	cells [upperQuantities][upperCells]upperCell
	start [upperBins]uint8 // the cell in which a bin of height begins
}

// Bins of equal height lead to the cell: none is wider than the lowest cell,
// so that the cell is that of the bin's beginning or the next.
const (
	binHeight = 240.0 // gpm
	upperBins = 3247  // to 1000 km, 864070.71 gpm
)

// cellAt finds the cell of a geopotential height from 86 km to 1000 km.
func (t *upperTable) cellAt(altitude float64) int {
	bin := int((altitude - t.edges[0]) / binHeight)
	cell := int(t.start[min(max(bin, 0), upperBins-1)])
	if cell < upperCells-1 && altitude >= t.edges[cell+1] {
		cell++
	}
	return cell
}

// valueAt gives a quantity in coherent SI units at a geopotential height.
func (t *upperTable) valueAt(quantity int, altitude float64) float64 {
	return column.Exp(t.logarithmAt(quantity, altitude))
}

// logarithmAt gives the logarithm of a quantity in coherent SI units.
func (t *upperTable) logarithmAt(quantity int, altitude float64) float64 {
	c := &t.cells[quantity][t.cellAt(altitude)]
	return c.logarithm.at(float64((altitude - c.centre) * c.scale))
}

// upperAtmosphere integrates the standard's equations when it is first asked.
var upperAtmosphere = sync.OnceValue(integrateUpperAtmosphere)

// upperWork is what the integration keeps of one cell: the air and the
// logarithms of number densities at the sampling's nodes, and the same at the
// points of the polynomial.
type upperWork struct {
	from, to float64 // km
	nodes    [samples]upperAir
	atNodes  [upperGases][samples]float64
	points   [degree + 1]float64 // -1 to 1
	air      [degree + 1]upperAir
	atPoints [upperGases][degree + 1]float64
}

func integrateUpperAtmosphere() *upperTable {
	t := &upperTable{}
	sampling, fitting := newSampling(), newFitting()
	for i := range t.edges {
		t.edges[i] = geopotentialHeight(float64(1000 * upperEdge(i)))
	}
	work := make([]upperWork, upperCells)
	for i := range work {
		work[i].prepare(i, sampling, fitting, t)
	}
	integrateHeavyGases(work, sampling)
	integrateHydrogen(work, sampling)
	for i := range work {
		t.tabulate(i, &work[i], fitting)
	}
	cell := 0
	for bin := range t.start {
		low := t.edges[0] + float64(binHeight*float64(bin))
		for cell < upperCells-1 && low >= t.edges[cell+1] {
			cell++
		}
		t.start[bin] = uint8(cell)
	}
	return t
}

// inCell turns x of (-1, 1) into a height in km.
func (w *upperWork) inCell(x float64) float64 {
	return float64((w.from+w.to)/2) + float64(x*(w.to-w.from)/2)
}

func (w *upperWork) prepare(cell int, sampling *sampling, fitting *fitting, t *upperTable) {
	w.from, w.to = upperEdge(cell), upperEdge(cell+1)
	where := w.inCell(0)
	for j, x := range sampling.nodes {
		w.nodes[j] = newUpperAir(w.inCell(x), where)
	}
	// The points are even in geopotential height; their geometric heights
	// follow.
	low, high := t.edges[cell], t.edges[cell+1]
	for i, x := range fitting.points {
		h := float64((low+high)/2) + float64(x*(high-low)/2)
		z := geometricHeight(h) / 1000
		switch i {
		case 0:
			z = w.from
		case degree:
			z = w.to
		}
		w.points[i] = (z - where) / float64((w.to-w.from)/2)
		w.air[i] = newUpperAir(z, where)
	}
}

// integrateHeavyGases integrates N2, then O and O2 in it, then Ar and He in
// those three, from 86 km upwards.
func integrateHeavyGases(work []upperWork, sampling *sampling) {
	var fallen [upperGases]float64
	for i := range work {
		w := &work[i]
		for gas := nitrogen; gas <= helium; gas++ {
			s := &upperGasTable[gas]
			var rates [samples]float64
			for j := range rates {
				rates[j] = w.fallOf(gas, j)
			}
			integral := sampling.integral(&rates, float64((w.to-w.from)/2))
			base := column.Ln(s.base) - fallen[gas]
			for j, x := range sampling.nodes {
				w.atNodes[gas][j] = base + column.Ln(upperBaseTemperature/w.nodes[j].temperature) - integral.at(x)
			}
			for j, x := range w.points {
				w.atPoints[gas][j] = base + column.Ln(upperBaseTemperature/w.air[j].temperature) - integral.at(x)
			}
			fallen[gas] += integral.at(1)
		}
	}
}

// fallOf gives the rate of fall of a gas at a node, in 1/km, in the air that
// the standard takes for it.
func (w *upperWork) fallOf(gas, node int) float64 {
	a := &w.nodes[node]
	mixed := w.to <= mixedMassTop
	mass := kilomole * standardMolarMass
	if gas == nitrogen {
		if !mixed {
			mass = upperGasTable[nitrogen].molarMass
		}
		return float64(a.pull * mass)
	}
	n := column.Exp(w.atNodes[nitrogen][node])
	if gas == atomicOxygen || gas == oxygen {
		if !mixed {
			mass = upperGasTable[nitrogen].molarMass
		}
		return upperGasTable[gas].fall(a, n, mass)
	}
	density, weight := 0.0, 0.0
	for other := nitrogen; other <= oxygen; other++ {
		if other != nitrogen {
			n = column.Exp(w.atNodes[other][node])
		}
		density += n
		weight += float64(n * upperGasTable[other].molarMass)
	}
	if !mixed {
		mass = weight / density
	}
	return upperGasTable[gas].fall(a, density, mass)
}

// integrateHydrogen integrates atomic hydrogen from its density at 500 km
// (equation 39), down to 150 km with its upward flux and up to 1000 km without.
func integrateHydrogen(work []upperWork, sampling *sampling) {
	s := &upperGasTable[hydrogen]
	// tau from 150 km upwards, then what it is at 500 km.
	depths := make([]series, len(work))
	starts := make([]float64, len(work))
	depth, atAnchor := 0.0, 0.0
	for i := hydrogenCell; i < len(work); i++ {
		w := &work[i]
		var rates [samples]float64
		for j := range rates {
			rates[j] = float64(w.nodes[j].pull * s.molarMass)
		}
		depths[i] = sampling.integral(&rates, float64((w.to-w.from)/2))
		starts[i] = depth
		if i == anchorCell {
			atAnchor = depth
		}
		depth += depths[i].at(1)
	}
	// The flux's integral, from 500 km downwards.
	escaped := 0.0
	for i := len(work) - 1; i >= hydrogenCell; i-- {
		w := &work[i]
		start := starts[i] - atAnchor
		var integral series
		if i < anchorCell {
			var rates [samples]float64
			for j := range rates {
				rates[j] = w.hydrogenSource(j, start+depths[i].at(sampling.nodes[j]))
			}
			integral = sampling.integral(&rates, float64((w.to-w.from)/2))
			escaped -= integral.at(1) // now the integral from 500 km to the cell's lower edge
		}
		for j, x := range w.points {
			tau := start + depths[i].at(x)
			ratio := anchorTemperature / w.air[j].temperature
			w.atPoints[hydrogen][j] = column.Ln(hydrogenDensity-(escaped+integral.at(x))) + float64((1+s.thermal)*column.Ln(ratio)) - tau
		}
	}
}

// hydrogenSource gives (phi/D) (T/T11)^(1 + alpha) exp(tau) in 1/(m^3 km) at a
// node.
func (w *upperWork) hydrogenSource(node int, tau float64) float64 {
	s := &upperGasTable[hydrogen]
	density := 0.0
	for gas := nitrogen; gas <= helium; gas++ {
		density += column.Exp(w.atNodes[gas][node])
	}
	t := w.nodes[node].temperature
	diffusion := s.a * column.Pow(t/nature.IcePoint, s.b) / density
	return 1000 * hydrogenFlux / diffusion * column.Pow(t/anchorTemperature, 1+s.thermal) * column.Exp(tau)
}

// tabulate turns a cell's number densities into the polynomials of all
// quantities.
func (t *upperTable) tabulate(cell int, w *upperWork, fitting *fitting) {
	low, high := t.edges[cell], t.edges[cell+1]
	centre, scale := float64((low+high)/2), 2/(high-low)
	for quantity := range t.cells {
		t.cells[quantity][cell].centre, t.cells[quantity][cell].scale = centre, scale
	}
	last := hydrogen
	if cell < hydrogenCell {
		last = helium
	}
	var pressures, densities [degree + 1]float64
	for i := range w.points {
		number, weight := 0.0, 0.0
		for gas := nitrogen; gas <= last; gas++ {
			n := column.Exp(w.atPoints[gas][i])
			number += n
			weight += float64(n * upperGasTable[gas].molarMass)
		}
		pressures[i] = column.Ln(number * standardBoltzmann * w.air[i].temperature)
		densities[i] = column.Ln(weight / standardAvogadro)
	}
	for gas := nitrogen; gas <= last; gas++ {
		t.cells[gas][cell].logarithm = fitting.through(&w.atPoints[gas])
	}
	t.cells[upperPressure][cell].logarithm = fitting.through(&pressures)
	t.cells[upperDensity][cell].logarithm = fitting.through(&densities)
}
