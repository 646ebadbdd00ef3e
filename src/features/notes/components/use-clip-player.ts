import { useEffect, useRef, useState } from 'react';
import { filePlayer } from '../../../client/file-player.ts';
import { type NoteKey, noteKeyOf } from '../../../client/note-keys.ts';
import { singleKeysAreOn } from '../../../client/single-keys.ts';
import { type Rate } from '../../../domain/time/rate.ts';

const TYPING = 'input, textarea, select, button, summary, a, video, [contenteditable]';

/**
 * Follows a clip's player by the frames it shows, and hands keys to it.
 * @param onCommand what the player itself does not do
 */
export function useClipPlayer(address: string | null, rate: Rate, onCommand: (command: NoteKey) => void) {
  const video = useRef<HTMLVideoElement>(null);
  const command = useRef(onCommand);
  const [frame, setFrame] = useState(0);
  useEffect(() => {
    command.current = onCommand;
  });
  const { num, den } = rate;
  useEffect(() => {
    const element = video.current;
    if (element === null || address === null) return;
    filePlayer(element, { rate: { num, den }, onFrame: setFrame, onLength: () => undefined });
  }, [address, num, den]);
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const target = event.target as HTMLElement;
      const element = video.current;
      const own = noteKeyOf(event);
      const typing = target.closest(TYPING) !== null && target !== element;
      if (own === null || (typing ? own.do !== 'leave' : !singleKeysAreOn())) return;
      if (!typing) event.preventDefault();
      if (element !== null) move(element, own, num / den);
      command.current(own);
    };
    document.addEventListener('keydown', press);
    return () => {
      document.removeEventListener('keydown', press);
    };
  }, [num, den]);
  const seek = (seconds: number) => {
    if (video.current !== null) video.current.currentTime = seconds;
  };
  return { video, frame, seek };
}

/** A file that counts in milliseconds is stepped through by a thirtieth of a second. */
function move(video: HTMLVideoElement, key: NoteKey, fps: number): void {
  if (key.do === 'play') {
    if (video.paused) void video.play().catch(() => undefined);
    else video.pause();
  }
  if (key.do === 'note' || key.do === 'kind') video.pause();
  if (key.do !== 'step') return;
  if (key.size !== 'frame') {
    video.currentTime = Math.max(0, video.currentTime + key.by * (key.size === 'ten' ? 10 : 1));
    return;
  }
  video.pause();
  const step = 1 / (fps >= 1000 ? 30 : fps);
  // Half a frame in, so that rounding cannot fall on the one beside it.
  const at = Math.floor(video.currentTime / step + 0.01) + key.by;
  video.currentTime = Math.max(0, (at + 0.5) * step);
}
