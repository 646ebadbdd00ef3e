import { and, eq, isNotNull, isNull } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { answers, questions } from '../../../db/schema/questions.ts';
import { memberships, workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { paths } from '../../../paths.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { urgentQuestionMail } from '../emails.ts';

/** Mails the owners that a question is urgent, while nobody has answered it. */
export const sendUrgent: JobHandler = async ({ db, mailer, settings }, ids) => {
  const id = ids['questionId'] ?? '';
  const owners = await db
    .select({
      email: accounts.email,
      accountId: accounts.id,
      text: questions.text,
      workshop: workshops.name,
      slug: workshopSlugs.slug,
    })
    .from(questions)
    .innerJoin(workshops, eq(workshops.id, questions.workshopId))
    .innerJoin(
      workshopSlugs,
      and(eq(workshopSlugs.workshopId, workshops.id), eq(workshopSlugs.current, true)),
    )
    .innerJoin(memberships, and(eq(memberships.workshopId, workshops.id), eq(memberships.role, 'owner')))
    .innerJoin(accounts, eq(accounts.id, memberships.accountId))
    .leftJoin(answers, eq(answers.questionId, questions.id))
    .where(and(eq(questions.id, id), isNotNull(questions.urgentAt), isNull(answers.answeredAt)));
  for (const { email, accountId, text, workshop, slug } of owners) {
    await mailer.send({
      to: email,
      mail: urgentQuestionMail({
        workshop,
        text,
        link: settings.PUBLIC_URL + paths.benchQuestion(slug, id),
      }),
      messageId: `<question-urgent.${id}.${accountId}@${new URL(settings.PUBLIC_URL).hostname}>`,
    });
  }
};
