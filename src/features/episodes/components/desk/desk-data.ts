import { type EpisodeState } from '../../../../domain/episode-states.ts';
import { type Rate } from '../../../../domain/time/rate.ts';
import { type DeskLists } from '../../desk.ts';

/** A part as the desk offers it. */
export interface DeskPart {
  readonly id: string;
  readonly number: string;
  readonly name: string;
  readonly inPlans: boolean;
}

/** What the page of an episode's desk holds for its island, once. */
export interface DeskData extends DeskLists {
  readonly workshop: string;
  readonly build: string;
  readonly episode: string;
  readonly state: EpisodeState;
  readonly me: string;
  /** May write notes and chapters at all. */
  readonly mayChange: boolean;
  /** May change numbers of a published episode, and take proposals. */
  readonly ownsNumbers: boolean;
  readonly rate: Rate;
  /** Frames of the video, when that is known. */
  readonly length: number | null;
  readonly parts: readonly DeskPart[];
  /** What a note can be placed on by hand: the build's clips, and its other episodes. */
  readonly clips: readonly { readonly id: string; readonly name: string; readonly rate: Rate }[];
  readonly otherEpisodes: readonly { readonly id: string; readonly title: string; readonly rate: Rate }[];
  readonly team: readonly { readonly id: string; readonly name: string }[];
}

export const DESK_DATA_ID = 'desk-data';

/** The page's data as text that can stand inside a script element: nothing in it ends the element. */
export function writeDeskData(data: DeskData): string {
  return JSON.stringify(data).replaceAll('<', '\\u003c');
}

/** Reads it back. The server wrote it into this very page, so its shape is known. */
export function readDeskData(root: ParentNode): DeskData | null {
  const text = root.querySelector(`#${DESK_DATA_ID}`)?.textContent ?? '';
  return text === '' ? null : (JSON.parse(text) as DeskData);
}
