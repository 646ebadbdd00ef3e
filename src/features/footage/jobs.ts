import { type JobDefinition } from '../../server/jobs/queue.ts';

/** Until then a film that was sent lies among the files, and on no day. */
export const makeClipJob: JobDefinition = {
  name: 'make-clip',
  on: 'file-ready',
  tries: 5,
  retryDelaySeconds: 20,
  load: async () => (await import('./server/make-clip.ts')).makeClip,
};
