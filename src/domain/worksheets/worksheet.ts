import { type Answer, right, wrong } from '../answer.ts';
import { type CautionTopic } from '../cautions/topics.ts';

/** One line of the working: the formula, the numbers put in with their units, and what comes out. */
export interface WorkingStep {
  readonly what: string;
  readonly formula: string;
  readonly numbers: string;
  readonly value: string;
}

/**
 * What a number or rule rests on. Published: printed in the source named. Practice: what shops do, without a single
 * source. Memory: a published text that was not at hand when this was written; check it before relying on it.
 */
export interface Source {
  readonly title: string;
  readonly clause: string;
  readonly standing: 'published' | 'practice' | 'memory';
}

/** What a worksheet gives: the result with everything that has to stand beside it. */
export interface Worked<Result> {
  readonly result: Result;
  readonly working: readonly WorkingStep[];
  readonly sources: readonly Source[];
  /** Where the method holds, and what it takes for given. */
  readonly limits: readonly string[];
  readonly notChecked: readonly string[];
  /** About these inputs: something is off, or missing. */
  readonly warnings: readonly string[];
  /** Whose usual cautions stand beside it. */
  readonly cautions: readonly CautionTopic[];
}

/** What stands beside every worksheet. */
export const PLANNING_GUIDE =
  'A guide for planning, not a design approval. Local codes and a licensed person decide.';

/** One input: what it is called, what a maker may type, and how that is read. */
export interface Field<Value> {
  readonly label: string;
  /** What may be typed, as an example. */
  readonly example: string;
  /** A yes or no, which is given by its name alone. */
  readonly flag?: true;
  /** It takes several lines. */
  readonly lines?: true;
  /** The words that may be chosen from. */
  readonly choices?: readonly string[];
  /** It may be left out. */
  readonly optional?: true;
  /** What it is taken as when it is left out, where that is something, as a maker reads it. */
  readonly otherwise?: string;
  /** How a text was read, in both systems; null for a text that cannot be read. */
  readonly readBack?: (text: string) => string | null;
  readonly read: (given: unknown) => Answer<Value>;
}

type Fields = Readonly<Record<string, Field<unknown>>>;

/** What the inputs of a worksheet are once they are read. */
export type ValuesOf<Inputs extends Fields> = {
  readonly [Name in keyof Inputs]: Inputs[Name] extends Field<infer Value> ? Value : never;
};

/** A shop computation: pure, with its inputs named. It refuses what is out of its range with a sentence. */
export interface Worksheet<Inputs extends Fields, Result> {
  readonly id: string;
  readonly title: string;
  readonly inputs: Inputs;
  readonly compute: (values: ValuesOf<Inputs>) => Answer<Worked<Result>>;
}

/** A worksheet with its types inferred. */
export function worksheet<Inputs extends Fields, Result>(
  definition: Worksheet<Inputs, Result>,
): Worksheet<Inputs, Result> {
  return definition;
}

/**
 * The inputs as given (texts, numbers, flags), read by their fields.
 * @returns the first that is wrong, with its label before the sentence
 */
export function readInputs<Inputs extends Fields>(
  inputs: Inputs,
  given: Readonly<Record<string, unknown>>,
): Answer<ValuesOf<Inputs>> {
  const values: Record<string, unknown> = {};
  for (const [name, field] of Object.entries(inputs)) {
    const read = field.read(Object.hasOwn(given, name) ? given[name] : undefined);
    if (!read.ok) return wrong(`${field.label}: ${read.error}`);
    values[name] = read.value;
  }
  return right(values as ValuesOf<Inputs>);
}

/** A worksheet on inputs as given. */
export function runWorksheet<Inputs extends Fields, Result>(
  sheet: Worksheet<Inputs, Result>,
  given: Readonly<Record<string, unknown>>,
): Answer<Worked<Result>> {
  const values = readInputs(sheet.inputs, given);
  return values.ok ? sheet.compute(values.value) : values;
}
