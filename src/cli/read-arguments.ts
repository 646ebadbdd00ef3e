import { parseArgs, type ParseArgsConfig } from 'node:util';
import { type Answer, right, wrong } from '../domain/answer.ts';

/** Options by name, and what stands without one. */
export interface Arguments {
  readonly options: Readonly<Record<string, string | boolean | string[] | undefined>>;
  readonly bare: readonly string[];
}

type Known = NonNullable<ParseArgsConfig['options']>;

/**
 * A command's arguments.
 * @param known the options of the tool; whatever else begins with - is an error
 */
export function readArguments(args: readonly string[], known: Known, usage: string): Answer<Arguments> {
  try {
    const { values, positionals } = parseArgs({ args: [...args], options: known, allowPositionals: true });
    return right({ options: values as Arguments['options'], bare: positionals });
  } catch {
    return wrong(`These arguments are not understood. Usage: ${usage}`);
  }
}
