import { describe, expect, it } from 'vitest';
import { fitWorksheet } from '../../../../src/domain/fits/fit-worksheet.ts';
import { seatsWorksheet } from '../../../../src/domain/fits/seats-worksheet.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
const fit = (given: Given) => {
  const worked = runWorksheet(fitWorksheet, given);
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
};
const seats = (given: Given) => {
  const worked = runWorksheet(seatsWorksheet, { bore: 25, outside: 52, turning: 'inner', ...given });
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
};

describe('The fit worksheet', () => {
  it('gives the limits of one part alone', () => {
    expect(fit({ size: 25, hole: 'H7' }).result).toEqual({
      hole: { lower: 0, upper: 21 },
      shaft: null,
      fit: null,
      takeOff: null,
    });
  });

  it('shows the numbers that it put in', () => {
    const { working } = fit({ size: '25 mm', hole: 'H7', shaft: 'k6' });
    expect(working.at(-2)).toMatchObject({ numbers: '0 − (+15)', value: '-15 µm' });
  });

  it('takes inches', () => {
    // 1 in is 25.4 mm: the step 18 to 30.
    expect(fit({ size: '1 in', hole: 'H7' }).result.hole).toEqual({ lower: 0, upper: 21 });
  });

  it('says what is still to come off, on diameter and on the dial, aimed at mid-limits', () => {
    // 25 k6 is 25.002 to 25.015, the middle 25.0085.
    const shaft = { size: 25, shaft: 'k6', measured: '25.31', instrument: '0.01', dial: 'radius' };
    expect(fit(shaft).result.takeOff).toEqual({
      verdict: 'outside',
      aim: 25.0085,
      onDiameter: 0.3015,
      onDial: 0.15075,
      pastLimit: false,
    });
    expect(fit({ size: 25, hole: 'H7', measured: '24.9' }).result.takeOff).toMatchObject({
      onDiameter: 0.1105,
    });
  });

  it.each([
    ['25.009', '0.001', 'inside'],
    ['25.015', '0', 'inside'],
    ['25.009', '0.01', 'can’t tell with this'],
    ['25.02', '0.01', 'can’t tell with this'],
    ['25.03', '0.01', 'outside'],
  ])('a shaft 25 k6 measured %s with ±%s is %s', (measured, instrument, verdict) => {
    expect(fit({ size: 25, shaft: 'k6', measured, instrument }).result.takeOff?.verdict).toBe(verdict);
  });

  it('says when too much is off already', () => {
    expect(fit({ size: 25, shaft: 'k6', measured: '24.99' }).warnings.join(' ')).toContain(
      'past its last limit',
    );
  });

  it.each([
    [{ size: 25 }, 'Give a hole'],
    [{ size: 25, hole: 'k6' }, 'is a shaft’s'],
    [{ size: 0, hole: 'H7' }, 'above zero'],
    [{ size: -25, hole: 'H7' }, 'below zero'],
    [{ size: 600, hole: 'H7' }, '500 mm'],
    [{ size: 'M12', hole: 'H7' }, 'Nominal size'],
    [{ size: 25, hole: 7 }, 'no tolerance class'],
    [{ size: 25, hole: 'H7', shaft: 'k6', measured: 25 }, 'was measured'],
  ])('refuses %j', (given, sentence) => {
    const worked = runWorksheet(fitWorksheet, given);
    expect(worked.ok ? '' : worked.error).toContain(sentence);
  });
});

describe('Bearing seats', () => {
  // A bearing maker's table for 18 to 30 mm bores, Normal class: theoretical interference, µm.
  it.each([
    ['k5', -21, -2],
    ['k6', -25, -2],
    ['m5', -27, -8],
    ['m6', -31, -8],
    ['n5', -34, -15],
    ['g6', -3, 20],
    ['h6', -10, 13],
    ['h5', -10, 9],
    ['j5', -15, 4],
    ['j6', -19, 4],
    ['js6', -16.5, 6.5],
  ])('on %s the inner ring has a clearance from %d to %d', (shaft, least, most) => {
    expect(seats({ shaft, housing: 'H7' }).result.inner.fit).toMatchObject({ least, most });
  });

  it('warns when both rings are tight', () => {
    expect(seats({ shaft: 'k6', housing: 'N7' }).warnings.join(' ')).toContain('Both rings are tight');
    expect(seats({ shaft: 'k6', housing: 'H7' }).warnings).toEqual([]);
  });

  it('wants the ring tight that turns under the load', () => {
    // A wheel on a dead axle: makers’ catalogues seat its inner ring g6 or h6.
    const wheel = seats({ shaft: 'g6', housing: 'N7', turning: 'outer' });
    expect([wheel.warnings, wheel.result.usualShaft]).toEqual([[], expect.stringContaining('g6')]);
    expect(seats({ shaft: 'g6', housing: 'H7' }).warnings.join(' ')).toContain('creeps');
  });

  it('refuses a bearing that cannot be', () => {
    const worked = runWorksheet(seatsWorksheet, {
      bore: 52,
      outside: 25,
      shaft: 'k6',
      housing: 'H7',
      turning: 'inner',
    });
    expect(worked.ok).toBe(false);
  });
});
