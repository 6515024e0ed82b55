import { EventEmitter } from 'node:events';
import type { Database } from '../db/client';
import {
  insertCatalystResults,
  insertWellFits,
  listUnfinishedAnalyses,
  updateAnalysis,
  type AnalysisRow,
} from '../db/repositories/analyses';
import { findCampaign, listCatalysts } from '../db/repositories/campaigns';
import { findScreen, listWells } from '../db/repositories/screens';
import type { ReferenceConditions } from '../kinetics/types';
import type { WrittenScreen } from '../workers/gatherParts';
import { decaySeriesOfScreen } from './decaySeries';
import type { WorkerPools } from './workerPools';

export interface ProgressEvent {
  done: number;
  total: number;
}

const saveEveryMs = 500;

/**
 * Runs stored analyses one after the other in worker threads. Their rows in the database are the
 * truth: a run that a stopped server left behind is taken up again at the next start, and results
 * appear whole or not at all.
 */
export class AnalysisRunner {
  readonly #db: Database;
  readonly #pools: WorkerPools;
  readonly #now: () => Date;
  readonly #progress = new EventEmitter().setMaxListeners(0);
  #tail: Promise<void> = Promise.resolve();

  constructor(db: Database, pools: WorkerPools, now: () => Date) {
    this.#db = db;
    this.#pools = pools;
    this.#now = now;
  }

  /** Queues a stored analysis. */
  enqueue(analysis: Pick<AnalysisRow, 'id' | 'groupId' | 'screenId' | 'settings'>): void {
    this.#tail = this.#tail.then(() => this.#run(analysis));
  }

  /** Takes up what an earlier server left queued or running. */
  async resume(): Promise<number> {
    const left = await listUnfinishedAnalyses(this.#db);
    for (const analysis of left) this.enqueue(analysis);
    return left.length;
  }

  /** Resolves when everything queued so far has ended. */
  async idle(): Promise<void> {
    await this.#tail;
  }

  /** Calls back at each step of one analysis until the returned function is called. */
  watch(analysisId: string, listener: (event: ProgressEvent) => void): () => void {
    this.#progress.on(analysisId, listener);
    return () => this.#progress.off(analysisId, listener);
  }

  async #run(analysis: Pick<AnalysisRow, 'id' | 'groupId' | 'screenId' | 'settings'>) {
    const { id, groupId } = analysis;
    try {
      await updateAnalysis(this.#db, groupId, id, { status: 'running', done: 0 });
      const input = await this.#input(analysis);
      const result = await this.#pools.analyseScreen(input, this.#report(groupId, id));
      await this.#store(analysis, result);
    } catch (error) {
      console.error(`analysis ${id} failed: ${error instanceof Error ? error.message : 'unknown'}`);
      await updateAnalysis(this.#db, groupId, id, {
        status: 'failed',
        finishedAt: this.#now(),
        failure: 'The analysis stopped on an error of the program. Start it again.',
      }).catch(() => undefined);
    }
    this.#progress.emit(id, { done: 1, total: 1 });
  }

  async #input(analysis: Pick<AnalysisRow, 'groupId' | 'screenId' | 'settings'>) {
    const { groupId, screenId } = analysis;
    const screen = await findScreen(this.#db, [groupId], screenId);
    const campaign = screen && (await findCampaign(this.#db, [groupId], screen.screen.campaignId));
    if (!screen || !campaign) throw new Error('its screen is gone');
    const wells = await listWells(this.#db, groupId, screenId);
    return {
      series: decaySeriesOfScreen(campaign, screen.screen, wells),
      reference: JSON.parse(analysis.settings) as ReferenceConditions,
    };
  }

  #report(groupId: string, id: string) {
    let savedAt = 0;
    return (done: number, total: number) => {
      this.#progress.emit(id, { done, total });
      const now = this.#now().getTime();
      if (now - savedAt < saveEveryMs) return;
      savedAt = now;
      void updateAnalysis(this.#db, groupId, id, { done }).catch(() => undefined);
    };
  }

  async #store(
    analysis: Pick<AnalysisRow, 'id' | 'groupId' | 'screenId'>,
    result: WrittenScreen,
  ): Promise<void> {
    const { id, groupId, screenId } = analysis;
    const screen = await findScreen(this.#db, [groupId], screenId);
    if (!screen) throw new Error('its screen is gone');
    const cards = await listCatalysts(this.#db, groupId, screen.screen.campaignId);
    const idOfCode = new Map(cards.map((card) => [card.code, card.id]));
    await this.#db.transaction(async (tx) => {
      await insertWellFits(
        tx,
        result.series.map(({ name, verdict, json }) => ({
          groupId,
          analysisId: id,
          wellId: name,
          verdict,
          result: json,
        })),
      );
      await insertCatalystResults(
        tx,
        result.catalysts.map(({ name, verdict, json, sparkline = '[]' }) => {
          const catalystId = idOfCode.get(name);
          if (!catalystId) throw new Error(`catalyst ${name} has no card`);
          return { groupId, analysisId: id, catalystId, verdict, result: json, sparkline };
        }),
      );
      await updateAnalysis(tx, groupId, id, {
        status: 'done',
        done: result.series.length,
        finishedAt: this.#now(),
        failure: null,
      });
    });
  }
}
