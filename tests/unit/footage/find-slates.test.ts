import { expect, test } from 'vitest';
import { slateToKeep } from '../../../src/features/footage/components/find-slates.ts';
import { AddSlateInput } from '../../../src/features/footage/footage.ts';

const RATE = { num: 30_000, den: 1001 };
const shopMs = Date.UTC(2026, 10, 2, 14, 22, 7, 400);

test('a slate is kept at the frame that the browser says it showed', () => {
  // Frame 7 begins at 0.233567 s; a browser may cut or round that off.
  const kept = slateToKeep({ seconds: 0.2335, exact: true, shopMs }, RATE);
  expect(AddSlateInput.parse(kept)).toMatchObject({ frame: 7, shopMs, readBy: 'code' });
});

test('where the browser does not say, it is kept at the frame that was sought', () => {
  expect(slateToKeep({ seconds: 0.26, exact: false, shopMs }, RATE)).toMatchObject({ frame: 7 });
});

test('a clip whose frames come unevenly is told the moment, within the frame', () => {
  const kept = AddSlateInput.parse(slateToKeep({ seconds: 0.233, exact: true, shopMs }, null));
  expect(kept.frame).toBeUndefined();
  expect(kept.moment).toBe('0.233500');
});
