import { and, desc, eq, isNull, ne } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { anchors, noteResults, notes } from '../../../db/schema/notes.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from '../../worksheets/server/load-worksheets.ts';
import { workOut } from '../../worksheets/work-out.ts';
import { type CarryingNote } from '../note-result.ts';

/** Notes to choose from; the newest of the build. */
const MOST_CHOICES = 200;

/**
 * The notes that carry results of a worksheet, with what it says now; its results, and the notes that could carry
 * one. What is asked of one person is not among them.
 * @throws NotFound
 */
export const listCarryingNotes = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string; readonly worksheet: string }) => {
    const { db } = context;
    const build = await loadBuild(context, input.build);
    const worksheet = await loadWorksheet(context, build.id, input.worksheet);
    const results = workOut(worksheet);
    const rows = await db
      .select({
        note: notes.id,
        text: notes.text,
        episode: { id: episodes.id, number: episodes.number },
        worksheetId: noteResults.worksheetId,
        what: noteResults.what,
        said: noteResults.said,
      })
      .from(notes)
      .innerJoin(anchors, eq(anchors.id, notes.anchorId))
      .leftJoin(episodes, eq(episodes.id, anchors.episodeId))
      .leftJoin(noteResults, eq(noteResults.noteId, notes.id))
      .where(and(eq(notes.buildId, build.id), isNull(notes.deletedAt), ne(notes.audience, 'person')))
      .orderBy(desc(notes.id));
    const items = rows.flatMap(({ note, text, episode, worksheetId, what, said }): CarryingNote[] =>
      worksheetId === worksheet.id && what !== null && said !== null
        ? [{ note, text, episode, what, said, now: results.get(what) ?? null }]
        : [],
    );
    const choices = rows
      .filter(({ text }) => text !== '')
      .slice(0, MOST_CHOICES)
      .map(({ note, text, episode }) => ({ note, text, episode }));
    return { items, choices, results: [...results], nextCursor: null };
  },
);
