import { massOfParts } from '../../../domain/sections/part-mass.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadParts } from '../../parts/server/load-parts.ts';

/** What the sections in a build's parts list weigh, and which parts could not be read. @throws NotFound */
export const getBuildMass = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string }) =>
    massOfParts(await loadParts(context, (await loadBuild(context, input.build)).id)),
);
