/** How long it says that the text was copied, in milliseconds. */
const SAID_MS = 4000;

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
    try {
      await navigator.clipboard.writeText(field?.value ?? '');
      if (!status) return;
      status.textContent = 'Copied.';
      setTimeout(() => (status.textContent = ''), SAID_MS);
    } catch {
      field?.select();
    }
  }
}

customElements.define('copy-text', CopyText);
