import { type Answer, right, wrong } from '../answer.ts';
import { framesIn } from '../media-rates.ts';
import { parseClock } from '../time/parse-clock.ts';
import { parseRate, type Rate } from '../time/rate.ts';
import { parseTimecode } from '../time/timecode.ts';
import { wallAsUtc } from '../time/wall-time.ts';
import { CAMERA_NAME_LENGTH, CLIP_NAME_LENGTH, type NamedClip } from './named-clip.ts';
import { parsePace } from './pace.ts';

/** The columns of a list of clips. */
export const CLIP_COLUMNS = [
  'name',
  'camera',
  'filmed',
  'length',
  'rate',
  'timecode',
  'pace',
  'stage',
  'parts',
] as const;
export type ClipColumn = (typeof CLIP_COLUMNS)[number];

const OFFSET = /\s*(Z|UTC|[+-]\d{2}:?\d{2})$/i;
const FOUR_FIELDS = /^\d{1,2}:\d{2}:\d{2}[:;]\d{2}$/;

/** A wall time with what it says of its zone. */
export function readFilmed(text: string): Answer<Pick<NamedClip, 'createdWall' | 'createdOffset'>> {
  const [said = '', zone] = OFFSET.exec(text) ?? [];
  const wall = text.slice(0, text.length - said.length).trim();
  const at = wallAsUtc(wall);
  if (at === null)
    return wrong(
      `“${text.slice(0, 40)}” is no time. Write it as 2026-11-02 14:22:07, with +01:00 or Z after it where the zone is known.`,
    );
  const createdWall = new Date(at)
    .toISOString()
    .slice(0, -1)
    .replace(/\.000$/, '');
  return right({ createdWall, createdOffset: zone === undefined ? null : offsetMinutes(zone) });
}

function offsetMinutes(zone: string): number {
  const [, sign, hours, minutes] = /^([+-])(\d{2}):?(\d{2})$/.exec(zone) ?? [];
  if (sign === undefined) return 0;
  return (sign === '-' ? -1 : 1) * (Number(hours) * 60 + Number(minutes));
}

/** A length in frames: a timecode of four fields, a time such as 3:41, or seconds. */
function readLength(text: string, rate: Rate): Answer<number> {
  if (FOUR_FIELDS.test(text)) {
    const timecode = parseTimecode(text, rate);
    return timecode.ok ? right(timecode.value.frame) : timecode;
  }
  const seconds = parseClock(text);
  if (!seconds.ok) return seconds;
  return right(framesIn({ num: Math.round(seconds.value * 1e6), den: 1_000_000 }, rate));
}

/** What a row gave: the clip, if it could be kept at all, and what is wrong with the rest of it. */
export interface ReadRow {
  readonly clip: NamedClip | null;
  /** A sentence each. */
  readonly problems: readonly string[];
}

/**
 * A row of a list of clips. What cannot be read is left out and said; only without a name, or with nothing in it, there
 * is no clip.
 * @param cells by column, trimmed; empty where the list says nothing
 * @param usual the rate of rows that do not say theirs
 */
export function readClipRow(cells: Readonly<Partial<Record<ClipColumn, string>>>, usual: Rate): ReadRow {
  const problems: string[] = [];
  /** Reads a cell that says something; what is wrong with it is noted. */
  function take<Value>(column: ClipColumn, read: (text: string) => Answer<Value>): Value | null {
    const text = cells[column] ?? '';
    if (text === '') return null;
    const answer = read(text);
    if (answer.ok) return answer.value;
    problems.push(`${column}: ${answer.error}`);
    return null;
  }
  const name = cells.name ?? '';
  if (name === '') return { clip: null, problems: ['It has no name. Left out.'] };
  if (name.length > CLIP_NAME_LENGTH) return { clip: null, problems: ['Its name is too long. Left out.'] };
  const rate = take('rate', parseRate) ?? usual;
  const frames = take('length', (text) => readLength(text, rate));
  if (frames === 0)
    return { clip: null, problems: ['Its length is nought: there is nothing in it. Left out.'] };
  const label = take('timecode', (text) => parseTimecode(text, rate));
  const filmed = take('filmed', readFilmed);
  const pace = take('pace', parsePace) ?? { num: 1, den: 1 };
  return {
    clip: {
      name,
      camera: cells.camera?.slice(0, CAMERA_NAME_LENGTH) || null,
      frames,
      rate,
      startLabel: label?.frame ?? null,
      drop: label?.drop ?? false,
      createdWall: filmed?.createdWall ?? null,
      createdOffset: filmed?.createdOffset ?? null,
      pace,
      stage: cells.stage || null,
      parts: (cells.parts ?? '').split(/[\s,;]+/).filter((number) => number !== ''),
    },
    problems,
  };
}
