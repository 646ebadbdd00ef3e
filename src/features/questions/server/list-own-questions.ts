import { and, desc, eq } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { questions } from '../../../db/schema/questions.ts';
import { workshopSlugs } from '../../../db/schema/workshops.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';
import { loadQuestions } from './load-questions.ts';

/** The questions that somebody has asked, in every workshop, newest first. */
export const listOwnQuestions = read({ may: 'account.own' }, async ({ db, actor }) => {
  const rows = await loadQuestions(
    db,
    and(eq(questions.askerId, actor.id), eq(builds.visibility, 'public')),
    [desc(questions.id)],
  );
  const items = await Promise.all(
    rows.map(async ({ question, build, answer }) => {
      const [slug] = await db
        .select({ slug: workshopSlugs.slug })
        .from(workshopSlugs)
        .where(and(eq(workshopSlugs.workshopId, question.workshopId), eq(workshopSlugs.current, true)));
      // Hidden ones wait, as far as whoever asked is told.
      const shown = question.state === 'shown';
      return {
        id: question.id,
        text: question.text,
        build: build.name,
        said: sayState(shown, answer?.answeredAt != null || question.mergedInto !== null),
        href: shown && slug ? paths.question(slug.slug, build.slug, question.id) : null,
      };
    }),
  );
  return { items, nextCursor: null };
});

function sayState(shown: boolean, answered: boolean): 'waits' | 'shown' | 'answered' {
  if (!shown) return 'waits';
  return answered ? 'answered' : 'shown';
}
