import { and, eq, isNull } from 'drizzle-orm';
import { editClips, editions } from '../../../db/schema/episodes.ts';
import { anchors, notes, noteVersions } from '../../../db/schema/notes.ts';
import { type NoteKind } from '../../../domain/note-kinds.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { type ClipRef, loadClip } from '../../footage/server/load-clip.ts';
import { isProposal, requireMayChange } from './guard-published.ts';
import { maySee } from './load-note.ts';

/** A clip that notes are kept on, with the episodes on show whose edit uses it. */
export async function loadClipOfNotes(context: WorkshopContext, ref: ClipRef) {
  const clip = await loadClip(context, ref);
  const shown = await context.db
    .selectDistinct({ id: editions.episodeId })
    .from(editClips)
    .innerJoin(editions, eq(editions.editId, editClips.editId))
    .where(and(eq(editClips.clipId, clip.id), isNull(editions.replacedAt), isNull(editions.withdrawnAt)));
  return { ...clip, shownIn: shown.map(({ id }) => id) };
}
export type ClipOfNotes = Awaited<ReturnType<typeof loadClipOfNotes>>;

/** As an episode, for the rule about numbers that builders work from: on show where one that uses the clip is. */
function asEpisode(clip: ClipOfNotes) {
  const state = clip.shownIn.length > 0 ? ('published' as const) : ('draft' as const);
  return { id: clip.shownIn[0] ?? '', buildId: clip.buildId, state };
}

/** Whether a note of this kind, by this person, only proposes. */
export function proposesOnClip(context: WorkshopContext, clip: ClipOfNotes, kind: NoteKind): boolean {
  return isProposal(context, asEpisode(clip), kind);
}

/** @throws Forbidden where a person may only propose */
export function requireMayChangeOnClip(
  context: WorkshopContext,
  clip: ClipOfNotes,
  kinds: readonly NoteKind[],
): void {
  requireMayChange(context, asEpisode(clip), kinds);
}

/** Tells the public pages of the episodes that use the clip. */
export async function announceClipNotes({ db }: WorkshopContext, clip: ClipOfNotes): Promise<void> {
  if (clip.shownIn.length > 0)
    await announcePageChanges(
      db,
      clip.shownIn.map((id) => `episode:${id}`),
    );
}

/**
 * A note on a clip, locked for the change that follows; what it says now is kept.
 * @throws NotFound for one that the reader may not see either; Conflict when it is not at the version that was seen
 */
export async function lockClipNote(
  context: WorkshopContext,
  clip: ClipOfNotes,
  ref: { readonly note: string; readonly version: number },
  options: { readonly deleted?: boolean } = {},
): Promise<typeof notes.$inferSelect> {
  const { db, workshop, actor, now } = context;
  const [row] = await db
    .select({ note: notes })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .where(
      and(
        eq(notes.id, ref.note),
        eq(notes.workshopId, workshop.id),
        eq(anchors.clipId, clip.id),
        options.deleted === true ? undefined : isNull(notes.deletedAt),
      ),
    )
    .for('update', { of: notes });
  if (!row || !maySee(context, row.note)) throw new NotFound('This note');
  const { id, version, kind, text, audience, standing, topic } = row.note;
  if (version !== ref.version) throw new Conflict({ id, version, kind, text });
  await db
    .insert(noteVersions)
    .values({
      workshopId: workshop.id,
      noteId: id,
      version,
      fields: { kind, text, audience, standing, topic },
      changedBy: actor.kind === 'account' ? actor.id : null,
      changedAt: now,
    })
    .onConflictDoNothing();
  return row.note;
}
