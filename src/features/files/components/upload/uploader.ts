import AwsS3, { type AwsBody } from '@uppy/aws-s3';
import Uppy from '@uppy/core';
import { callApi } from '../../../../client/call-api.ts';
import { paths } from '../../../../paths.ts';
import { ListedParts, partBytesFor, StartedUpload } from '../../file.ts';
import { type FilesOf } from '../../queries.ts';
import { fingerprintOf } from './fingerprint.ts';
import { openPartSigner } from './part-signer.ts';
import { PartRefused, patiently, PatienceEnded } from './patience.ts';

/** What we keep with a file that is being sent. */
export type UploadMeta = {
  /** The server's id of it. */
  fileId: string;
  /** Whether it waits for the network. */
  waiting: boolean;
  /** Why it stands still, when nobody paused it. */
  stopped: string | null;
  [key: string]: unknown;
};

export type FileUppy = Uppy<UploadMeta, AwsBody>;

/** Files sent side by side, counted in parts. */
const PARTS_AT_ONCE = 4;

type PartCall = {
  signature: { url: string };
  body: FormData | Blob;
  size?: number;
  onProgress: (event: { lengthComputable: boolean; loaded: number }) => void;
  onComplete: (etag: string) => void;
  signal?: AbortSignal;
};

/**
 * Sends files to the storage in signed parts. Progress counts whole parts that the storage has confirmed; nothing
 * is ever begun anew by itself.
 */
export function openUploader(of: FilesOf): FileUppy {
  const signer = openPartSigner(of);
  const api = (file: string, action: string) =>
    paths.api.inBuild(of.workshop, of.build, `files/${file}/${action}`);
  const uppy: FileUppy = new Uppy<UploadMeta, AwsBody>({ autoProceed: false });
  const urls = new Map<string, { uppyId: string; fileId: string; number: number; bytes: number }>();

  const waitingFor = (id: string) => (waiting: boolean) => {
    // It may have been cancelled while it waited.
    if (uppy.getState().files[id]) noteOf(uppy, id, { waiting });
  };

  async function putPart({ signature, body, size = 0, onProgress, onComplete, signal }: PartCall) {
    const part = urls.get(signature.url);
    if (!part) throw new Error('A part was sent to an address that is not ours.');
    let { url } = signature;
    const put = async () => {
      const answer = await fetch(url, { method: 'PUT', body, ...(signal && { signal }) });
      // Read to its end: a request that is left open is broken off with the upload, and looks like a fault.
      await answer.arrayBuffer();
      if (answer.ok) return answer.headers.get('etag') ?? '';
      if (answer.status === 403) url = await signer.sign(part.fileId, part.bytes, part.number, true);
      // An address that has run out is a passing thing once there is a new one.
      throw new PartRefused(answer.status === 403 ? 503 : answer.status);
    };
    try {
      const etag = await patiently(put, signal, waitingFor(part.uppyId));
      onProgress({ lengthComputable: true, loaded: size });
      onComplete(etag);
      return { ETag: etag };
    } catch (error) {
      if (error instanceof PatienceEnded) stop(uppy, part.uppyId, error.message);
      throw error;
    }
  }

  uppy.use(AwsS3<UploadMeta, AwsBody>, {
    shouldUseMultipart: true,
    limit: PARTS_AT_ONCE,
    // Trying again is done in here, where the network is asked first.
    retryDelays: [],
    getChunkSize: (file: { size: number }) => partBytesFor(file.size),
    // Announced before Uppy hears of it: the server knows a file again by itself.
    createMultipartUpload: ({ meta }) => ({ key: meta.fileId, uploadId: meta.fileId }),
    listParts: async ({ id, meta }) => {
      const answer = await patiently(() => callApi(api(meta.fileId, 'parts')), undefined, waitingFor(id));
      return ListedParts.parse(answer).parts.map(({ number, bytes, etag }) => ({
        PartNumber: number,
        Size: bytes,
        ETag: etag,
      }));
    },
    signPart: async (file, { partNumber: number, signal }) => {
      const { fileId } = file.meta;
      const bytes = file.size ?? 0;
      const url = await patiently(() => signer.sign(fileId, bytes, number), signal, waitingFor(file.id));
      urls.set(url, { uppyId: file.id, fileId, number, bytes });
      return { url, method: 'PUT' };
    },
    uploadPartBytes: putPart,
    completeMultipartUpload: async ({ id, meta }) => {
      await patiently(() => callApi(api(meta.fileId, 'complete'), {}), undefined, waitingFor(id));
      return {};
    },
    // Giving an upload up is a person's decision, and asked of our own server.
    abortMultipartUpload: () => undefined,
  });

  uppy.on('upload-error', (file, error) => {
    if (file) noteOf(uppy, file.id, { stopped: error.message, waiting: false });
  });
  return uppy;
}

function noteOf(uppy: FileUppy, id: string, change: Partial<UploadMeta>): void {
  uppy.setFileMeta(id, { ...uppy.getFile(id).meta, ...change });
}

/** Pauses a file because it cannot go on, and says why. */
function stop(uppy: FileUppy, id: string, sentence: string): void {
  const file = uppy.getState().files[id];
  if (!file || file.isPaused) return;
  noteOf(uppy, id, { stopped: sentence });
  uppy.pauseResume(id);
}

/**
 * Announces a chosen file and begins to send it, or what of it is missing.
 * @throws ApiError with the sentence why it is not taken
 */
export async function sendFile(uppy: FileUppy, of: FilesOf, data: File, fingerprint?: string): Promise<void> {
  const announced = await callApi(paths.api.inBuild(of.workshop, of.build, 'files'), {
    name: data.name,
    bytes: data.size,
    fingerprint: fingerprint ?? (await fingerprintOf(data)),
  });
  const { id: fileId } = StartedUpload.parse(announced);
  if (uppy.getFiles().some(({ meta }) => meta.fileId === fileId)) return;
  const id = uppy.addFile({
    name: data.name,
    type: data.type,
    data,
    meta: { fileId, waiting: false, stopped: null },
  });
  // With these Uppy asks which parts are there before it sends any.
  uppy.setFileState(id, { s3Multipart: { key: fileId, uploadId: fileId } } as object);
  void uppy.upload().catch(() => undefined);
}

/** Goes on with a file that was paused, or that stopped. */
export function goOn(uppy: FileUppy, id: string): void {
  const file = uppy.getFile(id);
  noteOf(uppy, id, { stopped: null });
  if (file.error != null) void uppy.retryUpload(id).catch(() => undefined);
  else if (file.isPaused) uppy.pauseResume(id);
}
