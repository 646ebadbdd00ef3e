import { sql } from 'drizzle-orm';
import {
  boolean,
  foreignKey,
  index,
  integer,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { workshops } from './workshops.ts';

export const buildVisibility = pgEnum('build_visibility', ['private', 'public']);

export const builds = pgTable(
  'builds',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    name: text('name').notNull(),
    about: text('about').notNull().default(''),
    visibility: buildVisibility('visibility').notNull().default('private'),
    plannedEpisodes: integer('planned_episodes'),
    /** ISO 4217; every amount of the build is in it. */
    currency: text('currency').notNull().default('GBP'),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('builds_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'builds_workshop_fk',
      columns: [table.workshopId],
      foreignColumns: [workshops.id],
    }).onDelete('cascade'),
  ],
);

/** Every address name a build has had in its workshop: old ones lead to the current one. */
export const buildSlugs = pgTable(
  'build_slugs',
  {
    workshopId: uuid('workshop_id').notNull(),
    slug: text('slug').notNull(),
    buildId: uuid('build_id').notNull(),
    current: boolean('current').notNull(),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    primaryKey({ name: 'build_slugs_pkey', columns: [table.workshopId, table.slug] }),
    foreignKey({
      name: 'build_slugs_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    uniqueIndex('build_slugs_current_unique')
      .on(table.buildId)
      .where(sql`${table.current}`),
  ],
);

export const stages = pgTable(
  'stages',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    /** Order in the build; gaps and ties are fine, ties go by id. */
    position: integer('position').notNull(),
    name: text('name').notNull(),
    about: text('about').notNull().default(''),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('stages_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'stages_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    index('stages_build_index').on(table.buildId),
  ],
);
