import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import sharp from 'sharp';
import { type MediaFormat } from './media-input.ts';
import { type MadePicture } from './picture-copies.ts';
import { RefusedFile } from './refused-file.ts';
import { runFfmpeg } from './run-ffmpeg.ts';

const WIDTH = 960;
const HEIGHT = 60;
/** Between ink and ground, so that it is seen on a light sheet and on a dark one. */
const COLOUR = '0x76858c';

/**
 * Draws how loud a local film or sound is from its beginning to its end: one colour on nothing.
 * @returns null when its sound cannot be drawn, which the film can do without
 */
export async function drawWaveform(
  film: { readonly path: string; readonly format: MediaFormat; readonly length: number },
  folder: string,
): Promise<MadePicture | null> {
  const path = join(folder, 'waveform.png');
  // The square root of the loudness, so that speech is seen beside a mallet.
  const draw = `showwavespic=s=${String(WIDTH)}x${String(HEIGHT)}:colors=${COLOUR}:scale=sqrt:filter=peak`;
  try {
    await runFfmpeg({
      path: film.path,
      format: film.format,
      output: [
        '-filter_complex',
        `[0:a:0]aformat=channel_layouts=mono,${draw}`,
        '-frames:v',
        '1',
        '-f',
        'image2',
        '-update',
        '1',
        path,
      ],
      seconds: 600 + film.length,
      fileBytes: 2 ** 20,
    });
    const { data, info } = await sharp(await readFile(path))
      .webp({ lossless: true })
      .toBuffer({ resolveWithObject: true });
    return {
      variant: 'waveform',
      contentType: 'image/webp',
      bytes: data,
      width: info.width,
      height: info.height,
    };
  } catch (error) {
    if (error instanceof RefusedFile || isMissing(error)) return null;
    throw error;
  }
}

function isMissing(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ENOENT';
}
