import { DataFiles } from './data-files.ts';
import { MultipartStore } from './multipart-store.ts';
import { ObjectStore } from './object-store.ts';

/** Everything a folder holds: objects, uploads under way, and the bytes of both. */
export type Storage = {
  readonly data: DataFiles;
  readonly objects: ObjectStore;
  readonly uploads: MultipartStore;
};

/** Opens a folder, which no other process may have open, and clears what an interrupted run left behind. */
export async function openStorage(folder: string): Promise<Storage> {
  const data = await DataFiles.open(folder);
  const objects = await ObjectStore.open(folder, data);
  const uploads = await MultipartStore.open(folder, data, objects);
  const inUse = new Set<string>();
  for (const { segments } of objects.everyRecord()) for (const { file } of segments) inUse.add(file);
  for (const { segment } of uploads.everyPart()) inUse.add(segment.file);
  await data.sweep(inUse);
  return { data, objects, uploads };
}
