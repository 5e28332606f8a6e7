// Package levels is the room of ladders of energy levels: explicit lists,
// harmonic oscillators, linear rigid rotors and independent combinations of
// them, and what follows from Boltzmann's distribution over their levels:
// partition sums, occupancies, population ratios, energy, heat capacity and
// entropy.
//
// A ladder is a made value: the law that makes one has no function, and a law
// that takes one gets the maker and its arguments.
package levels

import "plumbrule/engine/law"

// group is the name under which the catalogue lists this room's laws.
const group = "levels"

// Laws lists every law of the room.
func Laws() []*law.Law {
	all := []*law.Law{
		ladderLaw,
		oscillatorLaw,
		rotorLaw,
		combineLaw,
		anharmonicOscillatorLaw,
		morseLaw,
		boxLevelsLaw,
		hydrogenLikeLaw,
		spinRotorLaw,
		symmetricTopLaw,
		vibratingRotorLaw,
		asymmetricTopLaw,
		hinderedRotorLaw,
		classicalHinderedRotorLaw,
		spinLevelsLaw,
		nuclearSpinLevelsLaw,
		atomLaw,
		moleculeLaw,
		repeatModeLaw,
		shiftLaw,
		partitionSumLaw,
		occupancyLaw,
		occupanciesLaw,
		meanEnergyLaw,
		heatCapacityLaw,
		entropyLaw,
		boltzmannFactorLaw,
		populationRatioLaw,
		logPartitionSumLaw,
		freeEnergyLaw,
		energySpreadLaw,
		occupancyOfLaw,
		mostPopulatedLaw,
		levelsBelowLaw,
		temperatureFromRatioLaw,
		temperatureFromMeanEnergyLaw,
		temperatureFromOccupancyLaw,
		thermalWavelengthLaw,
		translationalPartitionSumLaw,
		translationalEntropyLaw,
		gasHeatCapacityLaw,
		gasEntropyLaw,
		gasEnthalpyIncrementLaw,
		gasGibbsFunctionLaw,
		equilibriumConstantLaw,
		dissociatedFractionLaw,
		fermiOccupancyLaw,
		boseOccupancyLaw,
		fermiIntegralLaw,
		carrierDensityLaw,
		fermiLevelForDensityLaw,
		effectiveDensityLaw,
		intrinsicCarrierDensityLaw,
		intrinsicDensityOfBandsLaw,
		dopantOccupancyLaw,
		ionisedDopantFractionLaw,
		debyeFunctionLaw,
		debyeHeatCapacityLaw,
		einsteinHeatCapacityLaw,
		planckRadianceLaw,
		blackBodyFractionLaw,
		langevinLaw,
		brillouinLaw,
		spinPolarisationLaw,
		siteOccupancyLaw,
		twoStateFractionLaw,
		vacancyFractionLaw,
		openFractionLaw,
		arrheniusRatioLaw,
		sahaRatioLaw,
		ionisedFractionLaw,
		ionisationEnergyLaw,
		lineStrengthAtLaw,
		dopplerWidthLaw,
		einsteinAbsorptionLaw,
		oscillatorStrengthLaw,
		lineEmissionLaw,
		excitationTemperatureLaw,
	}
	return all
}
