import { type JobDefinition } from '../../server/jobs/queue.ts';

export const sendInvitationJob: JobDefinition = {
  name: 'send-invitation',
  on: 'invitation-made',
  tries: 6,
  retryDelaySeconds: 30,
  load: async () => (await import('./server/send-invitation.ts')).sendInvitation,
};
