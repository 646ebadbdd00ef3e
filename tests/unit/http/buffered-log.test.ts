import { pino } from 'pino';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { bufferLines } from '../../../src/server/http/buffered-log.ts';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

test('lines are passed on together, whole and in order, at most 200 ms late', () => {
  const write = vi.fn();
  const log = pino({ base: null, timestamp: false }, bufferLines({ write }));
  log.info('first');
  log.info('second');
  expect(write).not.toHaveBeenCalled();
  vi.advanceTimersByTime(200);
  expect(write.mock.calls).toEqual([['{"level":30,"msg":"first"}\n{"level":30,"msg":"second"}\n']]);
});

test('many lines do not wait', () => {
  const write = vi.fn<(lines: string) => void>();
  const log = pino({ base: null, timestamp: false }, bufferLines({ write }));
  for (let count = 0; count < 1_000; count += 1) log.info('a line of some length, so that they add up');
  expect(write).toHaveBeenCalled();
  vi.advanceTimersByTime(200);
  expect(write.mock.calls.flatMap(([lines]) => lines.trimEnd().split('\n'))).toHaveLength(1_000);
});

test('what is still held is written when the process ends', () => {
  const write = vi.fn();
  const before = process.listeners('exit');
  pino({ base: null, timestamp: false }, bufferLines({ write })).info('last words');
  const [added] = process.listeners('exit').filter((listener) => !before.includes(listener));
  added?.call(process, 0);
  expect(write.mock.calls).toEqual([['{"level":30,"msg":"last words"}\n']]);
});
