import { Invalid } from '../../../server/errors.ts';
import { MILLISECOND_RATE, parseRate, type Rate, sameRate } from '../../../domain/time/rate.ts';
import { readHandEdit } from '../../../domain/edit/read-hand-edit.ts';
import { verb } from '../../../server/verb.ts';
import { loadFilmedClips, type LoadedClip } from '../../footage/server/load-filmed-clips.ts';
import { type BuildEdit, NO_RATE } from '../edit.ts';
import { type Video } from '../episode.ts';
import { type EpisodeRef, findDraftVideo, loadEpisode } from './load-episode.ts';
import { lockEdits, storeEdit } from './store-edit.ts';

/**
 * Takes an edit that was built by hand from clips with in and out, as the next version.
 * @throws Invalid at `segments`, naming the line, or at `rate`
 */
export const buildEdit = verb({ may: 'edit.change' }, async (context, input: EpisodeRef & BuildEdit) => {
  const { db } = context;
  const { episode } = await loadEpisode(context, input);
  const newest = await lockEdits(context, episode.id);
  const clips = await loadFilmedClips(db, episode.buildId);
  const rate = chooseRate(input.rate, await findDraftVideo(db, episode.id), clips);
  const read = readHandEdit(input.segments, episode.title, rate, clips);
  if (!read.ok) throw new Invalid({ segments: read.error });
  const { edit, clipIds } = read.value;
  const { id, number } = await storeEdit(context, episode.id, newest + 1, {
    source: 'hand',
    sourceName: 'by hand',
    sourceText: null,
    edit,
    clipIds,
  });
  return { id, number, segments: { picture: edit.picture.length, sound: edit.sound.length } };
});

/** The rate that was chosen; else the video's; else the first clip's that has one. */
function chooseRate(typed: string, video: Video | null, clips: readonly LoadedClip[]): Rate {
  if (typed !== '') {
    const read = parseRate(typed);
    if (!read.ok) throw new Invalid({ rate: NO_RATE });
    return read.value;
  }
  const rates = [...(video === null ? [] : [video.rate]), ...clips.map((clip) => clip.rate)];
  return rates.find((rate) => !sameRate(rate, MILLISECOND_RATE)) ?? { num: 25, den: 1 };
}
