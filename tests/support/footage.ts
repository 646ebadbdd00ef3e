import { newId } from '../../src/db/columns.ts';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { addCamera } from '../../src/features/footage/server/add-camera.ts';
import { addClips } from '../../src/features/footage/server/add-clips.ts';
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
