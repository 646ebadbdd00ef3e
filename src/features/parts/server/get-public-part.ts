import { isId } from '../../../domain/ids.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { loadPart } from './load-parts.ts';

/** A part of a build that is on show, as everyone sees it: its remark is the team's. @throws NotFound */
export const getPublicPart = read(
  { may: 'published.read' },
  async (context, input: { readonly build: string; readonly part: string }) => {
    const build = await getPublicBuild(context, input);
    if (!isId(input.part)) throw new NotFound('This part');
    const { id, number, name, kind, quantity, material, size, aliases, inPlans } = await loadPart(
      context,
      build.id,
      input.part,
    );
    return { build, part: { id, number, name, kind, quantity, material, size, aliases, inPlans } };
  },
);
