import { and, asc, eq, isNull, lte, or, type SQL, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { announcements, messages, subscribers } from '../../../db/schema/audience.ts';
import { builds } from '../../../db/schema/builds.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { type Services } from '../../../server/services.ts';

/** A claim that is not renewed for so long is another worker's to take. */
export const CLAIM_SECONDS = 30;

/** The database's clock alone counts: workers may be on several machines. */
const claimEnd = sql`now() + ${CLAIM_SECONDS} * interval '1 second'`;

/** That viewers can see what is announced. */
const onShow = and(
  eq(episodes.state, 'published'),
  isNull(episodes.deletedAt),
  eq(builds.visibility, 'public'),
  isNull(builds.deletedAt),
);

/** A message that waits and is due, or was claimed by a worker that has fallen silent. */
function isFree(): SQL | undefined {
  return or(
    and(eq(messages.state, 'waiting'), lte(messages.notBefore, sql`now()`)),
    and(eq(messages.state, 'sending'), lte(messages.claimedUntil, sql`now()`)),
  );
}

function ofAnnouncement(id: string | undefined): SQL | undefined {
  return and(eq(announcements.state, 'sending'), id === undefined ? undefined : eq(announcements.id, id));
}

/**
 * Takes the next message that is due for this worker alone.
 * @param announcementId only of this one
 * @returns null when none is due
 */
export async function claimMessage(db: Services['db'], announcementId: string | undefined) {
  return db.transaction(async (tx) => {
    const [next] = await openMessages(tx, and(ofAnnouncement(announcementId), onShow, isFree()))
      .orderBy(asc(messages.notBefore), asc(messages.id))
      .limit(1)
      .for('update', { of: messages, skipLocked: true });
    if (next?.content == null) return null;
    const tries = next.tries + 1;
    await tx
      .update(messages)
      .set({ state: 'sending', tries, claimedUntil: claimEnd, updatedAt: sql`now()` })
      .where(eq(messages.id, next.id));
    return { ...next, content: next.content, tries };
  });
}

/** Says that the worker which has a message lives. */
export async function renewClaim(db: Database, id: string): Promise<void> {
  await db
    .update(messages)
    .set({ claimedUntil: claimEnd })
    .where(and(eq(messages.id, id), eq(messages.state, 'sending')));
}

/** Whether there is anything to do now, or later, before these announcements are done. */
export async function findWork(
  db: Database,
  announcementId: string | undefined,
): Promise<'now' | 'later' | 'none'> {
  const [due] = await openMessages(db, and(ofAnnouncement(announcementId), onShow, isFree())).limit(1);
  if (due) return 'now';
  const [later] = await openMessages(db, ofAnnouncement(announcementId)).limit(1);
  return later ? 'later' : 'none';
}

/** Messages that are not done, to people who are on the list, each with what it says. */
function openMessages(db: Database, where: SQL | undefined) {
  return db
    .select({
      id: messages.id,
      messageId: messages.messageId,
      subscriberId: messages.subscriberId,
      tries: messages.tries,
      content: announcements.content,
      email: subscribers.email,
    })
    .from(messages)
    .innerJoin(announcements, eq(announcements.id, messages.announcementId))
    .innerJoin(
      subscribers,
      and(eq(subscribers.id, messages.subscriberId), eq(subscribers.state, 'confirmed')),
    )
    .innerJoin(episodes, eq(episodes.id, announcements.episodeId))
    .innerJoin(builds, eq(builds.id, episodes.buildId))
    .where(and(where, sql`${messages.state} in ('waiting', 'sending')`));
}

/**
 * Ends what is over: an episode that was taken off is announced no more, a message to someone who has left goes, and
 * an announcement without open messages is sent.
 */
export async function settleAnnouncements(db: Database): Promise<void> {
  const sending = db
    .select({ id: announcements.id })
    .from(announcements)
    .where(eq(announcements.state, 'sending'));
  await db.execute(sql`
    update ${announcements} set state = 'cancelled', version = ${announcements.version} + 1,
      finished_at = now(), updated_at = now()
    where ${announcements.state} = 'sending' and not exists (
      select 1 from ${episodes} join ${builds} on ${builds.id} = ${episodes.buildId}
      where ${episodes.id} = ${announcements.episodeId} and ${onShow})`);
  await db.execute(sql`
    delete from ${messages} using ${subscribers}
    where ${subscribers.id} = ${messages.subscriberId} and ${subscribers.state} <> 'confirmed'
      and ${messages.announcementId} in (${sending})
      and (${messages.state} = 'waiting' or (${messages.state} = 'sending' and ${messages.claimedUntil} <= now()))`);
  await db.execute(sql`
    update ${announcements} set state = 'sent', version = ${announcements.version} + 1,
      finished_at = now(), updated_at = now()
    where ${announcements.state} = 'sending' and not exists (
      select 1 from ${messages} where ${messages.announcementId} = ${announcements.id}
        and ${messages.state} in ('waiting', 'sending'))`);
}
