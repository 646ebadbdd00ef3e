import { type Answer } from '../domain/answer.ts';

/** What is asked of a tool: the fields of a batch request, or the options of a command under the same names. */
export type Request = Readonly<Record<string, unknown>>;

/** One shop computation for scripts. */
export interface Tool {
  /** How it is called, for the sentence after a wrong call. */
  readonly usage: string;
  /**
   * The request that a command's arguments make.
   * @param read the text of a file that an argument names
   */
  readonly fromArguments: (args: readonly string[], read: ReadFile) => Answer<Request>;
  /** What has to be loaded before the first run. */
  readonly prepare?: () => Promise<void>;
  readonly run: (request: Request) => Answer<unknown>;
  /** What a command prints, where that is not the JSON of the value: a document in its own form. */
  readonly print?: (value: unknown) => string;
}

export type ReadFile = (path: string) => Answer<string>;
