import { bigint, boolean, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { idColumn, instant, timestamps } from '../columns.ts';

// The tables that better-auth reads and writes. Field names are its own; a test holds them against getAuthTables().

export const accounts = pgTable(
  'accounts',
  {
    id: idColumn(),
    name: text('name').notNull(),
    email: text('email').notNull(),
    emailVerified: boolean('email_verified').notNull().default(false),
    image: text('image'),
    twoFactorEnabled: boolean('two_factor_enabled').notNull().default(false),
    ...timestamps(),
  },
  (table) => [unique('accounts_email_unique').on(table.email)],
);

export const sessions = pgTable(
  'sessions',
  {
    id: idColumn(),
    token: text('token').notNull(),
    userId: uuid('account_id')
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    expiresAt: instant('expires_at').notNull(),
    ipAddress: text('ip_address'),
    userAgent: text('user_agent'),
    ...timestamps(),
  },
  (table) => [
    unique('sessions_token_unique').on(table.token),
    // Signing out everywhere, and ending sessions when a role changes.
    index('sessions_account_index').on(table.userId),
  ],
);

/** How an account signs in: here always a password. */
export const credentials = pgTable(
  'credentials',
  {
    id: idColumn(),
    accountId: text('provider_account_id').notNull(),
    providerId: text('provider_id').notNull(),
    userId: uuid('account_id')
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    accessToken: text('access_token'),
    refreshToken: text('refresh_token'),
    idToken: text('id_token'),
    accessTokenExpiresAt: instant('access_token_expires_at'),
    refreshTokenExpiresAt: instant('refresh_token_expires_at'),
    scope: text('scope'),
    password: text('password'),
    ...timestamps(),
  },
  (table) => [index('credentials_account_index').on(table.userId)],
);

/** Tokens of mailed links and of the step between password and second factor; identifiers are kept hashed. */
export const verifications = pgTable(
  'verifications',
  {
    id: idColumn(),
    identifier: text('identifier').notNull(),
    value: text('value').notNull(),
    expiresAt: instant('expires_at').notNull(),
    ...timestamps(),
  },
  (table) => [index('verifications_identifier_index').on(table.identifier)],
);

export const secondFactors = pgTable(
  'second_factors',
  {
    id: idColumn(),
    secret: text('secret').notNull(),
    backupCodes: text('recovery_codes').notNull(),
    userId: uuid('account_id')
      .notNull()
      .references(() => accounts.id, { onDelete: 'cascade' }),
    verified: boolean('verified').notNull().default(true),
    failedVerificationCount: integer('failed_verification_count').notNull().default(0),
    lockedUntil: instant('locked_until'),
  },
  (table) => [
    unique('second_factors_account_unique').on(table.userId),
    index('second_factors_secret_index').on(table.secret),
  ],
);

/** The newest time step whose code an account has used: by RFC 6238 a code is taken once. Ours, not better-auth's. */
export const usedCodes = pgTable('used_codes', {
  accountId: uuid('account_id')
    .primaryKey()
    .references(() => accounts.id, { onDelete: 'cascade' }),
  /** Of 30 seconds since 1970. */
  step: bigint('step', { mode: 'number' }).notNull(),
});

/** Counters of rate-limiter-flexible; `expire` is milliseconds since 1970. */
export const rateLimits = pgTable('rate_limits', {
  key: text('key').primaryKey(),
  points: integer('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number' }),
});
