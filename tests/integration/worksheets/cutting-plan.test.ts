import { expect, test } from 'vitest';
import { planCuts } from '../../../src/server/solver/plan-cuts.ts';

test('cutting plans are made one after another in a process of their own, and proven', async () => {
  // By their lengths alone two bars could hold them; the solver shows that three are needed.
  const [one, other] = await Promise.all([
    planCuts({ pieces: '3100, 3', length: '6000' }),
    planCuts({ pieces: '1200, 4, rail\n800, 6', length: '6000', kerf: '2.5' }),
  ]);
  expect(one).toMatchObject({ ok: true, value: { result: { bought: 3, lowerBound: 3 }, warnings: [] } });
  expect(other).toMatchObject({ ok: true, value: { result: { bought: 2, lowerBound: 2 } } });
});

test('a cutting plan that cannot be made says why', async () => {
  expect(await planCuts({ pieces: '7000, 1', length: '6000' })).toMatchObject({
    ok: false,
    error: expect.stringContaining('longer than any bar') as string,
  });
});
