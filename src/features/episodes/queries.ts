import { queryOptions } from '@tanstack/react-query';
import { callApi } from '../../client/call-api.ts';
import { paths } from '../../paths.ts';
import {
  type Appearance,
  AppearanceAnswer,
  AppearancesAnswer,
  NoteAnswer,
  type Note,
  NotesAnswer,
  RemovedAnswer,
} from '../notes/note.ts';
import { type Chapter, ChapterAnswer, ChaptersAnswer } from './episode.ts';

/** Which episode's desk: the address names of its workshop and build, and its id. */
export interface DeskOf {
  readonly workshop: string;
  readonly build: string;
  readonly episode: string;
}

/** What the server holds of an episode's desk. */
export interface DeskLists {
  readonly notes: readonly Note[];
  readonly chapters: readonly Chapter[];
  readonly appearances: readonly Appearance[];
}

/** How often an open desk looks for what others have written. */
const LOOK_MS = 5000;

function api({ workshop, build, episode }: DeskOf, rest: string): string {
  return paths.api.inBuild(workshop, build, `episodes/${episode}/${rest}`);
}

/** What the server holds of an episode's desk: notes, chapters, and parts put on the bench by hand. */
export function deskQuery(of: DeskOf) {
  return queryOptions({
    queryKey: ['desk', of.workshop, of.build, of.episode],
    queryFn: async (): Promise<DeskLists> => {
      const [notes, chapters, appearances] = await Promise.all([
        callApi(api(of, 'notes')),
        callApi(api(of, 'chapters')),
        callApi(api(of, 'appearances')),
      ]);
      return {
        notes: NotesAnswer.parse(notes).items,
        chapters: ChaptersAnswer.parse(chapters).items,
        appearances: AppearancesAnswer.parse(appearances).items,
      };
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

/** Takes an editor's proposal. */
export function takeProposalMutation(of: DeskOf) {
  return {
    mutationKey: ['take proposal', of.episode],
    mutationFn: async ({ id, version }: { id: string; version: number }): Promise<Note> =>
      NoteAnswer.parse(await callApi(api(of, `notes/${id}/take`), { version })),
  };
}
