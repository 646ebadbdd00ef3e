import { newId } from '../../../db/columns.ts';
import { clips } from '../../../db/schema/footage.ts';
import { clipNameKey } from '../../../domain/edit/clip-names.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EditName, MATCHES, type ReadEdit } from '../edit.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { lookAtEdit } from './look-at-edit.ts';
import { requireMatches } from './match-names.ts';
import { lockEdits, storeEdit } from './store-edit.ts';

/**
 * Takes an edit as the next version of its episode's, read again from its text. Viewers see nothing of it before the
 * next edition. A name that stands for footage which is not here gets a clip of its own, known by its name alone, so
 * that notes can be held by clip time.
 * @throws Invalid where it cannot be read or a name stands for nothing yet, or when a newer edit was taken meanwhile
 */
export const takeEdit = verb({ may: 'edit.change' }, async (context, input: EpisodeRef & ReadEdit) => {
  const { episode } = await loadEpisode(context, input);
  // Read before anything is locked: a long list takes its time.
  const { view, text, footage } = await lookAtEdit(context, episode, input);
  const newest = await lockEdits(context, episode.id);
  if (newest !== view.seen || (input.seen !== undefined && input.seen !== newest))
    throw new Invalid({
      '': 'Another edit was taken meanwhile. Look at yours against that one, then take it.',
    });
  const { edit, names } = view;
  if (edit === null) throw new Invalid({ rate: view.error ?? view.rateReason });
  requireMatches(names, footage);
  const clipIds = await matchClips(context, episode.buildId, edit, names);
  const { id, number } = await storeEdit(context, episode.id, newest + 1, {
    source: text.source,
    sourceName: text.name,
    sourceText: text.text,
    edit,
    clipIds,
  });
  return { id, number, segments: { picture: edit.picture.length, sound: edit.sound.length } };
});

/** The clip that each name stands for; those that are only named are made here. */
async function matchClips(
  { db, workshop, actor }: WorkshopContext,
  buildId: string,
  edit: Edit,
  names: readonly EditName[],
): Promise<Map<string, string | null>> {
  const rates = new Map([...edit.sound, ...edit.picture].map(({ clip, clipRate }) => [clip, clipRate]));
  const clipIds = new Map<string, string | null>();
  // A clip that the list calls C0043 here and C0043.MP4 there is one.
  const made = new Map<string, typeof clips.$inferInsert & { readonly id: string }>();
  for (const { name, match } of names) {
    if (match !== MATCHES.named) {
      clipIds.set(name, match === MATCHES.none ? null : match);
      continue;
    }
    const key = clipNameKey(name);
    const rate = rates.get(name) ?? edit.rate;
    const clip = made.get(key) ?? {
      id: newId(),
      workshopId: workshop.id,
      buildId,
      name: name.slice(-200),
      rateNum: rate.num,
      rateDen: rate.den,
      addedBy: actor.kind === 'account' ? actor.id : null,
    };
    made.set(key, clip);
    clipIds.set(name, clip.id);
  }
  const rows = [...made.values()];
  for (let from = 0; from < rows.length; from += 1000)
    await db.insert(clips).values(rows.slice(from, from + 1000));
  return clipIds;
}
