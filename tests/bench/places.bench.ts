import Fraction from 'fraction.js';
import { carryNotes } from '../../src/domain/place/carry-notes.ts';
import { type ClipMoment, placeNotes } from '../../src/domain/place/place-notes.ts';
import { type Edit } from '../../src/domain/edit/edit.ts';
import { readEdl } from '../../src/domain/edit/read-edl.ts';
import { type Bench, formatTable, median } from './support/bench.ts';
import { CLIP_FRAMES, CLIPS, cutList, RATE, SIZES } from './support/cut-list.ts';

const ROUNDS = 5;
/** The most that the largest may take, and the most that twice the size may take of the time of once. */
const MOST_MS = 500;
const MOST_GROWTH = 3;

function someNotes(notes: number): ClipMoment[] {
  return Array.from({ length: notes }, (_none, index) => ({
    clip: `C${String(index % CLIPS)}`,
    at: new Fraction((index * 104_729) % CLIP_FRAMES, RATE.num),
    sense: 'picture',
  }));
}

function timed(work: () => unknown): number {
  const times = Array.from({ length: ROUNDS }, () => {
    const startedAt = performance.now();
    work();
    return performance.now() - startedAt;
  });
  return median(times);
}

function readList(text: string): Edit {
  const read = readEdl(text, { rate: RATE });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

function measure([segments, notes]: (typeof SIZES)[number]) {
  const list = cutList(segments).join('\n');
  const edit = readList(list);
  const moments = someNotes(notes);
  const read = timed(() => readList(list));
  const place = timed(() => placeNotes(edit, moments));
  const carry = timed(() => carryNotes(edit, edit, moments));
  return { segments, notes, read, place, carry };
}

/** What it costs to place the notes of an episode, and how that grows. */
export const bench: Bench = {
  name: 'places',
  what: `notes placed by an edit, in milliseconds, at three sizes; ${String(MOST_MS)} at most for the largest`,
  run(print) {
    measure(SIZES[0]);
    const measured = SIZES.map(measure);
    const rows = measured.map(({ segments, notes, read, place, carry }) => [
      ...[segments, notes],
      ...[read.toFixed(0), place.toFixed(0), carry.toFixed(0)],
    ]);
    for (const line of formatTable([['segments', 'notes', 'read', 'place', 'carry'], ...rows])) print(line);
    const growth = measured.slice(1).map(({ place }, index) => place / (measured[index]?.place ?? place));
    print(`\nTwice the size takes ${growth.map((times) => times.toFixed(1)).join(' and ')} times as long.`);
    const most = measured.at(-1)?.place ?? Number.POSITIVE_INFINITY;
    return Promise.resolve(most <= MOST_MS && growth.every((times) => times <= MOST_GROWTH));
  },
};
