import { acceptInvitation } from '../../../../features/workshops/server/accept-invitation.ts';
import { AcceptInput, idParam, MadeWorkshop } from '../../../../features/workshops/workshop.ts';
import { paths } from '../../../../paths.ts';
import { apiRoute, NONE } from '../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: acceptInvitation,
  params: NONE.extend({ invitation: idParam }),
  body: AcceptInput,
  answer: MadeWorkshop,
  limit: [{ name: 'accept-invitation', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: ({ invitation }, values) => paths.invitation(invitation, values['token'] ?? ''),
    done: ({ slug }) => paths.today(slug),
  },
});
