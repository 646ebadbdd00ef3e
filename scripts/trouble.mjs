/** Trouble that a person can do something about. Its message says what happened and what to do. */
export class Trouble extends Error {
  /** @param {string} message */
  constructor(message) {
    super(message);
    this.name = 'Trouble';
  }
}

/** By name, because some are classes of the product, which is not there to be loaded before set-up. */
const TOLD_PLAINLY = new Set(['Trouble', 'SettingsError', 'DatabaseVersionError']);

/**
 * What to print for an error: a sentence for foreseeable trouble, the stack for a fault of ours.
 * @param {unknown} error
 * @returns {string}
 */
export function describe(error) {
  if (!(error instanceof Error)) return String(error);
  return TOLD_PLAINLY.has(error.constructor.name) ? error.message : (error.stack ?? error.message);
}

/**
 * Runs a script's main function and ends the process with its status.
 * @param {() => Promise<number | undefined>} main gives the exit status; undefined leaves the process running
 * @returns {Promise<void>}
 */
export async function runScript(main) {
  try {
    const status = await main();
    if (status !== undefined) process.exit(status);
  } catch (error) {
    console.error(`\n${describe(error)}`);
    process.exit(1);
  }
}
