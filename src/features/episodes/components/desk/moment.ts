import { type StepSize } from '../../../../client/note-keys.ts';
import { convertEndFrame, convertFrame, frameToSeconds } from '../../../../domain/time/frames.ts';
import { formatClock } from '../../../../domain/time/format-clock.ts';
import { type Position } from '../../../../domain/positions.ts';
import { type Rate } from '../../../../domain/time/rate.ts';

/** The first frame that begins in or after a whole second. */
function firstFrameOf(second: number, { num, den }: Rate): number {
  return Math.ceil((second * num) / den);
}

/** A moment to the frame: 3:40.12 is the thirteenth frame of that second; thousandths have three figures. */
export function formatMoment(frame: number, rate: Rate): string {
  const second = Math.floor(frameToSeconds(frame, rate));
  const figures = rate.num / rate.den >= 1000 ? 3 : 2;
  const rest = String(Math.max(0, frame - firstFrameOf(second, rate))).padStart(figures, '0');
  return `${formatClock(second)}.${rest}`;
}

/** A place in frames of the desk's video, wherever it was marked. */
export function placeAt({ frame, endFrame, rate }: Position, to: Rate) {
  return {
    frame: convertFrame(frame, rate, to),
    endFrame: endFrame === null ? null : convertEndFrame(endFrame, rate, to),
  };
}

/** A stretch as it is said: 3:40, or 3:40 to 3:52. */
export function sayPlace(position: Position): string {
  const clock = (frame: number) => formatClock(frameToSeconds(frame, position.rate));
  return position.endFrame === null
    ? clock(position.frame)
    : `${clock(position.frame)} to ${clock(position.endFrame)}`;
}

/** How many frames a step is; in thousandths a frame of 1/25 s is meant. */
export function framesIn(size: StepSize, rate: Rate): number {
  const second = Math.round(rate.num / rate.den);
  if (size === 'frame') return second >= 1000 ? 40 : 1;
  return size === 'second' ? second : second * 10;
}

/** Moves a place as a whole, and not before the start or past the end. @param length frames, when known */
export function movePlace(position: Position, by: number, length: number | null): Position {
  const last = length === null ? Number.MAX_SAFE_INTEGER : Math.max(0, length - 1);
  const frame = Math.min(Math.max(0, position.frame + by), last);
  const { endFrame } = position;
  return { ...position, frame, endFrame: endFrame === null ? null : endFrame + (frame - position.frame) };
}

/** Moves a place to a frame of another count, keeping how long it lasts. */
export function movedTo(position: Position, frame: number, rate: Rate): Position {
  const here = placeAt(position, rate);
  return { frame, endFrame: here.endFrame === null ? null : frame + (here.endFrame - here.frame), rate };
}
