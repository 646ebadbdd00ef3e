import { describe, expect, test } from 'vitest';
import {
  afterSaving,
  EMPTY_DRAFT,
  NO_MARKS,
  placeOfDraft,
  setMark,
  withKind,
} from '../../../src/features/episodes/components/desk/composer-draft.ts';
import { makeClock } from '../../../src/features/episodes/components/desk/clock.ts';
import {
  formatMoment,
  framesIn,
  movedTo,
  movePlace,
} from '../../../src/features/episodes/components/desk/moment.ts';

const PAL = { num: 25, den: 1 };
const NTSC = { num: 30000, den: 1001 };
const MS = { num: 1000, den: 1 };

describe('a moment', () => {
  test.each([
    [0, PAL, '0:00.00'],
    [5512, PAL, '3:40.12'],
    [29, NTSC, '0:00.29'],
    [30, NTSC, '0:01.00'],
    [220480, MS, '3:40.480'],
  ])('%i is said to the frame', (frame, rate, said) => {
    expect(formatMoment(frame, rate)).toBe(said);
  });

  test('moves as a whole, and not before the start', () => {
    const place = { frame: 10, endFrame: 60, rate: PAL };
    expect(movePlace(place, -25, null)).toEqual({ frame: 0, endFrame: 50, rate: PAL });
    expect(movedTo(place, 100, PAL)).toEqual({ frame: 100, endFrame: 150, rate: PAL });
  });

  test('steps by a frame, a second, ten', () => {
    expect(['frame', 'second', 'ten'].map((size) => framesIn(size as 'frame', NTSC))).toEqual([1, 30, 300]);
    expect(framesIn('frame', MS)).toBe(40);
  });
});

describe('in and out', () => {
  test('never stand the wrong way round', () => {
    const marks = setMark(setMark(NO_MARKS, 'in', 50), 'out', 100);
    expect(setMark(marks, 'in', 120)).toEqual({ in: 120, out: null });
    expect(setMark(marks, 'out', 40)).toEqual({ in: null, out: 40 });
  });

  test('decide where a note stands, then where it was begun, then the moment on screen', () => {
    const draft = { ...EMPTY_DRAFT, at: 70 };
    expect(placeOfDraft(draft, { in: 50, out: 100 }, 90, PAL)).toMatchObject({ frame: 50, endFrame: 100 });
    expect(placeOfDraft(draft, NO_MARKS, 90, PAL)).toMatchObject({ frame: 70, endFrame: null });
    expect(placeOfDraft(EMPTY_DRAFT, NO_MARKS, 90, PAL)).toMatchObject({ frame: 90 });
  });
});

describe('a draft', () => {
  test('keeps only what belongs to its kind', () => {
    const size = withKind(EMPTY_DRAFT, 'size');
    expect(size.standing).toBe('as-made');
    expect(withKind(size, 'step').standing).toBeNull();
    expect(withKind({ ...EMPTY_DRAFT, topic: 'zinc' }, 'tip').topic).toBeNull();
  });

  test('that was saved leaves kind and audience for the next', () => {
    const next = afterSaving({
      ...EMPTY_DRAFT,
      kind: 'tip',
      audience: 'team',
      text: 'a',
      partIds: ['x'],
      at: 3,
    });
    expect(next).toEqual({ ...EMPTY_DRAFT, kind: 'tip', audience: 'team' });
  });
});

describe('the clock', () => {
  test('is set by hand without a player, inside the video', () => {
    const clock = makeClock(PAL, 100);
    clock.seek(500);
    expect(clock.now()).toBe(99);
    clock.seek(-5);
    expect(clock.now()).toBe(0);
  });

  test('asks the player for a time inside the frame', () => {
    const clock = makeClock(NTSC, null);
    const asked: number[] = [];
    clock.setPlayer({ seek: (seconds) => asked.push(seconds), toggle: null, pause: () => undefined });
    clock.seek(1);
    expect(asked).toEqual([0.034]);
  });
});
