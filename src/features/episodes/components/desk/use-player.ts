import { type RefObject, useEffect } from 'react';
import { filePlayer } from '../../../../client/file-player.ts';
import { outsidePlayer } from '../../../../client/outside-player.ts';
import { secondsToFrame } from '../../../../domain/time/frames.ts';
import { type DeskClock } from './clock.ts';

/** Follows the video that the page holds: a video element, or a frame once somebody loads it. */
export function usePlayer(place: RefObject<HTMLElement | null>, clock: DeskClock): void {
  useEffect(() => {
    const root = place.current;
    const video = root?.querySelector('video');
    if (video) followVideo(video, clock);
    const button = root?.querySelector<HTMLButtonElement>('button[data-frame-url]');
    const load = () => {
      if (button) followFrame(button, clock);
    };
    button?.addEventListener('click', load);
    return () => button?.removeEventListener('click', load);
  }, [place, clock]);
}

function watchOf(clock: DeskClock) {
  return {
    rate: clock.rate,
    onFrame: clock.show,
    onLength: (seconds: number) => {
      clock.setLength(secondsToFrame(seconds, clock.rate));
    },
  };
}

function followVideo(video: HTMLVideoElement, clock: DeskClock): void {
  const { seek } = filePlayer(video, {
    ...watchOf(clock),
    // The stored length is exact; an element's own includes the end of the sound.
    onLength: (seconds) => {
      if (clock.length() === null) clock.setLength(secondsToFrame(seconds, clock.rate));
    },
  });
  clock.setPlayer({
    seek,
    pause: () => {
      video.pause();
    },
    toggle: () => {
      if (video.paused) void video.play().catch(() => undefined);
      else video.pause();
    },
  });
}

function followFrame(button: HTMLButtonElement, clock: DeskClock): void {
  const { frameUrl = '', origin = '', frameTitle = '', frameClass = '' } = button.dataset;
  const frame = document.createElement('iframe');
  frame.title = frameTitle;
  frame.className = frameClass;
  frame.allow = 'autoplay; encrypted-media; fullscreen; picture-in-picture';
  // Hosts that let only some sites show a video ask for the site's name, and get no more than that.
  frame.referrerPolicy = 'strict-origin';
  frame.setAttribute('sandbox', 'allow-scripts allow-same-origin allow-presentation');
  frame.src = frameUrl;
  const player = outsidePlayer(frame, origin, {
    ...watchOf(clock),
    onReady: () => {
      clock.setPlayer({ ...player, toggle: null, pause: () => undefined });
      player.seek((clock.now() * clock.rate.den) / clock.rate.num);
    },
  });
  button.replaceWith(frame);
}
