import { and, desc, eq, isNotNull, isNull, ne, sql } from 'drizzle-orm';
import { questions } from '../../../db/schema/questions.ts';
import { read } from '../../../server/verb.ts';
import { findLike } from './find-like.ts';

/** So many to choose from. */
const MOST = 50;

/** The questions that one may repeat: those of its build that are not hidden and repeat none, like ones first. */
export const listMergeChoices = read(
  { may: 'question.sort' },
  async ({ db, workshop }, { question: id }: { readonly question: string }) => {
    const [asked] = await db
      .select({ buildId: questions.buildId, text: questions.text })
      .from(questions)
      .where(and(eq(questions.id, id), eq(questions.workshopId, workshop.id)));
    if (!asked) return { items: [], nextCursor: null };
    const like = new Set((await findLike(db, asked.buildId, asked.text)).map((one) => one.id));
    const rows = await db
      .select({ id: questions.id, text: questions.text })
      .from(questions)
      .where(
        and(
          eq(questions.buildId, asked.buildId),
          ne(questions.id, id),
          ne(questions.state, 'hidden'),
          isNull(questions.mergedInto),
          isNotNull(questions.confirmedAt),
        ),
      )
      .orderBy(desc(sql`similarity(${questions.text}, ${asked.text})`), desc(questions.id))
      .limit(MOST);
    return { items: rows.map((row) => ({ ...row, like: like.has(row.id) })), nextCursor: null };
  },
);
