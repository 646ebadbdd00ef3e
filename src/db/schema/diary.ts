import {
  date,
  foreignKey,
  index,
  integer,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds, stages } from './builds.ts';
import { files } from './files.ts';

export const diaryVisibility = pgEnum('diary_visibility', ['private', 'public']);

export const diaryEntries = pgTable(
  'diary_entries',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    stageId: uuid('stage_id'),
    day: date('day', { mode: 'string' }).notNull(),
    /** The Markdown subset. */
    text: text('text').notNull(),
    visibility: diaryVisibility('visibility').notNull().default('private'),
    writtenBy: uuid('written_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('diary_entries_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'diary_entries_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'diary_entries_stage_fk',
      columns: [table.workshopId, table.stageId],
      foreignColumns: [stages.workshopId, stages.id],
    }),
    index('diary_entries_build_index').on(table.buildId, table.day),
  ],
);

export const diaryPhotos = pgTable(
  'diary_photos',
  {
    workshopId: uuid('workshop_id').notNull(),
    entryId: uuid('entry_id').notNull(),
    fileId: uuid('file_id').notNull(),
    position: integer('position').notNull(),
    /** What the photo shows, for those who do not see it. */
    description: text('description').notNull().default(''),
  },
  (table) => [
    primaryKey({ name: 'diary_photos_pkey', columns: [table.entryId, table.fileId] }),
    foreignKey({
      name: 'diary_photos_entry_fk',
      columns: [table.workshopId, table.entryId],
      foreignColumns: [diaryEntries.workshopId, diaryEntries.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'diary_photos_file_fk',
      columns: [table.workshopId, table.fileId],
      foreignColumns: [files.workshopId, files.id],
    }).onDelete('cascade'),
  ],
);
