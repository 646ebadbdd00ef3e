import { and, eq } from 'drizzle-orm';
import { isId } from '../../../domain/ids.ts';
import { builds } from '../../../db/schema/builds.ts';
import { questions } from '../../../db/schema/questions.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { loadQuestions } from './load-questions.ts';
import { presentPublic } from './present-question.ts';

/**
 * A question that everyone sees, by its address. One that repeats another gives that other; `id` says which.
 * @throws NotFound unless it is shown in a build that is on show
 */
export const getPublicQuestion = read(
  { may: 'published.read' },
  async (context, input: { readonly build: string; readonly question: string }) => {
    const { db, workshop } = context;
    const build = await getPublicBuild(context, input);
    if (!isId(input.question)) throw new NotFound('This question');
    const find = async (id: string) => {
      const [row] = await loadQuestions(
        db,
        and(
          eq(questions.id, id),
          eq(questions.workshopId, workshop.id),
          eq(questions.buildId, build.id),
          eq(builds.visibility, 'public'),
          eq(questions.state, 'shown'),
        ),
      );
      return row;
    };
    const asked = await find(input.question);
    const mergedInto = asked?.question.mergedInto ?? null;
    const row = mergedInto === null ? asked : await find(mergedInto);
    if (!row) throw new NotFound('This question');
    return presentPublic(row);
  },
);
