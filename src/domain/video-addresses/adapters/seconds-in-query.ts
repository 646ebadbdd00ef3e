import { type VideoAdapter } from '../adapter.ts';

/** For hosts that read the second from their query: ?t=221. Common practice, no standard. */
export const secondsInQuery: VideoAdapter = {
  id: 'seconds-in-query',
  speaks: false,
  linkAt: (address, seconds) => {
    const at = new URL(address);
    at.searchParams.set('t', String(Math.floor(seconds)));
    return at;
  },
};
