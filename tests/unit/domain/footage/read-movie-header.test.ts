import { describe, expect, test } from 'vitest';
import { readMovieHeader } from '../../../../src/domain/footage/read-movie-header.ts';
import { snapRate } from '../../../../src/domain/time/rate.ts';

function box(type: string, ...parts: Buffer[]): Buffer {
  const body = Buffer.concat(parts);
  const head = Buffer.alloc(8);
  head.writeUInt32BE(body.length + 8, 0);
  head.write(type, 4, 'latin1');
  return Buffer.concat([head, body]);
}
const words = (...numbers: number[]) => {
  const bytes = Buffer.alloc(numbers.length * 4);
  for (const [index, number] of numbers.entries()) bytes.writeUInt32BE(number, index * 4);
  return bytes;
};

/** A header as ISO/IEC 14496-12 lays it out. @param durations how many frames last how long */
function header(given: { created?: number; scale?: number; durations?: number[][]; handler?: string }) {
  const { created = 3_860_000_000, scale = 25_000, durations = [[1500, 1000]], handler = 'vide' } = given;
  const times = box('stts', words(0, durations.length, ...durations.flat()));
  const media = box(
    'mdia',
    box('mdhd', words(0, 0, 0, scale, 0, 0)),
    box('hdlr', words(0, 0), Buffer.from(handler, 'latin1'), words(0, 0, 0)),
    box('minf', box('stbl', times)),
  );
  return box('moov', box('mvhd', words(0, created, created, 1000, 60_000)), box('trak', media));
}
const read = (bytes: Uint8Array) => readMovieHeader(bytes, snapRate);

describe('the header of a film', () => {
  test('says when it was made, its rate and its frames', () => {
    expect(read(header({}))).toEqual({
      createdWall: '2026-04-25T22:13:20',
      rate: { num: 25, den: 1 },
      frames: 1500,
      frameTimes: null,
    });
  });

  test.each([
    ['never set', 0, '1904-01-01T00:00:00'],
    ['set to 2036', 4_165_000_000, '2035-12-25'],
  ])('of a clock that was %s says so', (_, created, wall) => {
    expect(read(header({ created }))?.createdWall).toContain(wall);
  });

  test('with one odd frame at its end is of an even rate', () => {
    const durations = [
      [1799, 1001],
      [1, 500],
    ];
    expect(read(header({ scale: 30_000, durations }))).toMatchObject({
      rate: { num: 30_000, den: 1001 },
      frameTimes: null,
    });
  });

  test('of uneven frames gives when each begins, where they count at a listed rate', () => {
    const durations = [
      [50, 20],
      [50, 60],
    ];
    const uneven = read(header({ scale: 1000, durations }));
    expect(uneven).toMatchObject({ rate: { num: 25, den: 1 }, frames: 100 });
    expect(uneven?.frameTimes?.slice(49, 53)).toEqual([980, 1000, 1060, 1120]);
  });

  test('of uneven frames at no listed rate counts in milliseconds', () => {
    const durations = [
      [50, 20],
      [50, 50],
    ];
    expect(read(header({ scale: 1000, durations }))).toMatchObject({
      rate: { num: 1000, den: 1 },
      frames: 3500,
      frameTimes: null,
    });
  });

  test('of sound alone, or cut off anywhere, gives nothing and breaks nothing', () => {
    expect(read(header({ handler: 'soun' }))).toBeNull();
    const whole = header({});
    for (let length = 0; length < whole.length; length += 1)
      expect(read(whole.subarray(0, length))).toBeNull();
  });
});
