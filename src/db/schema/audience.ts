import { sql } from 'drizzle-orm';
import {
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { type AnnouncementContent } from '../../domain/audience/announcement-content.ts';
import {
  ANNOUNCEMENT_STATES,
  MESSAGE_STATES,
  SUBSCRIBER_STATES,
} from '../../domain/audience/audience-states.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';
import { editions, episodes } from './episodes.ts';
import { workshops } from './workshops.ts';

export const subscriberState = pgEnum('subscriber_state', SUBSCRIBER_STATES);
export const announcementState = pgEnum('announcement_state', ANNOUNCEMENT_STATES);
export const messageState = pgEnum('message_state', MESSAGE_STATES);

/** An address that asked to be mailed about a workshop, or about one build of it. */
export const subscribers = pgTable(
  'subscribers',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    /** Null for the whole workshop. */
    buildId: uuid('build_id'),
    email: text('email').notNull(),
    state: subscriberState('state').notNull().default('asked'),
    askedAt: instant('asked_at').notNull(),
    confirmedAt: instant('confirmed_at'),
    leftAt: instant('left_at'),
    bouncedAt: instant('bounced_at'),
  },
  (table) => [
    unique('subscribers_tenant_unique').on(table.workshopId, table.id),
    unique('subscribers_address_unique').on(table.workshopId, table.buildId, table.email).nullsNotDistinct(),
    foreignKey({
      name: 'subscribers_workshop_fk',
      columns: [table.workshopId],
      foreignColumns: [workshops.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'subscribers_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
  ],
);

/** The mail about one episode, to everyone who asked for it. */
export const announcements = pgTable(
  'announcements',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    episodeId: uuid('episode_id').notNull(),
    editionId: uuid('edition_id').notNull(),
    state: announcementState('state').notNull().default('draft'),
    words: text('words').notNull().default(''),
    content: jsonb('content').$type<AnnouncementContent>(),
    askedBy: uuid('asked_by').references(() => accounts.id),
    askedAt: instant('asked_at'),
    sentBy: uuid('sent_by').references(() => accounts.id),
    startedAt: instant('started_at'),
    finishedAt: instant('finished_at'),
    version: versionColumn(),
    ...timestamps(),
  },
  (table) => [
    unique('announcements_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'announcements_episode_fk',
      columns: [table.workshopId, table.episodeId],
      foreignColumns: [episodes.workshopId, episodes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'announcements_edition_fk',
      columns: [table.workshopId, table.editionId],
      foreignColumns: [editions.workshopId, editions.id],
    }).onDelete('cascade'),
    uniqueIndex('announcements_open_unique')
      .on(table.episodeId)
      .where(sql`${table.state} <> 'cancelled'`),
    // What the workers look for.
    index('announcements_sending_index')
      .on(table.id)
      .where(sql`${table.state} = 'sending'`),
  ],
);

/** One mail of an announcement to one subscriber. */
export const messages = pgTable(
  'messages',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    announcementId: uuid('announcement_id').notNull(),
    subscriberId: uuid('subscriber_id').notNull(),
    /** With its angle brackets; the same however often the mail is tried. */
    messageId: text('message_id').notNull(),
    state: messageState('state').notNull().default('waiting'),
    tries: integer('tries').notNull().default(0),
    /** Not tried before. */
    notBefore: instant('not_before').notNull(),
    /** Until then the worker that claimed it has it; later it is anyone's. */
    claimedUntil: instant('claimed_until'),
    sentAt: instant('sent_at'),
    /** What the mail server last said, without addresses. */
    problem: text('problem'),
    updatedAt: timestamps().updatedAt,
  },
  (table) => [
    unique('messages_subscriber_unique').on(table.announcementId, table.subscriberId),
    unique('messages_message_id_unique').on(table.messageId),
    foreignKey({
      name: 'messages_announcement_fk',
      columns: [table.workshopId, table.announcementId],
      foreignColumns: [announcements.workshopId, announcements.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'messages_subscriber_fk',
      columns: [table.workshopId, table.subscriberId],
      foreignColumns: [subscribers.workshopId, subscribers.id],
    }).onDelete('cascade'),
    index('messages_open_index')
      .on(table.announcementId, table.notBefore)
      .where(sql`${table.state} in ('waiting', 'sending')`),
    // Whether anything has changed since someone last looked.
    index('messages_changed_index').on(table.announcementId, table.updatedAt),
    index('messages_subscriber_index').on(table.subscriberId),
  ],
);
