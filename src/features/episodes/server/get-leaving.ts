import { checkChapters } from '../../../domain/chapters/check-chapters.ts';
import { toJsonChapters, writeChapterVtt } from '../../../domain/chapters/write-chapters.ts';
import { USUAL_CAUTIONS } from '../../../domain/cautions/usual-cautions.ts';
import { writeDescription } from '../../../domain/description/write-description.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';
import { type Companion } from '../companion.ts';
import { type Leaving } from '../leaving.ts';
import { getDraftCompanion } from './get-draft-companion.ts';
import { type EpisodeRef } from './load-episode.ts';

/** Beside every text of it, in the product's own words. */
const TERMS =
  'Notes and sizes are a guide, not a design: check every one against your own parts. Local codes and a licensed person decide.';

type Input = EpisodeRef & { readonly length: number };

/**
 * What goes with an episode's draft when it leaves: the text for its description within a length, and its chapters.
 * Null while there is no video.
 */
export const getLeaving = read(
  { may: 'workshop.see-bench' },
  async (context, input: Input): Promise<Leaving | null> => {
    const companion = await getDraftCompanion(context, input);
    if (companion === null) return null;
    const { workshop, services } = context;
    const address = (path: string) => `${services.settings.PUBLIC_URL}${path}`;
    const { build, episode } = companion;
    const chapters = companion.chapters.map(({ at, title }) => ({ start: toMilliseconds(at), title }));
    const { seconds } = companion.video;
    const length = seconds === null ? null : toMilliseconds(seconds);
    const described = {
      ...piecesOf(companion),
      chapters,
      links: [
        {
          label: 'Notes, sizes and parts of this episode',
          address: address(paths.episode(workshop.slug, build.slug, episode.number)),
        },
        { label: 'The whole build', address: address(paths.build(workshop.slug, build.slug)) },
        { label: 'Mail me the next episode', address: address(paths.subscribe(workshop.slug, build.slug)) },
      ],
    };
    const there = chapters.length > 0;
    return {
      ...writeDescription(described, input.length),
      length: input.length,
      chapters,
      faults: checkChapters(chapters, length).map(({ sentence }) => sentence),
      vtt: there && length !== null ? writeChapterVtt(chapters, length) : null,
      json: there ? `${JSON.stringify(toJsonChapters(chapters), null, 2)}\n` : null,
    };
  },
);

function toMilliseconds(seconds: number): number {
  return Math.round(seconds * 1000);
}

function piecesOf({ episode, parts, notes, cautions }: Companion) {
  const byId = new Map(notes.map((note) => [note.id, note]));
  return {
    about: episode.about,
    parts: parts.map(({ number, name }) => ({ number, name })),
    corrections: notes
      .filter(({ kind }) => kind === 'correction')
      .map(({ at, text }) => ({ at: toMilliseconds(at), text })),
    cautions: cautions.map(({ topic, noteId }) => {
      const { label, words } = USUAL_CAUTIONS[topic];
      const own = byId.get(noteId)?.text ?? '';
      return { label, words: own === '' ? words : own };
    }),
    terms: TERMS,
  };
}
