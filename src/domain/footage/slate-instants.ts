/** How much of each end of a clip is searched for a clock slate, in seconds. Our own choice. */
export const SLATE_STRETCH_SECONDS = 15;
/** A slate is filmed for three seconds, and its code stands still for 0.2 s. */
const STEP_MS = 200;

/**
 * Where to look for clock slates in a film: instants in its first and in its last 15 seconds, as two stretches of
 * which none overlaps the other. A film of up to 15 seconds has one.
 * @param seconds the film's length
 * @returns seconds since its first frame, rising, each within the film
 */
export function slateInstants(seconds: number): readonly (readonly number[])[] {
  if (!Number.isFinite(seconds) || seconds <= 0) throw new RangeError(`${String(seconds)} is no length.`);
  const length = seconds * 1000;
  const stretch = SLATE_STRETCH_SECONDS * 1000;
  const first = between(0, Math.min(stretch, length));
  return length <= stretch ? [first] : [first, between(Math.max(stretch, length - stretch), length)];
}

/** Half a step in from the beginning, so that few instants fall between two frames. */
function between(from: number, to: number): number[] {
  const steps = Math.max(1, Math.floor((to - from) / STEP_MS));
  const half = Math.min(STEP_MS, to - from) / 2;
  return Array.from({ length: steps }, (_none, step) => Math.round(from + half + step * STEP_MS) / 1000);
}
