import { eq } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { editions, episodeNumbers, episodes, videos } from '../../../db/schema/episodes.ts';
import { readVideoAddress } from '../../../domain/video-addresses/read-video-address.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { announceEpisode } from './announce-episode.ts';

interface Row {
  readonly title: string;
  readonly number: number;
  readonly address: string;
  readonly publishedOn: string;
}

/**
 * Brings in episodes that are out in the world already, by address and true date: all of them or none. They are
 * announced to nobody and are not new in the feed.
 * @throws Invalid at `lines`, naming the line
 */
export const bringInEpisodes = verb(
  { may: 'episode.publish' },
  async (context, input: { readonly build: string; readonly episodes: readonly Row[] }) => {
    const { db, workshop, actor, now } = context;
    const build = await loadBuild(context, input.build);
    const known = await db
      .select({ number: episodeNumbers.number })
      .from(episodeNumbers)
      .where(eq(episodeNumbers.buildId, build.id));
    const taken = new Set(known.map(({ number }) => number));
    for (const [index, row] of input.episodes.entries()) {
      const address = readVideoAddress(row.address);
      const line = `Line ${String(index + 1)}`;
      if (!address.ok) throw new Invalid({ lines: `${line}: ${address.error}` });
      if (taken.has(row.number)) {
        throw new Invalid({
          lines: `${line}: another episode has, or had, the number ${String(row.number)}.`,
        });
      }
      taken.add(row.number);
    }
    const person = actor.kind === 'account' ? actor.id : null;
    const made: string[] = [];
    for (const row of input.episodes) {
      const [id, videoId] = [newId(), newId()];
      const tenant = { workshopId: workshop.id, episodeId: id };
      await db.insert(episodes).values({
        id,
        workshopId: workshop.id,
        buildId: build.id,
        number: row.number,
        title: row.title,
        state: 'published',
        publishedOn: row.publishedOn,
      });
      const justTaken = { lines: `Another episode took the number ${String(row.number)} in the meantime.` };
      await onUniqueViolation({ episode_numbers_pkey: justTaken }, () =>
        db.insert(episodeNumbers).values({ ...tenant, buildId: build.id, number: row.number, current: true }),
      );
      await db
        .insert(videos)
        .values({ ...tenant, id: videoId, address: row.address, rateNum: 1000, rateDen: 1, addedBy: person });
      await db.insert(editions).values({
        ...tenant,
        number: 1,
        videoId,
        publishedAt: now,
        publishedBy: person,
        backCatalogue: true,
      });
      await announceEpisode(context, { id, buildId: build.id });
      made.push(id);
    }
    return { ids: made };
  },
);
