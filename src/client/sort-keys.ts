import { keepSingleKeys, singleKeysAreOn } from './single-keys.ts';

/** Presses the button inside that names the key, as long as nobody is typing and single keys are on. */
class SortKeys extends HTMLElement {
  connectedCallback(): void {
    document.addEventListener('keydown', this.#press);
    const box = this.querySelector<HTMLInputElement>('[data-keys]');
    if (!box) return;
    box.checked = singleKeysAreOn();
    box.closest('[hidden]')?.removeAttribute('hidden');
    box.addEventListener('change', () => {
      keepSingleKeys(box.checked);
    });
  }

  disconnectedCallback(): void {
    document.removeEventListener('keydown', this.#press);
  }

  #press = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey || event.repeat) return;
    if (event.target instanceof Element && event.target.closest('input, textarea, select, [contenteditable]'))
      return;
    const on = this.querySelector<HTMLInputElement>('[data-keys]')?.checked ?? singleKeysAreOn();
    const key = event.key.toLowerCase();
    if (!on || !/^[a-z]$/.test(key)) return;
    const button = this.querySelector<HTMLElement>(`[aria-keyshortcuts="${key}"]`);
    if (!button) return;
    event.preventDefault();
    button.click();
  };
}

customElements.define('sort-keys', SortKeys);
