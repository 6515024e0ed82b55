import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { DecisionState } from '../../screening/decisions';
import type { Executor } from '../client';
import { candidates, candidateTags, catalysts, decisions, users } from '../schema';

export interface CandidateState {
  state: DecisionState;
  version: number;
}

const untouched: CandidateState = { state: 'open', version: 0 };

/** Where a candidate stands; `open` at version 0 while nobody has decided anything. */
export async function findCandidateState(
  db: Executor,
  groupId: string,
  catalystId: string,
): Promise<CandidateState> {
  const [row] = await db
    .select({ state: candidates.state, version: candidates.version })
    .from(candidates)
    .where(and(eq(candidates.groupId, groupId), eq(candidates.catalystId, catalystId)))
    .limit(1);
  return row ?? untouched;
}

export async function listCandidateStates(
  db: Executor,
  groupId: string,
  campaignId: string,
): Promise<Map<string, CandidateState>> {
  const rows = await db
    .select({
      catalystId: candidates.catalystId,
      state: candidates.state,
      version: candidates.version,
    })
    .from(candidates)
    .innerJoin(catalysts, eq(catalysts.id, candidates.catalystId))
    .where(and(eq(candidates.groupId, groupId), eq(catalysts.campaignId, campaignId)));
  return new Map(rows.map(({ catalystId, ...state }) => [catalystId, state]));
}

/** Makes the candidate's row where there is none yet, so that an update can compare versions. */
export async function ensureCandidate(
  db: Executor,
  groupId: string,
  catalystId: string,
): Promise<void> {
  await db
    .insert(candidates)
    .values({ groupId, catalystId, ...untouched })
    .onDuplicateKeyUpdate({ set: { groupId } });
}

/** Moves a candidate on from `version`. @returns false when somebody else was faster. */
export async function updateCandidateState(
  db: Executor,
  groupId: string,
  catalystId: string,
  version: number,
  state: DecisionState,
): Promise<boolean> {
  const [result] = await db
    .update(candidates)
    .set({ state, version: version + 1 })
    .where(
      and(
        eq(candidates.groupId, groupId),
        eq(candidates.catalystId, catalystId),
        eq(candidates.version, version),
      ),
    );
  return result.affectedRows === 1;
}

export async function insertDecision(
  db: Executor,
  row: typeof decisions.$inferInsert,
): Promise<void> {
  await db.insert(decisions).values(row);
}

/** Newest first. */
export async function listDecisions(db: Executor, groupId: string, catalystId: string) {
  return db
    .select({ decision: decisions, decidedByName: users.name })
    .from(decisions)
    .innerJoin(users, eq(users.id, decisions.decidedBy))
    .where(and(eq(decisions.groupId, groupId), eq(decisions.catalystId, catalystId)))
    .orderBy(desc(decisions.decidedAt), desc(decisions.id));
}

/** Tags by catalyst, in alphabetical order. */
export async function listTags(
  db: Executor,
  groupId: string,
  catalystIds: string[],
): Promise<Map<string, string[]>> {
  const tags = new Map<string, string[]>();
  if (catalystIds.length === 0) return tags;
  const rows = await db
    .select({ catalystId: candidateTags.catalystId, tag: candidateTags.tag })
    .from(candidateTags)
    .where(and(eq(candidateTags.groupId, groupId), inArray(candidateTags.catalystId, catalystIds)))
    .orderBy(asc(candidateTags.tag));
  for (const { catalystId, tag } of rows) {
    const known = tags.get(catalystId);
    if (known) known.push(tag);
    else tags.set(catalystId, [tag]);
  }
  return tags;
}

/** Puts `tags` in the place of what was there; a tag that stays keeps who gave it. */
export async function replaceTags(
  db: Executor,
  groupId: string,
  catalystId: string,
  tags: string[],
  by: { userId: string; at: Date },
): Promise<void> {
  const ofCandidate = and(
    eq(candidateTags.groupId, groupId),
    eq(candidateTags.catalystId, catalystId),
  );
  const rows = await db.select({ tag: candidateTags.tag }).from(candidateTags).where(ofCandidate);
  const before = new Set(rows.map((row) => row.tag));
  const gone = [...before].filter((tag) => !tags.includes(tag));
  const added = tags.filter((tag) => !before.has(tag));
  if (gone.length > 0) {
    await db.delete(candidateTags).where(and(ofCandidate, inArray(candidateTags.tag, gone)));
  }
  if (added.length > 0) {
    await db
      .insert(candidateTags)
      .values(
        added.map((tag) => ({ groupId, catalystId, tag, taggedBy: by.userId, taggedAt: by.at })),
      );
  }
}
