import { type RuleBalloon, type RuleData } from '../../../../components/rule/rule-data.ts';
import { frameToMilliseconds } from '../../../../domain/time/frames.ts';
import { type Companion } from '../../companion.ts';
import { hatchingsOf } from '../say-off-camera.ts';
import { timeAddress } from './video-times.ts';

/** More balloons than this do not stand above a rule in two rows: then each part stands there once. */
const MOST_BALLOONS = 40;

/** How much of a rule is left after the last mark when nobody knows how long the video is, in seconds. */
const AFTER_LAST = 30;

/** How long a note's words may be where they are only a hint, in characters. */
const HINT = 80;

/** How long the rule is: the video, or what is known of it. Seconds. */
export function ruleLength({ video, notes, chapters }: Companion): number {
  if (video.seconds !== null) return video.seconds;
  const last = Math.max(0, ...notes.map(({ at }) => at), ...chapters.map(({ at }) => at));
  return Math.ceil((last + AFTER_LAST) / 60) * 60;
}

/** What stands on the rule of an episode. A balloon's id begins with the part's place in the list. */
export function ruleMarks(companion: Companion): RuleData {
  const { video, notes, chapters } = companion;
  return {
    length: ruleLength(companion),
    now: 0,
    quiet: true,
    balloons: balloonsOf(companion),
    pops: notes.map(({ id, at, kind, text }) => ({
      id,
      at,
      kind,
      label: text.length <= HINT ? text : `${text.slice(0, HINT)}…`,
      href: timeAddress(video, at),
    })),
    hatchings: hatchingsOf(companion.offCamera, ruleLength(companion)),
    chapters: chapters.map(({ at, title }) => ({ at, label: title, href: timeAddress(video, at) })),
  };
}

/** A part stands where it comes onto the bench: once a chapter, or once altogether when there are many. */
function balloonsOf({ appearances, parts, chapters, video }: Companion): RuleBalloon[] {
  const indexOf = new Map(parts.map(({ id }, index) => [id, index]));
  const once = (keyOf: (part: string, from: number) => string) => {
    const first = new Map(appearances.toReversed().map((one) => [keyOf(one.partId, one.from), one]));
    return [...first.values()];
  };
  const chapterAt = (from: number) => chapters.findLastIndex((chapter) => chapter.from <= from);
  const perChapter = once((part, from) => `${part} ${String(chapterAt(from))}`);
  const kept = perChapter.length <= MOST_BALLOONS ? perChapter : once((part) => part).slice(0, MOST_BALLOONS);
  return kept.flatMap(({ partId, from }) => {
    const index = indexOf.get(partId);
    const part = index === undefined ? undefined : parts[index];
    if (index === undefined || part === undefined) return [];
    const at = frameToMilliseconds(from, video.rate) / 1000;
    return {
      id: `${String(index)}-${String(from)}`,
      at,
      label: part.number,
      name: part.name,
      dashed: !part.inPlans,
      href: timeAddress(video, at),
    };
  });
}
