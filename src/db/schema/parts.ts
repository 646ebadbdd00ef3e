import { sql } from 'drizzle-orm';
import {
  boolean,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { PART_KINDS } from '../../domain/part-kinds.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';

export const partKind = pgEnum('part_kind', PART_KINDS);

export const parts = pgTable(
  'parts',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    /** As typed, trimmed and in NFC. */
    number: text('number').notNull(),
    /** The number without case: what is unique in a build. */
    numberKey: text('number_key').notNull(),
    name: text('name').notNull(),
    kind: partKind('kind').notNull().default('made'),
    quantity: integer('quantity').notNull().default(1),
    material: text('material').notNull().default(''),
    size: text('size').notNull().default(''),
    /** Other words for it, as it is called on camera. */
    aliases: text('aliases')
      .array()
      .notNull()
      .default(sql`'{}'`),
    /** False for what was added at the bench: its balloon is dashed. */
    inPlans: boolean('in_plans').notNull().default(true),
    remark: text('remark').notNull().default(''),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('parts_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'parts_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    uniqueIndex('parts_number_unique')
      .on(table.buildId, table.numberKey)
      .where(sql`${table.deletedAt} is null`),
    index('parts_build_index').on(table.buildId),
  ],
);

/** What a part said before each change, with who changed it and when. */
export const partVersions = pgTable(
  'part_versions',
  {
    partId: uuid('part_id').notNull(),
    workshopId: uuid('workshop_id').notNull(),
    version: integer('version').notNull(),
    fields: jsonb('fields').notNull(),
    changedBy: uuid('changed_by').references(() => accounts.id),
    changedAt: instant('changed_at').notNull(),
  },
  (table) => [
    primaryKey({ name: 'part_versions_pkey', columns: [table.partId, table.version] }),
    foreignKey({
      name: 'part_versions_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }).onDelete('cascade'),
  ],
);
