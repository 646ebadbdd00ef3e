import { type VideoFollow } from './video-follow.ts';

/** Sent to whatever on the page shows where the video is. */
export const NOW = 'video-now';

/** Sent by whatever on the page asks for an instant; its detail is seconds. */
export const SEEK = 'video-seek';

/** The element around the page that knows its video. */
export function followOf(element: Element): VideoFollow | null {
  return element.closest<VideoFollow>('video-follow');
}

/** Asks the video around an element for an instant. */
export function askFor(element: Element, seconds: number): void {
  element.dispatchEvent(new CustomEvent(SEEK, { bubbles: true, detail: seconds }));
}
