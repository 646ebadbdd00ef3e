import { slateInstants } from '../../../domain/footage/slate-instants.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { mediaTimeToFrame, secondsToFrame } from '../../../domain/time/frames.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { loadSlateReader, type ReadSlatePicture } from './read-slate-picture.ts';

/** A clock slate that was found in a film by its code. */
export interface FoundSlate {
  /** Of its frame, in seconds since the first. */
  readonly seconds: number;
  /** Whether the browser said when that frame begins; else it is where it was sought. */
  readonly exact: boolean;
  /** What it shows, in milliseconds since 1970. */
  readonly shopMs: number;
}

interface Search {
  /** As it is known of the clip, so that another film is not taken for it; null where it is not known. */
  readonly seconds: number | null;
  /** Is told how many pictures of how many have been looked at. */
  readonly tell: (looked: number, all: number) => void;
  readonly signal: AbortSignal;
}

/** Wide enough for a code that fills a tenth of the picture, and small enough to read five a second. */
const MOST_WIDTH = 960;
const PATIENCE_MS = 15_000;
/** A browser that draws no pages, as one in the background, tells no frames either. */
const FRAME_PATIENCE_MS = 2_000;
/** Sound may end after the picture. Our own choice. */
const LENGTHS_DIFFER_SECONDS = 1;

/**
 * Looks through the first and the last seconds of a film for clock slates; gives the first that reads in each.
 * @param address of the film, of this computer or of a storage that lets its pictures be read
 * @throws Error with a sentence when it cannot be looked at; the signal's reason when it was stopped
 */
export async function findSlates(address: string, { seconds, tell, signal }: Search): Promise<FoundSlate[]> {
  const read = await loadSlateReader();
  const film = openFilm(address);
  try {
    await film.opened;
    const { duration } = film.video;
    if (seconds !== null && Math.abs(duration - seconds) > LENGTHS_DIFFER_SECONDS)
      throw new Error(
        `That is another film: it lasts ${formatClock(duration)}, and this clip ${formatClock(seconds)}.`,
      );
    const stretches = slateInstants(duration);
    const all = stretches.flat().length;
    const found: FoundSlate[] = [];
    let looked = 0;
    for (const stretch of stretches) {
      const before = looked;
      for (const instant of stretch) {
        signal.throwIfAborted();
        tell(looked, all);
        await film.seek(instant);
        looked += 1;
        if (film.look(read) === null) continue;
        const slate = await film.lookAtFrame(instant, read);
        if (slate === null) continue;
        found.push(slate);
        break;
      }
      looked = before + stretch.length;
    }
    return found;
  } finally {
    film.close();
  }
}

/** What the route of slates takes. @param rate null for a clip whose frames do not come at a constant rate */
export function slateToKeep({ seconds, exact, shopMs }: FoundSlate, rate: Rate | null) {
  const base = { shopMs, readBy: 'code' as const };
  // Timestamps are known to a millisecond: half of one in, so that rounding cannot fall on the frame before.
  if (rate === null) return { ...base, moment: (seconds + 0.0005).toFixed(6) };
  return { ...base, frame: exact ? mediaTimeToFrame(seconds, rate) : secondsToFrame(seconds, rate) };
}

/** Opens a film in a player that nobody sees. */
function openFilm(address: string) {
  const video = document.createElement('video');
  video.muted = true;
  video.preload = 'auto';
  // Without it the pictures of a film from the storage may be shown, but not read.
  video.crossOrigin = 'anonymous';
  const canvas = document.createElement('canvas');
  const drawing = canvas.getContext('2d', { willReadFrequently: true });
  const happens = (name: string, otherwise: string) =>
    new Promise<void>((resolve, reject) => {
      const listening = new AbortController();
      const settle = (then: () => void) => () => {
        clearTimeout(timer);
        listening.abort();
        then();
      };
      const fail = settle(() => {
        reject(new Error(otherwise));
      });
      const timer = setTimeout(fail, PATIENCE_MS);
      video.addEventListener(name, settle(resolve), listening);
      video.addEventListener('error', fail, listening);
    });
  const look = (read: ReadSlatePicture) => {
    if (drawing === null || video.videoWidth === 0) return null;
    drawing.drawImage(video, 0, 0, canvas.width, canvas.height);
    return read(drawing.getImageData(0, 0, canvas.width, canvas.height));
  };
  const opened = happens('loadeddata', 'Its pictures cannot be read in this browser.').then(() => {
    if (!Number.isFinite(video.duration) || video.videoWidth === 0)
      throw new Error('Its pictures cannot be read in this browser.');
    canvas.width = Math.min(MOST_WIDTH, video.videoWidth);
    canvas.height = Math.max(1, Math.round((canvas.width * video.videoHeight) / video.videoWidth));
  });
  video.src = address;
  return {
    video,
    opened,
    look,
    async seek(seconds: number): Promise<void> {
      const sought = happens('seeked', `It could not be read any further at ${formatClock(seconds)}.`);
      video.currentTime = seconds;
      await sought;
    },
    /** Shows an instant again and reads the slate in the very frame whose time the browser gives. */
    lookAtFrame(seconds: number, read: ReadSlatePicture): Promise<FoundSlate | null> {
      return new Promise((resolve) => {
        const settle = (at: number, exact: boolean) => {
          clearTimeout(timer);
          const shopMs = look(read);
          resolve(shopMs === null ? null : { seconds: at, exact, shopMs });
        };
        const timer = setTimeout(() => {
          settle(seconds, false);
        }, FRAME_PATIENCE_MS);
        if ('requestVideoFrameCallback' in video) {
          // It was sought once already, so whichever frame is told, it is that of this instant.
          video.requestVideoFrameCallback((_now, { mediaTime }) => {
            settle(Math.max(0, mediaTime), true);
          });
        }
        video.currentTime = seconds;
      });
    },
    close() {
      video.removeAttribute('src');
      video.load();
    },
  };
}
