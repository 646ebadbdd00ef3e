import { beforeAll, describe, expect, it } from 'vitest';
import { wrong } from '../../../src/domain/answer.ts';
import { answerLine } from '../../../src/cli/answer-line.ts';
import { prepareCommand, runCommand } from '../../../src/cli/run-command.ts';

const FILES: Readonly<Record<string, string>> = {
  'pieces.csv': 'length,quantity\n1200,4\n850,6\n',
  'long.csv': '7000,1',
  'stages.json': JSON.stringify({
    start: '2026-03-02',
    hours: [0, 0, 4, 0, 0, 6, 0],
    stages: [
      { id: 'cut', work: 4 },
      { id: 'weld', work: 6, after: ['cut'] },
      { id: 'paint', work: 2, after: ['weld'], wait: 2 },
      { id: 'order', work: 0, notBefore: '2026-03-04' },
    ],
  }),
  'circle.json': '[{"id":"a","work":1,"after":["b"]},{"id":"b","work":1,"after":["a"]}]',
  'no.json': 'stages',
};
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

describe('stock', () => {
  beforeAll(() => prepareCommand(['stock']));

  it('prints a plan with its proof', () => {
    const answer = run('stock', '--length', '6000', '--kerf', '2.5', 'pieces.csv');
    expect(JSON.parse(answer.ok ? answer.value : '')).toMatchObject({
      bars: 2,
      lowerBound: 2,
      optimal: true,
      plan: [{ stock: 6000 }, { stock: 6000 }],
    });
  });

  it('answers a batch by the same names', () => {
    expect(ask({ tool: 'stock', length: 6000, kerf: 2.5, pieces: [[1200, 4]], offcuts: [2400] })).toEqual({
      ok: true,
      value: {
        bars: 1,
        lowerBound: 1,
        optimal: true,
        plan: [
          { stock: 2400, offcut: true, pieces: [1200], marks: [1200], left: 1197.5 },
          { stock: 6000, pieces: [1200, 1200, 1200], marks: [1200, 2402.5, 3605], left: 2392.5 },
        ],
      },
    });
  });
});

describe('Wrong lists', () => {
  it.each([
    [{ tool: 'schedule', stages: [] }, 'no stages'],
    [{ tool: 'schedule', start: '2026-03-02', stages: [{ id: 'a', work: 1 }] }, 'together'],
    [
      { tool: 'schedule', start: '2026-03-02', hours: [0, 0, 0, 0, 0, 0, 0], stages: [{ id: 'a', work: 1 }] },
      'shop hours',
    ],
    [{ tool: 'schedule', stages: [{ id: 'a', work: -1 }] }, 'not below zero'],
    [{ tool: 'schedule', stages: [{ id: 'a', work: [3, 2, 1] }] }, 'have to rise'],
    [{ tool: 'schedule', stages: [{ id: 'a', work: 1, notBefore: '2026-03-02' }] }, 'a number otherwise'],
  ])('%j gets a sentence', (request, sentence) => {
    const answer = ask(request);
    expect(answer.ok ? '' : answer.error).toContain(sentence);
  });
});

describe('ram, weld and ports', () => {
  const parsed = (...args: string[]) => {
    const answer = run(...args);
    return JSON.parse(answer.ok ? answer.value : answer.error) as Record<string, unknown>;
  };

  it('print their result with what was not checked and the cautions beside it', () => {
    const pump = '11 gpm@650psi,3 gpm@2500psi';
    const ram = parsed(
      'ram',
      '--bore',
      '100',
      '--rod',
      '45',
      '--stroke',
      '600',
      '--pressure',
      '2500 psi',
      '--pump',
      pump,
    );
    // π/4 × 100² mm2 × 17.2369 N/mm2
    expect(ram).toMatchObject({ extendForce: { kN: expect.closeTo(135.378, 2) }, warnings: [] });
    expect(ram['notChecked']).toContainEqual(expect.stringContaining('Rod and frame not checked'));
    expect([ram['cautions'], ram['guide']]).toEqual([
      expect.arrayContaining([expect.stringContaining('never feel for a leak')]),
      expect.stringContaining('not a design approval'),
    ]);
  });

  it('answer a batch by the same names', () => {
    const weld = { electrode: 'E7018', diameter: 3.2, leg: 5, length: 400, thickness: 10, other: 12 };
    expect(ask({ tool: 'weld', ...weld })).toMatchObject({ value: { currentA: [110, 160], leastLegMm: 5 } });
    expect(ask({ tool: 'ports', diameter: 16.6, pitch: '19 tpi' })).toMatchObject({
      value: { candidates: [{ name: 'G 3/8' }, { name: 'R 3/8' }] },
    });
  });
});

describe('schedule', () => {
  it('prints dates in shop hours, and the critical chain', () => {
    // 2 March 2026 is a Monday: four hours on Wednesdays, six on Saturdays.
    const answer = run('schedule', 'stages.json');
    expect(JSON.parse(answer.ok ? answer.value : answer.error)).toMatchObject({
      endDate: '2026-03-13',
      critical: ['cut', 'weld', 'paint'],
      stages: [
        { id: 'cut', earliestStartDate: '2026-03-02', earliestEndDate: '2026-03-04', slack: 0 },
        { id: 'order', earliestStartDate: '2026-03-04', critical: false },
        { id: 'weld', earliestEndDate: '2026-03-07' },
        { id: 'paint', earliestEndDate: '2026-03-13' },
      ],
    });
  });

  it('takes three guesses in a batch', () => {
    const stages = [
      { id: 'a', work: [1, 2, 9] },
      { id: 'b', work: 1, after: ['a'] },
    ];
    expect(ask({ tool: 'schedule', stages })).toMatchObject({
      value: { end: 4, critical: ['a', 'b'], variance: expect.closeTo(16 / 9, 12) },
    });
  });
});

describe('holes, drive, beam and square', () => {
  it('answer in the same manner', () => {
    expect(ask({ tool: 'holes', thread: 'M8' })).toMatchObject({ value: { tappingDrillMm: 6.8 } });
    expect(ask({ tool: 'drive', rpm: 1440, driver: 80, driven: 240 })).toMatchObject({ value: { rpm: 480 } });
    expect(
      ask({ tool: 'beam', case: 'simple-centre', span: 1200, load: '1 kN', bar: '12x50' }),
    ).toMatchObject({
      value: { momentNm: 300, guide: expect.stringContaining('not a design approval') },
    });
    expect(ask({ tool: 'square', width: 300, height: 400 })).toMatchObject({ value: { diagonalMm: 500 } });
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
    [['stock', 'pieces.csv'], 'Give the length'],
    [['schedule'], 'Give one list'],
    [['schedule', 'no.json'], 'no JSON'],
    [['schedule', 'circle.json'], 'in a circle: a, b'],
    [['stock', '--length', '6000'], 'Give one list'],
    [['stock', '--length', '6000', 'lost.csv'], 'cannot be read'],
    [['stock', '--length', '6000', 'long.csv'], 'longer than any bar'],
    [['stock', '--length', 'long', 'pieces.csv'], 'Bar'],
    [['stock', '--length', '6000', '--kerf', '1/2', 'pieces.csv'], 'Kerf'],
  ])('%j gets a sentence', (args, sentence) => {
    const answer = run(...args);
    expect(answer.ok ? '' : answer.error).toContain(sentence);
    expect(answer.ok ? '' : answer.error).not.toContain('\n');
  });
});
