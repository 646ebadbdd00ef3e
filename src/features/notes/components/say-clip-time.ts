import { formatClock } from '../../../domain/time/format-clock.ts';

/** A clip time to the hundredth of a second, cut off: 0:31.20. @param seconds not negative */
export function sayClipTime(seconds: number): string {
  // A frame that begins at 31.2 may come as 31.199999.
  const hundredths = Math.floor(seconds * 100 + 1e-4);
  return `${formatClock(Math.floor(hundredths / 100))}.${String(hundredths % 100).padStart(2, '0')}`;
}
