import { followOf, NOW } from './video-now.ts';

/**
 * The parts on the bench now, copied from the page's own list of parts: whole lines into `data-bench-list`, their
 * balloons alone into `data-bench-balloons`.
 */
export class BenchNow extends HTMLElement {
  #shown = '';

  connectedCallback(): void {
    followOf(this)?.addEventListener(NOW, () => {
      this.#show();
    });
  }

  #show(): void {
    const parts = followOf(this)?.now?.parts ?? [];
    const key = JSON.stringify(parts);
    // What has not changed is not touched: somebody may be on a link in it.
    if (key === this.#shown) return;
    this.#shown = key;
    const sources = followOf(this)?.querySelectorAll('[data-part]') ?? [];
    const copies = (selector?: string) =>
      parts.flatMap(({ index, filled }) => {
        const source = sources[index];
        const copy = (selector === undefined ? source : source?.querySelector(selector))?.cloneNode(true);
        if (!(copy instanceof Element)) return [];
        copy.removeAttribute('data-part');
        copy.toggleAttribute('data-filled', filled);
        if (filled && selector === undefined) copy.setAttribute('aria-current', 'true');
        // The balloons alone stand in a summary, which holds no links.
        if (selector !== undefined)
          for (const link of copy.querySelectorAll('a')) link.replaceWith(...link.childNodes);
        return [copy];
      });
    for (const list of this.querySelectorAll('[data-bench-list]')) list.replaceChildren(...copies());
    for (const row of this.querySelectorAll('[data-bench-balloons]'))
      row.replaceChildren(...copies('[data-part-balloon]'));
    for (const empty of this.querySelectorAll('[data-bench-empty]'))
      empty.toggleAttribute('hidden', parts.length > 0);
  }
}
