import { and, asc, eq, isNull, or } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { editClips, edits, episodes } from '../../../db/schema/episodes.ts';
import { clips } from '../../../db/schema/footage.ts';
import { clipNameKey, clipNames } from '../../../domain/edit/clip-names.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { proposeClips } from '../../../domain/edit/propose-clips.ts';
import { sameRate } from '../../../domain/time/rate.ts';
import { Invalid } from '../../../server/errors.ts';
import { type EditName, MATCHES } from '../edit.ts';
import { type BuildClip } from './load-clips.ts';

/** What a name stood for in an earlier edit, and whether that was one of this episode. */
interface Earlier {
  readonly clipId: string | null;
  readonly own: boolean;
}

async function loadEarlier(
  db: Database,
  episode: { readonly id: string; readonly buildId: string },
): Promise<ReadonlyMap<string, Earlier>> {
  const rows = await db
    .select({ name: editClips.name, clipId: editClips.clipId, episodeId: edits.episodeId })
    .from(editClips)
    .innerJoin(edits, eq(edits.id, editClips.editId))
    .innerJoin(episodes, eq(episodes.id, edits.episodeId))
    .leftJoin(clips, eq(clips.id, editClips.clipId))
    .where(and(eq(episodes.buildId, episode.buildId), or(isNull(editClips.clipId), isNull(clips.deletedAt))))
    .orderBy(asc(edits.createdAt), asc(edits.id));
  const earlier = new Map<string, Earlier>();
  for (const { name, clipId, episodeId } of rows) {
    const own = episodeId === episode.id;
    // The newest one counts; those of other episodes only where this episode has said nothing.
    if (own || earlier.get(clipNameKey(name))?.own !== true) earlier.set(clipNameKey(name), { clipId, own });
  }
  return earlier;
}

/**
 * What the names of an edit may stand for: what was said in an earlier edit of the build first, then what names and
 * labels tell. Between several clips that fit nobody decides but the person.
 */
export async function matchNames(
  db: Database,
  episode: { readonly id: string; readonly buildId: string },
  edit: Edit,
  footage: readonly BuildClip[],
  chosen: {
    readonly matches: Readonly<Record<string, string>>;
    readonly clipRates: Readonly<Record<string, string>>;
  },
): Promise<EditName[]> {
  const earlier = await loadEarlier(db, episode);
  const segments = [...edit.picture, ...edit.dissolved, ...edit.sound];
  const proposals = new Map(proposeClips(segments, footage).map(({ name, clips: ids }) => [name, ids]));
  const known = new Map(footage.map((clip) => [clip.id, clip]));
  const uses = new Map<string, (typeof segments)[number][]>();
  for (const segment of segments) {
    const own = uses.get(segment.clip);
    if (own === undefined) uses.set(segment.clip, [segment]);
    else own.push(segment);
  }
  return clipNames(edit).map((name, index) => {
    const proposed = proposals.get(name) ?? [];
    const [first] = uses.get(name) ?? [];
    const said = earlier.get(clipNameKey(name));
    const holds = said !== undefined && (said.own || said.clipId === null || fits(said.clipId, proposed));
    const match = chosen.matches[String(index)] ?? (holds ? (said.clipId ?? MATCHES.none) : only(proposed));
    const rate = known.get(match)?.rate ?? null;
    return {
      name,
      alsoCalled: first?.alsoCalled ?? [],
      uses: uses.get(name)?.length ?? 0,
      match,
      proposed,
      earlier: holds && chosen.matches[String(index)] === undefined,
      clipRate: chosen.clipRates[String(index)] ?? '',
      footageRate: rate === null || first === undefined || sameRate(rate, first.clipRate) ? null : rate,
    };
  });
}

/** Of an edit of another episode: cameras begin again at C0001, so labels and names go before it. */
function fits(clipId: string, proposed: readonly string[]): boolean {
  return proposed.length === 0 || proposed.includes(clipId);
}

function only(proposed: readonly string[]): string {
  if (proposed.length === 0) return MATCHES.named;
  return proposed.length === 1 ? (proposed[0] ?? '') : '';
}

/** @throws Invalid at the name's field where nothing was chosen, or a clip that is not of this build */
export function requireMatches(names: readonly EditName[], footage: readonly BuildClip[]): void {
  const ids = new Set(footage.map(({ id }) => id));
  const errors: Record<string, string> = {};
  for (const [index, { name, match }] of names.entries()) {
    if (match === MATCHES.named || match === MATCHES.none || ids.has(match)) continue;
    const known = `“${name.slice(0, 60)}”`;
    errors[`match-${String(index)}`] =
      match === '' ? `Several clips fit ${known}: choose one.` : `Choose a clip of this build for ${known}.`;
  }
  if (Object.keys(errors).length > 0) throw new Invalid(errors);
}
