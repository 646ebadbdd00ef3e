import { and, eq, isNull, sql } from 'drizzle-orm';
import { type PgColumn } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { appearances, chapters, notes } from '../../../db/schema/notes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { places } from '../../../db/schema/places.ts';
import { questions } from '../../../db/schema/questions.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { keepOnClip } from '../../../domain/place/keep-on-clip.ts';
import { type LoadedClip } from '../../footage/server/load-filmed-clips.ts';
import {
  type AnchorRow,
  editByIds,
  type Footage,
  loadFootage,
  positionOf,
} from '../../notes/server/footage-of-edits.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';
import { loadHeld, placeIn } from '../../notes/server/place-edit.ts';
import { type EditReport, type Reported } from '../edit-report.ts';

const secondsOf = (frame: number, rate: Rate) => (frame * rate.den) / rate.num;

/** The version of an episode that had no edit, as a clip that is not kept yet. */
export interface FirstVersion {
  readonly edit: Edit;
  readonly clipIds: ReadonlyMap<string, string>;
  readonly clip: LoadedClip;
}

/**
 * What taking an edit would do to the notes, chapters, parts in view and questions of its episode: nothing is kept.
 * @param of.clipIds by the edit's names; a name that is left out stands for footage that is not here yet
 * @param first the version that everything typed stands on, where the edit would not be the first one taken
 */
export async function reportEdit(
  db: Database,
  episode: { readonly id: string; readonly buildId: string },
  of: { readonly edit: Edit; readonly clipIds: ReadonlyMap<string, string | null> },
  first: FirstVersion | null = null,
): Promise<EditReport> {
  const before = await findDraftEdit(db, episode.id);
  const next = { episodeId: episode.id, number: (before?.number ?? 0) + 1, ...of };
  const held = await loadHeld(db, next, episode.buildId);
  const known = await loadFootage(db, episode.buildId);
  const footage = first === null ? known : withClip(known, first.clip);
  const rows =
    first === null
      ? held
      : held.map((row) => (isTyped(episode.id, row) ? onFirst(row, first, footage) : row));
  const found = await placeIn(db, next, footage, rows);
  const named = await nameAnchors(
    db,
    rows.map(({ id }) => id),
  );
  const stood =
    before === null ? typedIn(episode.id, held) : await loadStood(db, before.id, before.edit.rate);
  const stands = new Map(
    found.filter(({ position }) => position === 0).map((place) => [place.anchorId, place]),
  );
  const report = { stays: 0, brought: 0, by: [] as number[], lost: [] as Reported[], back: [] as Reported[] };
  for (const [id, owner] of named) {
    const [was, is] = [stood.get(id), stands.get(id)];
    const at = is?.frame == null ? null : secondsOf(is.frame, of.edit.rate);
    // Before there was an edit everything stands where it was typed, and stays there.
    if (before === null && first === null && was !== undefined) report.stays += 1;
    else if (at !== null && was != null) {
      const by = Math.abs(at - was);
      if (by < HALF_MILLISECOND) report.stays += 1;
      else report.by.push(by);
    } else if (at !== null) {
      if (was === null) report.back.push({ ...owner, dropped: null, at });
      else report.brought += 1;
    } else if (was != null) report.lost.push({ ...owner, dropped: is?.dropped ?? null, at: null });
  }
  const { by, ...counted } = report;
  const moves =
    by.length === 0
      ? null
      : {
          count: by.length,
          least: by.reduce((a, b) => Math.min(a, b)),
          most: by.reduce((a, b) => Math.max(a, b)),
        };
  return { ...counted, moves };
}

/** Places are whole frames; a difference below this is one of writing. */
const HALF_MILLISECOND = 0.0005;

/** Where each anchor stands in an edit, in seconds; null where it is told as not in it. */
async function loadStood(db: Database, editId: string, rate: Rate): Promise<Map<string, number | null>> {
  const rows = await db
    .select({ id: places.anchorId, frame: places.frame })
    .from(places)
    .where(and(eq(places.editId, editId), eq(places.position, 0)));
  return new Map(rows.map(({ id, frame }) => [id, frame === null ? null : secondsOf(frame, rate)]));
}

function typedIn(episodeId: string, rows: readonly AnchorRow[]): Map<string, number | null> {
  const typed = rows.filter((row) => isTyped(episodeId, row));
  return new Map(
    typed.map(({ id, frame, rateNum, rateDen }) => [
      id,
      secondsOf(frame ?? 0, { num: rateNum ?? 1, den: rateDen ?? 1 }),
    ]),
  );
}

function isTyped(episodeId: string, row: AnchorRow): boolean {
  return row.clock === 'episode' && row.episodeId === episodeId;
}

/** A typed anchor as it will be kept on the version before. */
function onFirst(row: AnchorRow, first: FirstVersion, footage: Footage): AnchorRow {
  const { clip, clipIds, edit } = first;
  const kept = keepOnClip(editByIds({ edit, clipIds }), footage.counted, positionOf(row), row.of);
  if (kept === null) return row;
  const { frame, endFrame, rate } = kept;
  return { ...row, clock: 'clip', clipId: clip.id, frame, endFrame, rateNum: rate.num, rateDen: rate.den };
}

function withClip(footage: Footage, clip: LoadedClip): Footage {
  return {
    clips: [...footage.clips, { ...clip, name: clip.id }],
    counted: new Map([...footage.counted, [clip.id, clip]]),
    loaded: new Map([...footage.loaded, [clip.id, clip]]),
  };
}

/** What stands at anchors, but for what is deleted. */
async function nameAnchors(
  db: Database,
  ids: readonly string[],
): Promise<Map<string, Pick<Reported, 'what' | 'text'>>> {
  const among = (column: PgColumn) => sql`${column} = any(${sql.param(ids)}::uuid[])`;
  const named = new Map<string, Pick<Reported, 'what' | 'text'>>();
  const add = (
    what: Reported['what'],
    rows: readonly { readonly id: string | null; readonly text: string }[],
  ) => {
    for (const { id, text } of rows) if (id !== null) named.set(id, { what, text });
  };
  add(
    'note',
    await db
      .select({ id: notes.anchorId, text: notes.text })
      .from(notes)
      .where(and(among(notes.anchorId), isNull(notes.deletedAt))),
  );
  add(
    'chapter',
    await db
      .select({ id: chapters.anchorId, text: chapters.title })
      .from(chapters)
      .where(and(among(chapters.anchorId), isNull(chapters.deletedAt))),
  );
  add(
    'part in view',
    await db
      .select({ id: appearances.anchorId, text: sql<string>`${parts.number} || ' ' || ${parts.name}` })
      .from(appearances)
      .innerJoin(parts, eq(parts.id, appearances.partId))
      .where(and(among(appearances.anchorId), isNull(appearances.deletedAt))),
  );
  add(
    'question',
    await db
      .select({ id: questions.anchorId, text: questions.text })
      .from(questions)
      .where(and(among(questions.anchorId), sql`${questions.confirmedAt} is not null`)),
  );
  return named;
}
