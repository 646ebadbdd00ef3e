import { type ServerResponse } from 'node:http';
import { answerPlainly } from './plain-answers.ts';

export const HEALTH_PATH = '/healthz';

const PATIENCE_MS = 2_000;

async function holdsUp(isHealthy: () => Promise<boolean> | boolean): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<boolean>((resolve) => {
    timer = setTimeout(resolve, PATIENCE_MS, false);
  });
  try {
    return await Promise.race([isHealthy(), tooLate]);
  } catch {
    return false;
  } finally {
    clearTimeout(timer);
  }
}

/** Answers 200 `ok`, or 503 with a sentence when the process is stopping or not healthy within two seconds. */
export async function answerHealth(
  res: ServerResponse,
  isHealthy: () => Promise<boolean> | boolean,
  isDraining: () => boolean,
): Promise<void> {
  if (isDraining()) answerPlainly(res, 503, 'This server is stopping.');
  else if (await holdsUp(isHealthy)) answerPlainly(res, 200, 'ok');
  else answerPlainly(res, 503, 'This server cannot reach what it needs.');
}
