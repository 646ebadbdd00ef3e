import {
  bigint,
  boolean,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  smallint,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { FILE_KINDS, FILE_PURPOSES, FILE_STATES } from '../../domain/file-kinds.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';

export const fileKind = pgEnum('file_kind', FILE_KINDS);
export const filePurpose = pgEnum('file_purpose', FILE_PURPOSES);
export const fileState = pgEnum('file_state', FILE_STATES);

export const files = pgTable(
  'files',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    purpose: filePurpose('purpose').notNull(),
    /** As the person named it; never part of a key. */
    name: text('name').notNull(),
    /** Announced size; completion must match it exactly. */
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    state: fileState('state').notNull().default('uploading'),
    /** A sentence for the person, when state is failed. */
    failure: text('failure'),
    /** Of the multipart upload, while state is uploading. */
    uploadId: text('upload_id'),
    /** SHA-256 of the first and the last MiB: by it a file chosen again is known. */
    fingerprint: text('fingerprint'),
    /** How often checking has begun: what breaks the worker each time is given up. */
    checkTries: smallint('check_tries').notNull().default(0),
    /** Of the playable copy, in hundredths, while it is made. */
    progress: smallint('progress'),
    /** Found by content once accepted. */
    kind: fileKind('kind'),
    contentType: text('content_type'),
    width: integer('width'),
    height: integer('height'),
    /** Length of a video or sound in frames at rateNum/rateDen, which is 1000/1 where frames mean nothing. */
    durationFrames: bigint('duration_frames', { mode: 'number' }),
    rateNum: integer('rate_num'),
    rateDen: integer('rate_den'),
    /** What the probe found, for the person: codec, wall time of the camera with its assumed zone. */
    probe: jsonb('probe'),
    originalKept: boolean('original_kept').notNull().default(true),
    addedBy: uuid('added_by').references(() => accounts.id),
    version: versionColumn(),
    deletedAt: instant('deleted_at'),
    ...timestamps(),
  },
  (table) => [
    unique('files_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'files_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    index('files_build_index').on(table.buildId),
  ],
);

/** The objects kept of a file: original, rendition, thumbnail, filmstrip, and so on. */
export const fileVariants = pgTable(
  'file_variants',
  {
    workshopId: uuid('workshop_id').notNull(),
    fileId: uuid('file_id').notNull(),
    variant: text('variant').notNull(),
    contentType: text('content_type').notNull(),
    bytes: bigint('bytes', { mode: 'number' }).notNull(),
    width: integer('width'),
    height: integer('height'),
    /** Of a filmstrip: how many pictures stand side by side, at even times. */
    frames: integer('frames'),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    primaryKey({ name: 'file_variants_pkey', columns: [table.fileId, table.variant] }),
    foreignKey({
      name: 'file_variants_file_fk',
      columns: [table.workshopId, table.fileId],
      foreignColumns: [files.workshopId, files.id],
    }).onDelete('cascade'),
  ],
);
