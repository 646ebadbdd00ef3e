import { type AnnouncementProgress } from '../audience.ts';

/** How far an announcement has come, in words: what is done, then what went wrong, if anything did. */
export function describeProgress({ counts, total }: AnnouncementProgress): string {
  const troubles = [
    [counts.refused, 'refused by the mail server'],
    [counts.failed, 'given up after many tries'],
    [counts.bounced, 'came back'],
  ] as const;
  return [
    `${String(counts.sent)} of ${String(total)} sent`,
    ...troubles.filter(([count]) => count > 0).map(([count, what]) => `${String(count)} ${what}`),
  ].join(', ');
}

/** Messages that are done with, whichever way. */
export function countDone({ counts }: AnnouncementProgress): number {
  return counts.sent + counts.refused + counts.failed + counts.bounced;
}
