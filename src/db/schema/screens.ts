import {
  double,
  foreignKey,
  int,
  longtext,
  mysqlEnum,
  mysqlTable,
  smallint,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { campaigns, catalysts } from './campaigns';
import { exactText, instant, longBytes, mediumBytes, sha256, uuid } from './columns';
import { users } from './people';

/** One upload: its metadata. The file itself is in `original`, so that lists stay light. */
export const screens = mysqlTable(
  'screen',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    campaignId: uuid().notNull(),
    name: varchar({ length: 160 }).notNull(),
    fileName: varchar({ length: 255 }).notNull(),
    sha256: sha256().notNull(),
    /** Bytes. */
    size: int().notNull(),
    dimension: mysqlEnum(['concentration', 'pressure', 'ratio']).notNull(),
    kind: mysqlEnum(['reactant', 'product', 'conversion', 'signal']).notNull(),
    /** As the file had them, such as mmol/L and min. */
    readingUnit: varchar({ length: 40 }).notNull(),
    timeUnit: varchar({ length: 40 }).notNull(),
    wellCount: int().notNull(),
    readingCount: int().notNull(),
    /** JSON list of the cautions found at import. */
    cautions: longtext().notNull(),
    uploadedBy: uuid()
      .notNull()
      .references(() => users.id),
    uploadedAt: instant().notNull(),
  },
  (table) => [
    // The same file is stored once in a campaign, whoever sends it and however often.
    unique('screen_file').on(table.campaignId, table.sha256),
    unique('screen_group').on(table.groupId, table.id),
    foreignKey({
      name: 'screen_campaign',
      columns: [table.groupId, table.campaignId],
      foreignColumns: [campaigns.groupId, campaigns.id],
    }),
  ],
);

/** The uploaded file, byte for byte. */
export const originals = mysqlTable(
  'original',
  {
    screenId: uuid().primaryKey(),
    groupId: uuid().notNull(),
    bytes: longBytes().notNull(),
  },
  (table) => [
    foreignKey({
      name: 'original_screen',
      columns: [table.groupId, table.screenId],
      foreignColumns: [screens.groupId, screens.id],
    }),
  ],
);

export const plates = mysqlTable(
  'plate',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    screenId: uuid().notNull(),
    name: exactText({ length: 80 }).notNull(),
    /** 24, 48, 96 or 384 wells. */
    format: smallint().notNull(),
  },
  (table) => [
    unique('plate_name').on(table.screenId, table.name),
    unique('plate_group').on(table.groupId, table.id),
    foreignKey({
      name: 'plate_screen',
      columns: [table.groupId, table.screenId],
      foreignColumns: [screens.groupId, screens.id],
    }),
  ],
);

/** One well with its readings packed: one row a well is several times faster than one a reading. */
export const wells = mysqlTable(
  'well',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    screenId: uuid().notNull(),
    plateId: uuid().notNull(),
    /** Place in the file's order of wells, from 0. */
    ordinal: int().notNull(),
    /** Letters and two digits: B07. */
    position: varchar({ length: 4 }).notNull(),
    catalystId: uuid(),
    role: mysqlEnum(['sample', 'blank', 'support-blank', 'control', 'benchmark']).notNull(),
    /** K, as set. */
    temperatureK: double().notNull(),
    /** K, as measured in the well. */
    measuredTemperatureK: double(),
    massG: double(),
    volumeL: double(),
    replicate: smallint(),
    /** Where the layout names this well. */
    layoutSheet: varchar({ length: 255 }).notNull(),
    layoutCell: varchar({ length: 12 }),
    readingCount: int().notNull(),
    /** s, 8-byte little-endian floats, in the order of the file. */
    timesS: mediumBytes().notNull(),
    /** Base unit, 8-byte little-endian floats; NaN is a missing reading. */
    readings: mediumBytes().notNull(),
    /** 1-based rows of the readings, 4-byte little-endian integers. */
    readingRows: mediumBytes().notNull(),
    readingSheet: varchar({ length: 255 }).notNull(),
    readingColumn: varchar({ length: 4 }).notNull(),
  },
  (table) => [
    unique('well_group').on(table.groupId, table.id),
    unique('well_place').on(table.plateId, table.position),
    foreignKey({
      name: 'well_screen',
      columns: [table.groupId, table.screenId],
      foreignColumns: [screens.groupId, screens.id],
    }),
    foreignKey({
      name: 'well_plate',
      columns: [table.groupId, table.plateId],
      foreignColumns: [plates.groupId, plates.id],
    }),
    foreignKey({
      name: 'well_catalyst',
      columns: [table.groupId, table.catalystId],
      foreignColumns: [catalysts.groupId, catalysts.id],
    }),
  ],
);
