import { rateUnit } from '../rateLaws/rateConstantUnit';
import type { RateLawName } from '../types';
import {
  celsius,
  celsiusToSet,
  durationNear,
  durationUp,
  kilojoules,
  listed,
  percent,
  rateText,
} from './benchWords';
import type { Proposal, TellLaws } from './proposal';

type ProposalOf<Code extends Proposal['code']> = Extract<Proposal, { code: Code }>;

/** A proposal as a sentence for a chemist: what to run, and what it will tell. */
export function explainProposal(proposal: Proposal): string {
  switch (proposal.code) {
    case 'sample-to':
    case 'sample-within':
    case 'more-readings':
    case 'repeat-well':
    case 'lower-noise':
      return tellLaws(proposal);
    case 'follow-until-bent':
      return `Follow the product at ${celsius(proposal.temperatureK)} to ${durationUp(proposal.lastS)}: it still grows so evenly that its end, and with it the order, stays open.`;
    case 'sample-earlier': {
      const colder = proposal.colderK === null ? '' : `${celsiusToSet(proposal.colderK)} or `;
      return `Sample ${celsius(proposal.temperatureK)} well before ${durationNear(proposal.overByS)}, or run ${colder}less catalyst: the reaction is over by the second reading.`;
    }
    case 'vary-concentration':
      return `Start wells at ${celsius(proposal.temperatureK)} from two concentrations and compare their initial rates: no run time or number of readings tried is expected to ${tell(proposal.laws)} at this noise.`;
    case 'more-readings-per-well':
      return `Take ${proposal.needed} readings per well or more, as at ${celsius(proposal.temperatureK)}: the ${proposal.readings} there are cannot tell an order.`;
    case 'repeat-only-well':
      return `Repeat the well at ${celsius(proposal.temperatureK)}: one reacting well alone decides so far.`;
    case 'tighten-rate-constant':
      return tightenRate(proposal);
    case 'three-temperatures':
      return `Add ${listed(proposal.temperaturesK.map((t) => celsiusToSet(t)))}: the activation energy needs three temperatures for its interval.`;
    case 'tighten-activation-energy':
      return tightenEnergy(proposal);
    case 'detect-reaction':
      return detect(proposal);
    case 'run-blanks':
      return `Run blanks at ${listed(proposal.temperaturesK.map(celsius))} with as many readings as the wells, so that their share can be taken off.`;
  }
}

/** "tell first from second order", "tell zero, first and second order apart". */
function tell(laws: readonly RateLawName[]): string {
  return laws.length === 2
    ? `tell ${laws[0]!} from ${laws[1]!} order`
    : `tell ${listed(laws)} order apart`;
}

function tellLaws(proposal: TellLaws): string {
  const { code, laws, lastS, readings, conversion, readingsAtPresentDuration: same } = proposal;
  const at = celsius(proposal.temperatureK);
  const reach = `${readings} readings, about ${percent(conversion)} conversion`;
  const instead =
    proposal.instead === null
      ? ''
      : `, or add ${celsiusToSet(proposal.instead, proposal.instead > proposal.temperatureK)} at the present run time,`;
  const more = same === null ? '' : ` ${same} readings within the present run time would do too.`;
  switch (code) {
    case 'sample-to':
    case 'more-readings':
      return `Sample ${at} to ${durationUp(lastS)} (${reach})${instead} to ${tell(laws)}.${more}`;
    case 'sample-within':
      return `Sample ${at} within the first ${durationNear(lastS)} (${reach})${instead} to ${tell(laws)}: later readings come after the reaction.`;
    case 'repeat-well':
      return `Repeat ${at} as it was (${readings} readings to ${durationUp(lastS)}): one more run like it is expected to ${tell(laws)}.`;
    case 'lower-noise':
      return `No run time is expected to ${tell(laws)} at this noise: at ${at} to ${durationUp(lastS)} (${readings} readings), bring it to ${percent(proposal.noiseShare ?? 1)} of what it is, or run ${proposal.replicates ?? 1} replicates.`;
  }
}

function tightenRate(proposal: ProposalOf<'tighten-rate-constant'>): string {
  const points = listed(proposal.pointsS.map(durationNear));
  return `Gather the ${proposal.readings} readings of ${celsius(proposal.temperatureK)} around ${points}: k is then expected within ± ${percent(proposal.expectedRelativeHalfWidth)}; it is within ± ${percent(proposal.relativeHalfWidth)} now.`;
}

function tightenEnergy(proposal: ProposalOf<'tighten-activation-energy'>): string {
  const { temperaturesK, replicates, repeats, reachesTarget } = proposal;
  const distinct = [...new Set(temperaturesK)];
  const temperatures = listed(distinct.map((t) => celsiusToSet(t)));
  const wells = replicates === 1 ? 'one well' : `${replicates} wells`;
  const plates = temperaturesK.length / distinct.length;
  const each =
    temperaturesK.length === 1
      ? wells
      : plates > 1
        ? `${wells} each on ${plates} plates`
        : `${wells} each`;
  const verb = repeats ? 'Run' : 'Add';
  const again = repeats ? ' once more' : '';
  const outcome = `the activation energy is then expected within ± ${kilojoules(proposal.expectedHalfWidth)} kJ/mol; it is within ± ${kilojoules(proposal.halfWidth)} kJ/mol now`;
  const left = reachesTarget ? '' : ` ± ${kilojoules(proposal.target)} kJ/mol needs less scatter.`;
  return `${verb} ${temperatures}${again} (${each}): ${outcome}.${left}`;
}

function detect(proposal: ProposalOf<'detect-reaction'>): string {
  const unit = rateUnit(proposal.dimension);
  const hotter = proposal.hotterK === null ? '' : `, or go to ${celsiusToSet(proposal.hotterK)}`;
  return `Run ${celsius(proposal.temperatureK)} to ${durationUp(proposal.lastS)}, where rates above ${rateText(proposal.detectableRate, unit)} would show${hotter}: so far only those above ${rateText(proposal.detectableNow, unit)} would have.`;
}
