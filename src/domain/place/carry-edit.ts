import Fraction from 'fraction.js';
import { type Edit, inRecordOrder, rateOf, type Segment, trimSegment } from '../edit/edit.ts';
import { formatClock } from '../time/format-clock.ts';
import { type Rate } from '../time/rate.ts';
import { type Alignment, type UnalignedStretch } from './align-captions.ts';

/**
 * The edit of a new version, from that of the version before and from how the two lie on each other: what was aligned
 * shows the clips that it showed before. Where nothing was aligned there is no segment; a warning tells of it.
 * @param now rate and length of the new version, in frames at that rate
 */
export function carryEdit(
  before: Edit,
  { aligned, unaligned }: Alignment,
  now: { readonly rate: Rate; readonly frames: Fraction },
): Edit {
  const carry = (segments: readonly Segment[]) =>
    inRecordOrder(
      aligned.flatMap((stretch) => {
        const seconds = new Fraction(stretch.now.in - stretch.before.in, 1000);
        const move = (frames: Fraction) => frames.div(rateOf(before.rate)).add(seconds).mul(rateOf(now.rate));
        return segments.flatMap((segment): Segment[] => {
          const start = later(framesAt(stretch.before.in, before.rate), segment.record.in);
          const end = earlier(framesAt(stretch.before.out, before.rate), segment.record.out);
          if (start.compare(end) >= 0) return [];
          const cut = trimSegment(segment, start, end, before.rate);
          return [{ ...cut, record: { in: move(start), out: move(end) } }];
        });
      }),
    );
  return {
    title: before.title,
    ...now,
    drop: false,
    picture: carry(before.picture),
    sound: carry(before.sound),
    dissolved: carry(before.dissolved),
    markers: [],
    warnings: unaligned.map((stretch) => ({ line: null, sentence: sayUnaligned(stretch) })),
  };
}

/** A stretch that was not found, as a sentence. */
export function sayUnaligned({ in: from, out, said }: UnalignedStretch): string {
  const words = said === '' ? 'where nobody speaks' : `“${said}”`;
  return `From ${formatClock(from / 1000)} to ${formatClock(out / 1000)} of the version before, ${words}: not found.`;
}

/** @param at milliseconds */
function framesAt(at: number, rate: Rate): Fraction {
  return new Fraction(at, 1000).mul(rateOf(rate));
}

function later(a: Fraction, b: Fraction): Fraction {
  return a.compare(b) > 0 ? a : b;
}

function earlier(a: Fraction, b: Fraction): Fraction {
  return a.compare(b) < 0 ? a : b;
}
