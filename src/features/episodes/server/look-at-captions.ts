import Fraction from 'fraction.js';
import { desc, eq, sql } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { type Database } from '../../../db/client.ts';
import { captions, edits, type episodes, videos } from '../../../db/schema/episodes.ts';
import { type Cue } from '../../../domain/captions/cue.ts';
import { readCaptionsText } from '../../../domain/captions/read-captions.ts';
import { type Edit, rateOf } from '../../../domain/edit/edit.ts';
import { type Alignment, alignCaptions } from '../../../domain/place/align-captions.ts';
import { carryEdit } from '../../../domain/place/carry-edit.ts';
import { findDraftEdit, type StoredEdit } from '../../notes/server/load-edits.ts';
import { type Video } from '../episode.ts';
import { findShownEdition } from './load-editions.ts';
import { presentVideo } from './load-episode.ts';
import { type FirstVersion } from './report-edit.ts';

type Episode = typeof episodes.$inferSelect;
type Captions = Pick<typeof captions.$inferSelect, 'id' | 'number' | 'sourceName'>;

/** The captions of two versions of an episode, and what is known of their videos. */
export interface TwoVersions {
  readonly before: Captions;
  readonly now: Captions;
  readonly video: Video;
  /** The video of the version before, while there is no edit of it. */
  readonly videoBefore: Video;
  /** The edit of the version before, which was made from captions too; null before the first. */
  readonly edit: StoredEdit | null;
}

/** The edit that the words of the captions give. */
export interface AlignedEdit {
  readonly alignment: Alignment;
  /** How long the version before is, in milliseconds. */
  readonly length: number;
  readonly edit: Edit;
  readonly clipIds: ReadonlyMap<string, string | null>;
  /** The version before as a clip and an edit of its own, neither kept yet; null where it has an edit. */
  readonly first: FirstVersion | null;
  /** Both captions, as WebVTT. */
  readonly texts: { readonly before: string; readonly now: string };
}

/**
 * The captions that places can move by: the newest, against those on show, else those before them. Null where there
 * are no two in one language, or where an edit says better what moved.
 */
export async function findTwoVersions(db: Database, episodeId: string): Promise<TwoVersions | null> {
  const edit = await findDraftEdit(db, episodeId);
  if (edit !== null && edit.source !== 'captions') return null;
  const all = await db
    .select({
      id: captions.id,
      number: captions.number,
      language: captions.language,
      sourceName: captions.sourceName,
      isOfEdit: sql<boolean>`exists (select from ${edits} e where e.id = ${edit?.id ?? null} and e.source_text = ${captions.webvtt})`,
    })
    .from(captions)
    .where(eq(captions.episodeId, episodeId))
    .orderBy(desc(captions.number));
  const newest = await db
    .select()
    .from(videos)
    .where(eq(videos.episodeId, episodeId))
    .orderBy(desc(videos.id))
    .limit(2);
  const [video, videoOld = video] = newest.map(presentVideo);
  const [now, ...older] = all;
  if (now === undefined || now.isOfEdit || video === undefined || videoOld === undefined) return null;
  const alike = older.filter(({ language }) => language === now.language);
  const shown = await findShownEdition(db, episodeId);
  const onShow = alike.find(({ id }) => id === shown?.captions?.id);
  const before = edit === null ? (onShow ?? alike[0]) : alike.find(({ isOfEdit }) => isOfEdit);
  if (before === undefined) return null;
  const videoBefore = shown !== null && before === onShow ? shown.video : videoOld;
  return { before, now, video, videoBefore, edit };
}

/** Aligns two versions. Up to two seconds for two hours of talk. */
export async function alignVersions(
  db: Database,
  episode: Episode,
  { before, now, video, videoBefore, edit }: TwoVersions,
): Promise<AlignedEdit> {
  const texts = { before: await textOf(db, before), now: await textOf(db, now) };
  const cues = { before: cuesOf(texts.before), now: cuesOf(texts.now) };
  const first = edit === null ? firstVersion(episode, videoBefore, cues.before) : null;
  const base = edit ?? first;
  if (base === null) throw new Error('There is no version before.');
  const length = Number(base.edit.frames.div(rateOf(base.edit.rate)).mul(1000).floor());
  const alignment = alignCaptions(
    { cues: cues.before, length },
    { cues: cues.now, length: video.seconds === null ? null : Math.round(video.seconds * 1000) },
  );
  const frames = framesOf(video, cues.now);
  const carried = carryEdit(base.edit, alignment, { rate: video.rate, frames });
  return {
    alignment,
    length,
    edit: { ...carried, title: episode.title },
    clipIds: base.clipIds,
    first,
    texts,
  };
}

async function textOf(db: Database, { id }: Captions): Promise<string> {
  const [row] = await db.select({ webvtt: captions.webvtt }).from(captions).where(eq(captions.id, id));
  return row?.webvtt ?? '';
}

function cuesOf(webvtt: string): readonly Cue[] {
  const read = readCaptionsText(webvtt);
  return read.ok ? read.value.cues : [];
}

/** How long a version is: as its video says, or up to its last caption. */
function framesOf({ seconds, rate }: Video, cues: readonly Cue[]): Fraction {
  const end = cues.reduce((most, cue) => Math.max(most, cue.end), Math.round((seconds ?? 0) * 1000));
  return new Fraction(end, 1000).mul(rateOf(rate)).ceil();
}

/** The version that everything was typed on, as one clip, with all of it used. */
function firstVersion(episode: Episode, video: Video, cues: readonly Cue[]): FirstVersion {
  const { rate } = video;
  const frames = framesOf(video, cues);
  const id = newId();
  const name = `Episode ${String(episode.number)}, version 1`;
  const whole = { in: new Fraction(0), out: frames };
  const edit: Edit = {
    title: episode.title,
    rate,
    drop: false,
    frames,
    picture: [
      {
        clip: name,
        alsoCalled: [],
        clipRate: rate,
        source: whole,
        record: whole,
        speed: new Fraction(1),
        track: 'V1',
      },
    ],
    sound: [],
    dissolved: [],
    markers: [],
    warnings: [],
  };
  const clip = {
    id,
    name,
    rate,
    frames: Number(frames),
    length: frames.div(rateOf(rate)),
    label: new Fraction(0),
    pace: new Fraction(1),
    start: null,
    clock: [],
    by: 'nothing' as const,
    problem: null,
    startLabel: null,
    drop: false,
    frameTimes: null,
    cameraId: null,
    fileId: null,
    continuesId: null,
    stageId: null,
  };
  return { edit, clip, clipIds: new Map([[name, id]]) };
}
