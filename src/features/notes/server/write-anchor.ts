import { eq } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { newId } from '../../../db/columns.ts';
import { anchors } from '../../../db/schema/notes.ts';
import { keepOnClip } from '../../../domain/place/keep-on-clip.ts';
import { type Position } from '../../../domain/positions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { type AnchorRow, editByIds, loadFootage } from './footage-of-edits.ts';
import { findDraftEdit, type StoredEdit } from './load-edits.ts';
import { lockPlaces, placeAgain } from './place-edit.ts';

interface OfBuild {
  readonly id: string;
  readonly buildId: string;
}

type AnchorColumns = Omit<AnchorRow, 'id' | 'workshopId' | 'buildId' | 'of' | 'createdAt'>;

/** The columns of an anchor at a position of the episode's own time. */
export function atEpisodeTime(episodeId: string, { frame, endFrame, rate }: Position): AnchorColumns {
  return {
    clock: 'episode',
    shopAt: null,
    shopUntil: null,
    clipId: null,
    endClipId: null,
    episodeId,
    frame,
    endFrame,
    rateNum: rate.num,
    rateDen: rate.den,
    ...NOT_TYPED,
  };
}

const NOT_TYPED = { typedFrame: null, typedEndFrame: null, typedRateNum: null, typedRateDen: null };

/**
 * The columns of an anchor at a position of an episode, kept at the clip time beneath it where an edit covers it.
 * @param through the edit whose timeline the position is on; null where there is none
 */
export async function columnsAt(
  db: Database,
  episode: OfBuild,
  position: Position,
  through: StoredEdit | null,
  of: AnchorRow['of'] = 'picture',
): Promise<AnchorColumns> {
  const typed = atEpisodeTime(episode.id, position);
  if (through === null) return typed;
  const { counted } = await loadFootage(db, episode.buildId);
  const kept = keepOnClip(editByIds(through), counted, position, of);
  if (kept === null) return typed;
  const { frame, endFrame, rate } = position;
  return {
    ...typed,
    clock: 'clip',
    clipId: kept.clip,
    endClipId: kept.endClip,
    frame: kept.frame,
    endFrame: kept.endFrame,
    rateNum: kept.rate.num,
    rateDen: kept.rate.den,
    // The first edit has the timeline of the episode as it was without one: an edition without an edit shows it too.
    ...(through.number === 1 && {
      typedFrame: frame,
      typedEndFrame: endFrame,
      typedRateNum: rate.num,
      typedRateDen: rate.den,
    }),
  };
}

/** Makes an anchor at a position of an episode's draft, and places it. */
export async function makeAnchor(
  { db, workshop }: Pick<WorkshopContext, 'db' | 'workshop'>,
  episode: OfBuild,
  position: Position,
): Promise<string> {
  await lockPlaces(db, episode.buildId);
  const columns = await columnsAt(db, episode, position, await findDraftEdit(db, episode.id));
  const id = newId();
  await db.insert(anchors).values({ id, workshopId: workshop.id, buildId: episode.buildId, ...columns });
  await placeAgain(db, episode.buildId, [id]);
  return id;
}

/**
 * Moves an anchor to another position of an episode's draft. One that stands there already stays as it was made; one
 * that was made elsewhere does not become the episode's.
 * @param stands where it is now; null where it is nowhere
 */
export async function moveAnchor(
  { db }: Pick<WorkshopContext, 'db'>,
  episode: OfBuild,
  anchorId: string,
  position: Position,
  stands: Position | null,
): Promise<void> {
  if (stands !== null && samePosition(stands, position)) return;
  await lockPlaces(db, episode.buildId);
  const [row] = await db.select().from(anchors).where(eq(anchors.id, anchorId));
  if (!row) throw new Error('The anchor is not there.');
  const through = await findDraftEdit(db, episode.id);
  const columns = await columnsAt(db, episode, position, through, row.of);
  const { typedFrame, typedEndFrame, typedRateNum, typedRateDen } = row;
  // What an edition without an edit shows stays as it was shown.
  const shown =
    through !== null && through.number > 1 && columns.clock === 'clip'
      ? { typedFrame, typedEndFrame, typedRateNum, typedRateDen }
      : {};
  const owner = columns.clock === 'clip' ? row.episodeId : episode.id;
  await db
    .update(anchors)
    .set({ ...columns, ...shown, episodeId: owner })
    .where(eq(anchors.id, anchorId));
  await placeAgain(db, episode.buildId, [anchorId]);
}

function samePosition(a: Position, b: Position): boolean {
  return (
    a.frame === b.frame && a.endFrame === b.endFrame && a.rate.num * b.rate.den === b.rate.num * a.rate.den
  );
}
