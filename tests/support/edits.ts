import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { takeEdit } from '../../src/features/episodes/server/take-edit.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { ReadEditInput } from '../../src/features/episodes/edit.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { aKeptVideo, BUILD } from './companion.ts';

/** Two clips at 25 frames a second: 10 s of C0043 from its label 00:00:31:00, then 5 s of C0044. */
export const LIST = `TITLE: Press 4
FCM: NON-DROP FRAME

001  C0043    V     C        00:00:31:00 00:00:41:00 01:00:00:00 01:00:10:00
* FROM CLIP NAME: C0043.MP4
* LOC: 01:00:02:00 RED     SHAFT IN
002  C0044    V     C        00:00:05:00 00:00:10:00 01:00:10:00 01:00:15:00
* FROM CLIP NAME: C0044.MP4
`;

/** The same later: C0043 comes 2 s later and is shorter, C0044 is gone, C0050 is new. */
export const NEXT_LIST = `TITLE: Press 4
001  C0050    V     C        00:00:00:00 00:00:02:00 01:00:00:00 01:00:02:00
* FROM CLIP NAME: C0050.MP4
002  C0043    V     C        00:00:31:00 00:00:39:00 01:00:02:00 01:00:10:00
* FROM CLIP NAME: C0043.MP4
`;

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
