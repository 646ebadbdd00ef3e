import { newId } from '../../src/db/columns.ts';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { addCamera } from '../../src/features/footage/server/add-camera.ts';
import { addClips } from '../../src/features/footage/server/add-clips.ts';
import { addSlate } from '../../src/features/footage/server/add-slate.ts';
import { addStretch } from '../../src/features/footage/server/add-stretch.ts';
import { AddClipsInput } from '../../src/features/footage/footage.ts';
import { type WorkshopContext } from '../../src/server/context.ts';

/** A build of its own, to put footage into. */
export async function aBuildToFilm(owner: WorkshopContext): Promise<{ build: string; buildId: string }> {
  const slug = `press-${newId().slice(-12)}`;
  const { id } = await makeBuild(owner, { name: 'Press', slug, about: '', plannedEpisodes: null });
  return { build: slug, buildId: id };
}

/** A camera that gives UTC and the clip's start. */
export async function aCamera(owner: WorkshopContext, build: string, given: object = {}): Promise<string> {
  const usual = { creationMeans: 'start', localAsUtc: false, timeZone: null } as const;
  return (await addCamera(owner, { build, name: `camera ${newId().slice(-6)}`, ...usual, ...given })).id;
}

/** A minute of footage at 25 frames a second, as a browser names it. */
export async function aClip(owner: WorkshopContext, build: string, given: object = {}): Promise<string> {
  const usual = {
    name: 'C0001.MP4',
    frames: 1500,
    rate: { num: 25, den: 1 },
    createdWall: '2026-11-02T14:22:07',
    createdOffset: 0,
  };
  const { clips } = AddClipsInput.parse({ clips: [{ ...usual, ...given }] });
  const { ids } = await addClips(owner, { build, clips });
  return ids[0] ?? '';
}

/** A day with two cameras, a time-lapse, a slate, a gap and an hour with the camera off. @returns a clip of it */
export async function filmADay(owner: WorkshopContext, build: string): Promise<string> {
  const clip = await aClip(owner, build, { camera: 'Big camera', frames: 45_000 });
  await aClip(owner, build, {
    camera: 'Small camera',
    name: 'TL_0012.MP4',
    createdWall: '2026-11-02T15:01:00',
    frames: 15_000,
  });
  await aClip(owner, build, { camera: 'Big camera', name: 'C0002.MP4', createdWall: '2026-11-02T16:10:00' });
  await aClip(owner, build, { camera: 'Big camera', name: 'C0003.MP4', createdWall: '1904-01-01T00:00:00' });
  const shopMs = Date.UTC(2026, 10, 2, 14, 22, 21, 400);
  await addSlate(owner, { build, clip, frame: 50, moment: '', shows: '', shopMs, readBy: 'hand' });
  await addStretch(owner, {
    build,
    day: '2026-11-02',
    from: '15:20',
    until: '16:00',
    stage: null,
    text: 'Filing the keyway.',
  });
  return clip;
}
