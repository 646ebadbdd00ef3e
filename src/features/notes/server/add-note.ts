import { and, eq, isNull } from 'drizzle-orm';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { type Note, type NoteFields } from '../note.ts';
import { announceNotes, isProposal } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { findDraftView } from './episode-view.ts';
import { loadNotes } from './load-notes.ts';
import { makeAnchor } from './write-anchor.ts';
import { requireKnown, writeParts } from './write-note.ts';

/**
 * Adds a note at a moment or a stretch of an episode. On a published episode an editor's number is a proposal.
 * Sent twice by the same person, because the first answer was lost, it is kept once.
 * @throws Invalid for a part or a person that is not known
 */
export const addNote = verb(
  { may: 'draft-note.change' },
  async (context, input: NoteFields & EpisodeRef & { id: string }): Promise<Note> => {
    const { db, workshop, actor } = context;
    const episode = await loadEpisodeOfNotes(context, input);
    await requireKnown(context, episode, input);
    const { id, kind, text, audience, askedId, standing, topic } = input;
    const writer = actor.kind === 'account' ? actor.id : null;
    const view = await findDraftView(db, episode.id);
    const [kept] = writer === null ? [] : await loadNotes(db, view, sentBefore(id, episode.id, writer));
    if (kept) return kept;
    const anchorId = await makeAnchor(context, episode, input.position);
    await onUniqueViolation(
      { notes_pkey: { id: 'This note is kept already. Open the page again to see it.' } },
      () =>
        db.insert(notes).values({
          id,
          workshopId: workshop.id,
          buildId: episode.buildId,
          anchorId,
          kind,
          text,
          audience,
          askedId: audience === 'person' ? askedId : null,
          standing,
          topic,
          proposed: isProposal(context, episode, kind),
          writtenBy: writer,
        }),
    );
    await writeParts(context, id, input.partIds);
    await announceNotes(context, episode);
    const [note] = await loadNotes(db, view, eq(notes.id, id));
    if (!note) throw new Error('The note was not kept.');
    return note;
  },
);

function sentBefore(id: string, episodeId: string, writer: string) {
  return and(
    eq(notes.id, id),
    eq(anchors.episodeId, episodeId),
    eq(notes.writtenBy, writer),
    isNull(notes.deletedAt),
  );
}
