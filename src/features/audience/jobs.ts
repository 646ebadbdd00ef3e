import { type JobDefinition } from '../../server/jobs/queue.ts';

const load = async () => (await import('./server/send-messages.ts')).sendMessages;

const sendAnnouncementJob: JobDefinition = {
  name: 'send-announcement',
  on: 'announcement-started',
  tries: 3,
  retryDelaySeconds: 5,
  load,
};

/** What a lap has left, or a killed worker had in hand, goes on with the next minute, or with the next worker. */
const carryOnAnnouncementsJob: JobDefinition = {
  name: 'carry-on-announcements',
  on: { cron: '* * * * *' },
  alsoAtStart: true,
  tries: 1,
  retryDelaySeconds: 0,
  load,
};

const forgetUnconfirmedJob: JobDefinition = {
  name: 'forget-unconfirmed',
  on: { cron: '43 3 * * *' },
  tries: 3,
  retryDelaySeconds: 60,
  load: async () => (await import('./server/forget-unconfirmed.ts')).forgetUnconfirmed,
};

export const audienceJobs: readonly JobDefinition[] = [
  sendAnnouncementJob,
  carryOnAnnouncementsJob,
  forgetUnconfirmedJob,
];
