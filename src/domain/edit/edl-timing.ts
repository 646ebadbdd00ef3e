import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { type Rate } from '../time/rate.ts';
import { framesADay, hasDropFrame, parseTimecode } from '../time/timecode.ts';
import { findByClipName } from './clip-names.ts';
import { sayWarning, type Stretch } from './edit.ts';
import { type EdlEvent } from './edl-events.ts';

/** Reels that stand for pictures which a machine makes. Common practice of edit lists. */
const GENERATED = /^(?:BL|BLACK|BARS)$/i;

/** An event with its times counted. */
export interface Timed {
  readonly event: EdlEvent;
  readonly clipRate: Rate;
  readonly source: Stretch;
  /** In frames of the list's own labels, not yet from the first event. */
  readonly record: Stretch;
}

export interface Reading {
  readonly rate: Rate;
  readonly clipRates: ReadonlyMap<string, Rate>;
  readonly warn: (line: number | null, sentence: string) => void;
}

export const atLine = (line: number, sentence: string) => sayWarning({ line, sentence });
export const isGenerated = (event: EdlEvent) => GENERATED.test(event.reel);
export const isDissolve = (event: EdlEvent) => /^[DW]/.test(event.transition);

/** The first line of a transition says what goes out, and has no length. */
export function isOutgoing(event: EdlEvent): boolean {
  return event.record[0] === event.record[1];
}

/** A time as a list writes it: a label, or a count of frames. */
export function readTime(written: string, rate: Rate, drop: boolean | null): Answer<number> {
  if (/^\d+$/.test(written)) return right(Number(written));
  const [hours = '', minutes = '', seconds = '', frames = ''] = written.split(/[:;.]/);
  const marked = /[;.]\d+$/.test(written) || (drop === true && hasDropFrame(rate));
  const read = parseTimecode(`${hours}:${minutes}:${seconds}${marked ? ';' : ':'}${frames}`, rate);
  return read.ok ? right(read.value.frame) : read;
}

/** A source may run over midnight on the camera's clock; then it ends on the day after. */
function overMidnight(start: number, end: number, rate: Rate, drop: boolean): number {
  const day = framesADay(rate, drop);
  return end < start && start >= (day * 23) / 24 && end <= day / 24 ? end + day : end;
}

/** @returns null for an event that is left out, with a warning */
function timeEvent(event: EdlEvent, { rate, clipRates, warn }: Reading): Answer<Timed | null> {
  const { line, drop } = event;
  const clipRate = findByClipName(clipRates, namesOf(event)) ?? rate;
  const times: number[] = [];
  for (const [written, at] of [
    [event.source[0], clipRate],
    [event.source[1], clipRate],
    [event.record[0], rate],
    [event.record[1], rate],
  ] as const) {
    const read = readTime(written, at, drop);
    if (!read.ok) return wrong(atLine(line, read.error));
    times.push(read.value);
  }
  const [sourceIn = 0, sourceEnd = 0, recordIn = 0, recordOut = 0] = times;
  const backwards = sourceEnd < sourceIn && event.speed !== null && event.speed.fps.startsWith('-');
  const dropped = hasDropFrame(clipRate) && (drop === true || /[;.]\d+$/.test(event.source[1]));
  const sourceOut = overMidnight(sourceIn, sourceEnd, clipRate, dropped);
  if (recordOut < recordIn || (sourceOut < sourceIn && !backwards)) {
    const which = recordOut < recordIn ? 'record' : 'source';
    warn(line, `The ${which} of event ${event.number} ends before it begins; the event is left out.`);
    return right(null);
  }
  const source = backwards ? [sourceOut, sourceIn] : [sourceIn, sourceOut];
  return right({
    event,
    clipRate,
    source: { in: new Fraction(source[0] ?? 0), out: new Fraction(source[1] ?? 0) },
    record: { in: new Fraction(recordIn), out: new Fraction(recordOut) },
  });
}

/** All names that a list has for the clip of an event, the best one first. */
export function namesOf(event: EdlEvent): string[] {
  // Of a transition FROM is what goes out; black has no name, so that FROM after it means what comes in.
  const own = isDissolve(event) ? event.to : event.from;
  return [own, isDissolve(event) ? null : event.file, event.reel].filter(
    (name): name is string => name !== null && name !== '',
  );
}

/** The events with their times, those without length left out; or why the list cannot be read. */
export function timeEvents(events: readonly EdlEvent[], reading: Reading): Answer<readonly Timed[]> {
  const timed: Timed[] = [];
  for (const [index, event] of events.entries()) {
    const next = events[index + 1];
    const goesOut = next?.number === event.number && isDissolve(next);
    if (isOutgoing(event) && !goesOut) {
      reading.warn(event.line, `Event ${event.number} has no length and is left out.`);
      continue;
    }
    const read = timeEvent(event, reading);
    if (!read.ok) return read;
    if (read.value !== null) timed.push(read.value);
  }
  return right(timed);
}
