import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { readAllCues } from '../../domain/captions/read-captions.ts';
import { readCsv } from '../../domain/csv/read-csv.ts';
import { type Finding, type ListedPart } from '../../domain/findings/finding.ts';
import { readFindings } from '../../domain/findings/read-findings.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE =
  'captions --parts parts.csv [--units mm|in] [--mil mm|thou] [--ton tonne|short|long] captions.vtt';

const CaptionsRequest = z.object({
  captions: z.string('Give the captions as the text of a WebVTT or SubRip file.'),
  /** A list with the columns number, name and aliases, as text; or its rows. */
  parts: z.union(
    [
      z.string(),
      z.array(
        z.object({
          number: z.union([z.string(), z.number()]).transform(String),
          name: z.string(),
          aliases: z.union([z.array(z.string()), z.string().transform(cutAliases)]).default([]),
        }),
      ),
    ],
    'Give the parts as a list of number, name and aliases.',
  ),
  units: z.enum(['mm', 'in'], 'Sizes without a unit are in mm or in.').optional(),
  mil: z.enum(['mm', 'thou'], 'A mil is an mm or a thou.').optional(),
  ton: z.enum(['tonne', 'short', 'long'], 'A ton is a tonne, short or long.').optional(),
});
type Asked = z.output<typeof CaptionsRequest>;

function cutAliases(text: string): string[] {
  return text
    .split(';')
    .map((alias) => alias.trim())
    .filter((alias) => alias !== '');
}

function readParts(parts: Asked['parts']): Answer<readonly ListedPart[]> {
  if (typeof parts !== 'string') return right(parts);
  // Aliases are parted by semicolons, which is therefore not what stands between the cells.
  const list = readCsv(parts, parts.split('\n', 1)[0]?.includes('\t') === true ? '\t' : ',');
  if (!list.ok) return list;
  const [head, ...rows] = list.value.rows;
  const names = head?.cells.map((cell) => cell.toLowerCase()) ?? [];
  const [number, name, aliases] = ['number', 'name', 'aliases'].map((column) => names.indexOf(column));
  if (number === undefined || name === undefined || aliases === undefined || number < 0 || name < 0)
    return wrong('The list of parts needs the columns number and name, and may have aliases.');
  return right(
    rows
      .map(({ cells }) => ({
        number: cells[number] ?? '',
        name: cells[name] ?? '',
        aliases: cutAliases(cells[aliases] ?? ''),
      }))
      .filter((part) => part.number !== ''),
  );
}

/** A finding as it is printed: the words, or a setting's own text, under `text`. */
function print({ kind, span, values, what, text, topic, part, rule, sure }: Finding) {
  return {
    cue: span.from.cue,
    kind,
    from: Math.round(span.seconds[0] * 1000) / 1000,
    to: Math.round(span.seconds[1] * 1000) / 1000,
    text: text ?? span.words,
    ...(text === undefined ? {} : { words: span.words }),
    ...(values === undefined ? {} : { values: values.map(({ value, unit }) => ({ value, unit })) }),
    part,
    ...(what === undefined ? {} : { what }),
    ...(topic === undefined ? {} : { topic }),
    rule,
    sure,
  };
}

/** What a careful person would note from captions. */
export const captionsTool: Tool = {
  usage: USAGE,
  fromArguments: (args, read) => {
    const text = { type: 'string' } as const;
    const found = readArguments(args, { parts: text, units: text, mil: text, ton: text }, USAGE);
    if (!found.ok) return found;
    const { parts: path, ...options } = found.value.options;
    const [file, ...more] = found.value.bare;
    if (typeof path !== 'string') return wrong(`Say which parts with --parts. Usage: ${USAGE}`);
    if (file === undefined || more.length > 0) return wrong(`Give one file of captions. Usage: ${USAGE}`);
    const parts = read(path);
    if (!parts.ok) return parts;
    const captions = read(file);
    return captions.ok ? right({ ...options, parts: parts.value, captions: captions.value }) : captions;
  },
  run: (request) => {
    const asked = readRequest(CaptionsRequest, request);
    if (!asked.ok) return asked;
    const parts = readParts(asked.value.parts);
    if (!parts.ok) return parts;
    const captions = readAllCues(asked.value.captions);
    if (!captions.ok) return captions;
    const { units, mil, ton } = asked.value;
    const dialect = {
      ...(units === undefined ? {} : { units }),
      ...(mil === undefined ? {} : { mil }),
      ...(ton === undefined ? {} : { ton }),
    };
    const { cues } = captions.value;
    return right({ cues: cues.length, findings: readFindings(cues, parts.value, dialect).map(print) });
  },
};
