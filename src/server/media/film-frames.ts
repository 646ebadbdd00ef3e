import { access } from 'node:fs/promises';
import { join } from 'node:path';
import { type MediaFormat } from './media-input.ts';
import { RefusedFile } from './refused-file.ts';
import { runFfmpeg } from './run-ffmpeg.ts';

/** A strip has so many pictures, or one a second of a film that is shorter. */
const MOST_FRAMES = 12;

/**
 * Takes frames out of a local film at even times: the middle of each of as many equal stretches.
 * @param length of the film, in seconds
 * @returns paths of PNG files in the folder, in order; each as large as asked and not larger
 * @throws RefusedFile when not even one can be read
 */
export async function takeFrames(
  film: { readonly path: string; readonly format: MediaFormat; readonly length: number },
  folder: string,
): Promise<string[]> {
  const count = Math.min(MOST_FRAMES, Math.max(1, Math.floor(film.length)));
  const taken: string[] = [];
  for (let index = 0; index < count; index += 1) {
    const path = join(folder, `frame-${String(index)}.png`);
    await takeFrame(film, ((index + 0.5) * film.length) / count, 480, path);
    const there = await exists(path);
    // The last second of a film may have sound alone: the picture before it stays on screen.
    const before = taken.at(-1);
    if (there) taken.push(path);
    else if (before !== undefined) taken.push(before);
  }
  if (taken.length === 0) {
    const path = await takeStill(film, 0, folder);
    taken.push(path);
  }
  return taken;
}

/** Takes one frame in full size. @throws RefusedFile when there is none */
export async function takeStill(
  film: { readonly path: string; readonly format: MediaFormat; readonly length: number },
  at: number,
  folder: string,
): Promise<string> {
  const path = join(folder, 'still.png');
  await takeFrame(film, at, 1920, path);
  if (!(await exists(path)) && at > 0) await takeFrame(film, 0, 1920, path);
  if (!(await exists(path)))
    throw new RefusedFile('No picture of the film could be read. Export it again as MP4 and send that.');
  return path;
}

async function takeFrame(
  film: { readonly path: string; readonly format: MediaFormat },
  from: number,
  edge: number,
  path: string,
): Promise<void> {
  const side = String(edge);
  await runFfmpeg({
    path: film.path,
    format: film.format,
    from,
    output: [
      '-map',
      '0:v:0',
      '-frames:v',
      '1',
      '-vf',
      `scale=w='min(${side},iw)':h='min(${side},ih)':force_original_aspect_ratio=decrease,setsar=1`,
      '-f',
      'image2',
      '-update',
      '1',
      path,
    ],
    seconds: 120,
    fileBytes: 64 * 2 ** 20,
  });
}

async function exists(path: string): Promise<boolean> {
  try {
    await access(path);
    return true;
  } catch {
    return false;
  }
}
