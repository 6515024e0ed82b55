import { buildBromateCampaign } from './marlbeck';
import { buildOximeCampaign } from './tarnside';
import type { Demo } from './types';

/** The seed of the demo data as shipped. */
export const DEMO_SEED = 20_260;

/**
 * The whole demo scenario, invented from one seed. The same seed gives the same bytes; what the
 * catalysts really do is in `truths.ts`.
 */
export function buildDemo(seed: number = DEMO_SEED): Demo {
  return {
    groups: [
      { name: 'Marlbeck Surface Lab', campaigns: [buildBromateCampaign(seed)] },
      { name: 'Tarnside Catalysis Group', campaigns: [buildOximeCampaign(seed)] },
    ],
  };
}
