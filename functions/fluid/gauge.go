package fluid

import (
	"math"

	"plumbrule/engine/law"
)

// gaugeLaws turn gauge into absolute pressure and back.
func gaugeLaws() []*law.Law {
	const definition = "definition; ISO 80000-4:2019, item 4-14.2 (gauge pressure)"
	ambient := law.Parameter{
		Name: "ambient", Meaning: "absolute pressure of the surroundings that the gauge is open to",
		Unit: "Pa(a)", Finite: law.AtLeast(0),
	}
	return []*law.Law{
		{
			Name:  "absolute",
			Group: "fluid",
			Gives: "absolute pressure from a gauge pressure",
			Parameters: []law.Parameter{
				{Name: "pressure", Meaning: "gauge pressure; negative for a partial vacuum", Unit: "Pa(g)"},
				ambient,
			},
			Result:   law.Result{Unit: "Pa(a)"},
			Equation: "p = p_e + p_amb; p_e pressure, p_amb ambient",
			Source:   definition,
			Caution:  "The ambient pressure is that at the gauge: weather changes it by 5 %, the first 1000 m of height by 11 %.",
			Refusal:  "the gauge pressure lies further below the surroundings than vacuum",
			Examples: []law.Example{
				{Formula: "absolute(2[barg], 1[bara])", Gives: "3 bara"},
				{Formula: "absolute(0[barg], 1[atm])", Gives: "101325 Pa"},
			},
			Body: law.Of2(absolutePressure),
		},
		{
			Name:  "gauge",
			Group: "fluid",
			Gives: "gauge pressure from an absolute pressure",
			Parameters: []law.Parameter{
				{Name: "pressure", Meaning: "absolute pressure", Unit: "Pa(a)", Finite: law.AtLeast(0)},
				ambient,
			},
			Result:   law.Result{Unit: "Pa(g)"},
			Equation: "p_e = p - p_amb; p pressure, p_amb ambient",
			Source:   definition,
			Caution:  "The ambient pressure is that at the gauge: weather changes it by 5 %, the first 1000 m of height by 11 %.",
			Examples: []law.Example{
				{Formula: "gauge(3[bara], 1[bara])", Gives: "2 barg"},
			},
			Body: law.Of2(gaugePressure),
		},
	}
}

// absolutePressure adds the surroundings' pressure, all in Pa; NaN below vacuum.
func absolutePressure(gauge, ambient float64) float64 {
	pressure := gauge + ambient
	if pressure < 0 {
		return math.NaN()
	}
	return pressure
}

// gaugePressure takes the surroundings' pressure away, all in Pa.
func gaugePressure(absolute, ambient float64) float64 { return absolute - ambient }
