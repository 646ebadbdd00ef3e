import { mediaTimeToFrame, secondsToFrame } from '../domain/time/frames.ts';
import { type Player, type PlayerWatch } from './player.ts';

/** The least time between two tries after an error: an address that has run out is renewed by asking again. */
const RETRY_MS = 30_000;

/** Follows a video element by the frames it shows, or by its clock where the browser does not tell frames. */
export function filePlayer(video: HTMLVideoElement, { rate, onFrame, onLength }: PlayerWatch): Player {
  const sayClock = () => {
    onFrame(secondsToFrame(video.currentTime, rate), video.currentTime);
  };
  const sayLength = () => {
    if (Number.isFinite(video.duration)) onLength(video.duration);
  };
  if ('requestVideoFrameCallback' in video) {
    const next = (_now: number, { mediaTime }: VideoFrameCallbackMetadata) => {
      // While another instant is sought, this is a frame of where it was.
      if (!video.seeking) onFrame(mediaTimeToFrame(Math.max(0, mediaTime), rate), mediaTime);
      video.requestVideoFrameCallback(next);
    };
    video.requestVideoFrameCallback(next);
  } else {
    (video as HTMLVideoElement).addEventListener('timeupdate', sayClock);
  }
  video.addEventListener('seeked', sayClock);
  video.addEventListener('durationchange', sayLength);
  if (video.readyState > 0) sayLength();
  video.addEventListener('error', retry);
  return {
    seek(seconds) {
      // Before its data is there the element keeps the wish and starts from it.
      video.currentTime = seconds;
      onFrame(secondsToFrame(seconds, rate), seconds);
    },
  };

  function retry(): void {
    const at = video.currentTime;
    const last = Number(video.dataset['retriedAt'] ?? 0);
    if (Date.now() - last < RETRY_MS) return;
    video.dataset['retriedAt'] = String(Date.now());
    const wasPlaying = !video.paused;
    video.load();
    video.currentTime = at;
    if (wasPlaying) void video.play().catch(() => undefined);
  }
}
