import { expect, test } from 'vitest';
import { listEndpoints } from '../../../scripts/openapi.ts';
import { describeApi } from '../../../src/server/http/describe-api.ts';
import { sourceFiles } from '../../support/authorisation/find-ruled.ts';

interface Operation {
  readonly operationId: string;
  readonly security: readonly unknown[];
  readonly parameters?: readonly { readonly name: string; readonly in: string; readonly required: boolean }[];
  readonly requestBody?: { readonly content: Readonly<Record<string, { readonly schema: unknown }>> };
  readonly responses: Readonly<Record<string, { readonly description: string }>>;
}

const endpoints = await listEndpoints();
const document = describeApi(endpoints, 'https://press.example') as {
  readonly openapi: string;
  readonly info: { readonly title: string; readonly version: string };
  readonly paths: Readonly<Record<string, Readonly<Record<string, Operation>>>>;
};
const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, ...operation })),
);

test('every endpoint is in the description of the API', () => {
  const paths = sourceFiles('src/pages/api', /\.ts$/).map((file) =>
    file
      .replace('src/pages', '')
      .replace(/(\/index)?\.ts$/, '')
      .replace(/\[(\w+)\]/g, '{$1}'),
  );
  expect(Object.keys(document.paths).sort()).toEqual(paths.sort());
  expect(operations.length).toBe(endpoints.length);
});

test('it is a document as OpenAPI 3.1 asks', () => {
  expect(document.openapi).toMatch(/^3\.1\.\d+$/);
  expect(document.info).toMatchObject({
    title: expect.any(String) as string,
    version: expect.any(String) as string,
  });
  expect(new Set(operations.map(({ operationId }) => operationId)).size).toBe(operations.length);
  for (const { path, method, parameters = [], requestBody, responses } of operations) {
    expect(['get', 'post'], path).toContain(method);
    // Every name in a path template is a parameter of it that is always given, and no other is.
    const named = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
    const inPath = parameters.filter((one) => one.in === 'path');
    expect(
      inPath.map(({ name }) => name),
      path,
    ).toEqual(named);
    expect(
      inPath.every(({ required }) => required),
      path,
    ).toBe(true);
    expect(method === 'post', path).toBe(requestBody !== undefined);
    expect(Object.keys(requestBody?.content ?? { any: 1 }).length, path).toBeGreaterThan(0);
    for (const { description } of Object.values(responses)) expect(description, path).not.toBe('');
  }
  expect(JSON.stringify(document)).not.toContain('"$schema"');
});

test('it says what a route takes, answers and asks of who calls it', () => {
  const stage = document.paths['/api/workshops/{workshop}/builds/{build}/stages']?.['post'];
  expect(stage).toMatchObject({
    'x-permission': 'build.change',
    'x-who-may': ['owner', 'editor'],
    security: [{ session: [] }],
    requestBody: {
      content: {
        'application/json': { schema: { required: ['name'], properties: { name: { type: 'string' } } } },
        'application/x-www-form-urlencoded': {},
      },
    },
  });
  expect(document.paths['/api/account/sign-in']?.['post']?.security).toEqual([]);
  const parts = document.paths['/api/workshops/{workshop}/builds/{build}/parts/import']?.['post'];
  expect(Object.keys(parts?.requestBody?.content ?? {})).toContain('multipart/form-data');
});
