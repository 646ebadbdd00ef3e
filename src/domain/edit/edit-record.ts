import Fraction from 'fraction.js';
import { type Edit, type EditWarning, type Segment, type Stretch } from './edit.ts';
import { type Rate } from '../time/rate.ts';

/** A fraction as text, such as 125 or 1001/30. */
type Written = string;
type StretchRecord = readonly [Written, Written];

interface SegmentRecord {
  readonly clip: string;
  readonly alsoCalled: readonly string[];
  readonly clipRate: Rate;
  readonly source: StretchRecord;
  readonly record: StretchRecord;
  readonly speed: Written;
  readonly track: string;
}

/** An edit as it is stored: every number exact, as text. */
export interface EditRecord {
  readonly title: string;
  readonly rate: Rate;
  readonly drop: boolean;
  readonly frames: Written;
  readonly picture: readonly SegmentRecord[];
  readonly sound: readonly SegmentRecord[];
  readonly dissolved: readonly SegmentRecord[];
  readonly markers: readonly {
    readonly record: Written;
    readonly name: string;
    readonly colour: string | null;
  }[];
  readonly warnings: readonly EditWarning[];
}

function write(number: Fraction): Written {
  return number.toFraction();
}

function writeStretch(stretch: Stretch): StretchRecord {
  return [write(stretch.in), write(stretch.out)];
}

function readStretch([start, end]: StretchRecord): Stretch {
  return { in: new Fraction(start), out: new Fraction(end) };
}

function writeSegment({ source, record, speed, ...names }: Segment): SegmentRecord {
  return { ...names, source: writeStretch(source), record: writeStretch(record), speed: write(speed) };
}

function readSegment({ source, record, speed, ...names }: SegmentRecord): Segment {
  return {
    ...names,
    source: readStretch(source),
    record: readStretch(record),
    speed: new Fraction(speed),
  };
}

/** An edit for storing. */
export function toEditRecord(edit: Edit): EditRecord {
  return {
    ...edit,
    frames: write(edit.frames),
    picture: edit.picture.map(writeSegment),
    sound: edit.sound.map(writeSegment),
    dissolved: edit.dissolved.map(writeSegment),
    markers: edit.markers.map((marker) => ({ ...marker, record: write(marker.record) })),
  };
}

/** An edit as it was stored. */
export function fromEditRecord(stored: EditRecord): Edit {
  return {
    ...stored,
    frames: new Fraction(stored.frames),
    picture: stored.picture.map(readSegment),
    sound: stored.sound.map(readSegment),
    dissolved: stored.dissolved.map(readSegment),
    markers: stored.markers.map((marker) => ({ ...marker, record: new Fraction(marker.record) })),
  };
}
