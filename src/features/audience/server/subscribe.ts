import { sql } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { subscribers } from '../../../db/schema/audience.ts';
import { paths } from '../../../paths.ts';
import { signToken } from '../../../server/auth/signed-token.ts';
import { inSteadyTime } from '../../../server/auth/steady-time.ts';
import { verb } from '../../../server/verb.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { CONFIRM_PURPOSE, DONE, LEAVE_PURPOSE } from '../audience.ts';
import { alreadySubscribedMail, confirmSubscriptionMail } from '../emails.ts';

/**
 * Asks to be mailed the next episode of a workshop, or of one of its builds. Mails a link that confirms it; one who
 * is on the list is told so by mail. Answers alike in any case.
 * @throws NotFound for a build that is not on show
 */
export const subscribe = verb(
  { may: 'audience.subscribe', transaction: false },
  async (context, input: { readonly email: string; readonly build?: string }) => {
    const { db, workshop, now, services } = context;
    const { AUTH_SECRET, PUBLIC_URL } = services.settings;
    const build = input.build === undefined ? null : await getPublicBuild(context, { build: input.build });
    return inSteadyTime(async () => {
      // One statement, so that two who ask at once make one row.
      const [row] = await db
        .insert(subscribers)
        .values({
          id: newId(),
          workshopId: workshop.id,
          buildId: build?.id ?? null,
          email: input.email,
          askedAt: now,
        })
        .onConflictDoUpdate({
          target: [subscribers.workshopId, subscribers.buildId, subscribers.email],
          set: {
            state: sql`case ${subscribers.state} when 'confirmed' then ${subscribers.state} else 'asked' end`,
            askedAt: now,
          },
        })
        .returning({ id: subscribers.id, state: subscribers.state });
      if (!row) throw new Error('The subscription was not kept.');
      const about = { workshop: workshop.name, build: build?.name ?? null };
      const link = (purpose: string, path: (id: string, token: string) => string) =>
        PUBLIC_URL + path(row.id, signToken(AUTH_SECRET, purpose, row.id));
      services.sendAtOnce({
        to: input.email,
        from: { name: workshop.name },
        mail:
          row.state === 'confirmed'
            ? alreadySubscribedMail({ ...about, leave: link(LEAVE_PURPOSE, paths.leave) })
            : confirmSubscriptionMail({ ...about, link: link(CONFIRM_PURPOSE, paths.confirmSubscription) }),
      });
      return DONE;
    });
  },
);
