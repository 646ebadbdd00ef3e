import { QueryClientProvider, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../../../components/Button.tsx';
import { EmptyState } from '../../../components/EmptyState.tsx';
import { ErrorState } from '../../../components/ErrorState.tsx';
import { Notice } from '../../../components/Notice.tsx';
import { queryClient } from '../../../client/query-client.ts';
import { type FileItem } from '../file.ts';
import { fileMutation, type FilesOf, filesQuery } from '../queries.ts';
import { FileRow } from './FileRow.tsx';
import { PhotoCells } from './PhotoCells.tsx';
import { UploadPanel } from './upload/UploadPanel.tsx';

type FootageDeskProps = FilesOf & { readonly mayChange: boolean };

/** A build's footage: sending it, watching it being looked at, and what is there. */
export function FootageDesk(props: FootageDeskProps) {
  return (
    <QueryClientProvider client={queryClient()}>
      <Footage {...props} />
    </QueryClientProvider>
  );
}

function Footage({ workshop, build, mayChange }: FootageDeskProps) {
  const of = { workshop, build };
  const { data: items, isError, refetch } = useQuery(filesQuery(of));
  const client = useQueryClient();
  const [deleted, setDeleted] = useState<FileItem | null>(null);
  const listAnew = () => client.invalidateQueries({ queryKey: filesQuery(of).queryKey });
  const remove = useMutation({ ...fileMutation(of, 'delete'), onSuccess: listAnew });
  const restore = useMutation({ ...fileMutation(of, 'restore'), onSuccess: listAnew });

  if (!items) {
    if (!isError) return <p className="text-ink-soft">Getting the list of files.</p>;
    return (
      <ErrorState
        title="The list of files did not come."
        kept="The files themselves are where they were."
        action={<Button onClick={() => void refetch()}>Ask again</Button>}
      />
    );
  }
  const onDelete = mayChange
    ? (item: FileItem) => {
        remove.mutate(item.id, {
          onSuccess: () => {
            setDeleted(item);
          },
        });
      }
    : undefined;
  const there = items.filter(({ state }) => state !== 'uploading');
  const groups = [
    { title: 'Not taken', items: there.filter(({ state }) => state === 'failed') },
    { title: 'Being looked at', items: there.filter(({ state }) => state === 'checking') },
    { title: 'Clips', items: there.filter(({ kind, state }) => state === 'ready' && kind === 'video') },
    { title: 'Sound', items: there.filter(({ kind }) => kind === 'sound') },
    {
      title: 'Documents and lists',
      items: there.filter(({ kind }) => kind === 'document' || kind === 'text'),
    },
  ];
  const photos = there.filter(({ kind }) => kind === 'photo');
  return (
    <div className="grid gap-6">
      {mayChange && <UploadPanel of={of} items={items} />}
      {deleted !== null && (
        <Notice
          live
          title={`${deleted.name} is deleted.`}
          action={
            <Button
              size="small"
              onClick={() => {
                restore.mutate(deleted.id);
                setDeleted(null);
              }}
            >
              Bring it back
            </Button>
          }
        >
          It can be brought back for 30 days, and takes up space until then.
        </Notice>
      )}
      {remove.isError && (
        <Notice tone="error" live>
          {remove.error.message}
        </Notice>
      )}
      {there.length === 0 && (
        <EmptyState title="Clips, photos and sound of this build go here.">
          Each clip gets a filmstrip and a copy that plays anywhere; place and device are taken out of every
          copy.
        </EmptyState>
      )}
      {groups
        .filter(({ items: some }) => some.length > 0)
        .map(({ title, items: some }) => (
          <section key={title} aria-label={title} className="grid gap-2">
            <h2 className="flex items-baseline justify-between gap-4 text-lg">
              {title} <span className="font-mono text-sm text-ink-soft">{some.length}</span>
            </h2>
            <ul className="border border-line bg-sheet">
              {some.map((item) => (
                <FileRow
                  key={item.id}
                  item={item}
                  onDelete={
                    onDelete &&
                    (() => {
                      onDelete(item);
                    })
                  }
                />
              ))}
            </ul>
          </section>
        ))}
      {photos.length > 0 && (
        <section aria-label="Photos" className="grid gap-2">
          <h2 className="flex items-baseline justify-between gap-4 text-lg">
            Photos <span className="font-mono text-sm text-ink-soft">{photos.length}</span>
          </h2>
          <PhotoCells items={photos} onDelete={onDelete} />
        </section>
      )}
    </div>
  );
}
