import type { CampaignSummary } from '../../contracts/leaderboard';
import { readingUnitFor } from '../charts/displayUnits';
import { plotNumber } from '../charts/plotNumber';
import { formatKelvinAsCelsius } from '../numbers';

/** The conditions at which a campaign's candidates are compared, as they follow `compared`. */
export function conditionsOf(
  campaign: Pick<
    CampaignSummary,
    | 'dimension'
    | 'reactant'
    | 'referenceTemperatureK'
    | 'referenceConcentration'
    | 'referenceLoadingGPerL'
  >,
): string {
  const unit = readingUnitFor(campaign.dimension, campaign.referenceConcentration);
  const number = plotNumber(campaign.referenceConcentration * unit.factor);
  const amount = unit.unit ? `${number} ${unit.unit}` : `${number} of the initial`;
  return (
    `at ${formatKelvinAsCelsius(campaign.referenceTemperatureK)}, ${amount} ${campaign.reactant}` +
    ` and ${plotNumber(campaign.referenceLoadingGPerL)} g/L of catalyst`
  );
}
