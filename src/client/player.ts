import { type Rate } from '../domain/time/rate.ts';

/** The video of a page, wherever it is. */
export interface Player {
  /** Shows an instant, and plays on if it was playing. */
  readonly seek: (seconds: number) => void;
}

/** What a player tells of itself. */
export interface PlayerWatch {
  readonly rate: Rate;
  /** The frame on show; whoever knows only seconds rounds as the domain does. */
  readonly onFrame: (frame: number, seconds: number) => void;
  readonly onLength: (seconds: number) => void;
}
