import { newId } from '../../src/db/columns.ts';
import { anchors, notes } from '../../src/db/schema/notes.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { paths } from '../../src/paths.ts';
import { aShownBuild, BUILD } from '../support/companion.ts';
import { expect, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';

const NOTES = 500;
const LENGTH = { text: '2:00:00', seconds: 7200 };

test('the desk of a two-hour episode with 500 notes takes every key that is pressed', async ({
  page,
  product,
  signIn,
}) => {
  const owner = await product.owner('Wren Hallam', 'Marram Lane');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await aShownBuild(context);
  const { id: buildId } = await getBuild(context, { build: BUILD });
  const { id: episode } = await makeEpisode(context, { build: BUILD, title: 'The long day' });
  const video = { fileId: null, address: 'https://video.example/1', length: LENGTH.text };
  await setVideo(context, { build: BUILD, episode, ...video });
  const tenant = { workshopId: context.workshop.id, buildId };
  const made = Array.from({ length: NOTES }, (_none, index) => ({
    ...tenant,
    id: newId(),
    clock: 'episode' as const,
    episodeId: episode,
    frame: Math.floor((index * LENGTH.seconds * 25) / NOTES),
    rateNum: 25,
    rateDen: 1,
  }));
  await context.db.insert(anchors).values(made);
  const note = { ...tenant, kind: 'step' as const, text: 'Face the shaft to 412 mm.' };
  await context.db.insert(notes).values(made.map(({ id }) => ({ ...note, id: newId(), anchorId: id })));

  await signIn(owner);
  await page.goto(paths.desk(owner.workshop, BUILD, episode));
  await expect(page.getByText(`${String(NOTES)} on this episode`)).toBeVisible();
  await page.keyboard.press('n');
  const words = 'The drill goes through the housing and back, at 412 mm.';
  // No pause between keys: whoever types faster than the page draws loses nothing.
  await page.keyboard.type(words);
  await expect(page.locator(':focus')).toHaveValue(words);
  await page.keyboard.press('Control+Enter');
  await expect(page.getByText(`${String(NOTES + 1)} on this episode`)).toBeVisible();
  await expect(page.getByText('Everything is saved.')).toBeVisible();
});
