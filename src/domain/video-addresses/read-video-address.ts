import { type Answer, right, wrong } from '../answer.ts';
import { type AdapterId } from './adapter.ts';
import { adapterOf, findAdapter, type KnownHost } from './adapters/find-adapter.ts';

/** The longest address that is kept, in characters. Our own limit; browsers send no longer ones safely. */
export const ADDRESS_LENGTH = 2000;

/** File names that a browser plays by itself, without a frame. Common practice: MP4, WebM and what phones write. */
const VIDEO_FILE = /\.(?:mp4|m4v|mov|webm)$/i;

/** Loopback by its own name or number; only tests keep a video there. */
const LOOPBACK = /^(?:localhost|127(?:\.\d{1,3}){3}|\[::1\])$/;

/** A video kept elsewhere, as its address says. Plain data: linkAt gives the address of a second. */
export interface VideoAddress {
  /** file: the browser plays it; known: the operator named the host; unknown: any other page. */
  readonly kind: 'file' | 'known' | 'unknown';
  /** As it is stored and opened: normalised, international names in punycode, without a time of its own. */
  readonly address: string;
  readonly adapter: AdapterId;
  /**
   * What the frame shows once someone has clicked; null for a file. A page of an unknown host is asked by
   * player messages too, and followed when it answers.
   */
  readonly frameUrl: string | null;
  /** Scheme, host and port: the only sender whose messages are believed, and what the policy must allow. */
  readonly origin: string;
}

/** What the operator settles. */
export interface VideoAddressOptions {
  readonly knownHosts?: readonly KnownHost[];
  /** For tests with a page of their own on this machine. */
  readonly allowLoopback?: boolean;
}

/** What an address of a video elsewhere is, or why it cannot be kept. */
export function readVideoAddress(
  text: string,
  { knownHosts = [], allowLoopback = false }: VideoAddressOptions = {},
): Answer<VideoAddress> {
  const typed = text.trim();
  if (typed === '') return wrong('Enter the address of the video.');
  if (typed.length > ADDRESS_LENGTH)
    return wrong(`Keep the address to ${String(ADDRESS_LENGTH)} characters.`);
  if (/[\s\p{Cc}\p{Cf}]/u.test(typed)) return wrong('That address has spaces or invisible characters in it.');
  const address = parseUrl(typed);
  if (address === null) return wrong('That is no whole address. It starts with https://.');
  const loopback = LOOPBACK.test(address.hostname);
  if (loopback && !allowLoopback)
    return wrong('That address is on this machine, where no viewer can reach it.');
  if (address.protocol !== 'https:' && !(loopback && address.protocol === 'http:'))
    return wrong('Use an address that starts with https://.');
  if (address.username !== '' || address.password !== '')
    return wrong('Leave the name and password out of the address: every viewer would see them.');
  if (!loopback && !address.hostname.includes('.'))
    return wrong('That host has no full name on the internet.');
  return right(recognise(address, knownHosts));
}

function parseUrl(text: string): URL | null {
  try {
    return new URL(text);
  } catch {
    return null;
  }
}

function recognise(given: URL, knownHosts: readonly KnownHost[]): VideoAddress {
  const address = withoutTime(given);
  const known = findAdapter(address.hostname, knownHosts);
  const file = VIDEO_FILE.test(address.pathname);
  const adapter = (file ? null : known) ?? adapterOf('seconds-in-fragment');
  return {
    kind: file ? 'file' : known === null ? 'unknown' : 'known',
    address: address.href,
    adapter: adapter.id,
    frameUrl: file ? null : address.href,
    origin: address.origin,
  };
}

/** A time that was copied with the address would start everyone there. */
function withoutTime(given: URL): URL {
  const address = new URL(given);
  if (/^#t=[\d:.,npt]*$/.test(address.hash)) address.hash = '';
  if (/^\d+s?$/.test(address.searchParams.get('t') ?? '')) address.searchParams.delete('t');
  return address;
}

/** The address of a second of the video, for someone to open. @param seconds not negative */
export function linkAt(
  { address, adapter }: Pick<VideoAddress, 'address' | 'adapter'>,
  seconds: number,
): string {
  if (!Number.isFinite(seconds) || seconds < 0) throw new RangeError(`${String(seconds)} is no time.`);
  return adapterOf(adapter).linkAt(new URL(address), Math.round(seconds * 1000) / 1000).href;
}
