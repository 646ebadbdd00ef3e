import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  date,
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
import { type EditRecord } from '../../domain/edit/edit-record.ts';
import { EDIT_SOURCES } from '../../domain/edit/edit-sources.ts';
import { EPISODE_STATES } from '../../domain/episode-states.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';
import { files } from './files.ts';
import { clips } from './footage.ts';

export const episodeState = pgEnum('episode_state', EPISODE_STATES);
export const editSource = pgEnum('edit_source', EDIT_SOURCES);

export const episodes = pgTable(
  'episodes',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    number: integer('number').notNull(),
    title: text('title').notNull(),
    /** What the episode is about, under its title. */
    about: text('about').notNull().default(''),
    state: episodeState('state').notNull().default('draft'),
    /** The day it came out, as the feed and the page say it. */
    publishedOn: date('published_on', { mode: 'string' }),
    readyAskedBy: uuid('ready_asked_by').references(() => accounts.id),
    readyAskedAt: instant('ready_asked_at'),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('episodes_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'episodes_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    index('episodes_build_index').on(table.buildId),
  ],
);

/** Every number an episode has had in its build: old ones lead to the current one and are given to no other. */
export const episodeNumbers = pgTable(
  'episode_numbers',
  {
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    number: integer('number').notNull(),
    episodeId: uuid('episode_id').notNull(),
    current: boolean('current').notNull(),
  },
  (table) => [
    primaryKey({ name: 'episode_numbers_pkey', columns: [table.buildId, table.number] }),
    foreignKey({
      name: 'episode_numbers_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    uniqueIndex('episode_numbers_current_unique')
      .on(table.episodeId)
      .where(sql`${table.current}`),
  ],
);

/** The finished episode: a file kept here, or an address elsewhere. The newest is the draft's. */
export const videos = pgTable(
  'videos',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    fileId: uuid('file_id'),
    address: text('address'),
    /** Length in frames at rateNum/rateDen; null until known. */
    durationFrames: bigint('duration_frames', { mode: 'number' }),
    rateNum: integer('rate_num').notNull(),
    rateDen: integer('rate_den').notNull(),
    addedBy: uuid('added_by').references(() => accounts.id),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    unique('videos_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'videos_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'videos_file_fk',
      columns: [table.workshopId, table.fileId],
      foreignColumns: [files.workshopId, files.id],
    }).onDelete('restrict'),
    check('videos_one_source', sql`num_nonnulls(${table.fileId}, ${table.address}) = 1`),
    index('videos_episode_index').on(table.episodeId),
  ],
);

/** A captions file as taken in; each import is a version, the newest is the draft's. */
export const captions = pgTable(
  'captions',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    number: integer('number').notNull(),
    language: text('language').notNull(),
    sourceName: text('source_name').notNull(),
    /** WebVTT as we serve it, written by our own exporter. */
    webvtt: text('webvtt').notNull(),
    cueCount: integer('cue_count').notNull(),
    addedBy: uuid('added_by').references(() => accounts.id),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    unique('captions_tenant_unique').on(table.workshopId, table.id),
    unique('captions_number_unique').on(table.episodeId, table.number),
    foreignKey({
      name: 'captions_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
  ],
);

/** The segments of clips that make an episode; each import is a version, the newest is the draft's. */
export const edits = pgTable(
  'edits',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    number: integer('number').notNull(),
    source: editSource('source').notNull(),
    sourceName: text('source_name').notNull(),
    /** What was imported, as it came; null for one built by hand. */
    sourceText: text('source_text'),
    rateNum: integer('rate_num').notNull(),
    rateDen: integer('rate_den').notNull(),
    frames: bigint('frames', { mode: 'number' }).notNull(),
    record: jsonb('record').$type<EditRecord>().notNull(),
    /** Grows whenever its places are computed again. */
    placesVersion: integer('places_version').notNull().default(0),
    takenBy: uuid('taken_by').references(() => accounts.id),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    unique('edits_tenant_unique').on(table.workshopId, table.id),
    unique('edits_number_unique').on(table.episodeId, table.number),
    foreignKey({
      name: 'edits_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
  ],
);

/** Which clip of the footage a name in an edit stands for; null where it was said that it is none. */
export const editClips = pgTable(
  'edit_clips',
  {
    workshopId: uuid('workshop_id').notNull(),
    editId: uuid('edit_id').notNull(),
    name: text('name').notNull(),
    clipId: uuid('clip_id'),
  },
  (table) => [
    primaryKey({ name: 'edit_clips_pkey', columns: [table.editId, table.name] }),
    foreignKey({
      name: 'edit_clips_edit_fk',
      columns: [table.workshopId, table.editId],
      foreignColumns: [edits.workshopId, edits.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'edit_clips_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('restrict'),
    index('edit_clips_clip_index').on(table.clipId),
  ],
);

/** What viewers see of an episode: one video, one edit and one captions version, fixed when the owner published. */
export const editions = pgTable(
  'editions',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    number: integer('number').notNull(),
    videoId: uuid('video_id').notNull(),
    captionsId: uuid('captions_id'),
    editId: uuid('edit_id'),
    publishedAt: instant('published_at').notNull(),
    publishedBy: uuid('published_by').references(() => accounts.id),
    replacedAt: instant('replaced_at'),
    withdrawnAt: instant('withdrawn_at'),
    /** Brought in after it was out in the world: announced to nobody. */
    backCatalogue: boolean('back_catalogue').notNull().default(false),
  },
  (table) => [
    unique('editions_tenant_unique').on(table.workshopId, table.id),
    unique('editions_number_unique').on(table.episodeId, table.number),
    foreignKey({
      name: 'editions_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'editions_video_fk',
      columns: [table.workshopId, table.videoId],
      foreignColumns: [videos.workshopId, videos.id],
    }).onDelete('restrict'),
    foreignKey({
      name: 'editions_captions_fk',
      columns: [table.workshopId, table.captionsId],
      foreignColumns: [captions.workshopId, captions.id],
    }).onDelete('restrict'),
    foreignKey({
      name: 'editions_edit_fk',
      columns: [table.workshopId, table.editId],
      foreignColumns: [edits.workshopId, edits.id],
    }).onDelete('restrict'),
    // What viewers see now: at most one.
    uniqueIndex('editions_shown_unique')
      .on(table.episodeId)
      .where(sql`${table.replacedAt} is null and ${table.withdrawnAt} is null`),
  ],
);
