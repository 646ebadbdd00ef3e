import { type Rate, snapRate } from '../../../domain/time/rate.ts';
import { framesIn } from '../../../domain/media-rates.ts';
import { readMovieHeader } from '../../../domain/footage/read-movie-header.ts';
import { type SentClip } from '../footage.ts';

/** What was read of a local film. Nothing of its pictures leaves the browser but `thumbnail`. */
export interface ReadMovie {
  readonly clip: SentClip;
  /** A small JPEG in base64; null when no picture could be drawn. */
  readonly thumbnail: string | null;
}

const THUMBNAIL_WIDTH = 240;
const PATIENCE_MS = 15_000;
/** A header this large is of a film of many hours. Our own limit. */
const MOST_HEADER_BYTES = 64 * 2 ** 20;
const FILM = /\.(mp4|mov|m4v|mkv|webm|avi|mts|mxf|insv|lrv)$/i;

/** Whether a file of a folder is a film, by its name or type. */
export function isFilm(file: { readonly name: string; readonly type: string }): boolean {
  return file.type.startsWith('video/') || FILM.test(file.name);
}

/** Reads what is known of a local film: by its header where it is MP4 or MOV, by playing it where the browser can. */
export async function readMovie(file: File, camera: string | null, usual: Rate): Promise<ReadMovie> {
  const header = await readHeader(file);
  const shown = await lookAt(file);
  const seconds = shown?.seconds ?? null;
  const rate = header?.rate ?? usual;
  const byLength =
    seconds === null ? null : framesIn({ num: Math.round(seconds * 1e6), den: 1_000_000 }, rate);
  const frames = header?.frames ?? byLength;
  return {
    clip: {
      name: file.name.normalize('NFC').slice(0, 200),
      camera,
      frames: frames === 0 ? null : frames,
      rate,
      startLabel: null,
      drop: false,
      createdWall: header?.createdWall ?? null,
      createdOffset: header?.createdWall == null ? null : 0,
      frameTimes: header?.frameTimes ? [...header.frameTimes] : null,
    },
    thumbnail: shown?.thumbnail ?? null,
  };
}

/** Finds the header among the boxes of an MP4 or MOV file, without reading what is between. */
async function readHeader(file: File) {
  let at = 0;
  for (let boxes = 0; boxes < 64 && at + 16 <= file.size; boxes += 1) {
    const view = new DataView(await file.slice(at, at + 16).arrayBuffer());
    const short = view.getUint32(0);
    const size = short === 1 ? Number(view.getBigUint64(8)) : short === 0 ? file.size - at : short;
    const type = String.fromCharCode(...new Uint8Array(view.buffer, 4, 4));
    if (size < 8) return null;
    if (type === 'moov')
      return size > MOST_HEADER_BYTES
        ? null
        : readMovieHeader(new Uint8Array(await file.slice(at, at + size).arrayBuffer()), snapRate);
    at += size;
  }
  return null;
}

/** Opens a film in a player that nobody sees: its length, and a picture from near its beginning. */
async function lookAt(file: File): Promise<{ seconds: number; thumbnail: string | null } | null> {
  const video = document.createElement('video');
  const address = URL.createObjectURL(file);
  const happens = (name: string) =>
    new Promise<boolean>((resolve) => {
      const timer = setTimeout(() => {
        resolve(false);
      }, PATIENCE_MS);
      const settle = (value: boolean) => () => {
        clearTimeout(timer);
        resolve(value);
      };
      video.addEventListener(name, settle(true), { once: true });
      video.addEventListener('error', settle(false), { once: true });
    });
  try {
    video.muted = true;
    video.preload = 'auto';
    const known = happens('loadeddata');
    video.src = address;
    if (!(await known) || !Number.isFinite(video.duration)) return null;
    const sought = happens('seeked');
    video.currentTime = Math.min(1, video.duration / 2);
    return { seconds: video.duration, thumbnail: (await sought) ? drawThumbnail(video) : null };
  } finally {
    video.removeAttribute('src');
    video.load();
    URL.revokeObjectURL(address);
  }
}

function drawThumbnail(video: HTMLVideoElement): string | null {
  const canvas = document.createElement('canvas');
  canvas.width = THUMBNAIL_WIDTH;
  canvas.height = Math.max(1, Math.round((THUMBNAIL_WIDTH * video.videoHeight) / (video.videoWidth || 1)));
  const drawing = canvas.getContext('2d');
  if (drawing === null || video.videoWidth === 0) return null;
  drawing.drawImage(video, 0, 0, canvas.width, canvas.height);
  return canvas.toDataURL('image/jpeg', 0.6).split(',')[1] ?? null;
}
