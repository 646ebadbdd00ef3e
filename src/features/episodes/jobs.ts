import { type JobDefinition } from '../../server/jobs/queue.ts';

/** Until then places say what was known of the footage before. */
export const placeFootageJob: JobDefinition = {
  name: 'place-footage',
  on: 'footage-changed',
  tries: 5,
  retryDelaySeconds: 20,
  longestSeconds: 600,
  load: async () => {
    const { placeFootage } = await import('./server/place-footage.ts');
    return placeFootage;
  },
};

/** It stands here because an episode holds more than anything to its left: whatever refers to it goes first. */
export const eraseDeletedJob: JobDefinition = {
  name: 'erase-deleted',
  on: { cron: '43 2 * * *' },
  tries: 3,
  retryDelaySeconds: 600,
  longestSeconds: 3600,
  load: async () => {
    const { eraseDeleted } = await import('./server/erase-deleted.ts');
    return (services) => eraseDeleted(services, new Date());
  },
};
