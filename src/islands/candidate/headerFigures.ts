import type { CandidateView } from '../../contracts/candidate';
import { rateUnit, reciprocalUnit } from '../../kinetics/rateLaws/rateConstantUnit';
import { celsius } from '../charts/buildArrheniusOption';
import { readingUnitFor } from '../charts/displayUnits';
import { plotNumber } from '../charts/plotNumber';
import type { Estimate } from '../../kinetics/types';
import { formulaText } from '../formula';
import { bracketFigure, durationFigure, figureOf, type Figure } from './figures';

/** One measured quantity of the header. */
export interface HeaderFigure {
  name: string;
  /** At which conditions it holds; empty where that goes without saying. */
  at: string;
  figure: Figure | null;
  /** What stands in its place, or beside it: a bracket, a reason why there is none. */
  note: string | null;
}

/** The numbers that a candidate is judged by, with their conditions. */
export function headerFigures({ result, campaign, catalyst }: CandidateView): HeaderFigure[] {
  const { dimension } = result;
  const concentration = readingUnitFor(dimension, campaign.referenceConcentration);
  const c = `${plotNumber(campaign.referenceConcentration * concentration.factor)} ${concentration.unit}`;
  const conditions =
    `${celsius(campaign.referenceTemperatureK)}, ${c}, ` +
    `${plotNumber(campaign.referenceLoadingGPerL)} g/L`;
  const inBracket = (figure: Figure) => (result.bracket ? bracketFigure(figure) : figure);
  const rate = (estimate: Estimate | null, unit: string) =>
    estimate && inBracket(figureOf(estimate, unit));
  const none =
    result.verdict === 'no-reaction'
      ? 'no reaction was seen'
      : 'cannot be given at these conditions';
  const bracket = result.bracket ? 'a bracket between zero and second order' : null;
  const ofInitialRates = result.activationEnergy === null && result.initialRateActivationEnergy;
  const energy = result.activationEnergy ?? result.initialRateActivationEnergy;
  const rates = [
    {
      name: 'Rate',
      at: conditions,
      figure: rate(result.rateRef, rateUnit(dimension)),
      note: result.rateRef ? bracket : none,
    },
    {
      name: 'Rate per mass of catalyst',
      at: 'at the same conditions',
      figure: rate(result.rateRefPerMass, 'mol kg^-1 s^-1'),
      note: result.rateRefPerMass ? bracket : result.rateRef ? 'no reference loading' : none,
    },
    {
      name: 'Turnover frequency',
      at: 'per site',
      figure: rate(result.turnoverFrequency, 's^-1'),
      note: result.turnoverFrequency
        ? bracket
        : catalyst.siteDensityMolPerKg === null
          ? 'the card has no site density'
          : none,
    },
  ];
  return [
    {
      name: 'Apparent activation energy',
      at: ofInitialRates ? 'of initial rates' : '',
      figure: energy && figureOf(energy, 'kJ/mol', 1e-3),
      note: energy
        ? null
        : result.verdict === 'no-reaction'
          ? none
          : 'needs one law at more than one temperature',
    },
    {
      name: 'Rate constant k',
      at: result.kRefTemperatureK === null ? '' : celsius(result.kRefTemperatureK),
      figure: result.kRef && figureOf(result.kRef, result.kUnit ?? ''),
      note: result.kRef
        ? null
        : result.rateRef
          ? 'no order, so no k; the rates stand without one'
          : 'no order, so no k',
    },
    ...adsorptionFigures(result),
    ...rates.slice(0, 1),
    {
      name: `Time to ${Math.round(campaign.targetConversion * 1000) / 10} % conversion`,
      at: `from ${c}`,
      figure: result.timeToTarget && inBracket(durationFigure(result.timeToTarget)),
      note: result.timeToTarget ? bracket : none,
    },
    ...(dimension === 'concentration' ? rates.slice(1) : []),
  ];
}

/** How strongly a saturating catalyst holds the reactant. */
function adsorptionFigures({ adsorption, dimension }: CandidateView['result']): HeaderFigure[] {
  if (adsorption === null) return [];
  const { K, temperatureK, enthalpy } = adsorption;
  return [
    {
      name: 'Adsorption constant K',
      at: celsius(temperatureK),
      figure: figureOf(K, reciprocalUnit(dimension)),
      note: null,
    },
    {
      name: 'Adsorption enthalpy',
      at: 'apparent',
      figure: enthalpy && figureOf(enthalpy, 'kJ/mol', 1e-3),
      note: enthalpy ? null : 'needs K at more than one temperature',
    },
  ];
}

/** What the catalyst is made of; the support only where the composition does not say it. */
export function compositionOf({ composition, support }: CandidateView['catalyst']): string {
  if (!composition) return support ? formulaText(support) : '';
  const both =
    support && !composition.includes(support) ? `${composition} on ${support}` : composition;
  return formulaText(both);
}

/** The catalyst's card as facts worth a line; what is unknown is left out. */
export function cardFacts({ catalyst }: CandidateView): [name: string, value: string][] {
  const number = (value: number | null, unit: string) =>
    value === null ? null : `${plotNumber(value)} ${unit}`;
  const facts: [string, string | null][] = [
    ['Support', catalyst.support && formulaText(catalyst.support)],
    ['Metal loading', number(catalyst.metalLoadingPercent, '%')],
    ['Lot', catalyst.lot],
    ['Active sites', number(catalyst.siteDensityMolPerKg, 'mol/kg')],
    ['Surface area', number(catalyst.surfaceAreaM2PerG, 'm²/g')],
    ['Particle size', number(catalyst.particleSizeUm, 'µm')],
    ['Hazards', catalyst.hazards],
  ];
  return facts.flatMap(([name, value]) => (value ? [[name, value] as [string, string]] : []));
}
