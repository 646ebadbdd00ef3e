import { setTimeout as wait } from 'node:timers/promises';

/** Longer than any of the guarded look-ups takes, a password's hash included; milliseconds. */
const FLOOR = 400;

/** Answers no sooner than a fixed time after it was asked, so that the time does not tell whether an address is known. */
export async function inSteadyTime<Result>(work: () => Promise<Result>): Promise<Result> {
  const [outcome] = await Promise.allSettled([work(), wait(FLOOR)]);
  if (outcome.status === 'rejected') throw outcome.reason;
  return outcome.value;
}
