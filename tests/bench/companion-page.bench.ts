import { brotliCompressSync, constants, gzipSync } from 'node:zlib';
import { sql } from 'drizzle-orm';
import { pino } from 'pino';
import { findFreePort } from '../../scripts/ports.ts';
import { accountMails } from '../../src/process-mails.ts';
import { newId } from '../../src/db/columns.ts';
import { paths } from '../../src/paths.ts';
import { readServiceSettings } from '../../src/server/env.ts';
import { announcePageChanges } from '../../src/server/http/page-changes.ts';
import { openServices, type Services } from '../../src/server/services.ts';
import { aShownBuild, aShownEpisode, BUILD } from '../support/companion.ts';
import { aWorkshop } from '../support/people.ts';
import { startProduct } from '../support/started-product.ts';
import { throwawayFolder } from '../support/throwaway.ts';
import { type Bench, formatTable, median } from './support/bench.ts';
import { besideNginx } from './support/beside-nginx.ts';

const NOTES = 1000;
const RENDERS = 7;
/** The most that an episode with a thousand notes may cost a reader, gzip, and the server, once a change. */
const MOST_BYTES = 150 * 1024;
const MOST_MS = 1500;

/** Puts many notes on an episode of an hour; straight into the database, because only reading them is measured. */
async function addNotes({ db }: Services, episode: string): Promise<void> {
  const ids = JSON.stringify(Array.from({ length: NOTES }, () => [newId(), newId()]));
  await db.execute(sql`
    with given as (
      select (pair->>0)::uuid as note_id, (pair->>1)::uuid as anchor_id, at
      from jsonb_array_elements(${ids}::jsonb) with ordinality as rows(pair, at)
    ), placed as (
      insert into anchors (id, workshop_id, build_id, clock, episode_id, frame, rate_num, rate_den)
      select anchor_id, workshop_id, build_id, 'episode', episodes.id, at * 3500, 1000, 1
      from given, episodes where episodes.id = ${episode}
    )
    insert into notes (id, workshop_id, build_id, anchor_id, kind, text, audience)
    select note_id, workshop_id, build_id, anchor_id, 'size',
      'Face number ' || at || ' to ' || (at * 7919 % 1009 + 1) || '.25 mm, square to the last one.', 'viewers'
    from given, episodes where episodes.id = ${episode}`);
}

async function time(url: string): Promise<{ ms: number; html: string }> {
  const startedAt = performance.now();
  const html = await (await fetch(url)).text();
  return { ms: performance.now() - startedAt, html };
}

async function measureRenders(services: Services, origin: string, notes: number) {
  const workshop = await aWorkshop(services);
  const video = { address: 'https://video.example/watch/1', length: '1:00:00' };
  const episode = await aShownEpisode(workshop.owner, await aShownBuild(workshop.owner), video);
  if (notes > 0) await addNotes(services, episode);
  const url = origin + paths.episode(workshop.slug, BUILD, 1);
  const rendered: number[] = [];
  for (let round = 0; round < RENDERS; round += 1) {
    await announcePageChanges(services.db, [`episode:${episode}`]);
    await new Promise((resolve) => setTimeout(resolve, 200));
    rendered.push((await time(url)).ms);
  }
  const kept = await time(url);
  return { rendered: median(rendered), kept: kept.ms, html: kept.html };
}

/** What an episode's page costs: its bytes, a render, and being served beside nginx. */
export const bench: Bench = {
  name: 'companion-page',
  what: `the page of an episode with 4 and with ${String(NOTES)} notes: bytes, milliseconds a render, and the latter beside nginx`,
  async run(print) {
    const folder = throwawayFolder('bench');
    const port = await findFreePort();
    const product = await startProduct({
      PORT: String(port),
      DATA_DIR: folder.path,
      DEMO: '0',
      LOG_LEVEL: 'warn',
    });
    try {
      const settings = readServiceSettings(product.environment);
      const log = pino({ level: 'silent' });
      const mails = accountMails(settings.PUBLIC_URL);
      const services = await openServices({ settings, log, accountMails: mails, worker: false });
      const few = await measureRenders(services, settings.PUBLIC_URL, 0);
      const many = await measureRenders(services, settings.PUBLIC_URL, NOTES);
      await services.close();
      const quality = { params: { [constants.BROTLI_PARAM_QUALITY]: 5 } };
      const row = (name: string, { html, rendered, kept }: typeof few) => [
        ...[name, html.length, gzipSync(html).length, brotliCompressSync(html, quality).length],
        ...[rendered.toFixed(0), kept.toFixed(1)],
      ];
      const rows = [['', 'bytes', 'gzip', 'brotli', 'ms a render', 'ms kept'], row('4 notes', few)];
      for (const line of formatTable([...rows, row(`${String(NOTES)} more`, many)])) print(line);
      print('');
      const held = gzipSync(many.html).length <= MOST_BYTES && many.rendered <= MOST_MS;
      return (await besideNginx(many.html, print)) && held;
    } finally {
      await product.stop();
      folder.remove();
    }
  },
};
