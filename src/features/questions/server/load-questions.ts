import { and, asc, eq, inArray, isNotNull, isNull, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { accounts } from '../../../db/schema/accounts.ts';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { editions, edits, episodes } from '../../../db/schema/episodes.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { answers, questionParts, questions } from '../../../db/schema/questions.ts';
import { places } from '../../../db/schema/places.ts';
import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type EpisodeView, standsAt } from '../../notes/server/episode-view.ts';
import { type AskedMoment, type AskedPart } from '../question.ts';

const writers = alias(accounts, 'answer_writers');
const assignees = alias(accounts, 'assignees');
const originals = alias(questions, 'originals');

/** Questions on one page. */
const PAGE = 200;

/**
 * Questions that have been confirmed, of builds that stand, with all that pages show of them.
 * @param where which of them, the tenant included
 * @param order oldest first when left out
 */
export async function loadQuestions(db: Database, where: SQL | undefined, order: readonly SQL[] = []) {
  const rows = await db
    .select({
      question: questions,
      build: { id: builds.id, slug: buildSlugs.slug, name: builds.name },
      anchor: anchors,
      edit: { id: edits.id, num: edits.rateNum, den: edits.rateDen },
      place: places,
      episode: { id: episodes.id, number: episodes.number, title: episodes.title },
      note: notes,
      answer: answers,
      writer: writers.name,
      assignee: assignees.name,
      original: { id: originals.id, text: originals.text },
    })
    .from(questions)
    .innerJoin(builds, and(eq(builds.id, questions.buildId), isNull(builds.deletedAt)))
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .leftJoin(anchors, eq(anchors.id, questions.anchorId))
    // A moment of an episode that is not on show any more leads nowhere.
    .leftJoin(
      episodes,
      and(eq(episodes.id, anchors.episodeId), eq(episodes.state, 'published'), isNull(episodes.deletedAt)),
    )
    .leftJoin(
      editions,
      and(eq(editions.episodeId, episodes.id), isNull(editions.replacedAt), isNull(editions.withdrawnAt)),
    )
    .leftJoin(edits, eq(edits.id, editions.editId))
    .leftJoin(
      places,
      and(eq(places.anchorId, anchors.id), eq(places.editId, edits.id), eq(places.position, 0)),
    )
    .leftJoin(
      notes,
      and(eq(notes.id, questions.noteId), eq(notes.audience, 'viewers'), isNull(notes.deletedAt)),
    )
    .leftJoin(answers, eq(answers.questionId, questions.id))
    .leftJoin(writers, eq(writers.id, answers.writtenBy))
    .leftJoin(assignees, eq(assignees.id, questions.assignedTo))
    .leftJoin(originals, eq(originals.id, questions.mergedInto))
    .where(and(isNotNull(questions.confirmedAt), where))
    .orderBy(...order, asc(questions.id))
    .limit(PAGE);
  const partsOf = await loadAskedParts(
    db,
    rows.map(({ question }) => question.id),
  );
  return rows.map(({ anchor, edit, place, episode, note, ...row }) => ({
    ...row,
    moment: momentOf(anchor, episode, edit, place),
    note: note && { id: note.id, text: note.text },
    parts: partsOf.get(row.question.id) ?? [],
  }));
}

export type QuestionRow = Awaited<ReturnType<typeof loadQuestions>>[number];

/** Where a question stands in the edition on show: nowhere when its moment is not in that edition's edit. */
function momentOf(
  anchor: typeof anchors.$inferSelect | null,
  episode: { readonly id: string; readonly number: number; readonly title: string } | null,
  shown: { readonly id: string; readonly num: number; readonly den: number } | null,
  place: typeof places.$inferSelect | null,
): AskedMoment | null {
  const edit: EpisodeView['edit'] = shown && {
    id: shown.id,
    rate: { num: shown.num, den: shown.den },
  };
  if (episode === null || anchor === null || (edit !== null && place?.frame == null)) return null;
  if (edit === null && anchor.clock !== 'episode' && anchor.typedFrame === null) return null;
  const { frame, rate } = standsAt({ episodeId: episode.id, edit }, anchor, place);
  const at = frameToMilliseconds(frame, rate) / 1000;
  return { episodeId: episode.id, number: episode.number, title: episode.title, at };
}

async function loadAskedParts(db: Database, ids: readonly string[]): Promise<Map<string, AskedPart[]>> {
  const found = new Map<string, AskedPart[]>();
  if (ids.length === 0) return found;
  const rows = await db
    .select({
      question: questionParts.questionId,
      part: { id: parts.id, number: parts.number, name: parts.name, inPlans: parts.inPlans },
    })
    .from(questionParts)
    .innerJoin(parts, and(eq(parts.id, questionParts.partId), isNull(parts.deletedAt)))
    .where(inArray(questionParts.questionId, [...ids]))
    .orderBy(asc(questionParts.position));
  for (const { question, part } of rows) found.set(question, [...(found.get(question) ?? []), part]);
  return found;
}
