import { afterEach, beforeEach, expect, vi } from 'vitest';

// A test that makes noise hides the next problem: console.error and console.warn fail it.
beforeEach(() => {
  vi.spyOn(console, 'error');
  vi.spyOn(console, 'warn');
});

afterEach(() => {
  const noise = [...vi.mocked(console.error).mock.calls, ...vi.mocked(console.warn).mock.calls];
  vi.restoreAllMocks();
  expect(noise, 'the test printed to console.error or console.warn').toEqual([]);
});
