import { Invalid } from '../../../server/errors.ts';
import { type TextFile } from '../../../server/http/text-file.ts';
import { read } from '../../../server/verb.ts';
import { type LeavingForm } from '../leaving.ts';
import { getLeaving } from './get-leaving.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

type Input = EpisodeRef & { readonly length: number; readonly as: LeavingForm };

/** One of the things that go with an episode, as a file. @throws Invalid for what cannot be written yet */
export const getLeavingFile = read(
  { may: 'workshop.see-bench' },
  async (context, input: Input): Promise<TextFile> => {
    const { build, episode } = await loadEpisode(context, input);
    const leaving = await getLeaving(context, input);
    const name = `${build.slug}-${String(episode.number)}`;
    const files = {
      text: { name: `${name}.txt`, type: 'text/plain', text: leaving?.text ?? null },
      vtt: { name: `${name}-chapters.vtt`, type: 'text/vtt', text: leaving?.vtt ?? null },
      json: {
        name: `${name}-chapters.json`,
        type: 'application/json+chapters',
        text: leaving?.json ?? null,
      },
    };
    const { text, ...file } = files[input.as];
    if (text === null) throw new Invalid({ as: 'It needs the video with its length, and a chapter.' });
    return { ...file, text };
  },
);
