import { and, asc, eq, isNotNull, isNull, or } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { answers, questions } from '../../../db/schema/questions.ts';
import { workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { paths } from '../../../paths.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { answerMail } from '../emails.ts';

/**
 * Tells whoever asked a question, or one that repeats it, that it is answered: each once. A run that was cut off
 * after a mail had gone out doubles that one at most, under the same Message-ID.
 */
export const sendAnswer: JobHandler = async ({ db, mailer, settings }, ids) => {
  const id = ids['questionId'] ?? '';
  const [row] = await db
    .select({
      answer: answers,
      workshop: workshops.name,
      slug: workshopSlugs.slug,
      build: buildSlugs.slug,
      isPublic: eq(builds.visibility, 'public'),
    })
    .from(questions)
    .innerJoin(answers, and(eq(answers.questionId, questions.id), isNotNull(answers.answeredAt)))
    .innerJoin(workshops, eq(workshops.id, questions.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .innerJoin(builds, and(eq(builds.id, questions.buildId), isNull(builds.deletedAt)))
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .where(and(eq(questions.id, id), eq(questions.state, 'shown')));
  const answeredAt = row?.answer.answeredAt;
  // What is not on show yet cannot be read by whoever would be told.
  if (!row?.isPublic || answeredAt == null) return;
  const untold = await db
    .select({ id: questions.id, to: questions.askerEmail, name: questions.askerName, text: questions.text })
    .from(questions)
    .where(
      and(
        or(eq(questions.id, id), eq(questions.mergedInto, id)),
        isNotNull(questions.confirmedAt),
        isNotNull(questions.askerEmail),
        isNull(questions.toldAt),
      ),
    )
    .orderBy(asc(questions.id));
  for (const { id: asked, to, name, text } of untold) {
    if (to === null) continue;
    await mailer.send({
      to,
      mail: answerMail({
        workshop: row.workshop,
        name,
        text,
        answer: row.answer.text,
        link: settings.PUBLIC_URL + paths.question(row.slug, row.build, id),
      }),
      messageId: `<answer.${asked}.${String(answeredAt.getTime())}@${new URL(settings.PUBLIC_URL).hostname}>`,
    });
    await db.update(questions).set({ toldAt: new Date() }).where(eq(questions.id, asked));
  }
};
