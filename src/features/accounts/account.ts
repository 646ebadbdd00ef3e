import { z } from 'zod';
import { email } from '../../domain/email-address.ts';
import { PASSWORD_LENGTH } from '../../domain/passwords.ts';

export const NAME_LENGTH = 80;
export const personName = z
  .string('Enter a name.')
  .trim()
  .normalize('NFC')
  .min(1, 'Enter a name.')
  .max(NAME_LENGTH, `Keep the name to ${String(NAME_LENGTH)} characters.`)
  .refine((name) => !/[\p{Cc}<>]/u.test(name), 'Leave out control characters and angle brackets.');

const newPassword = z
  .string('Choose a password.')
  .min(PASSWORD_LENGTH.min, `Use at least ${String(PASSWORD_LENGTH.min)} characters.`)
  .max(PASSWORD_LENGTH.max, `Use at most ${String(PASSWORD_LENGTH.max)} characters.`);

const password = z
  .string('Enter your password.')
  .min(1, 'Enter your password.')
  .max(PASSWORD_LENGTH.max, 'That is not your password.');
const NOT_WHOLE = 'The link is not whole. Open it from the mail again.';
const token = z.string(NOT_WHOLE).min(1, NOT_WHOLE).max(2000, NOT_WHOLE);
/** Where to go afterwards; anything but a path of ours is ignored. */
const next = z.string().max(500).optional().catch(undefined);

export const SignUpInput = z.object({ name: personName, email, password: newPassword });
export const AddressInput = z.object({ email });
export const TokenInput = z.object({ token });
export const ConfirmAddressInput = z.object({ token, password });
export const SignInInput = z.object({ email, password, next });
export const SecondStepInput = z.object({
  kind: z.enum(['code', 'recovery'], 'Choose which code it is.').default('code'),
  code: z.string('Enter the code.').trim().min(1, 'Enter the code.').max(40, 'That is too long for a code.'),
  next,
});
export const ResetPasswordInput = z.object({ token, newPassword });
export const PasswordInput = z.object({ password });
export const ChangePasswordInput = z.object({ password, newPassword });
export const ChangeEmailInput = z.object({ email, password });
export const ChangeNameInput = z.object({ name: personName });
export const AppCodeInput = z.object({
  code: z
    .string('Enter the six digits.')
    .transform((text) => text.replace(/\s/g, ''))
    .pipe(z.string().regex(/^\d{6}$/, 'Enter the six digits that your app shows.')),
  next,
});

export type SignUp = z.output<typeof SignUpInput>;
export type SignIn = z.output<typeof SignInInput>;

/** Who is signed in, as pages show it. */
export const MeAnswer = z
  .object({
    name: z.string(),
    workshops: z.array(z.object({ slug: z.string(), name: z.string() })),
  })
  .nullable();

/** What setting up a second factor shows, this once. */
export const SecondFactorStart = z.object({
  uri: z.string(),
  secret: z.string(),
  recoveryCodes: z.array(z.string()),
});
export type SecondFactorStart = z.output<typeof SecondFactorStart>;

export const RecoveryCodes = z.object({ recoveryCodes: z.array(z.string()) });
export const Done = z.object({ done: z.literal(true) });
export const DONE = { done: true as const };
export const SignedIn = z.object({ secondStep: z.boolean() });
