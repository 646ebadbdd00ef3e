import { type episodes } from '../../../db/schema/episodes.ts';
import { type Answer, wrong } from '../../../domain/answer.ts';
import { sayLengthsApart } from '../../../domain/edit/compare-lengths.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { sayRate, writeRate } from '../../../domain/edit/say-frames.ts';
import { suggestRates } from '../../../domain/edit/suggest-rates.ts';
import { MILLISECOND_RATE, parseRate, type Rate, sameRate } from '../../../domain/time/rate.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { type EditView, NO_RATE, type ReadEdit } from '../edit.ts';
import { type Video } from '../episode.ts';
import { type BuildClip, loadBuildClips } from './load-clips.ts';
import { findDraftEdit, type StoredEdit } from '../../notes/server/load-edits.ts';
import { findDraftVideo } from './load-episode.ts';
import { matchNames } from './match-names.ts';
import { type EditText, editTextOf, packText, readEditText } from './read-edit-text.ts';

/** An edit on its way in: what its page shows, its text, and the footage that its names were held against. */
export interface LookedAt {
  readonly view: Omit<EditView, 'compared' | 'report'>;
  /** The newest edit so far. */
  readonly before: StoredEdit | null;
  readonly text: EditText;
  readonly footage: readonly BuildClip[];
}

/** A rate to read at, and why that one. */
interface ChosenRate {
  readonly rate: Rate | null;
  readonly reason: string;
}

/** Moments of a video elsewhere are counted in thousandths, which is no rate that anyone cuts at. */
function rateOfVideo(video: Video | null): Rate | null {
  return video === null || sameRate(video.rate, MILLISECOND_RATE) ? null : video.rate;
}

function chooseRate(typed: string, { text, source }: EditText, video: Rate | null): ChosenRate {
  if (typed !== '') {
    const read = parseRate(typed);
    if (!read.ok) throw new Invalid({ rate: NO_RATE });
    const apart = video !== null && !sameRate(video, read.value);
    const reason = apart
      ? `The video runs at ${sayRate(video)} frames a second, the edit is read at ${sayRate(read.value)}.`
      : '';
    return { rate: read.value, reason };
  }
  if (source === 'timeline') return { rate: null, reason: 'The timeline says its own rate.' };
  const fitting = suggestRates(text);
  if (video !== null && fitting.some((rate) => sameRate(rate, video)))
    return {
      rate: video,
      reason: `A list does not say its rate. The video runs at ${sayRate(video)} frames a second, and every label of the list exists at that rate.`,
    };
  const labels = `Its labels exist at ${fitting.length === 0 ? 'no one rate' : listRates(fitting)}.`;
  return {
    rate: null,
    reason:
      video === null
        ? `A list does not say its rate, and there is no video kept here to tell from. ${labels}`
        : `A list does not say its rate, and some of its labels do not exist at the video’s, ${sayRate(video)}. ${labels}`,
  };
}

function listRates(rates: readonly Rate[]): string {
  return rates
    .map(sayRate)
    .join(', ')
    .replace(/, ([^,]+)$/, ' and $1');
}

/**
 * Reads an edit and says what it is, what its names stand for, and what it does to the newest one. Keeps nothing.
 * @throws Invalid at `file` or `rate`
 */
export async function lookAtEdit(
  { db }: WorkshopContext,
  episode: typeof episodes.$inferSelect,
  input: ReadEdit,
): Promise<LookedAt> {
  const text = editTextOf(input);
  const video = await findDraftVideo(db, episode.id);
  const { rate, reason } = chooseRate(input.rate, text, rateOfVideo(video));
  const asks = text.source === 'list' && rate === null;
  const read: Answer<Edit> = asks
    ? wrong('Choose the rate of the list first.')
    : await readEditText(text, rate, input.clipRates);
  const edit = read.ok ? read.value : null;
  const before = await findDraftEdit(db, episode.id);
  const footage = await loadBuildClips(db, episode.buildId);
  const lengthsApart =
    edit === null || video?.seconds == null
      ? null
      : sayLengthsApart(edit, { seconds: video.seconds, rate: video.rate, typed: video.fileId === null });
  const view = {
    name: text.name,
    packed: packText(text.text),
    source: text.source,
    rate: rate === null ? (edit === null ? '' : writeRate(edit.rate)) : writeRate(rate),
    rateReason: reason,
    edit,
    error: read.ok || asks ? null : read.error,
    warnings: edit?.warnings ?? [],
    names: edit === null ? [] : await matchNames(db, episode, edit, footage, input),
    clips: footage.map(({ id, label }) => ({ id, label })),
    lengthsApart,
    seen: before?.number ?? 0,
  };
  return { view, before, text, footage };
}
