import { callApi } from '../../../client/call-api.ts';
import { type NoteKind } from '../../../domain/note-kinds.ts';
import { paths } from '../../../paths.ts';
import { ClipNoteRow } from '../clip-note.ts';

interface ClipOf {
  readonly workshop: string;
  readonly build: string;
  readonly clip: string;
}

const at = ({ workshop, build, clip }: ClipOf, rest: string) =>
  paths.api.inBuild(workshop, build, `footage/clips/${clip}/notes${rest}`);

/** Adds a note on a clip, or changes one that has a version. @throws ApiError */
export async function saveClipNote(
  of: ClipOf,
  note: {
    readonly id: string;
    readonly kind: NoteKind;
    readonly text: string;
    readonly frame: number;
    readonly version: number | null;
  },
) {
  const { id, kind, text, frame, version } = note;
  const answer =
    version === null
      ? await callApi(at(of, ''), { id, kind, text, frame })
      : await callApi(at(of, `/${id}`), { kind, text, version });
  return ClipNoteRow.parse(answer);
}

/** Deletes a note on a clip or brings it back. @throws ApiError */
export async function undoClipNote(
  of: ClipOf,
  { id, version }: { readonly id: string; readonly version: number },
  action: 'delete' | 'restore',
) {
  return ClipNoteRow.parse(await callApi(at(of, `/${id}/${action}`), { version }));
}
