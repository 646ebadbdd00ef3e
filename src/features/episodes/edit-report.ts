/** Something anchored, as a report names it. */
export interface Reported {
  readonly what: 'note' | 'chapter' | 'part in view' | 'question';
  readonly text: string;
  /** Of what is lost: the segment that held it, as a person reads it. */
  readonly dropped: string | null;
  /** Of what comes back: seconds of the episode. */
  readonly at: number | null;
}

/** What taking an edit would do to everything that the episode holds. */
export interface EditReport {
  readonly stays: number;
  /** How many move, and by how many seconds: the least and the most. */
  readonly moves: { readonly count: number; readonly least: number; readonly most: number } | null;
  /** In the edit before and not in this one. */
  readonly lost: readonly Reported[];
  /** Not in the edit before, and told at the desk as not in it. */
  readonly back: readonly Reported[];
  /** Noted elsewhere, and brought into the episode by this edit. */
  readonly brought: number;
}
