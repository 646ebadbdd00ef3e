import { eq } from 'drizzle-orm';
import { type Database } from '../../db/client.ts';
import { sessions } from '../../db/schema/accounts.ts';
import { type Actor } from '../context.ts';
import { type ServiceSettings } from '../env.ts';
import { type Auth } from './auth.ts';
import { cookiePrefix } from './cookies.ts';

/** Who a request comes from, with the cookie lines that keep its session alive. */
export interface SessionReading {
  readonly actor: Actor;
  readonly setCookies: readonly string[];
}

const NOBODY: SessionReading = { actor: { kind: 'anyone' }, setCookies: [] };

/** Reads the session of a request; one without our cookie costs nothing. */
export async function readSession(
  auth: Auth,
  settings: ServiceSettings,
  headers: Headers,
): Promise<SessionReading> {
  if (!headers.get('cookie')?.includes(`${cookiePrefix(settings)}.session_token=`)) return NOBODY;
  const { response, headers: answered } = await auth.api.getSession({ headers, returnHeaders: true });
  const setCookies = answered.getSetCookie();
  if (response === null) return { ...NOBODY, setCookies };
  const { session, user } = response;
  return {
    actor: {
      kind: 'account',
      id: user.id,
      name: user.name,
      email: user.email,
      secondFactor: user.twoFactorEnabled === true,
      sessionToken: session.token,
    },
    setCookies,
  };
}

/** Ends every session of an account at once, on every device. */
export async function endSessions(db: Database, accountId: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.userId, accountId));
}
