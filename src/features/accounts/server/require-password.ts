import { callAuth } from '../../../server/auth/call-auth.ts';
import { type AccountContext } from '../../../server/context.ts';

/**
 * Asks for the password once more before something that a borrowed session must not do.
 * @throws Invalid at the field `password`
 */
export async function requirePassword(context: AccountContext, password: string): Promise<void> {
  await callAuth(context, async (headers) => ({
    response: await context.services.auth.api.verifyPassword({ body: { password }, headers }),
    headers: new Headers(),
  }));
}
