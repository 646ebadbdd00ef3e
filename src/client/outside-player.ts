import {
  type PlayerEvent,
  readPlayerMessage,
  writePlayerMessage,
} from '../domain/video-addresses/player-message.ts';
import { secondsToFrame } from '../domain/time/frames.ts';
import { type Player, type PlayerWatch } from './player.ts';

interface OutsideWatch extends PlayerWatch {
  /** The frame has answered: from now on it can be sought. */
  readonly onReady: () => void;
}

/**
 * Follows a video in a frame by the open player messages. Only messages of this very frame and its own origin
 * count, and none is sent anywhere else.
 */
export function outsidePlayer(frame: HTMLIFrameElement, origin: string, watch: OutsideWatch): Player {
  let ready = false;
  addEventListener('message', hear);
  return {
    seek(seconds) {
      send('setCurrentTime', seconds);
      watch.onFrame(secondsToFrame(seconds, watch.rate), seconds);
    },
  };

  function send(...message: Parameters<typeof writePlayerMessage>): void {
    frame.contentWindow?.postMessage(writePlayerMessage(...message), origin);
  }

  function hear({ source, origin: from, data }: MessageEvent<unknown>): void {
    if (!frame.isConnected) return removeEventListener('message', hear);
    if (source !== frame.contentWindow || from !== origin) return;
    const message = readPlayerMessage(data);
    if (message !== null) take(message);
  }

  function take(message: PlayerEvent): void {
    if (message.event === 'ready' && !ready) {
      ready = true;
      send('addEventListener', 'timeupdate', 'companion');
      send('getDuration', undefined, 'length');
      watch.onReady();
    }
    if (message.event === 'timeupdate') {
      if (message.duration !== null && message.duration > 0) watch.onLength(message.duration);
      watch.onFrame(secondsToFrame(message.seconds, watch.rate), message.seconds);
    }
    if (message.event === 'answer' && message.listener === 'length' && message.value > 0)
      watch.onLength(message.value);
  }
}
