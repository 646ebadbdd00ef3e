import { sql } from 'drizzle-orm';
import { check, foreignKey, index, jsonb, pgEnum, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds, stages } from './builds.ts';
import { diaryEntries } from './diary.ts';
import { episodes } from './episodes.ts';
import { parts } from './parts.ts';

export const worksheetVisibility = pgEnum('worksheet_visibility', ['private', 'public']);

/** A shop computation that is kept with a build; its result is computed from the inputs each time. */
export const worksheets = pgTable(
  'worksheets',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    /** Which computation. */
    sheet: text('sheet').notNull(),
    title: text('title').notNull(),
    /** As they were typed. */
    inputs: jsonb('inputs').$type<Readonly<Record<string, string>>>().notNull(),
    /** What it belongs to; none of them when that is the build itself. */
    stageId: uuid('stage_id'),
    partId: uuid('part_id'),
    entryId: uuid('entry_id'),
    episodeId: uuid('episode_id'),
    visibility: worksheetVisibility('visibility').notNull().default('private'),
    writtenBy: uuid('written_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('worksheets_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'worksheets_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'worksheets_stage_fk',
      columns: [table.workshopId, table.stageId],
      foreignColumns: [stages.workshopId, stages.id],
    }),
    foreignKey({
      name: 'worksheets_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }),
    foreignKey({
      name: 'worksheets_entry_fk',
      columns: [table.workshopId, table.entryId],
      foreignColumns: [diaryEntries.workshopId, diaryEntries.id],
    }),
    foreignKey({
      name: 'worksheets_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }),
    check(
      'worksheets_one_owner',
      sql`num_nonnulls(${table.stageId}, ${table.partId}, ${table.entryId}, ${table.episodeId}) <= 1`,
    ),
    index('worksheets_build_index').on(table.buildId),
  ],
);
