import { buffer } from 'node:stream/consumers';
import { join } from 'node:path';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { heicToPng } from '../../../server/media/heic-to-png.ts';
import { makePhotoCopies } from '../../../server/media/picture-copies.ts';
import { readExifTime } from '../../../server/media/read-exif.ts';
import { RefusedFile } from '../../../server/media/refused-file.ts';
import { rewritePdf } from '../../../server/media/rewrite-pdf.ts';
import { SNIFF_BYTES, type Sniffed, sniffFile } from '../../../server/media/sniff-file.ts';
import { type Services } from '../../../server/services.ts';
import { fetchToFile } from '../../../server/storage/local-copy.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { type CheckedFile, checkFile } from './check-file.ts';
import { acceptAs, keepVariants } from './keep-variants.ts';
import { assumeZone } from './camera-time.ts';

const PHOTO_TYPES = { jpeg: 'image/jpeg', png: 'image/png', webp: 'image/webp', heic: 'image/heic' } as const;
const TEXT_TYPES = {
  csv: 'text/csv; charset=utf-8',
  vtt: 'text/vtt; charset=utf-8',
  srt: 'application/x-subrip; charset=utf-8',
  edl: 'text/plain; charset=utf-8',
  otio: 'application/json; charset=utf-8',
} as const;

const MOST_PHOTO_BYTES = 300 * 2 ** 20;
const MOST_TEXT_BYTES = 20 * 2 ** 20;

/** Looks at an uploaded file; photos, documents and texts are taken in at once, films and sound wait their turn. */
export const acceptFile: JobHandler = (services, ids) =>
  checkFile(services, ids['fileId'] ?? '', async (file, folder) => {
    const sniffed = sniffFile(await readHead(services, file), file.name);
    if (sniffed.kind === 'media') {
      await services.jobs.enqueue(services.db, 'media-found', { fileId: file.id });
      return;
    }
    const limit = sniffed.kind === 'text' ? MOST_TEXT_BYTES : MOST_PHOTO_BYTES;
    if (file.bytes > limit) {
      throw new RefusedFile(
        `A file of this kind may have ${String(limit / 2 ** 20)} MiB. Save it smaller and send that.`,
      );
    }
    const path = join(folder, 'original');
    await fetchToFile(services.storage, incomingKey(file.workshopId, file.id), file.bytes, path);
    if (sniffed.kind === 'photo') await acceptPhoto(services, file, sniffed.format, path);
    else if (sniffed.kind === 'document') await acceptPdf(services, file, path);
    else {
      const contentType = TEXT_TYPES[sniffed.format];
      await acceptAs(services, file, { kind: 'text', contentType, probe: { format: sniffed.format } });
    }
  });

async function readHead({ storage }: Services, file: CheckedFile): Promise<Buffer> {
  const key = incomingKey(file.workshopId, file.id);
  const size = await storage.sizeOf(key);
  if (size === null) throw new RefusedFile('What was sent got lost on our side. Send the file again.');
  if (size !== file.bytes)
    throw new RefusedFile('What arrived is not as long as the file was said to be. Send the file again.');
  return buffer(await storage.read(key, { first: 0, last: Math.min(SNIFF_BYTES, size) - 1 }));
}

async function acceptPhoto(
  services: Services,
  file: CheckedFile,
  format: Extract<Sniffed, { kind: 'photo' }>['format'],
  path: string,
): Promise<void> {
  let readable = path;
  if (format === 'heic') {
    readable = `${path}.png`;
    await heicToPng(path, readable);
  }
  const { copies, width, height, exif } = await makePhotoCopies(readable);
  await keepVariants(services, file, copies);
  const time = exif === null ? null : readExifTime(exif);
  await acceptAs(services, file, {
    kind: 'photo',
    contentType: PHOTO_TYPES[format],
    width,
    height,
    probe: time === null ? {} : { camera: assumeZone(time, file.timeZone) },
  });
}

async function acceptPdf(services: Services, file: CheckedFile, path: string): Promise<void> {
  const contentType = 'application/pdf';
  await keepVariants(services, file, [{ variant: 'document', contentType, bytes: await rewritePdf(path) }]);
  await acceptAs(services, file, { kind: 'document', contentType, probe: {} });
}
