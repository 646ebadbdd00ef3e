import { formatClock } from '../domain/time/format-clock.ts';
import { askFor, followOf, NOW } from './video-now.ts';

/** What a key moves by, in seconds: a line of the rule, or a half minute. */
const KEYS: Readonly<Record<string, number>> = {
  ArrowRight: 5,
  ArrowUp: 5,
  ArrowLeft: -5,
  ArrowDown: -5,
  PageUp: 30,
  PageDown: -30,
};

/** The steel rule: its pointer stands at now, its face is a slider for pointer and keys. */
export class RuleNow extends HTMLElement {
  #shown = '';

  connectedCallback(): void {
    const follow = followOf(this);
    const face = this.#face;
    if (!follow || !face) return;
    face.tabIndex = 0;
    const attributes = { role: 'slider', 'aria-label': 'Time in the episode', 'aria-valuemin': '0' };
    for (const [name, value] of Object.entries(attributes)) face.setAttribute(name, value);
    face.setAttribute('aria-valuemax', String(Math.floor(this.#length)));
    follow.addEventListener(NOW, () => {
      this.#show(follow.now?.seconds ?? 0);
    });
    face.addEventListener('keydown', this.#key);
    face.addEventListener('pointerdown', (event) => {
      if (event.button !== 0) return;
      face.setPointerCapture(event.pointerId);
      this.#seekTo(event);
    });
    face.addEventListener('pointermove', (event) => {
      if (face.hasPointerCapture(event.pointerId)) this.#seekTo(event);
    });
  }

  get #face(): HTMLElement | null {
    return this.querySelector<HTMLElement>('[data-rule-face]');
  }

  get #length(): number {
    return Number(this.dataset['length']);
  }

  #show(seconds: number): void {
    const share = Math.min(1, seconds / this.#length);
    for (const pointer of this.querySelectorAll('[data-rule-now]'))
      pointer.setAttribute('x', `${String(Math.round(share * 100_000) / 1000)}%`);
    const face = this.#face;
    face?.setAttribute('aria-valuenow', String(Math.floor(seconds)));
    face?.setAttribute('aria-valuetext', `${formatClock(seconds)} of ${formatClock(this.#length)}`);
    this.#fill(seconds);
  }

  /** Fills the balloon at which each part in view came onto the bench: the last one before now. */
  #fill(seconds: number): void {
    const inView = (followOf(this)?.now?.parts ?? []).filter(({ filled }) => filled);
    const key = inView.map(({ index }) => index).join();
    if (key === this.#shown) return;
    this.#shown = key;
    const last = new Map<string, string>();
    const balloons = [...this.querySelectorAll<SVGElement>('[data-balloon]')];
    const partOf = (balloon: SVGElement) => balloon.dataset['balloon']?.split('-')[0] ?? '';
    for (const balloon of balloons) {
      const { balloon: id = '', at } = balloon.dataset;
      if (Number(at) <= seconds) last.set(partOf(balloon), id);
    }
    for (const balloon of balloons)
      balloon.toggleAttribute(
        'data-filled',
        inView.some(({ index }) => String(index) === partOf(balloon)) &&
          last.get(partOf(balloon)) === balloon.dataset['balloon'],
      );
  }

  #seekTo({ clientX }: PointerEvent): void {
    const scale = this.#face?.querySelector('svg')?.getBoundingClientRect();
    if (!scale || scale.width === 0) return;
    askFor(this, Math.min(1, Math.max(0, (clientX - scale.left) / scale.width)) * this.#length);
  }

  #key = (event: KeyboardEvent): void => {
    const now = followOf(this)?.now?.seconds ?? 0;
    const step = KEYS[event.key];
    const ends: Readonly<Record<string, number>> = { Home: 0, End: this.#length };
    const to = step === undefined ? ends[event.key] : Math.min(this.#length, Math.max(0, now + step));
    if (to === undefined) return;
    event.preventDefault();
    askFor(this, to);
  };
}
