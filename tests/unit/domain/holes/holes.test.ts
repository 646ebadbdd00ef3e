import { describe, expect, it } from 'vitest';
import { holesWorksheet } from '../../../../src/domain/holes/holes-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
function holes(given: Given) {
  const worked = runWorksheet(holesWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(holesWorksheet, given);
  return worked.ok ? '' : worked.error;
};

describe('Holes to be tapped', () => {
  // Three published charts of tapping drills that agree.
  it.each([
    ['M3', 2.5],
    ['M4', 3.3],
    ['M5', 4.2],
    ['M6', 5],
    ['M8', 6.8],
    ['M10', 8.5],
    ['M12', 10.2],
    ['M14', 12],
    ['M16', 14],
    ['M20', 17.5],
    ['M24', 21],
    ['M30', 26.5],
    ['M8x1', 7],
    ['M10x1.25', 8.75],
    ['M12 x 1.25', 10.75],
  ])('%s take a drill of %d mm', (thread, drill) => {
    expect(holes({ thread }).result.tappingDrillMm).toBe(drill);
  });

  it('say the exact size beside the drill of the charts', () => {
    expect(holes({ thread: 'M8' }).result).toMatchObject({ tappingExactMm: 6.75, tappingDrillMm: 6.8 });
  });

  // A maker's chart of inch drills.
  it.each([
    ['#8-32', '#29', 3.4544],
    ['10-24', '#25', 3.7973],
    ['1/4-20 UNC', '#7', 5.1054],
    ['5/16-18', 'F', 6.5278],
    ['3/8-16', '5/16', 7.9375],
    ['7/16-14', 'U', 9.3472],
    ['1/2-13', '27/64', 10.715625],
  ])('%s take drill %s', (thread, tappingDrill, tappingDrillMm) => {
    expect(holes({ thread }).result).toMatchObject({ tappingDrill, tappingDrillMm });
  });
});

describe('Clearance holes', () => {
  // ISO 273, as two sellers' tables agree; M16 by two of three, and against the one that has 17/18/19.
  it.each([
    ['M3', 3.2, 3.4, 3.6],
    ['M8', 8.4, 9, 10],
    ['M10', 10.5, 11, 12],
    ['M12', 13, 13.5, 14.5],
    ['M16', 17, 17.5, 18.5],
    ['M20', 21, 22, 24],
  ])('of %s', (thread, fine, medium, coarse) => {
    expect(holes({ thread }).result.clearanceMm).toEqual({ fine, medium, coarse });
  });
});

describe('Split pins', () => {
  // ISO 1234, from memory; the mean shank of each agrees with an open parts list made from the standard.
  it.each([
    [{ bolt: 12 }, 3.2, [2.7, 2.9]],
    [{ bolt: 16 }, 4, [3.5, 3.7]],
    [{ clevis: 10 }, 3.2, [2.7, 2.9]],
    [{ clevis: 12 }, 3.2, [2.7, 2.9]],
    [{ clevis: 12, transverse: true }, 4, [3.5, 3.7]],
  ])('for %j are %d mm, in a hole of that size', (given, nominal, shankMm) => {
    expect(holes(given).result.splitPin).toEqual({ nominal, holeMm: nominal, shankMm });
  });

  it('carry the warning that a published list has larger holes', () => {
    expect(holes({ bolt: 12 }).warnings.join(' ')).toContain('Check ISO 1234');
  });
});

describe('No hole', () => {
  it.each([
    [{}, 'Give one of'],
    [{ thread: 'M8', bolt: 8 }, 'Give one of'],
    [{ thread: 'M7' }, 'not known here'],
    [{ thread: 'M8x2' }, 'M8 has 1.25 mm'],
    [{ thread: 'M8x0' }, 'Pitch'],
    [{ thread: 'toString' }, 'no thread'],
    [{ thread: '3/8 NPT' }, 'no thread'],
    [{ bolt: 200 }, 'no split pin'],
    [{ bolt: '-1' }, 'below zero'],
  ])('for %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
