import { RefusedFile } from './refused-file.ts';

export type TextFormat = 'csv' | 'vtt' | 'srt' | 'edl' | 'otio';

const PLAYLIST = /^\s*(#EXTM3U|\[playlist\]|ffconcat version|<\?xml[^>]*>\s*<(asx|smil)|<MPD)/i;
const MARKUP = /^\s*<(!doctype|html|svg|\?xml|script|head|body|!--)/i;
const SRT_START = /^\s*\d+\s*\r?\n\d{1,2}:\d{2}:\d{2}[,.]\d{3}\s*-->/;
const EDL_LINE = /^(TITLE:|FCM:|\d{3,6}\s+\S+\s+[ABVNONE0-9/]+\s+[CDWK])/m;

/**
 * Which of the lists that are taken a text is; null when it is no text.
 * @param head its first bytes
 * @param name its ending decides where the content fits several
 * @throws RefusedFile for texts that are never taken, such as web pages and playlists
 */
export function sniffText(head: Buffer, name: string): TextFormat | null {
  const text = readText(head);
  if (text === null) return null;
  if (PLAYLIST.test(text)) {
    throw new RefusedFile(
      'This is a playlist, which only names films. Send the film that it names, exported as one MP4 file.',
    );
  }
  if (MARKUP.test(text)) {
    throw new RefusedFile(
      'This is a web page or a drawing in SVG, which can carry programs and is never taken. Save it as PDF, PNG or JPEG and send that.',
    );
  }
  if (/^WEBVTT([ \t\r\n]|$)/.test(text)) return 'vtt';
  if (SRT_START.test(text)) return 'srt';
  if (/^\s*\{/.test(text) && text.includes('"OTIO_SCHEMA"')) return 'otio';
  const ending = /\.([a-z0-9]+)$/i.exec(name)?.[1]?.toLowerCase();
  if (ending !== 'csv' && EDL_LINE.test(text)) return 'edl';
  if (ending === 'csv' && /[,;\t]/.test(text.split(/\r?\n/, 1)[0] ?? '')) return 'csv';
  if (ending !== undefined && ['csv', 'vtt', 'srt', 'edl', 'otio'].includes(ending)) {
    throw new RefusedFile(
      `The file is called .${ending}, but what is in it is not that. Export it again and send that.`,
    );
  }
  return null;
}

/** UTF-8 without zero bytes, or nothing; a letter cut in two at the end does no harm. */
function readText(head: Buffer): string | null {
  if (head.includes(0)) return null;
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(head, { stream: true });
  } catch {
    return null;
  }
}
