import { execFile } from 'node:child_process';
import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { promisify } from 'node:util';
import sharp from 'sharp';
import { throwawayFolder } from './throwaway.ts';

const run = promisify(execFile);

/** Runs ffmpeg and gives what it wrote. @param options everything before the output file */
export async function makeMedia(name: string, ...options: string[]): Promise<Buffer> {
  const folder = throwawayFolder('sample');
  try {
    const path = join(folder.path, name);
    await run('ffmpeg', ['-v', 'error', '-nostdin', ...options, path]);
    return await readFile(path);
  } finally {
    folder.remove();
  }
}

const PICTURE = ['-f', 'lavfi', '-i', 'testsrc2=size=320x180:rate=25:duration=2'];
const SOUND = ['-f', 'lavfi', '-i', 'sine=frequency=440:duration=2'];

/** Two seconds at 25 frames a second, H.264 and AAC. @param options further ones of the output */
export function makeFilm(name = 'C0043.mp4', ...options: string[]): Promise<Buffer> {
  const h264 = [
    '-c:v',
    'libx264',
    '-preset',
    'ultrafast',
    '-pix_fmt',
    'yuv420p',
    '-c:a',
    'aac',
    '-flags:a',
    '+bitexact',
    '-shortest',
  ];
  return makeMedia(name, ...PICTURE, ...SOUND, ...h264, ...options);
}

/** Two seconds of one tone. */
export function makeSound(name: string, ...options: string[]): Promise<Buffer> {
  return makeMedia(name, ...SOUND, ...options);
}

/** A photo with a place, a device and a time in it. */
export async function makePhoto(format: 'jpeg' | 'png' | 'webp' = 'jpeg', width = 640, height = 480) {
  return sharp({ create: { width, height, channels: 3, background: '#8a6112' } })
    .withExif({
      IFD0: { Make: 'Marram Optics', Model: 'Shed One' },
      IFD2: { DateTimeOriginal: '2026:03:14 14:22:07' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '52/1 39/1 0/1' },
    })
    .toFormat(format)
    .toBuffer();
}

const HEIF_ENC = '/usr/bin/heif-enc';

/** A JPEG as a phone would save it. */
export async function makeHeic(jpeg: Uint8Array): Promise<Buffer> {
  const folder = throwawayFolder('sample');
  try {
    const [from, to] = [join(folder.path, 'photo.jpg'), join(folder.path, 'photo.heic')];
    await writeFile(from, jpeg);
    await run(HEIF_ENC, ['-q', '60', '-o', to, from]);
    return await readFile(to);
  } finally {
    folder.remove();
  }
}

/** What ffprobe says of a film, tags of every stream included. */
export async function look(bytes: Uint8Array): Promise<{
  streams: Record<string, unknown>[];
  chapters: unknown[];
  format: { duration: string; tags?: Record<string, string> };
}> {
  const child = run(
    'ffprobe',
    [
      '-v',
      'error',
      '-print_format',
      'json',
      '-show_streams',
      '-show_format',
      '-show_chapters',
      '-i',
      'pipe:0',
    ],
    { encoding: 'utf8' },
  );
  child.child.stdin?.on('error', () => undefined).end(bytes);
  return JSON.parse((await child).stdout) as Awaited<ReturnType<typeof look>>;
}
