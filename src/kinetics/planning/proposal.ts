import type { RateLawName, ReadingDimension } from '../types';
import type { TemperatureRange } from './discriminatingTemperature';
import type { SamplingLimits } from './samplingTimes';

/** K beyond the measured temperatures that may be run where no range is given. */
export const RANGE_BEYOND_MEASURED_K = 10;

/** What may be run next; `explainProposal` holds the sentence for each. Serialisable. */
export type Proposal =
  | TellLaws
  | {
      /** Product that shows no end yet: follow it longer before anything is planned on it. */
      code: 'follow-until-bent';
      seriesId: string;
      temperatureK: number;
      lastS: number;
      readings: number;
    }
  | {
      /** The reaction is over before it was sampled twice. */
      code: 'sample-earlier';
      seriesId: string;
      temperatureK: number;
      /** s: time of the second reading. */
      overByS: number;
      /** K: a colder run instead; null at the bottom of the range. */
      colderK: number | null;
    }
  | {
      /** Neither times nor readings nor replicates tell the laws: initial rates from two C0 do. */
      code: 'vary-concentration';
      seriesId: string;
      temperatureK: number;
      laws: RateLawName[];
    }
  | {
      /** Too few readings for any order. */
      code: 'more-readings-per-well';
      seriesId: string;
      temperatureK: number;
      readings: number;
      needed: number;
    }
  | {
      /** A single reacting well decides. */
      code: 'repeat-only-well';
      seriesId: string;
      temperatureK: number;
    }
  | {
      /** k of the asserted law is wide at one temperature. */
      code: 'tighten-rate-constant';
      seriesId: string;
      temperatureK: number;
      law: RateLawName;
      /** Present and expected half width of the 95 % interval over the value. */
      relativeHalfWidth: number;
      expectedRelativeHalfWidth: number;
      /** s: where readings are worth most, one or two times. */
      pointsS: number[];
      /** s, ascending. */
      timesS: number[];
      readings: number;
    }
  | {
      /** Fewer than three temperatures: Ea has no value or no interval. */
      code: 'three-temperatures';
      measuredK: number[];
      /** K, ascending: the temperatures to add. */
      temperaturesK: number[];
    }
  | {
      /** The interval of Ea is wider than the target. */
      code: 'tighten-activation-energy';
      /** K, ascending, one entry per further plate run. */
      temperaturesK: number[];
      replicates: number;
      /** J/mol, half widths of the 95 % interval: present, expected and wanted. */
      halfWidth: number;
      expectedHalfWidth: number;
      target: number;
      reachesTarget: boolean;
      /** True where the added temperatures were all measured before. */
      repeats: boolean;
    }
  | {
      /** Nothing reacts: where a reaction would show. */
      code: 'detect-reaction';
      seriesId: string;
      temperatureK: number;
      dimension: ReadingDimension;
      /** Upper 95 % limit of −dC/dt as measured, base unit s⁻¹. */
      rateLimit: number;
      /** Base unit s⁻¹: the rate that 9 of 10 runs like the present one show. */
      detectableNow: number;
      /** s: a longer run, and the rate that 9 of 10 runs like it show. */
      lastS: number;
      detectableRate: number;
      /** K: a hotter run instead; null at the top of the range. */
      hotterK: number | null;
    }
  | {
      /** What goes on without the catalyst matters, and could not be taken off here. */
      code: 'run-blanks';
      temperaturesK: number[];
    };

/** Times or temperatures that tell the competing laws apart. */
export interface TellLaws {
  code: 'sample-to' | 'sample-within' | 'more-readings' | 'repeat-well' | 'lower-noise';
  seriesId: string;
  temperatureK: number;
  /** The likeliest first. */
  laws: RateLawName[];
  /** s, ascending; the proposed sampling. */
  timesS: number[];
  lastS: number;
  readings: number;
  conversion: number;
  /** Readings that would do within the present duration; null where none would. */
  readingsAtPresentDuration: number | null;
  /** K: where a run of the present length reaches that conversion; null where none is allowed. */
  instead: number | null;
  noiseShare: number | null;
  replicates: number | null;
  evidenceRatio: number;
}

/** What the instrument and the group allow. */
export interface PlanningOptions extends Partial<SamplingLimits> {
  /** K, ascending; without it, `RANGE_BEYOND_MEASURED_K` beyond what its wells were measured at. */
  temperatureRangeK?: TemperatureRange;
  /** Half width of the 95 % interval of k over k. */
  rateTarget?: number;
  /** J/mol. */
  activationEnergyTarget?: number;
}
