import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { hollowSection, roundTube, solidBar, solidRound } from '../../../../src/domain/beam/beam-section.ts';
import { beamWorksheet } from '../../../../src/domain/beam/beam-worksheet.ts';
import { BEAM_CASES, bend } from '../../../../src/domain/beam/bend.ts';
import { runWorksheet } from '../../../../src/domain/worksheets/worksheet.ts';

type Given = Readonly<Record<string, unknown>>;
const OURS: Given = { case: 'simple-centre', span: 1200, load: '1 kN', bar: '12x50' };
function beam(given: Given) {
  const worked = runWorksheet(beamWorksheet, { ...OURS, ...given });
  if (!worked.ok) throw new Error(worked.error);
  return worked.value;
}
const refusal = (given: Given) => {
  const worked = runWorksheet(beamWorksheet, { ...OURS, ...given });
  return worked.ok ? '' : worked.error;
};

describe('A section in bending', () => {
  it('of a round 25 has 1534 mm3, and 195.6 N/mm2 under 300 N·m', () => {
    // σ = 32 M / (π d³): computed by hand.
    const round = solidRound(25);
    expect(round.inertia / 12.5).toBeCloseTo(1534, 0);
    expect(bend('cantilever-end', 5000, 60, round, 210_000).stress).toBeCloseTo(195.6, 1);
  });

  it('of hollow 100x100x5 cold formed has 271 cm4, 80x80x5 131', () => {
    // Tables after EN 10219-2: from memory.
    const [large, small] = [hollowSection(100, 100, 5), hollowSection(80, 80, 5)];
    expect(large.ok ? large.value.inertia / 1e4 : 0).toBeCloseTo(271, 0);
    expect(small.ok ? small.value.inertia / 1e4 : 0).toBeCloseTo(131, 0);
  });

  it('of a tube is less than of the round', () => {
    const tube = roundTube(40, 3);
    expect(tube.ok && tube.value.inertia < solidRound(40).inertia).toBe(true);
  });
});

describe('A beam', () => {
  it('on two supports', () => {
    // M = 1000 × 1200 / 4; I = 12 × 50³ / 12; δ = F L³ / 48 E I: computed by hand.
    const { result } = beam({});
    expect(result).toMatchObject({ momentNm: 300, inertiaMm4: 125_000, stressNPerMm2: 60, shearN: 500 });
    expect(result.deflectionMm).toBeCloseTo(1.3714, 4);
  });

  it('built in at one end', () => {
    const { result } = beam({ case: 'cantilever-end', load: '300 N' });
    expect(result).toMatchObject({ momentNm: 360, stressNPerMm2: 72 });
    expect(result.deflectionMm).toBeCloseTo((300 * 1200 ** 3) / (3 * 210_000 * 125_000), 9);
  });

  it('bends more, never less, under more load', () => {
    fc.assert(
      fc.property(fc.constantFrom(...BEAM_CASES), fc.integer({ min: 1, max: 999 }), (which, newtons) => {
        const [less, more] = [newtons, newtons + 1].map((load) =>
          bend(which, load, 1000, solidBar(20, 60), 210_000),
        );
        expect(more!.deflection).toBeGreaterThan(less!.deflection);
        expect(more!.stress).toBeGreaterThan(less!.stress);
      }),
    );
  });

  it('spread over its length bends less than with the load in the worst place', () => {
    const section = solidBar(20, 60);
    const of = (which: (typeof BEAM_CASES)[number]) => bend(which, 1000, 1000, section, 210_000).deflection;
    expect(of('simple-uniform')).toBeLessThan(of('simple-centre'));
    expect(of('cantilever-uniform')).toBeLessThan(of('cantilever-end'));
  });

  it('gives no verdict, and says what it does not check', () => {
    const { notChecked, cautions, warnings } = beam({});
    expect([cautions.includes('load'), warnings]).toEqual([true, []]);
    expect(notChecked.join(' ')).toContain('sideways');
  });

  it.each([
    [{ case: 'fixed-fixed' }, 'Choose one of'],
    [{ span: 400 }, 'at least ten times the height'],
    [{ load: '20 kN' }, 'above the yield'],
    [{ load: '20 tons' }, 'Say which'],
    [{ load: '0 N' }, 'above zero'],
    [{ bar: undefined }, 'one section'],
    [{ round: 30 }, 'one section'],
    [{ bar: undefined, pipe: '20x10' }, 'no bore'],
    [{ bar: undefined, round: 1, span: 1000, load: '0.5 N', yield: '9 GPa' }, 'a tenth of its span'],
  ])('refuses %j', (given, sentence) => {
    expect(refusal(given)).toContain(sentence);
  });
});
