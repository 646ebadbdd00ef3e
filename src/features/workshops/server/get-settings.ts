import { read } from '../../../server/verb.ts';

/** The settings of a workshop, with the version that a change has to name. */
export const getSettings = read({ may: 'workshop.change-settings' }, ({ workshop }) =>
  Promise.resolve(workshop),
);
