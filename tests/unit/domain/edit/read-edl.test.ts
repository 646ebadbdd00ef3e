import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Edit, sayWarning, type Segment } from '../../../../src/domain/edit/edit.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { LISTED_RATES, type Rate } from '../../../../src/domain/time/rate.ts';
import { formatTimecode } from '../../../../src/domain/time/timecode.ts';

const PAL = { num: 25, den: 1 };
const VIDEO = { num: 30000, den: 1001 };

function answer(
  lines: readonly string[],
  rate: Rate = PAL,
  clipRates: ReadonlyMap<string, Rate> = new Map(),
) {
  return readEdl(lines.join('\n'), { rate, clipRates });
}

function edit(...args: Parameters<typeof answer>): Edit {
  const read = answer(...args);
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

const map = (segments: readonly Segment[]) =>
  segments.map(({ clip, source, record, speed }) => [
    clip,
    ...[source.in, source.out, record.in, record.out].map((at) => at.valueOf()),
    speed.toFraction(),
  ]);
const said = ({ warnings }: Edit) => warnings.map(sayWarning);

const FIRST = '001  C0043  V  C  00:00:10:00 00:00:12:00 01:00:00:00 01:00:02:00';
const SECOND = '002  C0044  V  C  00:00:00:00 00:00:01:00 01:00:02:00 01:00:03:00';

describe('An edit list', () => {
  it('counts the source from its own labels and the record from the first event', () => {
    expect(map(edit([FIRST, SECOND]).picture)).toEqual([
      ['C0043', 250, 300, 0, 50, '1'],
      ['C0044', 0, 25, 50, 75, '1'],
    ]);
  });

  it('may hold plain counts of frames', () => {
    expect(map(edit(['1 C0043 V C 113 170 0 57']).picture)).toEqual([['C0043', 113, 170, 0, 57, '1']]);
  });

  it('may mix line ends, part columns by tabs and have a reel of two words', () => {
    const list =
      'TITLE: Press\r\n001\tshed cam\tV\tC\t0 25 0 25\r*FROM CLIP NAME: C0043.MP4\n\n002 AX V C 0 5 25 30';
    const read = readEdl(list, { rate: PAL });
    expect(read.ok && [read.value.title, map(read.value.picture), said(read.value)]).toEqual([
      'Press',
      [
        ['C0043.MP4', 0, 25, 0, 25, '1'],
        ['AX', 0, 5, 25, 30, '1'],
      ],
      [],
    ]);
    expect(read.ok && read.value.picture[0]?.alsoCalled).toEqual(['shed cam']);
  });

  it('says drop frame in a line of its own or in its labels', () => {
    const event = (a: string, b: string) => `001 C0043 V C ${a} ${b} ${a} ${b}`;
    const marked = edit([event('00:00:59;29', '00:01:00;02')], VIDEO);
    const told = edit(['FCM: DROP FRAME', event('00:00:59:29', '00:01:00:02')], VIDEO);
    // OpenTimelineIO, tests/test_opentime.py: 1799 and 1800.
    expect(map(marked.picture)).toEqual([['C0043', 1799, 1800, 0, 1, '1']]);
    expect(map(told.picture)).toEqual(map(marked.picture));
    const plain = edit(['FCM: NON-DROP FRAME', event('00:00:59:29', '00:01:00:00')], VIDEO);
    expect(map(plain.picture)).toEqual(map(marked.picture));
  });

  it('may have a clip at a rate of its own', () => {
    const list = [
      '001 AX V C 00:00:01:30 00:00:02:30 00:00:00:00 00:00:01:00',
      '* FROM CLIP NAME: C0043.MP4',
    ];
    const read = edit(list, PAL, new Map([['c0043', { num: 50, den: 1 }]]));
    expect(map(read.picture)).toEqual([['C0043.MP4', 80, 130, 0, 25, '1']]);
    expect(said(read)).toEqual([]);
    expect(answer(list)).toMatchObject({ error: 'Line 1: 00:00:01:30 has frames beyond 24.' });
  });

  it('takes the speed of a clip at another rate in whichever frames fit its lengths', () => {
    const list = (fps: string) => ['1 C0043 V C 0 200 0 50', `M2 C0043 ${fps} 0`];
    const fast = new Map([['C0043', { num: 50, den: 1 }]]);
    for (const fps of ['100.0', '050.0'])
      expect(edit(list(fps), PAL, fast).picture[0]?.speed.toFraction()).toBe('2');
  });

  it('fades to and from black, which is no clip', () => {
    const list = [
      '001 CLPA V C 0 60 0 60',
      '002 CLPA V C 60 60 60 60',
      '002 BL V D 024 0 24 60 84',
      '003 BL V C 0 0 84 84',
      '003 CLPB V D 010 5 15 84 94',
      '* FROM CLIP NAME: C0044',
    ];
    const read = edit(list, { num: 24, den: 1 });
    expect(map(read.picture)).toEqual([
      ['CLPA', 0, 60, 0, 60, '1'],
      ['C0044', 5, 15, 84, 94, '1'],
    ]);
    expect(map(read.dissolved)).toEqual([['CLPA', 60, 84, 60, 84, '1']]);
    expect(read.frames.valueOf()).toBe(94);
  });

  it('plays backwards at a speed below zero, and says so', () => {
    for (const source of ['0 50', '50 0']) {
      const read = edit([`1 C0043 V C ${source} 0 50`, `M2 C0043 -025.0 ${source.split(' ')[0]!}`]);
      expect(map(read.picture)).toEqual([['C0043', 0, 50, 0, 50, '-1']]);
      expect(said(read)).toEqual(['Line 2: Event 1 plays backwards.']);
    }
  });

  it('holds one frame at a speed of 0, whatever its source', () => {
    for (const out of ['11', '60', '10']) {
      const read = edit([`1 C0043 V C 10 ${out} 0 50`, 'M2 C0043 000.0 10']);
      expect(map(read.picture)).toEqual([['C0043', 10, 11, 0, 50, '0']]);
      expect(said(read)).toEqual([]);
    }
  });

  it('has sound apart from the picture', () => {
    const read = edit(['1 C0043 V C 0 50 0 50', '2 C0044 A2 C 0 25 25 50', '3 C0045 B C 0 10 50 60']);
    expect(map(read.picture).map(([clip]) => clip)).toEqual(['C0043', 'C0045']);
    expect(read.sound.map(({ clip, track }) => [clip, track])).toEqual([
      ['C0044', 'A2'],
      ['C0045', 'A1'],
    ]);
  });

  it('has a higher track over a lower one', () => {
    expect(map(edit(['1 LOW V C 0 50 0 50', '2 HIGH V2 C 0 10 20 30']).picture)).toEqual([
      ['LOW', 0, 20, 0, 20, '1'],
      ['HIGH', 0, 10, 20, 30, '1'],
      ['LOW', 30, 50, 30, 50, '1'],
    ]);
  });

  it('runs over midnight on the camera’s clock', () => {
    const read = edit(['1 C0043 V C 23:59:59:00 00:00:01:00 00:00:00:00 00:00:02:00']);
    expect(map(read.picture)).toEqual([['C0043', 2_159_975, 2_160_025, 0, 50, '1']]);
  });
});

describe('What is wrong in an edit list is said with its line, and the rest is read', () => {
  it.each<[string, readonly string[], string]>([
    ['a list that breaks off', [FIRST, '002  C0044  V  C  00:00:0'], 'Line 2: The list breaks off'],
    ['a line that is none', [FIRST, 'hello'], 'Line 2: “hello” is not understood'],
    [
      'a source that ends before it begins',
      [FIRST, '002 C0044 V C 00:00:09:00 00:00:01:00 01:00:02:00 01:00:03:00'],
      'Line 2: The source of event 002 ends before it begins',
    ],
    ['a record that does', [FIRST, '002 C0044 V C 0 25 50 25'], 'Line 2: The record of event 002 ends'],
    ['an event without length', [FIRST, '002 C0044 V C 0 0 90050 90050'], 'Line 2: Event 002 has no length'],
    ['an unknown transition', [FIRST.replace(' C ', ' Q7 ')], 'Line 1: The transition Q7'],
    ['an unknown track', [FIRST, SECOND.replace(' V ', ' Z ')], 'Line 2: The track Z of event 002'],
    ['drop frame at a rate without', ['FCM: DROP FRAME', FIRST], 'drop frame, which its rate does not have'],
    ['a mark nowhere', [FIRST, '* LOC: 99:00:00:00 RED x'], 'Line 2: The mark is left out'],
    ['a speed that does not fit', [FIRST, 'M2 C0043 100.0 00:00:10:00'], 'Line 2: The speed of event 001'],
    ['lengths that differ', ['1 C0043 V C 0 500 0 50'], 'Line 1: Event 1 has 500 frames of source for 50'],
    [
      'a dissolve with one line',
      [FIRST, '002 C0044 V D 010 0 25 01:00:02:00 01:00:03:00'],
      'Line 2: Event 002 does not say what it comes in over',
    ],
  ])('%s', (_name, lines, sentence) => {
    const read = edit(lines);
    expect(said(read).join('\n')).toContain(sentence);
    expect(read.picture.length).toBeGreaterThan(0);
  });

  it('records that overlap: the later line lies over the earlier', () => {
    const read = edit(['1 C0043 V C 0 50 0 50', '2 C0044 V C 0 20 40 60']);
    expect(map(read.picture)).toEqual([
      ['C0043', 0, 40, 0, 40, '1'],
      ['C0044', 0, 20, 40, 60, '1'],
    ]);
    expect(said(read)).toEqual([
      'Line 2: The event records over that of line 1; where both lie, this one is taken.',
    ]);
  });
});

describe('A list that cannot be trusted is refused with a sentence', () => {
  it.each<[string, readonly string[], Rate, string]>([
    ['empty', [''], PAL, 'The list is empty.'],
    ['no list', ['Dear editor,', 'here is the cut.'], PAL, 'There is no event in this list'],
    [
      'labels of another rate',
      [FIRST.replace('10:00', '10:25')],
      PAL,
      'Line 1: 00:00:10:25 has frames beyond 24',
    ],
    ['drop-frame labels at 25', [FIRST.replace('10:00', '10;00')], PAL, 'Line 1: Drop-frame labels are for'],
    [
      'a label that drops out',
      ['1 A V C 00:01:00;00 00:01:01;00 0 30'],
      VIDEO,
      'Line 1: 00:01:00;00 does not',
    ],
    ['nothing left', ['1 A V C 0 25 50 25'], PAL, 'Line 1: The record of event 1 ends before it begins'],
  ])('%s', (_name, lines, rate, sentence) => {
    const read = answer(lines, rate);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });

  it('and one without a rate asks for it', () => {
    expect(readEdl(FIRST, { rate: null })).toMatchObject({ error: expect.stringContaining('Give it') });
  });
});

describe('Any list', () => {
  it('of cuts comes back as it was written, at every rate', () => {
    const cuts = fc.array(fc.tuple(fc.nat(1_000_000), fc.integer({ min: 1, max: 5000 })), {
      minLength: 1,
      maxLength: 20,
    });
    fc.assert(
      fc.property(cuts, fc.constantFrom(...LISTED_RATES), (all, rate) => {
        let at = 0;
        const expected = all.map(([from, length], index) => [
          `C${String(index)}`,
          from,
          from + length,
          at,
          (at += length),
          '1',
        ]);
        const lines = expected.map(([clip, ...times], index) => {
          const labels = times.slice(0, 4).map((time) => formatTimecode(Number(time), rate));
          return `${String(index + 1)} ${String(clip)} V C ${labels.join(' ')}`;
        });
        expect(map(edit(lines, rate).picture)).toEqual(expected);
      }),
      { numRuns: 60 },
    );
  });

  it('of nonsense gives an answer, never a fault, and no two pictures at one time', () => {
    const word = fc.constantFrom(
      ...[
        '001',
        '002',
        'AX',
        'BL',
        'V',
        'A',
        'B',
        'V2',
        'C',
        'D',
        'W001',
        '010',
        '0',
        '25',
        '50',
        '75',
        'M2',
        '-12.5',
        '000.0',
        '*',
      ],
      ...['FROM CLIP NAME: x', 'FCM: DROP FRAME', '00:00:01:00', '00:00:02:12', '99:99:99:99', '\0', '\t'],
    );
    const line = fc.oneof(
      fc.array(word, { maxLength: 10 }).map((words) => words.join(' ')),
      fc
        .tuple(
          fc.constantFrom('1', '2'),
          fc.constantFrom('AX', 'BL'),
          fc.constantFrom('V', 'V2', 'B', 'A'),
          fc.constantFrom('C', 'D 010', 'W001 5'),
          fc.array(fc.nat(200), { minLength: 4, maxLength: 4 }),
        )
        .map(
          ([number, reel, track, transition, times]) =>
            `${number} ${reel} ${track} ${transition} ${times.join(' ')}`,
        ),
    );
    fc.assert(
      fc.property(fc.array(line, { maxLength: 12 }), (lines) => {
        const read = answer(lines);
        const picture = read.ok ? read.value.picture : [];
        picture.forEach(({ record, source }, index) => {
          expect(record.out.compare(record.in)).toBeGreaterThan(0);
          expect(source.out.compare(source.in)).toBeGreaterThanOrEqual(0);
          const next = picture[index + 1];
          if (next !== undefined) expect(next.record.in.compare(record.out)).toBeGreaterThanOrEqual(0);
        });
      }),
      { numRuns: 60 },
    );
  });
});
