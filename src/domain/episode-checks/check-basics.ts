import { checkChapters } from '../chapters/check-chapters.ts';
import { frameToMilliseconds } from '../time/frames.ts';
import { type CheckSection, type PublishCheck } from './publish-check.ts';
import { type PublishFacts } from './publish-facts.ts';
import { capital, sayCount } from './say.ts';

function check(
  id: string,
  level: PublishCheck['level'],
  section: CheckSection,
  holds: boolean,
  sentence: string,
): PublishCheck {
  return { id, level, holds, sentence, place: { section, ids: [] } };
}

/** The title, the video and the captions: there, or what is missing. */
export function checkBasics({ title, video, edit, captionCount }: PublishFacts): PublishCheck[] {
  const titled = title.trim() !== '';
  const captioned = captionCount !== null && captionCount > 0;
  return [
    check('title', 'must', 'details', titled, titled ? 'It has a title.' : 'Give the episode a title.'),
    check('video', 'must', 'video', video?.state === 'ready', sayVideo(video)),
    ...(edit === null
      ? []
      : [
          check(
            'edit',
            'should',
            'edit',
            edit.lengthsApart === null,
            edit.lengthsApart ?? 'The edit is as long as the video.',
          ),
        ]),
    check(
      'captions',
      'should',
      'captions',
      captioned,
      captioned
        ? `${capital(sayCount(captionCount, 'caption'))} for those who cannot hear it.`
        : 'There are no captions. Some viewers will not know what is said.',
    ),
  ];
}

function sayVideo(video: PublishFacts['video']): string {
  if (video === null) return 'Add the video.';
  if (video.state === 'failed') return 'The video could not be read. Bring it in again.';
  return video.state === 'waiting' ? 'The video is still being made ready.' : 'The video is ready.';
}

/** Chapters in order must be right; what video hosts ask besides is told, not held against the episode. */
export function checkChapterList({ chapters, video, rate }: PublishFacts): PublishCheck[] {
  const frames = video?.lengthFrames ?? null;
  const faults = checkChapters(chapters, frames === null ? null : frameToMilliseconds(frames, rate));
  const wrong = faults.filter(({ rule }) => rule === 'order' || rule === 'title' || rule === 'end');
  const unlisted = faults.filter((fault) => !wrong.includes(fault));
  if (faults.length === 0) {
    const count = sayCount(chapters.length, 'chapter');
    const sentence = `First chapter starts at 0:00, ${count}, none shorter than 10 s.`;
    return [check('chapters', 'should', 'chapters', true, sentence)];
  }
  const say = (list: typeof faults) => list.map(({ sentence }) => sentence).join(' ');
  return [
    ...(wrong.length > 0 ? [check('chapter-order', 'must', 'chapters', false, say(wrong))] : []),
    ...(unlisted.length > 0 ? [check('chapters', 'should', 'chapters', false, say(unlisted))] : []),
  ];
}
