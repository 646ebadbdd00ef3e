import { writeFile } from 'node:fs/promises';
import { type Page } from '@playwright/test';
import { paths } from '../../../src/paths.ts';
import { makeMedia } from '../media-samples.ts';
import { expect } from './test.ts';

/** Makes a build that everyone can see, called `press` in addresses, with its two parts from a list of another shop's columns. */
export async function makeBuildFromList(page: Page, workshop: string): Promise<void> {
  await page.goto(paths.newBuild(workshop));
  await page.getByLabel('Name', { exact: true }).fill('Orchard press');
  await page.getByLabel('Address name').fill('press');
  await page.getByRole('button', { name: 'Make the build' }).click();
  await expect(page).toHaveURL(new RegExp(`/bench/${workshop}/press/`));
  await page.goto(paths.importParts(workshop, 'press'));
  const list = 'Mark;Called;Off\n117;drum shaft;1\n118;bearing housing;2\n';
  await page
    .getByLabel('A file')
    .setInputFiles({ name: 'parts.csv', mimeType: 'text/csv', buffer: Buffer.from(list) });
  await page.getByRole('button', { name: 'Read the list' }).click();
  await page.getByLabel('names the columns').check();
  await page.getByLabel('Number', { exact: true }).selectOption('0');
  await page.getByLabel('Name', { exact: true }).selectOption('1');
  await page.getByLabel('Needed').selectOption('2');
  await page.getByRole('button', { name: 'Look it over' }).click();
  await page.getByRole('button', { name: 'Take 2 parts in' }).click();
  await expect(page.getByText('2 added, 0 updated.')).toBeVisible();
  await page.goto(paths.buildSettings(workshop, 'press'));
  await page.getByLabel('Everyone').check();
  await page.getByRole('button', { name: 'Save this build' }).click();
  await expect(page.getByText('On show at')).toBeVisible();
}

/** Sixteen seconds whose every frame says its own number. @param pattern the source of ffmpeg that draws them */
export async function cutVideo(path: string, pattern: string): Promise<string> {
  const picture = ['-f', 'lavfi', '-i', `${pattern}=size=320x180:rate=25:duration=16`];
  const coding = ['-c:v', 'libx264', '-preset', 'ultrafast', '-g', '25', '-pix_fmt', 'yuv420p'];
  await writeFile(path, await makeMedia('cut.mp4', ...picture, ...coding));
  return path;
}

/** Writes a note on the desk at a time, as a maker does: the time typed, the kind by its key, the part by its number. */
export async function writeNote(desk: Page, time: string, words: string, part: string): Promise<void> {
  const composer = desk.getByRole('region', { name: 'New note' });
  await desk.getByLabel('Go to a time, such as 3:41').fill(time);
  await desk.keyboard.press('Enter');
  await desk.keyboard.press('Escape');
  await desk.keyboard.press('1');
  await expect(composer.getByLabel('Words')).toBeFocused();
  await desk.keyboard.type(words);
  await composer.getByRole('combobox', { name: 'Parts' }).fill(part);
  await desk.keyboard.press('Enter');
  await composer.getByRole('button', { name: 'Save the note' }).click();
  await expect(desk.getByRole('region', { name: 'Notes' }).getByText(words)).toBeVisible();
}
