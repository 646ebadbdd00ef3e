import { expect, test } from 'vitest';
import { readEdit } from '../../../src/domain/edit/read-edit.ts';
import { PRESS_EDIT } from '../../../src/seed/press-edit.ts';

test('the demo’s edit reads without a warning, cut to cut, as long as its film', () => {
  const read = readEdit(PRESS_EDIT.text, { rate: { num: 25, den: 1 } });
  if (!read.ok) throw new Error(read.error);
  const { picture, warnings, frames } = read.value;
  expect(warnings).toEqual([]);
  // The film in src/seed/media has 2537 frames, as ffprobe counts them.
  expect(frames.valueOf()).toBe(2537);
  expect(picture.map(({ record }) => [record.in.valueOf(), record.out.valueOf()])).toEqual([
    [0, 592],
    [592, 1135],
    [1135, 2027],
    [2027, 2537],
  ]);
});
