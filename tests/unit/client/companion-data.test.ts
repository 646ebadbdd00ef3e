import { describe, expect, it } from 'vitest';
import { askedSeconds, nowAt, readCourse } from '../../../src/client/companion-data.ts';

const course = readCourse({
  rate: [25, 1],
  seconds: 60,
  appearances: [
    [0, 250, 500],
    [1, 300, 700],
    [0, 800, 900],
  ],
  chapters: [0, 750],
  notes: [
    [250, 500],
    [300, 400],
    [800, 900],
  ],
});

describe('what holds at a frame', () => {
  it('is nothing before anything has come in', () => {
    expect(nowAt(course, 249, 9.96)).toEqual({ frame: 249, seconds: 9.96, parts: [], note: null });
  });

  it('is the newest note that holds, and the parts in view, newest first', () => {
    expect(nowAt(course, 300, 12)).toMatchObject({
      parts: [
        { index: 1, filled: true },
        { index: 0, filled: true },
      ],
      note: 1,
    });
  });

  it('goes back to an older note that still holds', () => {
    expect(nowAt(course, 400, 16).note).toBe(0);
  });

  it('changes at the very frame at which a stretch ends', () => {
    expect(nowAt(course, 499, 19.96).note).toBe(0);
    expect(nowAt(course, 500, 20)).toMatchObject({
      note: null,
      parts: [
        { index: 1, filled: true },
        { index: 0, filled: false },
      ],
    });
  });

  it('forgets the parts of the chapter before', () => {
    expect(nowAt(course, 750, 30).parts).toEqual([]);
  });
});

describe('the time in an address', () => {
  it.each([
    ['?t=221', 221],
    ['?t=221.25', 221.25],
    ['?x=1&t=0', 0],
    ['', null],
    ['?t=', null],
    ['?t=3:41', null],
    ['?t=-5', null],
    ['?t=1e9', null],
    ['?t=99999999', null],
  ])('%s is %s', (search, seconds) => {
    expect(askedSeconds(search)).toBe(seconds);
  });
});
