import { expect, test } from 'vitest';
import { exportedFunctions, isRoute, sourceFiles } from '../../support/authorisation/find-ruled.ts';
import { tripwireServices } from '../../support/authorisation/tripwires.ts';
import { callRoute, codeOf } from '../../support/call-route.ts';
import { testServices } from '../../support/services.ts';

const tripwires = tripwireServices(await testServices());
const routes = (await exportedFunctions(sourceFiles('src/pages/api', /\.ts$/))).filter(isRoute);
const writes = routes.filter(({ thing }) => thing.route.verb.rule.kind === 'write');
const guarded = writes.filter(({ thing }) => thing.route.origin !== 'any');

const FOREIGN = [
  null,
  'null',
  'https://elsewhere.example',
  'http://shed.test.elsewhere.example',
  'https://shed.test',
  'http://shed.test:8080',
  'http://SHED.test/',
];

test.each(guarded.map((found) => [found.file, found] as const))(
  '%s refuses what another site sent, as JSON and as a form',
  async (_file, { thing }) => {
    for (const origin of FOREIGN) {
      for (const sent of [{ body: {} }, { form: { name: 'x' } }]) {
        const answer = await callRoute(tripwires, thing, { ...sent, origin });
        expect({ origin, status: answer.status, code: codeOf(answer) }).toEqual({
          origin,
          status: 400,
          code: 'bad_request',
        });
      }
    }
  },
);

test('a page of ours may send', async () => {
  const { thing } = writes.find(({ file }) => file.endsWith('account/sign-out.ts'))!;
  expect(codeOf(await callRoute(tripwires, thing))).toBe('reached');
});
