import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { frameToSeconds } from '../../domain/time/frames.ts';
import { parseRate, type Rate } from '../../domain/time/rate.ts';
import { formatTimecode, parseTimecode, type Timecode } from '../../domain/time/timecode.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE = 'timecode --rate 30000/1001 [--drop] 1800|"00:01:00;02"';

const TimecodeRequest = z.object({
  rate: z.union([z.string(), z.number()], 'Give the rate, such as 25 or 30000/1001.').transform(String),
  drop: z.boolean('drop is true or false.').optional(),
  frame: z.int('A frame is a whole number.').min(0, 'A frame is not below zero.').optional(),
  timecode: z.string('A timecode is text, such as 00:01:00;02.').optional(),
});
type Asked = z.output<typeof TimecodeRequest>;

function findFrame(asked: Asked, rate: Rate): Answer<Timecode> {
  const { frame, timecode, drop } = asked;
  if ((frame === undefined) === (timecode === undefined)) return wrong('Give either a frame or a timecode.');
  if (timecode !== undefined) return parseTimecode(timecode, rate, drop);
  // The first label is read for its error: whether the rate has such labels at all.
  const zero = parseTimecode('00:00:00:00', rate, drop);
  return zero.ok ? right({ frame: frame ?? 0, drop: drop ?? false }) : zero;
}

/** The label of a frame, or the frame of a label, with its seconds from label 00:00:00:00. */
export const timecodeTool: Tool = {
  usage: USAGE,
  fromArguments: (args) => {
    const read = readArguments(args, { rate: { type: 'string' }, drop: { type: 'boolean' } }, USAGE);
    if (!read.ok) return read;
    const { options, bare } = read.value;
    const [what, ...more] = bare;
    if (what === undefined || more.length > 0) return wrong(`Give one frame or timecode. Usage: ${USAGE}`);
    return right({ ...options, ...(/^\d+$/.test(what) ? { frame: Number(what) } : { timecode: what }) });
  },
  run: (request) => {
    const asked = readRequest(TimecodeRequest, request);
    if (!asked.ok) return asked;
    const rate = parseRate(asked.value.rate);
    if (!rate.ok) return rate;
    const found = findFrame(asked.value, rate.value);
    if (!found.ok) return found;
    const { frame, drop } = found.value;
    return right({
      frame,
      timecode: formatTimecode(frame, rate.value, drop),
      seconds: frameToSeconds(frame, rate.value),
    });
  },
};
