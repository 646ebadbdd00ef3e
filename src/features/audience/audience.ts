import { z } from 'zod';
import { ANNOUNCEMENT_STATES, MESSAGE_STATES } from '../../domain/audience/audience-states.ts';
import { email } from '../../domain/email-address.ts';
import { runningText } from '../../domain/plain-text.ts';
export { episodeParams } from '../episodes/episode.ts';

/** How long a link that confirms a subscription holds, in days. */
export const CONFIRM_DAYS = 14;

/** What the tokens of mailed links are signed for. */
export const CONFIRM_PURPOSE = 'confirm-subscription';
export const LEAVE_PURPOSE = 'leave';

export const WORDS_LENGTH = 2000;

export const SubscribeInput = z.object({ email });

const NOT_WHOLE = 'The link is not whole. Open it from the mail again.';
const token = z.string(NOT_WHOLE).min(1, NOT_WHOLE).max(200, NOT_WHOLE);
export const ConfirmInput = z.object({ token });
export const subscriberParam = z.object({ subscriber: z.uuid('That is not an id of ours.') });
export const leaveParams = subscriberParam.extend({ token });

export const bounceParam = z.object({ token });
export const BounceInput = z.object({
  /** As it stands in the mail that came back, with its angle brackets. */
  messageId: z.string('Name the Message-ID of the mail that came back.').trim().min(3).max(300),
});

const STALE = 'Open the page again.';
/** The version that was seen; 0 before there is an announcement. */
const version = z.coerce
  .number(STALE)
  .int(STALE)
  .min(0, STALE)
  .max(2 ** 31 - 1, STALE);
const ticked = z
  .union([z.literal('on').transform(() => true), z.boolean()], 'Tick it or leave it.')
  .default(false);

export const DraftAnnouncementInput = z.object({ words: runningText(WORDS_LENGTH), version });
export const SendAnnouncementInput = z.object({
  version,
  /** The mark of the mail that was shown: another is not sent instead. */
  seen: z.string(STALE).max(100, STALE),
  /** The video can be watched where it lives. */
  watchable: ticked,
  /** It came out a while ago, and is to be mailed all the same. */
  late: ticked,
});
export const AnnouncementVersionInput = z.object({ version });
export type SendAnnouncement = z.output<typeof SendAnnouncementInput>;

export const MadeAnnouncement = z.object({ id: z.uuid() });

/** How far an announcement has come: messages by state. */
export const AnnouncementProgress = z.object({
  state: z.enum(ANNOUNCEMENT_STATES),
  counts: z.record(z.enum(MESSAGE_STATES), z.number()),
  total: z.number(),
});
export type AnnouncementProgress = z.output<typeof AnnouncementProgress>;

export const Done = z.object({ done: z.literal(true) });
export const DONE = { done: true as const };
