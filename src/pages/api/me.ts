import { MeAnswer } from '../../features/accounts/account.ts';
import { findMe } from '../../features/accounts/server/find-me.ts';
import { apiRoute, NONE } from '../../server/http/api-route.ts';

export const GET = apiRoute({ verb: findMe, params: NONE, body: NONE, answer: MeAnswer });
