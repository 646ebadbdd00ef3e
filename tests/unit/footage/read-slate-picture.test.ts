import { expect, test } from 'vitest';
import { writeSlateCode } from '../../../src/domain/footage/slate-code.ts';
import { loadSlateReader } from '../../../src/features/footage/components/read-slate-picture.ts';
import { drawCode } from '../../support/slate-picture.ts';

const AT = Date.UTC(2026, 10, 2, 14, 22, 7, 400);

test.each([
  { what: 'sharp', noise: 0, scale: 8 },
  { what: 'noisy, its squares no whole pixels', noise: 30, scale: 7.3 },
  { what: 'small in the picture', noise: 12, scale: 4.4 },
])('a slate is read from a picture that is $what', async ({ noise, scale }) => {
  const read = await loadSlateReader();
  expect(read(drawCode(writeSlateCode(AT), { noise, scale }))).toBe(AT);
});

test('a slate at the side of a wide picture is read', async () => {
  const read = await loadSlateReader();
  const { data } = drawCode(writeSlateCode(AT), { width: 360, height: 360 });
  const wide = new Uint8ClampedArray(960 * 360 * 4).fill(128);
  for (let y = 0; y < 360; y += 1) wide.set(data.subarray(y * 1440, (y + 1) * 1440), (y * 960 + 600) * 4);
  expect(read({ width: 960, height: 360, data: wide })).toBe(AT);
});

test('the code of something else is not taken for a slate, nor one whose check does not come out', async () => {
  const read = await loadSlateReader();
  expect(read(drawCode('HTTPS://SHED.EXAMPLE', { scale: 8 }))).toBeNull();
  const other = writeSlateCode(AT + 1000).slice(0, 13) + writeSlateCode(AT).slice(13);
  expect(read(drawCode(other, { scale: 8 }))).toBeNull();
});

test('a picture without a code has no slate', async () => {
  const read = await loadSlateReader();
  expect(read(drawCode('', { scale: 0.01, noise: 30 }))).toBeNull();
});
