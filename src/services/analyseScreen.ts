import { createHash } from 'node:crypto';
import { requirePermission } from '../auth/permissions';
import type { Viewer } from '../auth/viewer';
import type { AnalysisSummary } from '../contracts/screens';
import { insertAnalysis } from '../db/repositories/analyses';
import { insertAuditEvent } from '../db/repositories/audit';
import { findCampaign } from '../db/repositories/campaigns';
import { listWells } from '../db/repositories/screens';
import { problems } from '../errors';
import { ENGINE_VERSION } from '../kinetics';
import type { ReferenceConditions } from '../kinetics/types';
import { loadAnalysis } from './analyses';
import { decaySeriesOfScreen } from './decaySeries';
import { requireScreen } from './screens';
import type { Services } from './services';

/**
 * Stores a new analysis of a screen and queues it. Earlier analyses stay as they are.
 *
 * @throws Problem 404 for a screen of another group, 403 for a viewer.
 */
export async function analyseScreen(
  services: Services,
  viewer: Viewer,
  screenId: string,
): Promise<AnalysisSummary> {
  const screen = await requireScreen(services.db, viewer, screenId);
  const { groupId } = screen;
  requirePermission(viewer, groupId, 'analyse');
  const campaign = await findCampaign(services.db, [groupId], screen.campaignId);
  if (!campaign) throw problems.notFound();

  const reference: ReferenceConditions = {
    temperatureK: campaign.referenceTemperatureK,
    concentration: campaign.referenceConcentration,
    loadingGPerL: campaign.referenceLoadingGPerL,
    targetConversion: campaign.targetConversion,
  };
  const settings = JSON.stringify(reference);
  const series = decaySeriesOfScreen(
    campaign,
    screen,
    await listWells(services.db, groupId, screenId),
  );
  const id = services.newId();
  const now = services.now();
  await services.db.transaction(async (tx) => {
    await insertAnalysis(tx, {
      id,
      groupId,
      screenId,
      status: 'queued',
      done: 0,
      total: series.length,
      engine: ENGINE_VERSION,
      settings,
      inputSha256: createHash('sha256')
        .update(settings)
        .update(JSON.stringify(series))
        .digest('hex'),
      requestedBy: viewer.userId,
      requestedAt: now,
    });
    await insertAuditEvent(tx, {
      groupId,
      userId: viewer.userId,
      action: 'screen.analyse',
      objectId: id,
      detail: { screenId, engine: ENGINE_VERSION },
      at: now,
    });
  });
  // The answer is what was stored, not whatever the run has come to by then.
  try {
    return await loadAnalysis(services.db, viewer, id);
  } finally {
    services.runner.enqueue({ id, groupId, screenId, settings });
  }
}
