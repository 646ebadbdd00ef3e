import { type Supervisor } from './supervisor.ts';

/**
 * Stops everything when the person or the parent asks: Ctrl-C, SIGTERM, a closed terminal, the end of npm or of
 * the channel that this was started with. Asked by Ctrl-C once more, it no longer waits.
 */
export function stopWhenAsked(supervisor: Supervisor): void {
  let asked = false;
  const stop = (signal?: NodeJS.Signals) => {
    // npm passes on the Ctrl-C that the terminal has sent here already: only a later one is a second wish.
    if (asked) return;
    asked = true;
    if (signal) supervisor.tell('\nStopping …');
    void supervisor.stop(0);
  };
  process.on('SIGINT', stop);
  process.on('SIGTERM', stop);
  process.on('SIGHUP', stop);
  process.on('disconnect', stop);
  // A reader that has gone (npm start | head) is no reason to end without stopping the parts.
  process.stdout.on('error', () => undefined);
  process.stderr.on('error', () => undefined);
  const fault = (error: unknown) => {
    void supervisor.fail(error);
  };
  process.on('uncaughtException', fault);
  process.on('unhandledRejection', fault);
  if (process.env['npm_lifecycle_event'] === undefined) return;
  const parent = process.ppid;
  const timer = setInterval(() => {
    if (process.ppid !== parent) stop();
  }, 1000);
  timer.unref();
}
