import { eq } from 'drizzle-orm';
import { type Page } from '@playwright/test';
import { clips } from '../../src/db/schema/footage.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { formatTimecode } from '../../src/domain/time/timecode.ts';
import { paths } from '../../src/paths.ts';
import { aKeptVideo, aShownBuild, BUILD, publish, RATE } from '../support/companion.ts';
import { afterSeek, counterOf, type Cut, makeCountedFilm, readCounter } from '../support/e2e/counted-film.ts';
import { expect, test } from '../support/e2e/test.ts';
import { takeList } from '../support/edits.ts';
import { makePhoto } from '../support/media-samples.ts';
import { inWorkshop } from '../support/people.ts';
import { aClip, noteMade } from '../support/placed.ts';

/** The clips; the labels of the first begin at one hour. */
const CLIPS = [
  { clip: 1, name: 'C0043', label: 90_000 },
  { clip: 2, name: 'C0044', label: 0 },
  { clip: 3, name: 'C0050', label: 0 },
];

const FIRST: readonly Cut[] = [
  { clip: 1, in: 500, out: 700 },
  { clip: 2, in: 250, out: 400 },
  { clip: 1, in: 1000, out: 1150 },
  { clip: 3, in: 125, out: 225 },
];
/** Another order; of C0043 a second less, and its second stretch is gone. */
const SECOND: readonly Cut[] = [
  { clip: 2, in: 300, out: 400 },
  { clip: 1, in: 500, out: 650 },
  { clip: 3, in: 100, out: 225 },
];

/** The edit list that a film was rendered by. */
function listOf(cuts: readonly Cut[]): string {
  let at = 0;
  const lines = cuts.map(({ clip, in: start, out }, index) => {
    const { name, label } = CLIPS.find((one) => one.clip === clip)!;
    const record = [at, at + out - start];
    at += out - start;
    const times = [label + start, label + out, ...record].map((frame) => formatTimecode(frame, RATE));
    return `${String(index + 1).padStart(3, '0')}  ${name}  V  C  ${times.join(' ')}`;
  });
  return ['TITLE: Press 1', ...lines].join('\n');
}

/** Each note, and the frame of its clip that the two films show at its place; null where it is in neither. */
const NOTES = [
  { text: 'Face it.', clip: 1, frame: 512, first: 512, second: 512 },
  // The second film ends this stretch 40 frames earlier: it is moved to the last frame that is in.
  { text: 'Chamfer it.', clip: 1, frame: 690, first: 690, second: 649 },
  { text: 'Measure it.', clip: 1, frame: 1075, first: 1075, second: null },
  { text: 'Drill it.', clip: 2, frame: 333, first: 333, second: 333 },
  { text: 'The last frame.', clip: 2, frame: 399, first: 399, second: 399 },
  { text: 'The first frame.', clip: 3, frame: 125, first: 125, second: 125 },
];

async function readNotes(page: Page): Promise<Map<string, number>> {
  const video = page.locator('video');
  await video.evaluate(async (player: HTMLVideoElement) => {
    if (player.readyState < 2) await new Promise((resolve) => (player.onloadeddata = resolve));
  });
  const read = new Map<string, number>();
  for (const { text } of NOTES) {
    const row = page.locator('[data-note]', { hasText: text });
    if ((await row.count()) === 0) continue;
    await afterSeek(video, () => row.locator('a[data-at]').first().click());
    read.set(text, await readCounter(video));
  }
  return read;
}

const shownBy = (film: 'first' | 'second') =>
  new Map(
    NOTES.flatMap(({ text, clip, [film]: frame }): [string, number][] =>
      frame === null ? [] : [[text, counterOf(clip, frame)]],
    ),
  );

test('a note made on a clip stands at its frame of the finished episode, and follows a new edit once it is published', async ({
  page,
  product,
  signIn,
  openBrowser,
  request,
}) => {
  test.slow();
  const owner = await product.owner('Wren Hallam', 'Marram Lane');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await aShownBuild(context);
  const build = await getBuild(context, { build: BUILD });
  const ids = new Map<number, string>();
  for (const { clip, name, label } of CLIPS) {
    const id = await aClip(context, build.id, `${name}.MP4`);
    await context.db.update(clips).set({ startLabel: label }).where(eq(clips.id, id));
    ids.set(clip, id);
  }
  for (const { text, clip, frame } of NOTES)
    await noteMade(context, build.id, text, { clipId: ids.get(clip)!, frame });

  const { id: episode } = await makeEpisode(context, { build: BUILD, title: 'The drum shaft' });
  const poster = await makePhoto('jpeg', 320, 180);
  const cutBy = async (cuts: readonly Cut[]) => {
    const seconds = cuts.reduce((sum, cut) => sum + cut.out - cut.in, 0) / 25;
    const bytes = await makeCountedFilm(cuts);
    const fileId = await aKeptVideo(context, build.id, { seconds, bytes, poster });
    await setVideo(context, { build: BUILD, episode, fileId, address: null });
    await takeList(context, episode, listOf(cuts));
  };
  await cutBy(FIRST);
  await publish(context, episode);

  const shown = paths.episode(owner.workshop, BUILD, 1);
  const viewer = await (await openBrowser()).newPage();
  await viewer.goto(shown);
  expect(await readNotes(viewer)).toEqual(shownBy('first'));

  const before = await (await request.get(shown)).body();
  await cutBy(SECOND);
  expect((await (await request.get(shown)).body()).equals(before)).toBe(true);

  await signIn(owner);
  await page.goto(paths.desk(owner.workshop, BUILD, episode));
  const lost = page.getByRole('region', { name: 'Not in this edit' });
  await expect(lost.getByRole('listitem')).toHaveCount(1);
  await expect(lost.getByRole('listitem')).toContainText('Measure it.');
  await expect(lost.getByRole('listitem')).toContainText('C0043.MP4 from 0:40 to 0:46');
  await expect(page.getByRole('listitem').filter({ hasText: 'Chamfer it.' })).toContainText(
    'moved to the nearest',
  );

  await publish(context, episode);
  await viewer.goto(shown);
  expect(await readNotes(viewer)).toEqual(shownBy('second'));
  await expect(viewer.getByText('Measure it.')).toHaveCount(0);

  // Placed by hand it is there again, for viewers too, and put back it is not.
  await page.reload();
  await page.getByRole('button', { name: 'Place at the moment on screen: Measure it.' }).click();
  await expect(lost.getByText('Placed: Measure it.')).toBeVisible();
  await viewer.reload();
  await expect(viewer.locator('[data-note]', { hasText: 'Measure it.' })).toBeVisible();
  await lost.getByRole('button', { name: 'Put it back' }).click();
  await expect(lost.getByRole('listitem')).toContainText('Measure it.');
});
