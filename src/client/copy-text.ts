import { copy } from './copy.ts';

/** Copies the text of its textarea; where nothing may be copied, selects it. Without a script the text stands there. */
class CopyText extends HTMLElement {
  connectedCallback(): void {
    const button = this.querySelector('button');
    button?.removeAttribute('hidden');
    button?.addEventListener('click', () => void this.#copy());
  }

  async #copy(): Promise<void> {
    const field = this.querySelector('textarea');
    const status = this.querySelector('[role="status"]');
    if (!(await copy(field?.value ?? '', status, 'Copied.'))) field?.select();
  }
}

customElements.define('copy-text', CopyText);
