import { AS_FILMED } from '../../../domain/footage/pace.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type KeptClips, type SentClip } from '../footage.ts';
import { announceFootage } from './announce-footage.ts';
import { keepClips } from './keep-clips.ts';

/** Takes clips that a browser named: their files stay where they are. */
export const addClips = verb(
  { may: 'footage.change' },
  async (
    context,
    input: { readonly build: string; readonly clips: readonly SentClip[] },
  ): Promise<KeptClips> => {
    const { db, workshop, actor, now } = context;
    const build = await loadBuild(context, input.build);
    const kept = await keepClips(
      db,
      {
        workshopId: workshop.id,
        buildId: build.id,
        addedBy: actor.kind === 'account' ? actor.id : null,
        now,
      },
      input.clips.map(({ frameTimes, ...clip }, index) => ({
        line: index + 1,
        clip: { ...clip, pace: AS_FILMED, stage: null, parts: [] },
        frameTimes,
      })),
    );
    await announceFootage(context, build.id);
    return kept;
  },
);
