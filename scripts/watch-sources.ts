import { watch } from 'node:fs';

const PAUSE_MS = 200;

/** Calls back when something below a folder has changed and then kept still for a moment. */
export function watchSources(folder: string, onChange: () => void): void {
  let timer: NodeJS.Timeout | undefined;
  const watcher = watch(folder, { recursive: true }, () => {
    clearTimeout(timer);
    timer = setTimeout(onChange, PAUSE_MS);
  });
  watcher.unref();
}
