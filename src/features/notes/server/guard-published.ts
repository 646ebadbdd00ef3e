import { GUARDED_KINDS, type NoteKind } from '../../../domain/note-kinds.ts';
import { may } from '../../../domain/permissions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Forbidden } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { type EpisodeOfNotes } from './load-episode.ts';

/** Whether a note of this kind, by this person, only proposes: numbers of a published episode are the owner's. */
export function isProposal({ role }: WorkshopContext, episode: EpisodeOfNotes, kind: NoteKind): boolean {
  return (
    episode.state === 'published' && GUARDED_KINDS.includes(kind) && !may(role, 'published-number.change')
  );
}

/** @throws Forbidden where a person may only propose */
export function requireMayChange(
  context: WorkshopContext,
  episode: EpisodeOfNotes,
  kinds: readonly NoteKind[],
): void {
  if (kinds.some((kind) => isProposal(context, episode, kind))) {
    throw new Forbidden(
      'The episode is published, and builders work from this number: only the owner changes it. Your text is kept here; add it as a note of its own to propose it.',
    );
  }
}

/** Tells the public page of an episode that what it shows has changed. */
export async function announceNotes({ db }: WorkshopContext, episode: EpisodeOfNotes): Promise<void> {
  if (episode.state === 'published') await announcePageChanges(db, [`episode:${episode.id}`]);
}
