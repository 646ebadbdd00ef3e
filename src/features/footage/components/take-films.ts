import { callApi } from '../../../client/call-api.ts';
import { parseRate } from '../../../domain/time/rate.ts';
import { paths } from '../../../paths.ts';
import { KeptClips } from '../footage.ts';
import { isFilm, readMovie, type ReadMovie } from './read-movie.ts';

/** How far the clips of a folder are. */
export interface FolderState {
  readonly step: 'waiting' | 'reading' | 'done' | 'failed';
  readonly read: number;
  readonly all: number;
  readonly added: number;
  readonly updated: number;
  readonly problems: readonly string[];
}

interface Wanted {
  readonly workshop: string;
  readonly build: string;
  /** Empty where it is not said. */
  readonly camera: string;
  readonly rate: string;
}

/** Few enough that a broken line loses little. */
const BATCH = 20;

/** Reads the films among files and keeps them as named clips, a batch at a time. @param tell is told how far it is */
export async function takeFilms(
  wanted: Wanted,
  files: readonly File[],
  tell: (state: FolderState) => void,
): Promise<void> {
  const films = files.filter(isFilm).sort((a, b) => a.name.localeCompare(b.name));
  let state: FolderState = {
    step: 'reading',
    read: 0,
    all: films.length,
    added: 0,
    updated: 0,
    problems: [],
  };
  const set = (change: Partial<FolderState>) => {
    state = { ...state, ...change };
    tell(state);
  };
  const rate = parseRate(wanted.rate);
  if (!rate.ok) {
    set({ step: 'failed', problems: [rate.error] });
    return;
  }
  set({});
  try {
    for (let from = 0; from < films.length; from += BATCH) {
      const movies: ReadMovie[] = [];
      for (const film of films.slice(from, from + BATCH)) {
        movies.push(await readMovie(film, wanted.camera || null, rate.value));
        set({ read: state.read + 1 });
      }
      const kept = await send(wanted, movies);
      set({
        added: state.added + kept.added,
        updated: state.updated + kept.updated,
        problems: [...state.problems, ...kept.problems.map(({ text }) => text)],
      });
    }
    set({ step: 'done' });
  } catch (error) {
    set({
      step: 'failed',
      problems: [...state.problems, error instanceof Error ? error.message : String(error)],
    });
  }
}

async function send({ workshop, build }: Wanted, movies: readonly ReadMovie[]): Promise<KeptClips> {
  const api = (rest: string) => paths.api.inBuild(workshop, build, `footage/clips${rest}`);
  const kept = KeptClips.parse(await callApi(api(''), { clips: movies.map(({ clip }) => clip) }));
  for (const [index, { thumbnail }] of movies.entries()) {
    const id = kept.ids[index];
    if (id == null || thumbnail === null) continue;
    // A clip without its picture is still a clip.
    await callApi(api(`/${id}/thumbnail`), { jpeg: thumbnail }).catch(() => undefined);
  }
  return kept;
}
