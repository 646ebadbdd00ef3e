import { describe, expect, it } from 'vitest';
import { PORT_THREADS } from '../../../../src/domain/ports/port-threads.ts';
import { portsWorksheet } from '../../../../src/domain/ports/ports-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

function ports(given: Readonly<Record<string, unknown>>) {
  const worked = runWorksheet(portsWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const names = (given: Readonly<Record<string, unknown>>) =>
  ports(given).result.candidates.map(({ name }) => name);
const refusal = (given: Readonly<Record<string, unknown>>) => {
  const worked = runWorksheet(portsWorksheet, given);
  return worked.ok ? '' : worked.error;
};

describe('Which thread this is', () => {
  it.each([
    [{ diameter: 16.6, pitch: '19 tpi' }, 'G 3/8'],
    [{ diameter: 16.6, pitch: '19 tpi', taper: 'no' }, 'G 3/8'],
    [{ diameter: 16.9, pitch: '18 tpi', taper: 'yes' }, '3/8 NPT'],
    [{ diameter: '0.53 in', pitch: '18 tpi', taper: 'yes' }, '1/4 NPT'],
    [{ diameter: 15.1, pitch: '19 tpi', side: 'internal', taper: 'no' }, 'G 3/8'],
    [{ diameter: 14.2, pitch: '18 tpi' }, '9/16-18 (JIC 6)'],
    [{ diameter: 17.9, pitch: '1.5 mm' }, 'M18x1.5'],
    [{ diameter: 20.8, pitch: '14 tpi', taper: 'no' }, 'G 1/2'],
  ])('%j is %s', (given, name) => {
    expect(names(given)).toContain(name);
  });

  it('tells 3/8 G from 3/8 NPT, and says why they must not go together', () => {
    expect(names({ diameter: 16.6, pitch: '19 tpi' })).toEqual(['G 3/8', 'R 3/8']);
    const [first] = ports({ diameter: 16.6, pitch: '19 tpi', taper: 'no' }).result.candidates;
    expect(first).toMatchObject({ name: 'G 3/8', sure: 'likely', angle: 55 });
    // 19 against 18 threads an inch, 55° against 60°: ISO 228-1 and ASME B1.20.1.
    expect(first?.neverWith).toContainEqual({
      name: '3/8 NPT',
      why: '19 tpi against 18 tpi, 55° against 60°, parallel against tapered',
    });
  });

  it('names threads that screw together fully and do not seal', () => {
    const [first] = ports({ diameter: 19, pitch: '16 tpi', side: 'external' }).result.candidates;
    expect(first?.neverWith.map(({ name }) => name)).toContain('3/4-16 (ORB 8)');
    const half = ports({ diameter: 20.9, pitch: '14 tpi', taper: 'no' }).result.candidates[0];
    expect(half?.neverWith).toContainEqual({
      name: '1/2 NPT',
      why: '55° against 60°, parallel against tapered',
    });
  });

  it('says that it is a guess without the pitch, and when nothing fits', () => {
    const guess = ports({ diameter: 16.6 });
    expect([guess.result.candidates[0]?.sure, guess.warnings.join(' ')]).toEqual([
      'possible',
      expect.stringContaining('guess'),
    ]);
    expect(ports({ diameter: 16.6, pitch: '40 tpi' }).warnings.join(' ')).toContain('No port thread');
  });

  it('has the taper threads narrower at the small end', () => {
    // ASME B1.20.1, 1/4-18: pitch diameter at the small end 0.47739 in; 0.8 of the pitch is the height: from memory.
    const quarter = PORT_THREADS.find(({ name }) => name === '1/4 NPT');
    expect(quarter?.external[0]).toBeCloseTo((0.47739 + 0.8 / 18) * 25.4 - 0.06, 2);
  });

  it('finds each thread by its own nominal size and pitch', () => {
    for (const { name, major, pitchName, family } of PORT_THREADS) {
      const diameter = family === 'NPT' ? major - 0.2 : major;
      expect(names({ diameter: diameter.toFixed(3), pitch: pitchName, side: 'external' })).toContain(name);
    }
  });

  it('never counts a thread among those that it must not meet', () => {
    for (const { candidates } of [16.6, 20.9, 26.4, 33.2].map((diameter) => ports({ diameter }).result))
      for (const { name, neverWith } of candidates)
        expect(neverWith.map((near) => near.name)).not.toContain(name);
  });

  it.each([
    [{}, 'Diameter'],
    [{ diameter: 500 }, '5 to 70 mm'],
    [{ diameter: -16 }, 'below zero'],
    [{ diameter: 16.6, pitch: '19' }, 'no unit'],
    [{ diameter: 16.6, pitch: 'fine' }, 'no pitch'],
    [{ diameter: 16.6, pitch: '0 tpi' }, '4 to 80'],
    [{ diameter: 16.6, pitch: '50 mm' }, '0.25 to 8'],
    [{ diameter: 16.6, side: 'both' }, 'external, internal'],
  ])('refuses %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
