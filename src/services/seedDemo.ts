import { randomUUID } from 'node:crypto';
import type { Viewer } from '../auth/viewer';
import type { Executor } from '../db/client';
import { insertCampaign, insertCatalysts } from '../db/repositories/campaigns';
import { findGroupByName, findUserByEmail } from '../db/repositories/people';
import accounts from '../demo/accounts.json';
import { buildDemo } from '../demo/buildDemo';
import type { DemoCampaign } from '../demo/types';
import { addPerson, ensureGroup } from './accounts';
import { analyseScreen } from './analyseScreen';
import { loadViewer } from './identify';
import { importScreen } from './importScreen';
import type { Services } from './services';

/**
 * Puts the demo groups, their people and their campaigns into the database, and analyses their
 * screens through the same use cases as anybody's.
 *
 * @returns false when the demo is there already; nothing is touched then
 */
export async function seedDemo(services: Services): Promise<boolean> {
  const demo = buildDemo();
  const [first] = demo.groups;
  if (!first || (await findGroupByName(services.db, first.name))) return false;
  const campaigns = await services.db.transaction(async (tx) => {
    const placed: { group: string; campaignId: string; campaign: DemoCampaign }[] = [];
    for (const group of demo.groups) {
      const groupId = await ensureGroup(tx, group.name, services.now());
      for (const account of accounts.filter((one) => one.group === group.name)) {
        await addPerson(tx, { ...account, role: roleOf(account.role), groupId }, services.now());
      }
      for (const campaign of group.campaigns) {
        const campaignId = await placeCampaign(tx, groupId, campaign, services.now());
        placed.push({ group: group.name, campaignId, campaign });
      }
    }
    return placed;
  });
  for (const { group, campaignId, campaign } of campaigns) {
    const viewer = await analystOf(services, group);
    for (const screen of campaign.screens) {
      const answer = await importScreen(services, viewer, {
        campaignId,
        name: screen.name,
        fileName: screen.fileName,
        bytes: Buffer.from(screen.bytes),
      });
      await analyseScreen(services, viewer, answer.screen.id);
    }
  }
  await services.runner.idle();
  return true;
}

function roleOf(name: string) {
  if (name === 'viewer' || name === 'analyst' || name === 'lead' || name === 'admin') return name;
  throw new Error(`${name} is no role`);
}

async function placeCampaign(
  tx: Executor,
  groupId: string,
  campaign: DemoCampaign,
  now: Date,
): Promise<string> {
  const id = randomUUID();
  const { catalysts, screens: _screens, thresholds, benchmark, conditions, ...row } = campaign;
  await insertCampaign(tx, {
    ...row,
    id,
    groupId,
    conditions: `${conditions} Benchmark ${benchmark}. ${thresholds}`,
    createdAt: now,
  });
  await insertCatalysts(
    tx,
    catalysts.map((card) => ({
      ...card,
      id: randomUUID(),
      groupId,
      campaignId: id,
      createdAt: now,
    })),
  );
  return id;
}

/** The group's demo analyst, in whose name its screens are uploaded. */
async function analystOf(services: Services, groupName: string): Promise<Viewer> {
  const account = accounts.find((one) => one.group === groupName && one.role === 'analyst');
  const user = account && (await findUserByEmail(services.db, account.email));
  const viewer = user && (await loadViewer(services.db, user.id, 'session'));
  if (!viewer) throw new Error(`${groupName} has no demo analyst`);
  return viewer;
}
