import { formatClock } from '../domain/time/format-clock.ts';
import { secondsToFrame } from '../domain/time/frames.ts';
import {
  askedSeconds,
  type CompanionData,
  type Course,
  type Now,
  nowAt,
  readCourse,
} from './companion-data.ts';
import { filePlayer } from './file-player.ts';
import { outsidePlayer } from './outside-player.ts';
import { type Player } from './player.ts';
import { NOW, SEEK, type VideoWatch } from './video-now.ts';

/** How finely pointers move between the frames at which something changes, in seconds. */
const STEP = 0.25;

const EMPTY: Course = {
  rate: { num: 1000, den: 1 },
  seconds: null,
  appearances: [],
  chapters: [],
  notes: [],
};

/**
 * Around everything of a page that follows its video. It knows the player; what shows the present listens here for
 * NOW, and a link or button with `data-at` seconds seeks there when it is clicked.
 */
export class VideoFollow extends HTMLElement implements VideoWatch {
  course = EMPTY;
  now: Now | undefined;
  #player: Player | undefined;

  connectedCallback(): void {
    const data = this.querySelector('script[data-course]')?.textContent ?? '';
    if (data === '') return;
    this.course = readCourse(JSON.parse(data) as CompanionData);
    this.addEventListener('click', this.#click);
    this.addEventListener(SEEK, (event) => {
      this.#seek((event as CustomEvent<number>).detail);
    });
    const video = this.querySelector('video');
    if (video) this.#followVideo(video);
    this.#seek(askedSeconds(location.search) ?? 0, { atStart: true });
  }

  /** Follows a frame that has just been put into the page; until it answers, times stay links to its host. */
  followFrame(frame: HTMLIFrameElement, origin: string): void {
    const player = outsidePlayer(frame, origin, {
      ...this.#watch(),
      onReady: () => {
        this.#player = player;
        if (this.now && this.now.seconds > 0) player.seek(this.now.seconds);
      },
    });
  }

  #followVideo(video: HTMLVideoElement): void {
    this.#player = filePlayer(video, this.#watch());
    // They led to the file itself for whoever has no script; like this they can be passed on.
    for (const link of this.querySelectorAll<HTMLAnchorElement>('a[data-at]'))
      link.href = `?t=${link.dataset['at'] ?? '0'}`;
  }

  #watch() {
    return {
      rate: this.course.rate,
      onFrame: (frame: number, seconds: number) => {
        this.#show(frame, seconds);
      },
      onLength: (seconds: number) => {
        this.course = { ...this.course, seconds };
      },
    };
  }

  #show(frame: number, seconds: number): void {
    if (frame === this.now?.frame) return;
    const now = nowAt(this.course, frame, seconds);
    if (this.now && !differs(this.now, now)) return;
    this.now = now;
    for (const clock of this.querySelectorAll('[data-clock]')) clock.textContent = formatClock(seconds);
    this.dispatchEvent(new CustomEvent(NOW));
  }

  #seek(seconds: number, { atStart = false } = {}): void {
    const length = this.course.seconds ?? Number.POSITIVE_INFINITY;
    const at = Math.min(Math.max(0, seconds), length);
    // A video that nobody has asked to start anywhere is left alone.
    if (this.#player && !(atStart && at === 0)) this.#player.seek(at);
    else this.#show(secondsToFrame(at, this.course.rate), at);
  }

  #click = (event: MouseEvent): void => {
    const { target } = event;
    if (!this.#player || event.button !== 0 || event.metaKey || event.ctrlKey || event.shiftKey) return;
    if (!(target instanceof Element) || target.closest('a, button') === null) return;
    const at = target.closest('[data-at]')?.getAttribute('data-at');
    if (at === null || at === undefined) return;
    event.preventDefault();
    this.#seek(Number(at));
    this.querySelector('video, iframe')?.scrollIntoView({ block: 'nearest' });
  };
}

function differs(a: Now, b: Now): boolean {
  const key = ({ seconds, parts, note }: Now) => JSON.stringify([Math.floor(seconds / STEP), parts, note]);
  return key(a) !== key(b);
}
