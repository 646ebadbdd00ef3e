/** How long a line on the rule is, short to long, as on a steel rule. */
export type Rank = 1 | 2 | 3 | 4;

export type GraduationLevel = {
  /** Seconds between the lines of this level. */
  readonly every: number;
  readonly rank: Rank;
  /** Where its lines stand, in seconds; those of longer levels are left out. */
  readonly at: readonly number[];
  /** The narrowest rule, in pixels, on which these lines stay apart. */
  readonly minWidth: number;
};

export type RuleNumber = { readonly at: number; readonly text: string; readonly minWidth: number };

const STEPS: readonly { readonly every: number; readonly rank: Rank }[] = [
  { every: 5, rank: 1 },
  { every: 30, rank: 2 },
  { every: 60, rank: 3 },
  { every: 300, rank: 4 },
];

/** Each divides the next, so that a wider rule only ever adds numbers to a narrower one. */
const NUMBER_STEPS = [60, 300, 900, 3600, 14400];

/** Pixels between two lines that the eye still tells apart, and between two numbers. */
const LINE_GAP = 4;
const NUMBER_GAP = 30;

/** The share at the end of a rule that stays without a number. */
const END_SHARE = 0.02;

function multiples(every: number, length: number): number[] {
  return Array.from({ length: Math.floor(length / every) + 1 }, (_, index) => index * every);
}

/**
 * The lines of a rule for an episode.
 * @param length seconds, 0 or more
 * @returns levels from 5 s to 5 min, each with the width from which it may be drawn. Five minutes are
 *   set apart from minutes only when there are enough of them to count by.
 */
export function graduate(length: number): readonly GraduationLevel[] {
  const steps = length >= 1200 ? STEPS : STEPS.filter((step) => step.every < 300);
  return steps.map(({ every, rank }) => {
    const longer = steps.filter((step) => step.every > every);
    return {
      every,
      rank,
      at: multiples(every, length).filter((at) => longer.every((step) => at % step.every !== 0)),
      minWidth: Math.ceil((length / every) * LINE_GAP),
    };
  });
}

/** The numbers along a rule (minutes, from an hour on hours and minutes), each with the width it needs. */
export function numberRule(length: number): readonly RuleNumber[] {
  const hours = length >= 3600;
  // A number stands after its line, and the very end of the rule has no room after it.
  const last = length - length * END_SHARE;
  return multiples(60, Math.max(0, last)).map((at) => {
    const step = NUMBER_STEPS.findLast((every) => at % every === 0) ?? 60;
    const minutes = at / 60;
    const text = hours
      ? `${String(Math.floor(minutes / 60))}:${String(minutes % 60).padStart(2, '0')}`
      : String(minutes);
    return { at, text, minWidth: Math.ceil((length / step) * NUMBER_GAP) };
  });
}

export type StretchLine = { readonly at: number; readonly rank: Rank; readonly text?: string };

/**
 * The lines of one stretch of an upright tape, thinned to the room there is.
 * @param from,to seconds, `from` included and `to` not
 * @param pixels how long the stretch is drawn
 */
export function graduateStretch(from: number, to: number, pixels: number): readonly StretchLine[] {
  if (to <= from || pixels <= 0) return [];
  const room = (every: number) => (every / (to - from)) * pixels;
  const every =
    [...STEPS.map((step) => step.every), 900, 3600].find((step) => room(step) >= LINE_GAP) ?? 3600;
  const numbered = NUMBER_STEPS.find((step) => room(step) >= NUMBER_GAP / 2) ?? Number.POSITIVE_INFINITY;
  const first = Math.ceil(from / every) * every;
  const count = Math.max(0, Math.ceil((to - first) / every));
  return Array.from({ length: count }, (_, index) => {
    const at = first + index * every;
    const rank: Rank = at % 60 === 0 ? 3 : at % 30 === 0 ? 2 : 1;
    return at > 0 && at % numbered === 0 ? { at, rank, text: String(at / 60) } : { at, rank };
  });
}
