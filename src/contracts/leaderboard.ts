import type {
  Estimate,
  RateLawName,
  ReadingDimension,
  Verdict,
  WarningCode,
} from '../kinetics/types';
import type { HeatmapCell } from '../screening/heatmap';
import type { Rankings } from '../screening/rankedMeasures';
import type { DecisionState } from './decisions';

export type { HeatmapCell };

/** One candidate on the leaderboard: a catalyst with its results in the current analysis. */
export interface LeaderboardRow {
  catalystId: string;
  code: string;
  composition: string | null;
  support: string | null;
  verdict: Verdict;
  order: number | null;
  basis: 'law' | 'initial-rate';
  /** k at the reference temperature and loading, in `kUnit`; ranked only within one order. */
  kRef: Estimate | null;
  kUnit: string | null;
  /** J/mol. */
  activationEnergy: Estimate | null;
  /** Base unit s⁻¹; with `bracket` low and high are orders 0 and 2, not a 95 % interval. */
  rateRef: Estimate | null;
  /** mol kg⁻¹ s⁻¹. */
  rateRefPerMass: Estimate | null;
  /** s⁻¹. */
  turnoverFrequency: Estimate | null;
  /** s. */
  timeToTarget: Estimate | null;
  bracket: boolean;
  /** Largest conversion reached, 0 to 1. */
  conversion: number | null;
  /** Residual standard deviation as a share of C0. */
  relativeResidualSd: number | null;
  wellsWithLackOfFit: number;
  wells: number;
  temperatures: number;
  warnings: { code: WarningCode; sentence: string }[];
  /** One sentence that says why the verdict is what it is. */
  explanation: string;
  /** Its place by each measure with a 95 % rank interval, and the chance to be among the first. */
  ranks: Rankings;
  tags: string[];
  decision: { state: DecisionState; version: number };
  screenId: string;
  screenName: string;
  analysisId: string;
  /** How many other screens of the campaign also hold this catalyst. */
  otherScreens: number;
  /** Thinned decay of its best-followed well: [time s, C/C0] pairs, at most 16. */
  sparkline: [number, number][];
}

export interface Leaderboard {
  campaign: CampaignSummary;
  rows: LeaderboardRow[];
  /** Screens that have no finished analysis yet. */
  pendingScreens: { id: string; name: string; analysisId: string | null }[];
}

export interface CampaignSummary {
  id: string;
  groupId: string;
  name: string;
  reactant: string;
  dimension: ReadingDimension;
  /** K. */
  referenceTemperatureK: number;
  /** Base unit of `dimension`. */
  referenceConcentration: number;
  referenceLoadingGPerL: number;
  targetConversion: number;
  /** Standing conditions in words: gas and pressure, solvent, pH, stirring. */
  conditions: string;
}

export interface HeatmapRow {
  catalystId: string;
  code: string;
  verdict: Verdict;
  law: RateLawName | null;
  /** Aligned with `Heatmap.temperaturesK`; null where nothing was measured. */
  cells: (HeatmapCell | null)[];
}

export interface Heatmap {
  campaign: CampaignSummary;
  temperaturesK: number[];
  rows: HeatmapRow[];
}
