import { type Pattern, type UnitProblem } from './cutting.ts';

/** The most of a bar that can be filled with what is left, as counts of each piece. */
export type FillBar = (problem: UnitProblem, left: readonly number[], capacity: number) => readonly number[];

/** The longest piece that still fits, again and again: first-fit decreasing, a bar at a time. */
export const fillLongestFirst: FillBar = ({ pieces }, left, capacity) => {
  let room = capacity;
  return pieces.map(({ size }, at) => {
    const count = Math.min(left[at] ?? 0, Math.floor(room / size));
    room -= count * size;
    return count;
  });
};

/** How many steps a search for the fullest bar takes before it keeps the best so far. */
const STEPS_AT_MOST = 100_000;

/** The fullest bar that holds the longest piece left: a bounded search, exact for short bars. */
export const fillFullest: FillBar = ({ pieces }, left, capacity) => {
  const first = left.findIndex((count, at) => count > 0 && (pieces[at]?.size ?? 0) <= capacity);
  if (first === -1) return pieces.map(() => 0);
  const counts = pieces.map(() => 0);
  let best: readonly number[] = [];
  let least = Number.POSITIVE_INFINITY;
  let steps = 0;
  const search = (at: number, room: number): void => {
    if (room < least) [least, best] = [room, [...counts]];
    for (let next = at; next < pieces.length && least > 0 && steps < STEPS_AT_MOST; next += 1) {
      const size = pieces[next]?.size ?? 0;
      steps += 1;
      if (size > room || (counts[next] ?? 0) >= (left[next] ?? 0)) continue;
      counts[next] = (counts[next] ?? 0) + 1;
      search(next, room - size);
      counts[next] = (counts[next] ?? 0) - 1;
    }
  };
  counts[first] = 1;
  search(first, capacity - (pieces[first]?.size ?? 0));
  return best;
};

/** A plan made bar by bar, offcuts first; null where a piece fits nowhere. */
export function fillBars(
  problem: UnitProblem,
  fill: FillBar,
  demand: readonly number[] = problem.pieces.map(({ quantity }) => quantity),
  used: readonly number[] = problem.bars.map(() => 0),
): readonly Pattern[] | null {
  const left = [...demand];
  const plan: Pattern[] = [];
  for (const [bar, { capacity, quantity }] of problem.bars.entries()) {
    for (let taken = used[bar] ?? 0; taken < quantity && left.some((count) => count > 0); taken += 1) {
      const counts = fill(problem, left, capacity);
      if (counts.every((count) => count === 0)) break;
      counts.forEach((count, at) => (left[at] = (left[at] ?? 0) - count));
      plan.push({ bar, counts });
    }
  }
  return left.some((count) => count > 0) ? null : plan;
}
