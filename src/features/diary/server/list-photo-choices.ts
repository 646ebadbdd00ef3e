import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { loadPhotoChoices } from './load-photo-choices.ts';

/** The photos that an entry may show: those of its build that are ready. @throws NotFound */
export const listPhotoChoices = read(
  { may: 'diary.change' },
  async (context, input: { readonly build: string }) => ({
    items: await loadPhotoChoices(context, (await loadBuild(context, input.build)).id),
    nextCursor: null,
  }),
);
