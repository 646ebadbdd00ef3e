import { audienceJobs } from './features/audience/jobs.ts';
import { eraseDeletedJob, placeFootageJob } from './features/episodes/jobs.ts';
import { fileJobs } from './features/files/jobs.ts';
import { makeClipJob } from './features/footage/jobs.ts';
import { questionJobs } from './features/questions/jobs.ts';
import { sendInvitationJob } from './features/workshops/jobs.ts';
import { liveUntilStopped, startProcess } from './process-life.ts';
import { openProcessServices } from './process-services.ts';
import { readServiceSettings } from './server/env.ts';
import { type JobDefinition, workQueue } from './server/jobs/queue.ts';

/** Every job there is. */
const JOBS: readonly JobDefinition[] = [
  sendInvitationJob,
  ...fileJobs,
  makeClipJob,
  placeFootageJob,
  eraseDeletedJob,
  ...questionJobs,
  ...audienceJobs,
];

await startProcess(async () => {
  const services = await openProcessServices(readServiceSettings(), 'worker');
  await services.storage.prepare().catch((error: unknown) => {
    services.log.warn(
      { error: String(error) },
      'The storage could not be prepared; work on files waits for it.',
    );
  });
  await workQueue(services.jobs, JOBS, async (definition, ids, jobId) => {
    const handle = await definition.load();
    try {
      await handle(services, ids);
    } catch (error) {
      services.log.warn({ job: definition.name, jobId, err: error }, 'A job failed and is tried again.');
      throw error;
    }
  });
  liveUntilStopped({}, () => services.close());
});
