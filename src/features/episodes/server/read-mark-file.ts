import { decodeText } from '../../../domain/csv/decode-text.ts';
import { readMarks } from '../../../domain/marks/read-marks.ts';
import { Invalid } from '../../../server/errors.ts';
import { UploadedFile } from '../../../server/http/uploaded-file.ts';
import { verb } from '../../../server/verb.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';
import { type OfferedMark } from '../marks.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { offerMarks } from './offer-marks.ts';

/** The longest file of marks, in bytes. Our own limit. */
const MOST_BYTES = 512 * 1024;

/** Reads the marks of a file, to be taken as notes or chapters. Keeps nothing. @throws Invalid at `file` */
export const readMarkFile = verb(
  { may: 'draft-note.change', transaction: false },
  async (context, { file, ...ref }: EpisodeRef & { readonly file?: unknown }) => {
    const { episode } = await loadEpisode(context, ref);
    const stored = await findDraftEdit(context.db, episode.id);
    if (stored === null) throw new Invalid({ file: 'Take an edit in first: marks stand on its times.' });
    if (!(file instanceof UploadedFile))
      throw new Invalid({ file: 'Choose a file with marks: an edit list, a timeline or CSV.' });
    if (file.bytes.length > MOST_BYTES) throw new Invalid({ file: 'The file is longer than 512 KiB.' });
    const text = decodeText(file.bytes);
    if (!text.ok) throw new Invalid({ file: 'That is not a text file.' });
    const read = readMarks(text.value.text, stored.edit.rate);
    if (!read.ok) throw new Invalid({ file: read.error });
    if (read.value.length === 0) throw new Invalid({ file: 'There is no mark in this file.' });
    const marks: readonly OfferedMark[] = await offerMarks(context.db, stored, read.value);
    return { marks };
  },
);
