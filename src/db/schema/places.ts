import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  foreignKey,
  index,
  pgEnum,
  pgTable,
  primaryKey,
  smallint,
  text,
  uuid,
} from 'drizzle-orm/pg-core';
import { PLACE_STATUSES } from '../../domain/place/place-statuses.ts';
import { edits } from './episodes.ts';
import { clips } from './footage.ts';
import { anchors } from './notes.ts';

export const placeStatus = pgEnum('place_status', PLACE_STATUSES);

/** Where anchors come in an edit, computed from both; the main place is at position 0. */
export const places = pgTable(
  'places',
  {
    workshopId: uuid('workshop_id').notNull(),
    anchorId: uuid('anchor_id').notNull(),
    editId: uuid('edit_id').notNull(),
    position: smallint('position').notNull(),
    status: placeStatus('status').notNull(),
    /** Frames of the episode at the edit's rate, the one that has begun; null where it is not in this edit. */
    frame: bigint('frame', { mode: 'number' }),
    endFrame: bigint('end_frame', { mode: 'number' }),
    /** The clip it lies on, with frames since that clip's first. */
    clipId: uuid('clip_id'),
    clipFrame: bigint('clip_frame', { mode: 'number' }),
    /** The picture was taken for a note about sound, because the edit has no sound track. */
    byPicture: boolean('by_picture').notNull().default(false),
    /** It was made just outside of a clip and goes to its edge. */
    toEdge: boolean('to_edge').notNull().default(false),
    /** Of one that is lost: the segment that the edit before used it in, as a person reads it. */
    dropped: text('dropped'),
  },
  (table) => [
    primaryKey({ name: 'places_pkey', columns: [table.anchorId, table.editId, table.position] }),
    foreignKey({
      name: 'places_anchor_fk',
      columns: [table.workshopId, table.anchorId],
      foreignColumns: [anchors.workshopId, anchors.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'places_edit_fk',
      columns: [table.workshopId, table.editId],
      foreignColumns: [edits.workshopId, edits.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'places_clip_fk',
      columns: [table.workshopId, table.clipId],
      foreignColumns: [clips.workshopId, clips.id],
    }).onDelete('cascade'),
    index('places_edit_index')
      .on(table.editId, table.frame)
      .where(sql`${table.frame} is not null`),
  ],
);
