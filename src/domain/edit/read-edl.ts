import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { type Rate, sameRate } from '../time/rate.ts';
import { hasDropFrame } from '../time/timecode.ts';
import {
  type Edit,
  type EditWarning,
  inRecordOrder,
  lengthOf,
  type Marker,
  rateOf,
  type ReadEditOptions,
  sayWarning,
  type Segment,
  type Stretch,
} from './edit.ts';
import { type EdlEvent, readEdlEvents } from './edl-events.ts';
import {
  atLine,
  isDissolve,
  isGenerated,
  isOutgoing,
  namesOf,
  type Reading,
  type Timed,
  timeEvents,
  readTime,
} from './edl-timing.ts';
import { flattenTracks, type Layer } from './flatten-tracks.ts';

/** The most warnings that are listed one by one. Our own limit: a file that is no list has more. */
const MOST_WARNINGS = 500;

/** How far source and record may differ and still mean the same length, in frames: both are rounded to frames. */
const ROUNDING = 2;

/** A picture that goes out where an event has just ended is that event's, whatever reel its line bears. */
function carriedOn(outgoing: EdlEvent, event: EdlEvent | undefined): string | null {
  const on = event?.source[1] === outgoing.source[0] && event.record[1] === outgoing.record[0];
  return on ? (namesOf(event)[0] ?? null) : null;
}

/** Gives the outgoing line of a transition the clip that the incoming line says it goes out from. */
function nameTransitions(events: readonly EdlEvent[]): void {
  events.forEach((event, index) => {
    const before = events[index - 1];
    if (!isDissolve(event) || before === undefined || before.number !== event.number) return;
    if (isGenerated(before)) event.to ??= event.from;
    else before.from ??= event.from ?? carriedOn(before, events[index - 2]);
  });
}

/** Tracks of an event's channels. Common practice: B is picture and sound, AA the first two sound tracks. */
function tracksOf(channels: string): { readonly picture: string | null; readonly sound: readonly string[] } {
  let picture: string | null = null;
  const sound: string[] = [];
  for (const channel of channels.split('/').flatMap((part) => part.match(/V\d*|A\d+|AA|A|B|NONE/g) ?? [])) {
    if (channel.startsWith('V')) picture = channel === 'V' ? 'V1' : channel;
    if (channel === 'B') picture = 'V1';
    if (channel === 'AA') sound.push('A1', 'A2');
    else if (channel === 'A' || channel === 'B') sound.push('A1');
    else if (/^A\d/.test(channel)) sound.push(channel);
  }
  return { picture, sound };
}

const nominal = ({ num, den }: Rate) => new Fraction(Math.round(num / den));

/** The speed that the list states, or that the lengths of an event leave. */
function speedOf(timed: Timed, room: Fraction | null, { rate, warn }: Reading): [Fraction, Stretch] {
  const { event, clipRate, source, record } = timed;
  const clipFrames = rateOf(clipRate);
  const inSource = lengthOf(source).div(clipFrames);
  const inRecord = lengthOf(record).div(rateOf(rate));
  const apart = inSource.sub(inRecord).abs().mul(rateOf(rate));
  if (event.speed !== null) {
    const fps = new Fraction(event.speed.fps);
    const miss = (speed: Fraction) => inRecord.mul(speed.abs()).sub(inSource).abs();
    // Written in frames of the clip a second, or of the list, or of the whole rate beside it, as 30 stands for
    // 30000/1001: where these differ, the lengths tell which.
    const speed = [clipFrames, nominal(clipRate), rateOf(rate), nominal(rate)]
      .map((frames) => fps.div(frames))
      .reduce((best, other) => (miss(other).compare(miss(best)) < 0 ? other : best));
    if (speed.compare(0) < 0) warn(event.speed.line, `Event ${event.number} plays backwards.`);
    // The speed is written to a tenth of a frame, and both ends are rounded to frames.
    const doubt = inRecord.div(20).add(new Fraction(ROUNDING).mul(speed.abs().add(1)));
    if (speed.compare(0) !== 0 && miss(speed).mul(clipFrames).compare(doubt) > 0)
      warn(
        event.speed.line,
        `The speed of event ${event.number} does not fit its lengths; it is taken as written.`,
      );
    return [speed, record];
  }
  if (apart.compare(sameRate(clipRate, rate) ? 0 : 1) <= 0 || isOutgoing(event))
    return [new Fraction(1), record];
  const frames = (stretch: Stretch) => lengthOf(stretch).toString();
  const differ = `Event ${event.number} has ${frames(source)} frames of source for ${frames(record)} of record, and no speed is said`;
  const whole = record.in.add(inSource.mul(rateOf(rate)));
  if (
    room !== null &&
    room.compare(record.out) > 0 &&
    whole.compare(room) <= 0 &&
    whole.compare(record.out) > 0
  ) {
    warn(event.line, `${differ}; it keeps its record-in and the length of its source.`);
    return [new Fraction(1), { in: record.in, out: whole }];
  }
  if (apart.compare(ROUNDING) <= 0) {
    warn(event.line, `${differ}; it is taken at its own speed.`);
    return [new Fraction(1), record];
  }
  warn(
    event.line,
    `${differ}; it is taken as played at ${inSource.div(inRecord).toFraction()} of its speed.`,
  );
  return [inSource.div(inRecord), record];
}

/** Where the next event on the picture begins, for each. */
function roomAfter(timed: readonly Timed[]): Map<Timed, Fraction | null> {
  const picture = timed.filter(({ event }) => tracksOf(event.channels).picture !== null);
  const order = [...picture].sort((a, b) => a.record.in.compare(b.record.in));
  return new Map(
    order.map((one, index) => {
      const next = order
        .slice(index + 1, index + 3)
        .find(({ record }) => record.in.compare(one.record.in) > 0);
      return [one, next?.record.in ?? null];
    }),
  );
}

function sayUnread(read: ReturnType<typeof readEdlEvents>, lines: number, { warn }: Reading): void {
  for (const { line, text, event } of read.unread) {
    const shown = text.length > 60 ? `${text.slice(0, 60)}…` : text;
    if (event && line >= lines) warn(line, `The list breaks off in an event: “${shown}” is left out.`);
    else warn(line, `“${shown}” is not understood ${event ? 'as an event ' : ''}and is left out.`);
  }
  for (const { line, text } of read.moreSound)
    warn(
      line,
      `${text.replace(/\s+/g, ' ')} names more sound tracks of its event; they are heard with its first.`,
    );
}

/** A transition needs both its lines; which picture goes out is not guessed. */
function findLoneTransition(events: readonly EdlEvent[]): EdlEvent | null {
  return (
    events.find((event, index) => {
      const before = events[index - 1];
      return (
        isDissolve(event) &&
        before !== undefined &&
        before.number !== event.number &&
        isOutgoing(before) &&
        before.record[1] === event.record[0]
      );
    }) ?? null
  );
}

function sayTransition({ event }: Timed, { warn }: Reading): void {
  const { line, number, transition, transitionFrames } = event;
  if (transition.startsWith('W'))
    warn(
      line,
      `Event ${number} comes in by wipe ${transition} over ${String(transitionFrames)} frames; it is taken as a dissolve.`,
    );
  else if (!/^[CD]$/.test(transition))
    warn(line, `The transition ${transition} of event ${number} is not understood; it is taken as a cut.`);
}

/** What an event puts on the tracks. */
interface Laid {
  readonly line: number;
  readonly track: string | null;
  readonly layer: Layer;
  readonly sound: readonly Segment[];
  readonly dissolved: readonly Segment[];
}

function layEvent(timed: Timed, before: Timed | undefined, room: Fraction | null, reading: Reading): Laid {
  const { event, clipRate } = timed;
  const made = isGenerated(event);
  const [speed, record] = made ? [new Fraction(1), timed.record] : speedOf(timed, room, reading);
  // A held frame is one frame, however long a source the list gives it.
  const source = speed.equals(0) ? { in: timed.source.in, out: timed.source.in.add(1) } : timed.source;
  const { picture, sound } = tracksOf(event.channels);
  if (picture === null && sound.length === 0)
    reading.warn(
      event.line,
      `The track ${event.channels} of event ${event.number} is not understood; it is left out.`,
    );
  const segment = { ...named(event), clipRate, source, record, speed };
  return {
    line: event.line,
    track: picture,
    layer: { record, segment: made || picture === null ? null : { ...segment, track: picture } },
    sound: made ? [] : sound.map((track) => ({ ...segment, track })),
    dissolved: picture === null ? [] : dissolveOut(timed, before, picture, reading),
  };
}

/** What is still seen of the picture that goes out: from its own source, for as long as the transition takes. */
function dissolveOut(
  { event, record }: Timed,
  before: Timed | undefined,
  track: string,
  reading: Reading,
): Segment[] {
  if (!isDissolve(event)) return [];
  if (before?.event.number !== event.number || !isOutgoing(before.event)) {
    reading.warn(
      event.line,
      `Event ${event.number} does not say what it comes in over; only what comes in is taken.`,
    );
    return [];
  }
  if (isGenerated(before.event)) return [];
  const frames = new Fraction(event.transitionFrames);
  const inClip = frames.mul(rateOf(before.clipRate)).div(rateOf(reading.rate));
  return [
    {
      ...named(before.event),
      clipRate: before.clipRate,
      source: { in: before.source.in, out: before.source.in.add(inClip) },
      record: { in: record.in, out: record.in.add(frames) },
      speed: new Fraction(1),
      track,
    },
  ];
}

function named(event: EdlEvent): Pick<Segment, 'clip' | 'alsoCalled'> {
  const [clip = event.reel, ...others] = namesOf(event);
  return { clip, alsoCalled: [...new Set(others)].filter((name) => name !== clip) };
}

const trackNumber = (track: string | null) => Number(track?.slice(1) ?? 0);

/** Pictures from the lowest track up; on one track a later line records over an earlier one. */
function layPictures(laid: readonly Laid[], { rate, warn }: Reading): Segment[] {
  const pictures = laid
    .filter(({ track, layer }) => track !== null && lengthOf(layer.record).compare(0) > 0)
    .sort((a, b) => trackNumber(a.track) - trackNumber(b.track) || a.line - b.line);
  const order = [...pictures].sort(
    (a, b) => trackNumber(a.track) - trackNumber(b.track) || a.layer.record.in.compare(b.layer.record.in),
  );
  for (const [index, { line, track, layer }] of order.entries()) {
    const next = order[index + 1];
    if (next?.track !== track || next.layer.record.in.compare(layer.record.out) >= 0) continue;
    const [first, last] = [Math.min(line, next.line), Math.max(line, next.line)];
    warn(last, `The event records over that of line ${String(first)}; where both lie, this one is taken.`);
  }
  return flattenTracks(
    pictures.map(({ layer }) => layer),
    rate,
  ).seen;
}

function fromZero(segment: Segment, zero: Fraction): Segment {
  return { ...segment, record: { in: segment.record.in.sub(zero), out: segment.record.out.sub(zero) } };
}

function readMarkers(timed: readonly Timed[], zero: Fraction, { rate, warn }: Reading): Marker[] {
  return timed.flatMap(({ event }) =>
    event.markers.flatMap(({ line, at, colour, name }) => {
      const read = readTime(at, rate, event.drop);
      if (read.ok) return [{ record: new Fraction(read.value).sub(zero), name, colour }];
      warn(line, `The mark is left out: ${read.error}`);
      return [];
    }),
  );
}

/**
 * An edit list of the CMX 3600 kind (SMPTE 258M). Out points are the first frame that is not in. What is not
 * understood stands in the warnings with its line; a list that cannot be trusted as a whole is refused: labels that do
 * not exist at the rate, a transition whose two lines do not belong together, no event at all.
 * @param text of the list
 * @param options the rate, which the list itself does not say
 * @returns the edit; or a sentence, with the line where there is one
 */
export function readEdl(text: string, { rate, clipRates = new Map() }: ReadEditOptions): Answer<Edit> {
  if (rate === null) return wrong('An edit list does not say its rate. Give it, such as 25 or 30000/1001.');
  const found = readEdlEvents(text);
  if (found.events.length === 0)
    return wrong(
      text.trim() === '' ? 'The list is empty.' : 'There is no event in this list: it is no edit list.',
    );
  const warnings: EditWarning[] = [];
  const reading: Reading = { rate, clipRates, warn: (line, sentence) => warnings.push({ line, sentence }) };
  sayUnread(found, lastLine(text), reading);
  if (found.events.some(({ drop }) => drop === true) && !hasDropFrame(rate))
    reading.warn(null, 'The list says drop frame, which its rate does not have; no label is dropped.');
  const lone = findLoneTransition(found.events);
  if (lone !== null)
    return wrong(
      atLine(
        lone.line,
        `the transition of event ${lone.number} follows a line of another event, so what it comes in over is not clear.`,
      ),
    );
  nameTransitions(found.events);
  const read = timeEvents(found.events, reading);
  if (!read.ok) return read;
  const timed = read.value;
  if (timed.length === 0)
    return wrong(warnings[0] === undefined ? 'No event of the list can be used.' : sayWarning(warnings[0]));
  const room = roomAfter(timed);
  const laid = timed.map((one, index) => {
    sayTransition(one, reading);
    return layEvent(one, timed[index - 1], room.get(one) ?? null, reading);
  });
  const zero = timed
    .map(({ record }) => record.in)
    .reduce((least, at) => (at.compare(least) < 0 ? at : least));
  const end = laid
    .map(({ layer }) => layer.record.out)
    .reduce((most, at) => (at.compare(most) > 0 ? at : most));
  const all = (segments: readonly Segment[]) =>
    inRecordOrder(segments.map((segment) => fromZero(segment, zero)));
  return right({
    title: found.title,
    rate,
    drop: found.events.some(({ drop }) => drop === true),
    frames: end.sub(zero),
    picture: all(layPictures(laid, reading)),
    sound: all(laid.flatMap(({ sound }) => sound)),
    dissolved: all(laid.flatMap(({ dissolved }) => dissolved)),
    markers: readMarkers(timed, zero, reading),
    warnings: fewest(warnings),
  });
}

function lastLine(text: string): number {
  return text.trimEnd().split(/\r\n|\r|\n/).length;
}

/** In the order of the list, and no more than a person reads. */
function fewest(warnings: readonly EditWarning[]): EditWarning[] {
  const sorted = [...warnings].sort((a, b) => (a.line ?? 0) - (b.line ?? 0));
  if (sorted.length <= MOST_WARNINGS) return sorted;
  const more = `${String(sorted.length - MOST_WARNINGS)} more of such lines are not listed.`;
  return [...sorted.slice(0, MOST_WARNINGS), { line: null, sentence: more }];
}
