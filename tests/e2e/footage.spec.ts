import { mkdir, writeFile } from 'node:fs/promises';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { makeFilm } from '../support/media-samples.ts';
import { inWorkshop } from '../support/people.ts';
import { expect, test } from '../support/e2e/test.ts';

const MiB = 2 ** 20;

/** A film of exactly so many bytes: the rest is one box that players skip. */
async function filmOf(bytes: number): Promise<Buffer> {
  const film = await makeFilm();
  const padding = Buffer.alloc(bytes - film.length, 7);
  padding.writeUInt32BE(padding.length, 0);
  padding.write('free', 4, 'latin1');
  return Buffer.concat([film, padding]);
}

/** Runs in the page: keeps the third part of an upload back for as long as the spec says. */
function holdThirdPart(): void {
  const send = window.fetch.bind(window);
  window.fetch = async (input, init) => {
    const isThird = init?.method === 'PUT' && /[?&]partNumber=3(&|$)/.test(input as string);
    while (isThird && sessionStorage.getItem('third part') !== 'may go')
      await new Promise((resolve) => setTimeout(resolve, 50));
    return send(input, init);
  };
}

test('a clip goes on after a lost connection and after a reload, and only what is missing is sent', async ({
  page,
  context,
  product,
  signIn,
  complaints,
}, testInfo) => {
  test.slow();
  const owner = await product.owner('Hedy Marlow', 'Slipway Shed');
  const editor = await product.person('Nils Aho');
  await product.join(owner, editor, 'editor');
  const { slug } = await makeBuild(await inWorkshop(product.services, owner, owner.workshop), {
    name: 'Orchard press',
    slug: 'press',
    about: '',
    plannedEpisodes: null,
  });
  await signIn(editor);

  const sent: number[] = [];
  page.on('request', (request) => {
    if (request.method() === 'PUT') sent.push(Number(new URL(request.url()).searchParams.get('partNumber')));
  });
  // In the page and not on the wire: what stands in the way there would have to carry every part.
  await page.addInitScript(holdThirdPart);
  const mayGo = (may: boolean) =>
    page.evaluate((go) => {
      sessionStorage.setItem('third part', go ? 'may go' : 'waits');
    }, may);
  page.on('dialog', (dialog) => void dialog.accept());

  const keep = async (folder: string, bytes: Buffer) => {
    await mkdir(testInfo.outputPath(folder), { recursive: true });
    const path = testInfo.outputPath(folder, 'C0043.mp4');
    await writeFile(path, bytes);
    return path;
  };
  const clip = await keep('card', await filmOf(40 * MiB));
  await page.goto(`/bench/${owner.workshop}/${slug}/footage/files`);
  await page.getByLabel('Choose files…').setInputFiles(clip);
  const row = page.getByRole('list', { name: 'On their way' }).getByRole('listitem');
  await expect(row.getByText('32.0 MiB of 40.0 MiB')).toBeVisible();

  await context.setOffline(true);
  await mayGo(true);
  await expect(row.getByText('No connection. It goes on by itself when there is one.')).toBeVisible();
  await mayGo(false);
  await context.setOffline(false);
  await expect(row.getByText('No connection')).toBeHidden();
  await row.getByRole('button', { name: 'Pause sending C0043.mp4' }).click();
  await expect(row.getByText('Paused. What was sent is kept.')).toBeVisible();

  await page.reload();
  await expect(row.getByText('Choose the file again to go on')).toBeVisible();
  await mayGo(true);
  const other = await keep('elsewhere', Buffer.alloc(40 * MiB, 1));
  await row.getByLabel('Choose C0043.mp4 again').setInputFiles(other);
  await expect(row.getByText('That is another file.')).toBeVisible();
  sent.length = 0;
  await row.getByLabel('Choose C0043.mp4 again').setInputFiles(clip);
  const clips = page.getByRole('region', { name: 'Clips' });
  await expect(clips.getByRole('link', { name: 'C0043.mp4' })).toBeVisible({ timeout: 90_000 });
  expect(sent).toEqual([3]);
  const strip = clips.getByRole('img', { name: '2 pictures of C0043.mp4, at even times' });
  await expect(strip).toBeVisible();
  await expect.poll(() => strip.evaluate((image: HTMLImageElement) => image.naturalWidth)).toBe(320);
  // The browser says so of every request that a lost connection took.
  const foreseen = complaints.filter((complaint) => complaint.includes('ERR_INTERNET_DISCONNECTED'));
  for (const complaint of foreseen) complaints.splice(complaints.indexOf(complaint), 1);
});
