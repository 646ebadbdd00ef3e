import { heightAt, type TapePlace, timeAt } from './tape-places.ts';
import { askFor, followOf, NOW } from './video-now.ts';

/** From a row's top to its place on the tape, in pixels; the tape is drawn so. */
const PLACE = 24;

/** The list of notes: the one that holds now is marked, and on the tape beside them a pointer stands at now. */
export class NotesNow extends HTMLElement {
  #rows: readonly HTMLElement[] = [];
  #current: Element | undefined;

  connectedCallback(): void {
    this.#rows = [...this.querySelectorAll<HTMLElement>('[data-row-at]')];
    const notes = this.querySelectorAll('[data-note]');
    const follow = followOf(this);
    follow?.addEventListener(NOW, () => {
      const { note = null, seconds = 0 } = follow.now ?? {};
      this.#mark(note === null ? undefined : notes[note]);
      this.#point(seconds);
    });
    this.querySelector('[data-tape]')?.addEventListener('click', (event) => {
      const top = this.#tape?.getBoundingClientRect().top ?? 0;
      askFor(this, timeAt((event as MouseEvent).clientY - top, this.#places()));
    });
  }

  get #tape(): Element | null {
    return this.querySelector('[data-tape]');
  }

  #mark(row: Element | undefined): void {
    if (row === this.#current) return;
    for (const [one, on] of [
      [this.#current, false],
      [row, true],
    ] as const) {
      one?.toggleAttribute('data-filled', on);
      if (on) one?.setAttribute('aria-current', 'true');
      else one?.removeAttribute('aria-current');
    }
    this.#current = row;
  }

  #point(seconds: number): void {
    const tape = this.#tape;
    // Only narrow screens show the tape.
    if (!tape || tape.getClientRects().length === 0) return;
    tape
      .querySelector('[data-rule-now]')
      ?.setAttribute('y', String(Math.round(heightAt(seconds, this.#places()))));
  }

  #places(): TapePlace[] {
    const tape = this.#tape?.getBoundingClientRect();
    if (!tape) return [];
    const rows = this.#rows.map((row) => ({
      at: Number(row.dataset['rowAt']),
      y: row.getBoundingClientRect().top - tape.top + PLACE,
    }));
    const end = Math.max(followOf(this)?.course.seconds ?? 0, (rows.at(-1)?.at ?? 0) + 1);
    return [{ at: 0, y: 0 }, ...rows.filter(({ at }) => at > 0), { at: end, y: tape.height }];
  }
}
