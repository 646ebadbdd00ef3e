import { compareEdits } from '../../../domain/edit/compare-edits.ts';
import { verb } from '../../../server/verb.ts';
import { type EditView, MATCHES, type ReadEdit } from '../edit.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { lookAtEdit } from './look-at-edit.ts';
import { reportEdit } from './report-edit.ts';

/**
 * What an edit would be and do, nothing kept. No transaction: reading a long list takes its time.
 * @throws Invalid at `file` or `rate`
 */
export const previewEdit = verb(
  { may: 'edit.change', transaction: false },
  async (context, input: EpisodeRef & ReadEdit): Promise<EditView> => {
    const { episode } = await loadEpisode(context, input);
    const { view, before } = await lookAtEdit(context, episode, input);
    const compared = view.edit === null || before === null ? null : compareEdits(before.edit, view.edit);
    const clipIds = new Map(
      view.names.flatMap(({ name, match }): [string, string | null][] =>
        match === MATCHES.named || match === '' ? [] : [[name, match === MATCHES.none ? null : match]],
      ),
    );
    const { edit } = view;
    const report = edit && (await reportEdit(context.db, episode, { edit, clipIds }));
    return { ...view, compared, report };
  },
);
