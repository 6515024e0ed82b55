import {
  foreignKey,
  index,
  int,
  mysqlEnum,
  mysqlTable,
  primaryKey,
  varchar,
} from 'drizzle-orm/mysql-core';
import { roles } from '../../auth/roles';
import { instant, sha256, uuid } from './columns';

/** A person who can sign in. */
export const users = mysqlTable('person', {
  id: uuid().primaryKey(),
  /** Lower case, trimmed. */
  email: varchar({ length: 254 }).notNull().unique(),
  name: varchar({ length: 120 }).notNull(),
  /** argon2id, PHC string. */
  passwordHash: varchar({ length: 255 }).notNull(),
  createdAt: instant().notNull(),
});

/** A tenant: every other object belongs to one group. */
export const groups = mysqlTable('lab_group', {
  id: uuid().primaryKey(),
  name: varchar({ length: 120 }).notNull().unique(),
  createdAt: instant().notNull(),
});

export const memberships = mysqlTable(
  'membership',
  {
    groupId: uuid()
      .notNull()
      .references(() => groups.id),
    userId: uuid()
      .notNull()
      .references(() => users.id),
    role: mysqlEnum([...roles]).notNull(),
    createdAt: instant().notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.groupId, table.userId] }),
    index('membership_user').on(table.userId),
  ],
);

/** A sign-in that is still good. Deleting the row signs the person out at the next request. */
export const sessions = mysqlTable(
  'session',
  {
    id: uuid().primaryKey(),
    userId: uuid()
      .notNull()
      .references(() => users.id),
    createdAt: instant().notNull(),
    lastSeenAt: instant().notNull(),
    expiresAt: instant().notNull(),
  },
  (table) => [index('session_user').on(table.userId)],
);

/** A token for scripts, bound to one person in one group. Only its SHA-256 is kept. */
export const apiTokens = mysqlTable(
  'api_token',
  {
    id: uuid().primaryKey(),
    groupId: uuid().notNull(),
    userId: uuid().notNull(),
    name: varchar({ length: 120 }).notNull(),
    tokenSha256: sha256().notNull().unique(),
    createdAt: instant().notNull(),
    expiresAt: instant().notNull(),
    revokedAt: instant(),
    lastUsedAt: instant(),
  },
  (table) => [
    foreignKey({
      name: 'api_token_membership',
      columns: [table.groupId, table.userId],
      foreignColumns: [memberships.groupId, memberships.userId],
    }).onDelete('cascade'),
  ],
);

/** Failed sign-ins per account and per address, for the throttle. */
export const signInFailures = mysqlTable(
  'sign_in_failure',
  {
    id: int().autoincrement().primaryKey(),
    /** `account:` or `address:` and the SHA-256 of what it counts. */
    subject: varchar({ length: 80 }).notNull(),
    failedAt: instant().notNull(),
  },
  (table) => [index('sign_in_failure_subject').on(table.subject, table.failedAt)],
);

/** What was done in a group, by whom. Rows are only ever added. */
export const auditEvents = mysqlTable(
  'audit_event',
  {
    id: uuid().primaryKey(),
    groupId: uuid()
      .notNull()
      .references(() => groups.id),
    userId: uuid()
      .notNull()
      .references(() => users.id),
    action: varchar({ length: 60 }).notNull(),
    objectId: uuid().notNull(),
    /** JSON text. */
    detail: varchar({ length: 4000 }).notNull(),
    at: instant().notNull(),
  },
  (table) => [index('audit_event_group').on(table.groupId, table.at)],
);
