import { eq, max } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { captions } from '../../../db/schema/episodes.ts';
import { readCaptions } from '../../../domain/captions/read-captions.ts';
import { writeWebvtt } from '../../../domain/captions/write-captions.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisode } from '../../episodes/server/load-episode.ts';
import { type AddCaptions } from '../captions.ts';

/**
 * Takes a captions file in as the draft's newest; viewers see it with the next edition. It is kept as WebVTT that
 * our own exporter wrote, so that nothing of the file but its words and times reaches a player.
 * @throws Invalid at `file`
 */
export const addCaptions = verb(
  { may: 'captions.change' },
  async (context, { file, language, ...ref }: EpisodeRef & AddCaptions) => {
    const { db, workshop, actor } = context;
    const { episode } = await loadEpisode(context, ref);
    const read = readCaptions(file.bytes);
    if (!read.ok) throw new Invalid({ file: read.error });
    const { cues, warnings } = read.value;
    const [last] = await db
      .select({ number: max(captions.number) })
      .from(captions)
      .where(eq(captions.episodeId, episode.id));
    const id = newId();
    await db.insert(captions).values({
      id,
      workshopId: workshop.id,
      episodeId: episode.id,
      number: (last?.number ?? 0) + 1,
      language,
      sourceName: file.name.slice(0, 200),
      webvtt: writeWebvtt(cues),
      cueCount: cues.length,
      addedBy: actor.kind === 'account' ? actor.id : null,
    });
    return { id, cueCount: cues.length, warnings: [...warnings] };
  },
);
