import { betterAuth } from 'better-auth';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { APIError } from 'better-auth/api';
import { magicLink, twoFactor } from 'better-auth/plugins';
import { type NodePgDatabase } from 'drizzle-orm/node-postgres';
import { type Logger } from 'pino';
import { newId } from '../../db/columns.ts';
import * as tables from '../../db/schema/accounts.ts';
import { type Mail } from '../../domain/mail.ts';
import { PASSWORD_LENGTH } from '../../domain/passwords.ts';
import { type ServiceSettings } from '../env.ts';
import { cookiePrefix } from './cookies.ts';
import { makeRecoveryCodes } from './recovery-codes.ts';
import { mayUseSignInLink } from './sign-in-links.ts';

const HOUR = 3600;

/** How long a mailed link works, in seconds. */
export const LINK_LIFE = { confirm: 24 * HOUR, reset: HOUR, signIn: HOUR / 4 } as const;

/** What the account mails say; the links are whole addresses. */
export interface AccountMails {
  confirmAddress(props: { name: string; token: string }): Mail;
  addressIsKnown(props: { name: string }): Mail;
  resetPassword(props: { name: string; token: string }): Mail;
  passwordChanged(props: { name: string }): Mail;
  approveNewAddress(props: { name: string; newEmail: string; token: string }): Mail;
  confirmNewAddress(props: { name: string; token: string }): Mail;
  signInLink(props: { token: string }): Mail;
}

export interface AuthParts {
  readonly settings: ServiceSettings;
  readonly db: NodePgDatabase;
  readonly mails: AccountMails;
  readonly log: Logger;
  /** Sends without making the asker wait: waiting would tell known addresses from unknown ones. */
  readonly sendLater: (to: string, mail: Mail) => void;
}

/**
 * better-auth over our own tables. Its router is mounted nowhere: every call comes from an account verb, which
 * has checked origin and limits, so that none of its own addresses exist.
 */
export function openAuth({ settings, db, mails, log, sendLater }: AuthParts) {
  const secure = settings.PUBLIC_URL.startsWith('https:');
  return betterAuth({
    appName: 'Centrepop',
    baseURL: settings.PUBLIC_URL,
    secret: settings.AUTH_SECRET,
    telemetry: { enabled: false },
    database: drizzleAdapter(db, {
      provider: 'pg',
      transaction: true,
      schema: {
        user: tables.accounts,
        session: tables.sessions,
        account: tables.credentials,
        verification: tables.verifications,
        twoFactor: tables.secondFactors,
      },
    }),
    logger: {
      level: 'warn',
      log: (level, message) => {
        // Its own sentences for unknown addresses are not for the log.
        if (level === 'error') log.error({ part: 'auth' }, message);
      },
    },
    advanced: {
      cookiePrefix: cookiePrefix(settings),
      useSecureCookies: false,
      defaultCookieAttributes: { secure, sameSite: 'lax', httpOnly: true, path: '/' },
      database: { generateId: newId },
      ipAddress: { ipAddressHeaders: ['x-forwarded-for'] },
      disableOriginCheck: true,
    },
    rateLimit: { enabled: false },
    session: { expiresIn: 30 * 24 * HOUR, updateAge: 24 * HOUR, cookieCache: { enabled: false } },
    user: {
      changeEmail: {
        enabled: true,
        sendChangeEmailConfirmation: ({ user, newEmail, token }) => {
          sendLater(user.email, mails.approveNewAddress({ name: user.name, newEmail, token }));
          return Promise.resolve();
        },
      },
    },
    verification: { storeIdentifier: 'hashed' },
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      minPasswordLength: PASSWORD_LENGTH.min,
      maxPasswordLength: PASSWORD_LENGTH.max,
      resetPasswordTokenExpiresIn: LINK_LIFE.reset,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: ({ user, token }) => {
        sendLater(user.email, mails.resetPassword({ name: user.name, token }));
        return Promise.resolve();
      },
      onPasswordReset: ({ user }) => {
        sendLater(user.email, mails.passwordChanged({ name: user.name }));
        return Promise.resolve();
      },
      onExistingUserSignUp: ({ user }) => {
        sendLater(user.email, mails.addressIsKnown({ name: user.name }));
        return Promise.resolve();
      },
    },
    emailVerification: {
      sendOnSignUp: true,
      expiresIn: LINK_LIFE.confirm,
      autoSignInAfterVerification: false,
      sendVerificationEmail: ({ user, token }) => {
        const props = { name: user.name, token };
        // A confirmed account is asked again only when its address changes.
        sendLater(
          user.email,
          user.emailVerified ? mails.confirmNewAddress(props) : mails.confirmAddress(props),
        );
        return Promise.resolve();
      },
    },
    databaseHooks: {
      session: {
        create: {
          before: async (session, call) => {
            // A link needs no second factor, so it opens no account that has or owes one.
            if (call?.path === '/magic-link/verify' && !(await mayUseSignInLink(db, session.userId))) {
              throw new APIError('FORBIDDEN', { code: 'LINK_NOT_FOR_THIS_ACCOUNT' });
            }
          },
        },
      },
    },
    plugins: [
      twoFactor({
        issuer: 'Centrepop',
        twoFactorCookieMaxAge: 600,
        backupCodeOptions: { customBackupCodesGenerate: makeRecoveryCodes },
      }),
      magicLink({
        expiresIn: LINK_LIFE.signIn,
        disableSignUp: true,
        storeToken: 'hashed',
        sendMagicLink: ({ email, token }) => {
          sendLater(email, mails.signInLink({ token }));
        },
      }),
    ],
  });
}

export type Auth = ReturnType<typeof openAuth>;
