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
  timestamp,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { CREATION_MEANS, OFF_CAMERA_SIGNS, SLATE_READERS } from '../../domain/footage/clip-facts.ts';
import { bytes, idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds, stages } from './builds.ts';
import { files } from './files.ts';
import { parts } from './parts.ts';
import { workshops } from './workshops.ts';

export const creationMeans = pgEnum('creation_means', CREATION_MEANS);
export const slateReader = pgEnum('slate_reader', SLATE_READERS);
export const offCameraSign = pgEnum('off_camera_sign', OFF_CAMERA_SIGNS);

/** A camera of the workshop, with what its files mean by their times. */
export const cameras = pgTable(
  'cameras',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    name: text('name').notNull(),
    creationMeans: creationMeans('creation_means').notNull().default('start'),
    /** It writes its wall time as if that were UTC. */
    localAsUtc: boolean('local_as_utc').notNull().default(false),
    /** IANA zone that its clock is set to; null for the workshop's. */
    timeZone: text('time_zone'),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('cameras_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'cameras_workshop_fk',
      columns: [table.workshopId],
      foreignColumns: [workshops.id],
    }).onDelete('cascade'),
    uniqueIndex('cameras_name_unique')
      .on(table.workshopId, sql`lower(${table.name})`)
      .where(sql`${table.deletedAt} is null`),
  ],
);

/** Footage as a camera made it: a file kept here, or one that is only named. */
export const clips = pgTable(
  'clips',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    cameraId: uuid('camera_id'),
    /** Null for a clip that stays at home. */
    fileId: uuid('file_id'),
    /** The file's name on the card. */
    name: text('name').notNull(),
    /** Length in frames at rateNum/rateDen; null until known. */
    frames: bigint('frames', { mode: 'number' }),
    rateNum: integer('rate_num').notNull(),
    rateDen: integer('rate_den').notNull(),
    /** Its first timecode label in frames since 00:00:00:00; null where it has none. */
    startLabel: bigint('start_label', { mode: 'number' }),
    drop: boolean('drop').notNull().default(false),
    /** What the file says of when it was made, as a wall time; with how far it says that is from UTC, in minutes. */
    createdWall: timestamp('created_wall', { mode: 'string', precision: 3 }),
    createdOffset: integer('created_offset'),
    /** Shop time of its first frame, set by hand; goes before the camera's clock. */
    startSetAt: instant('start_set_at'),
    /** Seconds of the shop that a second of it shows: 1/1 as filmed, 20/1 for time-lapse, 1/4 for slow motion. */
    paceNum: integer('pace_num').notNull().default(1),
    paceDen: integer('pace_den').notNull().default(1),
    /** Where frames do not come at a constant rate: when each begins, in milliseconds since the first. Counts at 1000/1 stay milliseconds. */
    frameTimes: jsonb('frame_times').$type<readonly number[]>(),
    /** The clip that this one goes on from without a gap: a camera splits what it films into several files. */
    continuesId: uuid('continues_id'),
    stageId: uuid('stage_id'),
    addedBy: uuid('added_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('clips_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'clips_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'clips_camera_fk',
      columns: [table.workshopId, table.cameraId],
      foreignColumns: [cameras.workshopId, cameras.id],
    }).onDelete('restrict'),
    foreignKey({
      name: 'clips_file_fk',
      columns: [table.workshopId, table.fileId],
      foreignColumns: [files.workshopId, files.id],
    }).onDelete('restrict'),
    foreignKey({
      name: 'clips_stage_fk',
      columns: [table.workshopId, table.stageId],
      foreignColumns: [stages.workshopId, stages.id],
    }),
    foreignKey({
      name: 'clips_continues_fk',
      columns: [table.workshopId, table.continuesId],
      foreignColumns: [table.workshopId, table.id],
    }),
    check('clips_pace_forward', sql`${table.paceNum} > 0 and ${table.paceDen} > 0`),
    index('clips_build_index').on(table.buildId),
    uniqueIndex('clips_file_unique')
      .on(table.fileId)
      .where(sql`${table.deletedAt} is null`),
  ],
);

/** A small picture of a clip that stays at home, made in the browser. */
export const clipThumbnails = pgTable(
  'clip_thumbnails',
  {
    workshopId: uuid('workshop_id').notNull(),
    clipId: uuid('clip_id').notNull(),
    jpeg: bytes('jpeg').notNull(),
  },
  (table) => [
    primaryKey({ name: 'clip_thumbnails_pkey', columns: [table.clipId] }),
    foreignKey({
      name: 'clip_thumbnails_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('cascade'),
  ],
);

export const clipParts = pgTable(
  'clip_parts',
  {
    workshopId: uuid('workshop_id').notNull(),
    clipId: uuid('clip_id').notNull(),
    partId: uuid('part_id').notNull(),
  },
  (table) => [
    primaryKey({ name: 'clip_parts_pkey', columns: [table.clipId, table.partId] }),
    foreignKey({
      name: 'clip_parts_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'clip_parts_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }).onDelete('restrict'),
  ],
);

/** A clock slate found in a clip: the shop time that stands in one of its frames. */
export const slates = pgTable(
  'slates',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    clipId: uuid('clip_id').notNull(),
    /** Frames since the clip's first, at the clip's rate. */
    frame: bigint('frame', { mode: 'number' }).notNull(),
    shopAt: instant('shop_at').notNull(),
    readBy: slateReader('read_by').notNull(),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('slates_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'slates_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('cascade'),
    index('slates_clip_index').on(table.clipId),
  ],
);

/** A stretch of shop time in which work went on, by timer, by a mark, or by an accepted suggestion. */
export const workStretches = pgTable(
  'work_stretches',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    fromAt: instant('from_at').notNull(),
    untilAt: instant('until_at'),
    sign: offCameraSign('sign').notNull(),
    stageId: uuid('stage_id'),
    text: text('text').notNull().default(''),
    addedBy: uuid('added_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('work_stretches_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'work_stretches_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'work_stretches_stage_fk',
      columns: [table.workshopId, table.stageId],
      foreignColumns: [stages.workshopId, stages.id],
    }),
    check('work_stretches_forward', sql`${table.untilAt} is null or ${table.untilAt} > ${table.fromAt}`),
    index('work_stretches_build_index').on(table.buildId, table.fromAt),
  ],
);
