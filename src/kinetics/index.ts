export { analyseScreen } from './analyseScreen';
export { analyseSeries } from './analyseSeries';
export { analyseWell, type AnalysedWell } from './analyseWell';
export { analyseCatalyst } from './catalyst/analyseCatalyst';
export { ENGINE_VERSION, GAS_CONSTANT } from './constants';
export {
  evaluateArrhenius,
  evaluateFit,
  reactantConcentrations,
  straighten,
  type BandedCurve,
  type StraightenedReading,
} from './curves';
export { explainCatalyst, explainSeries, explainWarning } from './explanations';
export { explainProposal } from './planning/explainProposal';
export type { PlannedWell } from './planning/plannedWell';
export type { PlanningOptions, Proposal } from './planning/proposal';
export { proposals } from './planning/proposals';
export { baseUnit, rateConstantUnit, rateUnit } from './rateLaws/rateConstantUnit';
export { findRateLaw, lawOfOrder, rateLaws } from './rateLaws/registry';
export { formatWithUncertainty, superscript, type FormattedValue } from './significantFigures';
export type * from './types';
