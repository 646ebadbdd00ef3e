import { type z } from 'zod';
import { decodeText } from '../../../domain/csv/decode-text.ts';
import { readClipList } from '../../../domain/footage/read-clip-list.ts';
import { parseRate } from '../../../domain/time/rate.ts';
import { Invalid } from '../../../server/errors.ts';
import { UploadedFile } from '../../../server/http/uploaded-file.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { CLIP_LIST_BYTES, type ImportClipsInput, type KeptClips } from '../footage.ts';
import { announceFootage } from './announce-footage.ts';
import { keepClips } from './keep-clips.ts';

type Import = z.output<typeof ImportClipsInput> & { readonly build: string };

/**
 * Takes the clips of a list; what could not be read of it is told by line.
 * @throws Invalid at `file`, `text` or `rate` when nothing of it can be read
 */
export const importClips = verb(
  { may: 'footage.change' },
  async (context, input: Import): Promise<KeptClips> => {
    const { db, workshop, actor, now } = context;
    const build = await loadBuild(context, input.build);
    const rate = parseRate(input.rate);
    if (!rate.ok) throw new Invalid({ rate: `The frame rate: ${rate.error}` });
    const { text, field } = textOf(input);
    const list = readClipList(text, rate.value);
    const [first] = list.problems;
    if (list.clips.length === 0)
      throw new Invalid({ [field]: sayProblem(first ?? { line: 0, text: 'There is no clip in the list.' }) });
    const kept = await keepClips(
      db,
      {
        workshopId: workshop.id,
        buildId: build.id,
        addedBy: actor.kind === 'account' ? actor.id : null,
        now,
      },
      list.clips,
    );
    await announceFootage(context, build.id);
    return {
      ...kept,
      problems: [...list.problems, ...kept.problems].sort((a, b) => a.line - b.line),
    };
  },
);

function sayProblem({ line, text }: { readonly line: number; readonly text: string }): string {
  return line === 0 ? text : `Line ${String(line)}: ${text}`;
}

function textOf({ file, text }: Import): { text: string; field: 'file' | 'text' } {
  if (!(file instanceof UploadedFile)) {
    if (text.trim() === '') throw new Invalid({ file: 'Choose a file, or paste the list below.' });
    return { text, field: 'text' };
  }
  if (file.bytes.length > CLIP_LIST_BYTES) {
    const size = (file.bytes.length / 1024 / 1024).toFixed(1);
    throw new Invalid({
      file: `The list is ${size} MiB long; lists up to 6 MiB are taken. Nothing was taken.`,
    });
  }
  const decoded = decodeText(file.bytes);
  if (!decoded.ok) throw new Invalid({ file: decoded.error });
  return { text: decoded.value.text, field: 'file' };
}
