export type CaptionsFormat = 'webvtt' | 'subrip';

/** A SubRip timing: a comma or a full stop before the milliseconds, hours always there. */
const SUBRIP_TIMING = /^[ \t]*\d{1,3}:\d{1,2}:\d{1,2}[,.]\d{1,3}[ \t]*-->[ \t]*\d{1,3}:\d{1,2}:\d{1,2}/m;

/** The first line of WebVTT (W3C WebVTT, section 4.1): the word, then nothing, or a space or tab and anything. */
const SIGNATURE = /^WEBVTT(?:[ \t\r\n]|$)/;

/** How far into a file the first timing is looked for, in characters. */
const LOOKED_AT = 64 * 1024;

/**
 * Which captions format a text is in, by its content, whatever its name says. Null when it is neither.
 * @param text without a byte order mark
 */
export function sniffCaptions(text: string): CaptionsFormat | null {
  if (SIGNATURE.test(text)) return 'webvtt';
  return SUBRIP_TIMING.test(text.slice(0, LOOKED_AT)) ? 'subrip' : null;
}
