import { read } from '../../../server/verb.ts';
import { listShownAppearances } from '../../notes/server/list-appearances.ts';
import { listShownNotes } from '../../notes/server/list-shown-notes.ts';
import { findShownView } from '../../notes/server/episode-view.ts';
import { loadShownResults } from '../../notes/server/load-shown-results.ts';
import { type Companion } from '../companion.ts';
import { getPublicEpisode } from './get-public-episode.ts';
import { listPublicEpisodes } from './list-public-episodes.ts';
import { describeVideo, loadShownParts } from './load-companion-pieces.ts';
import { loadOffCamera } from './load-off-camera.ts';
import { presentCompanion } from './present-companion.ts';

interface Ref {
  readonly build: string;
  readonly number: number;
}

/**
 * All that the page of a published episode shows. `build.slug` and `episode.number` are the current ones, whatever
 * old ones were asked for.
 * @throws NotFound unless an edition of it is on show in a public build
 */
export const getCompanion = read({ may: 'published.read' }, async (context, ref: Ref): Promise<Companion> => {
  const { db, workshop } = context;
  const { build, episode, edition, chapters, of } = await getPublicEpisode(context, ref);
  const { items: notes } = await listShownNotes(context, { episodeId: episode.id });
  const { items: byHand } = await listShownAppearances(context, { episodeId: episode.id });
  const { items: published } = await listPublicEpisodes(context, { buildId: build.id });
  const partIds = new Set([...notes.flatMap((note) => note.partIds), ...byHand.map(({ partId }) => partId)]);
  const { captions, video } = edition;
  return {
    build: { id: build.id, slug: build.slug, name: build.name },
    episode: {
      id: episode.id,
      number: episode.number,
      title: episode.title,
      about: episode.about,
      publishedOn: episode.publishedOn,
    },
    video: await describeVideo(db, video),
    captions: captions && { id: captions.id, language: captions.language },
    ...presentCompanion({
      video,
      notes,
      byHand,
      chapters,
      parts: await loadShownParts(db, workshop.id, [...partIds]),
      results: await loadShownResults(
        db,
        notes.map(({ id: noteId }) => noteId),
      ),
    }),
    offCamera: (await loadOffCamera(db, build.id, await findShownView(db, episode.id), context.now)).map(
      (cut) => ({ ...cut, texts: [] }),
    ),
    series: published.map(({ number, title }) => ({ number, title })).sort((a, b) => a.number - b.number),
    of,
  };
});
