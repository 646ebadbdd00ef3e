import { describe, expect, it } from 'vitest';
import { wrong } from '../../../src/domain/answer.ts';
import { answerLine } from '../../../src/cli/answer-line.ts';
import { runCommand } from '../../../src/cli/run-command.ts';

const FILES: Readonly<Record<string, string>> = {};
const read = (path: string) => {
  const text = FILES[path];
  return text === undefined ? wrong(`The file ${path} cannot be read.`) : { ok: true as const, value: text };
};
const run = (...args: string[]) => runCommand(args, read);
const ask = (request: unknown) => answerLine(JSON.stringify(request));

describe('sections', () => {
  it('prints the mass of a metre and of the length', () => {
    expect(run('sections', '--flat', '50x12', '--length', '6000')).toEqual({
      ok: true,
      value: '{"kgPerM":4.71,"kg":28.26}\n',
    });
    expect(ask({ tool: 'sections', flat: '50x12' })).toEqual({ ok: true, value: { kgPerM: 4.71 } });
  });
});

describe('fit', () => {
  it('prints limits and clearance in micrometres', () => {
    expect(run('fit', '--size', '25', '--hole', 'H7', '--shaft', 'k6')).toEqual({
      ok: true,
      value: '{"hole":[0,21],"shaft":[2,15],"clearance":[-15,19],"fit":"transition"}\n',
    });
    expect(ask({ tool: 'fit', size: 25, hole: 'H7' })).toEqual({ ok: true, value: { hole: [0, 21] } });
  });

  it('has the seats of a bearing beside it', () => {
    const asked = { tool: 'seats', bore: 25, outside: 52, shaft: 'k6', housing: 'H7', turning: 'inner' };
    expect(ask(asked)).toMatchObject({ value: { inner: { fit: { least: -25, most: -2 } }, warnings: [] } });
  });
});

describe('Wrong input', () => {
  it.each([
    [['sections'], 'Give one section'],
    [['sections', '50x12'], 'by its option'],
    [['sections', '--flat', '50x12', '--density', 'heavy'], 'Density'],
    [['fit', '--size', '25'], 'Give a hole'],
    [['fit', '--size', '501', '--hole', 'H7'], '500 mm'],
    [['fit', '--size', '-25', '--hole', 'H7'], 'not understood'],
    [['seats', '--bore', '25'], 'Outside diameter'],
  ])('%j gets a sentence', (args, sentence) => {
    const answer = run(...args);
    expect(answer.ok ? '' : answer.error).toContain(sentence);
    expect(answer.ok ? '' : answer.error).not.toContain('\n');
  });
});
