import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';

function start(args: readonly string[], input = '') {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'src/cli/main.ts', ...args],
    { input, encoding: 'utf8' },
  );
  return { status, stdout, stderr };
}

describe('The command line', { timeout: 60_000 }, () => {
  it('prints JSON and nothing else, and ends with 0', () => {
    expect(start(['length', '1 in'])).toEqual({
      status: 0,
      stdout: '{"mm":25.4,"in":1,"fraction":"1","fractionErrorMm":0}\n',
      stderr: '',
    });
  });

  it('says on standard error what is wrong, and ends with 2', () => {
    expect(start(['length', '12'])).toEqual({
      status: 2,
      stdout: '',
      stderr: `12 has no unit. Write it as 38.1 mm, 1-1/2 in or 3'-4".\n`,
    });
  });

  it('answers each line of a batch, wrong ones too, and ends with 0', () => {
    const { status, stdout, stderr } = start(
      ['batch'],
      '{"tool":"length","text":"1 in"}\n\n{"tool":"fly"}\r\n{"tool":"length","text":"2 in"}',
    );
    const answers = stdout
      .trimEnd()
      .split('\n')
      .map((line) => JSON.parse(line) as { ok: boolean });
    expect(answers.map(({ ok }) => ok)).toEqual([true, false, true]);
    expect([status, stderr]).toEqual([0, '']);
  });
});
