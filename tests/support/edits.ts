import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { takeEdit } from '../../src/features/episodes/server/take-edit.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { ReadEditInput } from '../../src/features/episodes/edit.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { aKeptVideo, BUILD } from './companion.ts';
import { LIST } from './edit-lists.ts';

export { LIST, NEXT_LIST } from './edit-lists.ts';

/** Input as a route gives it. */
export function readEditOf(fields: Readonly<Record<string, unknown>>) {
  return ReadEditInput.parse(fields);
}

/** An episode with a kept video of a length, and no edit yet. */
export async function anUncutEpisode(context: WorkshopContext, seconds = 15): Promise<string> {
  const build = await getBuild(context, { build: BUILD });
  const { id } = await makeEpisode(context, { build: BUILD, title: 'The drum shaft' });
  await setVideo(context, {
    build: BUILD,
    episode: id,
    fileId: await aKeptVideo(context, build.id, { seconds }),
    address: null,
  });
  return id;
}

/** Takes an edit list at 25 frames a second. */
export function takeList(
  context: WorkshopContext,
  episode: string,
  text = LIST,
  more: object = {},
  build = BUILD,
) {
  return takeEdit(context, {
    ...readEditOf({ text, name: 'press-4.edl', rate: '25', ...more }),
    build,
    episode,
  });
}
