import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { type RuledRoute } from '../../../src/server/http/api-route.ts';
import { POST as settingsRoute } from '../../../src/pages/api/workshops/[workshop]/settings.ts';
import { POST as roleRoute } from '../../../src/pages/api/workshops/[workshop]/team/[member]/role.ts';
import { POST as signInRoute } from '../../../src/pages/api/account/sign-in.ts';
import {
  exportedFunctions,
  type Found,
  isRoute,
  paramsOf,
  sourceFiles,
} from '../../support/authorisation/find-ruled.ts';
import { tripwireServices } from '../../support/authorisation/tripwires.ts';
import { callRoute, codeOf, fieldsOf } from '../../support/call-route.ts';
import { aWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const shed = await aWorkshop(services);
const tripwires = tripwireServices(services);
const routes = (await exportedFunctions(sourceFiles('src/pages/api', /\.ts$/))).filter(isRoute);
const writes = routes.filter(({ thing }) => thing.route.verb.rule.kind === 'write');

const ODD = {
  nothing: null,
  'a number': 7.5,
  'a huge number': 1e300,
  'a truth value': false,
  'a list': ['a', 'b'],
  'an object': { toString: 'x', __proto__: null },
  'a NUL': 'a\u0000b',
  'half a character': 'a\ud83d',
  'a very long text': 'x'.repeat(100_000),
  'a change of direction': '\u202e\u200b\ufeff',
  'stacked accents': `a${'\u0301'.repeat(5000)}`,
  markup: '<script>alert(1)</script>',
  SQL: "'; drop table accounts; --",
};

/** The names of a body's fields, through whatever is done to it afterwards. */
function fieldNames(schema: z.ZodType): string[] {
  if (schema instanceof z.ZodObject) return Object.keys(schema.shape as object);
  if (schema instanceof z.ZodPipe) return fieldNames(schema.in as z.ZodType);
  return [];
}

function call({ file, thing }: Found<RuledRoute>, body: unknown) {
  const params = { ...paramsOf(file), workshop: shed.slug };
  return callRoute(tripwires, thing, { params, actor: shed.people.owner, body });
}

test('the fields of most bodies are known', () => {
  expect(writes.flatMap(({ thing }) => fieldNames(thing.route.body)).length).toBeGreaterThan(25);
});

test.each(writes.map((found) => [found.file, found] as const))(
  '%s answers anything odd with a sentence',
  async (_file, found) => {
    const fields = [...fieldNames(found.thing.route.body), 'unknown'];
    for (const [what, value] of Object.entries(ODD)) {
      const answer = await call(found, Object.fromEntries(fields.map((field) => [field, value])));
      expect(Math.floor(answer.status / 100), what).toBe(4);
      for (const [field, sentence] of Object.entries(fieldsOf(answer)))
        expect(sentence, `${field} as ${what}`).toMatch(/^[A-Z][^{}]*\.$/);
    }
  },
);

describe('a body that is no record', () => {
  test.each([
    ['nothing', ''],
    ['half of one', '{'],
    ['a list', '[]'],
    ['null', 'null'],
    ['a text', '"text"'],
    ['a number', '7'],
    ['one and a half', '{"a":1}}'],
    ['a NUL', '\u0000'],
    ['brackets without end', '['.repeat(50_000)],
  ])('is refused: %s', async (_what, body) => {
    const answer = await callRoute(services, signInRoute, { body });
    expect(answer).toMatchObject({ status: 400, json: { error: { code: 'bad_request' } } });
  });

  test.each(['text/plain', 'application/xml'])('%s is refused', async (type) => {
    const answer = await callRoute(services, signInRoute, { headers: { 'content-type': type }, body: 'x' });
    expect(codeOf(answer)).toBe('bad_request');
  });

  test('nested as deep as a body can be is refused in a sentence', async () => {
    const deep = `{"email":${'['.repeat(100_000)}${']'.repeat(100_000)}}`;
    expect((await callRoute(services, signInRoute, { body: deep })).status).toBe(422);
  });
});

describe('an odd address', () => {
  test.each([
    ['with a NUL', 'a\u0000b'],
    ['with half a character', '\ud83d'],
    ['with SQL', "' or 1=1 --"],
    ['far too long', 'x'.repeat(5000)],
    ['that climbs', '../..'],
    ['that is empty', ''],
  ])('of a workshop is not found: one %s', async (_what, workshop) => {
    const answer = await callRoute(services, settingsRoute, {
      params: { workshop },
      actor: shed.people.owner,
    });
    expect(answer.status).toBe(404);
  });

  test.each(['a\u0000b', '7', "' or 1=1 --"])('member %j is no id', async (member) => {
    const params = { workshop: shed.slug, member };
    const body = { role: 'editor' };
    const answer = await callRoute(services, roleRoute, { params, body, actor: shed.people.owner });
    expect(answer.status).toBe(422);
  });
});
