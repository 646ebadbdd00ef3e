import { buffer } from 'node:stream/consumers';
import {
  EncryptedPDFError,
  PDFArray,
  PDFDict,
  PDFDocument,
  PDFName,
  type PDFObject,
  PDFRawStream,
  PDFRef,
  PDFStream,
} from 'pdf-lib';
import { stripJpeg } from './strip-jpeg.ts';

/** Said by their statuses to the process that waits. */
const DAMAGED = 2;
const LOCKED = 3;

/** Who made it, with what, where and when; programs; other files inside; what happens by itself. */
const DROPPED = [
  'Metadata',
  'PieceInfo',
  'LastModified',
  'JS',
  'JavaScript',
  'EmbeddedFiles',
  'AF',
  'OpenAction',
  'AA',
];

function clean(object: PDFObject): void {
  if (object instanceof PDFRawStream) clean(object.dict);
  if (!(object instanceof PDFDict)) return;
  for (const name of DROPPED) object.delete(PDFName.of(name));
  for (const value of object.values()) {
    if (value instanceof PDFDict) clean(value);
    if (value instanceof PDFArray) value.asArray().forEach(clean);
  }
}

/** Photos inside a PDF carry what the camera wrote, place included. */
function withoutExif(object: PDFObject): PDFRawStream | null {
  if (!(object instanceof PDFRawStream)) return null;
  if (object.dict.get(PDFName.of('Filter'))?.toString() !== '/DCTDecode') return null;
  const bytes = stripJpeg(object.contents);
  object.dict.set(PDFName.of('Length'), object.dict.context.obj(bytes.length));
  return PDFRawStream.of(object.dict, bytes);
}

/** Takes out what nothing leads to any more: what was dropped above would otherwise still be written. */
function dropUnreachable({ context, catalog }: PDFDocument): void {
  const seen = new Set<PDFRef>();
  const waiting: PDFObject[] = [catalog];
  const { Root } = context.trailerInfo;
  if (Root) waiting.push(Root);
  for (let object = waiting.pop(); object !== undefined; object = waiting.pop()) {
    if (object instanceof PDFRef) {
      if (seen.has(object)) continue;
      seen.add(object);
      const target = context.lookup(object);
      if (target) waiting.push(target);
    } else if (object instanceof PDFArray) {
      waiting.push(...object.asArray());
    } else if (object instanceof PDFDict) {
      waiting.push(...object.values());
    } else if (object instanceof PDFStream) {
      waiting.push(object.dict);
    }
  }
  for (const [reference] of context.enumerateIndirectObjects()) {
    if (!seen.has(reference)) context.delete(reference);
  }
}

async function rewrite(bytes: Uint8Array): Promise<Uint8Array> {
  const document = await PDFDocument.load(bytes, { updateMetadata: false, throwOnInvalidObject: true });
  // Drawings without a page are no drawings; this also reads the tree of pages once.
  if (document.getPageCount() === 0) throw new Error('There are no pages.');
  const { context } = document;
  delete context.trailerInfo.Info;
  for (const [reference, object] of context.enumerateIndirectObjects()) {
    clean(object);
    const bare = withoutExif(object);
    if (bare) context.assign(reference, bare);
  }
  dropUnreachable(document);
  return document.save({ useObjectStreams: true, addDefaultPage: false, updateFieldAppearances: false });
}

try {
  const made = await rewrite(await buffer(process.stdin));
  process.stdout.write(made);
} catch (error) {
  process.exitCode = error instanceof EncryptedPDFError ? LOCKED : DAMAGED;
}
