import { type Course, type Now } from './companion-data.ts';

/** What the element around the page tells of its video. */
export interface VideoWatch extends HTMLElement {
  readonly course: Course;
  readonly now: Now | undefined;
  /** Follows a frame that has just been put into the page. @param origin the only sender that is believed */
  followFrame(frame: HTMLIFrameElement, origin: string): void;
}

/** Sent to whatever on the page shows where the video is. */
export const NOW = 'video-now';

/** Sent by whatever on the page asks for an instant; its detail is seconds. */
export const SEEK = 'video-seek';

/** The element around the page that knows its video. */
export function followOf(element: Element): VideoWatch | null {
  return element.closest<VideoWatch>('video-follow');
}

/** Asks the video around an element for an instant. */
export function askFor(element: Element, seconds: number): void {
  element.dispatchEvent(new CustomEvent(SEEK, { bubbles: true, detail: seconds }));
}
