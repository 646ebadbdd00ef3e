import { type VideoAdapter } from '../adapter.ts';

/** Puts the second behind the address: #t=221. Source: W3C Media Fragments URI 1.0, 4.2.1, normal play time. */
export function withSecondsInFragment(address: URL, seconds: number): URL {
  const at = new URL(address);
  at.hash = `t=${String(seconds)}`;
  return at;
}

/** Any page: one that knows media fragments starts there, and no other minds. */
export const secondsInFragment: VideoAdapter = {
  id: 'seconds-in-fragment',
  speaks: false,
  linkAt: withSecondsInFragment,
};
