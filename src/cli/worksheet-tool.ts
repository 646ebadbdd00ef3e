import { right, wrong } from '../domain/answer.ts';
import { USUAL_CAUTIONS } from '../domain/cautions/usual-cautions.ts';
import {
  type Field,
  PLANNING_GUIDE,
  runWorksheet,
  type Worked,
  type Worksheet,
} from '../domain/worksheets/worksheet.ts';
import { readArguments } from './read-arguments.ts';
import { type Tool } from './tool.ts';

type Fields = Readonly<Record<string, Field<unknown>>>;

interface Presented<Result> {
  readonly usage: string;
  /** What is printed; without it the result, and what has to stand beside it. */
  readonly present?: (worked: Worked<Result>) => unknown;
}

/** The result, with what is off about it, what was not checked, and the usual cautions. */
function withCautions<Result extends object>(worked: Worked<Result>): unknown {
  const { result, warnings, limits, notChecked, cautions } = worked;
  return {
    ...result,
    warnings,
    limits,
    notChecked,
    cautions: cautions.map((topic) => USUAL_CAUTIONS[topic].words),
    guide: PLANNING_GUIDE,
  };
}

/** A worksheet as a tool: its inputs are the options, and the fields of a request, under the same names. */
export function worksheetTool<Inputs extends Fields, Result extends object>(
  sheet: Worksheet<Inputs, Result>,
  { usage, present = withCautions }: Presented<Result>,
): Tool {
  const known = Object.fromEntries(
    Object.entries(sheet.inputs).map(([name, { flag }]) => [
      name,
      { type: flag === true ? ('boolean' as const) : ('string' as const) },
    ]),
  );
  return {
    usage,
    fromArguments: (args) => {
      const read = readArguments(args, known, usage);
      if (!read.ok) return read;
      const { options, bare } = read.value;
      return bare.length === 0 ? right(options) : wrong(`Give every value by its option. Usage: ${usage}`);
    },
    run: (request) => {
      const worked = runWorksheet(sheet, request);
      return worked.ok ? right(present(worked.value)) : worked;
    },
  };
}
