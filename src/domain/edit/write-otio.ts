import Fraction from 'fraction.js';
import { type Rate } from '../time/rate.ts';
import { type Edit, lengthOf, type Marker, rateOf, type Segment } from './edit.ts';
import { type OtioObject } from './otio-objects.ts';

/** The colours that a mark of a timeline may have. Source: OpenTimelineIO, marker.h. */
const COLOURS = [
  'PINK',
  'RED',
  'ORANGE',
  'YELLOW',
  'GREEN',
  'CYAN',
  'BLUE',
  'PURPLE',
  'MAGENTA',
  'BLACK',
  'WHITE',
];

const NO_TIME = new Fraction(0);

function time(frames: Fraction, rate: Rate): OtioObject {
  return { OTIO_SCHEMA: 'RationalTime.1', rate: rateOf(rate).valueOf(), value: frames.valueOf() };
}

function range(start: Fraction, duration: Fraction, rate: Rate, durationRate = rate): OtioObject {
  return {
    OTIO_SCHEMA: 'TimeRange.1',
    duration: time(duration, durationRate),
    start_time: time(start, rate),
  };
}

function writeEffects({ speed }: Segment): OtioObject[] {
  if (speed.equals(1)) return [];
  const held = speed.equals(0);
  return [
    {
      OTIO_SCHEMA: held ? 'FreezeFrame.1' : 'LinearTimeWarp.1',
      metadata: {},
      name: '',
      effect_name: held ? 'FreezeFrame' : 'LinearTimeWarp',
      time_scalar: speed.valueOf(),
    },
  ];
}

function writeClip(segment: Segment, rate: Rate): OtioObject {
  const { clip, alsoCalled, source, clipRate, record } = segment;
  const [file] = alsoCalled;
  // The range has the length that the clip takes in the episode; its speed is an effect that does not change it.
  const inClip = lengthOf(record).div(rateOf(rate)).mul(rateOf(clipRate));
  const media =
    file === undefined
      ? { OTIO_SCHEMA: 'MissingReference.1', metadata: {}, name: '', available_range: null }
      : {
          OTIO_SCHEMA: 'ExternalReference.1',
          metadata: {},
          name: file,
          available_range: null,
          target_url: encodeURI(file),
        };
  return {
    OTIO_SCHEMA: 'Clip.2',
    metadata: {},
    name: clip,
    source_range: range(source.in, inClip, clipRate),
    effects: writeEffects(segment),
    markers: [],
    enabled: true,
    media_references: { DEFAULT_MEDIA: media },
    active_media_reference_key: 'DEFAULT_MEDIA',
  };
}

function writeGap(length: Fraction, rate: Rate): OtioObject {
  return {
    OTIO_SCHEMA: 'Gap.1',
    metadata: {},
    name: '',
    source_range: range(NO_TIME, length, rate),
    effects: [],
    markers: [],
    enabled: true,
  };
}

function writeTrack(name: string, kind: string, segments: readonly Segment[], edit: Edit): OtioObject {
  const { rate, frames } = edit;
  const children: OtioObject[] = [];
  let at = NO_TIME;
  const fill = (until: Fraction) => {
    if (until.compare(at) > 0) children.push(writeGap(until.sub(at), rate));
  };
  for (const segment of segments) {
    fill(segment.record.in);
    children.push(writeClip(segment, rate));
    at = segment.record.out;
  }
  fill(frames);
  return {
    OTIO_SCHEMA: 'Track.1',
    metadata: {},
    name,
    source_range: null,
    effects: [],
    markers: [],
    enabled: true,
    children,
    kind,
  };
}

function writeMarker({ record, name, colour }: Marker, rate: Rate): OtioObject {
  const ink = colour?.toUpperCase() ?? '';
  return {
    OTIO_SCHEMA: 'Marker.2',
    metadata: {},
    name,
    color: COLOURS.includes(ink) ? ink : 'RED',
    marked_range: range(record, NO_TIME, rate),
  };
}

/** Sound laid out so that nothing on one track overlaps. */
function soundTracks(sound: readonly Segment[]): Segment[][] {
  const tracks: Segment[][] = [];
  for (const segment of sound) {
    const free = tracks.find((track) => {
      const last = track.at(-1);
      return last !== undefined && last.record.out.compare(segment.record.in) <= 0;
    });
    if (free === undefined) tracks.push([segment]);
    else free.push(segment);
  }
  return tracks;
}

/**
 * An edit as a timeline of OpenTimelineIO: its pictures on one track, its sound on as many as it needs, its marks on
 * the stack that holds them.
 * Source: OpenTimelineIO, docs/tutorials/otio-serialized-schema.
 */
export function writeOtio(edit: Edit): string {
  const { title, rate, markers } = edit;
  const tracks = [
    writeTrack('V1', 'Video', edit.picture, edit),
    ...soundTracks(edit.sound).map((track, index) =>
      writeTrack(`A${String(index + 1)}`, 'Audio', track, edit),
    ),
  ];
  const timeline = {
    OTIO_SCHEMA: 'Timeline.1',
    metadata: {},
    name: title,
    global_start_time: null,
    tracks: {
      OTIO_SCHEMA: 'Stack.1',
      metadata: {},
      name: 'tracks',
      source_range: null,
      effects: [],
      markers: markers.map((marker) => writeMarker(marker, rate)),
      enabled: true,
      children: tracks,
    },
  };
  return `${JSON.stringify(timeline, null, 2)}\n`;
}
