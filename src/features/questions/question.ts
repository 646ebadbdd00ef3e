import { z } from 'zod';
import { email } from '../../domain/email-address.ts';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import {
  type AnswerState,
  type QuestionSource,
  type QuestionState,
} from '../../domain/questions/question-states.ts';
import { READY_REFUSAL } from '../../domain/questions/risks.ts';
import { parseClock } from '../../domain/time/parse-clock.ts';
import { buildParams, buildVersion } from '../builds/build.ts';

export const QUESTION_LENGTH = 1000;
export const ANSWER_LENGTH = 10_000;
export const ASKER_NAME_LENGTH = 80;
export const LINK_LENGTH = 500;
/** Parts that one question names. */
export const MOST_PARTS = 8;
/** How long a mailed link can make a question wait, in days. */
export const CONFIRM_DAYS = 7;
/** What the token of such a link is signed for. */
export const CONFIRM_PURPOSE = 'question';

const id = z.uuid('That is not an id of ours.');
export const questionParams = z.object({ workshop: z.string().min(1), question: id });
export const confirmParams = z.object({ question: id });
export { buildParams };

const question = runningText(QUESTION_LENGTH).refine((text) => text !== '', 'Write your question.');

const MOMENT = 'Write the moment as 3:41 or 1:02:03, or leave it empty.';
/** Seconds into the episode, as an address or a person writes them. */
const moment = z
  .string(MOMENT)
  .trim()
  .max(20, MOMENT)
  .default('')
  .transform((text, context) => {
    if (text === '') return null;
    const read = parseClock(text);
    if (read.ok) return read.value;
    context.addIssue({ code: 'custom', message: MOMENT });
    return z.NEVER;
  });

const EPISODE = 'Choose an episode of this build.';
const about = {
  episode: z
    .union(
      [
        z.literal('').transform(() => null),
        z.coerce.number(EPISODE).int(EPISODE).min(1, EPISODE).max(9999, EPISODE),
      ],
      EPISODE,
    )
    .nullable()
    .default(null),
  t: moment,
  note: z
    .union([z.literal('').transform(() => null), id], 'Ask about a note from the episode’s page.')
    .nullable()
    .default(null),
  parts: z
    .array(id, 'Choose the parts again.')
    .max(MOST_PARTS, `Choose at most ${String(MOST_PARTS)} parts.`)
    .default([]),
};

const MOMENT_OF_WHAT = { path: ['episode'], error: 'Say which episode the moment is in.' };
function hasEpisode({ t, episode }: { t: number | null; episode: number | null }): boolean {
  return t === null || episode !== null;
}

/** In a plain form each part is a box to tick, `part-ID`. */
function gatherParts(values: unknown): unknown {
  if (typeof values !== 'object' || values === null || 'parts' in values) return values;
  const parts = Object.keys(values).flatMap((key) => /^part-([\da-f-]{36})$/.exec(key)?.[1] ?? []);
  return { ...values, parts };
}

const TICK = 'Tick it or leave it.';
const tick = z.union([z.literal(['on', '1']).transform(() => true), z.boolean()], TICK).default(false);

const asked = z.object({
  ...about,
  text: question,
  /** Sent again after like questions were offered. */
  anyway: tick,
});
export const AskInput = z.preprocess(gatherParts, asked.refine(hasEpisode, MOMENT_OF_WHAT));
export type Ask = z.output<typeof AskInput>;

const name = lineOfText('Enter the name to show with it.', ASKER_NAME_LENGTH).refine(
  (line) => !/[<>]/.test(line),
  'Leave out angle brackets.',
);
export const AskByMailInput = z.preprocess(
  gatherParts,
  asked.extend({ email, name }).refine(hasEpisode, MOMENT_OF_WHAT),
);
export type AskByMail = z.output<typeof AskByMailInput>;

const NOT_WHOLE = 'The link is not whole. Open it from the mail again.';
export const ConfirmInput = z.object({ token: z.string(NOT_WHOLE).min(1, NOT_WHOLE).max(200, NOT_WHOLE) });

const LINK = 'Paste the whole address, such as https://video.example/watch/1.';
const foundAt = z
  .string(LINK)
  .trim()
  .max(LINK_LENGTH, `Keep the address to ${String(LINK_LENGTH)} characters.`)
  .refine((text) => /^https?:\/\/\S+$/.test(text) && URL.canParse(text), LINK);
export const PasteInput = z.preprocess(
  gatherParts,
  z.object({ ...about, text: question, name, foundAt }).refine(hasEpisode, MOMENT_OF_WHAT),
);
export type Paste = z.output<typeof PasteInput>;

/** The lists that questions are sorted into on the bench. */
export const QUESTION_LISTS = ['waiting', 'unanswered', 'answered', 'hidden'] as const;
export type QuestionList = (typeof QUESTION_LISTS)[number];

/** Where to go on after sorting one: the queue, or the question itself. */
const back = z.enum(['queue', 'question']).catch('question');

export const SetStateInput = z.object({
  state: z.enum(['waiting', 'shown', 'hidden'], 'Show it or hide it.'),
  version: buildVersion,
  back,
});
export const MarkInput = z.object({ back });
export const ClearRiskyInput = z.object({ version: buildVersion });
export const AssignInput = z.object({
  to: z.union([z.literal('').transform(() => null), id], 'Choose somebody of the team.').nullable(),
  version: buildVersion,
});
const OTHER = 'Choose the question that it repeats.';
export const MergeInput = z.object({ into: z.uuid(OTHER), version: buildVersion });
export const BarInput = z.object({ barred: tick });

const STALE = 'Open the page again.';
/** The buttons with the ready refusal send it instead of what was written: `ready` says as what. */
function takeReadyRefusal(values: unknown): unknown {
  if (typeof values !== 'object' || values === null) return values;
  const { ready, ...sent } = values as Record<string, unknown>;
  return ready === 'draft' || ready === 'answer' ? { ...sent, text: READY_REFUSAL, send: ready } : values;
}
export const AnswerInput = z.preprocess(
  takeReadyRefusal,
  z.object({
    text: runningText(ANSWER_LENGTH).refine((text) => text !== '', 'Write the answer.'),
    send: z.enum(['draft', 'answer'], 'Save the draft or send the answer.').default('answer'),
    /** Of the answer that the change saw; 0 when there was none. */
    version: z.coerce
      .number(STALE)
      .int(STALE)
      .min(0, STALE)
      .max(2 ** 31 - 1, STALE),
  }),
);

export const AskedAnswer = z.object({ done: z.literal(true) });
export const SortedAnswer = z.object({ id, version: z.number() });

/** A part that a question names. */
export interface AskedPart {
  readonly id: string;
  readonly number: string;
  readonly name: string;
  readonly inPlans: boolean;
}

/** The moment that a question is about, in an episode that is on show. */
export interface AskedMoment {
  readonly episodeId: string;
  readonly number: number;
  readonly title: string;
  /** Seconds from the start of the video. */
  readonly at: number;
}

interface QuestionCore {
  readonly id: string;
  readonly build: { readonly id: string; readonly slug: string; readonly name: string };
  readonly text: string;
  readonly askerName: string;
  readonly askedAt: Date;
  readonly moment: AskedMoment | null;
  readonly note: { readonly id: string; readonly text: string } | null;
  readonly parts: readonly AskedPart[];
  readonly risky: boolean;
  readonly risks: readonly string[];
}

/** A question as everyone sees it. */
export interface PublicQuestion extends QuestionCore {
  readonly answer: {
    readonly html: string;
    readonly by: string | null;
    readonly answeredAt: Date;
  } | null;
}

/** A question as its team sees it. */
export interface BenchQuestion extends QuestionCore {
  readonly state: QuestionState;
  readonly source: QuestionSource;
  readonly foundAt: string | null;
  /** For those who may see addresses. */
  readonly askerEmail: string | null;
  readonly urgentAt: Date | null;
  readonly assigned: { readonly id: string; readonly name: string } | null;
  readonly mergedInto: { readonly id: string; readonly text: string } | null;
  readonly version: number;
  readonly answerState: AnswerState;
  readonly answer: {
    readonly text: string;
    readonly html: string;
    readonly by: string | null;
    readonly answeredAt: Date | null;
    readonly byOwner: boolean;
    readonly version: number;
  } | null;
}
