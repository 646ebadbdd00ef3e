import { describe, expect, it } from 'vitest';
import { type Cue } from '../../../../src/domain/captions/cue.ts';
import { alignCaptions } from '../../../../src/domain/place/align-captions.ts';

/** Captions of two seconds each, one after another from a moment on, in milliseconds. */
function spoken(lines: readonly string[], from = 0): Cue[] {
  return lines.map((line, index) => ({
    start: from + index * 2000,
    end: from + index * 2000 + 2000,
    lines: [line],
  }));
}

function align(before: readonly Cue[], now: readonly Cue[]) {
  return alignCaptions({ cues: before, length: null }, { cues: now, length: null });
}

const SHAFT = [
  'we turn the drum shaft',
  'between two dead centres',
  'and leave a hair over size',
  'the bearing goes on last',
  'so it never sees the grit',
];
const FRAME = [
  'cut four legs from channel',
  'clamp them square to the plate',
  'tack every corner before welding',
  'check both diagonals once more',
  'then run the long beads',
];
const INTRO = ['welcome back to the shop', 'today is a long day'];

describe('Laying new captions on the old ones', () => {
  it('moves everything by an intro that was put before it', () => {
    const { aligned, unaligned } = align(spoken(SHAFT), spoken([...INTRO, ...SHAFT]));
    expect(aligned).toEqual([{ before: { in: 0, out: 10_000 }, now: { in: 4000, out: 14_000 } }]);
    expect(unaligned).toEqual([]);
  });

  it('lists a passage that was cut', () => {
    const { aligned, unaligned } = align(
      spoken([...SHAFT, ...INTRO, ...FRAME]),
      spoken([...SHAFT, ...FRAME]),
    );
    expect(aligned).toEqual([
      { before: { in: 0, out: 10_000 }, now: { in: 0, out: 10_000 } },
      { before: { in: 14_000, out: 24_000 }, now: { in: 10_000, out: 20_000 } },
    ]);
    expect(unaligned).toEqual([
      { in: 10_000, out: 14_000, said: 'welcome back to the shop today is a long day' },
    ]);
  });

  it('finds a passage that was moved', () => {
    const { aligned, unaligned } = align(spoken([...SHAFT, ...FRAME]), spoken([...FRAME, ...SHAFT]));
    expect(aligned).toEqual([
      { before: { in: 10_000, out: 20_000 }, now: { in: 0, out: 10_000 } },
      { before: { in: 0, out: 10_000 }, now: { in: 10_000, out: 20_000 } },
    ]);
    expect(unaligned).toEqual([]);
  });

  it('is not broken by words that were corrected', () => {
    const corrected = SHAFT.map((line) => line.replace('dead', 'live').replace('grit', 'dirt'));
    const { aligned, unaligned } = align(spoken(SHAFT), spoken([...INTRO, ...corrected]));
    expect(aligned).toHaveLength(1);
    expect(aligned[0]?.now.in).toBe(4000);
    expect(unaligned.map(({ said }) => said)).toEqual(['grit']);
  });

  it('does not look at capitals, punctuation and where captions break', () => {
    const joined = ['We turn the drum shaft, between two', 'dead centres; and leave a hair over size.'];
    const { aligned } = align(
      spoken(SHAFT.slice(0, 3)),
      joined.map((line, index) => ({
        start: 60_000 + index * 3000,
        end: 63_000 + index * 3000,
        lines: [line],
      })),
    );
    expect(aligned).toHaveLength(1);
    expect(Math.abs((aligned[0]?.now.in ?? 0) - (aligned[0]?.before.in ?? 0) - 60_000)).toBeLessThan(500);
  });

  it('cuts where a silence between the same words was cut out', () => {
    const before = [...spoken(SHAFT), ...spoken(FRAME, 70_000)];
    const { aligned, unaligned } = align(before, spoken([...SHAFT, ...FRAME]));
    expect(aligned.map(({ now }) => now)).toEqual([
      { in: 0, out: 10_000 },
      { in: 10_000, out: 20_000 },
    ]);
    expect(unaligned).toEqual([{ in: 10_000, out: 70_000, said: '' }]);
  });

  it('keeps a silence that both have, and the ends of both videos', () => {
    const cues = [...spoken(SHAFT, 3000), ...spoken(FRAME, 70_000)];
    const { aligned } = alignCaptions({ cues, length: 90_000 }, { cues, length: 88_000 });
    expect(aligned).toEqual([{ before: { in: 0, out: 88_000 }, now: { in: 0, out: 88_000 } }]);
  });

  it('believes a short caption only where it stands whole', () => {
    const before = spoken(['tighten it now', ...INTRO]);
    expect(align(before, spoken(['tighten it now'])).aligned).toHaveLength(1);
    expect(align(before, spoken(['and tighten it now or lose it'])).aligned).toEqual([]);
  });

  it('aligns nothing where no words are shared, and lists all of it', () => {
    expect(align(spoken(SHAFT), spoken(INTRO))).toMatchObject({
      aligned: [],
      unaligned: [{ in: 0, out: 10_000 }],
    });
    expect(align([], [])).toEqual({ aligned: [], unaligned: [] });
  });

  it('never lets two stretches overlap, however words repeat and times drift', () => {
    const lines = [...SHAFT, ...FRAME, ...SHAFT, ...INTRO, ...FRAME];
    const drifting = spoken([...FRAME, ...lines]).map((cue) => ({
      ...cue,
      start: Math.round(cue.start * 1.04),
      end: Math.round(cue.end * 1.04),
    }));
    const { aligned } = align(spoken(lines), drifting);
    expect(aligned.length).toBeGreaterThan(1);
    for (const side of ['before', 'now'] as const) {
      const spans = aligned.map((stretch) => stretch[side]).sort((a, b) => a.in - b.in);
      for (const [index, span] of spans.entries()) {
        expect(span.out).toBeGreaterThan(span.in);
        expect(span.in).toBeGreaterThanOrEqual(spans[index - 1]?.out ?? 0);
      }
    }
    for (const { before, now } of aligned) expect(now.out - now.in).toBe(before.out - before.in);
  });

  it('takes two hours of talk, rewritten or kept, without comparing all with all', () => {
    const word = (seed: number) => `word${String(seed % 900)}`;
    const talk = (from: number) =>
      spoken(
        Array.from({ length: 3000 }, (_none, line) =>
          Array.from({ length: 6 }, (_word, index) => word((from + line * 6 + index) ** 2 % 100_003)).join(
            ' ',
          ),
        ),
      );
    const whole = talk(0);
    const cut = [...whole.slice(0, 1000), ...whole.slice(1300)];
    const [lost, ...others] = align(whole, cut).unaligned;
    expect(others).toEqual([]);
    expect(Math.abs((lost?.in ?? 0) - 2_000_000)).toBeLessThan(2000);
    expect(Math.abs((lost?.out ?? 0) - 2_600_000)).toBeLessThan(2000);
    expect(align(whole, talk(500_000)).unaligned).not.toEqual([]);
  }, 30_000);
});
