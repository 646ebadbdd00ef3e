import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { loadDraftChapters } from './load-chapters.ts';
import { findDraftVideo } from './load-episode.ts';
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
