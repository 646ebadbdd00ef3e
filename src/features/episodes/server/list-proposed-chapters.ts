import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type Chapter } from '../../../domain/chapters/chapter.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { read } from '../../../server/verb.ts';
import { loadDraftChapters } from './load-chapters.ts';
import { type EpisodeRef, findDraftVideo, loadEpisode } from './load-episode.ts';
import { proposeEpisodeChapters } from './propose-episode-chapters.ts';

/** The proposals that say something new: no chapter begins there yet. */
export async function loadNewProposals({ db }: WorkshopContext, episode: { id: string; buildId: string }) {
  const video = await findDraftVideo(db, episode.id);
  const length = video?.seconds == null ? null : Math.round(video.seconds * 1000);
  const { chapters, rate } = await proposeEpisodeChapters(db, episode, length);
  const there = new Set(
    (await loadDraftChapters(db, episode.id)).map(({ position }) =>
      frameToMilliseconds(position.frame, position.rate),
    ),
  );
  return { chapters: chapters.filter(({ start }) => !there.has(start)), rate };
}

/** Chapters that the stages of the footage propose, without those that are there. */
export const listProposedChapters = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<{ items: readonly Chapter[]; nextCursor: null }> => {
    const { episode } = await loadEpisode(context, ref);
    return { items: (await loadNewProposals(context, episode)).chapters, nextCursor: null };
  },
);
