import { isShownToViewers } from '../../../domain/notes/shown-notes.ts';
import { read } from '../../../server/verb.ts';
import { isInEdit } from '../../notes/note.ts';
import { listAppearances } from '../../notes/server/list-appearances.ts';
import { listNotes } from '../../notes/server/list-notes.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { loadShownResults } from '../../notes/server/load-shown-results.ts';
import { type Companion } from '../companion.ts';
import { getDesk } from './get-desk.ts';
import { listPublicEpisodes } from './list-public-episodes.ts';
import { describeVideo, loadShownParts } from './load-companion-pieces.ts';
import { type EpisodeRef } from './load-episode.ts';
import { loadOffCamera } from './load-off-camera.ts';
import { presentCompanion } from './present-companion.ts';

/**
 * What viewers would see of an episode if it were published now, for its preview with the newest captions. Null while there is no video.
 */
export const getDraftCompanion = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<Companion | null> => {
    const { db, workshop } = context;
    const { build, episode, video, captions, chapters } = await getDesk(context, ref);
    if (!video) return null;
    const notes = (await listNotes(context, ref)).items.filter(
      (note) => isShownToViewers(note) && isInEdit(note),
    );
    const byHand = (await listAppearances(context, ref)).items.filter(isInEdit);
    const { items: published } = await listPublicEpisodes(context, { buildId: build.id });
    const partIds = new Set([
      ...notes.flatMap((note) => note.partIds),
      ...byHand.map(({ partId }) => partId),
    ]);
    const { id, number, title, about, publishedOn } = episode;
    const series = [...published.filter((one) => one.number !== number), { number, title }];
    return {
      build: { id: build.id, slug: build.slug, name: build.name },
      episode: { id, number, title, about, publishedOn },
      video: await describeVideo(db, video),
      captions: captions && { id: captions.id, language: captions.language },
      ...presentCompanion({
        video,
        notes,
        byHand,
        chapters: chapters.filter(isInEdit),
        parts: await loadShownParts(db, workshop.id, [...partIds]),
        results: await loadShownResults(
          db,
          notes.map(({ id: noteId }) => noteId),
        ),
      }),
      offCamera: await loadOffCamera(db, build.id, await findDraftView(db, episode.id), context.now),
      series: series
        .map((one) => ({ number: one.number, title: one.title }))
        .sort((a, b) => a.number - b.number),
      of: Math.max(build.plannedEpisodes ?? 0, ...series.map((one) => one.number)),
    };
  },
);
