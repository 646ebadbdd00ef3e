import { type Answer, right, wrong } from '../answer.ts';
import { parseClock } from '../time/parse-clock.ts';
import { type Rate } from '../time/rate.ts';
import { formatTimecode, hasTimecode, parseTimecode } from '../time/timecode.ts';

/** A clip that an edit is built from. */
export interface HandClip {
  readonly id: string;
  readonly name: string;
  readonly rate: Rate;
  /** The frame that its first label stands for; null where labels count from its first frame. */
  readonly startLabel: number | null;
  readonly drop: boolean;
  /** Null until known. */
  readonly frames: number | null;
}

/** A moment of a clip as typed: its own label, or a time since its first frame where it has no labels. */
export function readClipTime(
  text: string,
  { rate, startLabel, drop }: Pick<HandClip, 'rate' | 'startLabel' | 'drop'>,
): Answer<number> {
  if (hasTimecode(rate) && /^\d{1,2}:\d{2}:\d{2}[:;.]\d{2,3}$/.test(text.trim())) {
    const read = parseTimecode(text.trim().replace(/[:;.](\d+)$/, drop ? ';$1' : ':$1'), rate);
    return read.ok ? right(read.value.frame) : read;
  }
  const clock = parseClock(text);
  if (!clock.ok)
    return wrong(
      `“${text.slice(0, 40)}” is no time of the clip. Write it as 00:00:31:20, or as 31.5 seconds in.`,
    );
  return right((startLabel ?? 0) + Math.round((clock.value * rate.num) / rate.den));
}

/** The label of a clip's frame, as `readClipTime` reads it. */
export function sayClipTime(
  frame: number,
  { rate, startLabel, drop }: Omit<HandClip, 'id' | 'name'>,
): string {
  if (hasTimecode(rate)) return formatTimecode(frame, rate, drop);
  return (((frame - (startLabel ?? 0)) * rate.den) / rate.num).toFixed(3);
}
