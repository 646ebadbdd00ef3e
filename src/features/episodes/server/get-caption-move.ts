import { read } from '../../../server/verb.ts';
import { type CaptionMove } from '../edit.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { alignVersions, findTwoVersions } from './look-at-captions.ts';
import { reportEdit } from './report-edit.ts';

/**
 * What moving everything by the words of the newest captions would do; null where nothing can move that way.
 * @param ref.look whether to align them, which takes a second or two for two hours of talk
 */
export const getCaptionMove = read(
  { may: 'edit.change' },
  async (context, ref: EpisodeRef & { readonly look: boolean }): Promise<CaptionMove | null> => {
    const { db } = context;
    const { episode } = await loadEpisode(context, ref);
    const versions = await findTwoVersions(db, episode.id);
    if (versions === null) return null;
    const { before, now } = versions;
    const offer = { captions: now.number, from: before.sourceName, to: now.sourceName };
    if (!ref.look) return { ...offer, look: null };
    const { alignment, length, edit, clipIds, first } = await alignVersions(db, episode, versions);
    return {
      ...offer,
      look: {
        found: alignment.aligned.reduce((sum, { before: span }) => sum + span.out - span.in, 0),
        length,
        unaligned: alignment.unaligned,
        report: await reportEdit(db, episode, { edit, clipIds }, first),
      },
    };
  },
);
