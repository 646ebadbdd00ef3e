import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { getPublicEpisode } from './get-public-episode.ts';

interface Ref {
  readonly build: string;
  readonly number: number;
  readonly captions: string;
}

/**
 * The captions of the edition on show, as WebVTT, with what they belong to.
 * @throws NotFound for those of any other edition
 */
export const getShownCaptions = read({ may: 'published.read' }, async (context, ref: Ref) => {
  const { build, episode, edition } = await getPublicEpisode(context, ref);
  if (edition.captions?.id !== ref.captions) throw new NotFound('These captions');
  return { webvtt: edition.captions.webvtt, buildId: build.id, episodeId: episode.id };
});
