import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useUppyState } from '@uppy/react';
import { useEffect, useState } from 'react';
import { Notice } from '../../../../components/Notice.tsx';
import { type FileItem } from '../../file.ts';
import { fileMutation, type FilesOf, filesQuery } from '../../queries.ts';
import { DropZone } from './DropZone.tsx';
import { UnfinishedRow } from './UnfinishedRow.tsx';
import { goOn, openUploader, sendFile } from './uploader.ts';
import { UploadRow } from './UploadRow.tsx';

type Refusal = { readonly name: string; readonly sentence: string };

/** Sends files, and lists those that are under way or were left unfinished. */
export function UploadPanel({ of, items }: { readonly of: FilesOf; readonly items: readonly FileItem[] }) {
  const [uppy] = useState(() => openUploader(of));
  const sent = Object.values(useUppyState(uppy, (state) => state.files));
  const [refusals, setRefusals] = useState<readonly Refusal[]>([]);
  const client = useQueryClient();
  const abandon = useMutation(fileMutation(of, 'abandon'));
  const { queryKey } = filesQuery(of);

  useEffect(() => {
    const listAnew = () => client.invalidateQueries({ queryKey });
    const done = (file: { id: string } | undefined) => {
      void listAnew().then(() => {
        if (file) uppy.removeFile(file.id);
      });
    };
    uppy.on('upload-success', done);
    return () => {
      uppy.off('upload-success', done);
    };
  }, [uppy, client, queryKey]);

  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (uppy.getFiles().some(({ progress }) => progress.uploadComplete !== true)) event.preventDefault();
    };
    window.addEventListener('beforeunload', warn);
    return () => {
      window.removeEventListener('beforeunload', warn);
    };
  }, [uppy]);

  async function send(file: File, fingerprint?: string) {
    setRefusals((all) => all.filter(({ name }) => name !== file.name));
    try {
      await sendFile(uppy, of, file, fingerprint);
    } catch (error) {
      const { message = '', fields = {} } = error as { message?: string; fields?: Record<string, string> };
      const sentence = Object.values(fields)[0] ?? message;
      setRefusals((all) => [...all, { name: file.name, sentence }]);
    }
  }

  async function giveUp(fileId: string, uppyId?: string) {
    if (uppyId !== undefined) uppy.removeFile(uppyId);
    await abandon.mutateAsync(fileId).catch(() => undefined);
    await client.invalidateQueries({ queryKey });
  }

  const here = new Set(sent.map(({ meta }) => meta.fileId));
  const unfinished = items.filter(({ id, state }) => state === 'uploading' && !here.has(id));
  return (
    <section aria-labelledby="send" className="grid gap-3">
      <h2 id="send" className="text-lg">
        Send files
      </h2>
      <DropZone onFiles={(files) => void Promise.all(files.map((file) => send(file)))} />
      {refusals.map(({ name, sentence }) => (
        <Notice key={name} tone="error" title={name} live>
          {sentence}
        </Notice>
      ))}
      {sent.length + unfinished.length > 0 && (
        <ul aria-label="On their way" className="border border-line bg-sheet">
          {sent.map(({ id, name, size, isPaused, progress, meta }) => (
            <UploadRow
              key={id}
              name={name}
              file={{
                bytes: size ?? 0,
                confirmed: Number(progress.bytesUploaded) || 0,
                paused: isPaused === true,
                waiting: meta.waiting,
                stopped: meta.stopped,
              }}
              onPause={() => {
                uppy.pauseResume(id);
              }}
              onGoOn={() => {
                goOn(uppy, id);
              }}
              onGiveUp={() => void giveUp(meta.fileId, id)}
            />
          ))}
          {unfinished.map((item) => (
            <UnfinishedRow
              key={item.id}
              item={item}
              onChosen={(file, fingerprint) => void send(file, fingerprint)}
              onGiveUp={() => void giveUp(item.id)}
            />
          ))}
        </ul>
      )}
    </section>
  );
}
