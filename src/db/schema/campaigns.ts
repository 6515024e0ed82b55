import {
  double,
  foreignKey,
  mysqlEnum,
  mysqlTable,
  text,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { exactText, instant, uuid } from './columns';
import { groups } from './people';

/** One reaction that a group screens catalysts for, with its conditions of comparison. */
export const campaigns = mysqlTable(
  'campaign',
  {
    id: uuid().primaryKey(),
    groupId: uuid()
      .notNull()
      .references(() => groups.id),
    name: varchar({ length: 160 }).notNull(),
    /** The species whose decay is followed. */
    reactant: varchar({ length: 120 }).notNull(),
    /** Stoichiometric coefficient of the reactant, above 0. */
    nu: double().notNull(),
    /** Base unit mol/L, Pa or 1. */
    dimension: mysqlEnum(['concentration', 'pressure', 'ratio']).notNull(),
    /** K. */
    referenceTemperatureK: double().notNull(),
    /** Base unit of `dimension`. */
    referenceConcentration: double().notNull(),
    /** g/L. */
    referenceLoadingGPerL: double().notNull(),
    /** 0 < X < 1. */
    targetConversion: double().notNull(),
    /** Gas and pressure, co-reactant, solvent, pH, stirring. */
    conditions: text().notNull(),
    createdAt: instant().notNull(),
  },
  (table) => [
    unique('campaign_name').on(table.groupId, table.name),
    unique('campaign_group').on(table.groupId, table.id),
  ],
);

/** A catalyst's card, campaign-wide. */
export const catalysts = mysqlTable(
  'catalyst',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    campaignId: uuid().notNull(),
    code: exactText({ length: 64 }).notNull(),
    composition: varchar({ length: 200 }),
    support: varchar({ length: 120 }),
    /** Mass percent of metal. */
    metalLoadingPercent: double(),
    lot: varchar({ length: 60 }),
    /** mol/kg of active sites. */
    siteDensityMolPerKg: double(),
    /** m²/g. */
    surfaceAreaM2PerG: double(),
    /** µm. */
    particleSizeUm: double(),
    hazards: varchar({ length: 500 }),
    createdAt: instant().notNull(),
  },
  (table) => [
    unique('catalyst_code').on(table.campaignId, table.code),
    unique('catalyst_group').on(table.groupId, table.id),
    foreignKey({
      name: 'catalyst_campaign',
      columns: [table.groupId, table.campaignId],
      foreignColumns: [campaigns.groupId, campaigns.id],
    }),
  ],
);
