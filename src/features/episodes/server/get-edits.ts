import { desc, eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { editions, edits } from '../../../db/schema/episodes.ts';
import { type Database } from '../../../db/client.ts';
import { type ComparedSegment, compareEdits } from '../../../domain/edit/compare-edits.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { findEditById, type StoredEdit } from '../../notes/server/load-edits.ts';
import { type EditVersion } from '../edit.ts';
import { offerMarks } from './offer-marks.ts';
import { type EpisodeRef, findDraftVideo, loadEpisode } from './load-episode.ts';

/** A version as its page shows it. */
export interface ShownEdit extends StoredEdit {
  /** What it did to the one before; null for the first. */
  readonly compared: readonly ComparedSegment[] | null;
}

/** The versions of an episode's edit, the newest first, without what is in them. */
async function listVersions(db: Database, episodeId: string): Promise<EditVersion[]> {
  const rows = await db
    .select({ edit: edits, takenBy: accounts.name })
    .from(edits)
    .leftJoin(accounts, eq(accounts.id, edits.takenBy))
    .where(eq(edits.episodeId, episodeId))
    .orderBy(desc(edits.number));
  const published = await db
    .select({ editId: editions.editId, number: editions.number })
    .from(editions)
    .where(eq(editions.episodeId, episodeId));
  return rows.map(({ edit, takenBy }) => ({
    id: edit.id,
    number: edit.number,
    source: edit.source,
    sourceName: edit.sourceName,
    takenBy,
    takenAt: edit.createdAt,
    frames: edit.frames,
    rate: { num: edit.rateNum, den: edit.rateDen },
    editions: published.filter(({ editId }) => editId === edit.id).map(({ number }) => number),
  }));
}

/**
 * The edits of an episode: all versions, and one of them with what is in it and what it did to the one before.
 * @param ref.version its number; the newest when left out. @throws NotFound for one that is not there
 */
export const getEdits = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef & { readonly version?: number | undefined }) => {
    const { db } = context;
    const { build, episode } = await loadEpisode(context, ref);
    const versions = await listVersions(db, episode.id);
    const index = ref.version === undefined ? 0 : versions.findIndex(({ number }) => number === ref.version);
    if (index === -1) throw new NotFound('This version of the edit');
    const shown = await showEdit(db, versions[index]?.id, versions[index + 1]?.id);
    // Marks stand on the newest edit's times: an older version's are offered no more.
    const marks = shown === null || index > 0 ? [] : await offerMarks(db, shown, shown.edit.markers);
    return {
      build,
      episode,
      versions,
      video: await findDraftVideo(db, episode.id),
      shown,
      marks,
    };
  },
);

async function showEdit(db: Database, id = '', beforeId = ''): Promise<ShownEdit | null> {
  const stored = id === '' ? null : await findEditById(db, id);
  if (stored === null) return null;
  const before = beforeId === '' ? null : await findEditById(db, beforeId);
  return { ...stored, compared: before === null ? null : compareEdits(before.edit, stored.edit) };
}
