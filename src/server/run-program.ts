import { spawn } from 'node:child_process';

export interface ProgramCall {
  readonly program: string;
  readonly args: readonly string[];
  /** Wall clock, after which it is killed. */
  readonly seconds: number;
  /** Of address space; none for programs that reserve more than they use. */
  readonly memoryBytes?: number;
  /** Of any one file that it writes. */
  readonly fileBytes?: number;
  readonly stdin?: Uint8Array;
  /** Given each line of standard output as it comes. */
  readonly onLine?: (line: string) => void;
}

export interface ProgramResult {
  /** Null when it was killed. */
  readonly status: number | null;
  readonly timedOut: boolean;
  readonly stdout: Buffer;
  /** The end of what it complained about. */
  readonly complaints: string;
}

const MOST_OUTPUT = 64 * 1024 * 1024;
const MOST_COMPLAINTS = 8 * 1024;

/**
 * Runs a program on untrusted data: with caps on memory, processor time and file size, at low priority, with an
 * empty environment, killed when its time is up or this process is gone.
 */
export function runProgram(call: ProgramCall): Promise<ProgramResult> {
  const { memoryBytes, fileBytes } = call;
  const limits = [
    '--core=0',
    '--nofile=256',
    // Processor time on every core; the wall clock below is what ends it in earnest.
    `--cpu=${String(Math.ceil(call.seconds * 8))}`,
    ...(memoryBytes === undefined ? [] : [`--as=${String(memoryBytes)}`]),
    ...(fileBytes === undefined ? [] : [`--fsize=${String(fileBytes)}`]),
  ];
  const child = spawn(
    'setpriv',
    ['--pdeathsig', 'KILL', '--', 'prlimit', ...limits, '--', 'nice', '-n', '10', call.program, ...call.args],
    { stdio: ['pipe', 'pipe', 'pipe'], env: { PATH: '/usr/local/bin:/usr/bin:/bin', LC_ALL: 'C.UTF-8' } },
  );
  const output: Buffer[] = [];
  let outputBytes = 0;
  let line = '';
  let complaints = '';
  let timedOut = false;
  const timer = setTimeout(() => {
    timedOut = true;
    child.kill('SIGKILL');
  }, call.seconds * 1000);
  child.stdout.on('data', (chunk: Buffer) => {
    if (call.onLine) {
      const lines = (line + chunk.toString('latin1')).split('\n');
      line = lines.pop() ?? '';
      for (const whole of lines) call.onLine(whole);
      return;
    }
    outputBytes += chunk.length;
    if (outputBytes > MOST_OUTPUT) child.kill('SIGKILL');
    else output.push(chunk);
  });
  child.stderr.setEncoding('utf8').on('data', (text: string) => {
    complaints = (complaints + text).slice(-MOST_COMPLAINTS);
  });
  // A program that ends before it has read everything closes its end; that is its status to say.
  child.stdin.on('error', () => undefined).end(call.stdin);
  return new Promise((resolve, reject) => {
    child.once('error', (error) => {
      clearTimeout(timer);
      reject(error);
    });
    child.once('close', (status) => {
      clearTimeout(timer);
      resolve({ status, timedOut, stdout: Buffer.concat(output), complaints });
    });
  });
}

let queue: Promise<unknown> = Promise.resolve();

/** Runs one piece of heavy work after another, never two at once in this process. */
export function oneAtATime<Result>(work: () => Promise<Result>): Promise<Result> {
  const turn = queue.then(work, work);
  queue = turn.catch(() => undefined);
  return turn;
}
