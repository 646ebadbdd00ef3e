import { type Companion } from '../../companion.ts';

/** How long a page's description may be, in characters; what is longer is cut by whoever shows it. */
const LONGEST = 200;

/** An episode in a line or two, for whoever has only a link to it. */
export function describeEpisode({ episode, build, of, notes, parts }: Companion): string {
  const about = episode.about.replace(/\s+/g, ' ').trim();
  if (about !== '') return about.length <= LONGEST ? about : `${about.slice(0, LONGEST - 1).trimEnd()}…`;
  const held = [count(notes.length, 'note'), count(parts.length, 'part')].filter((word) => word !== '');
  const what = held.length === 0 ? '' : ` With ${held.join(' and ')} at their second.`;
  return `Episode ${String(episode.number)} of ${String(of)} of ${build.name}.${what}`;
}

function count(number: number, word: string): string {
  return number === 0 ? '' : `${String(number)} ${word}${number === 1 ? '' : 's'}`;
}
