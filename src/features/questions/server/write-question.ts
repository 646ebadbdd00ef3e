import { and, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { editions, episodes } from '../../../db/schema/episodes.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { questionParts, questions } from '../../../db/schema/questions.ts';
import { places } from '../../../db/schema/places.ts';
import { type CautionTopic, isCautionTopic } from '../../../domain/cautions/topics.ts';
import { findRisks } from '../../../domain/questions/risks.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { secondsToFrame } from '../../../domain/time/frames.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { getPublicEpisode } from '../../episodes/server/get-public-episode.ts';
import { findShownView } from '../../notes/server/episode-view.ts';
import { findEditById, findFirstEdit } from '../../notes/server/load-edits.ts';
import { placeAgain } from '../../notes/server/place-edit.ts';
import { columnsAt } from '../../notes/server/write-anchor.ts';
import { type Ask } from '../question.ts';
import { findLike } from './find-like.ts';

export type AskedAbout = Pick<Ask, 'text' | 'episode' | 't' | 'note' | 'parts'> & { readonly build: string };
type NewQuestion = Pick<typeof questions.$inferInsert, 'source' | 'askerName'> &
  Partial<typeof questions.$inferInsert>;

/** The like questions that are answered already are offered before a new one is taken. */
export const ASKED_ALREADY =
  'Something like it has been answered already. Look below, and send yours if that is not it.';

/** @throws NotFound for a build that is not on show, Invalid at `like` when something like it is answered */
export async function requireNew(
  context: WorkshopContext,
  input: Pick<Ask, 'text' | 'anyway'> & { readonly build: string },
): Promise<void> {
  const build = await getPublicBuild(context, input);
  if (input.anyway) return;
  const like = await findLike(context.db, build.id, input.text);
  if (like.length > 0) throw new Invalid({ like: ASKED_ALREADY });
}

/**
 * Writes a question with its moment, note and parts, and marks it by the rule of risks.
 * @param asker who asks, and when it counts as asked: at once, or once a link has been opened
 * @throws Invalid at `t`, `note` or `parts` for what is not there; NotFound for an episode that is not on show
 */
export async function writeQuestion(
  context: WorkshopContext,
  input: AskedAbout,
  asker: NewQuestion,
): Promise<string> {
  const { db, workshop } = context;
  const build = await loadBuild(context, input.build);
  const note = input.note === null ? null : await findNote(context, build.id, input.note);
  const anchor = note === null ? await findMoment(context, input) : note.anchor;
  const anchorId = anchor === null ? null : await makeAnchor(context, build.id, anchor);
  const partIds = [...new Set(input.parts)];
  await requireParts(context, build.id, partIds);
  const risks = findRisks(input.text, note?.topics);
  const id = newId();
  await db.insert(questions).values({
    id,
    workshopId: workshop.id,
    buildId: build.id,
    anchorId,
    noteId: input.note,
    text: input.text,
    risks,
    risky: risks.length > 0,
    createdAt: context.now,
    ...asker,
  });
  if (partIds.length > 0) {
    await db
      .insert(questionParts)
      .values(
        partIds.map((partId, position) => ({ workshopId: workshop.id, questionId: id, partId, position })),
      );
  }
  return id;
}

type Moment = Omit<typeof anchors.$inferInsert, 'id' | 'workshopId' | 'buildId'>;

async function findMoment(context: WorkshopContext, input: AskedAbout): Promise<Moment | null> {
  if (input.episode === null || input.t === null) return null;
  const { episode, edition } = await getPublicEpisode(context, { build: input.build, number: input.episode });
  const { seconds, rate } = edition.video;
  if (seconds !== null && input.t >= seconds) {
    throw new Invalid({ t: `The episode ends at ${formatClock(seconds)}. Choose a moment before that.` });
  }
  const position = { frame: secondsToFrame(input.t, rate), endFrame: null, rate };
  const { edit } = await findShownView(context.db, episode.id);
  const through =
    edit === null ? await findFirstEdit(context.db, episode.id) : await findEditById(context.db, edit.id);
  return columnsAt(context.db, episode, position, through);
}

async function makeAnchor(
  { db, workshop }: WorkshopContext,
  buildId: string,
  moment: Moment,
): Promise<string> {
  const id = newId();
  await db.insert(anchors).values({ id, workshopId: workshop.id, buildId, ...moment });
  await placeAgain(db, buildId, [id]);
  return id;
}

/** A question about a note stands where the note stood when it was asked. */
async function findNote(
  { db, workshop }: WorkshopContext,
  buildId: string,
  noteId: string,
): Promise<{ anchor: Moment; topics: CautionTopic[] }> {
  const [note] = await db
    .select({ topic: notes.topic, anchor: anchors, episodeId: episodes.id })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(places, and(eq(places.anchorId, anchors.id), eq(places.position, 0), isNotNull(places.frame)))
    .leftJoin(
      editions,
      and(eq(editions.editId, places.editId), isNull(editions.replacedAt), isNull(editions.withdrawnAt)),
    )
    // A note made on a clip belongs to the episodes that show it.
    .innerJoin(
      episodes,
      and(
        eq(episodes.id, sql`coalesce(${anchors.episodeId}, ${editions.episodeId})`),
        eq(episodes.state, 'published'),
      ),
    )
    .where(
      and(
        eq(notes.id, noteId),
        eq(notes.workshopId, workshop.id),
        eq(notes.buildId, buildId),
        eq(notes.audience, 'viewers'),
        eq(notes.proposed, false),
        isNull(notes.deletedAt),
        isNull(episodes.deletedAt),
      ),
    );
  if (!note) throw new Invalid({ note: 'That note is not there any more. Ask about the moment instead.' });
  const { id: _id, workshopId: _workshop, buildId: _build, createdAt: _at, ...moment } = note.anchor;
  const anchor = { ...moment, shopUntil: null, endClipId: null, endFrame: null, episodeId: note.episodeId };
  return { anchor, topics: isCautionTopic(note.topic) ? [note.topic] : [] };
}

async function requireParts(
  { db, workshop }: WorkshopContext,
  buildId: string,
  ids: readonly string[],
): Promise<void> {
  if (ids.length === 0) return;
  const known = await db
    .select({ id: parts.id })
    .from(parts)
    .where(
      and(
        eq(parts.workshopId, workshop.id),
        eq(parts.buildId, buildId),
        inArray(parts.id, [...ids]),
        isNull(parts.deletedAt),
      ),
    );
  if (known.length !== ids.length) {
    throw new Invalid({ parts: 'One of these parts is not in the parts list. Choose again.' });
  }
}
