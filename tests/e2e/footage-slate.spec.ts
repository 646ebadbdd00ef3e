import { writeFile } from 'node:fs/promises';
import { eq } from 'drizzle-orm';
import sharp from 'sharp';
import { clips, slates } from '../../src/db/schema/footage.ts';
import { writeSlateCode } from '../../src/domain/footage/slate-code.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { paths } from '../../src/paths.ts';
import { aKeptVideo, aShownBuild, BUILD } from '../support/companion.ts';
import { expect, test } from '../support/e2e/test.ts';
import { makeMedia } from '../support/media-samples.ts';
import { inWorkshop } from '../support/people.ts';
import { aClip } from '../support/placed.ts';
import { drawCode } from '../support/slate-picture.ts';

const SECONDS = 4;
/** The frames of the film that show the slate, at 25 a second. */
const SHOWN = { from: 30, until: 80 };
const AT = new Date('2026-11-02T14:22:07.400Z');

test('a clock slate is found by its code, in a film that stays at home and in one that is kept', async ({
  page,
  product,
  signIn,
}, testInfo) => {
  const owner = await product.owner('Orla Fenwick', 'Sluice Yard');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await aShownBuild(context);
  const build = await getBuild(context, { build: BUILD });
  const { width, height, data } = drawCode(writeSlateCode(AT.getTime()));
  const picture = testInfo.outputPath('slate.png');
  await sharp(data, { raw: { width, height, channels: 4 } }).toFile(picture);
  const bytes = await makeMedia(
    'C0043.mp4',
    ...['-f', 'lavfi', '-i', `testsrc2=size=640x360:rate=25:duration=${String(SECONDS)}`, '-i', picture],
    ...['-filter_complex', `overlay=enable='between(n,${String(SHOWN.from)},${String(SHOWN.until - 1)})'`],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', '-movflags', '+faststart'],
  );
  const film = testInfo.outputPath('C0043.mp4');
  await writeFile(film, bytes);
  const frames = SECONDS * 25;
  const atHome = await aClip(context, build.id, 'C0043.MP4', { frames });
  const kept = await aClip(context, build.id, 'C0044.MP4', { frames });
  const fileId = await aKeptVideo(context, build.id, { seconds: SECONDS, bytes });
  await context.db.update(clips).set({ fileId }).where(eq(clips.id, kept));
  await signIn(owner);
  const sent: string[] = [];
  page.on('request', (request) => {
    if (request.method() !== 'GET') sent.push(request.postData() ?? '');
  });

  await page.goto(paths.clip(owner.workshop, BUILD, atHome));
  await page.getByLabel('Choose C0043.MP4 to find its slates').setInputFiles(film);
  await expect(page.getByText('Found by its code, and kept.')).toBeVisible();
  await page.getByRole('button', { name: 'Show the clip’s new time' }).click();
  await expect(page.getByText('found by its code')).toBeVisible();
  await expect(page.getByText(/^2026-11-02 14:22:0[4-6]$/)).toBeVisible();
  expect(sent.length).toBe(1);
  expect(sent[0]?.length).toBeLessThan(200);

  await page.goto(paths.clip(owner.workshop, BUILD, kept));
  await page.getByRole('button', { name: 'Find the slates in this film' }).click();
  await expect(page.getByText('Found by its code, and kept.')).toBeVisible();

  for (const clip of [atHome, kept]) {
    const read = await context.db.select().from(slates).where(eq(slates.clipId, clip));
    expect(read).toMatchObject([{ shopAt: AT, readBy: 'code' }]);
    // The code stands still in these; a slow browser may show one picture late, and read the next.
    expect(read[0]?.frame).toBeGreaterThanOrEqual(SHOWN.from);
    expect(read[0]?.frame).toBeLessThan(SHOWN.until);
  }
});
