/**
 * A length of time as feeds and page data carry it: PT14M8S, PT1H0.5S. Rounded to a millisecond.
 * Source: ISO 8601-1:2019, 5.5.2, durations by designators.
 * @param seconds not negative
 */
export function formatIsoDuration(seconds: number): string {
  if (!Number.isFinite(seconds) || seconds < 0) throw new RangeError(`${String(seconds)} is no length.`);
  const milliseconds = Math.round(seconds * 1000);
  const hours = Math.floor(milliseconds / 3_600_000);
  const minutes = Math.floor((milliseconds % 3_600_000) / 60_000);
  const rest = (milliseconds % 60_000) / 1000;
  const parts = [
    hours > 0 ? `${String(hours)}H` : '',
    minutes > 0 ? `${String(minutes)}M` : '',
    rest > 0 || milliseconds < 60_000 ? `${String(rest)}S` : '',
  ];
  return `PT${parts.join('')}`;
}
