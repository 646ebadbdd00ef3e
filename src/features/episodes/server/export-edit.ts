import { and, eq } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { edits } from '../../../db/schema/episodes.ts';
import { type Database } from '../../../db/client.ts';
import { type Edit, type Marker, rateOf } from '../../../domain/edit/edit.ts';
import { CHAPTER_COLOUR, markOfNote } from '../../../domain/marks/note-marks.ts';
import { type Position } from '../../../domain/positions.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { findEditById } from '../../notes/server/load-edits.ts';
import { loadNotes, ofEpisode } from '../../notes/server/load-notes.ts';
import { type EditFileForm } from '../edit.ts';
import { loadChapters } from './load-chapters.ts';
import { loadPartNumbers } from './load-part-numbers.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { writeEditFile } from './write-edit-file.ts';

type Input = EpisodeRef & {
  readonly edit: string;
  readonly as: EditFileForm;
  readonly marks: 'own' | 'notes';
};

/** A version of the edit as a file for an editing program: with the marks it came with, or with the notes as marks. */
export const exportEdit = read({ may: 'workshop.see-bench' }, async (context, input: Input) => {
  const { db } = context;
  const { build, episode } = await loadEpisode(context, input);
  const [known] = await db
    .select({ id: edits.id })
    .from(edits)
    .where(and(eq(edits.id, input.edit), eq(edits.episodeId, episode.id)));
  const stored = known && (await findEditById(db, input.edit));
  if (!stored) throw new NotFound('This version of the edit');
  const name = `${build.slug}-${String(episode.number)}-v${String(stored.number)}`;
  if (input.marks === 'own') return writeEditFile(name, stored.edit, input.as);
  const markers = await loadMarks(db, episode, stored.id, stored.edit);
  return writeEditFile(`${name}-notes`, { ...stored.edit, markers }, input.as);
});

/** Notes and chapters where they come in an edit. */
async function loadMarks(
  db: Database,
  episode: { readonly id: string; readonly buildId: string },
  id: string,
  { rate, frames }: Edit,
): Promise<Marker[]> {
  const view = { episodeId: episode.id, edit: { id, rate } };
  const notes = await loadNotes(db, view, ofEpisode(view));
  const chapters = await loadChapters(db, view);
  const numbers = await loadPartNumbers(db, episode.buildId);
  const at = ({ frame, rate: counted }: Position) =>
    new Fraction(frame).div(rateOf(counted)).mul(rateOf(rate));
  const marks = [
    ...chapters.map(({ title, position }) => ({
      record: at(position),
      name: `chapter: ${title}`,
      colour: CHAPTER_COLOUR,
    })),
    ...notes.map((note) => ({
      record: at(note.position),
      ...markOfNote({ ...note, parts: note.partIds.flatMap((part) => numbers.get(part) ?? []) }),
    })),
  ];
  return marks.filter(({ record }) => record.compare(frames) < 0).sort((a, b) => a.record.compare(b.record));
}
