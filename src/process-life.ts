/**
 * Tells whoever started this process that it is ready, and stops it once on a signal, or when that one is gone.
 * @param stop finishes what is in hand; the process ends with it
 */
export function liveUntilStopped(message: object, stop: () => Promise<void>): void {
  let stopping = false;
  const stopOnce = () => {
    if (stopping) return;
    stopping = true;
    void stop().then(
      () => process.exit(0),
      (error: unknown) => {
        process.stderr.write(`Stopping went wrong: ${String(error)}\n`);
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', stopOnce);
  process.on('SIGINT', stopOnce);
  if (process.send) {
    process.on('disconnect', stopOnce);
    process.send({ ready: true, ...message });
  }
}

/** Runs the start of a process; a foreseeable failure ends it with its sentence, anything else with its stack. */
export async function startProcess(start: () => Promise<void>): Promise<void> {
  try {
    await start();
  } catch (error) {
    const said = error instanceof Error ? error : new Error(String(error));
    const foreseen = ['SettingsError', 'DatabaseVersionError'].includes(said.name) || 'code' in said;
    process.stderr.write(`${foreseen ? said.message : (said.stack ?? said.message)}\n`);
    process.exit(1);
  }
}
