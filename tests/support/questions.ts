import { desc, eq } from 'drizzle-orm';
import { questions } from '../../src/db/schema/questions.ts';
import { type Ask, type AskByMail, CONFIRM_PURPOSE } from '../../src/features/questions/question.ts';
import { askByMail } from '../../src/features/questions/server/ask-by-mail.ts';
import { askQuestion } from '../../src/features/questions/server/ask-question.ts';
import { confirmQuestion } from '../../src/features/questions/server/confirm-question.ts';
import { getQuestion } from '../../src/features/questions/server/get-question.ts';
import { signToken } from '../../src/server/auth/signed-token.ts';
import { type Context, type WorkshopContext } from '../../src/server/context.ts';
import { type Services } from '../../src/server/services.ts';
import { BUILD } from './companion.ts';

const ABOUT = { build: BUILD, episode: null, t: null, note: null, parts: [], anyway: true } as const;

/** Asks as somebody signed in. @returns the question's id */
export async function ask(
  context: WorkshopContext,
  given: Partial<Ask> & Pick<Ask, 'text'> & { readonly build?: string },
): Promise<string> {
  await askQuestion(context, { ...ABOUT, parts: [], ...given });
  return newestQuestion(context);
}

/** Asks with an address; the question waits for its link. @returns its id */
export async function askFrom(
  context: WorkshopContext,
  given: Partial<AskByMail> & Pick<AskByMail, 'text' | 'email'>,
): Promise<string> {
  await askByMail(context, { ...ABOUT, parts: [], name: 'Pia', ...given });
  return newestQuestion(context);
}

/** Opens the link that was mailed for a question. */
export function openLink(context: Context, question: string) {
  return confirmQuestion(context, { question, token: questionToken(context.services, question) });
}

export function questionToken(services: Services, question: string): string {
  return signToken(services.settings.AUTH_SECRET, CONFIRM_PURPOSE, question);
}

/** The version of a question as it stands. */
export async function versionOf(context: WorkshopContext, question: string): Promise<number> {
  return (await getQuestion(context, { question })).version;
}

async function newestQuestion({ db, workshop }: WorkshopContext): Promise<string> {
  const [row] = await db
    .select({ id: questions.id })
    .from(questions)
    .where(eq(questions.workshopId, workshop.id))
    .orderBy(desc(questions.id))
    .limit(1);
  if (!row) throw new Error('Nothing was asked.');
  return row.id;
}
