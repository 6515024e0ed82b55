import type { WorkbookIssue } from '../workbooks/types';

export type AnalysisStatus = 'queued' | 'running' | 'done' | 'failed';

/** A stored run of the engine and how far it has come. */
export interface AnalysisSummary {
  id: string;
  screenId: string;
  status: AnalysisStatus;
  /** Wells fitted so far, and in all. */
  done: number;
  total: number;
  engine: string;
  requestedBy: string;
  /** ISO 8601, UTC. */
  requestedAt: string;
  finishedAt: string | null;
  /** One sentence when it failed. */
  failure: string | null;
}

export interface ScreenSummary {
  id: string;
  campaignId: string;
  name: string;
  fileName: string;
  sha256: string;
  /** Bytes of the original. */
  size: number;
  plates: number;
  wells: number;
  readings: number;
  uploadedBy: string;
  uploadedAt: string;
  latestAnalysis: AnalysisSummary | null;
}

/** Verdict and numbers of one well in the latest analysis, for the screen page's table. */
export interface ScreenWellRow {
  wellId: string;
  plate: string;
  position: string;
  catalyst: string | null;
  catalystId: string | null;
  role: string;
  temperatureK: number;
  readings: number;
  verdict: string | null;
  conversion: number | null;
}

export interface ScreenView {
  screen: ScreenSummary;
  cautions: WorkbookIssue[];
  analyses: AnalysisSummary[];
  wells: ScreenWellRow[];
  may: { analyse: boolean };
}

/** Answer of an upload: stored, or known already. */
export interface UploadAnswer {
  screen: ScreenSummary;
  /** True when this file was already in the campaign; nothing was stored again. */
  alreadyImported: boolean;
  cautions: WorkbookIssue[];
  /** Page of the screen. */
  href: string;
}
