import { newId } from '../db/columns.ts';
import { addStage } from '../features/builds/server/add-stage.ts';
import { changeBuild } from '../features/builds/server/change-build.ts';
import { getBuild } from '../features/builds/server/get-build.ts';
import { makeBuild } from '../features/builds/server/make-build.ts';
import { addChapter } from '../features/episodes/server/add-chapter.ts';
import { getDesk } from '../features/episodes/server/get-desk.ts';
import { makeEpisode } from '../features/episodes/server/make-episode.ts';
import { publishEdition } from '../features/episodes/server/publish-edition.ts';
import { setVideo } from '../features/episodes/server/set-video.ts';
import { addNote } from '../features/notes/server/add-note.ts';
import { addPart } from '../features/parts/server/add-part.ts';
import { type Context } from '../server/context.ts';
import { type DemoEpisode, type DemoNote, PRESS_EPISODES } from './press-episodes.ts';
import { NOT_IN_PLANS, PRESS_PARTS, PRESS_STAGES } from './press-parts.ts';

const BUILD = 'orchard-press';
/** Moments of a video elsewhere are counted in thousandths. */
const RATE = { num: 1000, den: 1 };

/** Builds the demo's press by the verbs that people use: parts, stages, and the episodes that are out. */
export async function seedPress(owner: Context): Promise<void> {
  await makeBuild(owner, {
    name: 'Orchard press and apple mill',
    slug: BUILD,
    about: 'A frame press with a hydraulic cylinder, and a powered drum mill to feed it.',
    plannedEpisodes: 6,
  });
  for (const [name, about] of PRESS_STAGES) await addStage(owner, { build: BUILD, name, about });
  const partIds = new Map<string, string>();
  for (const [number, name, kind, quantity, material, size, aliases] of PRESS_PARTS) {
    const { id } = await addPart(owner, {
      build: BUILD,
      number,
      name,
      kind,
      quantity,
      material,
      size,
      aliases: aliases === undefined ? [] : [aliases],
      inPlans: !NOT_IN_PLANS.includes(number),
      remark: '',
    });
    partIds.set(number, id);
  }
  for (const episode of PRESS_EPISODES) await seedEpisode(owner, episode, partIds);
  const { currency, version, name, about, plannedEpisodes } = await getBuild(owner, { build: BUILD });
  await changeBuild(owner, {
    build: BUILD,
    name,
    slug: BUILD,
    about,
    plannedEpisodes,
    currency,
    version,
    visibility: 'public',
  });
}

async function seedEpisode(
  owner: Context,
  { number, title, address, length, publishedOn, chapters, notes }: DemoEpisode,
  partIds: ReadonlyMap<string, string>,
): Promise<void> {
  const { id: episode } = await makeEpisode(owner, { build: BUILD, number, title });
  const ref = { build: BUILD, episode };
  await setVideo(owner, { ...ref, fileId: null, address, length });
  for (const [at, chapter] of chapters) {
    await addChapter(owner, { ...ref, id: newId(), title: chapter, position: positionAt(at) });
  }
  for (const note of notes) await seedNote(owner, ref, note, partIds);
  const { episode: draft } = await getDesk(owner, ref);
  await publishEdition(owner, { ...ref, version: draft.version, publishedOn });
}

async function seedNote(
  owner: Context,
  ref: { readonly build: string; readonly episode: string },
  note: DemoNote,
  partIds: ReadonlyMap<string, string>,
): Promise<void> {
  await addNote(owner, {
    ...ref,
    id: newId(),
    kind: note.kind,
    text: note.text,
    audience: 'viewers',
    askedId: null,
    standing: note.standing ?? null,
    topic: note.topic ?? null,
    partIds: note.parts.map((number) => {
      const id = partIds.get(number);
      if (id === undefined) throw new Error(`The demo has no part ${number}.`);
      return id;
    }),
    position: positionAt(note.at),
  });
}

function positionAt(seconds: number) {
  return { frame: seconds * RATE.num, endFrame: null, rate: RATE };
}
