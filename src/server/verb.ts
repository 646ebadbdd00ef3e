import { type NodePgDatabase } from 'drizzle-orm/node-postgres';
import {
  type AccountPermission,
  isWorkshopPermission,
  may,
  type Permission,
  type WorkshopPermission,
} from '../domain/permissions.ts';
import { type AccountContext, type Context, type WorkshopContext } from './context.ts';
import { Forbidden, NotFound, SecondFactorNeeded, SignInNeeded } from './errors.ts';

export interface Rule<P extends Permission = Permission> {
  readonly may: P;
  /** False for account verbs, since better-auth writes on connections of its own, and where mail goes at once. */
  readonly transaction?: false;
}

/** What a rule guarantees its handler: a workshop, or an account, or nothing. */
type ContextFor<P extends Permission> = P extends WorkshopPermission
  ? WorkshopContext
  : P extends 'account.own' | 'workshop.make' | 'invitation.accept'
    ? AccountContext
    : Context;

export interface Ruled<Input, Result> {
  (context: Context, input: Input): Promise<Result>;
  readonly rule: Rule & { readonly kind: 'write' | 'read' };
  /** The rule alone, before anything of the input is looked at. @throws as the verb itself does */
  readonly check: (context: Context) => void;
}

/**
 * A write: checks the rule, then runs the handler in one transaction, which becomes its `db`.
 * @throws SignInNeeded, SecondFactorNeeded, Forbidden, or NotFound where no workshop was found
 */
export function verb<P extends Permission, Input, Result>(
  rule: Rule<P>,
  handler: (context: ContextFor<P>, input: Input) => Promise<Result>,
): Ruled<Input, Result> {
  const check = (context: Context) => {
    requireMay(context, rule.may);
  };
  async function ruled(context: Context, input: Input): Promise<Result> {
    check(context);
    if (rule.transaction === false) return handler(context as ContextFor<P>, input);
    return (context.db as NodePgDatabase).transaction((db) =>
      handler({ ...context, db } as Context as ContextFor<P>, input),
    );
  }
  return Object.assign(ruled, { rule: { ...rule, kind: 'write' as const }, check });
}

/** A read: checks the rule, then runs the handler. Never writes. */
export function read<P extends Permission, Input, Result>(
  rule: Rule<P>,
  handler: (context: ContextFor<P>, input: Input) => Promise<Result>,
): Ruled<Input, Result> {
  const check = (context: Context) => {
    requireMay(context, rule.may);
  };
  async function ruled(context: Context, input: Input): Promise<Result> {
    check(context);
    return handler(context as ContextFor<P>, input);
  }
  return Object.assign(ruled, { rule: { ...rule, kind: 'read' as const }, check });
}

function requireMay(context: Context, permission: Permission): void {
  if (isWorkshopPermission(permission)) requireInWorkshop(context, permission);
  else requireOutside(context, permission);
}

function requireInWorkshop(context: Context, permission: WorkshopPermission): void {
  if (context.workshop === null) throw new NotFound('This workshop');
  const { actor, role } = context;
  if (!may(role, permission)) {
    if (actor.kind === 'anyone') throw new SignInNeeded();
    // To someone outside the team its bench does not exist.
    if (role === 'viewer') throw new NotFound();
    throw new Forbidden();
  }
  if (permission === 'money.see' && role === 'editor' && !context.workshop.editorsMaySeeOrders) {
    throw new Forbidden('The owner keeps orders and money to themselves in this workshop.');
  }
  if (role === 'owner' && !may('viewer', permission) && actor.kind === 'account' && !actor.secondFactor) {
    throw new SecondFactorNeeded();
  }
}

function requireOutside(context: Context, permission: AccountPermission): void {
  const standing = context.actor.kind === 'account' ? 'viewer' : 'anyone';
  if (!may(standing, permission)) throw new SignInNeeded();
}
