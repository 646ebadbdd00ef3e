import { describe, expect, it } from 'vitest';
import { mayGoOut } from '../../../../src/domain/episode-checks/publish-check.ts';
import { publishChecks } from '../../../../src/domain/episode-checks/publish-checks.ts';
import { type CheckedNote, type PublishFacts } from '../../../../src/domain/episode-checks/publish-facts.ts';

const rate = { num: 25, den: 1 };

function note(id: string, seconds: number, fields: Partial<CheckedNote> = {}): CheckedNote {
  return {
    id,
    frame: seconds * 25,
    endFrame: null,
    text: 'Face the end.',
    audience: 'viewers',
    proposed: false,
    topic: null,
    partIds: [],
    waitsFor: null,
    ...fields,
  };
}

const READY: PublishFacts = {
  title: 'The drum shaft, its bearings and the wrong port thread',
  video: { state: 'ready', lengthFrames: 848 * 25 },
  rate,
  chapters: [0, 185, 370].map((start) => ({ start: start * 1000, title: `From ${String(start)}` })),
  edit: null,
  captionCount: 212,
  notes: [note('n1', 58, { partIds: ['p117'] })],
  parts: [
    { id: 'p117', number: '117', name: 'drum shaft', inPlans: true },
    { id: 'p125', number: '125', name: 'port adapter', inPlans: false },
  ],
  revision: 'B',
};

function check(id: string, facts: Partial<PublishFacts>) {
  const found = publishChecks({ ...READY, ...facts }).find((one) => one.id === id);
  if (found === undefined) throw new Error(`There is no check ${id}.`);
  return found;
}

describe('An episode with nothing missing', () => {
  it('may go out, and says so in sentences', () => {
    const checks = publishChecks(READY);
    expect(checks.filter(({ holds }) => !holds)).toEqual([]);
    expect(mayGoOut(checks)).toBe(true);
    expect(checks.map(({ sentence }) => sentence)).toContain(
      'First chapter starts at 0:00, three chapters, none shorter than 10 s.',
    );
    expect(checks.every(({ sentence }) => /^[A-Z0-9“].*\.$/.test(sentence))).toBe(true);
  });
});

describe('What must hold', () => {
  it.each<[string, Partial<PublishFacts>, string]>([
    ['title', { title: '  ' }, 'Give the episode a title.'],
    ['video', { video: null }, 'Add the video.'],
    ['video', { video: { state: 'waiting', lengthFrames: null } }, 'The video is still being made ready.'],
    [
      'video',
      { video: { state: 'failed', lengthFrames: null } },
      'The video could not be read. Bring it in again.',
    ],
    [
      'chapter-order',
      { chapters: [...READY.chapters, { start: 900_000, title: 'Drip tray' }] },
      '“Drip tray” starts at 15:00, after the video has ended.',
    ],
    [
      'parts-listed',
      { notes: [note('n1', 58, { partIds: ['gone'] })] },
      'One note names a part that is not in the parts list.',
    ],
    ['notes-in-video', { notes: [note('n1', 848)] }, 'One note at 14:08 comes after the video has ended.'],
    [
      'asks',
      { notes: [note('n1', 288, { audience: 'person', waitsFor: 'Rosa' })] },
      'Rosa has a question to answer at 4:48.',
    ],
  ])('%s keeps the episode back', (id, facts, sentence) => {
    const checks = publishChecks({ ...READY, ...facts });
    expect(check(id, facts)).toMatchObject({ level: 'must', holds: false, sentence });
    expect(mayGoOut(checks)).toBe(false);
  });
});

describe('What should hold', () => {
  it.each<[string, Partial<PublishFacts>, string]>([
    ['captions', { captionCount: null }, 'There are no captions. Some viewers will not know what is said.'],
    ['chapters', { chapters: [] }, 'There are no chapters; video hosts show them from three on.'],
    [
      'parts-in-plans',
      { notes: [note('n1', 58, { partIds: ['p125'] })] },
      'Part 125 is not in revision B. Viewers will see it as not in the plans.',
    ],
    [
      'proposals',
      { notes: [note('n1', 58, { proposed: true })] },
      'One proposal at 0:58 waits for the owner.',
    ],
    [
      'caution-pressure',
      { notes: [note('n1', 554, { text: 'The hydraulic hoses go on.' })] },
      'The notes touch hydraulic pressure; this episode has no caution about it.',
    ],
  ])('%s is told and leaves it to the owner', (id, facts, sentence) => {
    expect(check(id, facts)).toMatchObject({ level: 'should', holds: false, sentence });
    expect(mayGoOut(publishChecks({ ...READY, ...facts }))).toBe(true);
  });

  it('leads to the notes that it is about, in the order of the episode', () => {
    const notes = [note('late', 900), note('early', 860)];
    expect(check('notes-in-video', { notes }).place).toEqual({ section: 'notes', ids: ['early', 'late'] });
  });

  it('asks for no caution that a shown note carries', () => {
    const notes = [
      note('n1', 1, { text: 'The hoses go on.' }),
      note('n2', 2, { text: 'Mind it.', topic: 'pressure' }),
    ];
    expect(check('cautions', { notes }).holds).toBe(true);
  });

  it('counts neither private notes nor private cautions', () => {
    const touching = note('n1', 1, { text: 'The hoses go on.', audience: 'team' });
    expect(check('cautions', { notes: [touching] }).holds).toBe(true);
    const hidden = note('n2', 2, { topic: 'pressure', audience: 'team' });
    const shown = note('n1', 1, { text: 'The hoses go on.' });
    expect(check('caution-pressure', { notes: [shown, hidden] }).holds).toBe(false);
  });
});
