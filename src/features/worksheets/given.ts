import { type Field } from '../../domain/worksheets/worksheet.ts';

type Fields = Readonly<Record<string, Field<unknown>>>;

/** The longest text of one input, and of one that takes several lines. */
export const INPUT_LENGTH = 200;
export const LINES_LENGTH = 4000;

/** What was typed or chosen, by the name of its input; nothing for what was not. */
export type Typed = Readonly<Record<string, string>>;

/** The inputs of a worksheet in the query of an address. */
export function typedIn(query: URLSearchParams, inputs: Fields): Typed {
  return Object.fromEntries(
    Object.entries(inputs).flatMap(([name, { lines }]) => {
      const text = query.get(name)?.slice(0, lines === true ? LINES_LENGTH : INPUT_LENGTH) ?? '';
      return text === '' ? [] : [[name, text]];
    }),
  );
}

/** Typed inputs as a worksheet reads them. */
export function toGiven(typed: Typed, inputs: Fields): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(inputs).map(([name, { flag }]) => [
      name,
      flag === true ? typed[name] === 'yes' : typed[name],
    ]),
  );
}

/** The query that carries them. */
export function toQuery(typed: Typed): string {
  const given = Object.entries(typed).filter(([, text]) => text !== '');
  return given.length === 0 ? '' : `?${new URLSearchParams(given).toString()}`;
}

/** What is wrong with each input that was typed in. */
export function findErrors(typed: Typed, inputs: Fields): Typed {
  const given = toGiven(typed, inputs);
  return Object.fromEntries(
    Object.entries(inputs).flatMap(([name, field]) => {
      if ((typed[name] ?? '') === '') return [];
      const read = field.read(given[name]);
      return read.ok ? [] : [[name, read.error]];
    }),
  );
}

/** The labels of inputs that are needed and not there. */
export function findMissing(typed: Typed, inputs: Fields): readonly string[] {
  return Object.entries(inputs).flatMap(([name, { label, optional, flag }]) =>
    optional === true || flag === true || (typed[name] ?? '') !== '' ? [] : [label],
  );
}
