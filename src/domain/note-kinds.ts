/** The kinds of note, in the order in which they are offered. */
export const NOTE_KINDS = [
  'step',
  'size',
  'setting',
  'rating',
  'change',
  'undecided',
  'correction',
  'caution',
  'ask',
  'tip',
] as const;
export type NoteKind = (typeof NOTE_KINDS)[number];

/** Kinds whose numbers people build from: on a published episode only the owner changes them. */
export const GUARDED_KINDS: readonly NoteKind[] = ['size', 'setting', 'rating', 'caution', 'correction'];

/** Who sees a note: viewers, the team, or one person of the team who is asked. */
export const NOTE_AUDIENCES = ['viewers', 'team', 'person'] as const;
export type NoteAudience = (typeof NOTE_AUDIENCES)[number];

/** What a size in a note is: what the plan says, what came out, or what was said on camera. */
export const SIZE_STANDINGS = ['plan', 'as-made', 'as-said'] as const;
export type SizeStanding = (typeof SIZE_STANDINGS)[number];
