import { and, eq, isNull } from 'drizzle-orm';
import { chapters } from '../../../db/schema/notes.ts';
import { type Position } from '../../../domain/positions.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { type Chapter } from '../episode.ts';
import { announceEpisode } from './announce-episode.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { makeAnchor } from '../../notes/server/write-anchor.ts';
import { loadChaptersWhere } from './load-chapters.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

type Input = EpisodeRef & { readonly id: string; readonly title: string; readonly position: Position };

/** Begins a chapter at a moment. Sent twice, because the first answer was lost, it is kept once. */
export const addChapter = verb(
  { may: 'draft-note.change' },
  async (context, input: Input): Promise<Chapter> => {
    const { db, workshop } = context;
    const { episode } = await loadEpisode(context, input);
    const view = await findDraftView(db, episode.id);
    const [sentBefore] = await loadChaptersWhere(
      db,
      view,
      and(eq(chapters.id, input.id), eq(chapters.episodeId, episode.id), isNull(chapters.deletedAt)),
    );
    if (sentBefore) return sentBefore;
    const anchorId = await makeAnchor(context, episode, { ...input.position, endFrame: null });
    await onUniqueViolation(
      { chapters_pkey: { id: 'This chapter is kept already. Open the page again.' } },
      () =>
        db.insert(chapters).values({
          id: input.id,
          workshopId: workshop.id,
          episodeId: episode.id,
          anchorId,
          title: input.title,
        }),
    );
    await announceEpisode(context, episode);
    const [chapter] = await loadChaptersWhere(db, view, eq(chapters.id, input.id));
    if (!chapter) throw new Error('The chapter was not kept.');
    return chapter;
  },
);
