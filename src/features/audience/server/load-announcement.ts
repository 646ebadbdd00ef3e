import { createHash } from 'node:crypto';
import { and, asc, eq, inArray, isNull, ne, notExists, or, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { announcements, messages, subscribers } from '../../../db/schema/audience.ts';
import { type AnnouncementContent } from '../../../domain/audience/announcement-content.ts';
import {
  type AnnouncementState,
  NEXT_ANNOUNCEMENT_STATES,
} from '../../../domain/audience/audience-states.ts';
import { daysSince, NEWS_DAYS } from '../../../domain/audience/announcement-rules.ts';
import { dayIn } from '../../../domain/time/day-in.ts';
import { paths } from '../../../paths.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, Invalid, NotFound } from '../../../server/errors.ts';
import { renderMail, type RenderedMail } from '../../../server/mail/render-mail.ts';
import { findShownEdition } from '../../episodes/server/load-editions.ts';
import { type EpisodeRef, loadEpisode } from '../../episodes/server/load-episode.ts';
import { announcementMail } from '../emails.ts';

/** The announcement of an episode that was not called off; null before there is one. */
export async function findAnnouncement(db: Database, episodeId: string, lock = false) {
  const found = db
    .select()
    .from(announcements)
    .where(and(eq(announcements.episodeId, episodeId), ne(announcements.state, 'cancelled')));
  const [row] = await (lock ? found.for('update') : found);
  return row ?? null;
}

/** An episode that viewers can see, with the edition that they see. @throws NotFound, Invalid when they cannot */
export async function loadForAnnouncing(context: WorkshopContext, ref: EpisodeRef) {
  const { build, episode } = await loadEpisode(context, ref);
  const edition = await findShownEdition(context.db, episode.id);
  const refusal = refusalToAnnounce(build, episode, edition);
  if (refusal !== null || edition === null) throw new Invalid({ '': refusal ?? '' });
  return { build, episode, edition };
}

/**
 * The same with its announcement, locked for the change that follows.
 * @throws Conflict when the announcement is not at the version seen
 */
export async function lockForAnnouncing(
  context: WorkshopContext,
  ref: EpisodeRef & { readonly version: number },
) {
  const { build, episode, edition } = await loadForAnnouncing(context, ref);
  const announcement = await findAnnouncement(context.db, episode.id, true);
  if ((announcement?.version ?? 0) !== ref.version) {
    throw new Conflict(
      announcement,
      'Someone else changed this announcement in the meantime. Open the page again.',
    );
  }
  return { build, episode, edition, announcement };
}

/** Why an episode cannot be announced, as a sentence; null when it can. */
export function refusalToAnnounce(
  build: { readonly visibility: string },
  episode: { readonly state: string },
  edition: { readonly backCatalogue: boolean } | null,
): string | null {
  if (episode.state === 'withdrawn')
    return 'The episode was withdrawn. Publish it again before you announce it.';
  if (episode.state !== 'published' || edition === null)
    return 'The episode is not published yet. Publish it, then announce it.';
  if (edition.backCatalogue)
    return 'The episode was out before it was brought in here, so it is announced to nobody.';
  if (build.visibility !== 'public')
    return 'The build is private. Put it on show under This build, then announce its episodes.';
  return null;
}

/** Whether an episode came out too long ago to be announced without a word from the owner. */
export function isOldNews({ workshop, now }: WorkshopContext, publishedOn: string | null): boolean {
  return publishedOn !== null && daysSince(publishedOn, dayIn(workshop.timeZone, now)) > NEWS_DAYS;
}

/** What the announcement of an episode says, as of now. */
export function contentOf(
  { workshop, services }: WorkshopContext,
  build: { readonly slug: string; readonly name: string },
  episode: { readonly number: number; readonly title: string; readonly about: string },
  words: string,
): AnnouncementContent {
  const { number, title, about } = episode;
  const link = services.settings.PUBLIC_URL + paths.episode(workshop.slug, build.slug, number);
  return { workshop: workshop.name, build: build.name, number, title, about, words, link };
}

/**
 * The mail as it will be, but for the leave link, which is each reader's own.
 * @returns with a mark that differs whenever the mail does
 */
export function previewOf(
  content: AnnouncementContent,
  publicUrl: string,
): RenderedMail & { readonly seen: string } {
  const leave = publicUrl + paths.leave('each-reader', 'has-their-own');
  const mail = renderMail(announcementMail({ ...content, leave }));
  const seen = createHash('sha256').update(`${mail.subject}\n${mail.text}`).digest('base64url').slice(0, 22);
  return { ...mail, seen };
}

/**
 * Whoever is to be mailed about an episode: each address once, by its build's list rather than the workshop's, and
 * none that an announcement called off has reached already.
 */
export function selectRecipients(
  db: Database,
  of: { readonly workshopId: string; readonly buildId: string; readonly episodeId: string },
) {
  const reached = db
    .select({ one: sql`1` })
    .from(messages)
    .innerJoin(announcements, eq(announcements.id, messages.announcementId))
    .innerJoin(sql`${subscribers} as earlier`, sql`earlier.id = ${messages.subscriberId}`)
    .where(
      and(
        eq(announcements.episodeId, of.episodeId),
        inArray(messages.state, ['sending', 'sent', 'bounced', 'refused']),
        sql`earlier.email = ${subscribers.email}`,
      ),
    );
  return db
    .selectDistinctOn([subscribers.email], { id: subscribers.id, email: subscribers.email })
    .from(subscribers)
    .where(
      and(
        eq(subscribers.workshopId, of.workshopId),
        eq(subscribers.state, 'confirmed'),
        or(eq(subscribers.buildId, of.buildId), isNull(subscribers.buildId)),
        notExists(reached),
      ),
    )
    .orderBy(asc(subscribers.email), sql`${subscribers.buildId} nulls last`);
}

/**
 * Brings an episode's announcement into another state.
 * @throws NotFound when there is none, Conflict at another version, Invalid when it cannot go there
 */
export async function moveAnnouncement(
  context: WorkshopContext,
  ref: EpisodeRef & { readonly version: number },
  to: AnnouncementState,
): Promise<string> {
  const { db, now } = context;
  const { episode } = await loadEpisode(context, ref);
  const announcement = await findAnnouncement(db, episode.id, true);
  if (!announcement) throw new NotFound('This announcement');
  if (announcement.version !== ref.version) {
    throw new Conflict(announcement, 'The announcement has moved on in the meantime. Open the page again.');
  }
  if (!NEXT_ANNOUNCEMENT_STATES[announcement.state].includes(to)) {
    throw new Invalid({ '': `It is ${announcement.state} already. Nothing was changed.` });
  }
  await db
    .update(announcements)
    .set({
      state: to,
      version: announcement.version + 1,
      updatedAt: now,
      ...(to === 'cancelled' && { finishedAt: now }),
    })
    .where(eq(announcements.id, announcement.id));
  return announcement.id;
}
