import { type OffCameraSign } from '../../domain/footage/clip-facts.ts';

/** A clip as the footage pages show it. */
export interface ShownClip {
  readonly id: string;
  readonly name: string;
  readonly version: number;
  readonly camera: { readonly id: string; readonly name: string } | null;
  /** When it ran, in milliseconds since 1970 by the shop's time; null when nothing says so. */
  readonly from: number | null;
  readonly until: number | null;
  /** How long it plays, in seconds; null until known. */
  readonly length: number | null;
  readonly rate: { readonly num: number; readonly den: number };
  readonly pace: { readonly num: number; readonly den: number };
  readonly by: 'hand' | 'camera' | 'slate' | 'before' | 'nothing';
  /** Why its file's own time is no use; null where it is. */
  readonly problem: string | null;
  readonly stage: { readonly id: string; readonly name: string } | null;
  readonly parts: readonly { readonly id: string; readonly number: string; readonly name: string }[];
  /** Null for a clip that stays at home. */
  readonly fileId: string | null;
  /** Whether it is kept as a film, with a thumbnail and a filmstrip. */
  readonly hasFilm: boolean;
  /** Whether its browser sent a small picture of it. */
  readonly hasPicture: boolean;
  readonly continuesId: string | null;
}

/** A stretch of work that was done with the camera off, as it is shown. */
export interface ShownStretch {
  readonly id: string;
  readonly version: number;
  readonly from: number;
  /** Null while it runs. */
  readonly until: number | null;
  readonly sign: OffCameraSign;
  readonly stage: string | null;
  readonly text: string;
}

/** One day of a build's footage. */
export interface FootageDay {
  /** Days with clips or hours, the newest first. */
  readonly days: readonly { readonly day: string; readonly clips: number }[];
  /** The day that is shown; null shows the clips of unknown time. */
  readonly day: string | null;
  readonly clips: readonly ShownClip[];
  readonly stretches: readonly ShownStretch[];
  /** When no camera ran between the day's first clip and its last, whatever is shown of it. */
  readonly gaps: readonly { readonly from: number; readonly until: number }[];
  /** How many clips there are that nothing says the time of. */
  readonly unknown: number;
  /** All clips of the build. */
  readonly total: number;
  readonly cameras: readonly { readonly id: string; readonly name: string }[];
  /** What runs now, if something does. */
  readonly running: ShownStretch | null;
}
