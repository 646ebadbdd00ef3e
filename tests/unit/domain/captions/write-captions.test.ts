import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import webvtt from 'webvtt-parser';
import { type Cue, cueAt, sortCues } from '../../../../src/domain/captions/cue.ts';
import { readCaptionsText } from '../../../../src/domain/captions/read-captions.ts';
import { writeSubrip, writeWebvtt } from '../../../../src/domain/captions/write-captions.ts';

const HOUR = 3_600_000;
const word = fc.constantFrom(
  'shaft',
  '-->',
  '<b>',
  '&amp;',
  '14',
  '118',
  'a & b',
  '>',
  '--',
  'é',
  'NOTE',
  'WEBVTT',
  '1',
);
const lines = fc.array(
  fc.array(word, { minLength: 1, maxLength: 5 }).map((words) => words.join(' ')),
  {
    minLength: 1,
    maxLength: 3,
  },
);
const cues: fc.Arbitrary<Cue[]> = fc.array(
  fc
    .tuple(
      fc.nat(200 * HOUR),
      fc.integer({ min: 1, max: 10_000 }),
      lines,
      fc.option(fc.constantFrom('Rosa', 'A > B')),
    )
    .map(([start, length, words, voice]) => ({
      start,
      end: start + length,
      lines: words,
      ...(voice === null ? {} : { voice }),
    })),
  { minLength: 1, maxLength: 12 },
);
const arrowless = (text: string) => text.replaceAll('-->', '→');

describe('writeWebvtt', () => {
  it('writes what the standard asks for', () => {
    const list = [
      { start: 60_060, end: 61_000, lines: ['a < b & c --> d'] },
      { start: 0, end: 1500, lines: ['one', 'two'], voice: 'Rosa' },
    ];
    expect(writeWebvtt(list)).toBe(
      [
        'WEBVTT',
        '',
        '1',
        '00:00:00.000 --> 00:00:01.500',
        '<v Rosa>one',
        'two</v>',
        '',
        '2',
        '00:01:00.060 --> 00:01:01.000',
        'a &lt; b &amp; c → d',
        '',
      ].join('\n'),
    );
  });

  it('is without fault in the eyes of the standard’s own parser', () => {
    fc.assert(
      fc.property(cues, (list) => {
        const { cues: parsed, errors } = new webvtt.WebVTTParser().parse(writeWebvtt(list));
        expect(errors).toEqual([]);
        expect(parsed).toHaveLength(list.length);
      }),
    );
  });

  it('comes back as it was, but for arrows', () => {
    fc.assert(
      fc.property(cues, (list) => {
        const read = readCaptionsText(writeWebvtt(list));
        const wanted = sortCues(list).map((cue) => ({ ...cue, lines: cue.lines.map(arrowless) }));
        expect(read).toEqual({ ok: true, value: { format: 'webvtt', cues: wanted, warnings: [] } });
      }),
    );
  });

  it('starts with nothing but its signature when there are no captions', () => {
    expect(writeWebvtt([])).toBe('WEBVTT\n');
  });

  it.each([
    [-1, 5],
    [5, 5],
    [0.5, 2],
  ])('throws for a caption from %d to %d', (start, end) => {
    expect(() => writeWebvtt([{ start, end, lines: ['a'] }])).toThrow(RangeError);
  });
});

describe('writeSubrip', () => {
  it('counts from one, with a comma and the hours', () => {
    const list = [{ start: 3_599_999, end: HOUR, lines: ['fish & <chips>'], voice: 'Rosa' }];
    expect(writeSubrip(list)).toBe('1\n00:59:59,999 --> 01:00:00,000\nRosa: fish & <chips>\n');
  });

  it('keeps times, and no words that pass for a timing', () => {
    fc.assert(
      fc.property(cues, (list) => {
        const read = readCaptionsText(writeSubrip(list));
        const times = (some: readonly Cue[]) => some.map(({ start, end }) => [start, end]);
        // Tags are taken out when SubRip is read, so a caption of nothing else has no words left.
        const worded = sortCues(list).filter(
          ({ voice, lines: words }) =>
            voice !== undefined || words.some((line) => line.replaceAll('<b>', '').trim() !== ''),
        );
        expect(read.ok ? times(read.value.cues) : []).toEqual(times(worded));
      }),
    );
  });
});

describe('cueAt', () => {
  const list = [
    { start: 0, end: 1000, lines: ['a'] },
    { start: 500, end: 800, lines: ['b'] },
    { start: 2000, end: 3000, lines: ['c'] },
  ];

  it.each([
    [0, 'a'],
    [499, 'a'],
    [500, 'b'],
    [800, 'a'],
    [1000, undefined],
    [2000, 'c'],
    [3000, undefined],
  ])('at %i ms shows %s', (time, words) => {
    expect(cueAt(list, time)?.lines[0]).toBe(words);
  });
});
