/** Whether an edit shows an anchor: moved to the nearest when snapped; fixed for an episode time with no clip beneath. */
export const PLACE_STATUSES = ['placed', 'snapped', 'lost', 'fixed', 'no-footage'] as const;
export type StoredPlaceStatus = (typeof PLACE_STATUSES)[number];
