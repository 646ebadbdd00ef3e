import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { addUp, countEndToEnd, countVitest } from '../../../scripts/test-counts.mjs';
import { throwawayFolder } from '../../support/throwaway.ts';

const folder = throwawayFolder('counts');
afterAll(folder.remove);

function report(name: string, content: unknown): string {
  const file = join(folder.path, name);
  writeFileSync(file, JSON.stringify(content));
  return file;
}

test('both runners are added up in one line', () => {
  expect(
    addUp([
      { status: 0, counts: { passed: 10, failed: 0, skipped: 2 } },
      { status: 0, counts: { passed: 5, failed: 0, skipped: 1 } },
    ]),
  ).toEqual({ line: '15 passed, 0 failed, 3 skipped', status: 0 });
});

test('a failed test fails the run', () => {
  const sum = addUp([{ status: 1, counts: { passed: 10, failed: 3, skipped: 0 } }]);
  expect(sum).toEqual({ line: '10 passed, 3 failed, 0 skipped', status: 1 });
});

test('a runner that crashed without a report counts as one failure', () => {
  const sum = addUp([
    { status: 0, counts: { passed: 10, failed: 0, skipped: 0 } },
    { status: 134, counts: undefined },
  ]);
  expect(sum).toEqual({ line: '10 passed, 1 failed, 0 skipped', status: 1 });
});

test('a run in which nothing ran has failed', () => {
  expect(addUp([{ status: 0, counts: { passed: 0, failed: 0, skipped: 4 } }]).status).toBe(1);
});

test('a test file that could not be loaded counts as one failure', () => {
  const file = report('vitest.json', {
    numPassedTests: 2,
    numFailedTests: 1,
    numPendingTests: 1,
    numTodoTests: 1,
    testResults: [
      { status: 'failed', assertionResults: [] },
      { status: 'failed', assertionResults: [{ status: 'failed' }] },
      { status: 'passed', assertionResults: [{}, {}] },
    ],
  });
  expect(countVitest(file)).toEqual({ passed: 2, failed: 2, skipped: 2 });
});

test('errors outside the end-to-end tests count as failures', () => {
  const file = report('end-to-end.json', {
    stats: { expected: 4, unexpected: 1, flaky: 0, skipped: 2 },
    errors: [{ message: 'the copy did not start' }],
  });
  expect(countEndToEnd(file)).toEqual({ passed: 4, failed: 2, skipped: 2 });
});

test('a missing report gives no counts', () => {
  expect(countVitest(join(folder.path, 'none.json'))).toBeUndefined();
  expect(countEndToEnd(join(folder.path, 'none.json'))).toBeUndefined();
});
