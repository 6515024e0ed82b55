import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DatabaseHandle } from '@/db/client';
import { ensureCandidate } from '@/db/repositories/candidates';
import { insertCatalysts } from '@/db/repositories/campaigns';
import { insertScreen } from '@/db/repositories/screens';
import type { Services } from '@/services/services';
import { makeGroup, openTestServices } from '../../fixtures/groups';

let services: Services;
let database: DatabaseHandle;

beforeAll(() => {
  ({ services, database } = openTestServices());
});
afterAll(() => database.close());

describe('the database itself', () => {
  it('refuses a row that would tie one group’s object to another’s', async () => {
    const own = await makeGroup(services);
    const other = await makeGroup(services);
    const now = new Date();
    const catalyst = { id: randomUUID(), code: 'X-1', createdAt: now };
    await expect(
      insertCatalysts(services.db, [
        { ...catalyst, groupId: own.groupId, campaignId: other.campaignId },
      ]),
    ).rejects.toMatchObject({ cause: { code: 'ER_NO_REFERENCED_ROW_2' } });

    await insertCatalysts(services.db, [
      { ...catalyst, groupId: other.groupId, campaignId: other.campaignId },
    ]);
    await expect(ensureCandidate(services.db, own.groupId, catalyst.id)).rejects.toMatchObject({
      cause: { code: 'ER_NO_REFERENCED_ROW_2' },
    });

    const screen = {
      id: randomUUID(),
      groupId: own.groupId,
      campaignId: other.campaignId,
      name: 'S',
      fileName: 's.csv',
      sha256: 'a'.repeat(64),
      size: 1,
      dimension: 'concentration' as const,
      kind: 'reactant' as const,
      readingUnit: 'mol/L',
      timeUnit: 's',
      wellCount: 0,
      readingCount: 0,
      cautions: '[]',
      uploadedBy: own.viewers.analyst.userId,
      uploadedAt: now,
    };
    await expect(insertScreen(services.db, screen, Buffer.from('x'))).rejects.toMatchObject({
      cause: { code: 'ER_NO_REFERENCED_ROW_2' },
    });
  });
});
