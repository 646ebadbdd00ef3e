import webvtt, { type Cue as ParsedCue, type Entity, type TreeNode } from 'webvtt-parser';
import { type Answer, right, wrong } from '../answer.ts';
import { type Cue, type Stamp } from './cue.ts';

/** Words with who says them; a caption with several voices has several. */
interface Run {
  readonly text: string;
  readonly voice: string | undefined;
  /** Milliseconds, for a moment that stands between the words. */
  readonly time?: number;
}

/**
 * Escapes as captions carry them: those of W3C WebVTT, 4.2.2, and two that other programs write. With their
 * semicolons, which the parser's own table lacks: it would leave the semicolon in the words.
 */
const ESCAPES: Readonly<Record<Entity, string>> = {
  '&amp;': '&',
  '&lt;': '<',
  '&gt;': '>',
  '&nbsp;': '\u00a0',
  '&lrm;': '\u200e',
  '&rlm;': '\u200f',
  '&quot;': '"',
  '&apos;': "'",
};

/**
 * The captions of a WebVTT text, as the standard's own parser keeps them: some may be empty, or end before they
 * start. Styles, regions and settings are left out.
 * @param text without a byte order mark
 */
export function readWebvtt(text: string): Answer<Cue[]> {
  const { cues, errors } = new webvtt.WebVTTParser(ESCAPES).parse(text);
  // The parser goes on after a wrong first line; a player would not.
  if (errors.some((error) => error.message.startsWith('No valid signature')))
    return wrong('This is not a captions file: its first line is not WEBVTT.');
  return right(cues.map(toCue));
}

function toCue(parsed: ParsedCue): Cue {
  const runs = parsed.tree.children.flatMap((node) => runsOf(node, undefined));
  const voices = [...new Set(runs.flatMap(({ voice }) => voice ?? []))];
  const text = runs.map((run) => run.text).join('');
  const stamps = stampsOf(runs, text);
  const lines = linesOf(text);
  return {
    start: Math.round(parsed.startTime * 1000),
    end: Math.round(parsed.endTime * 1000),
    lines,
    ...(voices.length === 1 ? { voice: voices[0] } : {}),
    ...(stamps.length > 0 ? { stamps } : {}),
  };
}

function linesOf(text: string): string[] {
  return text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
}

/** Where the words behind each moment stand once lines are trimmed. */
function stampsOf(runs: readonly Run[], text: string): Stamp[] {
  let at = 0;
  const written = runs.flatMap(({ text: words, time }) => {
    const from = at;
    at += words.length;
    // A word is written with the space before it.
    return time === undefined
      ? []
      : [{ from: from + (/^\s*/.exec(text.slice(from, from + 20))?.[0].length ?? 0), time }];
  });
  let begin = 0;
  let kept = 0;
  const lines = (written.length === 0 ? [] : text.split('\n')).map((line) => {
    const trimmed = line.trim();
    const first = begin + line.length - line.trimStart().length;
    const placed = { first, end: begin + line.length, kept, length: trimmed.length };
    begin += line.length + 1;
    if (trimmed !== '') kept += trimmed.length + 1;
    return placed;
  });
  let index = 0;
  return written.map(({ from, time }) => {
    while ((lines[index]?.end ?? from) < from) index++;
    const line = lines[index];
    const inside = line === undefined ? 0 : Math.min(Math.max(from - line.first, 0), line.length);
    return { character: (line?.kept ?? kept) + inside, time };
  });
}

function runsOf(node: TreeNode, voice: string | undefined): Run[] {
  if (node.type === 'text') return [{ text: node.value, voice }];
  if (node.type === 'timestamp') return [{ text: '', voice, time: Math.round(node.value * 1000) }];
  const speaker = node.name === 'v' ? unescape(node.value ?? '').trim() || voice : voice;
  return node.children.flatMap((child) => runsOf(child as TreeNode, speaker));
}

/** The parser undoes escapes in words, but not in the name of a voice. */
function unescape(text: string): string {
  return text.replace(/&[a-z]+;/g, (written) => ESCAPES[written as Entity] ?? written);
}
