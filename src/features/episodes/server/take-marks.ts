import { newId } from '../../../db/columns.ts';
import { partNumberKey } from '../../../domain/part-numbers.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { addNote } from '../../notes/server/add-note.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';
import { CHAPTER_TITLE_LENGTH } from '../episode.ts';
import { type TakeMarks } from '../marks.ts';
import { addChapter } from './add-chapter.ts';
import { loadPartNumbers } from './load-part-numbers.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

/** Takes marks of an editing program as notes for the team, or as chapters. @throws Invalid where there is no edit */
export const takeMarks = verb(
  { may: 'draft-note.change' },
  async (context, { rows, ...ref }: EpisodeRef & TakeMarks) => {
    const { episode } = await loadEpisode(context, ref);
    const stored = await findDraftEdit(context.db, episode.id);
    if (stored === null) throw new Invalid({ '': 'Take an edit in first: marks stand on its times.' });
    const numbers = await loadPartNumbers(context.db, episode.buildId);
    const idOf = new Map([...numbers].map(([id, number]) => [partNumberKey(number), id]));
    const taken = rows.filter(({ as }) => as !== 'leave');
    for (const { as, frame, kind, parts, text } of taken) {
      const position = { frame, endFrame: null, rate: stored.edit.rate };
      const words = text === '' ? 'A mark without words.' : text;
      const at = { build: ref.build, episode: episode.id, id: newId(), position };
      if (as === 'chapter')
        await addChapter(context, {
          ...at,
          title: words.replace(/\s+/gu, ' ').slice(0, CHAPTER_TITLE_LENGTH),
        });
      else
        await addNote(context, {
          ...at,
          kind,
          text: words,
          audience: 'team',
          askedId: null,
          standing: kind === 'size' ? 'as-said' : null,
          topic: null,
          partIds: parts.split(',').flatMap((number) => idOf.get(partNumberKey(number)) ?? []),
        });
    }
    const chapters = taken.filter(({ as }) => as === 'chapter').length;
    return { notes: taken.length - chapters, chapters };
  },
);
