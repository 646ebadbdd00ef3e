import { type Locator } from '@playwright/test';
import sharp from 'sharp';
import { makeMedia } from '../media-samples.ts';

/** Columns of a picture: each is one binary figure of its counter. */
const COLUMNS = 16;
/** Clips are told apart by the figures above their frames. */
const FRAMES = 4096;

/** A stretch of a clip in frames, half-open. */
export interface Cut {
  /** 1 to 15. */
  readonly clip: number;
  readonly in: number;
  readonly out: number;
}

/** What a picture of a film says: which frame of which clip it is. */
export function counterOf(clip: number, frame: number): number {
  return clip * FRAMES + frame;
}

/** A film at 25 frames a second, rendered from its cuts; every picture shows its clip and frame as black and white columns. */
export function makeCountedFilm(cuts: readonly Cut[]): Promise<Buffer> {
  const segments = cuts.map(({ clip, in: start, out }, index) => {
    const figure = `mod(floor((N+${String(counterOf(clip, 0))})/pow(2,X)),2)`;
    return [
      `color=c=black:s=${String(COLUMNS)}x9:r=25,format=gray,trim=end_frame=${String(out)}`,
      `geq=lum='if(${figure},235,16)'`,
      `trim=start_frame=${String(start)},setpts=PTS-STARTPTS`,
      `scale=320:180:flags=neighbor,format=yuv420p[s${String(index)}]`,
    ].join(',');
  });
  const all = cuts.map((_cut, index) => `[s${String(index)}]`).join('');
  const joined = `${all}concat=n=${String(cuts.length)}:v=1:a=0[v]`;
  const coding = ['-c:v', 'libx264', '-preset', 'ultrafast', '-crf', '12', '-g', '25', '-pix_fmt', 'yuv420p'];
  return makeMedia(
    'episode.mp4',
    ...['-filter_complex', [...segments, joined].join(';'), '-map', '[v]'],
    ...[...coding, '-r', '25', '-movflags', '+faststart'],
  );
}

/** Reads the counter in the picture that a player shows. */
export async function readCounter(video: Locator): Promise<number> {
  const { data, info } = await sharp(await video.screenshot())
    .greyscale()
    .raw()
    .toBuffer({ resolveWithObject: true });
  // Above the player's own controls, in the middle of each column.
  const row = Math.floor(info.height / 4);
  return Array.from({ length: COLUMNS }, (_none, column) => {
    const x = Math.floor(((column + 0.5) * info.width) / COLUMNS);
    return (data[(row * info.width + x) * info.channels] ?? 0) > 127 ? 2 ** column : 0;
  }).reduce((sum, figure) => sum + figure, 0);
}

/** Does something that seeks, and waits until the player shows the picture it sought. */
export async function afterSeek(video: Locator, seek: () => Promise<void>): Promise<void> {
  await video.evaluate((player: HTMLVideoElement) => {
    const shown = new Promise<void>((resolve) => {
      player.addEventListener('seeked', () => requestAnimationFrame(() => resolve()), { once: true });
    });
    Object.assign(globalThis, { shownAfterSeek: shown });
  });
  await seek();
  await video.evaluate(() => (globalThis as unknown as { shownAfterSeek: Promise<void> }).shownAfterSeek);
}
