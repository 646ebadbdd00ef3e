import { copy } from './copy.ts';
import { followOf } from './video-now.ts';

/** Copies a link to the present instant; where nothing may be copied, shows it selected. */
export class MomentLink extends HTMLElement {
  connectedCallback(): void {
    this.querySelector('button')?.addEventListener('click', () => void this.#copy());
  }

  async #copy(): Promise<void> {
    const seconds = Math.floor(followOf(this)?.now?.seconds ?? 0);
    const link = location.origin + location.pathname + (seconds === 0 ? '' : `?t=${String(seconds)}`);
    const field = this.querySelector('input');
    const status = this.querySelector('[role="status"]');
    if ((await copy(link, status, 'Link copied.')) || !field) return;
    field.value = link;
    field.closest('[hidden]')?.removeAttribute('hidden');
    field.select();
  }
}
