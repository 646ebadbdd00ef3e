/**
 * A length as people read it: 0:02, 14:08, 1:02:03; whole seconds, rounded down as clocks do.
 * @param duration frames at an exact rate
 */
export function sayLength(duration: {
  readonly frames: number;
  readonly rate: { readonly num: number; readonly den: number };
}): string {
  const whole = Math.floor((duration.frames * duration.rate.den) / duration.rate.num);
  const two = (value: number) => String(value).padStart(2, '0');
  const [hours, minutes, seconds] = [Math.floor(whole / 3600), Math.floor(whole / 60) % 60, whole % 60];
  return hours > 0
    ? `${String(hours)}:${two(minutes)}:${two(seconds)}`
    : `${String(minutes)}:${two(seconds)}`;
}

/** A rate as the trade says it: 25, 29.97; nothing where frames mean nothing. */
export function sayRate({ num, den }: { readonly num: number; readonly den: number }): string | null {
  if (num === 1000 && den === 1) return null;
  return `${String(Number((num / den).toFixed(3)))} fps`;
}
