import { frameTimesOf, MOST_FRAME_TIMES } from '../../domain/footage/frame-times.ts';
import { runProgram } from '../run-program.ts';
import { inputArgs, type MediaFormat, READ_ONLY_LOCAL } from './media-input.ts';

/** When the frames of a film begin. */
export interface FrameTimes {
  /** In milliseconds since the first; null where they come evenly, or were not read. */
  readonly times: readonly number[] | null;
  /** Whether they were left unread: there are too many, or their packets could not be read. */
  readonly unread: boolean;
}

/** As long as reading a film of many hours from a slow disk takes. */
const PATIENCE_SECONDS = 1800;

/** Reads when each frame of a local film is shown with ffprobe, by its packets; nothing is decoded. */
export async function readFrameTimes(path: string, format: MediaFormat): Promise<FrameTimes> {
  const seconds: number[] = [];
  const { status } = await runProgram({
    program: 'ffprobe',
    args: [
      '-v',
      'error',
      ...READ_ONLY_LOCAL,
      ...inputArgs(format),
      '-select_streams',
      'v:0',
      '-read_intervals',
      `%+#${String(MOST_FRAME_TIMES + 1)}`,
      '-show_entries',
      'packet=pts_time,flags',
      '-of',
      'csv=print_section=0',
      path,
    ],
    seconds: PATIENCE_SECONDS,
    memoryBytes: 4 * 2 ** 30,
    onLine: (line) => {
      const [, shown, flags] = /^(-?\d+(?:\.\d+)?),(.*)$/.exec(line) ?? [];
      // What an edit list leaves out is flagged to be discarded, and never shown.
      if (shown !== undefined && flags?.includes('D') !== true) seconds.push(Number(shown));
    },
  });
  if (status !== 0 || seconds.length > MOST_FRAME_TIMES) return { times: null, unread: true };
  return { times: frameTimesOf(seconds), unread: false };
}
