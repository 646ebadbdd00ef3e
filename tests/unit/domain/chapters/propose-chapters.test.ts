import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkChapters } from '../../../../src/domain/chapters/check-chapters.ts';
import { proposeChapters } from '../../../../src/domain/chapters/propose-chapters.ts';

type Told = readonly [seconds: number, stage: string];
const propose = (told: readonly Told[], length: number | null = null) =>
  proposeChapters(
    told.map(([seconds, stage]) => ({ at: seconds * 1000, stage })),
    length === null ? null : length * 1000,
  ).map(({ start, title }) => [start / 1000, title]);

describe('Chapters proposed from the stages of the notes', () => {
  it.each<[string, readonly Told[], number | null, readonly Told[]]>([
    [
      'begin with the video and where the stage changes',
      [
        [20, 'Drum'],
        [40, 'Drum'],
        [60, 'Frame'],
      ],
      null,
      [
        [0, 'Drum'],
        [60, 'Frame'],
      ],
    ],
    [
      'leave out a stage that is only touched',
      [
        [0, 'Drum'],
        [60, 'Frame'],
        [65, 'Drum'],
        [90, 'Drum'],
      ],
      null,
      [[0, 'Drum']],
    ],
    [
      'begin with the touched stage when another follows it',
      [
        [0, 'Drum'],
        [60, 'Frame'],
        [65, 'Ram'],
      ],
      null,
      [
        [0, 'Drum'],
        [60, 'Ram'],
      ],
    ],
    [
      'come back to a stage',
      [
        [0, 'Drum'],
        [60, 'Frame'],
        [90, 'Drum'],
      ],
      null,
      [
        [0, 'Drum'],
        [60, 'Frame'],
        [90, 'Drum'],
      ],
    ],
    [
      'leave out one that the end cuts short',
      [
        [0, 'Drum'],
        [60, 'Frame'],
      ],
      65,
      [[0, 'Drum']],
    ],
    ['are none without stages', [], 60, []],
  ])('%s', (_name, told, length, expected) => {
    expect(propose(told, length)).toEqual(expected);
  });

  it('keep every rule of order, title, end, first and length', () => {
    const moments = fc.array(
      fc.record({
        at: fc.nat(600_000),
        stage: fc.constantFrom('Drum', 'Frame', 'Ram', ' ', 'x'.repeat(200)),
      }),
    );
    fc.assert(
      fc.property(moments, fc.integer({ min: 20_000, max: 600_000 }), (told, length) => {
        const faults = checkChapters(proposeChapters(told, length), length);
        expect(faults.filter(({ rule }) => rule !== 'few')).toEqual([]);
      }),
    );
  });
});
