import { frameToMilliseconds } from '../../../../domain/time/frames.ts';
import { type Rate } from '../../../../domain/time/rate.ts';

/** What plays the video, when anything does. */
export interface DeskPlayer {
  readonly seek: (seconds: number) => void;
  /** Null where a page elsewhere plays it and tells nothing. */
  readonly toggle: (() => void) | null;
  readonly pause: () => void;
}

/** The moment on screen. Without a player it is a clock that is set by hand. */
export interface DeskClock {
  readonly rate: Rate;
  readonly now: () => number;
  /** Frames; null while it is not known. */
  readonly length: () => number | null;
  readonly player: () => DeskPlayer | null;
  readonly subscribe: (listener: () => void) => () => void;
  readonly seek: (frame: number) => void;
  /** Told by the player. */
  readonly show: (frame: number) => void;
  readonly setLength: (frames: number) => void;
  readonly setPlayer: (player: DeskPlayer) => void;
}

export function makeClock(rate: Rate, knownLength: number | null): DeskClock {
  const listeners = new Set<() => void>();
  let now = 0;
  let length = knownLength;
  let player: DeskPlayer | null = null;
  const tell = () => {
    for (const listener of listeners) listener();
  };
  const show = (frame: number) => {
    if (frame === now) return;
    now = frame;
    tell();
  };
  return {
    rate,
    now: () => now,
    length: () => length,
    player: () => player,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    seek: (wanted) => {
      const last = length === null ? Number.MAX_SAFE_INTEGER : Math.max(0, length - 1);
      const frame = Math.min(Math.max(0, Math.round(wanted)), last);
      // Before the player is told: what it shows on the way there must not pull the pointer back and forth.
      show(frame);
      player?.seek(frameToMilliseconds(frame, rate) / 1000);
    },
    show,
    setLength: (frames) => {
      if (frames === length) return;
      length = frames;
      tell();
    },
    setPlayer: (given) => {
      player = given;
      tell();
    },
  };
}
