import { type VideoAdapter } from '../adapter.ts';
import { withSecondsInFragment } from './seconds-in-fragment.ts';

/** For hosts whose frame speaks the open player messages: the page follows it, and seeks in it. */
export const playerMessages: VideoAdapter = {
  id: 'player-messages',
  speaks: true,
  linkAt: withSecondsInFragment,
};
