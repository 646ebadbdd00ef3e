import { and, asc, eq, isNotNull, isNull, ne, or, type SQL } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { shopTimeAt } from '../../../domain/footage/camera-clock.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { loadFilmedClips } from '../../footage/server/load-filmed-clips.ts';
import { type FootageNote } from '../footage-note.ts';
import { secondsOn } from './footage-of-edits.ts';

/**
 * The notes of a build that the reader may see and that stand by the shop's clock or on a clip, in that order.
 * @param only which of them
 */
export async function loadFootageNotes(
  { db, actor, role, now }: WorkshopContext,
  buildId: string,
  only?: SQL,
): Promise<FootageNote[]> {
  const others = ne(notes.audience, 'person');
  const mine =
    actor.kind === 'account'
      ? or(others, eq(notes.askedId, actor.id), eq(notes.writtenBy, actor.id))
      : others;
  const rows = await db
    .select({ note: notes, anchor: anchors, writtenBy: accounts.name })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(accounts, eq(accounts.id, notes.writtenBy))
    .where(
      and(
        eq(notes.buildId, buildId),
        isNull(notes.deletedAt),
        or(isNotNull(anchors.shopAt), isNotNull(anchors.clipId)),
        role === 'owner' ? undefined : mine,
        only,
      ),
    )
    .orderBy(asc(anchors.shopAt), asc(anchors.frame), asc(notes.id));
  if (rows.length === 0) return [];
  const clips = new Map((await loadFilmedClips(db, buildId, now)).map((clip) => [clip.id, clip]));
  return rows
    .map(({ note, anchor, writtenBy }): FootageNote => {
      const { id, version, kind, text, audience } = note;
      const said = { id, version, kind, text, audience, writtenBy };
      const clip = clips.get(anchor.clipId ?? '');
      const { frame, rateNum, rateDen } = anchor;
      if (clip === undefined || frame === null || rateNum === null || rateDen === null)
        return {
          ...said,
          at: anchor.shopAt?.getTime() ?? null,
          clip: null,
          clipName: null,
          seconds: null,
        };
      const on = secondsOn(clip, frame, { num: rateNum, den: rateDen });
      const began = clip.start?.add(on.mul(clip.pace).mul(1000));
      return {
        ...said,
        at: began === undefined ? null : Math.round(shopTimeAt(clip.clock, began).valueOf()),
        clip: clip.id,
        clipName: clip.name,
        seconds: on.valueOf(),
      };
    })
    .sort((a, b) => (a.at ?? 0) - (b.at ?? 0));
}
