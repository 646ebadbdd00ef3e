import { sql } from 'drizzle-orm';
import {
  boolean,
  foreignKey,
  index,
  pgEnum,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { INVITED_ROLES, TEAM_ROLES } from '../../domain/roles.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';

export const teamRole = pgEnum('team_role', TEAM_ROLES);
export const invitedRole = pgEnum('invited_role', INVITED_ROLES);

export const workshops = pgTable('workshops', {
  id: idColumn(),
  name: text('name').notNull(),
  timeZone: text('time_zone').notNull(),
  language: text('language').notNull(),
  editorsMaySeeOrders: boolean('editors_may_see_orders').notNull().default(false),
  version: versionColumn(),
  ...timestamps(),
});

/** Every address name a workshop has had: old ones lead to the current one and are given to nobody else. */
export const workshopSlugs = pgTable(
  'workshop_slugs',
  {
    slug: text('slug').primaryKey(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    current: boolean('current').notNull(),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    uniqueIndex('workshop_slugs_current_unique')
      .on(table.workshopId)
      .where(sql`${table.current}`),
  ],
);

export const memberships = pgTable(
  'memberships',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    accountId: uuid('account_id')
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    role: teamRole('role').notNull(),
    ...timestamps(),
  },
  (table) => [
    unique('memberships_account_unique').on(table.workshopId, table.accountId),
    unique('memberships_tenant_unique').on(table.workshopId, table.id),
    // The workshops of one account, read at every signed-in page.
    index('memberships_account_index').on(table.accountId),
  ],
);

export const invitations = pgTable(
  'invitations',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    email: text('email').notNull(),
    role: invitedRole('role').notNull(),
    invitedBy: uuid('invited_by').notNull(),
    createdAt: timestamps().createdAt,
    expiresAt: instant('expires_at').notNull(),
    acceptedAt: instant('accepted_at'),
    withdrawnAt: instant('withdrawn_at'),
  },
  (table) => [
    foreignKey({
      name: 'invitations_workshop_fk',
      columns: [table.workshopId],
      foreignColumns: [workshops.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'invitations_inviter_fk',
      columns: [table.invitedBy],
      foreignColumns: [accounts.id],
    }).onDelete('cascade'),
    uniqueIndex('invitations_open_unique')
      .on(table.workshopId, table.email)
      .where(sql`${table.acceptedAt} is null and ${table.withdrawnAt} is null`),
  ],
);
