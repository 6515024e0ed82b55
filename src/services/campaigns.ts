import { requirePermission } from '../auth/permissions';
import { groupIdsOf, type Viewer } from '../auth/viewer';
import type { CreateCampaignRequest } from '../contracts/campaigns';
import type { CampaignSummary } from '../contracts/leaderboard';
import type { Database } from '../db/client';
import { insertAuditEvent } from '../db/repositories/audit';
import {
  findCampaign,
  insertCampaign,
  listCampaigns,
  type CampaignRow,
} from '../db/repositories/campaigns';
import { problems } from '../errors';
import type { Services } from './services';

export function summariseCampaign(row: CampaignRow): CampaignSummary {
  return {
    id: row.id,
    groupId: row.groupId,
    name: row.name,
    reactant: row.reactant,
    dimension: row.dimension,
    referenceTemperatureK: row.referenceTemperatureK,
    referenceConcentration: row.referenceConcentration,
    referenceLoadingGPerL: row.referenceLoadingGPerL,
    targetConversion: row.targetConversion,
    conditions: row.conditions,
  };
}

/** @throws Problem 404 when the viewer is not in the group. */
export async function listCampaignSummaries(
  db: Database,
  viewer: Viewer,
  groupId: string,
): Promise<CampaignSummary[]> {
  requirePermission(viewer, groupId, 'read');
  return (await listCampaigns(db, groupId)).map(summariseCampaign);
}

/** The campaigns of all the viewer's groups, group by group. */
export async function listOwnCampaigns(db: Database, viewer: Viewer): Promise<CampaignSummary[]> {
  const lists = await Promise.all(
    groupIdsOf(viewer).map((groupId) => listCampaignSummaries(db, viewer, groupId)),
  );
  return lists.flat();
}

/** The campaign, if the viewer is in its group. @throws Problem 404 otherwise. */
export async function requireCampaign(
  db: Database,
  viewer: Viewer,
  campaignId: string,
): Promise<CampaignRow> {
  const row = await findCampaign(db, groupIdsOf(viewer), campaignId);
  if (!row) throw problems.notFound();
  return row;
}

/**
 * Defines a campaign.
 *
 * @throws Problem 404 in another group, 403 below lead, 409 when the name is taken.
 */
export async function createCampaign(
  services: Services,
  viewer: Viewer,
  request: CreateCampaignRequest,
): Promise<CampaignSummary> {
  const { groupId } = request;
  requirePermission(viewer, groupId, 'defineCampaign');
  const id = services.newId();
  const now = services.now();
  const row: CampaignRow = {
    id,
    groupId,
    name: request.name,
    reactant: request.reactant,
    nu: request.nu,
    dimension: request.dimension,
    referenceTemperatureK: request.referenceTemperatureC + 273.15,
    referenceConcentration: request.referenceConcentration,
    referenceLoadingGPerL: request.referenceLoadingGPerL,
    targetConversion: request.targetConversion,
    conditions: request.conditions,
    createdAt: now,
  };
  await services.db.transaction(async (tx) => {
    const taken = (await listCampaigns(tx, groupId)).some((one) => one.name === row.name);
    if (taken) throw problems.nameTaken('campaign', row.name);
    await insertCampaign(tx, row);
    await insertAuditEvent(tx, {
      groupId,
      userId: viewer.userId,
      action: 'campaign.create',
      objectId: id,
      detail: { name: row.name },
      at: now,
    });
  });
  return summariseCampaign(row);
}

/**
 * The same view, if the address names the group and campaign that it belongs to.
 *
 * @throws Problem 404 when it does not: an address is right as a whole or not at all.
 */
export function requireInGroup<View extends { campaign: CampaignSummary }>(
  groupId: string,
  view: View,
  campaignId = view.campaign.id,
): View {
  if (view.campaign.groupId !== groupId || view.campaign.id !== campaignId) {
    throw problems.notFound();
  }
  return view;
}

/** A campaign by the address of its page. @throws Problem 404 when the viewer is not in the group. */
export async function loadCampaignIn(
  db: Database,
  viewer: Viewer,
  groupId: string,
  campaignId: string,
): Promise<CampaignSummary> {
  const campaign = summariseCampaign(await requireCampaign(db, viewer, campaignId));
  return requireInGroup(groupId, { campaign }).campaign;
}
