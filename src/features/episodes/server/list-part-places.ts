import { type CautionTopic } from '../../../domain/cautions/topics.ts';
import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { read } from '../../../server/verb.ts';
import { type PartPlaces } from '../companion.ts';
import { getCompanion } from './get-companion.ts';
import { listPublicEpisodes } from './list-public-episodes.ts';

/**
 * Every place at which a part is on film in the published editions of its build, by episode.
 * @param input of a part that was found in a build on show
 * @returns with the topics of the cautions that its notes carry, and every published episode's id: what a page that
 * shows this depends on
 */
export const listPartPlaces = read(
  { may: 'published.read' },
  async (
    context,
    input: { readonly build: { readonly id: string; readonly slug: string }; readonly partId: string },
  ) => {
    const { build, partId } = input;
    const { items: published } = await listPublicEpisodes(context, { buildId: build.id });
    const found: PartPlaces[] = [];
    const topics = new Set<CautionTopic>();
    for (const { number } of [...published].sort((a, b) => a.number - b.number)) {
      const { episode, notes, appearances, video } = await getCompanion(context, {
        build: build.slug,
        number,
      });
      const own = notes.filter((note) => note.partIds.includes(partId));
      for (const { topic } of own) if (topic !== null) topics.add(topic);
      const starts = new Set([
        ...own.map(({ from }) => from),
        ...appearances.filter((one) => one.partId === partId).map(({ from }) => from),
      ]);
      const places = [...starts]
        .sort((a, b) => a - b)
        .map((from) => ({
          at: frameToMilliseconds(from, video.rate) / 1000,
          note: own.find((note) => note.from === from) ?? null,
        }));
      if (places.length > 0) {
        const { id, title } = episode;
        found.push({ episode: { id, number: episode.number, title }, places });
      }
    }
    return { items: found, topics: [...topics], episodeIds: published.map(({ id }) => id) };
  },
);
