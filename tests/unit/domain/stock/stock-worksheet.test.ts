import { describe, expect, test } from 'vitest';
import { stockWorksheet } from '../../../../src/domain/stock/stock-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

/** Without a solver: what is proven is what the volume of the pieces proves. */
const sheet = stockWorksheet({ solve: () => null, secondsLeft: () => 1 });
const usual = { pieces: '1200, 4, rail\n800, 6', length: '6000', kerf: '2.5' };

describe('a cutting plan as it was typed', () => {
  test('names its pieces and marks them from one end, with the kerf between', () => {
    const worked = runWorksheet(sheet, { ...usual, pieces: '1200, 2, rail' });
    expect(worked).toMatchObject({
      value: {
        result: {
          bought: 1,
          lowerBound: 1,
          bars: [
            {
              stock: 6000,
              pieces: [
                { length: 1200, name: 'rail', mark: 1200 },
                { length: 1200, name: 'rail', mark: 2402.5 },
              ],
              left: 3595,
            },
          ],
        },
      },
    });
  });

  test('uses offcuts first, and takes inches', () => {
    const worked = runWorksheet(sheet, { ...usual, pieces: '20 in, 1', offcuts: '2 ft, 800' });
    expect(worked).toMatchObject({
      value: { result: { bought: 0, bars: [{ offcut: true, stock: 609.6 }] } },
    });
  });

  test('says when the number of bars is not proven', () => {
    // Three pieces of 3100 fill no bar together, though their lengths would go into two.
    const worked = runWorksheet(sheet, { pieces: '3100, 3', length: '6000' });
    expect(worked).toMatchObject({ value: { result: { bought: 3, lowerBound: 2 } } });
    expect(worked.ok && worked.value.warnings).toEqual([expect.stringContaining('not proven')]);
  });

  test.each([
    [{ pieces: '' }, 'Give the pieces'],
    [{ pieces: '7000, 1' }, 'longer than any bar'],
    [{ pieces: '1200, none' }, 'whole number'],
    [{ pieces: 'x'.repeat(4001) }, '4000 characters'],
    [{ length: '' }, 'Bars that can be bought'],
    [{ length: '6000, -1' }, 'Bars that can be bought'],
    [{ offcuts: Array.from({ length: 21 }, () => '800').join(',') }, 'at most 20'],
    [{ kerf: 'thin' }, 'What the saw takes'],
  ])('refuses %j with a sentence', (given, sentence) => {
    const worked = runWorksheet(sheet, { ...usual, ...given });
    expect(worked).toMatchObject({ ok: false, error: expect.stringContaining(sentence) as string });
  });
});
