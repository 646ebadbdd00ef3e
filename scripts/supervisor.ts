import { setTimeout as wait } from 'node:timers/promises';
import { type KeptPart, keepRunning } from './keep-running.ts';
import { type Part } from './part.ts';
import { type Running } from './running.ts';
import { describe } from './trouble.mjs';

/** Longer than the longest stop of one part. */
const STOP_WITHIN_MS = 45_000;

/** Thrown inside a start that has been told to stop. */
export class Stopped extends Error {}

/** Looks after the parts of this copy until it is told to stop or one of them cannot be kept running. */
export class Supervisor {
  readonly #tiers: (() => Promise<void>)[][] = [];
  readonly #finished: Promise<number>;
  #finish: (status: number) => void = () => undefined;
  #stopping = false;

  /** @param tell prints a report */
  constructor(readonly tell: (line: string) => void) {
    this.#finished = new Promise((resolve) => (this.#finish = resolve));
  }

  /** Settles with the exit status when everything has ended. */
  get finished(): Promise<number> {
    return this.#finished;
  }

  /**
   * Starts parts together and waits until all are ready. They end before those that were started earlier.
   * @throws Stopped when the copy has been told to stop meanwhile
   */
  async start<T extends readonly Running[]>(
    ...parts: { readonly [K in keyof T]: Part<T[K]> }
  ): Promise<{ -readonly [K in keyof T]: KeptPart<T[K]> }> {
    this.#throwIfStopping();
    const kept = parts.map((part: Part) =>
      keepRunning(part, this.tell, (sentence) => {
        this.tell(sentence);
        void this.stop(1);
      }),
    );
    this.#tiers.push(kept.map(({ stop }) => stop));
    try {
      await Promise.all(kept.map(({ started }) => started));
    } catch (error) {
      this.#throwIfStopping();
      throw error;
    }
    this.#throwIfStopping();
    return kept as { -readonly [K in keyof T]: KeptPart<T[K]> };
  }

  /** Has a process that is no lasting part ended with the rest. */
  alsoStop(running: Running): void {
    if (this.#stopping) void running.stop();
    else this.#tiers.push([running.stop]);
  }

  /** Ends all parts, the newest first, in a bounded time. A second call changes nothing. */
  async stop(status: number): Promise<void> {
    if (this.#stopping) return;
    this.#stopping = true;
    const inOrder = async () => {
      for (const tier of this.#tiers.reverse()) await Promise.allSettled(tier.map((end) => end()));
    };
    await Promise.race([inOrder(), wait(STOP_WITHIN_MS, undefined, { ref: false })]);
    this.#finish(status);
  }

  /** Ends everything because a start has failed. */
  async fail(error: unknown): Promise<void> {
    if (error instanceof Stopped) return;
    if (!this.#stopping) this.tell(`\n${describe(error)}`);
    await this.stop(1);
  }

  #throwIfStopping(): void {
    if (this.#stopping) throw new Stopped();
  }
}
