import Fraction from 'fraction.js';
import { describe, expect, test } from 'vitest';
import { clockErrorAt, shopTimeAt } from '../../../../src/domain/footage/camera-clock.ts';
import {
  type CameraFacts,
  type ClipFacts,
  type SlateFacts,
  timeClips,
} from '../../../../src/domain/footage/film-clips.ts';

const NOW = Date.UTC(2026, 11, 1);
const PLACE = { timeZone: 'Europe/London', now: NOW };
const CAMERA: CameraFacts = { id: 'a', creationMeans: 'start', localAsUtc: false, timeZone: null };

function clip(given: Partial<ClipFacts> = {}): ClipFacts {
  return {
    id: 'c1',
    cameraId: 'a',
    frames: 1500,
    rate: { num: 25, den: 1 },
    pace: new Fraction(1),
    createdWall: '2026-07-02T14:22:07',
    createdOffset: 0,
    startSetAt: null,
    frameTimes: null,
    continuesId: null,
    ...given,
  };
}

function startOf(given: Partial<ClipFacts>, camera: Partial<CameraFacts> = {}, slates: SlateFacts[] = []) {
  const timing = timeClips([clip(given)], [{ ...CAMERA, ...camera }], slates, PLACE).get('c1');
  return { ...timing, at: timing?.start == null ? null : new Date(timing.start.valueOf()).toISOString() };
}

describe('when a clip began', () => {
  test.each([
    ['a file that gives UTC', {}, {}, '2026-07-02T14:22:07.000Z'],
    ['a file with its own zone', { createdOffset: 120 }, {}, '2026-07-02T12:22:07.000Z'],
    ['a file without a zone, in the shop’s', { createdOffset: null }, {}, '2026-07-02T13:22:07.000Z'],
    ['a camera that writes local time as UTC', {}, { localAsUtc: true }, '2026-07-02T13:22:07.000Z'],
    [
      'a camera that is set to another zone',
      { createdOffset: null },
      { timeZone: 'Asia/Tokyo' },
      '2026-07-02T05:22:07.000Z',
    ],
    ['a camera that gives the end', {}, { creationMeans: 'end' as const }, '2026-07-02T14:21:07.000Z'],
    [
      'a time-lapse of 1:20 whose camera gives the end',
      { pace: new Fraction(20) },
      { creationMeans: 'end' as const },
      '2026-07-02T14:02:07.000Z',
    ],
  ])('is read from %s', (_, given, camera, at) => {
    expect(startOf(given, camera)).toMatchObject({ at, by: 'camera', problem: null });
  });

  test.each([
    [null, 'does not say'],
    ['1904-01-01T00:00:00', '1904'],
    ['2036-02-07T06:28:15', '2036'],
  ])('is not known from a file that says %s, and why is said', (createdWall, why) => {
    const timing = startOf({ createdWall });
    expect(timing).toMatchObject({ at: null, by: 'nothing' });
    expect(timing.problem).toContain(why);
  });

  test('is what was set by hand before all else', () => {
    const timing = startOf({ startSetAt: NOW }, {}, [{ clipId: 'c1', frame: 0, shopAt: 5 }]);
    expect(timing).toMatchObject({ by: 'hand', clock: [] });
    expect(timing.start?.valueOf()).toBe(NOW);
  });

  test('is read back from its own slate when the file says nothing', () => {
    const timing = startOf({ createdWall: null }, {}, [
      { clipId: 'c1', frame: 50, shopAt: 1_790_000_000_000 },
    ]);
    expect(timing).toMatchObject({ by: 'slate' });
    expect(timing.start?.valueOf()).toBe(1_789_999_998_000);
  });
});

test('slates of one clip set every clip of the camera right, and no other camera’s', () => {
  const start = Date.UTC(2026, 6, 2, 14, 22, 7);
  const day = 86_400_000;
  const clips = [
    clip({ id: 'c1' }),
    clip({ id: 'c2', createdWall: '2026-07-03T14:22:07' }),
    clip({ id: 'c3', createdWall: '2026-07-03T02:22:07' }),
    clip({ id: 'other', cameraId: 'b' }),
  ];
  const slates = [
    { clipId: 'c1', frame: 0, shopAt: start + 12_400 },
    { clipId: 'c2', frame: 0, shopAt: start + day + 13_200 },
  ];
  const timed = timeClips(clips, [CAMERA, { ...CAMERA, id: 'b' }], slates, PLACE);
  const middle = timed.get('c3');
  if (middle?.start == null) throw new Error('The clip has no start.');
  expect(shopTimeAt(middle.clock, middle.start).valueOf()).toBe(start + day / 2 + 12_800);
  const error = clockErrorAt(middle.clock, middle.start);
  expect([error.offset.valueOf(), error.drift?.valueOf()]).toEqual([12.8, 0.8]);
  expect(timed.get('other')?.clock).toEqual([]);
});

test('a slate counts from the timestamp of its frame where frames come unevenly', () => {
  const given = { createdWall: null, frameTimes: [0, 33, 90, 120] };
  expect(startOf(given, {}, [{ clipId: 'c1', frame: 2, shopAt: 1000 }]).start?.valueOf()).toBe(910);
});

test('a slate in a clip that counts in milliseconds stands at its millisecond, whatever its frames begin at', () => {
  const given = { createdWall: null, rate: { num: 1000, den: 1 }, frameTimes: [0, 33, 90, 120] };
  expect(startOf(given, {}, [{ clipId: 'c1', frame: 2, shopAt: 1000 }]).start?.valueOf()).toBe(998);
});

describe('a clip that goes on from another', () => {
  const first = clip({ id: 'c1' });
  const second = clip({ id: 'c2', continuesId: 'c1', createdWall: '1904-01-01T00:00:00' });
  const at = (timed: ReturnType<typeof timeClips>, id: string) =>
    new Date(timed.get(id)?.start?.valueOf() ?? 0).toISOString();

  test('begins where that one ended, whatever its own file says', () => {
    const timed = timeClips([second, first], [CAMERA], [], PLACE);
    expect(at(timed, 'c2')).toBe('2026-07-02T14:23:07.000Z');
    expect(timed.get('c2')?.by).toBe('before');
  });

  test('moves with it when that is set by hand', () => {
    const set = { ...first, startSetAt: Date.UTC(2026, 6, 2, 8) };
    expect(at(timeClips([set, second], [CAMERA], [], PLACE), 'c2')).toBe('2026-07-02T08:01:00.000Z');
  });

  test('in a circle is timed by its own file', () => {
    const timed = timeClips([{ ...first, continuesId: 'c2' }, second], [CAMERA], [], PLACE);
    expect(timed.size).toBe(2);
  });
});
