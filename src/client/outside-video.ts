import { followOf } from './video-now.ts';

/** A video on someone else's site: nothing of it is loaded until somebody asks for it. */
export class OutsideVideo extends HTMLElement {
  connectedCallback(): void {
    const button = this.querySelector('button');
    button?.addEventListener('click', () => {
      this.#load(button);
    });
  }

  #load(button: Element): void {
    const { frameUrl = '', origin = '', frameTitle = '' } = this.dataset;
    const follow = followOf(this);
    const seconds = Math.floor(follow?.now?.seconds ?? 0);
    const address = new URL(frameUrl);
    if (seconds > 0 && address.hash === '') address.hash = `t=${String(seconds)}`;
    const frame = document.createElement('iframe');
    frame.title = frameTitle;
    frame.className = button.getAttribute('data-frame-class') ?? '';
    frame.allow = 'autoplay; encrypted-media; fullscreen; picture-in-picture';
    // Hosts that let only some sites show a video ask for the site's name, and get no more than that.
    frame.referrerPolicy = 'strict-origin';
    frame.setAttribute('sandbox', 'allow-scripts allow-same-origin allow-presentation');
    frame.src = address.href;
    follow?.followFrame(frame, origin);
    button.replaceWith(frame);
    frame.focus();
  }
}
