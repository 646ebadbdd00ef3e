import { queryOptions } from '@tanstack/react-query';
import { callApi } from '../../client/call-api.ts';
import { callTagged, type Tagged } from '../../client/call-tagged.ts';
import { paths } from '../../paths.ts';
import { type FileItem, FileId, FilePage } from './file.ts';

/** Which build's files: the address names of its workshop and of it. */
export interface FilesOf {
  readonly workshop: string;
  readonly build: string;
}

const ASK_AGAIN_MS = 5_000;
const last = new Map<string, Tagged>();

/** How many more of the list are asked for at most. */
const MOST_PAGES = 20;

/** The files of a build, newest first; asked again every five seconds while something is being looked at. */
export function filesQuery({ workshop, build }: FilesOf) {
  const path = paths.api.inBuild(workshop, build, 'files');
  return queryOptions({
    queryKey: ['files', workshop, build],
    queryFn: async (): Promise<readonly FileItem[]> => {
      const tagged = await callTagged(path, last.get(path));
      last.set(path, tagged);
      let page = FilePage.parse(tagged.answer);
      const items = [...page.items];
      for (let pages = 1; page.nextCursor !== null && pages < MOST_PAGES; pages += 1) {
        page = FilePage.parse(await callApi(`${path}?before=${page.nextCursor}`));
        items.push(...page.items);
      }
      return items;
    },
    refetchInterval: ({ state }) =>
      state.data?.some((file) => file.state === 'checking') === true ? ASK_AGAIN_MS : false,
    refetchIntervalInBackground: false,
  });
}

/** Takes a file away, brings it back, or gives an upload up. */
export function fileMutation({ workshop, build }: FilesOf, action: 'delete' | 'restore' | 'abandon') {
  return {
    mutationKey: [`${action} file`, workshop, build],
    mutationFn: async (file: string) =>
      FileId.parse(await callApi(paths.api.inBuild(workshop, build, `files/${file}/${action}`), {})).id,
  };
}
