import { memberships, workshops, workshopSlugs } from '../../../src/db/schema/workshops.ts';
import { type Database } from '../../../src/db/client.ts';
import { AppError } from '../../../src/server/errors.ts';
import { type Services } from '../../../src/server/services.ts';

/** Thrown where a handler first touches anything: its rule has let it through, and nothing has happened. */
export class Reached extends AppError {
  readonly code = 'reached';
  readonly status = 418;
}

function trip(): never {
  throw new Reached('The handler was reached.');
}

/** Something of which only what is given can be used. */
function only<T extends object>(given: Partial<T>): T {
  return new Proxy(given, { get: (target, key) => Reflect.get(target, key) ?? trip() }) as T;
}

/** Services of which nothing can be used: for a verb that is given its context whole. */
export const NOTHING = only<Services>({ db: only<Services['db']>({}) });

/** What finding out where someone stands reads. */
const STANDING_TABLES: readonly unknown[] = [workshopSlugs, workshops, memberships];

/**
 * Services with which a request gets as far as its rule, and a handler nowhere.
 * @param real what is to work all the same
 */
export function tripwireServices(services: Services, real: Partial<Services> = {}): Services {
  const select = (...fields: unknown[]) => {
    const builder = (services.db.select as (...all: unknown[]) => object)(...fields);
    return new Proxy(builder, {
      get: (target, key) => (key === 'from' ? fromStandingTables(target) : trip()),
    });
  };
  return only<Services>({
    settings: services.settings,
    log: services.log,
    limiter: { count: () => Promise.resolve() },
    auth: only<Services['auth']>({
      api: only<Services['auth']['api']>({ getSession: services.auth.api.getSession }),
    }),
    db: only<Database>({ select: select as unknown as Database['select'] }) as Services['db'],
    ...real,
  });
}

function fromStandingTables(builder: object) {
  return (table: unknown) =>
    STANDING_TABLES.includes(table) ? (builder as { from: (table: unknown) => unknown }).from(table) : trip();
}
