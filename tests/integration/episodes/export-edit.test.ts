import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { anchors, notes } from '../../../src/db/schema/notes.ts';
import { readEdit } from '../../../src/domain/edit/read-edit.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { exportClipMarks } from '../../../src/features/episodes/server/export-clip-marks.ts';
import { exportEdit } from '../../../src/features/episodes/server/export-edit.ts';
import { GET as fileRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/edits/[edit]/file.ts';
import { GET as marksRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/marks.ts';
import { Invalid, NotFound } from '../../../src/server/errors.ts';
import { callRoute } from '../../support/call-route.ts';
import { aShownBuild, BUILD, chapterAt, noteAt, RATE } from '../../support/companion.ts';
import { anUncutEpisode, LIST, takeList } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;
let parts: Map<string, string>;
let buildId: string;
let cards = 40;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  parts = await aShownBuild(workshop.owner);
  buildId = (await getBuild(workshop.owner, { build: BUILD })).id;
});

/** An episode of the list with a note at 3 s and a chapter at 12 s. */
async function aMarkedEpisode(): Promise<{ episode: string; edit: string; list: string }> {
  const episode = await anUncutEpisode(workshop.owner);
  // Clips of its own: what is noted on a clip comes in every edit that uses it.
  cards += 1;
  const list = LIST.replaceAll('C00', `C${String(cards).padStart(2, '0')}`);
  const { id: edit } = await takeList(workshop.owner, episode, list);
  const partIds = [parts.get('117') ?? ''];
  await noteAt(workshop.owner, episode, 3, {
    text: 'Face it\nto 412 mm.',
    kind: 'size',
    standing: 'plan',
    partIds,
  });
  await chapterAt(workshop.owner, episode, 12, 'Housings');
  return { episode, edit, list };
}

const read = (text: string) => {
  const edit = readEdit(text, { rate: text.startsWith('{') ? null : RATE });
  if (!edit.ok) throw new Error(edit.error);
  return edit.value;
};

describe('A version as a file', () => {
  it.each(['edl', 'otio'] as const)('is the same edit when its .%s is read again', async (as) => {
    const { episode, edit, list } = await aMarkedEpisode();
    const file = await exportEdit(workshop.moderator, { build: BUILD, episode, edit, as, marks: 'own' });
    expect(file.name).toMatch(new RegExp(`^press-\\d+-v1\\.${as}$`));
    const [again, was] = [read(file.text), read(list)];
    const of = ({ picture, frames, rate }: typeof was) => ({
      rate,
      frames: frames.toString(),
      picture: picture.map(({ clip, source, record, speed }) => [
        clip,
        ...[source.in, source.out, record.in, record.out, speed].map(String),
      ]),
    });
    expect(of(again)).toEqual(of(was));
    expect(again.warnings).toEqual([]);
    expect(again.markers).toMatchObject([{ name: 'SHAFT IN', colour: 'RED' }]);
  });

  it.each(['edl', 'otio'] as const)('carries notes and chapters as marks in its .%s', async (as) => {
    const { episode, edit } = await aMarkedEpisode();
    const { text } = await exportEdit(workshop.owner, { build: BUILD, episode, edit, as, marks: 'notes' });
    expect(read(text).markers.map(({ record, name, colour }) => [record.toString(), name, colour])).toEqual([
      ['75', as === 'edl' ? 'size 117: Face it to 412 mm.' : 'size 117: Face it\nto 412 mm.', 'GREEN'],
      ['300', 'chapter: Housings', 'WHITE'],
    ]);
  });

  it('gives the marks as CSV, with the clip beneath and its own label', async () => {
    const { episode, edit } = await aMarkedEpisode();
    const { text } = await exportEdit(workshop.owner, {
      build: BUILD,
      episode,
      edit,
      as: 'csv',
      marks: 'notes',
    });
    expect(text).toMatch(/^00:00:12:00,12\.000,C\d\d44\.MP4,00:00:07:00,chapter: Housings,white\r$/m);
  });

  it('is a download for the team alone', async () => {
    const { episode, edit } = await aMarkedEpisode();
    const params = { workshop: workshop.slug, build: BUILD, episode, edit };
    const ask = (actor: 'moderator' | 'viewer' | 'outsider') =>
      callRoute(services, fileRoute, { params, actor: workshop.people[actor], query: { as: 'edl' } });
    const answer = await ask('moderator');
    expect(answer.status).toBe(200);
    expect(answer.headers.get('content-disposition')).toMatch(/^attachment; filename="press-\d+-v1\.edl"$/);
    expect(answer.headers.get('cache-control')).toBe('private, no-store');
    expect([(await ask('viewer')).status, (await ask('outsider')).status]).toEqual([404, 404]);
    const other = await anUncutEpisode(workshop.owner);
    const elsewhere = { build: BUILD, episode: other, edit, as: 'edl', marks: 'own' } as const;
    await expect(exportEdit(workshop.owner, elsewhere)).rejects.toThrow(NotFound);
  });
});

describe('The notes on clips', () => {
  it('lie on whole clips one after another, whichever clock they were made by', async () => {
    const clip = { workshopId: workshop.id, buildId, rateNum: 25, rateDen: 1, frames: 250 };
    const [first, second] = [newId(), newId()];
    const startSetAt = new Date('2026-11-24T14:00:00Z');
    await services.db.insert(clips).values([
      { ...clip, id: first, name: 'C0101.MP4', startLabel: 1000 },
      { ...clip, id: second, name: 'C0102.MP4', startSetAt },
    ]);
    const tenant = { workshopId: workshop.id, buildId };
    const [onClip, byShop] = [newId(), newId()];
    await services.db.insert(anchors).values([
      { ...tenant, id: onClip, clock: 'clip', clipId: first, frame: 50, rateNum: 25, rateDen: 1 },
      { ...tenant, id: byShop, clock: 'shop', shopAt: new Date(startSetAt.getTime() + 4000) },
    ]);
    await services.db.insert(notes).values([
      { ...tenant, anchorId: onClip, kind: 'step', text: 'The first cut.' },
      { ...tenant, anchorId: byShop, kind: 'caution', text: 'Guard off.' },
    ]);
    const { text, name } = await exportClipMarks(workshop.editor, { build: BUILD, as: 'edl', rate: '' });
    expect(name).toBe('press-clips-notes.edl');
    const { picture, markers } = read(text);
    const at = new Map(picture.map(({ clip: on, record }) => [on, record.in]));
    const marks = markers.map(({ record, name: words, colour }) => [
      record.sub(at.get(words.includes('cut') ? 'C0101.MP4' : 'C0102.MP4') ?? 0).toString(),
      words,
      colour,
    ]);
    expect(marks).toEqual(
      expect.arrayContaining([
        ['50', 'step: The first cut.', 'BLUE'],
        ['100', 'caution: Guard off.', 'RED'],
      ]),
    );
    expect(picture.find(({ clip: on }) => on === 'C0101.MP4')?.source.in.toString()).toBe('1000');
    await services.db.delete(notes).where(eq(notes.anchorId, onClip));
  });

  it('says so when there are none', async () => {
    const shed = await aWorkshop(services);
    await aShownBuild(shed.owner);
    await expect(exportClipMarks(shed.owner, { build: BUILD, as: 'otio', rate: '' })).rejects.toThrow(
      Invalid,
    );
    const outside = await callRoute(services, marksRoute, {
      params: { workshop: shed.slug, build: BUILD },
      actor: workshop.people.owner,
      query: { as: 'otio' },
    });
    expect(outside.status).toBe(404);
  });
});
