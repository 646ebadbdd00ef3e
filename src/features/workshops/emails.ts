import { type Mail } from '../../domain/mail.ts';
import { type InvitedRole } from '../../domain/roles.ts';

const CAN_DO: Record<InvitedRole, string> = {
  editor: 'As an editor you keep builds, parts, footage and notes, and draft episodes.',
  moderator: 'As a moderator you keep the questions in order and answer those you can.',
};

export function invitationMail(props: {
  readonly inviter: string;
  readonly workshop: string;
  readonly role: InvitedRole;
  readonly days: number;
  readonly link: string;
}): Mail {
  return {
    subject: `${props.workshop}: you are invited as ${props.role}`,
    blocks: [
      {
        kind: 'paragraph',
        text: `${props.inviter} invites you to the team of ${props.workshop}, as ${props.role}.`,
      },
      { kind: 'paragraph', text: CAN_DO[props.role] },
      { kind: 'action', label: 'See the invitation', url: props.link },
      {
        kind: 'small',
        text: `The invitation holds for ${String(props.days)} days, for this address only. If you do not know ${props.inviter}, do nothing.`,
      },
    ],
  };
}
