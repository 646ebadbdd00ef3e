import { z } from 'zod';

/** Frames a second as an exact fraction, such as 30000/1001. */
export interface FrameRate {
  readonly num: number;
  readonly den: number;
}

/** A moment, or a half-open stretch, in frames of one rate. */
export interface Position {
  readonly frame: number;
  readonly endFrame: number | null;
  readonly rate: FrameRate;
}

/** No clip or episode is longer than this, in frames: ten days at 1000 a second. */
const MOST_FRAMES = 864_000_000;
const frame = z
  .int('Choose a moment of the episode.')
  .min(0, 'Choose a moment of the episode.')
  .max(MOST_FRAMES);

/** A position as it is sent: frames and rate together, never reinterpreted. */
export const PositionInput = z
  .object({
    frame,
    endFrame: frame.nullable().default(null),
    rate: z.object({ num: z.int().min(1).max(1_000_000), den: z.int().min(1).max(10_000) }),
  })
  .refine(({ frame: start, endFrame }) => endFrame === null || endFrame > start, {
    path: ['endFrame'],
    error: 'The end comes before the start.',
  });
