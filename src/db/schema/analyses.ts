import {
  foreignKey,
  index,
  int,
  mediumtext,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  text,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { catalysts } from './campaigns';
import { instant, sha256, uuid } from './columns';
import { users } from './people';
import { screens, wells } from './screens';

/** One immutable run of the engine over a screen. A later one never overwrites it. */
export const analyses = mysqlTable(
  'analysis',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    screenId: uuid().notNull(),
    status: mysqlEnum(['queued', 'running', 'done', 'failed']).notNull(),
    done: int().notNull(),
    total: int().notNull(),
    engine: varchar({ length: 20 }).notNull(),
    /** JSON: the reference conditions the run used. */
    settings: text().notNull(),
    /** SHA-256 of the engine's input, so that two runs on the same readings can be told. */
    inputSha256: sha256().notNull(),
    requestedBy: uuid()
      .notNull()
      .references(() => users.id),
    requestedAt: instant().notNull(),
    finishedAt: instant(),
    failure: varchar({ length: 500 }),
  },
  (table) => [
    unique('analysis_group').on(table.groupId, table.id),
    index('analysis_screen_time').on(table.screenId, table.requestedAt),
    foreignKey({
      name: 'analysis_screen',
      columns: [table.groupId, table.screenId],
      foreignColumns: [screens.groupId, screens.id],
    }),
  ],
);

/** The engine's answer for one well in one analysis. */
export const wellFits = mysqlTable(
  'well_fit',
  {
    groupId: uuid().notNull(),
    analysisId: uuid().notNull(),
    wellId: uuid().notNull(),
    verdict: varchar({ length: 20 }).notNull(),
    /** JSON of the engine's `SeriesAnalysis`. */
    result: mediumtext().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.analysisId, table.wellId] }),
    foreignKey({
      name: 'well_fit_analysis',
      columns: [table.groupId, table.analysisId],
      foreignColumns: [analyses.groupId, analyses.id],
    }),
    foreignKey({
      name: 'well_fit_well',
      columns: [table.groupId, table.wellId],
      foreignColumns: [wells.groupId, wells.id],
    }),
  ],
);

/** The engine's answer for one catalyst in one analysis. */
export const catalystResults = mysqlTable(
  'catalyst_result',
  {
    groupId: uuid().notNull(),
    analysisId: uuid().notNull(),
    catalystId: uuid().notNull(),
    verdict: varchar({ length: 20 }).notNull(),
    /** JSON of the engine's `CatalystAnalysis`. */
    result: mediumtext().notNull(),
    /** JSON of the thinned decay shown on the leaderboard. */
    sparkline: text().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.analysisId, table.catalystId] }),
    foreignKey({
      name: 'catalyst_result_analysis',
      columns: [table.groupId, table.analysisId],
      foreignColumns: [analyses.groupId, analyses.id],
    }),
    foreignKey({
      name: 'catalyst_result_catalyst',
      columns: [table.groupId, table.catalystId],
      foreignColumns: [catalysts.groupId, catalysts.id],
    }),
  ],
);
