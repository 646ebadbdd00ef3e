import { and, eq, exists, isNotNull, isNull, sql } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { anchors } from '../../../db/schema/notes.ts';
import { answers, questionParts, questions } from '../../../db/schema/questions.ts';
import { read } from '../../../server/verb.ts';
import { loadQuestions } from './load-questions.ts';
import { presentPublic } from './present-question.ts';

interface Wanted {
  readonly buildId: string;
  /** Only those at a moment of this episode, in its order. */
  readonly episodeId?: string;
  /** Only those about this part that are answered. */
  readonly partId?: string;
}

/** The questions that everyone sees, of a build that is on show; those that repeat another stand with it. */
export const listPublicQuestions = read(
  { may: 'published.read' },
  async ({ db, workshop }, { buildId, episodeId, partId }: Wanted) => {
    const rows = await loadQuestions(
      db,
      and(
        eq(questions.workshopId, workshop.id),
        eq(questions.buildId, buildId),
        eq(builds.visibility, 'public'),
        eq(questions.state, 'shown'),
        isNull(questions.mergedInto),
        episodeId === undefined ? undefined : eq(anchors.episodeId, episodeId),
        partId === undefined
          ? undefined
          : and(
              isNotNull(answers.answeredAt),
              exists(
                db
                  .select({ one: sql`1` })
                  .from(questionParts)
                  .where(and(eq(questionParts.questionId, questions.id), eq(questionParts.partId, partId))),
              ),
            ),
      ),
    );
    const items = rows.map(presentPublic);
    const shown = episodeId === undefined ? items : items.filter(({ moment }) => moment !== null);
    return {
      items: shown.sort((a, b) => (a.moment?.at ?? 0) - (b.moment?.at ?? 0)),
      nextCursor: null,
    };
  },
);
