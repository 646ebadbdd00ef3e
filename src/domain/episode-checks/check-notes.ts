import { findTopics } from '../cautions/find-topics.ts';
import { type CautionTopic } from '../cautions/topics.ts';
import { USUAL_CAUTIONS } from '../cautions/usual-cautions.ts';
import { sortNotes } from '../notes/note-place.ts';
import { notesPastTheEnd } from '../notes/notes-past-the-end.ts';
import { isShownToViewers } from '../notes/shown-notes.ts';
import { formatClock } from '../time/format-clock.ts';
import { frameToSeconds } from '../time/frames.ts';
import { type PublishCheck } from './publish-check.ts';
import { type CheckedNote, type PublishFacts } from './publish-facts.ts';
import { capital, sayCount, sayList } from './say.ts';

function aboutNotes(
  id: string,
  level: PublishCheck['level'],
  notes: readonly { readonly id: string }[],
  sentence: string,
): PublishCheck {
  const ids = notes.map((note) => note.id);
  return { id, level, holds: ids.length === 0, sentence, place: { section: 'notes', ids } };
}

/** Notes after the end, questions to one person without an answer, and proposals that wait. */
export function checkNotes({ notes, video, rate }: PublishFacts): PublishCheck[] {
  const sorted = sortNotes(notes);
  const clocks = (list: readonly CheckedNote[]) =>
    sayList(list.map((note) => formatClock(frameToSeconds(note.frame, rate))));
  const length = video?.lengthFrames ?? null;
  const past = length === null ? [] : notesPastTheEnd(sorted, length);
  const asked = sorted.filter((note) => note.waitsFor !== null);
  const proposed = sorted.filter((note) => note.proposed);
  return [
    aboutNotes(
      'notes-in-video',
      'must',
      past,
      past.length === 0
        ? 'Every note stands in the video.'
        : `${capital(sayCount(past.length, 'note'))} at ${clocks(past)} ${past.length === 1 ? 'comes' : 'come'} after the video has ended.`,
    ),
    aboutNotes(
      'asks',
      'must',
      asked,
      asked.length === 0
        ? 'Nothing waits for an answer.'
        : `${sayList([...new Set(asked.map((note) => note.waitsFor ?? ''))])} ${asked.length === 1 ? 'has a question' : 'have questions'} to answer at ${clocks(asked)}.`,
    ),
    aboutNotes(
      'proposals',
      'should',
      proposed,
      proposed.length === 0
        ? 'No proposals are waiting.'
        : `${capital(sayCount(proposed.length, 'proposal'))} at ${clocks(proposed)} ${proposed.length === 1 ? 'waits' : 'wait'} for the owner.`,
    ),
  ];
}

/** One line for each topic that the shown notes touch without its usual caution; one that holds when none is missing. */
export function checkCautions({ notes }: PublishFacts): PublishCheck[] {
  const shown = sortNotes(notes.filter(isShownToViewers));
  const carried = new Set(shown.map((note) => note.topic));
  const touched = new Map<CautionTopic, CheckedNote[]>();
  for (const note of shown)
    for (const topic of findTopics(note.text)) touched.set(topic, [...(touched.get(topic) ?? []), note]);
  const missing = [...touched].filter(([topic]) => !carried.has(topic));
  if (missing.length === 0)
    return [
      aboutNotes('cautions', 'should', [], 'Every topic in the notes that can hurt someone has its caution.'),
    ];
  return missing.map(([topic, touching]) =>
    aboutNotes(
      `caution-${topic}`,
      'should',
      touching,
      `The notes touch ${USUAL_CAUTIONS[topic].label}; this episode has no caution about it.`,
    ),
  );
}
