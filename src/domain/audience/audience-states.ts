/** Someone who asked to be mailed; only a confirmed one is. */
export const SUBSCRIBER_STATES = ['asked', 'confirmed', 'left', 'bounced'] as const;
export type SubscriberState = (typeof SUBSCRIBER_STATES)[number];

export const ANNOUNCEMENT_STATES = ['draft', 'sending', 'paused', 'sent', 'cancelled'] as const;
export type AnnouncementState = (typeof ANNOUNCEMENT_STATES)[number];

/** Which states an announcement may go to next. */
export const NEXT_ANNOUNCEMENT_STATES: Readonly<Record<AnnouncementState, readonly AnnouncementState[]>> = {
  draft: ['sending', 'cancelled'],
  sending: ['paused', 'sent', 'cancelled'],
  paused: ['sending', 'cancelled'],
  sent: [],
  cancelled: [],
};

/** One mail to one subscriber; `sending` holds until its claim runs out. */
export const MESSAGE_STATES = ['waiting', 'sending', 'sent', 'failed', 'refused', 'bounced'] as const;
export type MessageState = (typeof MESSAGE_STATES)[number];
