import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { type Rate, sameRate } from '../time/rate.ts';
import { findByClipName } from './clip-names.ts';
import {
  type Edit,
  type EditWarning,
  framesPerFrame,
  inRecordOrder,
  type Marker,
  rateOf,
  type ReadEditOptions,
  type Segment,
} from './edit.ts';
import { flattenTracks } from './flatten-tracks.ts';
import {
  isObject,
  listIn,
  mediaOf,
  nameOf,
  OtioFault,
  type OtioObject,
  type OtioRange,
  parseOtio,
  readOffset,
  readRange,
  sayObject,
  schemaOf,
} from './otio-objects.ts';
import { cutOut, hold, moveBy, NOTHING, ONE, playAt, type Shown, together, ZERO } from './otio-shown.ts';

/** How deep stacks may lie in stacks, and how many things a timeline may hold when all is unfolded. Our own limits. */
const DEEPEST = 64;
const MOST_ITEMS = 20_000;

interface Reading {
  readonly rate: Rate;
  readonly clipRates: ReadonlyMap<string, Rate>;
  readonly marked: ReadonlyMap<string, OtioObject>;
  readonly warn: (sentence: string) => void;
  /** Marks of what is being unfolded, so that nothing holds itself. */
  readonly inside: Set<string>;
  items: number;
}

/** Where an item lies. */
interface Place {
  readonly track: string;
  readonly sound: boolean;
  readonly depth: number;
}

/** The speed that an item's effects give it. */
function speedOf(item: OtioObject, { warn }: Reading): Fraction {
  let speed = ONE;
  for (const effect of listIn(item, 'effects')) {
    if (!isObject(effect)) continue;
    const schema = schemaOf(effect);
    const scalar = effect['time_scalar'];
    if (schema === 'FreezeFrame') speed = ZERO;
    else if (schema === 'LinearTimeWarp' && typeof scalar === 'number' && Number.isFinite(scalar))
      speed = speed.mul(new Fraction(scalar));
    else if (schema === 'LinearTimeWarp' || schema === 'TimeEffect')
      warn(`${sayObject(item)} has a change of speed that is not understood; it is taken at its own speed.`);
  }
  return speed;
}

function readMarkers(item: OtioObject, range: OtioRange, speed: Fraction, { rate, warn }: Reading): Marker[] {
  return listIn(item, 'markers').flatMap((marker) => {
    if (!isObject(marker)) return [];
    const marked = readRange(marker, 'marked_range');
    if (marked === null) return [];
    const since = marked.start.seconds.sub(range.start.seconds);
    const record = (speed.compare(0) > 0 ? since.div(speed) : since).mul(rateOf(rate));
    const colour = isObject(marker['color']) ? nameOf(marker['color']) : marker['color'];
    if (since.compare(0) >= 0 && record.compare(range.duration.seconds.mul(rateOf(rate))) <= 0)
      return [{ record, name: nameOf(marker), colour: typeof colour === 'string' ? colour : null }];
    warn(`A mark of ${sayObject(item)} lies outside of what is used of it and is left out.`);
    return [];
  });
}

/** The names that a clip goes by: its own, its media's, its file's. */
function namesOf(clip: OtioObject): string[] {
  const media = mediaOf(clip);
  const address = media?.['target_url'];
  const file = typeof address === 'string' ? address.replace(/[?#].*$/s, '').replace(/^.*[/\\]/s, '') : '';
  const names = [nameOf(clip), media === null ? '' : nameOf(media), decodePath(file)];
  return [...new Set(names.filter((name) => name !== ''))];
}

function decodePath(path: string): string {
  try {
    return decodeURIComponent(path);
  } catch {
    return path;
  }
}

function readClip(clip: OtioObject, place: Place, reading: Reading): Shown {
  const media = mediaOf(clip);
  const range =
    readRange(clip, 'source_range') ?? (media === null ? null : readRange(media, 'available_range'));
  if (range === null)
    throw new OtioFault(
      `${sayObject(clip)} does not say what is used of it, so nothing after it has a place.`,
    );
  const length = range.duration.seconds.mul(rateOf(reading.rate));
  const record = { in: ZERO, out: length };
  if (media !== null && schemaOf(media) === 'GeneratorReference')
    return { ...NOTHING, length, layers: [{ record, segment: null }] };
  const speed = speedOf(clip, reading);
  if (speed.compare(0) < 0) reading.warn(`${sayObject(clip)} plays backwards.`);
  const names = namesOf(clip);
  const clipRate = findByClipName(reading.clipRates, names) ?? range.start.rate;
  const start = range.start.seconds.mul(rateOf(clipRate));
  const step = framesPerFrame({ clipRate, speed }, reading.rate).abs();
  const used = speed.equals(0) ? ONE : length.mul(step);
  const segment: Segment = {
    clip: names[0] ?? 'without a name',
    alsoCalled: names.slice(1),
    clipRate,
    source: { in: start, out: start.add(used) },
    record,
    speed,
    track: place.track,
  };
  const shown = place.sound ? { sound: [segment] } : { layers: [{ record, segment }] };
  return { ...NOTHING, length, ...shown, markers: readMarkers(clip, range, speed, reading) };
}

/** A stack or track cut to its own range, at its own speed. */
function useOf(item: OtioObject, whole: Shown, reading: Reading): Shown {
  const range = readRange(item, 'source_range');
  const speed = speedOf(item, reading);
  const frames = rateOf(reading.rate);
  const from = range === null ? ZERO : range.start.seconds.mul(frames);
  const length = range === null ? whole.length : range.duration.seconds.mul(frames);
  const marks = readMarkers(item, range ?? wholeRange(length, reading.rate), speed, reading);
  const withMarks = (shown: Shown): Shown => ({ ...shown, markers: [...shown.markers, ...marks] });
  if (range === null && speed.equals(1)) return withMarks(whole);
  const beside = from.compare(whole.length) >= 0 || from.add(length).compare(0) <= 0;
  if (range !== null && beside && length.compare(0) > 0 && whole.length.compare(0) > 0) {
    reading.warn(`The range of ${sayObject(item)} lies outside of all it holds; the whole of it is taken.`);
    return withMarks(whole);
  }
  if (speed.equals(0))
    return withMarks(hold(cutOut(whole, from, length, reading.rate), length, reading.rate));
  if (speed.compare(0) < 0)
    reading.warn(`${sayObject(item)} plays several clips backwards; they are taken forwards.`);
  const content = cutOut(whole, from, length.mul(speed.abs()), reading.rate);
  return withMarks(speed.equals(1) ? content : playAt(content, speed.abs(), length));
}

function wholeRange(length: Fraction, rate: Rate): OtioRange {
  return {
    start: { seconds: ZERO, rate },
    duration: { seconds: length.div(rateOf(rate)), rate },
  };
}

/** Both pictures of a transition are seen: the one before the cut stays on, the one after it comes early. */
function dissolve(
  transition: OtioObject,
  before: Shown | null,
  after: Shown | null,
  cut: Fraction,
  reading: Reading,
): Segment[] {
  const { rate } = reading;
  const frames = rateOf(rate);
  const kind = transition['transition_type'];
  if (typeof kind === 'string' && kind !== 'SMPTE_Dissolve' && kind !== '')
    reading.warn(`The transition ${kind} is taken as a dissolve.`);
  const only = (shown: Shown | null) =>
    shown?.layers.length === 1 ? (shown.layers[0]?.segment ?? null) : null;
  const parts: Segment[] = [];
  const [last, first] = [only(before), only(after)];
  const stays = readOffset(transition, 'out_offset').mul(frames);
  const early = readOffset(transition, 'in_offset').mul(frames);
  if (last !== null && stays.compare(0) > 0) {
    const step = framesPerFrame(last, rate);
    const edge = step.compare(0) < 0 ? last.source.in : last.source.out;
    const end = edge.add(stays.mul(step));
    parts.push({
      ...last,
      source: step.compare(0) < 0 ? { in: end, out: edge } : { in: edge, out: end },
      record: { in: cut, out: cut.add(stays) },
    });
  }
  if (first !== null && early.compare(0) > 0) {
    const step = framesPerFrame(first, rate);
    const edge = step.compare(0) < 0 ? first.source.out : first.source.in;
    const start = edge.sub(early.mul(step));
    parts.push({
      ...first,
      source: step.compare(0) < 0 ? { in: edge, out: start } : { in: start, out: edge },
      record: { in: cut.sub(early), out: cut },
    });
  }
  // A held frame has no source before or after it.
  return parts.filter(({ source }) => source.out.compare(source.in) > 0);
}

function readTrack(track: OtioObject, place: Place, reading: Reading): Shown {
  const children = listIn(track, 'children').map((child) => resolve(child, reading));
  const shown = children.map((child) =>
    schemaOf(child) === 'Transition' ? null : readItem(child, place, reading),
  );
  let at = ZERO;
  const parts: Shown[] = [];
  const dissolved: Segment[] = [];
  for (const [index, child] of children.entries()) {
    const one = shown[index] ?? null;
    if (one !== null) {
      parts.push(moveBy(one, at));
      at = at.add(one.length);
    } else if (!place.sound)
      dissolved.push(...dissolve(child, shown[index - 1] ?? null, shown[index + 1] ?? null, at, reading));
  }
  const all = together(parts, at);
  return useOf(track, { ...all, dissolved: [...all.dissolved, ...dissolved] }, reading);
}

function readStack(stack: OtioObject, place: Place, reading: Reading): Shown {
  const counts = { V: 0, A: 0 };
  const parts = listIn(stack, 'children').map((child) => {
    const item = resolve(child, reading);
    const sound = schemaOf(item) === 'Track' && item['kind'] === 'Audio';
    if (place.depth > 0) return readItem(item, { ...place, sound: place.sound || sound }, reading);
    const letter = sound ? 'A' : 'V';
    counts[letter] += 1;
    return readItem(item, { ...place, sound, track: `${letter}${String(counts[letter])}` }, reading);
  });
  const length = parts
    .map((part) => part.length)
    .reduce((most, one) => (one.compare(most) > 0 ? one : most), ZERO);
  return useOf(stack, together(parts, length), reading);
}

/** An object itself, where another stands for it. */
function resolve(value: unknown, { marked }: Reading): OtioObject {
  if (!isObject(value)) throw new OtioFault('The timeline holds something that is no item.');
  if (schemaOf(value) !== 'SerializableObjectRef') return value;
  const found = typeof value['id'] === 'string' ? marked.get(value['id']) : undefined;
  if (found === undefined)
    throw new OtioFault(`The timeline points to ${String(value['id'])}, which is not there.`);
  return found;
}

function readItem(item: OtioObject, place: Place, reading: Reading): Shown {
  reading.items += 1;
  if (reading.items > MOST_ITEMS) throw new OtioFault('The timeline holds more than can be unfolded.');
  if (place.depth > DEEPEST)
    throw new OtioFault(`${sayObject(item)} lies too deep: stacks in stacks without end.`);
  const mark = item['OTIO_REF_ID'];
  if (typeof mark === 'string' && reading.inside.has(mark))
    throw new OtioFault(`${sayObject(item)} holds itself: the timeline goes in a circle.`);
  if (typeof mark === 'string') reading.inside.add(mark);
  const shown = readInside(item, { ...place, depth: place.depth + 1 }, reading);
  if (typeof mark === 'string') reading.inside.delete(mark);
  if (item['enabled'] !== false || shown.layers.length + shown.sound.length === 0) return shown;
  reading.warn(`${sayObject(item)} is switched off and is left out.`);
  return { ...NOTHING, length: shown.length };
}

function readInside(item: OtioObject, place: Place, reading: Reading): Shown {
  const schema = schemaOf(item);
  if (schema === 'Clip') return readClip(item, place, reading);
  if (schema === 'Track') return readTrack(item, place, reading);
  if (schema === 'Stack') return readStack(item, place, reading);
  const range = readRange(item, 'source_range');
  if (schema !== 'Gap') {
    if (range === null)
      throw new OtioFault(
        `${sayObject(item)} is a ${schema || 'thing'} without a length, which is not understood.`,
      );
    reading.warn(`${sayObject(item)} is a ${schema}, which is not understood; its time is left empty.`);
  }
  const length = range === null ? ZERO : range.duration.seconds.mul(rateOf(reading.rate));
  const markers = range === null ? [] : readMarkers(item, range, ONE, reading);
  return { ...NOTHING, length, markers };
}

/** The rate that a timeline counts in: of its start, else of the first length in it. */
function findRate(timeline: OtioObject, marked: ReadonlyMap<string, OtioObject>): Rate | null {
  const start = timeline['global_start_time'];
  if (isObject(start)) {
    const range = readRange({ ...timeline, range: { start_time: start, duration: start } }, 'range');
    if (range !== null) return range.start.rate;
  }
  const open: unknown[] = [timeline['tracks']];
  const seen = new Set<unknown>();
  while (open.length > 0) {
    const item = open.pop();
    if (!isObject(item) || seen.has(item)) continue;
    seen.add(item);
    const schema = schemaOf(item);
    if (schema === 'SerializableObjectRef') open.push(marked.get(String(item['id'])));
    const media = schema === 'Clip' ? mediaOf(item) : null;
    const range =
      schema === 'Clip' || schema === 'Gap'
        ? (readRange(item, 'source_range') ?? (media === null ? null : readRange(media, 'available_range')))
        : null;
    if (range !== null) return range.duration.rate;
    for (const child of [...listIn(item, 'children')].reverse()) open.push(child);
  }
  return null;
}

function findTimeline(root: OtioObject): OtioObject | null {
  if (schemaOf(root) === 'Timeline') return root;
  if (schemaOf(root) === 'Stack' || schemaOf(root) === 'Track')
    return {
      OTIO_SCHEMA: 'Timeline.1',
      name: nameOf(root),
      tracks: { OTIO_SCHEMA: 'Stack.1', children: [root] },
    };
  const timelines = listIn(root, 'children').filter(
    (child): child is OtioObject => isObject(child) && schemaOf(child) === 'Timeline',
  );
  return timelines.length === 1 ? (timelines[0] ?? null) : null;
}

/**
 * A timeline of OpenTimelineIO, as its JSON. The episode begins with the timeline; a range that is not given is all of
 * the media; a transition takes no time of its own; a change of speed does not change the length of its item.
 * Source: OpenTimelineIO, docs/tutorials: otio-serialized-schema, timeline-structure, time-ranges.
 * @param text of the file
 * @param options a rate, where the episode has another one than the timeline
 * @returns the edit; or a sentence that names the line, or the item
 */
export function readOtio(
  text: string,
  { rate: wanted, clipRates = new Map() }: ReadEditOptions,
): Answer<Edit> {
  const parsed = parseOtio(text);
  if (!parsed.ok) return parsed;
  const timeline = findTimeline(parsed.value.root);
  if (timeline === null) return wrong('The file holds no timeline, or more than one.');
  const warnings: EditWarning[] = [];
  const warn = (sentence: string) => warnings.push({ line: null, sentence });
  try {
    const own = findRate(timeline, parsed.value.marked);
    const rate = wanted ?? own;
    if (rate === null) return wrong('The timeline is empty.');
    if (own !== null && !sameRate(own, rate))
      warn(
        `The timeline counts in ${rateOf(own).toFraction()} frames a second; it is read at ${rateOf(rate).toFraction()}.`,
      );
    const reading: Reading = { ...parsed.value, rate, clipRates, warn, inside: new Set(), items: 0 };
    const stack = resolve(timeline['tracks'], reading);
    const shown = readItem(stack, { track: 'V1', sound: false, depth: -1 }, reading);
    const { seen, hidden } = flattenTracks(shown.layers, rate);
    for (const { clip } of hidden) warn(`Nothing is seen of “${clip}”: other pictures lie over it.`);
    return right({
      title: nameOf(timeline),
      rate,
      drop: false,
      frames: shown.length,
      picture: seen,
      sound: inRecordOrder(shown.sound),
      dissolved: inRecordOrder(shown.dissolved),
      markers: [...shown.markers].sort((a, b) => a.record.compare(b.record)),
      warnings,
    });
  } catch (error) {
    if (error instanceof OtioFault) return wrong(error.message);
    throw error;
  }
}
