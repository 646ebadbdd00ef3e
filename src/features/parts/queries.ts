import { queryOptions } from '@tanstack/react-query';
import { callApi } from '../../client/call-api.ts';
import { paths } from '../../paths.ts';
import { type Part, type PartChange, PartsAnswer, SavedParts } from './part.ts';

/** Which build's parts: the address names of its workshop and of it. */
export interface PartsOf {
  readonly workshop: string;
  readonly build: string;
}

/** The parts of a build, by number. */
export function partsQuery({ workshop, build }: PartsOf) {
  return queryOptions({
    queryKey: ['parts', workshop, build],
    queryFn: async (): Promise<readonly Part[]> =>
      PartsAnswer.parse(await callApi(paths.api.inBuild(workshop, build, 'parts'))).items,
  });
}

/** Saves changes to several parts, all or none. @returns the changed rows as they are stored now */
export function savePartsMutation({ workshop, build }: PartsOf) {
  return {
    mutationKey: ['save parts', workshop, build],
    // One after the other: a row's next change names the version that its last one gave it.
    scope: { id: `parts ${workshop} ${build}` },
    mutationFn: async (changes: readonly PartChange[]): Promise<readonly Part[]> =>
      SavedParts.parse(await callApi(paths.api.inBuild(workshop, build, 'parts/save'), { changes })).items,
  };
}
