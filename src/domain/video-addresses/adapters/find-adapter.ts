import { type AdapterId, type VideoAdapter } from '../adapter.ts';
import { playerMessages } from './player-messages.ts';
import { secondsInFragment } from './seconds-in-fragment.ts';
import { secondsInQuery } from './seconds-in-query.ts';

const ADAPTERS: Readonly<Record<AdapterId, VideoAdapter>> = {
  'player-messages': playerMessages,
  'seconds-in-query': secondsInQuery,
  'seconds-in-fragment': secondsInFragment,
};

/** A host that the operator knows, with everything below it: video.example stands for www.video.example too. */
export interface KnownHost {
  readonly suffix: string;
  readonly adapter: AdapterId;
}

/** The adapter of that name. */
export function adapterOf(id: AdapterId): VideoAdapter {
  return ADAPTERS[id];
}

/** The adapter that the operator names for a host; of several that fit the longest suffix. Null for none. */
export function findAdapter(host: string, known: readonly KnownHost[]): VideoAdapter | null {
  const fitting = known
    .filter(({ suffix }) => host === suffix || host.endsWith(`.${suffix}`))
    .sort((a, b) => b.suffix.length - a.suffix.length)[0];
  return fitting === undefined ? null : ADAPTERS[fitting.adapter];
}
