import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { cutsOverWork, offCamera, type WorkStretch } from '../../../../src/domain/footage/off-camera.ts';

const T = Date.UTC(2026, 10, 12, 14);
const PAL = { num: 25, den: 1 };
const minute = (at: number) => T + at * 60_000;

const work = (from: number, until: number, text = ''): WorkStretch => ({
  from: minute(from),
  until: minute(until),
  sign: 'timer',
  text,
});
/** A clip that ran from one minute to another. */
const aClip = (id: string, from: number | null, until: number) => ({
  id,
  start: from === null ? null : new Fraction(minute(from)),
  length: new Fraction((until - (from ?? 0)) * 60),
  rate: PAL,
  pace: new Fraction(1),
  clock: [],
  label: new Fraction(0),
});
const minutes = (found: ReturnType<typeof offCamera>) =>
  found.map(({ from, until }) => [(from - T) / 60_000, (until - T) / 60_000]);

describe('Off camera', () => {
  it('is work while no clip was running', () => {
    const clips = [aClip('A', 10, 20), aClip('B', 50, 60)];
    expect(minutes(offCamera([work(0, 70)], clips))).toEqual([
      [0, 10],
      [20, 50],
      [60, 70],
    ]);
  });

  it('is not a gap without a sign of work, nor what was filmed by any camera', () => {
    const clips = [aClip('A', 10, 20), aClip('B', 15, 60)];
    expect(offCamera([], clips)).toEqual([]);
    expect(offCamera([work(12, 58)], clips)).toEqual([]);
  });

  it('counts work that several signs tell of once, and keeps what they say', () => {
    const [only] = offCamera([work(0, 30, 'Welded.'), work(20, 40), work(25, 35, 'Ground it.')], []);
    expect(minutes([only!])).toEqual([[0, 40]]);
    expect(only!.texts).toEqual(['Welded.', 'Ground it.']);
  });

  it('is not the moment between two clips, and a clip of unknown time hides nothing', () => {
    expect(offCamera([work(0, 20)], [aClip('A', 0, 10), aClip('B', 10.5, 20)])).toEqual([]);
    expect(minutes(offCamera([work(0, 20)], [aClip('A', null, 10)]))).toEqual([[0, 20]]);
  });
});

describe('A cut over work', () => {
  const clips = [aClip('A', 0, 10), aClip('B', 60, 70), aClip('C', 100, 110)];
  const off = offCamera([work(10, 40, 'Welded.'), work(75, 95)], clips);
  function cuts(...lines: readonly string[]) {
    const read = readEdl(lines.join('\n'), { rate: PAL });
    if (!read.ok) throw new Error(read.error);
    return cutsOverWork(read.value, clips, off).map(({ frame, seconds }) => [frame, seconds / 60]);
  }

  it('is the one where the picture goes from before the work to after it', () => {
    expect(cuts('1 A V C 0 250 0 250', '2 B V C 0 250 250 500', '3 C V C 0 250 500 750')).toEqual([
      [250, 30],
      [500, 20],
    ]);
  });

  it('is told once, where least is left out, and not where the picture goes back', () => {
    // First a teaser of the end.
    const teased = [
      '1 A V C 0 50 0 50',
      '2 C V C 0 50 50 100',
      '3 A V C 0 250 100 350',
      '4 B V C 0 250 350 600',
    ];
    expect(cuts(...teased, '5 C V C 0 250 600 850')).toEqual([
      [350, 30],
      [600, 20],
    ]);
    expect(cuts('1 C V C 0 250 0 250', '2 A V C 0 250 250 500')).toEqual([]);
  });

  it('is not at footage that was filmed and left out', () => {
    expect(cutsOverWork({ ...emptyEdit(), picture: [] }, clips, off)).toEqual([]);
    expect(cuts('1 A V C 0 100 0 100', '2 A V C 5000 5100 100 200')).toEqual([]);
  });

  function emptyEdit() {
    const read = readEdl('1 A V C 0 1 0 1', { rate: PAL });
    if (!read.ok) throw new Error(read.error);
    return read.value;
  }
});
