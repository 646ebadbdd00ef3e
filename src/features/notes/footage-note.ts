import { type NoteAudience, type NoteKind } from '../../domain/note-kinds.ts';

/** A note that was made by the shop's clock or on a clip, where it stands in both. */
export interface FootageNote {
  readonly id: string;
  readonly version: number;
  readonly kind: NoteKind;
  readonly text: string;
  readonly audience: NoteAudience;
  readonly writtenBy: string | null;
  /** Shop time, in milliseconds since 1970; null when nothing says when its clip was filmed. */
  readonly at: number | null;
  /** The clip it was made on; null by the shop's clock. */
  readonly clip: string | null;
  readonly clipName: string | null;
  /** Of one on a clip: seconds since its first frame. */
  readonly seconds: number | null;
}
