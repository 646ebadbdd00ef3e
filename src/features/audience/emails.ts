import { type AnnouncementContent } from '../../domain/audience/announcement-content.ts';
import { type Mail, type MailBlock } from '../../domain/mail.ts';
import { CONFIRM_DAYS } from './audience.ts';

/** Asks whoever reads an address whether they want the mails. */
export function confirmSubscriptionMail(props: {
  readonly workshop: string;
  /** Null for the whole workshop. */
  readonly build: string | null;
  readonly link: string;
}): Mail {
  const what = props.build === null ? props.workshop : `${props.build}, by ${props.workshop}`;
  return {
    subject: `${props.workshop}: shall we mail you the next episode?`,
    blocks: [
      {
        kind: 'paragraph',
        text: `Someone, we hope you, asked us to mail this address when there is a new episode of ${what}.`,
      },
      { kind: 'action', label: 'Yes, mail me', url: props.link },
      {
        kind: 'small',
        text: `The link holds for ${String(CONFIRM_DAYS)} days. If you did not ask, do nothing: without it no more mail comes.`,
      },
    ],
  };
}

/** Tells someone who asks again that nothing is missing. */
export function alreadySubscribedMail(props: {
  readonly workshop: string;
  readonly build: string | null;
  readonly leave: string;
}): Mail {
  return {
    subject: `${props.workshop}: you are on the list already`,
    blocks: [
      {
        kind: 'paragraph',
        text: `Someone, we hope you, asked again to be mailed the next episode of ${props.build ?? props.workshop}. This address is on the list: there is nothing to do.`,
      },
      { kind: 'link', label: 'Take me off the list', url: props.leave },
    ],
  };
}

/** An episode is out. */
export function announcementMail(
  props: AnnouncementContent & {
    /** Where one reader leaves the list. */
    readonly leave: string;
  },
): Mail {
  const episode = `Episode ${String(props.number)}`;
  const paragraphs = (text: string): MailBlock[] =>
    text
      .split(/\n{2,}/)
      .filter((paragraph) => paragraph.trim() !== '')
      .map((paragraph) => ({ kind: 'paragraph', text: paragraph }));
  return {
    subject: `${props.build}, ${episode.toLowerCase()}: ${props.title}`,
    preview: `${episode} by ${props.workshop} is out.`,
    blocks: [
      ...paragraphs(props.words),
      { kind: 'paragraph', text: `${episode} of ${props.build} is out: ${props.title}.` },
      ...paragraphs(props.about),
      { kind: 'action', label: `Watch episode ${String(props.number)}`, url: props.link },
      { kind: 'small', text: `You asked ${props.workshop} to mail you the next episode. One click ends it:` },
      { kind: 'link', label: 'Mail me no more', url: props.leave },
    ],
  };
}
