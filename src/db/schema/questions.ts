import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { QUESTION_SOURCES, QUESTION_STATES } from '../../domain/questions/question-states.ts';
import { idColumn, instant, timestamps, versionColumn } from '../columns.ts';
import { accounts } from './accounts.ts';
import { builds } from './builds.ts';
import { anchors, notes } from './notes.ts';
import { parts } from './parts.ts';
import { workshops } from './workshops.ts';

export const questionState = pgEnum('question_state', QUESTION_STATES);
export const questionSource = pgEnum('question_source', QUESTION_SOURCES);

export const questions = pgTable(
  'questions',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    buildId: uuid('build_id').notNull(),
    /** The moment it is about, where it is about one. */
    anchorId: uuid('anchor_id'),
    noteId: uuid('note_id'),
    text: text('text').notNull(),
    state: questionState('state').notNull().default('waiting'),
    source: questionSource('source').notNull(),
    askerId: uuid('asker_id').references(() => accounts.id),
    /** The name that is shown. */
    askerName: text('asker_name').notNull(),
    askerEmail: text('asker_email'),
    /** Where a comment was found. */
    foundAt: text('found_at'),
    /** Null until the link that was sent to the address has been opened: until then it is nobody's question. */
    confirmedAt: instant('confirmed_at'),
    risky: boolean('risky').notNull().default(false),
    /** What the rule found in it. */
    risks: text('risks')
      .array()
      .notNull()
      .default(sql`'{}'`),
    urgentAt: instant('urgent_at'),
    assignedTo: uuid('assigned_to').references(() => accounts.id),
    /** The question that it repeats, whose answer is its answer. */
    mergedInto: uuid('merged_into'),
    /** When its asker was told of the answer. */
    toldAt: instant('told_at'),
    version: versionColumn(),
    ...timestamps(),
  },
  (table) => [
    unique('questions_tenant_unique').on(table.workshopId, table.id),
    foreignKey({
      name: 'questions_build_fk',
      columns: [table.workshopId, table.buildId],
      foreignColumns: [builds.workshopId, builds.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'questions_anchor_fk',
      columns: [table.workshopId, table.anchorId],
      foreignColumns: [anchors.workshopId, anchors.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'questions_note_fk',
      columns: [table.workshopId, table.noteId],
      foreignColumns: [notes.workshopId, notes.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'questions_merged_fk',
      columns: [table.workshopId, table.mergedInto],
      foreignColumns: [table.workshopId, table.id],
    }).onDelete('cascade'),
    check('questions_not_into_itself', sql`${table.mergedInto} <> ${table.id}`),
    index('questions_build_index').on(table.buildId, table.state),
    index('questions_workshop_index').on(table.workshopId, table.state),
    index('questions_asker_index').on(table.askerId),
    index('questions_anchor_index').on(table.anchorId),
    index('questions_merged_index').on(table.mergedInto),
  ],
);

export const questionParts = pgTable(
  'question_parts',
  {
    workshopId: uuid('workshop_id').notNull(),
    questionId: uuid('question_id').notNull(),
    partId: uuid('part_id').notNull(),
    position: integer('position').notNull(),
  },
  (table) => [
    primaryKey({ name: 'question_parts_pkey', columns: [table.questionId, table.partId] }),
    foreignKey({
      name: 'question_parts_question_fk',
      columns: [table.workshopId, table.questionId],
      foreignColumns: [questions.workshopId, questions.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'question_parts_part_fk',
      columns: [table.workshopId, table.partId],
      foreignColumns: [parts.workshopId, parts.id],
    }).onDelete('restrict'),
    index('question_parts_part_index').on(table.partId),
  ],
);

/** What is answered to a question; a draft until it goes out. */
export const answers = pgTable(
  'answers',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id').notNull(),
    questionId: uuid('question_id').notNull(),
    /** The Markdown subset. */
    text: text('text').notNull(),
    answeredAt: instant('answered_at'),
    /** Whether the owner sent it out: nobody else's answer to a risky question stands. */
    byOwner: boolean('by_owner').notNull().default(false),
    writtenBy: uuid('written_by').references(() => accounts.id),
    version: versionColumn(),
    ...timestamps(),
  },
  (table) => [
    unique('answers_tenant_unique').on(table.workshopId, table.id),
    unique('answers_question_unique').on(table.questionId),
    foreignKey({
      name: 'answers_question_fk',
      columns: [table.workshopId, table.questionId],
      foreignColumns: [questions.workshopId, questions.id],
    }).onDelete('cascade'),
  ],
);

/** What an answer said before each change, with who changed it and when. */
export const answerVersions = pgTable(
  'answer_versions',
  {
    workshopId: uuid('workshop_id').notNull(),
    answerId: uuid('answer_id').notNull(),
    version: integer('version').notNull(),
    fields: jsonb('fields').notNull(),
    changedBy: uuid('changed_by').references(() => accounts.id),
    changedAt: instant('changed_at').notNull(),
  },
  (table) => [
    primaryKey({ name: 'answer_versions_pkey', columns: [table.answerId, table.version] }),
    foreignKey({
      name: 'answer_versions_answer_fk',
      columns: [table.workshopId, table.answerId],
      foreignColumns: [answers.workshopId, answers.id],
    }).onDelete('cascade'),
  ],
);

/** Viewers who may not ask in a workshop any more, by account and by address. */
export const barredAskers = pgTable(
  'barred_askers',
  {
    id: idColumn(),
    workshopId: uuid('workshop_id')
      .notNull()
      .references(() => workshops.id, { onDelete: 'cascade' }),
    accountId: uuid('account_id').references(() => accounts.id, { onDelete: 'cascade' }),
    email: text('email'),
    barredBy: uuid('barred_by').references(() => accounts.id),
    createdAt: timestamps().createdAt,
  },
  (table) => [
    check('barred_askers_one_way', sql`num_nonnulls(${table.accountId}, ${table.email}) = 1`),
    uniqueIndex('barred_askers_account_unique').on(table.workshopId, table.accountId),
    uniqueIndex('barred_askers_email_unique').on(table.workshopId, table.email),
  ],
);
