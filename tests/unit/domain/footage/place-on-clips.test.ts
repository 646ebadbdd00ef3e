import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { cameraClock } from '../../../../src/domain/footage/camera-clock.ts';
import { clipStart } from '../../../../src/domain/footage/creation-time.ts';
import { type FilmedClip, placeOnClips } from '../../../../src/domain/footage/place-on-clips.ts';

const T = Date.UTC(2026, 10, 12, 14, 22);
const aClip = (id: string, start: number, length: number, more: Partial<FilmedClip> = {}): FilmedClip => ({
  id,
  start: new Fraction(T + start * 1000),
  length: new Fraction(length),
  rate: { num: 25, den: 1 },
  pace: new Fraction(1),
  clock: [],
  ...more,
});

function place(seconds: number, ...clips: readonly FilmedClip[]) {
  const [found] = placeOnClips(clips, [new Fraction(T + seconds * 1000)]);
  return [found!.status, ...found!.clips.map(({ id, at }) => [id, at.valueOf()])];
}

describe('A moment of the shop', () => {
  const clip = aClip('C0043', 0, 60);

  it.each<[number, readonly unknown[]]>([
    [31.2, ['running', ['C0043', 31.2]]],
    [0, ['running', ['C0043', 0]]],
    [60, ['edge', ['C0043', 59.96]]],
    [70, ['edge', ['C0043', 59.96]]],
    [70.5, ['near', ['C0043', 59.96]]],
    [-10, ['edge', ['C0043', 0]]],
    [-10.001, ['near', ['C0043', 0]]],
    [360, ['near', ['C0043', 59.96]]],
    [360.001, ['none']],
  ])('%d s after a clip of 60 s began is %j', (seconds, expected) => {
    expect(place(seconds, clip)).toEqual(expected);
  });

  it('lies on the clip of each camera that ran', () => {
    expect(place(30, clip, aClip('P1', 20, 60))).toEqual(['running', ['C0043', 30], ['P1', 10]]);
  });

  it('goes to the nearest of two edges, and is offered both beyond', () => {
    const later = aClip('C0044', 75, 10);
    expect(place(69, clip, later)).toEqual(['edge', ['C0044', 0]]);
    expect(place(100, clip, later)).toEqual(['near', ['C0044', 9.96], ['C0043', 59.96]]);
  });

  it('runs with time-lapse and slow motion', () => {
    expect(place(100, aClip('LAPSE', 0, 60, { pace: new Fraction(20) }))).toEqual(['running', ['LAPSE', 5]]);
    expect(place(10, aClip('SLOW', 0, 60, { pace: new Fraction(1, 4) }))).toEqual(['running', ['SLOW', 40]]);
  });

  it('is found through the camera’s clock', () => {
    const clock = cameraClock([{ camera: new Fraction(T), shop: new Fraction(T + 90_500) }]);
    expect(place(90.5 + 12, aClip('C0043', 0, 60, { clock }))).toEqual(['running', ['C0043', 12]]);
  });

  it('is not held by a clip without length', () => {
    expect(place(0, aClip('C0045', 0, 0))).toEqual(['edge', ['C0045', 0]]);
  });
});

describe('The time in a clip’s file', () => {
  const ran = new Fraction(60);

  it('is the start of the clip or its end', () => {
    expect(clipStart(T, 'start', ran, T)).toEqual({ ok: true, value: new Fraction(T) });
    expect(clipStart(T, 'end', ran, T)).toEqual({ ok: true, value: new Fraction(T - 60_000) });
  });

  it.each([
    ['none', null, 'does not say when'],
    ['1904, where QuickTime counts from', Date.UTC(1904, 0, 1), 'in 1904'],
    ['2036', Date.UTC(2036, 1, 7), 'in 2036'],
    ['1970', 0, 'in 1970'],
  ])('is of no use when it is %s', (_name, created, sentence) => {
    const read = clipStart(created, 'start', ran, T);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });
});
