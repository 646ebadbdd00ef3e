import { and, asc, eq, isNull } from 'drizzle-orm';
import { buildSlugs } from '../../../db/schema/builds.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { type Waiting } from '../../../domain/waiting.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';

/** The notes that ask the reader something. */
export const listWaitingAsks = read(
  { may: 'workshop.see-bench' },
  async ({ db, workshop, actor }): Promise<readonly Waiting[]> => {
    if (actor.kind !== 'account') return [];
    const rows = await db
      .select({
        id: notes.id,
        text: notes.text,
        episodeId: episodes.id,
        title: episodes.title,
        build: buildSlugs.slug,
      })
      .from(notes)
      .innerJoin(anchors, eq(anchors.id, notes.anchorId))
      .innerJoin(episodes, and(eq(episodes.id, anchors.episodeId), isNull(episodes.deletedAt)))
      .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, notes.buildId), eq(buildSlugs.current, true)))
      .where(
        and(
          eq(notes.workshopId, workshop.id),
          eq(notes.askedId, actor.id),
          eq(notes.audience, 'person'),
          isNull(notes.answeredAt),
          isNull(notes.deletedAt),
        ),
      )
      .orderBy(asc(notes.id));
    return rows.map((row) => ({
      urgency: 'soon',
      what: `You are asked: “${row.text}” (${row.title})`,
      href: `${paths.desk(workshop.slug, row.build, row.episodeId)}#note-${row.id}`,
      due: null,
    }));
  },
);
