import { type NoteAudience } from '../note-kinds.ts';

/** What decides who reads a note. */
export interface NoteVisibility {
  readonly audience: NoteAudience;
  readonly proposed: boolean;
  /** When it was deleted; null or left out while it stands. */
  readonly deletedAt?: Date | string | null;
}

/** Whether viewers see a note: meant for them, not only proposed, and not deleted. */
export function isShownToViewers(note: NoteVisibility): boolean {
  return note.audience === 'viewers' && !note.proposed && (note.deletedAt ?? null) === null;
}
