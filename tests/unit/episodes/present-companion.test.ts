import { describe, expect, it } from 'vitest';
import { type Note } from '../../../src/features/notes/note.ts';
import { groupNotes } from '../../../src/features/episodes/components/companion/list-rows.ts';
import { presentCompanion } from '../../../src/features/episodes/server/present-companion.ts';

const PART = { kind: 'made', quantity: 1, material: '', size: '', inPlans: true } as const;
const parts = [
  { ...PART, id: 'shaft', number: '117', name: 'drum shaft' },
  { ...PART, id: 'housing', number: '118', name: 'bearing housing' },
];

function note(id: string, seconds: number, more: Partial<Note> = {}): Note {
  return {
    id,
    version: 1,
    kind: 'step',
    text: id,
    audience: 'viewers',
    asked: null,
    answer: null,
    standing: null,
    topic: null,
    proposed: false,
    partIds: [],
    writtenBy: null,
    position: { frame: seconds * 50, endFrame: null, rate: { num: 50, den: 1 } },
    place: null,
    ...more,
  };
}

function present(notes: readonly Note[], seconds: number | null = 100) {
  const chapters = [0, 60].map((at) => ({
    id: `c${String(at)}`,
    version: 1,
    title: `From ${String(at)}`,
    position: { frame: at, endFrame: null, rate: { num: 1, den: 1 } },
    place: null,
  }));
  return presentCompanion({
    video: { seconds, rate: { num: 25, den: 1 } },
    notes,
    byHand: [],
    chapters,
    parts,
    results: new Map([['carrying', { what: 'Force out', said: '86 kN', worksheet: null }]]),
  });
}

describe('what a page shows of notes', () => {
  it('comes with what of a worksheet a note carries', () => {
    const { notes } = present([note('carrying', 40), note('plain', 50)]);
    expect(notes.map(({ result }) => result?.said ?? null)).toEqual(['86 kN', null]);
  });

  it('stands in frames and seconds of the shown video, whatever rate it was marked at', () => {
    const [only] = present([note('n', 40)]).notes;
    expect(only).toMatchObject({ from: 1000, to: 1500, at: 40 });
  });

  it('leaves out what begins after the video has ended, and parts that are gone', () => {
    const shown = present([note('in', 99, { partIds: ['gone', 'shaft'] }), note('late', 100)]);
    expect(shown.notes.map(({ id, partIds }) => [id, partIds])).toEqual([['in', ['shaft']]]);
  });

  it('lists parts in the order in which they come in', () => {
    const shown = present([note('b', 30, { partIds: ['shaft'] }), note('a', 10, { partIds: ['housing'] })]);
    expect(shown.parts.map(({ number }) => number)).toEqual(['118', '117']);
    expect(shown.appearances).toEqual([
      { partId: 'housing', from: 250, to: 750 },
      { partId: 'shaft', from: 750, to: 1250 },
    ]);
  });

  it('gathers each topic once, where it first comes', () => {
    const shown = present([note('b', 50, { topic: 'arc' }), note('a', 5, { topic: 'arc' })]);
    expect(shown.cautions).toEqual([{ topic: 'arc', noteId: 'a', at: 5 }]);
  });
});

describe('the list of notes', () => {
  it('puts each under its chapter and says where the row after it begins', () => {
    const { notes, chapters } = present([note('a', 5), note('b', 70)]);
    const groups = groupNotes(notes, chapters, 100);
    expect(
      groups.map(({ chapter, next, rows }) => [
        chapter?.title,
        next,
        rows.map(({ note: { id }, next: after }) => [id, after]),
      ]),
    ).toEqual([
      ['From 0', 5, [['a', 60]]],
      ['From 60', 70, [['b', 100]]],
    ]);
  });

  it('needs no chapters', () => {
    const { notes } = present([note('a', 5), note('b', 70)]);
    expect(groupNotes(notes, [], 100)).toMatchObject([
      { chapter: null, rows: [{ next: 70 }, { next: 100 }] },
    ]);
  });
});
