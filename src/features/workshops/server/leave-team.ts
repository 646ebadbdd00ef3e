import { eq } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { keepsAnOwner } from '../../../domain/roles.ts';
import { endSessions } from '../../../server/auth/session.ts';
import { Invalid, NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { lockTeam } from './lock-team.ts';

/** Leaves the team oneself. @throws Invalid for the last owner */
export const leaveTeam = verb({ may: 'team.leave' }, async ({ db, actor, workshop }) => {
  const team = await lockTeam(db, workshop.id);
  const member = team.find((one) => actor.kind === 'account' && one.accountId === actor.id);
  if (!member) throw new NotFound('This member');
  if (!keepsAnOwner(team, member.id, null)) {
    throw new Invalid({ '': 'You are the only owner. Make someone else owner before you leave.' });
  }
  await db.delete(memberships).where(eq(memberships.id, member.id));
  await endSessions(db, member.accountId);
  return { id: member.id };
});
