import { z } from 'zod';
import { type Rate } from '../../domain/time/rate.ts';
import { RefusedFile } from './refused-file.ts';
import { READ_ONLY_LOCAL, inputArgs, type MediaFormat } from './media-input.ts';
import { runProgram } from '../run-program.ts';

/** What a film or sound holds, as far as is decided by it. */
export interface MediaFacts {
  readonly seconds: Rate;
  readonly bitRate: number;
  readonly video: VideoFacts | null;
  readonly audio: { readonly codec: string; readonly channels: number } | null;
  /** Of the file and its streams together, by lower-case name. */
  readonly tags: Readonly<Record<string, string>>;
}

export interface VideoFacts {
  readonly codec: string;
  readonly pixelFormat: string;
  /** As shown: turned the way the camera was held. */
  readonly width: number;
  readonly height: number;
  readonly averageRate: Rate | null;
  /** Whether the frames come at uneven times. */
  readonly variableRate: boolean;
  readonly interlaced: boolean;
  /** How many frames the container counts; null when it does not. */
  readonly frames: number | null;
}

const tags = z.record(z.string(), z.string()).default({});
const Stream = z.object({
  index: z.number(),
  codec_type: z.string().optional(),
  codec_name: z.string().default('unknown'),
  pix_fmt: z.string().default('unknown'),
  width: z.number().default(0),
  height: z.number().default(0),
  avg_frame_rate: z.string().default('0/0'),
  r_frame_rate: z.string().default('0/0'),
  field_order: z.string().default('unknown'),
  nb_frames: z.string().optional(),
  time_base: z.string().default('0/0'),
  duration_ts: z.number().optional(),
  channels: z.number().default(0),
  disposition: z.object({ attached_pic: z.number().default(0) }).prefault({}),
  side_data_list: z.array(z.object({ rotation: z.number().optional() })).default([]),
  tags,
});
type StreamRow = z.output<typeof Stream>;
const Probed = z.object({
  streams: z.array(Stream).default([]),
  format: z.object({ duration: z.string().optional(), bit_rate: z.string().optional(), tags }),
});

const UNREADABLE =
  'The file could not be read as a film or as sound: it is damaged, or was cut off. Copy it from the card again and send that, or export it as MP4.';

/**
 * Looks into a local film or sound with ffprobe.
 * @throws RefusedFile when there is neither picture nor sound in it that can be read
 */
export async function probeMedia(path: string, format: MediaFormat): Promise<MediaFacts> {
  const { status, stdout, timedOut } = await runProgram({
    program: 'ffprobe',
    args: [
      '-v',
      'error',
      ...READ_ONLY_LOCAL,
      ...inputArgs(format),
      '-print_format',
      'json',
      '-show_format',
      '-show_streams',
      path,
    ],
    seconds: 120,
    memoryBytes: 4 * 2 ** 30,
  });
  if (timedOut || status !== 0) throw new RefusedFile(UNREADABLE);
  const parsed = Probed.safeParse(JSON.parse(stdout.toString('utf8')));
  if (!parsed.success) throw new RefusedFile(UNREADABLE);
  return readFacts(parsed.data);
}

function readFacts({ streams, format }: z.output<typeof Probed>): MediaFacts {
  const video = streams.find(
    (stream) => stream.codec_type === 'video' && stream.disposition.attached_pic === 0,
  );
  const audio = streams.find((stream) => stream.codec_type === 'audio');
  const main = video ?? audio;
  if (!main || (video && (video.width === 0 || video.height === 0))) throw new RefusedFile(UNREADABLE);
  const seconds = lengthOf(main, format.duration);
  if (seconds === null) {
    throw new RefusedFile(
      'There is nothing in the file: its length is nought. Look at it where it came from, and export it again.',
    );
  }
  return {
    seconds,
    bitRate: Number(format.bit_rate ?? 0),
    video: video ? videoFacts(video) : null,
    audio: audio ? { codec: audio.codec_name, channels: audio.channels } : null,
    tags: lowerNames({ ...Object.assign({}, ...streams.map((stream) => stream.tags)), ...format.tags }),
  };
}

function videoFacts(stream: StreamRow): VideoFacts {
  const rotation = stream.side_data_list.find(({ rotation: angle }) => angle !== undefined)?.rotation ?? 0;
  const turned = Math.abs(rotation) % 180 === 90;
  const average = readFraction(stream.avg_frame_rate);
  const base = readFraction(stream.r_frame_rate);
  return {
    codec: stream.codec_name,
    pixelFormat: stream.pix_fmt,
    width: turned ? stream.height : stream.width,
    height: turned ? stream.width : stream.height,
    averageRate: average,
    variableRate:
      average !== null &&
      base !== null &&
      Math.abs((average.num * base.den) / (average.den * base.num) - 1) > 0.001,
    interlaced: !['progressive', 'unknown'].includes(stream.field_order),
    frames: stream.nb_frames === undefined ? null : Number(stream.nb_frames),
  };
}

/** Exactly from the stream's own clock where it has one, else to the microsecond. */
function lengthOf(stream: StreamRow, whole: string | undefined): Rate | null {
  const base = readFraction(stream.time_base);
  if (stream.duration_ts !== undefined && stream.duration_ts > 0 && base !== null)
    return { num: stream.duration_ts * base.num, den: base.den };
  const microseconds = Math.round(Number(whole ?? 0) * 1e6);
  return microseconds > 0 ? { num: microseconds, den: 1_000_000 } : null;
}

function readFraction(text: string): Rate | null {
  const [num = 0, den = 0] = text.split('/').map(Number);
  return num > 0 && den > 0 ? { num, den } : null;
}

function lowerNames(given: Record<string, string>): Record<string, string> {
  return Object.fromEntries(Object.entries(given).map(([name, value]) => [name.toLowerCase(), value]));
}
