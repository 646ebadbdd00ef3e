import { eq } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { keepsAnOwner, type TeamRole } from '../../../domain/roles.ts';
import { endSessions } from '../../../server/auth/session.ts';
import { Invalid, NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { lockTeam } from './lock-team.ts';

/** Gives a member another role and ends their sessions. @throws Invalid when nobody would be owner any more */
export const changeRole = verb(
  { may: 'team.change' },
  async ({ db, workshop, now }, { member: id, role }: { member: string; role: TeamRole }) => {
    const team = await lockTeam(db, workshop.id);
    const member = team.find((one) => one.id === id);
    if (!member) throw new NotFound('This member');
    if (!keepsAnOwner(team, id, role)) {
      throw new Invalid({ role: 'A workshop always has an owner. Make someone else owner first.' });
    }
    if (member.role === role) return { id };
    await db.update(memberships).set({ role, updatedAt: now }).where(eq(memberships.id, id));
    await endSessions(db, member.accountId);
    return { id };
  },
);
