import { type Mail } from '../../domain/mail.ts';

const NOT_YOU = 'If this was not you, do nothing: nothing changes without the link.';

export function confirmAddressMail({ name, link }: { name: string; link: string }): Mail {
  return {
    subject: 'Confirm your address',
    blocks: [
      { kind: 'paragraph', text: `Hello ${name},` },
      { kind: 'paragraph', text: 'Someone, most likely you, signed up for Centrepop with this address.' },
      { kind: 'action', label: 'Confirm this address', url: link },
      { kind: 'small', text: `The link works for a day, with the password you chose. ${NOT_YOU}` },
    ],
  };
}

export function addressIsKnownMail(props: { name: string; signIn: string; reset: string }): Mail {
  return {
    subject: 'You already have an account',
    blocks: [
      { kind: 'paragraph', text: `Hello ${props.name},` },
      {
        kind: 'paragraph',
        text: 'Someone tried to sign up with this address, which has an account already.',
      },
      { kind: 'action', label: 'Sign in', url: props.signIn },
      { kind: 'paragraph', text: `Forgotten the password? Choose a new one: ${props.reset}` },
      { kind: 'small', text: 'If this was not you, do nothing. Nobody else has got in.' },
    ],
  };
}

export function resetPasswordMail({ name, link }: { name: string; link: string }): Mail {
  return {
    subject: 'Choose a new password',
    blocks: [
      { kind: 'paragraph', text: `Hello ${name},` },
      { kind: 'paragraph', text: 'Someone, most likely you, asked for a new password.' },
      { kind: 'action', label: 'Choose a new password', url: link },
      { kind: 'small', text: `The link works once, for an hour. ${NOT_YOU}` },
    ],
  };
}

export function passwordChangedMail({ name, reset }: { name: string; reset: string }): Mail {
  return {
    subject: 'Your password was changed',
    blocks: [
      { kind: 'paragraph', text: `Hello ${name},` },
      { kind: 'paragraph', text: 'Your password was changed, and every device was signed out.' },
      { kind: 'paragraph', text: `If this was not you, choose another at once: ${reset}` },
    ],
  };
}

export function approveNewAddressMail(props: { name: string; newEmail: string; link: string }): Mail {
  return {
    subject: 'Approve your new address',
    blocks: [
      { kind: 'paragraph', text: `Hello ${props.name},` },
      {
        kind: 'paragraph',
        text: `Your account is to move to ${props.newEmail}. Approve it from this address first.`,
      },
      { kind: 'action', label: 'Approve the new address', url: props.link },
      { kind: 'small', text: `The link works for a day. ${NOT_YOU} Then change your password, too.` },
    ],
  };
}

export function confirmNewAddressMail({ name, link }: { name: string; link: string }): Mail {
  return {
    subject: 'Confirm your new address',
    blocks: [
      { kind: 'paragraph', text: `Hello ${name},` },
      { kind: 'paragraph', text: 'This address is to become the address of your account.' },
      { kind: 'action', label: 'Use this address', url: link },
      { kind: 'small', text: `The link works for a day, while you are signed in. ${NOT_YOU}` },
    ],
  };
}

export function signInLinkMail({ link }: { link: string }): Mail {
  return {
    subject: 'Your link to sign in',
    blocks: [
      { kind: 'paragraph', text: 'Open this on the device you want to sign in on.' },
      { kind: 'action', label: 'Sign in', url: link },
      { kind: 'small', text: `The link works once, for 15 minutes. ${NOT_YOU}` },
    ],
  };
}
