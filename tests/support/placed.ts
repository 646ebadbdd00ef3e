import { eq } from 'drizzle-orm';
import { newId } from '../../src/db/columns.ts';
import { editClips, edits } from '../../src/db/schema/episodes.ts';
import { clips } from '../../src/db/schema/footage.ts';
import { anchors, notes } from '../../src/db/schema/notes.ts';
import { type Edit } from '../../src/domain/edit/edit.ts';
import { toEditRecord } from '../../src/domain/edit/edit-record.ts';
import { readEdl } from '../../src/domain/edit/read-edl.ts';
import { placeTakenEdit } from '../../src/features/episodes/server/place-taken-edit.ts';
import { placeAgain } from '../../src/features/notes/server/place-edit.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { RATE } from './companion.ts';

/** An edit from the lines of a list, in frames at 25 a second. */
export function editOf(...lines: readonly string[]): Edit {
  const read = readEdl(lines.join('\n'), { rate: RATE });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

/** A clip of the footage, 25 frames a second. @param startedAt shop time of its first frame */
export async function aClip(
  { db, workshop }: WorkshopContext,
  buildId: string,
  name: string,
  { frames = 10_000, startedAt = null as Date | null } = {},
): Promise<string> {
  const id = newId();
  await db.insert(clips).values({
    id,
    workshopId: workshop.id,
    buildId,
    name,
    frames,
    rateNum: RATE.num,
    rateDen: RATE.den,
    startSetAt: startedAt,
  });
  return id;
}

/** Takes an edit as the next version of an episode's, its clips matched by name. */
export async function takeEdit(
  { db, workshop }: WorkshopContext,
  episodeId: string,
  edit: Edit,
  clipIds: Readonly<Record<string, string | null>>,
): Promise<string> {
  const id = newId();
  const tenant = { workshopId: workshop.id };
  const before = await db.$count(edits, eq(edits.episodeId, episodeId));
  await db.insert(edits).values({
    ...tenant,
    id,
    episodeId,
    number: before + 1,
    source: 'list',
    sourceName: 'list.edl',
    rateNum: RATE.num,
    rateDen: RATE.den,
    frames: Number(edit.frames.valueOf()),
    record: toEditRecord(edit),
  });
  const names = Object.entries(clipIds).map(([name, clipId]) => ({ ...tenant, editId: id, name, clipId }));
  if (names.length > 0) await db.insert(editClips).values(names);
  await placeTakenEdit(db, id);
  return id;
}

/** A note for viewers made on a clip, or in the shop. */
export async function noteMade(
  { db, workshop }: WorkshopContext,
  buildId: string,
  text: string,
  at:
    | { readonly clipId: string; readonly frame: number; readonly endFrame?: number; readonly of?: 'sound' }
    | { readonly shopAt: Date },
): Promise<string> {
  const [id, anchorId] = [newId(), newId()];
  const base = { id: anchorId, workshopId: workshop.id, buildId };
  await db
    .insert(anchors)
    .values(
      'shopAt' in at
        ? { ...base, clock: 'shop', shopAt: at.shopAt }
        : { ...base, clock: 'clip', ...at, rateNum: RATE.num, rateDen: RATE.den },
    );
  await db
    .insert(notes)
    .values({ id, workshopId: workshop.id, buildId, anchorId, kind: 'step', text, audience: 'viewers' });
  await placeAgain(db, buildId, [anchorId]);
  return id;
}
