import { and, count, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DatabaseHandle } from '@/db/client';
import { listWells } from '@/db/repositories/screens';
import { catalysts, plates, screens, wells } from '@/db/schema';
import { importScreen } from '@/services/importScreen';
import { unpackFloats } from '@/services/readingsCodec';
import { downloadOriginal } from '@/services/screens';
import type { Services } from '@/services/services';
import { makeGroup, openTestServices, smallWorkbook, type TestGroup } from '../../fixtures/groups';

let services: Services;
let database: DatabaseHandle;
let group: TestGroup;

beforeAll(async () => {
  ({ services, database } = openTestServices());
  group = await makeGroup(services);
});
afterAll(() => database.close());

const upload = (bytes: Buffer, campaignId = group.campaignId) => ({
  campaignId,
  name: 'A screen',
  fileName: 'screen.csv',
  bytes,
});

async function rowsOf(groupId: string) {
  const of = async (table: typeof screens | typeof plates | typeof wells | typeof catalysts) => {
    const [row] = await services.db
      .select({ rows: count() })
      .from(table)
      .where(eq(table.groupId, groupId));
    return row?.rows ?? 0;
  };
  return {
    screens: await of(screens),
    plates: await of(plates),
    wells: await of(wells),
    catalysts: await of(catalysts),
  };
}

describe('importing a screen', () => {
  it('stores every reading in SI units and keeps the file byte for byte', async () => {
    const bytes = smallWorkbook('I');
    const answer = await importScreen(services, group.viewers.analyst, upload(bytes));
    expect(answer.alreadyImported).toBe(false);
    expect(answer.screen).toMatchObject({ wells: 8, plates: 1, readings: 8 * 16 });

    const stored = await listWells(services.db, group.groupId, answer.screen.id);
    const first = stored[0];
    expect(first?.well).toMatchObject({ position: 'A01', temperatureK: 323.15, massG: 0.005 });
    expect(first?.well.volumeL).toBeCloseTo(0.002, 12);
    const lines = bytes.toString().split('\n');
    const second = lines[2]?.split(',') ?? [];
    expect(unpackFloats(first?.well.timesS ?? Buffer.alloc(0))[1]).toBe(Number(second[7]) * 60);
    expect(unpackFloats(first?.well.readings ?? Buffer.alloc(0))[1]).toBeCloseTo(
      Number(second[8]) / 1000,
      15,
    );

    const original = await downloadOriginal(services.db, group.viewers.viewer, answer.screen.id);
    expect(original.bytes.equals(bytes)).toBe(true);
  });

  it('knows the same file again and stores nothing twice', async () => {
    const bytes = smallWorkbook('T');
    const first = await importScreen(services, group.viewers.analyst, upload(bytes));
    const before = await rowsOf(group.groupId);
    const second = await importScreen(services, group.viewers.lead, upload(bytes));
    expect(second).toMatchObject({ alreadyImported: true, screen: { id: first.screen.id } });
    expect(await rowsOf(group.groupId)).toEqual(before);
  });

  it('stores a file once when two people send it at the same moment', async () => {
    const bytes = smallWorkbook('R');
    const answers = await Promise.all(
      [group.viewers.analyst, group.viewers.lead, group.viewers.admin].map((viewer) =>
        importScreen(services, viewer, upload(bytes)),
      ),
    );
    expect(new Set(answers.map((answer) => answer.screen.id)).size).toBe(1);
    expect(answers.filter((answer) => !answer.alreadyImported)).toHaveLength(1);
  });

  it('stores nothing of a workbook with a fault, and names the cell', async () => {
    const before = await rowsOf(group.groupId);
    const text = smallWorkbook('F').toString().replace(',sample,70,', ',sample,hot,');
    const attempt = importScreen(services, group.viewers.analyst, upload(Buffer.from(text)));
    await expect(attempt).rejects.toMatchObject({ status: 422, code: 'workbook-faults' });
    const { extra } = (await attempt.catch((error: unknown) => error)) as {
      extra: { issues: { cell: string; found: string }[] };
    };
    expect(extra.issues[0]).toMatchObject({ found: 'hot', cell: 'D34' });
    expect(await rowsOf(group.groupId)).toEqual(before);
  });

  it('stores nothing when the database fails in the middle', async () => {
    const before = await rowsOf(group.groupId);
    let ids = 0;
    // The eleventh new identity repeats the tenth, so that a row after the screen's is refused.
    let last = '';
    const newId = () => {
      ids += 1;
      if (ids === 11) return last;
      last = services.newId();
      return last;
    };
    const attempt = importScreen(
      { ...services, newId },
      group.viewers.analyst,
      upload(smallWorkbook('M')),
    );
    await expect(attempt).rejects.toThrow();
    expect(await rowsOf(group.groupId)).toEqual(before);
  });

  it('keeps catalyst codes that differ only by letter case apart', async () => {
    const other = await makeGroup(services);
    const text = smallWorkbook('Co').toString().replaceAll('Co-2', 'CO-1');
    await importScreen(
      services,
      other.viewers.analyst,
      upload(Buffer.from(text), other.campaignId),
    );
    const cards = await services.db
      .select({ code: catalysts.code })
      .from(catalysts)
      .where(and(eq(catalysts.groupId, other.groupId)));
    expect(cards.map((card) => card.code).sort()).toEqual(['CO-1', 'Co-1']);
  });

  it('refuses a viewer with 403 and another group’s analyst with 404', async () => {
    const other = await makeGroup(services);
    const attempt = (viewer: TestGroup['viewers']['viewer']) =>
      importScreen(services, viewer, upload(smallWorkbook('N')));
    await expect(attempt(group.viewers.viewer)).rejects.toMatchObject({ status: 403 });
    await expect(attempt(other.viewers.admin)).rejects.toMatchObject({ status: 404 });
  });
});
