import type { Proposal } from '../kinetics/planning/proposal';
import type { CatalystAnalysis, SeriesAnalysis, WarningCode, WellRole } from '../kinetics/types';
import type { DecisionRecord, DecisionState } from './decisions';
import type { CampaignSummary } from './leaderboard';

/** The catalyst's card. */
export interface CatalystCard {
  id: string;
  code: string;
  composition: string | null;
  support: string | null;
  /** Mass fraction in percent. */
  metalLoadingPercent: number | null;
  lot: string | null;
  /** mol/kg. */
  siteDensityMolPerKg: number | null;
  /** m²/g. */
  surfaceAreaM2PerG: number | null;
  /** µm. */
  particleSizeUm: number | null;
  hazards: string | null;
}

/** One well of a candidate with its readings and its fits. */
export interface CandidateWell {
  wellId: string;
  plate: string;
  position: string;
  role: WellRole;
  /** K. */
  temperatureK: number;
  replicate: number | null;
  massG: number | null;
  volumeL: number | null;
  /** s and base unit, in the order of the file. */
  timesS: number[];
  values: (number | null)[];
  /** Where the readings stand in the workbook: sheet, column letter, 1-based rows. */
  source: { sheet: string; column: string; rows: number[] };
  analysis: SeriesAnalysis;
  /** Drawn curves by law: shared times with C and, for the shown law, its 95 % band. */
  curves: {
    timesS: number[];
    laws: { law: string; values: number[] }[];
    band: { low: number[]; high: number[] } | null;
  };
  warnings: { code: WarningCode; sentence: string }[];
  explanation: string;
}

/** Everything the candidate page shows. */
export interface CandidateView {
  campaign: CampaignSummary;
  catalyst: CatalystCard;
  screen: { id: string; name: string; fileName: string };
  analysis: { id: string; engine: string; finishedAt: string; requestedBy: string };
  result: CatalystAnalysis;
  warnings: { code: WarningCode; sentence: string }[];
  explanation: string;
  /** What to run next; empty where nothing is open. */
  proposals: { code: Proposal['code']; sentence: string }[];
  wells: CandidateWell[];
  /** Arrhenius line and band: 1000/T in kK⁻¹ against ln k. */
  arrhenius: {
    points: { x: number; y: number; se: number; wellId: string; temperatureK: number }[];
    line: { x: number[]; y: number[]; low: number[] | null; high: number[] | null };
    yUnit: string;
  } | null;
  decision: { state: DecisionState; version: number; history: DecisionRecord[] };
  tags: string[];
  previous: { id: string; code: string } | null;
  next: { id: string; code: string } | null;
  may: { tag: boolean; nominate: boolean; decide: boolean };
}
