import { inputArgs, type MediaFormat, READ_ONLY_LOCAL } from './media-input.ts';
import { RefusedFile } from './refused-file.ts';
import { runProgram } from '../run-program.ts';

export interface FfmpegCall {
  readonly path: string;
  readonly format: MediaFormat;
  /** Where to begin, in seconds. */
  readonly from?: number;
  /** Everything after the input. */
  readonly output: readonly string[];
  readonly seconds: number;
  readonly fileBytes: number;
  /** Told how far it is, in seconds of the result. */
  readonly onProgress?: (seconds: number) => void;
}

const BROKE =
  'The file could not be read to its end: it is damaged. Export it again as MP4 with H.264 and AAC, and send that.';

/** @throws RefusedFile when ffmpeg cannot make it, or takes too long */
export async function runFfmpeg(call: FfmpegCall): Promise<void> {
  const { onProgress } = call;
  const { status, timedOut } = await runProgram({
    program: 'ffmpeg',
    args: [
      '-v',
      'error',
      '-nostdin',
      '-y',
      ...(onProgress ? ['-progress', 'pipe:1'] : []),
      ...READ_ONLY_LOCAL,
      ...inputArgs(call.format),
      ...(call.from === undefined ? [] : ['-ss', call.from.toFixed(3)]),
      '-i',
      call.path,
      ...call.output,
    ],
    seconds: call.seconds,
    memoryBytes: 6 * 2 ** 30,
    fileBytes: call.fileBytes,
    ...(onProgress && {
      onLine: (line: string) => {
        const [, microseconds] = /^out_time_us=(\d+)/.exec(line) ?? [];
        if (microseconds !== undefined) onProgress(Number(microseconds) / 1e6);
      },
    }),
  });
  if (timedOut) {
    throw new RefusedFile(
      'Making a playable copy took too long and was stopped. Export the film as MP4 with H.264 at 1080 lines and send that.',
    );
  }
  if (status !== 0) throw new RefusedFile(BROKE);
}
