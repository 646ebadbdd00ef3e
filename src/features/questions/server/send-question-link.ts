import { and, eq, isNull } from 'drizzle-orm';
import { questions } from '../../../db/schema/questions.ts';
import { workshops } from '../../../db/schema/workshops.ts';
import { paths } from '../../../paths.ts';
import { signToken } from '../../../server/auth/signed-token.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { confirmQuestionMail } from '../emails.ts';
import { CONFIRM_DAYS, CONFIRM_PURPOSE } from '../question.ts';
import { isBarred } from './find-barred.ts';

/** Mails the link that lets a question wait; nothing to somebody who was barred. It is the same however often it is mailed. */
export const sendQuestionLink: JobHandler = async ({ db, mailer, settings }, ids) => {
  const id = ids['questionId'] ?? '';
  const [row] = await db
    .select({ question: questions, workshop: workshops.name })
    .from(questions)
    .innerJoin(workshops, eq(workshops.id, questions.workshopId))
    .where(and(eq(questions.id, id), isNull(questions.confirmedAt)));
  const to = row?.question.askerEmail;
  if (!row || to == null) return;
  if (await isBarred(db, row.question.workshopId, { accountId: null, email: to })) return;
  const token = signToken(settings.AUTH_SECRET, CONFIRM_PURPOSE, id);
  await mailer.send({
    to,
    mail: confirmQuestionMail({
      workshop: row.workshop,
      name: row.question.askerName,
      text: row.question.text,
      days: CONFIRM_DAYS,
      link: settings.PUBLIC_URL + paths.confirmQuestion(id, token),
    }),
    messageId: `<question.${id}@${new URL(settings.PUBLIC_URL).hostname}>`,
  });
};
