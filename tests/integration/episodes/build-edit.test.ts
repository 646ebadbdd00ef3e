import { beforeAll, describe, expect, it } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { buildEdit } from '../../../src/features/episodes/server/build-edit.ts';
import { getEdits } from '../../../src/features/episodes/server/get-edits.ts';
import { listHandClips } from '../../../src/features/episodes/server/list-hand-clips.ts';
import { POST as byHandRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/edits/by-hand.ts';
import { Forbidden, NotFound } from '../../../src/server/errors.ts';
import { callRoute } from '../../support/call-route.ts';
import { aShownBuild, BUILD } from '../../support/companion.ts';
import { anUncutEpisode } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;
const [first, second] = [newId(), newId()];

beforeAll(async () => {
  workshop = await aWorkshop(services);
  await aShownBuild(workshop.owner);
  const { id: buildId } = await getBuild(workshop.owner, { build: BUILD });
  const clip = { workshopId: workshop.id, buildId, rateNum: 25, rateDen: 1, frames: 1000 };
  await services.db.insert(clips).values([
    { ...clip, id: first, name: 'C0043.MP4', startLabel: 775 },
    { ...clip, id: second, name: 'C0044.MP4' },
  ]);
});

const SEGMENTS = 'C0043.MP4,00:00:31:00,00:00:41:00\nC0044.MP4,0,5';

describe('Building an edit by hand', () => {
  it('keeps it as the next version, each name on its clip', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await buildEdit(workshop.editor, { build: BUILD, episode, segments: SEGMENTS, rate: '' });
    const { shown } = await getEdits(workshop.owner, { build: BUILD, episode });
    expect(shown).toMatchObject({ number: 1, source: 'hand', edit: { rate: { num: 25, den: 1 } } });
    expect(Object.fromEntries(shown?.clipIds ?? [])).toEqual({ 'C0043.MP4': first, 'C0044.MP4': second });
    expect(shown?.edit.frames.valueOf()).toBe(375);
    const { items } = await listHandClips(workshop.editor, { build: BUILD, episode });
    expect(items.map(({ label }) => label)).toEqual(['C0043.MP4', 'C0044.MP4']);
  });

  it('shows the form again with the line that is wrong, and what was typed', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const form = { segments: `${SEGMENTS}\nC0099.MP4,0,1`, rate: '25' };
    const answer = await callRoute(services, byHandRoute, { params, form, actor: workshop.people.editor });
    expect(answer.page?.form).toMatchObject({
      values: form,
      errors: { segments: 'Line 3: There is no clip “C0099.MP4” in the footage.' },
    });
  });

  it('refuses a moderator, and does not find another workshop’s episode', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const input = { build: BUILD, episode, segments: SEGMENTS, rate: '' };
    await expect(buildEdit(workshop.moderator, input)).rejects.toThrow(Forbidden);
    await expect(buildEdit(workshop.outsider, input)).rejects.toThrow(NotFound);
  });
});
