import { dayIn } from '../../../domain/time/day-in.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type FootageNote } from '../footage-note.ts';
import { loadFootageNotes } from './load-footage-notes.ts';

/** The notes of a build that fall on a day of the shop, by its clock or through the clips they were made on. */
export const listShopNotes = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string; readonly day: string }) => {
    const { id } = await loadBuild(context, input.build);
    const all = await loadFootageNotes(context, id);
    const items = all.filter(
      (note): note is FootageNote & { readonly at: number } =>
        note.at !== null && dayIn(context.workshop.timeZone, new Date(note.at)) === input.day,
    );
    return { items, nextCursor: null };
  },
);
