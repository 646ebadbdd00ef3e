import { type PlacedMark, placeMarks } from './place-marks.ts';

/** Literal names, because the style sheet is made from the names found in the source. */
const FROM_WIDTH: readonly (readonly [width: number, className: string | undefined])[] = [
  [320, undefined],
  [480, 'hidden @min-[480px]:inline'],
  [640, 'hidden @min-[640px]:inline'],
  [800, 'hidden @min-[800px]:inline'],
  [960, 'hidden @min-[960px]:inline'],
  [1120, 'hidden @min-[1120px]:inline'],
];

/** The class that shows something from a rule width on, or null when no rule gets that wide. */
export function showFrom(minWidth: number): { readonly className: string | undefined } | null {
  const step = FROM_WIDTH.find(([width]) => width >= minWidth);
  return step === undefined ? null : { className: step[1] };
}

/** `within` shows a strip from its width to the next, `open` from its width on. */
const STRIPS = [
  { from: 320, within: '@min-[560px]:hidden', open: undefined },
  { from: 560, within: 'hidden @min-[560px]:block @min-[928px]:hidden', open: 'hidden @min-[560px]:block' },
  { from: 928, within: 'hidden @min-[928px]:block', open: 'hidden @min-[928px]:block' },
] as const;

/** What the face takes beyond the scale at both ends together. */
const ENDS = 60;

export type Strip = {
  readonly className: string | undefined;
  readonly places: readonly PlacedMark[];
  readonly rows: number;
};

/**
 * Places marks for every width a rule may have, without knowing it: once for the narrowest of each range. The
 * first placement in which nothing had to move serves all wider rules as well.
 * @param shares where the marks are, 0 to 1, rising
 */
export function placeForAllWidths(shares: readonly number[], gap: number): readonly Strip[] {
  const strips = STRIPS.map((strip) => {
    const places = placeMarks(shares, strip.from - ENDS, gap);
    return { strip, places, rows: Math.max(0, ...places.map(({ row }) => row + 1)) };
  });
  const unmoved = strips.findIndex(({ places }) =>
    places.every(({ shift, row }) => shift === 0 && row === 0),
  );
  const last = unmoved === -1 ? strips.length - 1 : unmoved;
  return strips.slice(0, last + 1).map(({ strip, places, rows }, index) => ({
    className: index === last ? strip.open : strip.within,
    places,
    rows,
  }));
}
