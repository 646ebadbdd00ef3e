import { queryOptions } from '@tanstack/react-query';
import { callTagged, type Tagged } from '../../client/call-tagged.ts';
import { AnnouncementProgress } from './audience.ts';

const ASK_AGAIN_MS = 5_000;

/**
 * How far an announcement has come; asked again every five seconds while it is being sent and the page is looked at.
 * @param path of the announcement, below /api
 */
export function progressQuery(path: string) {
  let last: Tagged | undefined;
  return queryOptions({
    queryKey: ['announcement', path],
    queryFn: async (): Promise<AnnouncementProgress> => {
      last = await callTagged(path, last);
      return AnnouncementProgress.parse(last.answer);
    },
    refetchInterval: ({ state }) =>
      state.data === undefined || state.data.state === 'sending' ? ASK_AGAIN_MS : false,
    refetchIntervalInBackground: false,
  });
}
