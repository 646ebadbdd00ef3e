import { type JobDefinition } from '../../server/jobs/queue.ts';

const HALF_A_DAY = 12 * 3600;

export const acceptFileJob: JobDefinition = {
  name: 'accept-file',
  on: 'upload-completed',
  tries: 6,
  retryDelaySeconds: 5,
  longestSeconds: 3600,
  load: async () => (await import('./server/accept-file.ts')).acceptFile,
};

export const acceptMediaJob: JobDefinition = {
  name: 'accept-media',
  on: 'media-found',
  tries: 6,
  retryDelaySeconds: 10,
  longestSeconds: HALF_A_DAY,
  load: async () => (await import('./server/accept-media.ts')).acceptMedia,
};

export const eraseOriginalJob: JobDefinition = {
  name: 'erase-original',
  on: 'original-dropped',
  tries: 10,
  retryDelaySeconds: 30,
  load: async () => (await import('./server/erase-original.ts')).eraseOriginal,
};

export const keepStorageCleanJob: JobDefinition = {
  name: 'keep-storage-clean',
  on: { cron: '17 * * * *' },
  tries: 3,
  retryDelaySeconds: 60,
  longestSeconds: 3600,
  load: async () => (await import('./server/keep-storage-clean.ts')).keepStorageClean,
};

export const fileJobs: readonly JobDefinition[] = [
  acceptFileJob,
  acceptMediaJob,
  eraseOriginalJob,
  keepStorageCleanJob,
];
