import { and, eq } from 'drizzle-orm';
import { edits } from '../../../db/schema/episodes.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { findEditById } from '../../notes/server/load-edits.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { lockEdits, storeEdit } from './store-edit.ts';

/** Goes back to an old version: what it had is taken as a new one, so that nothing between is lost. */
export const takeEditAgain = verb(
  { may: 'edit.change' },
  async (context, input: EpisodeRef & { readonly edit: string }) => {
    const { db } = context;
    const { episode } = await loadEpisode(context, input);
    const newest = await lockEdits(context, episode.id);
    const [row] = await db
      .select({ sourceText: edits.sourceText })
      .from(edits)
      .where(and(eq(edits.id, input.edit), eq(edits.episodeId, episode.id)));
    const old = row && (await findEditById(db, input.edit));
    if (!old) throw new NotFound('This version of the edit');
    const { edit, clipIds, source, sourceName } = old;
    const { id, number } = await storeEdit(context, episode.id, newest + 1, {
      source,
      sourceName,
      sourceText: row.sourceText,
      edit,
      clipIds,
    });
    return { id, number, segments: { picture: edit.picture.length, sound: edit.sound.length } };
  },
);
