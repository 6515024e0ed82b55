import {
  foreignKey,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  text,
} from 'drizzle-orm/mysql-core';
import { decisionActions, decisionStates } from '../../screening/decisions';
import { analyses } from './analyses';
import { catalysts } from './campaigns';
import { exactText, instant, uuid } from './columns';
import { users } from './people';

/** Where each candidate stands now; the history is in `decision`. */
export const candidates = mysqlTable(
  'candidate',
  {
    catalystId: uuid().primaryKey(),
    groupId: uuid().notNull(),
    state: mysqlEnum([...decisionStates]).notNull(),
    /** Rises with each decision; a decision on a stale version is refused. */
    version: int().notNull(),
  },
  (table) => [
    foreignKey({
      name: 'candidate_catalyst',
      columns: [table.groupId, table.catalystId],
      foreignColumns: [catalysts.groupId, catalysts.id],
    }),
  ],
);

/** Who decided what, when and why, on which analysis. Rows are only ever added. */
export const decisions = mysqlTable(
  'decision',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    catalystId: uuid().notNull(),
    action: mysqlEnum([...decisionActions]).notNull(),
    fromState: mysqlEnum([...decisionStates]).notNull(),
    toState: mysqlEnum([...decisionStates]).notNull(),
    reason: text().notNull(),
    analysisId: uuid(),
    decidedBy: uuid()
      .notNull()
      .references(() => users.id),
    decidedAt: instant().notNull(),
  },
  (table) => [
    index('decision_time').on(table.catalystId, table.decidedAt),
    foreignKey({
      name: 'decision_catalyst',
      columns: [table.groupId, table.catalystId],
      foreignColumns: [catalysts.groupId, catalysts.id],
    }),
    foreignKey({
      name: 'decision_analysis',
      columns: [table.groupId, table.analysisId],
      foreignColumns: [analyses.groupId, analyses.id],
    }),
  ],
);

/** Free labels on a candidate. */
export const candidateTags = mysqlTable(
  'candidate_tag',
  {
    groupId: uuid().notNull(),
    catalystId: uuid().notNull(),
    tag: exactText({ length: 40 }).notNull(),
    taggedBy: uuid()
      .notNull()
      .references(() => users.id),
    taggedAt: instant().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.catalystId, table.tag] }),
    foreignKey({
      name: 'candidate_tag_catalyst',
      columns: [table.groupId, table.catalystId],
      foreignColumns: [catalysts.groupId, catalysts.id],
    }),
  ],
);
