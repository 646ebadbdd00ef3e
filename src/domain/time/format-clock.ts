/**
 * Seconds as people read them off a video: 0:58, 14:08, 1:02:03. Parts of a second are dropped, so that the
 * clock never runs ahead of the picture.
 * @param seconds not negative
 */
export function formatClock(seconds: number): string {
  if (!Number.isFinite(seconds) || seconds < 0) throw new RangeError(`${String(seconds)} is no time.`);
  const whole = Math.floor(seconds);
  const hours = Math.floor(whole / 3600);
  const minutes = String(Math.floor((whole % 3600) / 60));
  const rest = String(whole % 60).padStart(2, '0');
  return hours === 0 ? `${minutes}:${rest}` : `${String(hours)}:${minutes.padStart(2, '0')}:${rest}`;
}
