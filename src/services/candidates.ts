import { permissionFor, requirePermission } from '../auth/permissions';
import { groupIdsOf, type Viewer } from '../auth/viewer';
import type {
  DecideRequest,
  DecisionRecord,
  DecisionState,
  TagsRequest,
} from '../contracts/decisions';
import type { Executor } from '../db/client';
import { insertAuditEvent } from '../db/repositories/audit';
import {
  ensureCandidate,
  findCandidateState,
  insertDecision,
  listDecisions,
  listTags,
  replaceTags,
  updateCandidateState,
} from '../db/repositories/candidates';
import { findCatalyst, type CatalystRow } from '../db/repositories/campaigns';
import { problems } from '../errors';
import { stateAfter } from '../screening/decisions';
import { loadCurrentAnalyses, loadCurrentResults } from './currentAnalyses';
import type { Services } from './services';

export interface CandidateDecision {
  state: DecisionState;
  version: number;
  /** Newest first. */
  history: DecisionRecord[];
}

/** @throws Problem 404 when the viewer is not in the catalyst's group. */
export async function requireCatalyst(
  db: Executor,
  viewer: Viewer,
  catalystId: string,
): Promise<CatalystRow> {
  const row = await findCatalyst(db, groupIdsOf(viewer), catalystId);
  if (!row) throw problems.notFound();
  return row;
}

export async function loadDecision(
  db: Executor,
  groupId: string,
  catalystId: string,
): Promise<CandidateDecision> {
  const [state, rows] = await Promise.all([
    findCandidateState(db, groupId, catalystId),
    listDecisions(db, groupId, catalystId),
  ]);
  return {
    ...state,
    history: rows.map(({ decision, decidedByName }) => ({
      action: decision.action,
      from: decision.fromState,
      to: decision.toState,
      reason: decision.reason,
      by: decidedByName,
      at: decision.decidedAt.toISOString(),
      analysisId: decision.analysisId,
    })),
  };
}

/**
 * Moves a candidate on and records who, when, why, and on which analysis.
 *
 * @throws Problem 404 in another group, 403 below the role it takes, 409 when somebody decided in
 *   the meantime or the step is not possible from where the candidate stands.
 */
export async function decideCandidate(
  services: Services,
  viewer: Viewer,
  catalystId: string,
  request: DecideRequest,
): Promise<CandidateDecision> {
  const { db } = services;
  const catalyst = await requireCatalyst(db, viewer, catalystId);
  const { groupId, campaignId } = catalyst;
  requirePermission(viewer, groupId, permissionFor(request.action));
  const current = await loadCurrentAnalyses(db, groupId, campaignId);
  const result = (await loadCurrentResults(db, groupId, current)).get(catalystId);
  const now = services.now();

  await db.transaction(async (tx) => {
    await ensureCandidate(tx, groupId, catalystId);
    const before = await findCandidateState(tx, groupId, catalystId);
    if (before.version !== request.version) throw await stale(tx, groupId, catalystId);
    const to = stateAfter(before.state, request.action);
    if (!to) {
      throw problems.notFromHere(
        `${catalyst.code} is “${before.state}”; “${request.action}” is not possible from there.`,
      );
    }
    const moved = await updateCandidateState(tx, groupId, catalystId, before.version, to);
    if (!moved) throw await stale(tx, groupId, catalystId);
    await insertDecision(tx, {
      id: services.newId(),
      groupId,
      catalystId,
      action: request.action,
      fromState: before.state,
      toState: to,
      reason: request.reason,
      analysisId: result?.row.analysisId ?? null,
      decidedBy: viewer.userId,
      decidedAt: now,
    });
    await insertAuditEvent(tx, {
      groupId,
      userId: viewer.userId,
      action: `candidate.${request.action}`,
      objectId: catalystId,
      detail: { from: before.state, to, reason: request.reason },
      at: now,
    });
  });
  return loadDecision(db, groupId, catalystId);
}

async function stale(db: Executor, groupId: string, catalystId: string) {
  const { state, version, history } = await loadDecision(db, groupId, catalystId);
  const last = history[0];
  const who = last ? `${last.by} did, at ${last.at}.` : 'The page you had was out of date.';
  return problems.staleVersion({ state, version, last: last ?? null }, who);
}

/**
 * Puts a candidate's tags in the place of those it had.
 *
 * @throws Problem 404 in another group, 403 for a viewer.
 */
export async function tagCandidate(
  services: Services,
  viewer: Viewer,
  catalystId: string,
  request: TagsRequest,
): Promise<string[]> {
  const { db } = services;
  const { groupId } = await requireCatalyst(db, viewer, catalystId);
  requirePermission(viewer, groupId, 'tag');
  const tags = [...new Set(request.tags)];
  const now = services.now();
  await db.transaction(async (tx) => {
    const before = (await listTags(tx, groupId, [catalystId])).get(catalystId) ?? [];
    await replaceTags(tx, groupId, catalystId, tags, { userId: viewer.userId, at: now });
    await insertAuditEvent(tx, {
      groupId,
      userId: viewer.userId,
      action: 'candidate.tag',
      objectId: catalystId,
      detail: { before, after: tags },
      at: now,
    });
  });
  return (await listTags(db, groupId, [catalystId])).get(catalystId) ?? [];
}
