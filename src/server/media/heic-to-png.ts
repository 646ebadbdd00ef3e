import { access, constants } from 'node:fs/promises';
import { RefusedFile } from './refused-file.ts';
import { runProgram } from '../run-program.ts';

// The older and the newer name of the program in Debian's libheif.
const PROGRAMS = ['/usr/bin/heif-dec', '/usr/bin/heif-convert'];

/**
 * Unpacks a photo of a phone into a PNG beside it, turned upright already.
 * @throws RefusedFile when it is damaged, or where the program for it is not installed
 */
export async function heicToPng(path: string, output: string): Promise<void> {
  const program = await findProgram();
  if (program === null) {
    throw new RefusedFile(
      'HEIC photos cannot be read on this installation. Set the phone to save the most compatible form, or save the photo as JPEG, and send that.',
    );
  }
  const { status, timedOut } = await runProgram({
    program,
    args: [path, output],
    seconds: 60,
    memoryBytes: 3 * 2 ** 30,
    fileBytes: 1024 * 2 ** 20,
  });
  if (timedOut || status !== 0) {
    throw new RefusedFile(
      'The photo is damaged or was cut off. Send it again, or save it as JPEG and send that.',
    );
  }
}

async function findProgram(): Promise<string | null> {
  for (const program of PROGRAMS) {
    try {
      await access(program, constants.X_OK);
      return program;
    } catch {
      // The other one, then.
    }
  }
  return null;
}
