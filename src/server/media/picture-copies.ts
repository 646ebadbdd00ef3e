import sharp, { type OutputInfo, type Sharp } from 'sharp';
import { RefusedFile } from './refused-file.ts';

/** One kept form, made. */
export interface MadePicture {
  readonly variant: 'thumb' | 'medium' | 'large' | 'poster' | 'filmstrip' | 'waveform';
  readonly contentType: string;
  readonly bytes: Buffer;
  readonly width: number;
  readonly height: number;
  /** Of a filmstrip: how many pictures stand side by side. */
  readonly frames?: number;
}

/** A camera's largest and then some; a small file that unpacks to more is an attack. */
const MOST_PIXELS = 150_000_000;

const EDGES = [
  ['thumb', 320],
  ['medium', 960],
  ['large', 2048],
] as const;

const DAMAGED =
  'The picture is damaged or was cut off. Copy it from the card again and send that, or save it as JPEG.';

// Of the many loaders that come along, the three that are taken.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpeg', 'VipsForeignLoadPng', 'VipsForeignLoadWebp'] });
sharp.cache(false);
sharp.concurrency(1);

function open(source: Buffer | string): Sharp {
  return sharp(source, {
    limitInputPixels: MOST_PIXELS,
    failOn: 'truncated',
    pages: 1,
    sequentialRead: true,
  });
}

/**
 * The copies of a photo that are shown: turned upright, in sRGB, without anything that the camera wrote into it.
 * @param source a file, or its bytes
 * @returns them, the photo's size as shown, and its raw EXIF block
 * @throws RefusedFile when it is damaged or too large
 */
export async function makePhotoCopies(
  source: Buffer | string,
): Promise<{ copies: MadePicture[]; width: number; height: number; exif: Buffer | null }> {
  try {
    const { width, height, exif, orientation = 1 } = await open(source).metadata();
    if (width * height > MOST_PIXELS)
      throw new RefusedFile('The picture has more than 150 million pixels. Save it smaller and send that.');
    const copies: MadePicture[] = [];
    for (const [variant, edge] of EDGES) {
      copies.push(
        toPicture(
          variant,
          'image/webp',
          await open(source)
            .rotate()
            .resize({ width: edge, height: edge, fit: 'inside', withoutEnlargement: true })
            .webp({ quality: variant === 'thumb' ? 72 : 82 })
            .toBuffer({ resolveWithObject: true }),
        ),
      );
    }
    const turned = orientation >= 5;
    return {
      copies,
      width: turned ? height : width,
      height: turned ? width : height,
      exif: exif ?? null,
    };
  } catch (error) {
    if (error instanceof RefusedFile) throw error;
    throw new RefusedFile(DAMAGED);
  }
}

/** The still of a film: large for its page, small for lists. */
export async function makeStills(frame: string): Promise<MadePicture[]> {
  const poster = open(frame).resize({ width: 1280, height: 1280, fit: 'inside', withoutEnlargement: true });
  const thumb = open(frame).resize({ width: 320, height: 320, fit: 'inside', withoutEnlargement: true });
  return [
    // JPEG, because readers of feeds and cards show it too.
    toPicture(
      'poster',
      'image/jpeg',
      await poster.jpeg({ quality: 82 }).toBuffer({ resolveWithObject: true }),
    ),
    toPicture('thumb', 'image/webp', await thumb.webp({ quality: 72 }).toBuffer({ resolveWithObject: true })),
  ];
}

const STRIP_HEIGHT = 90;

/** Sets frames of one film side by side, each as wide as the first. */
export async function makeFilmstrip(frames: readonly string[]): Promise<MadePicture> {
  const tiles = [];
  let width = 0;
  for (const frame of frames) {
    const resized = open(frame).resize(
      width === 0 ? { height: STRIP_HEIGHT } : { width, height: STRIP_HEIGHT, fit: 'cover' },
    );
    const { data, info } = await resized.raw().toBuffer({ resolveWithObject: true });
    width = info.width;
    tiles.push({ data, info });
  }
  const strip = sharp({
    create: { width: width * tiles.length, height: STRIP_HEIGHT, channels: 3, background: '#000000' },
  }).composite(
    tiles.map(({ data, info }, index) => ({
      input: data,
      raw: { width: info.width, height: info.height, channels: info.channels },
      left: index * width,
      top: 0,
    })),
  );
  const made = await strip.webp({ quality: 70 }).toBuffer({ resolveWithObject: true });
  return { ...toPicture('filmstrip', 'image/webp', made), frames: tiles.length };
}

function toPicture(
  variant: MadePicture['variant'],
  contentType: string,
  { data, info }: { data: Buffer; info: OutputInfo },
): MadePicture {
  return { variant, contentType, bytes: data, width: info.width, height: info.height };
}
