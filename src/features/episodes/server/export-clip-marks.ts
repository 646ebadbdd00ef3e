import { and, eq, inArray, isNull } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { anchors, noteParts, notes } from '../../../db/schema/notes.ts';
import { type Database } from '../../../db/client.ts';
import { rateOf } from '../../../domain/edit/edit.ts';
import { isTimed, placeOnClips } from '../../../domain/footage/place-on-clips.ts';
import { markOfNote } from '../../../domain/marks/note-marks.ts';
import { type MarkedClip, stringOut } from '../../../domain/marks/string-out.ts';
import { MILLISECOND_RATE, parseRate, type Rate, sameRate } from '../../../domain/time/rate.ts';
import { Invalid } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadFilmedClips, type LoadedClip } from '../../footage/server/load-filmed-clips.ts';
import { secondsOn } from '../../notes/server/footage-of-edits.ts';
import { type EditFileForm, NO_RATE } from '../edit.ts';
import { loadPartNumbers } from './load-part-numbers.ts';
import { writeEditFile } from './write-edit-file.ts';

type Input = { readonly build: string; readonly as: EditFileForm; readonly rate: string };

interface NoteOnClip {
  readonly id: string;
  readonly clipId: string;
  /** Seconds since the clip's first frame. */
  readonly at: Fraction;
  readonly kind: (typeof notes.$inferSelect)['kind'];
  readonly text: string;
  readonly topic: string | null;
}

/**
 * The clips of a build one after another with what was noted on them, so that an editor has the shop's marks on the
 * timeline before the first cut. Notes made by shop time lie on the clips that ran then.
 * @throws Invalid for a rate that is none, and where no clip has a note
 */
export const exportClipMarks = read({ may: 'workshop.see-bench' }, async (context, input: Input) => {
  const { db } = context;
  const build = await loadBuild(context, input.build);
  const clips = await loadFilmedClips(db, build.id);
  const noted = await loadNotesOnClips(db, build.id, clips);
  const numbers = await loadPartNumbers(db, build.id);
  const partsOf = await loadParts(db, noted, numbers);
  const marked = clips.flatMap((clip) => {
    const own = noted.filter(({ clipId }) => clipId === clip.id);
    return own.length === 0 ? [] : [markClip(clip, own, partsOf)];
  });
  const [first] = marked;
  if (first === undefined) throw new Invalid({ '': 'No note lies on a clip yet.' });
  const edit = stringOut(`${build.name}: notes`, marked, chooseRate(input.rate, first.rate));
  return writeEditFile(`${build.slug}-clips-notes`, edit, input.as);
});

function chooseRate(typed: string, usual: Rate): Rate {
  if (typed === '') return sameRate(usual, MILLISECOND_RATE) ? { num: 25, den: 1 } : usual;
  const read = parseRate(typed);
  if (!read.ok) throw new Invalid({ rate: NO_RATE });
  return read.value;
}

function markClip(
  { name, rate, startLabel, frames }: LoadedClip,
  own: readonly NoteOnClip[],
  partsOf: ReadonlyMap<string, readonly string[]>,
): MarkedClip {
  const marks = own
    .map(({ at, ...note }) => ({
      frame: Math.max(0, Number(at.mul(rateOf(rate)).floor())),
      ...markOfNote({ ...note, parts: partsOf.get(note.id) ?? [] }),
    }))
    .sort((a, b) => a.frame - b.frame);
  // A clip that is only named is as long as what was noted on it.
  const long = frames ?? (marks.at(-1)?.frame ?? 0) + 1;
  return { clip: name, file: null, rate, start: startLabel ?? 0, frames: long, marks };
}

/** Notes made on clips, and those made by the shop's clock while a clip ran. */
async function loadNotesOnClips(
  db: Database,
  buildId: string,
  clips: readonly LoadedClip[],
): Promise<NoteOnClip[]> {
  const rows = await db
    .select({ note: notes, anchor: anchors })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .where(
      and(eq(notes.buildId, buildId), isNull(notes.deletedAt), inArray(anchors.clock, ['clip', 'shop'])),
    );
  const shop = rows.flatMap(({ anchor }) => (anchor.shopAt === null ? [] : [anchor]));
  const ran = placeOnClips(
    clips.filter(isTimed),
    shop.map(({ shopAt }) => new Fraction(shopAt?.getTime() ?? 0)),
  );
  const known = new Map(clips.map((clip) => [clip.id, clip]));
  const byAnchor = new Map(shop.map(({ id }, index) => [id, ran[index]]));
  return rows.flatMap(({ note: { id, kind, text, topic }, anchor }) => {
    const { clipId, frame, rateNum, rateDen } = anchor;
    if (anchor.clock === 'clip' && clipId !== null && frame !== null) {
      const counted = { num: rateNum ?? 1, den: rateDen ?? 1 };
      return [{ id, kind, text, topic, clipId, at: secondsOn(known.get(clipId), frame, counted) }];
    }
    const places = byAnchor.get(anchor.id);
    if (places === undefined || (places.status !== 'running' && places.status !== 'edge')) return [];
    return places.clips.map((on) => ({ id, kind, text, topic, clipId: on.id, at: on.at }));
  });
}

async function loadParts(
  db: Database,
  noted: readonly NoteOnClip[],
  numbers: ReadonlyMap<string, string>,
): Promise<ReadonlyMap<string, readonly string[]>> {
  const ids = [...new Set(noted.map(({ id }) => id))];
  const byNote = new Map<string, string[]>();
  if (ids.length === 0) return byNote;
  const rows = await db
    .select()
    .from(noteParts)
    .where(inArray(noteParts.noteId, ids))
    .orderBy(noteParts.position);
  for (const { noteId, partId } of rows)
    byNote.set(noteId, [...(byNote.get(noteId) ?? []), numbers.get(partId) ?? '']);
  return byNote;
}
