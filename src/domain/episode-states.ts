/** The states of an episode; the checks before publishing are computed, never stored. */
export const EPISODE_STATES = ['draft', 'ready', 'scheduled', 'published', 'withdrawn'] as const;
export type EpisodeState = (typeof EPISODE_STATES)[number];

/** Which states an episode may go to next. */
export const NEXT_EPISODE_STATES: Readonly<Record<EpisodeState, readonly EpisodeState[]>> = {
  draft: ['ready', 'scheduled', 'published'],
  ready: ['draft', 'scheduled', 'published'],
  scheduled: ['draft', 'published'],
  published: ['published', 'withdrawn'],
  withdrawn: ['published', 'draft'],
};
