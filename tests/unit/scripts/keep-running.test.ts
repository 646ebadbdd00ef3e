import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { keepRunning } from '../../../scripts/keep-running.ts';
import { type Part } from '../../../scripts/part.ts';
import { type Running } from '../../../scripts/running.ts';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

/** A part of which a test ends the newest process by hand. */
function handPart() {
  const ends: ((how: string) => void)[] = [];
  const part: Part = {
    name: 'worker',
    start: (onSpawn) => {
      let end: (how: string) => void = () => undefined;
      const ended = new Promise<string>((resolve) => (end = resolve));
      ends.push(end);
      const running: Running = {
        pid: 1,
        ended,
        stop: async () => {
          end('was ended by SIGTERM');
          await ended;
        },
      };
      onSpawn(running);
      return Promise.resolve(running);
    },
  };
  const lines: string[] = [];
  const given: string[] = [];
  const kept = keepRunning(
    part,
    (line) => lines.push(line),
    (sentence) => given.push(sentence),
  );
  return { kept, lines, given, ends, crash: (how: string) => ends.at(-1)?.(how) };
}

test('a part that ends by itself is reported by name and started again', async () => {
  const { kept, crash, lines, ends } = handPart();
  await kept.started;
  crash('was ended by SIGKILL');
  await vi.advanceTimersByTimeAsync(1000);
  expect(lines).toEqual(['worker was ended by SIGKILL; starting it again.', 'worker is running again.']);
  expect(ends).toHaveLength(2);
});

test('it gives up after five crashes within a minute', async () => {
  const { kept, crash, given, ends } = handPart();
  await kept.started;
  for (let crashes = 0; crashes < 5; crashes += 1) {
    crash('ended with status 1');
    await vi.advanceTimersByTimeAsync(5000);
  }
  expect(given).toEqual([
    'worker ended with status 1 for the 5th time within a minute; what it said is above.',
  ]);
  expect(ends).toHaveLength(5);
});

test('five crashes spread over many minutes are no reason to give up', async () => {
  const { kept, crash, given } = handPart();
  await kept.started;
  for (let crashes = 0; crashes < 8; crashes += 1) {
    crash('ended with status 1');
    await vi.advanceTimersByTimeAsync(30_000);
  }
  expect(given).toEqual([]);
});

test('a part that is stopped is not started again', async () => {
  const { kept, lines, ends } = handPart();
  await kept.started;
  await kept.stop();
  await vi.advanceTimersByTimeAsync(60_000);
  expect(lines).toEqual([]);
  expect(ends).toHaveLength(1);
});

test('a restart that was asked for is no crash', async () => {
  const { kept, given, ends } = handPart();
  await kept.started;
  for (let restarts = 0; restarts < 10; restarts += 1) {
    await kept.restart();
    await vi.advanceTimersByTimeAsync(10);
  }
  expect(given).toEqual([]);
  expect(ends).toHaveLength(11);
});

test('a part that cannot be started the first time says so to its starter', async () => {
  const part: Part = { name: 'web', start: () => Promise.reject(new Error('no port')) };
  const kept = keepRunning(
    part,
    () => undefined,
    () => undefined,
  );
  await expect(kept.started).rejects.toThrow('no port');
  await kept.stop();
});
