import { describe, expect, test } from 'vitest';
import { isWorkshopPermission } from '../../src/domain/permissions.ts';
import { type Context } from '../../src/server/context.ts';
import { AppError } from '../../src/server/errors.ts';
import { contextFor } from '../../src/seed/people.ts';
import {
  expectedVerdict,
  type Verdict,
  verdictOf,
  type Walker,
  WALKERS,
} from '../support/authorisation/expected.ts';
import {
  exportedFunctions,
  importsOf,
  isRoute,
  isVerb,
  paramsOf,
  sourceFiles,
  sourceText,
} from '../support/authorisation/find-ruled.ts';
import { NOTHING, tripwireServices } from '../support/authorisation/tripwires.ts';
import { walkedWorkshop } from '../support/authorisation/walked-workshop.ts';
import { callRoute, codeOf } from '../support/call-route.ts';
import { testServices } from '../support/services.ts';

const services = await testServices();
const { slug, people } = await walkedWorkshop(services);
const tripwires = tripwireServices(services);

const endpointFiles = sourceFiles('src/pages/api', /\.ts$/);
const endpoints = await exportedFunctions(endpointFiles);
const routes = endpoints.filter(isRoute);
const featureFiles = sourceFiles('src/features', /\/server\/[^/]+\.ts$/);
const functions = await exportedFunctions(featureFiles);
const verbs = functions.filter(isVerb);

const walkers = Object.keys(WALKERS) as Walker[];

async function walk(step: (walker: Walker) => Promise<Verdict>): Promise<Record<string, Verdict>> {
  return Object.fromEntries(
    await Promise.all(walkers.map(async (walker) => [walker, await step(walker)] as const)),
  );
}

async function callVerb(verb: (context: Context, input: unknown) => Promise<unknown>, walker: Walker) {
  const { workshop, ...context } = await contextFor(services, people[walker], slug);
  try {
    await verb({ ...context, workshop, db: NOTHING.db, services: NOTHING }, {});
    return verdictOf(null);
  } catch (error) {
    if (error instanceof AppError) return verdictOf(error.code);
    // What a handler makes of an empty input is not the walk's concern.
    if (error instanceof TypeError) return verdictOf(null);
    throw error;
  }
}

describe('every endpoint', () => {
  test('is found', () => {
    expect(endpointFiles.length).toBeGreaterThan(20);
    expect(new Set(endpoints.map(({ file }) => file)).size).toBe(endpointFiles.length);
  });

  test('has a rule, and a method that fits it', () => {
    expect(endpoints.filter((found) => !isRoute(found)).map(({ file, name }) => `${file}: ${name}`)).toEqual(
      [],
    );
    const misfits = routes.filter(
      ({ name, thing }) => (name === 'GET') !== (thing.route.verb.rule.kind === 'read'),
    );
    expect(misfits.map(({ file, name }) => `${file}: ${name}`)).toEqual([]);
  });

  test('that is about a workshop names it in its path', () => {
    const strays = routes.filter(
      ({ file, thing }) => isWorkshopPermission(thing.route.verb.rule.may) !== file.includes('/[workshop]/'),
    );
    expect(strays.map(({ file }) => file)).toEqual([]);
  });

  test('that takes a write from any site is listed here', () => {
    expect(routes.filter(({ thing }) => thing.route.origin === 'any').map(({ file }) => file))
      .toMatchInlineSnapshot(`
      [
        "src/pages/api/bounces/[token].ts",
        "src/pages/api/subscriptions/[subscriber]/leave/[token].ts",
      ]
    `);
  });

  test('that writes lies below api', () => {
    const elsewhere = sourceFiles('src/pages', /\.(ts|astro)$/).filter(
      (file) => !file.startsWith('src/pages/api/'),
    );
    const writers = elsewhere.filter((file) =>
      /\b(POST|PUT|PATCH|DELETE|ALL)\b\s*[:=]|request\.(formData|json|text|body)/.test(sourceText(file)),
    );
    expect(writers).toEqual([]);
  });

  test.each(routes.map((found) => [`${found.name} ${found.file}`, found] as const))(
    '%s lets in whom the table lets in',
    async (_title, { file, thing }) => {
      const params = paramsOf(file);
      const verdicts = await walk(async (walker) =>
        verdictOf(
          codeOf(
            await callRoute(tripwires, thing, {
              params: { ...params, workshop: slug },
              actor: people[walker],
            }),
          ),
        ),
      );
      expect(verdicts).toEqual(
        Object.fromEntries(
          walkers.map((walker) => [walker, expectedVerdict(thing.route.verb.rule.may, walker)]),
        ),
      );
    },
  );
});

describe("every function of a feature's server folder", () => {
  test('has a rule, or is an inner piece that nothing outside imports', () => {
    const outside = [
      ...sourceFiles('src/pages', /\.(ts|tsx|astro)$/),
      ...sourceFiles('src/layouts', /\.(ts|tsx|astro)$/),
      ...sourceFiles('src/seed', /\.ts$/),
      ...sourceFiles('src/features', /\/components\/.*\.(ts|tsx|astro)$/),
      ...sourceFiles('src', /^src\/(cli\/.*|[^/]+)\.ts$/),
    ];
    const imports = new Map(outside.map((file) => [file, importsOf(file)]));
    const problems = functions
      .filter((found) => !isVerb(found))
      .flatMap(({ file, name }) => {
        const importers = outside.filter((importer) => imports.get(importer)?.includes(file));
        const mixed = verbs.some((verb) => verb.file === file);
        return [
          ...importers.map((importer) => `${file}: ${name} has no rule, and ${importer} imports it`),
          ...(mixed ? [`${file}: ${name} has no rule beside a function that has one`] : []),
        ];
      });
    expect(problems).toEqual([]);
  });

  test.each(verbs.map((found) => [found.name, found] as const))(
    '%s lets in whom the table lets in',
    async (_name, { thing }) => {
      expect(await walk((walker) => callVerb(thing, walker))).toEqual(
        Object.fromEntries(walkers.map((walker) => [walker, expectedVerdict(thing.rule.may, walker)])),
      );
    },
  );
});

describe('a workshop that is not there', () => {
  test.each(walkers)('is not found by %s, whatever the endpoint', async (walker) => {
    const ofWorkshops = routes.filter(({ thing }) => isWorkshopPermission(thing.route.verb.rule.may));
    const codes = await Promise.all(
      ofWorkshops.map(async ({ thing }) =>
        codeOf(
          await callRoute(tripwires, thing, { params: { workshop: 'no-such-shed' }, actor: people[walker] }),
        ),
      ),
    );
    expect(new Set(codes)).toEqual(new Set(['not_found']));
  });
});
