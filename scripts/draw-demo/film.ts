import { execFileSync, spawn } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { type Ground, group, picture, words } from './drawing.ts';

/** A sentence of the narration: as its caption has it, and as the speaker needs it where that differs. */
export interface Cue {
  readonly text: string;
  readonly say?: string;
}

/** What a drawing knows of the moment it is drawn for. */
export interface Now {
  /** Seconds into the shot. */
  readonly at: number;
  /** How far something has come in that begins with a sentence: 0 before, 1 after. */
  readonly come: (cue: number, delay?: number, takes?: number) => number;
  /** 1 while a sentence is the one spoken, else 0. */
  readonly on: (...cues: readonly number[]) => number;
}

export interface Shot {
  readonly chapter: string;
  readonly ground?: Ground;
  readonly cues: readonly Cue[];
  readonly draw: (now: Now) => string;
}

export interface Film {
  readonly file: string;
  /** What the title block on the picture says of the film; none for a clip as the camera made it. */
  readonly episode: string | null;
  readonly shots: readonly Shot[];
  /** Tags in the file. */
  readonly tags?: Readonly<Record<string, string>>;
  readonly captions: string;
}

const WIDTH = 1280;
const HEIGHT = 720;
/** Pictures drawn a second; each stands for two frames of the film. */
const DRAWN = 12.5;
const SAMPLES = 16_000;
const BEFORE = 0.8;
const BETWEEN_CUES = 0.45;
const BETWEEN_SHOTS = 0.9;
const AFTER = 1.6;

interface TimedCue extends Cue {
  readonly from: number;
  readonly to: number;
}
interface TimedShot extends Shot {
  readonly from: number;
  readonly to: number;
  readonly timed: readonly TimedCue[];
}

/** Speaks, draws and encodes a film and writes its captions. Needs Debian's flite and ffmpeg. */
export async function makeFilm(film: Film, output: string, work: string): Promise<void> {
  const { shots, sound, length } = speak(film, work);
  const speech = join(work, 'speech.wav');
  writeFileSync(speech, wav(sound));
  writeFileSync(join(output, film.captions), webvtt(shots));
  const tags = Object.entries(film.tags ?? {}).flatMap(([name, value]) => ['-metadata', `${name}=${value}`]);
  const encoder = spawn(
    'ffmpeg',
    [
      ...[
        '-y',
        '-v',
        'error',
        '-f',
        'rawvideo',
        '-pix_fmt',
        'rgb24',
        '-s',
        `${String(WIDTH)}x${String(HEIGHT)}`,
      ],
      ...['-framerate', '25/2', '-i', '-', '-i', speech, '-r', '25', '-map', '0:v', '-map', '1:a'],
      ...['-vf', 'scale=out_color_matrix=bt709:out_range=tv,format=yuv420p'],
      ...['-colorspace', 'bt709', '-color_primaries', 'bt709', '-color_trc', 'bt709'],
      ...[
        '-c:v',
        'libx264',
        '-profile:v',
        'high',
        '-preset',
        'veryslow',
        '-crf',
        '30',
        '-g',
        '250',
        '-tune',
        'animation',
      ],
      ...[
        '-af',
        'highpass=f=90,volume=2dB,alimiter=limit=0.9',
        '-c:a',
        'aac',
        '-b:a',
        '40k',
        '-ar',
        '24000',
        '-ac',
        '1',
      ],
      ...[
        '-map_metadata',
        '-1',
        '-fflags',
        '+bitexact',
        '-flags',
        '+bitexact',
        ...tags,
        '-movflags',
        '+faststart',
      ],
      join(output, film.file),
    ],
    { stdio: ['pipe', 'inherit', 'inherit'] },
  );
  const ended = once(encoder, 'close');
  let last: { svg: string; pixels: Buffer } = { svg: '', pixels: Buffer.alloc(0) };
  for (let index = 0; index < Math.ceil(length * DRAWN); index += 1) {
    const svg = drawAt(film, shots, index / DRAWN);
    if (svg !== last.svg) last = { svg, pixels: await render(svg) };
    if (!encoder.stdin.write(last.pixels)) await once(encoder.stdin, 'drain');
  }
  encoder.stdin.end();
  const [status] = (await ended) as [number];
  if (status !== 0) throw new Error(`ffmpeg ended with status ${String(status)}.`);
}

/** One picture of a film as PNG, to look at while it is drawn. */
export async function drawStill(film: Film, at: number, work: string): Promise<Buffer> {
  const { default: sharp } = await import('sharp');
  return sharp(Buffer.from(drawAt(film, speak(film, work).shots, at)))
    .png()
    .toBuffer();
}

/** When each sentence is spoken, without making the film. */
export function timesOf(film: Film, work: string): string {
  return webvtt(speak(film, work).shots);
}

async function render(svg: string): Promise<Buffer> {
  const { default: sharp } = await import('sharp');
  return sharp(Buffer.from(svg)).removeAlpha().raw().toBuffer();
}

function drawAt(film: Film, shots: readonly TimedShot[], time: number): string {
  const shot = shots.find(({ to }) => time < to) ?? shots.at(-1);
  if (!shot) throw new Error('A film has at least one shot.');
  const now: Now = {
    at: time - shot.from,
    come: (cue, delay = 0, takes = 0.5) => {
      const begin = (shot.timed[cue]?.from ?? shot.from) + delay;
      const part = Math.min(1, Math.max(0, (time - begin) / takes));
      return part * part * (3 - 2 * part);
    },
    on: (...cues) =>
      cues.some((cue) => {
        const { from = 0, to = 0 } = shot.timed[cue] ?? {};
        return time >= from - 0.1 && time < to + 0.35;
      })
        ? 1
        : 0,
  };
  const fade = Math.min(1, (time - shot.from) / 0.32 + 0.08);
  const size = { ground: shot.ground ?? ('bench' as const), width: WIDTH, height: HEIGHT };
  return picture(size, group(shot.draw(now), { opacity: fade }) + titleBlock(film, shot.chapter));
}

/** Top left, where captions and the player's own bar never stand. */
function titleBlock({ episode }: Film, chapter: string): string {
  if (episode === null) return '';
  const wide = 34 + chapter.length * 12.6;
  return `<g transform="translate(40 34)"><rect class="paper" width="${String(64 + wide)}" height="58" stroke="#9aa9ae" stroke-width="1.6"/><path class="soft" d="M64 0v58"/>${words(32, 21, 'Episode', { size: 13, kind: 'faint', anchor: 'middle' })}${words(32, 47, episode, { size: 24, kind: 'mono', anchor: 'middle' })}${words(80, 38, chapter, { size: 25, kind: 'strong' })}</g>`;
}

function speak(film: Film, work: string): { shots: TimedShot[]; sound: Int16Array; length: number } {
  const pieces: { from: number; samples: Int16Array }[] = [];
  const shots: TimedShot[] = [];
  let time = BEFORE;
  for (const shot of film.shots) {
    const from = shots.at(-1)?.to ?? 0;
    const timed = shot.cues.map((cue) => {
      const samples = sayAloud(cue.say ?? cue.text, work);
      const begin = time;
      pieces.push({ from: begin, samples });
      const to = begin + samples.length / SAMPLES;
      time = to + BETWEEN_CUES;
      return { ...cue, from: begin, to };
    });
    const end = timed.at(-1)?.to ?? time;
    shots.push({ ...shot, from, to: end + BETWEEN_SHOTS / 2, timed });
    time = end + BETWEEN_SHOTS;
  }
  const length = time + AFTER;
  const last = shots.at(-1);
  if (last) shots[shots.length - 1] = { ...last, to: length };
  const sound = new Int16Array(Math.ceil(length * SAMPLES));
  for (const { from, samples } of pieces) sound.set(samples, Math.round(from * SAMPLES));
  return { shots, sound, length };
}

/** Speaks a sentence and cuts the silence off both ends, so that its times are those of the voice. */
function sayAloud(text: string, work: string): Int16Array {
  const file = join(work, 'sentence.wav');
  execFileSync('flite', ['-voice', 'slt', '--setf', 'duration_stretch=1.04', '-t', text, '-o', file]);
  const bytes = readFileSync(file);
  const begin = bytes.indexOf('data', 12, 'latin1') + 8;
  const samples = new Int16Array(
    bytes.buffer.slice(bytes.byteOffset + begin, bytes.byteOffset + bytes.length),
  );
  const isLoud = (value: number) => Math.abs(value) > 300;
  const spare = 0.04 * SAMPLES;
  const first = Math.max(0, samples.findIndex(isLoud) - spare);
  const last = Math.min(samples.length, samples.findLastIndex(isLoud) + 2 * spare);
  return samples.slice(first, last);
}

function wav(samples: Int16Array): Buffer {
  const head = Buffer.alloc(44);
  head.write('RIFF', 0);
  head.writeUInt32LE(36 + samples.byteLength, 4);
  head.write('WAVEfmt ', 8);
  head.writeUInt32LE(16, 16);
  head.writeUInt16LE(1, 20);
  head.writeUInt16LE(1, 22);
  head.writeUInt32LE(SAMPLES, 24);
  head.writeUInt32LE(SAMPLES * 2, 28);
  head.writeUInt16LE(2, 32);
  head.writeUInt16LE(16, 34);
  head.write('data', 36);
  head.writeUInt32LE(samples.byteLength, 40);
  return Buffer.concat([head, Buffer.from(samples.buffer, samples.byteOffset, samples.byteLength)]);
}

function webvtt(shots: readonly TimedShot[]): string {
  const cues = shots
    .flatMap(({ timed }) => timed)
    .map(({ from, to, text }) => `${stamp(from)} --> ${stamp(to)}\n${inLines(text)}\n`);
  return `WEBVTT\n\n${cues.join('\n')}`;
}

/** Two lines at most, broken near the middle. */
function inLines(text: string): string {
  if (text.length <= 42) return text;
  const spaces = [...text.matchAll(/ /g)].map(({ index }) => index);
  const middle = spaces.reduce((best, at) =>
    Math.abs(at - text.length / 2) < Math.abs(best - text.length / 2) ? at : best,
  );
  return `${text.slice(0, middle)}\n${text.slice(middle + 1)}`;
}

function stamp(seconds: number): string {
  return new Date(Math.round(seconds * 1000)).toISOString().slice(11, 23);
}
