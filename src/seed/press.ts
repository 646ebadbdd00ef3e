import { newId } from '../db/columns.ts';
import { addEntry } from '../features/diary/server/add-entry.ts';
import { addCaptions } from '../features/captions/server/add-captions.ts';
import { addStage } from '../features/builds/server/add-stage.ts';
import { changeBuild } from '../features/builds/server/change-build.ts';
import { getBuild } from '../features/builds/server/get-build.ts';
import { makeBuild } from '../features/builds/server/make-build.ts';
import { addChapter } from '../features/episodes/server/add-chapter.ts';
import { changeEpisode } from '../features/episodes/server/change-episode.ts';
import { getDesk } from '../features/episodes/server/get-desk.ts';
import { makeEpisode } from '../features/episodes/server/make-episode.ts';
import { publishEdition } from '../features/episodes/server/publish-edition.ts';
import { ReadEditInput } from '../features/episodes/edit.ts';
import { takeEdit } from '../features/episodes/server/take-edit.ts';
import { setVideo } from '../features/episodes/server/set-video.ts';
import { addNote } from '../features/notes/server/add-note.ts';
import { setAppearance } from '../features/notes/server/set-appearance.ts';
import { addPart } from '../features/parts/server/add-part.ts';
import { type Context } from '../server/context.ts';
import { PRESS_DIARY } from './press-diary.ts';
import {
  type DemoEpisode,
  type DemoNote,
  type DemoVideo,
  PRESS_DRAFT,
  PRESS_EPISODES,
} from './press-episodes.ts';
import { addWorksheet } from '../features/worksheets/server/add-worksheet.ts';
import { PRESS_WORKSHEETS } from './press-worksheets.ts';
import { PRESS_EDIT } from './press-edit.ts';
import { seedFootage } from './press-footage.ts';
import { NOT_IN_PLANS, PRESS_PARTS, PRESS_STAGES } from './press-parts.ts';
import { readMedia, takeIn } from './take-in.ts';

const BUILD = 'orchard-press';
/** Moments of a video elsewhere are counted in thousandths, those of the films in their frames. */
const THOUSANDTHS = { num: 1000, den: 1 };
const FILM_FRAMES = { num: 25, den: 1 };

type Ids = ReadonlyMap<string, string>;
interface EpisodeRef {
  readonly build: string;
  readonly episode: string;
}

/**
 * Builds the demo's press by the verbs that people use: parts, stages, diary, the episodes that are out, and one
 * that the editor is drafting.
 */
export async function seedPress({ owner, editor }: { owner: Context; editor: Context }): Promise<void> {
  await makeBuild(owner, {
    name: 'Orchard press and apple mill',
    slug: BUILD,
    about: 'A frame press with a hydraulic cylinder, and a powered drum mill to feed it.',
    plannedEpisodes: 6,
  });
  const stageIds = await seedStages(owner);
  const partIds = await seedParts(owner);
  const fileIds = await seedFiles(owner);
  await seedDiary(owner, stageIds, fileIds);
  await seedWorksheets(owner, partIds);
  await seedFootage(owner, BUILD);
  for (const episode of PRESS_EPISODES) {
    const ref = await seedEpisode(owner, episode, { partIds, fileIds });
    const { episode: draft } = await getDesk(owner, ref);
    await publishEdition(owner, { ...ref, version: draft.version, publishedOn: episode.publishedOn });
  }
  await seedEpisode(editor, PRESS_DRAFT, { partIds, fileIds }, owner);
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

async function seedWorksheets(owner: Context, partIds: Ids): Promise<void> {
  for (const { part, ...worksheet } of PRESS_WORKSHEETS) {
    const id = partIds.get(part ?? '');
    await addWorksheet(owner, {
      build: BUILD,
      ...worksheet,
      of: id === undefined ? null : { kind: 'part', id },
    });
  }
}

async function seedStages(owner: Context): Promise<Ids> {
  const ids = new Map<string, string>();
  for (const [name, about] of PRESS_STAGES)
    ids.set(name, (await addStage(owner, { build: BUILD, name, about })).id);
  return ids;
}

async function seedParts(owner: Context): Promise<Ids> {
  const ids = new Map<string, string>();
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
    ids.set(number, id);
  }
  return ids;
}

/** Everything that is kept as a file, by its name. */
function seedFiles(owner: Context): Promise<Ids> {
  const photos = PRESS_DIARY.flatMap(({ photos: shown = [] }) => shown.map(({ file }) => file));
  const films = PRESS_EPISODES.flatMap(({ video }) => ('file' in video ? [video.file] : []));
  const clips = 'file' in PRESS_DRAFT.video ? [PRESS_DRAFT.video.file] : [];
  return takeIn(owner, BUILD, [
    ...photos.map((name) => ({ name, purpose: 'diary' as const })),
    ...films.map((name) => ({ name, purpose: 'episode' as const })),
    ...clips.map((name) => ({ name, purpose: 'footage' as const })),
  ]);
}

async function seedDiary(owner: Context, stageIds: Ids, fileIds: Ids): Promise<void> {
  for (const { day, stage, text, visibility, photos: described = [] } of PRESS_DIARY) {
    const photos = described.map(({ file, description }) => ({ file: idOf(fileIds, file), description }));
    await addEntry(owner, { build: BUILD, day, stage: idOf(stageIds, stage), text, visibility, photos });
  }
}

/** @param asked whom the notes to one person ask; the writer when left out */
async function seedEpisode(
  writer: Context,
  { number, title, about, video, chapters, notes, onBench }: DemoEpisode,
  { partIds, fileIds }: { readonly partIds: Ids; readonly fileIds: Ids },
  asked: Context = writer,
): Promise<EpisodeRef> {
  const { id: episode } = await makeEpisode(writer, { build: BUILD, number, title });
  const ref = { build: BUILD, episode };
  const { episode: made } = await getDesk(writer, ref);
  await changeEpisode(writer, { ...ref, number, title, about, version: made.version });
  const position = await seedVideo(writer, ref, video, fileIds);
  if (number === PRESS_EDIT.episode) await takeEdit(writer, { ...ref, ...ReadEditInput.parse(PRESS_EDIT) });
  for (const [at, chapter] of chapters)
    await addChapter(writer, { ...ref, id: newId(), title: chapter, position: position(at) });
  for (const note of notes)
    await addNote(writer, { ...ref, ...noteFields(note, partIds, asked), position: position(note.at) });
  for (const [part, from, to] of onBench) {
    const partId = idOf(partIds, part);
    await setAppearance(writer, { ...ref, id: newId(), partId, position: position(from, to) });
  }
  return ref;
}

/** Gives an episode its video. @returns how its seconds are counted */
async function seedVideo(writer: Context, ref: EpisodeRef, video: DemoVideo, fileIds: Ids) {
  if ('address' in video) {
    await setVideo(writer, { ...ref, fileId: null, ...video });
    return positionIn(THOUSANDTHS);
  }
  await setVideo(writer, { ...ref, fileId: idOf(fileIds, video.file), address: null });
  const bytes = await readMedia(video.captions);
  await addCaptions(writer, { ...ref, file: { name: video.captions, bytes }, language: 'en' });
  return positionIn(FILM_FRAMES);
}

function positionIn(rate: { readonly num: number; readonly den: number }) {
  const frameAt = (seconds: number) => Math.round((seconds * rate.num) / rate.den);
  return (from: number, to?: number) => ({
    frame: frameAt(from),
    endFrame: to === undefined ? null : frameAt(to),
    rate,
  });
}

function noteFields(note: DemoNote, partIds: Ids, { actor }: Context) {
  const { kind, text, parts, standing = null, topic = null, audience = 'viewers' } = note;
  return {
    id: newId(),
    kind,
    text,
    audience,
    askedId: audience === 'person' && actor.kind === 'account' ? actor.id : null,
    standing,
    topic,
    partIds: parts.map((number) => idOf(partIds, number)),
  };
}

function idOf(ids: Ids, name: string): string {
  const id = ids.get(name);
  if (id === undefined) throw new Error(`The demo has no ${name}.`);
  return id;
}
