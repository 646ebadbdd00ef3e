import { paths } from './paths.ts';
import { type AccountMails } from './server/auth/auth.ts';
import * as mails from './features/accounts/emails.ts';

/**
 * The account mails with their links.
 * @param publicUrl PUBLIC_URL
 */
export function accountMails(publicUrl: string): AccountMails {
  const at = (path: string) => publicUrl + path;
  return {
    confirmAddress: ({ name, token }) =>
      mails.confirmAddressMail({ name, link: at(paths.confirmAddress(token)) }),
    addressIsKnown: ({ name }) =>
      mails.addressIsKnownMail({ name, signIn: at(paths.signIn()), reset: at(paths.askReset()) }),
    resetPassword: ({ name, token }) =>
      mails.resetPasswordMail({ name, link: at(paths.resetPassword(token)) }),
    passwordChanged: ({ name }) => mails.passwordChangedMail({ name, reset: at(paths.askReset()) }),
    approveNewAddress: ({ name, newEmail, token }) =>
      mails.approveNewAddressMail({ name, newEmail, link: at(paths.confirmNewAddress(token)) }),
    confirmNewAddress: ({ name, token }) =>
      mails.confirmNewAddressMail({ name, link: at(paths.confirmNewAddress(token)) }),
    signInLink: ({ token }) => mails.signInLinkMail({ link: at(paths.signInLink(token)) }),
  };
}
