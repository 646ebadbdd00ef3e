import { expect, test } from 'vitest';
import { findGaps } from '../../../../src/domain/footage/find-gaps.ts';
import { proposeJoin } from '../../../../src/domain/footage/propose-join.ts';

const minutes = (from: number, until: number) => ({ from: from * 60_000, until: until * 60_000 });

test('gaps lie between clips of all cameras, and short ones are none', () => {
  const clips = [minutes(30, 40), minutes(0, 10), minutes(5, 12), minutes(12.5, 20)];
  expect(findGaps(clips)).toEqual([minutes(20, 30)]);
  expect(findGaps([])).toEqual([]);
});

test('a clip is offered to be joined to the number before it that ends where it begins', () => {
  const rate = { num: 25, den: 1 };
  const clip = (name: string, from: number, until: number, camera = 'a') => ({
    id: name + camera,
    name,
    camera: { id: camera },
    rate,
    ...minutes(from, until),
  });
  const second = clip('C0002.MP4', 10, 20);
  const first = clip('C0001.MP4', 0, 10);
  expect(proposeJoin(second, [second, first])).toBe(first);
  expect(proposeJoin(second, [second, clip('C0001.MP4', 0, 9.9)])).toBeNull();
  expect(proposeJoin(second, [second, clip('C0001.MP4', 0, 10, 'b')])).toBeNull();
  expect(proposeJoin(second, [second, clip('C0009.MP4', 0, 10)])).toBeNull();
});
