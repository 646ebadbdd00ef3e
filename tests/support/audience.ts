import { newId } from '../../src/db/columns.ts';
import { subscribers } from '../../src/db/schema/audience.ts';
import { LEAVE_PURPOSE, CONFIRM_PURPOSE } from '../../src/features/audience/audience.ts';
import { getAnnouncement } from '../../src/features/audience/server/get-announcement.ts';
import { sendAnnouncement } from '../../src/features/audience/server/send-announcement.ts';
import { changeBuild } from '../../src/features/builds/server/change-build.ts';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { getDesk } from '../../src/features/episodes/server/get-desk.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../src/features/episodes/server/publish-edition.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { signToken } from '../../src/server/auth/signed-token.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { type Services } from '../../src/server/services.ts';

/** What names an episode on the bench, with the ids that tests look rows up by. */
export interface AnnouncedEpisode {
  readonly build: string;
  readonly episode: string;
  readonly buildId: string;
}

let counter = 0;

/**
 * A public build with a published episode whose video is elsewhere.
 * @param publishedOn as 2026-11-12; today when left out
 */
export async function publishedEpisode(
  owner: WorkshopContext,
  publishedOn?: string,
): Promise<AnnouncedEpisode> {
  counter += 1;
  const plan = {
    name: `Press ${String(counter)}`,
    slug: `press-${String(counter)}`,
    about: '',
    plannedEpisodes: 6,
  };
  await makeBuild(owner, plan);
  await changeBuild(owner, { ...plan, build: plan.slug, currency: 'GBP', visibility: 'public', version: 1 });
  const { id: episode } = await makeEpisode(owner, { build: plan.slug, title: 'The drum shaft' });
  const ref = { build: plan.slug, episode };
  await setVideo(owner, { ...ref, fileId: null, address: 'https://video.example/press', length: '10:00' });
  const desk = await getDesk(owner, ref);
  await publishEdition(owner, { ...ref, version: desk.episode.version, publishedOn });
  return { ...ref, buildId: desk.build.id };
}

/** Puts confirmed subscribers straight into the database: `name-1@example.com` and on. @returns their ids */
export async function addSubscribers(
  services: Services,
  of: { readonly workshopId: string; readonly buildId?: string | null },
  name: string,
  count: number,
): Promise<string[]> {
  const now = new Date();
  const rows = Array.from({ length: count }, (_, index) => ({
    id: newId(),
    workshopId: of.workshopId,
    buildId: of.buildId ?? null,
    email: `${name}-${String(index + 1)}@example.com`,
    state: 'confirmed' as const,
    askedAt: now,
    confirmedAt: now,
  }));
  await services.db.insert(subscribers).values(rows);
  return rows.map(({ id }) => id);
}

/** Sends the announcement of an episode, every question answered. */
export async function announce(owner: WorkshopContext, { build, episode }: AnnouncedEpisode) {
  const { version, mail } = await getAnnouncement(owner, { build, episode });
  return sendAnnouncement(owner, { build, episode, version, seen: mail.seen, watchable: true, late: true });
}

/** The tokens of someone's mailed links. */
export function tokensOf(services: Services, subscriber: string) {
  const { AUTH_SECRET } = services.settings;
  return {
    confirm: signToken(AUTH_SECRET, CONFIRM_PURPOSE, subscriber),
    leave: signToken(AUTH_SECRET, LEAVE_PURPOSE, subscriber),
  };
}

/** What a list of mails comes to when each address should have had one. */
export interface Tally {
  readonly addresses: number;
  /** Mails beyond the first to an address. */
  readonly doubled: number;
  /** Of those, the ones under another Message-ID than the first: there must be none. */
  readonly strange: number;
}

/** Counts mails by address. */
export function tally(
  mails: readonly { readonly to: readonly string[]; readonly messageId: string | undefined }[],
): Tally {
  const byAddress = new Map<string, (string | undefined)[]>();
  for (const { to, messageId } of mails) {
    for (const address of to) byAddress.set(address, [...(byAddress.get(address) ?? []), messageId]);
  }
  const extra = [...byAddress.values()].map((ids) => ({ more: ids.length - 1, kinds: new Set(ids).size }));
  return {
    addresses: byAddress.size,
    doubled: extra.reduce((sum, { more }) => sum + more, 0),
    strange: extra.filter(({ kinds }) => kinds > 1).length,
  };
}
