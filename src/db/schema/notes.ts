import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { NOTE_AUDIENCES, NOTE_KINDS, SIZE_STANDINGS } from '../../domain/note-kinds.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';
import { episodes } from './episodes.ts';
import { clips } from './footage.ts';
import { parts } from './parts.ts';
import { worksheets } from './worksheets.ts';

export const anchorClock = pgEnum('anchor_clock', ['shop', 'clip', 'episode']);
export const anchorOf = pgEnum('anchor_of', ['picture', 'sound']);
export const noteKind = pgEnum('note_kind', NOTE_KINDS);
export const noteAudience = pgEnum('note_audience', NOTE_AUDIENCES);
export const sizeStanding = pgEnum('size_standing', SIZE_STANDINGS);

/** Where something was marked, on the clock it was marked by; everything else is computed from it. */
export const anchors = pgTable(
  'anchors',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    clock: anchorClock('clock').notNull(),
    of: anchorOf('of').notNull().default('picture'),
    shopAt: instant('shop_at'),
    shopUntil: instant('shop_until'),
    clipId: uuid('clip_id'),
    /** Of a stretch marked over a cut: the clip that its end counts on. */
    endClipId: uuid('end_clip_id'),
    /** Of a clip time that was typed at an episode's desk: that episode. */
    episodeId: uuid('episode_id'),
    /** Frames at rateNum/rateDen of the clip or the episode's video; half-open where there is an end. */
    frame: bigint('frame', { mode: 'number' }),
    endFrame: bigint('end_frame', { mode: 'number' }),
    rateNum: integer('rate_num'),
    rateDen: integer('rate_den'),
    /** Of a clip time that was typed as an episode time before an edit covered it: what an edition without one shows. */
    typedFrame: bigint('typed_frame', { mode: 'number' }),
    typedEndFrame: bigint('typed_end_frame', { mode: 'number' }),
    typedRateNum: integer('typed_rate_num'),
    typedRateDen: integer('typed_rate_den'),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    unique('anchors_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'anchors_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'anchors_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('restrict'),
    foreignKey({
      name: 'anchors_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    check(
      'anchors_one_clock',
      sql`case ${table.clock}
        when 'shop' then ${table.shopAt} is not null and ${table.frame} is null
        when 'clip' then ${table.clipId} is not null and num_nonnulls(${table.frame}, ${table.rateNum}, ${table.rateDen}) = 3
        else ${table.episodeId} is not null and num_nonnulls(${table.frame}, ${table.rateNum}, ${table.rateDen}) = 3
      end`,
    ),
    foreignKey({
      name: 'anchors_end_clip_fk',
      columns: [table.workshopId, table.endClipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('restrict'),
    check(
      'anchors_end_after_start',
      sql`${table.endFrame} is null or ${table.endFrame} > ${table.frame} or ${table.endClipId} is not null`,
    ),
    index('anchors_episode_index').on(table.episodeId),
    check(
      'anchors_typed_whole',
      sql`num_nonnulls(${table.typedFrame}, ${table.typedRateNum}, ${table.typedRateDen}) in (0, 3)`,
    ),
    index('anchors_clip_index').on(table.clipId),
    index('anchors_build_index').on(table.buildId),
  ],
);

export const notes = pgTable(
  'notes',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    anchorId: uuid('anchor_id').notNull(),
    kind: noteKind('kind').notNull(),
    text: text('text').notNull(),
    audience: noteAudience('audience').notNull().default('team'),
    /** Who is asked, when the audience is one person; and what they answered. */
    askedId: uuid('asked_id').references(() => accounts.id),
    answer: text('answer'),
    answeredAt: instant('answered_at'),
    /** What the sizes in it are. */
    standing: sizeStanding('standing'),
    /** The usual caution that a caution note carries, by its topic. */
    topic: text('topic'),
    /** An editor's proposal for a published episode; the owner takes or drops it. */
    proposed: boolean('proposed').notNull().default(false),
    writtenBy: uuid('written_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('notes_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'notes_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'notes_anchor_fk',
      columns: [table.workshopId, table.anchorId],
      foreignColumns: [anchors.workshopId, anchors.id],
    }).onDelete('cascade'),
    index('notes_anchor_index').on(table.anchorId),
    // What waits for one person, read by Today.
    index('notes_asked_index')
      .on(table.askedId)
      .where(sql`${table.answeredAt} is null and ${table.deletedAt} is null`),
  ],
);

export const noteParts = pgTable(
  'note_parts',
  {
    workshopId: uuid('workshop_id').notNull(),
    noteId: uuid('note_id').notNull(),
    partId: uuid('part_id').notNull(),
    position: integer('position').notNull(),
  },
  (table) => [
    primaryKey({ name: 'note_parts_pkey', columns: [table.noteId, table.partId] }),
    foreignKey({
      name: 'note_parts_note_fk',
      columns: [table.workshopId, table.noteId],
      foreignColumns: [notes.workshopId, notes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'note_parts_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }).onDelete('restrict'),
    index('note_parts_part_index').on(table.partId),
  ],
);

/** A result of a worksheet that a note carries, as it was when the note was given it. */
export const noteResults = pgTable(
  'note_results',
  {
    workshopId: uuid('workshop_id').notNull(),
    noteId: uuid('note_id').notNull(),
    worksheetId: uuid('worksheet_id').notNull(),
    /** Which of its results, by what it is called. */
    what: text('what').notNull(),
    said: text('said').notNull(),
  },
  (table) => [
    primaryKey({ name: 'note_results_pkey', columns: [table.noteId] }),
    foreignKey({
      name: 'note_results_note_fk',
      columns: [table.workshopId, table.noteId],
      foreignColumns: [notes.workshopId, notes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'note_results_worksheet_fk',
      columns: [table.workshopId, table.worksheetId],
      foreignColumns: [worksheets.workshopId, worksheets.id],
    }).onDelete('cascade'),
    index('note_results_worksheet_index').on(table.worksheetId),
  ],
);

/** What a note said before each change, with who changed it and when. */
export const noteVersions = pgTable(
  'note_versions',
  {
    workshopId: uuid('workshop_id').notNull(),
    noteId: uuid('note_id').notNull(),
    version: integer('version').notNull(),
    fields: jsonb('fields').notNull(),
    changedBy: uuid('changed_by').references(() => accounts.id),
    changedAt: instant('changed_at').notNull(),
  },
  (table) => [
    primaryKey({ name: 'note_versions_pkey', columns: [table.noteId, table.version] }),
    foreignKey({
      name: 'note_versions_note_fk',
      columns: [table.workshopId, table.noteId],
      foreignColumns: [notes.workshopId, notes.id],
    }).onDelete('cascade'),
  ],
);

/** A part in view set by hand; those that follow from notes are computed. */
export const appearances = pgTable(
  'appearances',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    anchorId: uuid('anchor_id').notNull(),
    partId: uuid('part_id').notNull(),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('appearances_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'appearances_anchor_fk',
      columns: [table.workshopId, table.anchorId],
      foreignColumns: [anchors.workshopId, anchors.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'appearances_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }).onDelete('restrict'),
    index('appearances_anchor_index').on(table.anchorId),
  ],
);

export const chapters = pgTable(
  'chapters',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    anchorId: uuid('anchor_id').notNull(),
    title: text('title').notNull(),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('chapters_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'chapters_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'chapters_anchor_fk',
      columns: [table.workshopId, table.anchorId],
      foreignColumns: [anchors.workshopId, anchors.id],
    }).onDelete('cascade'),
    index('chapters_episode_index').on(table.episodeId),
  ],
);
