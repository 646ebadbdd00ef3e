import { queryOptions } from '@tanstack/react-query';
import { callApi } from '../../client/call-api.ts';
import { callTagged, type Tagged } from '../../client/call-tagged.ts';
import { paths } from '../../paths.ts';
import {
  AppearanceAnswer,
  NoteAnswer,
  type Note,
  type PlacedAnchor,
  PlaceNoteAnswer,
  RemovedAnswer,
} from '../notes/note.ts';
import { DeskAnswer, type DeskLists } from './desk.ts';
import { ChapterAnswer } from './episode.ts';

/** Which episode's desk: the address names of its workshop and build, and its id. */
export interface DeskOf {
  readonly workshop: string;
  readonly build: string;
  readonly episode: string;
}

/** How often an open desk looks for what others have written. */
const LOOK_MS = 5000;

function api({ workshop, build, episode }: DeskOf, rest: string): string {
  return paths.api.inBuild(workshop, build, `episodes/${episode}/${rest}`);
}

let last: { readonly path: string; readonly tagged: Tagged; readonly lists: DeskLists } | undefined;

/** What the server holds of an episode's desk; asked again every five seconds, and sent only when it has changed. */
export function deskQuery(of: DeskOf) {
  const path = api(of, 'desk');
  return queryOptions({
    queryKey: ['desk', of.workshop, of.build, of.episode],
    queryFn: async (): Promise<DeskLists> => {
      const known = last?.path === path ? last : undefined;
      const tagged = await callTagged(path, known?.tagged);
      if (tagged !== known?.tagged) last = { path, tagged, lists: DeskAnswer.parse(tagged.answer) };
      return last?.lists ?? DeskAnswer.parse(tagged.answer);
    },
    refetchInterval: LOOK_MS,
  });
}

/** One change to a note, a chapter or a part on the bench. `version` is the one that the writer saw. */
export interface DeskChange {
  readonly do: 'add' | 'change' | 'delete' | 'restore';
  readonly what: 'note' | 'chapter' | 'appearance';
  readonly id: string;
  readonly version: number | null;
  readonly form: object;
}

/** Sends one change. @returns the row as it is stored now; of a part taken off the bench, its id */
export async function sendDeskChange(of: DeskOf, change: DeskChange) {
  const { do: what, id, version, form } = change;
  const seen = { version };
  const list = `${change.what}s`;
  if (change.what === 'appearance') {
    return what === 'delete'
      ? RemovedAnswer.parse(await callApi(api(of, `${list}/${id}/remove`), {}))
      : AppearanceAnswer.parse(await callApi(api(of, list), { ...form, id }));
  }
  const answer =
    what === 'add'
      ? await callApi(api(of, list), { ...form, id })
      : await callApi(api(of, `${list}/${id}/${what}`), what === 'change' ? { ...form, ...seen } : seen);
  return change.what === 'note' ? NoteAnswer.parse(answer) : ChapterAnswer.parse(answer);
}

/** Answers a note that asks one person. */
export function answerNoteMutation(of: DeskOf) {
  return {
    mutationKey: ['answer note', of.episode],
    mutationFn: async ({
      id,
      version,
      answer,
    }: {
      id: string;
      version: number;
      answer: string;
    }): Promise<Note> => NoteAnswer.parse(await callApi(api(of, `notes/${id}/answer`), { version, answer })),
  };
}

/** Says by hand where a note was made. */
export function placeNoteMutation(of: DeskOf) {
  return {
    mutationKey: ['place note', of.episode],
    mutationFn: async ({ id, ...input }: { id: string; version: number; anchor: PlacedAnchor }) =>
      PlaceNoteAnswer.parse(await callApi(api(of, `notes/${id}/place`), input)),
  };
}

/** Takes an editor's proposal. */
export function takeProposalMutation(of: DeskOf) {
  return {
    mutationKey: ['take proposal', of.episode],
    mutationFn: async ({ id, version }: { id: string; version: number }): Promise<Note> =>
      NoteAnswer.parse(await callApi(api(of, `notes/${id}/take`), { version })),
  };
}
