import { type RefObject, useEffect } from 'react';
import { type DeskClock } from './clock.ts';
import { framesIn } from './moment.ts';

/**
 * Makes the face of the rule in a place a slider, and keeps its pointer at now. By hand, not by rendering: it
 * moves with every frame of the video.
 * @param length frames that the rule is long
 */
export function useRuleSlider(
  place: RefObject<HTMLElement | null>,
  clock: DeskClock,
  length: number,
  say: (frame: number) => string,
): void {
  useEffect(() => {
    const root = place.current;
    const face = root?.querySelector<HTMLElement>('[data-rule-face]');
    if (!root || !face) return undefined;
    face.tabIndex = 0;
    face.classList.add('cursor-pointer', 'touch-pan-y');
    set(face, { role: 'slider', 'aria-label': 'Moment in the episode', 'aria-valuemin': '0' });
    set(face, { 'aria-valuemax': String(length) });
    const follow = () => {
      const now = clock.now();
      const share = Math.min(1, now / length);
      for (const pointer of root.querySelectorAll('[data-rule-now]'))
        pointer.setAttribute('x', `${String(Math.round(share * 100_000) / 1000)}%`);
      set(face, { 'aria-valuenow': String(now), 'aria-valuetext': say(now) });
    };
    follow();
    const seekTo = ({ clientX }: PointerEvent) => {
      const scale = face.querySelector('svg')?.getBoundingClientRect();
      if (!scale || scale.width === 0) return;
      clock.seek(Math.min(1, Math.max(0, (clientX - scale.left) / scale.width)) * length);
    };
    const down = (event: PointerEvent) => {
      if (event.button !== 0) return;
      face.setPointerCapture(event.pointerId);
      seekTo(event);
    };
    const move = (event: PointerEvent) => {
      if (face.hasPointerCapture(event.pointerId)) seekTo(event);
    };
    const key = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey) return;
      const to = frameFor(event, clock, length);
      if (to === null) return;
      event.preventDefault();
      clock.seek(to);
    };
    face.addEventListener('pointerdown', down);
    face.addEventListener('pointermove', move);
    face.addEventListener('keydown', key);
    const leave = clock.subscribe(follow);
    return () => {
      face.removeEventListener('pointerdown', down);
      face.removeEventListener('pointermove', move);
      face.removeEventListener('keydown', key);
      leave();
    };
  });
}

/** Arrows a second, with Shift or by page ten; single frames have keys of their own everywhere. */
function frameFor({ key, shiftKey }: KeyboardEvent, clock: DeskClock, length: number): number | null {
  if (key === 'Home') return 0;
  if (key === 'End') return length - 1;
  const ways: Readonly<Record<string, number>> = {
    ArrowLeft: -1,
    ArrowDown: -1,
    PageDown: -1,
    ArrowRight: 1,
    ArrowUp: 1,
    PageUp: 1,
  };
  const way = ways[key];
  if (way === undefined) return null;
  const size = key.startsWith('Page') || shiftKey ? 'ten' : 'second';
  return clock.now() + way * framesIn(size, clock.rate);
}

function set(element: Element, attributes: Readonly<Record<string, string>>): void {
  for (const [name, value] of Object.entries(attributes)) element.setAttribute(name, value);
}
