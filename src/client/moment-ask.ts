import { followOf } from './video-now.ts';

/** Sends the present second along with a form that asks about it. */
export class MomentAsk extends HTMLElement {
  connectedCallback(): void {
    this.addEventListener('submit', () => {
      const field = this.querySelector<HTMLInputElement>('[name="t"]');
      if (field) field.value = String(Math.floor(followOf(this)?.now?.seconds ?? 0));
    });
  }
}
