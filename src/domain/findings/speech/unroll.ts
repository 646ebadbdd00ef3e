import { type Cue } from '../../captions/cue.ts';

/** What of a caption is new: from a character of its lines joined by line feeds on. */
export interface FreshText {
  readonly cue: number;
  readonly text: string;
  readonly from: number;
}

/** From this share of captions on that begin with words of the one before, a file is taken to roll. Our own. */
const ROLLS = 0.3;
const FEWEST = 3;

/**
 * What each caption adds to the one before. In rolling captions, as video hosts give them out, each line stands in
 * two captions or three: it is kept where it comes first. Other captions are kept whole, repeats included.
 * @param order indices of the captions in the order in which they show
 */
export function unroll(cues: readonly Cue[], order: readonly number[]): FreshText[] {
  const texts = order.map((cue) => ({ cue, lines: cues[cue]?.lines ?? [] }));
  const repeats = texts.map(({ lines }, index) => repeated(texts[index - 1]?.lines ?? [], lines));
  const spoken = texts.filter(({ lines }) => lines.length > 0).length;
  const rolling = repeats.filter((length) => length > 0).length;
  const rolls = rolling >= FEWEST && rolling >= spoken * ROLLS;
  return texts.map(({ cue, lines }, index) => ({
    cue,
    text: lines.join('\n'),
    from: rolls ? (repeats[index] ?? 0) : 0,
  }));
}

/** How many characters of a caption the one before has shown already. */
function repeated(previous: readonly string[], lines: readonly string[]): number {
  for (let kept = Math.min(previous.length, lines.length); kept > 0; kept--) {
    const shown = previous.slice(-kept);
    if (shown.every((line, index) => line === lines[index])) return shown.join('\n').length;
    const last = shown.at(-1) ?? '';
    const grown = lines[kept - 1] ?? '';
    // A line that grows word by word.
    if (
      last !== '' &&
      grown.startsWith(`${last} `) &&
      shown.slice(0, -1).every((line, index) => line === lines[index])
    )
      return [...shown.slice(0, -1), last].join('\n').length;
  }
  return 0;
}
