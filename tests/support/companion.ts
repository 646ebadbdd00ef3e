import { newId } from '../../src/db/columns.ts';
import { files, fileVariants } from '../../src/db/schema/files.ts';
import { addCaptions } from '../../src/features/captions/server/add-captions.ts';
import { changeBuild } from '../../src/features/builds/server/change-build.ts';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { addChapter } from '../../src/features/episodes/server/add-chapter.ts';
import { getDesk } from '../../src/features/episodes/server/get-desk.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { publishEdition } from '../../src/features/episodes/server/publish-edition.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { type NoteFields } from '../../src/features/notes/note.ts';
import { addNote } from '../../src/features/notes/server/add-note.ts';
import { addPart } from '../../src/features/parts/server/add-part.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { keyOf } from '../../src/server/storage/storage.ts';

/** Frames a second of the videos made here. */
export const RATE = { num: 25, den: 1 };

export const BUILD = 'press';

const PARTS = [
  { number: '117', name: 'drum shaft', inPlans: true },
  { number: '118', name: 'bearing housing', inPlans: true },
  { number: '125', name: 'port adapter', inPlans: false },
] as const;

/** A build on show with three parts; gives their ids by number. */
export async function aShownBuild(context: WorkshopContext): Promise<Map<string, string>> {
  const about = 'A frame press, and a mill to feed it.';
  await makeBuild(context, { name: 'Orchard press', slug: BUILD, about, plannedEpisodes: 6 });
  const build = await getBuild(context, { build: BUILD });
  await changeBuild(context, { ...build, build: BUILD, visibility: 'public' });
  const ids = new Map<string, string>();
  for (const part of PARTS) {
    const fields = {
      kind: 'made',
      quantity: 2,
      material: 'flat',
      size: '',
      aliases: [],
      remark: '',
    } as const;
    const { id } = await addPart(context, { ...fields, ...part, build: BUILD });
    ids.set(part.number, id);
  }
  return ids;
}

/** A video of the build, as the worker leaves one that it has accepted. @param bytes kept, when there are any */
export async function aKeptVideo(
  { db, workshop, services }: WorkshopContext,
  buildId: string,
  {
    seconds,
    bytes,
    poster,
  }: { readonly seconds: number; readonly bytes?: Uint8Array; readonly poster?: Uint8Array },
): Promise<string> {
  const id = newId();
  const [tenant, size] = [{ workshopId: workshop.id }, bytes?.length ?? 4321];
  await db.insert(files).values({
    ...tenant,
    id,
    buildId,
    purpose: 'episode',
    name: 'episode.mp4',
    bytes: size,
    state: 'ready',
    kind: 'video',
    contentType: 'video/mp4',
    durationFrames: seconds * RATE.num,
    rateNum: RATE.num,
    rateDen: RATE.den,
  });
  const variant = { ...tenant, fileId: id, variant: 'video', contentType: 'video/mp4', bytes: size };
  await db.insert(fileVariants).values({ ...variant, width: 320, height: 180 });
  if (bytes) await services.storage.put(keyOf(workshop.id, id, 'video'), 'video/mp4', bytes);
  if (poster) {
    const still = { variant: 'poster', contentType: 'image/jpeg', bytes: poster.length };
    await db.insert(fileVariants).values({ ...tenant, ...still, fileId: id, width: 320, height: 180 });
    await services.storage.put(keyOf(workshop.id, id, 'poster'), 'image/jpeg', poster);
  }
  return id;
}

/** A note for viewers at a second. */
export async function noteAt(
  context: WorkshopContext,
  episode: string,
  seconds: number,
  note: Partial<NoteFields> & Pick<NoteFields, 'text'>,
): Promise<string> {
  const id = newId();
  await addNote(context, {
    kind: 'step',
    audience: 'viewers',
    askedId: null,
    standing: null,
    topic: null,
    partIds: [],
    position: { frame: Math.round(seconds * RATE.num), endFrame: null, rate: RATE },
    ...note,
    id,
    build: BUILD,
    episode,
  });
  return id;
}

export async function chapterAt(context: WorkshopContext, episode: string, seconds: number, title: string) {
  const position = { frame: seconds * RATE.num, endFrame: null, rate: RATE };
  await addChapter(context, { id: newId(), build: BUILD, episode, title, position });
}

/** Publishes what the draft holds. */
export async function publish(context: WorkshopContext, episode: string, publishedOn?: string) {
  const { episode: draft } = await getDesk(context, { build: BUILD, episode });
  await publishEdition(context, { build: BUILD, episode, version: draft.version, publishedOn });
}

export const CAPTIONS =
  'WEBVTT\n\n00:00.000 --> 00:09.000\nfirst the shaft\n\n00:10.000 --> 00:19.000\nthe housing, one-one-eight\n';

/** Takes captions in, as from a file. */
export function captionsOf(context: WorkshopContext, episode: string, webvtt = CAPTIONS) {
  const file = { name: 'words.vtt', bytes: new TextEncoder().encode(webvtt) };
  return addCaptions(context, { build: BUILD, episode, file, language: 'en' } as Parameters<
    typeof addCaptions
  >[1]);
}

/** A published episode of 60 s in two chapters, with notes at 0, 10, 20 and 40 s. */
export async function aShownEpisode(
  context: WorkshopContext,
  parts: ReadonlyMap<string, string>,
  video: { readonly fileId: string } | { readonly address: string; readonly length: string },
  title = 'The drum shaft and the wrong thread',
): Promise<string> {
  const { id } = await makeEpisode(context, { build: BUILD, title });
  await setVideo(context, { build: BUILD, episode: id, fileId: null, address: null, ...video });
  const part = (number: string) => [parts.get(number) ?? ''];
  await chapterAt(context, id, 0, 'Drum shaft');
  await chapterAt(context, id, 15, 'Housings');
  await chapterAt(context, id, 30, 'Ports');
  await noteAt(context, id, 1, {
    text: 'Face the shaft to 412 mm.',
    kind: 'size',
    standing: 'plan',
    partIds: part('117'),
  });
  await noteAt(context, id, 10, {
    text: 'Seats came out at 1-1/2 in.',
    kind: 'size',
    standing: 'as-made',
    partIds: part('117'),
  });
  await noteAt(context, id, 20, { text: 'The housing goes on.', partIds: part('118') });
  await noteAt(context, id, 40, {
    text: 'Let the pressure down before you open a line.',
    kind: 'caution',
    topic: 'pressure',
    partIds: part('125'),
  });
  await captionsOf(context, id);
  await publish(context, id);
  return id;
}
