import { createHash } from 'node:crypto';
import { requirePermission } from '../auth/permissions';
import { groupIdsOf, type Viewer } from '../auth/viewer';
import { screenHref } from '../contracts/links';
import type { UploadAnswer } from '../contracts/screens';
import type { Executor } from '../db/client';
import { insertAuditEvent } from '../db/repositories/audit';
import {
  findCampaign,
  insertCatalysts,
  listCatalysts,
  type CampaignRow,
} from '../db/repositories/campaigns';
import {
  findScreenBySha256,
  insertPlates,
  insertScreen,
  insertWells,
  lockCampaign,
  type WellInsert,
} from '../db/repositories/screens';
import { problems } from '../errors';
import type { ParsedScreen, ParsedWell, WorkbookIssue } from '../workbooks/types';
import { packFloats, packIntegers } from './readingsCodec';
import { loadScreenSummary } from './screens';
import type { Services } from './services';

export interface ScreenUpload {
  campaignId: string;
  name: string;
  fileName: string;
  bytes: Buffer;
}

/**
 * Reads an uploaded workbook and stores it whole, with its readings, in one transaction. The same
 * file in the same campaign is stored once.
 *
 * @throws Problem 404 for a campaign of another group, 403 for a viewer, 422 with every fault of the
 *   workbook; nothing is stored then.
 */
export async function importScreen(
  services: Services,
  viewer: Viewer,
  upload: ScreenUpload,
): Promise<UploadAnswer> {
  const campaign = await findCampaign(services.db, groupIdsOf(viewer), upload.campaignId);
  if (!campaign) throw problems.notFound();
  requirePermission(viewer, campaign.groupId, 'upload');

  const sha256 = createHash('sha256').update(upload.bytes).digest('hex');
  const known = await knownScreen(services, campaign, sha256);
  if (known) return known;

  const parsed = await services.pools.readWorkbook(upload.bytes, upload.fileName);
  if (!parsed.ok) throw problems.workbookFaults(parsed.issues, countStops(parsed.issues));
  refuseOtherDimension(campaign, parsed.screen);

  const screenId = services.newId();
  const stored = await services.db.transaction(async (tx) => {
    await lockCampaign(tx, campaign.groupId, campaign.id);
    // Somebody may have stored the same file while this one was being read.
    if (await findScreenBySha256(tx, campaign.groupId, campaign.id, sha256)) return false;
    await storeScreen(
      tx,
      services,
      viewer,
      campaign,
      { ...upload, sha256, screenId },
      parsed.screen,
    );
    return true;
  });
  if (!stored) {
    const other = await knownScreen(services, campaign, sha256);
    if (other) return other;
  }
  return answerFor(services, campaign, screenId, false, parsed.screen.cautions);
}

const countStops = (issues: WorkbookIssue[]) =>
  issues.filter((issue) => issue.severity === 'stop').length;

async function knownScreen(services: Services, campaign: CampaignRow, sha256: string) {
  const known = await findScreenBySha256(services.db, campaign.groupId, campaign.id, sha256);
  return known && answerFor(services, campaign, known.screen.id, true, []);
}

async function answerFor(
  services: Services,
  campaign: CampaignRow,
  screenId: string,
  alreadyImported: boolean,
  cautions: WorkbookIssue[],
): Promise<UploadAnswer> {
  const screen = await loadScreenSummary(services.db, campaign.groupId, screenId);
  return {
    screen,
    alreadyImported,
    cautions,
    href: screenHref(campaign.groupId, campaign.id, screenId),
  };
}

/** Readings of another kind of unit could not be compared with the campaign's other screens. */
function refuseOtherDimension(campaign: CampaignRow, screen: ParsedScreen): void {
  if (campaign.dimension === screen.dimension) return;
  const issue: WorkbookIssue = {
    severity: 'stop',
    code: 'other-dimension',
    sheet: screen.wells[0]?.readings.sheet ?? '',
    cell: null,
    found: screen.readingUnit,
    expected: `readings in a unit of ${campaign.dimension}`,
    message: `This campaign compares readings of ${campaign.dimension}; the workbook has ${screen.readingUnit}. Choose the right campaign or convert the readings.`,
  };
  throw problems.workbookFaults([issue], 1);
}

async function storeScreen(
  tx: Executor,
  services: Services,
  viewer: Viewer,
  campaign: CampaignRow,
  upload: ScreenUpload & { sha256: string; screenId: string },
  screen: ParsedScreen,
): Promise<void> {
  const groupId = campaign.groupId;
  const now = services.now();
  await insertScreen(
    tx,
    {
      id: upload.screenId,
      groupId,
      campaignId: campaign.id,
      name: upload.name,
      fileName: upload.fileName,
      sha256: upload.sha256,
      size: upload.bytes.length,
      dimension: screen.dimension,
      kind: screen.kind,
      readingUnit: screen.readingUnit,
      timeUnit: screen.timeUnit,
      wellCount: screen.wells.length,
      readingCount: screen.wells.reduce((sum, well) => sum + well.readings.values.length, 0),
      cautions: JSON.stringify(screen.cautions),
      uploadedBy: viewer.userId,
      uploadedAt: now,
    },
    upload.bytes,
  );

  const plateIds = new Map(screen.plates.map((plate) => [plate.name, services.newId()]));
  await insertPlates(
    tx,
    screen.plates.map((plate) => ({
      id: plateIds.get(plate.name) ?? services.newId(),
      groupId,
      screenId: upload.screenId,
      name: plate.name,
      format: plate.format,
    })),
  );

  const catalystIds = await ensureCatalysts(tx, services, campaign, screen.wells);
  const rows = screen.wells.map((well, ordinal): WellInsert => {
    const plateId = plateIds.get(well.plate);
    if (!plateId)
      throw new Error(`plate ${well.plate} of well ${well.position} is not in the screen`);
    return {
      id: services.newId(),
      groupId,
      screenId: upload.screenId,
      plateId,
      ordinal,
      catalystId: well.catalyst === null ? null : (catalystIds.get(well.catalyst) ?? null),
      ...wellColumns(well),
    };
  });
  await insertWells(tx, rows);
  await insertAuditEvent(tx, {
    groupId,
    userId: viewer.userId,
    action: 'screen.import',
    objectId: upload.screenId,
    detail: { fileName: upload.fileName, sha256: upload.sha256, wells: rows.length },
    at: now,
  });
}

function wellColumns(well: ParsedWell) {
  return {
    position: well.position,
    role: well.role,
    temperatureK: well.temperatureK,
    measuredTemperatureK: well.measuredTemperatureK,
    massG: well.massG,
    volumeL: well.volumeL,
    replicate: well.replicate,
    layoutSheet: well.source.sheet,
    layoutCell: well.source.cell,
    readingCount: well.readings.values.length,
    timesS: packFloats(well.readings.timesS),
    readings: packFloats(well.readings.values),
    readingRows: packIntegers(well.readings.rows),
    readingSheet: well.readings.sheet,
    readingColumn: well.readings.column,
  };
}

/** The campaign's catalysts by code, with a plain card added for each code not yet known. */
async function ensureCatalysts(
  tx: Executor,
  services: Services,
  campaign: CampaignRow,
  wells: ParsedWell[],
): Promise<Map<string, string>> {
  const cards = await listCatalysts(tx, campaign.groupId, campaign.id);
  const ids = new Map(cards.map((card) => [card.code, card.id]));
  const added = [...new Set(wells.map((well) => well.catalyst))]
    .filter((code) => code !== null)
    .filter((code) => !ids.has(code))
    .map((code) => ({
      id: services.newId(),
      groupId: campaign.groupId,
      campaignId: campaign.id,
      code,
      createdAt: services.now(),
    }));
  await insertCatalysts(tx, added);
  for (const card of added) ids.set(card.code, card.id);
  return ids;
}
