import { clips } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type MoveByCaptions } from '../edit.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { alignVersions, findTwoVersions } from './look-at-captions.ts';
import { type FirstVersion } from './report-edit.ts';
import { lockEdits, storeEdit } from './store-edit.ts';

/**
 * Moves everything in an episode by the words of its newest captions: the stretches that were aligned are taken as
 * the next version of its edit. Where there was none, the version before is kept as a clip known by its name alone
 * and as version 1, so that what is not found keeps its moment there.
 * @throws Invalid when there is nothing to move by, nothing was found, or other captions came in meanwhile
 */
export const moveByCaptions = verb(
  { may: 'edit.change' },
  async (context, input: EpisodeRef & MoveByCaptions) => {
    const { episode } = await loadEpisode(context, input);
    const newest = await lockEdits(context, episode.id);
    const versions = await findTwoVersions(context.db, episode.id);
    if (versions?.now.number !== input.captions)
      throw new Invalid({ '': 'The captions or the edit changed meanwhile. Nothing moved; look again.' });
    const { edit, clipIds, first, texts } = await alignVersions(context.db, episode, versions);
    if (edit.picture.length === 0)
      throw new Invalid({ '': 'The two versions have no words in common. Nothing moved.' });
    const source = 'captions';
    if (first !== null) {
      await keepClip(context, episode.buildId, first);
      const { sourceName } = versions.before;
      await storeEdit(context, episode.id, 1, { source, sourceName, sourceText: texts.before, ...first });
    }
    const number = newest + (first === null ? 1 : 2);
    const { sourceName } = versions.now;
    // The captions stay with the edit, to align the next ones with.
    const taken = { source, sourceName, sourceText: texts.now, edit, clipIds } as const;
    const { id } = await storeEdit(context, episode.id, number, taken);
    return { id, number, segments: { picture: edit.picture.length, sound: edit.sound.length } };
  },
);

async function keepClip(
  { db, workshop, actor }: WorkshopContext,
  buildId: string,
  { clip }: FirstVersion,
): Promise<void> {
  await db.insert(clips).values({
    id: clip.id,
    workshopId: workshop.id,
    buildId,
    name: clip.name,
    frames: clip.frames,
    rateNum: clip.rate.num,
    rateDen: clip.rate.den,
    addedBy: actor.kind === 'account' ? actor.id : null,
  });
}
