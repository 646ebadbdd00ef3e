import { type Database } from '../../../db/client.ts';
import { type Marker } from '../../../domain/edit/edit.ts';
import { sayFrames } from '../../../domain/edit/say-frames.ts';
import { readMarkWords } from '../../../domain/marks/read-marks.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { type StoredEdit } from '../../notes/server/load-edits.ts';
import { loadNotes, ofDesk } from '../../notes/server/load-notes.ts';
import { MOST_MARKS, type OfferedMark } from '../marks.ts';
import { loadDraftChapters } from './load-chapters.ts';

/** Marks as what they may become, those that begin before the episode left out; with which of them are there already. */
export async function offerMarks(
  db: Database,
  { episodeId, edit: { rate, drop } }: Pick<StoredEdit, 'episodeId' | 'edit'>,
  markers: readonly Marker[],
): Promise<OfferedMark[]> {
  const view = await findDraftView(db, episodeId);
  const plain = (text: string) => text.replace(/\s+/gu, ' ').trim();
  const there = new Set([
    ...(await loadNotes(db, view, ofDesk(view))).map(({ text }) => plain(text)),
    ...(await loadDraftChapters(db, episodeId)).map(({ title }) => plain(title)),
  ]);
  return markers
    .filter(({ record }) => record.compare(0) >= 0)
    .slice(0, MOST_MARKS)
    .map(({ record, name }) => {
      const words = readMarkWords(name);
      const label = sayFrames(record, rate, drop);
      return { ...words, frame: Number(record.floor()), label, there: there.has(plain(words.text)) };
    });
}
