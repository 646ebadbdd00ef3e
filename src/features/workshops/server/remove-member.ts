import { eq } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { keepsAnOwner } from '../../../domain/roles.ts';
import { endSessions } from '../../../server/auth/session.ts';
import { Invalid, NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { lockTeam } from './lock-team.ts';

/** Takes a member off the team and ends their sessions. @throws Invalid when nobody would be owner any more */
export const removeMember = verb(
  { may: 'team.change' },
  async ({ db, workshop }, { member: id }: { member: string }) => {
    const team = await lockTeam(db, workshop.id);
    const member = team.find((one) => one.id === id);
    if (!member) throw new NotFound('This member');
    if (!keepsAnOwner(team, id, null)) {
      throw new Invalid({ '': 'A workshop always has an owner. Make someone else owner first.' });
    }
    await db.delete(memberships).where(eq(memberships.id, id));
    await endSessions(db, member.accountId);
    return { id };
  },
);
