import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { readCsv } from '../csv/read-csv.ts';
import { type Rate } from '../time/rate.ts';
import { type Edit, lengthOf, rateOf, type Segment } from './edit.ts';
import { type HandClip, readClipTime, sayClipTime } from './hand-clip.ts';

/** An edit built by hand, with the clip that each of its names stands for. */
export interface HandEdit {
  readonly edit: Edit;
  readonly clipIds: ReadonlyMap<string, string>;
}

/** The clip that is meant: by its id, else by its name alone. */
function findClip(text: string, clips: readonly HandClip[]): Answer<HandClip> {
  const own = clips.find(({ id }) => id === text);
  if (own !== undefined) return right(own);
  const [first, ...others] = clips.filter(({ name }) => name.toLowerCase() === text.toLowerCase());
  if (first === undefined) return wrong(`There is no clip “${text.slice(0, 60)}” in the footage.`);
  if (others.length > 0) return wrong(`Several clips are called “${first.name}”: choose it in the list.`);
  return right(first);
}

function readRow([clip = '', from = '', to = '']: readonly string[], clips: readonly HandClip[]) {
  const found = findClip(clip, clips);
  if (!found.ok) return found;
  const start = readClipTime(from, found.value);
  if (!start.ok) return start;
  const end = readClipTime(to, found.value);
  if (!end.ok) return end;
  const { name, startLabel, frames } = found.value;
  const first = startLabel ?? 0;
  if (end.value <= start.value) return wrong(`The out of ${name} does not come after its in.`);
  if (start.value < first || (frames !== null && end.value > first + frames))
    return wrong(`${name} runs from ${say(first)} to ${frames === null ? 'its end' : say(first + frames)}.`);
  return right({ clip: found.value, in: start.value, out: end.value });

  function say(frame: number): string {
    return found.ok ? sayClipTime(frame, found.value) : '';
  }
}

/**
 * An edit from rows of clip, in, out: one after another, as they stand. Times are the clip's own labels; out is the
 * first frame that is not in. A head row is passed over.
 * @returns the edit at the rate given; or a sentence with the line
 */
export function readHandEdit(
  text: string,
  title: string,
  rate: Rate,
  clips: readonly HandClip[],
): Answer<HandEdit> {
  const read = readCsv(text);
  if (!read.ok) return read;
  const [head] = read.value.rows;
  const rows = /^clip$/i.test(head?.cells[0] ?? '') ? read.value.rows.slice(1) : read.value.rows;
  if (rows.length === 0) return wrong('Add at least one clip, with its in and out.');
  const clipIds = new Map<string, string>();
  const picture: Segment[] = [];
  let at = new Fraction(0);
  for (const { line, cells } of rows) {
    const row = readRow(cells, clips);
    if (!row.ok) return wrong(`Line ${String(line)}: ${row.error}`);
    const { clip } = row.value;
    const source = { in: new Fraction(row.value.in), out: new Fraction(row.value.out) };
    const end = at.add(lengthOf(source).div(rateOf(clip.rate)).mul(rateOf(rate)));
    picture.push({
      clip: nameIn(clipIds, clip),
      alsoCalled: [],
      clipRate: clip.rate,
      source,
      record: { in: at, out: end },
      speed: new Fraction(1),
      track: 'V1',
    });
    at = end;
  }
  const edit = {
    title,
    rate,
    drop: false,
    frames: at,
    picture,
    sound: picture.map((segment) => ({ ...segment, track: 'A1' })),
    dissolved: [],
    markers: [],
    warnings: [],
  };
  return right({ edit, clipIds });
}

/** What a clip is called in an edit: cameras begin again at C0001, and a name stands for one clip there. */
function nameIn(clipIds: Map<string, string>, { id, name }: HandClip): string {
  for (let number = 1; ; number += 1) {
    const called = number === 1 ? name : `${name} (${String(number)})`;
    const taken = clipIds.get(called);
    if (taken !== undefined && taken !== id) continue;
    clipIds.set(called, id);
    return called;
  }
}
