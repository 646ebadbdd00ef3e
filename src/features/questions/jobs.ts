import { type JobDefinition } from '../../server/jobs/queue.ts';

export const questionJobs: readonly JobDefinition[] = [
  {
    name: 'send-question-link',
    on: 'question-sent',
    tries: 6,
    retryDelaySeconds: 30,
    load: async () => (await import('./server/send-question-link.ts')).sendQuestionLink,
  },
  {
    name: 'send-urgent-question',
    on: 'question-urgent',
    tries: 10,
    retryDelaySeconds: 15,
    load: async () => (await import('./server/send-urgent.ts')).sendUrgent,
  },
  {
    name: 'send-answer',
    on: 'question-answered',
    tries: 10,
    retryDelaySeconds: 30,
    load: async () => (await import('./server/send-answer.ts')).sendAnswer,
  },
  {
    name: 'erase-unconfirmed-questions',
    on: { cron: '40 3 * * *' },
    tries: 3,
    retryDelaySeconds: 600,
    load: async () => (await import('./server/erase-unconfirmed.ts')).eraseUnconfirmed,
  },
];
