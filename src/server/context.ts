import { type Standing } from '../domain/roles.ts';
import { type Database } from '../db/client.ts';
import { type Services } from './services.ts';

export interface AccountActor {
  readonly kind: 'account';
  readonly id: string;
  readonly name: string;
  readonly email: string;
  /** Whether signing in took a second factor: owners are held to it. */
  readonly secondFactor: boolean;
  readonly sessionToken: string;
}

export type Actor = AccountActor | { readonly kind: 'anyone' };

export interface Workshop {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly timeZone: string;
  readonly language: string;
  readonly editorsMaySeeOrders: boolean;
  readonly version: number;
}

/** Everything that a read or a verb knows about who asks, where and when. Nothing of it is global. */
export interface Context {
  readonly db: Database;
  readonly actor: Actor;
  readonly workshop: Workshop | null;
  readonly role: Standing;
  readonly now: Date;
  readonly requestId: string;
  readonly services: Services;
  /** The request's headers, for the account verbs alone: cookies are their authority. */
  readonly headers: Headers;
  /** Set-Cookie lines that the answer is to carry. */
  readonly setCookies: string[];
}

export type WorkshopContext = Context & { readonly workshop: Workshop };
export type AccountContext = Context & { readonly actor: AccountActor };
