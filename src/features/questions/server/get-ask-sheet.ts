import { partsAt } from '../../../domain/appearances/parts-at.ts';
import { parseClock } from '../../../domain/time/parse-clock.ts';
import { secondsToFrame } from '../../../domain/time/frames.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { read } from '../../../server/verb.ts';
import { numberInAddress } from '../../episodes/companion.ts';
import { getCompanion } from '../../episodes/server/get-companion.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { getPublicPart } from '../../parts/server/get-public-part.ts';
import { findLike } from './find-like.ts';

/** What an address says is asked about: as typed, empty for nothing. */
interface Asked {
  readonly build: string;
  readonly episode: string;
  readonly t: string;
  readonly part: string;
  readonly note: string;
  /** A question to which like ones are offered. */
  readonly like: string;
}

interface Offered {
  readonly id: string;
  readonly chosen: boolean;
}

interface AskSheet {
  readonly episode: { readonly number: number; readonly title: string } | null;
  /** Seconds; null when no moment is asked about. */
  readonly at: number | null;
  readonly parts: readonly (Offered & { readonly number: string; readonly name: string })[];
  /** The note that holds at the moment. */
  readonly notes: readonly (Offered & { readonly text: string })[];
}

const NOTHING: AskSheet = { episode: null, at: null, parts: [], notes: [] };

/**
 * What the form for a question offers: the moment, the parts on the bench then, the note that holds then.
 * @throws NotFound for an episode or a part that is not on show
 */
export const getAskSheet = read({ may: 'published.read' }, async (context, asked: Asked) => {
  const build = await getPublicBuild(context, asked);
  const like = asked.like === '' ? [] : await findLike(context.db, build.id, asked.like);
  if (asked.episode !== '') return { ...(await sheetOfEpisode(context, asked)), like };
  if (asked.part !== '') {
    const { part } = await getPublicPart(context, asked);
    const { id, number, name } = part;
    return { ...NOTHING, parts: [{ id, number, name, chosen: true }], like };
  }
  return { ...NOTHING, like };
});

async function sheetOfEpisode(context: WorkshopContext, asked: Asked): Promise<AskSheet> {
  const companion = await getCompanion(context, {
    build: asked.build,
    number: numberInAddress(asked.episode),
  });
  const { episode, video, appearances, chapters, notes, parts } = companion;
  const byId = new Map(parts.map((part) => [part.id, part]));
  const named = notes.find(({ id }) => id === asked.note);
  const read = parseClock(asked.t);
  const at = named?.at ?? (read.ok ? read.value : null);
  const sheet = { episode: { number: episode.number, title: episode.title }, at };
  if (at === null || (video.seconds !== null && at >= video.seconds)) return { ...NOTHING, ...sheet };
  const frame = named?.from ?? secondsToFrame(at, video.rate);
  const shown = partsAt(
    frame,
    appearances,
    chapters.map(({ from }) => from),
  );
  const holds = named ?? notes.findLast(({ from, to }) => from <= frame && frame < to);
  return {
    ...sheet,
    parts: shown.flatMap(({ partId, filled }) => {
      const part = byId.get(partId);
      return part ? [{ id: part.id, number: part.number, name: part.name, chosen: filled }] : [];
    }),
    notes: holds && holds.text !== '' ? [{ id: holds.id, text: holds.text, chosen: holds === named }] : [],
  };
}
