import { type Rate } from '../time/rate.ts';
import { type Pace } from './pace.ts';

/** A clip as a list or a browser names it, before it is held against a build. */
export interface NamedClip {
  readonly name: string;
  /** The camera's name; null where it is not said. */
  readonly camera: string | null;
  /** Length in frames at the rate; null where it is not known. */
  readonly frames: number | null;
  readonly rate: Rate;
  /** Its first timecode label, in frames since 00:00:00:00; null where it has none. */
  readonly startLabel: number | null;
  readonly drop: boolean;
  /** Wall time of creation: 2026-11-02T14:22:07; with how far it says that is from UTC, in minutes. */
  readonly createdWall: string | null;
  readonly createdOffset: number | null;
  readonly pace: Pace;
  /** The stage's name, and the numbers of parts. */
  readonly stage: string | null;
  readonly parts: readonly string[];
}

export const CLIP_NAME_LENGTH = 200;
export const CAMERA_NAME_LENGTH = 80;
