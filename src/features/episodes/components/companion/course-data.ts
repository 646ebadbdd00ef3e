import { type CompanionData } from '../../../../client/companion-data.ts';
import { type Companion } from '../../companion.ts';

/** What the page's script needs to know, as JSON that may stand inside a script element. */
export function courseData({ video, appearances, parts, chapters, notes }: Companion): string {
  const indexOf = new Map(parts.map(({ id }, index) => [id, index]));
  const data: CompanionData = {
    rate: [video.rate.num, video.rate.den],
    seconds: video.seconds,
    appearances: appearances.flatMap(({ partId, from, to }) => {
      const index = indexOf.get(partId);
      return index === undefined ? [] : [[index, from, to] as const];
    }),
    chapters: chapters.map(({ from }) => from),
    notes: notes.map(({ from, to }) => [from, to] as const),
  };
  return JSON.stringify(data).replaceAll('<', '\\u003c');
}
