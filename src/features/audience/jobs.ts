import { type JobDefinition } from '../../server/jobs/queue.ts';

const load = async () => (await import('./server/send-messages.ts')).sendMessages;

export const sendAnnouncementJob: JobDefinition = {
  name: 'send-announcement',
  on: 'announcement-started',
  tries: 3,
  retryDelaySeconds: 5,
  load,
};

/** What a lap has left, or a killed worker had in hand, goes on with the next minute, or with the next worker. */
export const carryOnAnnouncementsJob: JobDefinition = {
  name: 'carry-on-announcements',
  on: { cron: '* * * * *' },
  alsoAtStart: true,
  tries: 1,
  retryDelaySeconds: 0,
  load,
};

export const audienceJobs: readonly JobDefinition[] = [sendAnnouncementJob, carryOnAnnouncementsJob];
