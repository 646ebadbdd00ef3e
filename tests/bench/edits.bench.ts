import { pino } from 'pino';
import { startCluster } from '../../scripts/cluster.ts';
import { openDataDir } from '../../scripts/data-dir.ts';
import { newId } from '../../src/db/columns.ts';
import { anchors, notes } from '../../src/db/schema/notes.ts';
import { migrateDatabase } from '../../src/db/migrate.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { lookAtDesk } from '../../src/features/episodes/server/look-at-desk.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { reportEdit } from '../../src/features/episodes/server/report-edit.ts';
import { placeEdit } from '../../src/features/notes/server/place-edit.ts';
import { accountMails } from '../../src/process-mails.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { readServiceSettings } from '../../src/server/env.ts';
import { openServices, type Services } from '../../src/server/services.ts';
import { aShownBuild, BUILD, noteAt } from '../support/companion.ts';
import { aWorkshop } from '../support/people.ts';
import { aClip, editOf, takeEdit } from '../support/placed.ts';
import { throwawayFolder } from '../support/throwaway.ts';
import { type Bench, formatTable } from './support/bench.ts';
import { CLIP_FRAMES, CLIPS, cutList, RATE, SIZES } from './support/cut-list.ts';

// Announces on stderr that it will want a newer Node one day.
process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';

/** "A few seconds" for the largest to be placed again and stored, and the most that twice the size may take of once. */
const MOST_MS = 4000;
const MOST_GROWTH = 3;

const AT_ONCE = 1000;

async function makeNotes({ db, workshop }: WorkshopContext, buildId: string, count: number, ids: string[]) {
  await db.delete(notes);
  await db.delete(anchors);
  const tenant = { workshopId: workshop.id, buildId };
  const rows = Array.from({ length: count }, (_none, index) => ({
    ...tenant,
    id: newId(),
    clock: 'clip' as const,
    clipId: ids[index % CLIPS] ?? '',
    frame: (index * 104_729) % CLIP_FRAMES,
    rateNum: RATE.num,
    rateDen: RATE.den,
  }));
  for (let from = 0; from < count; from += AT_ONCE) {
    const some = rows.slice(from, from + AT_ONCE);
    await db.insert(anchors).values(some);
    await db.insert(notes).values(
      some.map(({ id }) => ({
        ...tenant,
        id: newId(),
        anchorId: id,
        kind: 'step' as const,
        text: 'Face it.',
      })),
    );
  }
}

async function timed(work: () => Promise<unknown>): Promise<number> {
  const startedAt = performance.now();
  await work();
  return performance.now() - startedAt;
}

async function measure(
  services: Services,
  owner: WorkshopContext,
  buildId: string,
  [segments, count]: (typeof SIZES)[number],
  ids: string[],
) {
  const clipIds = Object.fromEntries(ids.map((id, index) => [`C${String(index)}`, id]));
  const { id: episode } = await makeEpisode(owner, { build: BUILD, title: 'The longest' });
  await makeNotes(owner, buildId, count, ids);
  const list = cutList(segments);
  const edit = await takeEdit(owner, episode, editOf(...list), clipIds);
  const place = await timed(() => services.db.transaction((transaction) => placeEdit(transaction, edit)));
  const next = { edit: editOf(...list.slice(segments / 20)), clipIds: new Map(Object.entries(clipIds)) };
  const report = await timed(() => reportEdit(owner.db, { id: episode, buildId }, next));
  const take = await timed(() => takeEdit(owner, episode, next.edit, clipIds));
  const desk = await timed(() => lookAtDesk(owner, { build: BUILD, episode }));
  const add = await timed(() => noteAt(owner, episode, 10, { text: 'Typed.' }));
  return { segments, notes: count, place, report, take, desk, add };
}

/** What it costs to take an edit with everything that is anchored, on a real database, and how that grows. */
export const bench: Bench = {
  name: 'edits',
  what: `an edit placed again and stored, in milliseconds, at three sizes; ${String(MOST_MS)} at most for the largest`,
  async run(print) {
    const folder = throwawayFolder('bench');
    const release = await openDataDir(folder.path);
    const cluster = await startCluster({ dataDir: folder.path, durable: false });
    try {
      await migrateDatabase(cluster.databaseUrl);
      const none = {
        S3_ENDPOINT: 'http://127.0.0.1:1',
        S3_ACCESS_KEY_ID: 'none',
        S3_SECRET_ACCESS_KEY: 'none',
      };
      const settings = readServiceSettings({
        ...none,
        PUBLIC_URL: 'http://shed.test',
        DATABASE_URL: cluster.databaseUrl,
        SMTP_URL: 'smtp://127.0.0.1:1',
        MAIL_FROM: 'Centrepop <post@centrepop.test>',
        AUTH_SECRET: 'a-secret-of-the-bench-and-nothing-else',
      });
      const mails = accountMails(settings.PUBLIC_URL);
      const services = await openServices({
        settings,
        log: pino({ level: 'silent' }),
        accountMails: mails,
        worker: false,
      });
      try {
        const { owner } = await aWorkshop(services);
        await aShownBuild(owner);
        const { id: buildId } = await getBuild(owner, { build: BUILD });
        const ids: string[] = [];
        for (let clip = 0; clip < CLIPS; clip += 1)
          ids.push(await aClip(owner, buildId, `C${String(clip)}.MP4`, { frames: CLIP_FRAMES }));
        // The first round warms up.
        await measure(services, owner, buildId, SIZES[0], ids);
        const measured: Awaited<ReturnType<typeof measure>>[] = [];
        for (const size of SIZES) measured.push(await measure(services, owner, buildId, size, ids));
        const rows = measured.map(({ segments, notes: count, ...times }) => [
          ...[segments, count],
          ...Object.values(times).map((time) => time.toFixed(0)),
        ]);
        const head = ['segments', 'notes', 'place again', 'report', 'take', 'desk', 'add a note'];
        for (const line of formatTable([head, ...rows])) print(line);
        const growth = measured.slice(1).map(({ place }, index) => place / (measured[index]?.place ?? place));
        print(
          `\nTwice the size takes ${growth.map((times) => times.toFixed(1)).join(' and ')} times as long.`,
        );
        const most = measured.at(-1)?.place ?? Number.POSITIVE_INFINITY;
        return most <= MOST_MS && growth.every((times) => times <= MOST_GROWTH);
      } finally {
        await services.close();
      }
    } finally {
      await cluster.stop();
      await release();
      folder.remove();
    }
  },
};
