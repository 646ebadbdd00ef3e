import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { type Edit, type Segment } from '../../../../src/domain/edit/edit.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { readOtio } from '../../../../src/domain/edit/read-otio.ts';
import { writeEdl } from '../../../../src/domain/edit/write-edl.ts';
import { writeOtio } from '../../../../src/domain/edit/write-otio.ts';
import { LISTED_RATES, type Rate } from '../../../../src/domain/time/rate.ts';
import { hasDropFrame } from '../../../../src/domain/time/timecode.ts';

const PAL = { num: 25, den: 1 };
const ONE = new Fraction(1);

interface Cut {
  readonly clip: string;
  readonly from: number;
  readonly length: number;
  readonly hole: number;
  readonly speed?: Fraction;
  readonly clipRate?: Rate;
}

function build(cuts: readonly Cut[], rate: Rate, markers: Edit['markers'] = [], title = 'Press'): Edit {
  let at = new Fraction(0);
  const picture = cuts.map(({ clip, from, length, hole, speed = ONE, clipRate = rate }): Segment => {
    const start = at.add(hole);
    at = start.add(length);
    const used = speed.equals(0)
      ? ONE
      : speed.abs().mul(length).mul(clipRate.num, clipRate.den).div(rate.num, rate.den);
    const source = { in: new Fraction(from), out: used.add(from) };
    return { clip, alsoCalled: [], clipRate, source, record: { in: start, out: at }, speed, track: 'V1' };
  });
  return { title, rate, drop: false, frames: at, picture, sound: [], dissolved: [], markers, warnings: [] };
}

const map = ({ picture, sound, frames }: Edit) => ({
  segments: [...picture, ...sound].map(({ clip, source, record, speed, track }) => [
    clip,
    ...[source.in, source.out, record.in, record.out, speed].map((one) => one.toFraction()),
    track[0],
  ]),
  frames: frames.toFraction(),
});
const marks = ({ markers }: Edit) =>
  markers.map(({ record, name, colour }) => [record.toFraction(), name, colour]);

function read(answer: ReturnType<typeof readEdl>): Edit {
  if (!answer.ok) throw new Error(answer.error);
  return answer.value;
}

const cuts = fc.array(
  fc.record({
    clip: fc.constantFrom('C0043', 'C0043.MP4', 'shed cam 2', 'BL', '001', 'Späne'),
    from: fc.nat(100_000),
    length: fc.integer({ min: 1, max: 500 }).map((half) => half * 2),
    hole: fc.constantFrom(0, 0, 0, 12),
    speed: fc.constantFrom(ONE, ONE, new Fraction(2), new Fraction(1, 2), new Fraction(0), new Fraction(-1)),
  }),
  { minLength: 1, maxLength: 12 },
);

describe('A list that is written', () => {
  it('comes back as the same edit, at every rate', () => {
    fc.assert(
      fc.property(cuts, fc.constantFrom(...LISTED_RATES), fc.boolean(), (all, rate, drop) => {
        const edit = build(all, rate);
        const text = writeEdl(edit, drop && hasDropFrame(rate));
        expect(map(read(readEdl(text, { rate })))).toEqual(map(edit));
      }),
      { numRuns: 40 },
    );
  });

  it('looks as lists do', () => {
    const edit = build(
      [
        { clip: 'C0043.MP4', from: 780, length: 50, hole: 0 },
        { clip: 'C0044', from: 0, length: 25, hole: 0, speed: new Fraction(119, 125) },
      ],
      PAL,
      [{ record: new Fraction(60), name: 'grind here', colour: null }],
    );
    expect(writeEdl(edit).split('\r\n')).toEqual([
      'TITLE: Press',
      'FCM: NON-DROP FRAME',
      '',
      '001  C0043    V     C        00:00:31:05 00:00:33:05 01:00:00:00 01:00:02:00',
      '* FROM CLIP NAME: C0043.MP4',
      '002  C0044    V     C        00:00:00:00 00:00:00:24 01:00:02:00 01:00:03:00',
      'M2   C0044    023.8    00:00:00:00',
      '* FROM CLIP NAME: C0044',
      '* LOC: 01:00:02:10 RED     grind here',
      '',
    ]);
  });

  it('lets no words out of their line', () => {
    const evil = 'x\r\n002  AX V C 0 5 0 5\u2028M2 AX 000.0 0\u0000';
    const edit = build(
      [{ clip: evil, from: 0, length: 10, hole: 0 }],
      PAL,
      [{ record: ONE, name: evil, colour: evil }],
      evil,
    );
    const text = writeEdl(edit);
    expect(text.split('\r\n').filter((line) => line !== '')).toHaveLength(5);
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n\0\u2028]/);
    expect(read(readEdl(text, { rate: PAL })).picture).toHaveLength(1);
  });

  it('keeps the rate of a clip when the reader is told it', () => {
    const clipRate = { num: 50, den: 1 };
    const edit = build([{ clip: 'C0043', from: 130, length: 10, hole: 5, clipRate }], PAL);
    const back = read(readEdl(writeEdl(edit), { rate: PAL, clipRates: new Map([['C0043', clipRate]]) }));
    expect(map(back)).toEqual(map(edit));
  });
});

describe('A timeline that is written', () => {
  it('comes back as the same edit with its marks, at every rate', () => {
    const places = fc.array(fc.tuple(fc.nat(100), fc.constantFrom('RED', 'GREEN'), fc.string()), {
      maxLength: 4,
    });
    fc.assert(
      fc.property(cuts, fc.constantFrom(...LISTED_RATES), places, (all, rate, noted) => {
        const plain = build(all, rate);
        const markers = noted
          .map(([part, colour, name]) => ({
            record: plain.frames.mul(part, 100).floor(),
            name: name.trim(),
            colour,
          }))
          .sort((a, b) => a.record.compare(b.record));
        const edit = { ...plain, markers };
        const back = read(readOtio(writeOtio(edit), { rate: null }));
        expect(back.rate).toEqual(rate);
        expect([map(back), marks(back)]).toEqual([map(edit), marks(edit)]);
      }),
      { numRuns: 40 },
    );
  });

  it('lays sound that overlaps on tracks of its own', () => {
    const edit = build([{ clip: 'A', from: 0, length: 100, hole: 0 }], PAL);
    const sound = [0, 0, 50].map((at, index): Segment => ({
      ...edit.picture[0]!,
      clip: `S${String(index)}`,
      source: { in: new Fraction(0), out: new Fraction(50) },
      record: { in: new Fraction(at), out: new Fraction(at + 50) },
      track: 'A1',
    }));
    const back = read(readOtio(writeOtio({ ...edit, sound }), { rate: null }));
    expect(back.sound.map(({ clip, track }) => [clip, track])).toEqual([
      ['S0', 'A1'],
      ['S1', 'A2'],
      ['S2', 'A1'],
    ]);
  });
});
